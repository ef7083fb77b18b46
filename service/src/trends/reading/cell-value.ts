/** What a value cell says: a number, a sample the historian could not vouch for, or nothing. */
export type CellValue =
  | { readonly kind: 'number'; readonly value: number }
  | { readonly kind: 'bad' }
  | { readonly kind: 'empty' }
  | { readonly kind: 'other mark' }
  | { readonly kind: 'not a number' };

const empty: CellValue = { kind: 'empty' };
const bad: CellValue = { kind: 'bad' };
const otherMark: CellValue = { kind: 'other mark' };
const notANumber: CellValue = { kind: 'not a number' };

const pointNumber = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/;
const commaNumber = /^[+-]?(?:\d+,?\d*|,\d+)(?:[eE][+-]?\d+)?$/;

/**
 * Words controllers and historians write for their modes: 1 in automatic, 0 in manual. LO is not among them: in a
 * measurement it says below range, and a zero there would be a value nobody measured.
 */
const modes: ReadonlyMap<string, number> = new Map([
  ...['auto', 'automatic', 'aut', 'cas', 'cascade', 'rcas'].map((word) => [word, 1] as const),
  ...['man', 'manual', 'rout', 'iman'].map((word) => [word, 0] as const),
]);

/**
 * Reads one value cell.
 *
 * Words other than a mode are a bad sample, never zero (methods.md §1.1). A number written with the other decimal
 * mark is told apart from one that is no number at all, because it condemns the whole file and not a row.
 */
export function cellValue(text: string, decimalMark: '.' | ','): CellValue {
  const cell = text.trim();
  if (cell === '') return empty;
  const [own, other] = decimalMark === '.' ? [pointNumber, commaNumber] : [commaNumber, pointNumber];
  if (own.test(cell)) {
    const value = Number(decimalMark === '.' ? cell : cell.replace(',', '.'));
    return Number.isFinite(value) ? { kind: 'number', value } : bad;
  }
  if (other.test(cell)) return otherMark;
  const mode = modes.get(cell.toLowerCase());
  if (mode !== undefined) return { kind: 'number', value: mode };
  return /^[#<[(]?[\p{L}?*-]/u.test(cell) ? bad : notANumber;
}

/**
 * Does a quality cell vouch for its sample? OPC status codes by their two high bits (192 good, 64 uncertain,
 * 0 bad), words by their beginning; an empty cell says nothing against it.
 */
export function qualityIsGood(text: string, uncertainIsGood: boolean): boolean {
  const cell = text.trim().toLowerCase();
  if (cell === '') return true;
  if (/^\d+$/.test(cell)) {
    const status = Number(cell) & 0xc0;
    return status === 0xc0 || (status === 0x40 && uncertainIsGood);
  }
  if (/^(good|ok|g$|true|valid)/.test(cell)) return true;
  return uncertainIsGood && /^(uncertain|questionable|u$|suspect)/.test(cell);
}
