import { lagAutocorrelation } from '../statistics/autocorrelation.js';

/** Points below which an autocorrelation is no more than a guess: half is then assumed. */
const fewPoints = 6;
const assumed = 0.5;

/**
 * Lag-1 autocorrelation of what is left of a short series once `fitted` parameters were taken out, with the bias
 * of short series put back: E[r] ≈ ρ − (1 + (1 + fitted)·ρ)/n (Kendall 1954, Marriott & Pope 1954, taken to fits
 * of more than the mean).
 *
 * @param rest equally spaced
 * @returns 0 to 0.9
 */
export function persistence(rest: ArrayLike<number>, fitted: number): number {
  const n = rest.length;
  if (n < fewPoints) return assumed;
  const r = lagAutocorrelation(rest, 1);
  if (Number.isNaN(r)) return 0;
  return Math.min(0.9, Math.max(0, (r + fitted / n) / (1 - (1 + 2 * fitted) / n)));
}

/** Factor on a standard error for points that follow a first-order autoregression. */
export function persistenceFactor(r1: number): number {
  return Math.sqrt((1 + r1) / (1 - r1));
}

/** Standard deviation of what is left after `fitted` parameters. */
export function restSpread(rest: ArrayLike<number>, fitted: number): number {
  let squares = 0;
  for (let i = 0; i < rest.length; i++) squares += (rest[i] as number) ** 2;
  return Math.sqrt(squares / Math.max(1, rest.length - fitted));
}
