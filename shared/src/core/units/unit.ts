/** What a unit measures. Flow has three dimensions, because they cannot be turned into each other without the fluid. */
export type Dimension =
  | 'volume flow'
  | 'mass flow'
  | 'normal volume flow'
  | 'pressure'
  | 'temperature'
  | 'density'
  | 'travel'
  | 'coefficient';

/**
 * One unit as its way into the units of methods.md §0: core = value·factor + offset, plus the site's barometric
 * pressure where the unit counts from it.
 */
export interface Unit {
  /** the spelling it is shown with */
  readonly name: string;
  readonly dimension: Dimension;
  readonly factor: number;
  readonly offset: number;
  /** a gauge pressure: the site's barometric pressure is added */
  readonly gauge: boolean;
  /** the text did not say gauge or absolute: it is read as absolute, and callers should say so */
  readonly doubtful: boolean;
}

/** What a conversion must know of the place. */
export interface Site {
  /** kPa(a) */
  readonly barometricPressure: number;
}

export const standardSite: Site = { barometricPressure: 101.325 };

const shift = (unit: Unit, site: Site) => unit.offset + (unit.gauge ? site.barometricPressure : 0);

/**
 * A value in a unit, in the program's own units (methods.md §0).
 *
 * @example toCore(2, barg) // 301.325 kPa(a)
 */
export function toCore(value: number, unit: Unit, site: Site = standardSite): number {
  return value * unit.factor + shift(unit, site);
}

/** A value in the program's own units, in another unit of its dimension: the inverse of `toCore`. */
export function fromCore(value: number, unit: Unit, site: Site = standardSite): number {
  return (value - shift(unit, site)) / unit.factor;
}

/**
 * `toCore` for a whole column. NaN stays NaN.
 *
 * @returns the column itself where nothing changes, else a new one
 */
export function columnToCore(values: Float64Array, unit: Unit, site: Site = standardSite): Float64Array {
  const offset = shift(unit, site);
  const { factor } = unit;
  if (factor === 1 && offset === 0) return values;
  const converted = new Float64Array(values.length);
  for (let i = 0; i < values.length; i++) converted[i] = (values[i] as number) * factor + offset;
  return converted;
}
