/**
 * A number as an axis or a read-out shows it: at most so many significant digits, no trailing noughts after
 * the point, a true minus sign, narrow spaces between thousands.
 *
 * @param value any number
 * @param digits significant digits kept; whole numbers keep all theirs
 * @returns "–" for a value that is not finite
 * @example figureText(12345.6) // "12 346"
 * @example figureText(-0.01234) // "−0.0123"
 */
export function figureText(value: number, digits = 3): string {
  if (!Number.isFinite(value)) return '–';
  const size = Math.abs(value);
  const kept = size >= 10 ** (digits - 1) ? Math.round(size) : Number(size.toPrecision(digits));
  return signed(value < 0, plain(kept));
}

/**
 * The numbers of one table column, all with the same decimals, so that their points stand under each other:
 * as many as give three quarters of them the digits asked for.
 *
 * @param values any numbers
 * @param digits significant digits wanted
 */
export function figureColumn(values: readonly number[], digits = 3): string[] {
  const sizes = values
    .map(Math.abs)
    .filter((size) => Number.isFinite(size) && size > 0)
    .sort((a, b) => a - b);
  const small = sizes[Math.floor(sizes.length / 4)] ?? 1;
  const decimals = Math.min(6, Math.max(0, digits - 1 - Math.floor(Math.log10(small))));
  return values.map((value) =>
    Number.isFinite(value) ? signed(value < 0, Math.abs(value).toFixed(decimals)) : '–',
  );
}

function signed(negative: boolean, text: string): string {
  const [whole = '0', rest] = text.split('.');
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, '\u202f') : whole;
  const size = rest ? `${grouped}.${rest}` : grouped;
  return negative && /[1-9]/.test(size) ? `−${size}` : size;
}

function plain(value: number): string {
  return value !== 0 && value < 1e-6 ? value.toFixed(12).replace(/0+$/, '') : String(value);
}
