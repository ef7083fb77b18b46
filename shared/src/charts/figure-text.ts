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
  const [whole = '0', rest] = plain(kept).split('.');
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, '\u202f') : whole;
  const text = rest ? `${grouped}.${rest}` : grouped;
  return value < 0 && kept !== 0 ? `−${text}` : text;
}

function plain(value: number): string {
  return value !== 0 && value < 1e-6 ? value.toFixed(12).replace(/0+$/, '') : String(value);
}
