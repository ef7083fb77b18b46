import { type Dimension, type Unit } from './unit.js';
import { absoluteByName, unitTable, type UnitRow, withoutState } from './unit-table.js';

/** One spelling for one unit: lower case, no blanks, plain digits, no degree sign, one outer bracket taken off. */
function tidy(text: string): string {
  const plain = text
    .trim()
    .toLowerCase()
    .replace(/³/g, '3')
    .replace(/²/g, '2')
    .replace(/₂/g, '2')
    .replace(/[°º\s]/g, '')
    .replace(/[[{]/g, '(')
    .replace(/[\]}]/g, ')');
  return /^\([^()]*\)$/.test(plain) ? plain.slice(1, -1) : plain;
}

function bySpelling(rows: readonly UnitRow[]): ReadonlyMap<string, UnitRow> {
  return new Map(
    rows.flatMap((row) => [row.name, ...row.spellings].map((text) => [tidy(text), row] as const)),
  );
}

const rows = bySpelling(unitTable);
const absolutes = bySpelling(absoluteByName);

/** 'bar(g)', 'barg', 'bar gauge', 'psia', 'kpa(abs)' …: the unit, and what its ending says. */
const pressureEnding = /^(.+?)[.,_-]?(?:\(?(gauge|ga|g|ü)\)?|\(?(absolute|abs|a)\)?)$/;

/**
 * The unit a text names, in the spellings of the trade; case and blanks do not matter.
 *
 * A pressure that does not say gauge or absolute is read as absolute and marked `doubtful`.
 *
 * @returns null for a text that names no unit known here, and for a normal or standard flow without its state
 * @example unitOf('bar(g)') // { name: 'bar(g)', dimension: 'pressure', factor: 100, gauge: true … }
 * Source: methods.md §1.4
 */
export function unitOf(text: string): Unit | null {
  const key = tidy(text);
  const row = rows.get(key);
  if (row !== undefined) return unitFrom(row, row.name, false, row.dimension === 'pressure');
  const absolute = absolutes.get(key);
  if (absolute !== undefined) return unitFrom(absolute, absolute.name, false, false);
  const ending = pressureEnding.exec(key);
  const stem = ending === null ? undefined : rows.get(ending[1] as string);
  if (ending === null || stem === undefined || stem.dimension !== 'pressure') return null;
  const gauge = ending[2] !== undefined;
  return unitFrom(stem, `${stem.name}(${gauge ? 'g' : 'a'})`, gauge, false);
}

function unitFrom(row: UnitRow, name: string, gauge: boolean, doubtful: boolean): Unit {
  return { name, dimension: row.dimension, factor: row.factor, offset: row.offset ?? 0, gauge, doubtful };
}

/** What a unit's text measures; null where `unitOf` knows no such unit. */
export function dimensionOf(text: string): Dimension | null {
  return unitOf(text)?.dimension ?? null;
}

/** True for a normal or standard flow that does not name the state it is counted at: refused, never guessed. */
export function lacksState(text: string): boolean {
  return withoutState.includes(tidy(text));
}

const flows: readonly Dimension[] = ['volume flow', 'mass flow', 'normal volume flow'];

/** True for the three dimensions of flow. */
export function isFlow(dimension: Dimension): boolean {
  return flows.includes(dimension);
}
