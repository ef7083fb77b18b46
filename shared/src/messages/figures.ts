/** How a figure is written in a sentence. Screens format through their own component; these are for prose. */

const nonBreaking = '\u00a0';

/** A number with so many decimals, thousands set apart, a true minus sign. */
export function number(value: number, decimals = 0): string {
  if (!Number.isFinite(value)) return '–';
  const [whole = '0', fraction] = Math.abs(value).toFixed(decimals).split('.');
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, '\u202f') : whole;
  const sign = value < 0 && Number(Math.abs(value).toFixed(decimals)) !== 0 ? '−' : '';
  return `${sign}${grouped}${fraction ? `.${fraction}` : ''}`;
}

/** A share 0 to 1 as a percentage; small ones keep a decimal so that they do not read as nothing. */
export function share(value: number): string {
  const percent = value * 100;
  return `${number(percent, Math.abs(percent) < 9.95 && percent !== 0 ? 1 : 0)}${nonBreaking}%`;
}

/** A travel in % of rated travel. */
export function travel(value: number, decimals = 0): string {
  return `${number(value, decimals)}${nonBreaking}%`;
}

/** A length of time given in s, in the unit a reader would choose. */
export function duration(seconds: number): string {
  if (!Number.isFinite(seconds)) return '–';
  if (seconds < 120) return `${number(seconds)}${nonBreaking}s`;
  if (seconds < 7_200) return `${number(seconds / 60)}${nonBreaking}min`;
  if (seconds < 172_800) return `${number(seconds / 3_600, 1)}${nonBreaking}h`;
  return `${number(seconds / 86_400, seconds < 864_000 ? 1 : 0)}${nonBreaking}days`;
}

/** A change of ln capacity as a percentage of capacity. */
export function capacityChange(ln: number): string {
  return share(Math.abs(Math.exp(ln) - 1));
}
