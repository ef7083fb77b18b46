import { type DataSheet } from '../data-sheet.js';
import { pchip } from '../statistics/pchip.js';
import { relativeCoefficient } from './models.js';

/** What a sheet, or a candidate trim, says of a characteristic. */
type SpecifiedTrim = Pick<DataSheet, 'characteristic' | 'ratedCoefficient' | 'rangeability' | 'table'>;

/**
 * Relative flow coefficient against relative travel as the data sheet specifies it.
 *
 * A table becomes a monotone cubic of ln C, held flat outside; below its first positive row, a row of zero is
 * joined by a straight line in C. A kind without rangeability gets 50, quick opening the square root.
 *
 * @returns null where the sheet gives no characteristic, or a table without two positive rows
 * Source: methods.md §3
 */
export function specifiedCurve(sheet: SpecifiedTrim): ((h: number) => number) | null {
  if (sheet.characteristic === null) return null;
  if (sheet.characteristic === 'table') return tableCurve(sheet);
  const kind = sheet.characteristic;
  const R = sheet.rangeability !== null && sheet.rangeability > 1 ? sheet.rangeability : null;
  // the rangeability of a sheet belongs to the linear and equal-percentage laws; quick opening has its own exponent
  const parameter = kind === 'equal percentage' || kind === 'linear' ? R : null;
  return (h) => relativeCoefficient(kind, h, parameter);
}

function tableCurve(sheet: SpecifiedTrim): ((h: number) => number) | null {
  const rows = (sheet.table ?? [])
    .filter((row) => Number.isFinite(row.travel) && row.coefficient >= 0)
    .sort((a, b) => a.travel - b.travel)
    .filter((row, i, all) => i === 0 || row.travel > (all[i - 1]?.travel ?? -Infinity));
  const positive = rows.filter((row) => row.coefficient > 0);
  const first = positive[0];
  const last = positive[positive.length - 1];
  if (positive.length < 2 || first === undefined || last === undefined) return null;
  const rated =
    sheet.ratedCoefficient !== null && sheet.ratedCoefficient > 0 ? sheet.ratedCoefficient : last.coefficient;
  const curve = pchip(
    positive.map((row) => row.travel / 100),
    positive.map((row) => Math.log(row.coefficient / rated)),
  );
  const zero = rows.filter((row) => row.coefficient === 0 && row.travel < first.travel).at(-1);
  return (h) => {
    if (!(h >= 0 && h <= 1)) return NaN;
    if (zero === undefined || h >= first.travel / 100) return Math.exp(curve(h));
    const share = (100 * h - zero.travel) / (first.travel - zero.travel);
    return (Math.max(0, share) * first.coefficient) / rated;
  };
}
