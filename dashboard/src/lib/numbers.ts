import { number } from '@tailrace/shared/messages/figures';

/** A number to so many significant digits, without an exponent and without false precision. */
export function significant(value: number | null | undefined, digits = 3): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return '–';
  if (value === 0) return '0';
  if (Math.abs(value) < 1e-6) return 'under 0.000001';
  const decimals = Math.max(0, digits - 1 - Math.floor(Math.log10(Math.abs(value))));
  return number(value, Math.min(decimals, 6));
}

/** A number as somebody entered it: neither rounded nor padded. */
export function asEntered(value: number | null | undefined): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return '–';
  const decimals = /\.(\d+)$/.exec(String(value))?.[1]?.length ?? 0;
  return number(value, decimals);
}

/** A unit as the register holds it, its powers raised. */
export function unitText(unit: string): string {
  return unit.replace(/m\^?([23])(?!\d)/g, (_, power) => `m${power === '2' ? '²' : '³'}`);
}

/** A share 0 to 1 as a percentage's number: small ones keep a decimal. */
export function percentage(share: number | null | undefined): string {
  if (share === null || share === undefined || !Number.isFinite(share)) return '–';
  const percent = share * 100;
  return number(percent, percent !== 0 && Math.abs(percent) < 9.95 ? 1 : 0);
}

/** A length in bytes as a person reads it. */
export function fileSize(bytes: number): string {
  if (bytes < 1e3) return `${number(bytes)} B`;
  if (bytes < 1e6) return `${number(bytes / 1e3)} kB`;
  if (bytes < 1e9) return `${number(bytes / 1e6, 1)} MB`;
  return `${number(bytes / 1e9, 2)} GB`;
}
