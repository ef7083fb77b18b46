import { type DataSheet, type ValveStyle } from '../data-sheet.js';

interface StyleFactors {
  readonly FL: number;
  readonly xT: number;
  readonly Fd: number;
}

/**
 * Typical factors at full travel by style, of the kind tabulated in IEC 60534-2-1 (from memory). They keep windows
 * that are probably choked out of fits; no verdict on choking may rest on them.
 */
const typical: Readonly<Record<ValveStyle, StyleFactors>> = {
  globe: { FL: 0.9, xT: 0.72, Fd: 0.46 },
  'rotary plug': { FL: 0.85, xT: 0.6, Fd: 0.42 },
  'segment ball': { FL: 0.6, xT: 0.3, Fd: 0.98 },
  butterfly: { FL: 0.62, xT: 0.35, Fd: 0.57 },
};

/** Liquid pressure recovery factor: the sheet's, else typical of the style. */
export function recoveryFactor(sheet: DataSheet): number {
  return sheet.FL ?? typical[sheet.style].FL;
}

/** Critical pressure-drop ratio of a gas: the sheet's, else typical of the style. */
export function dropRatioFactor(sheet: DataSheet): number {
  return sheet.xT ?? typical[sheet.style].xT;
}

/** Valve style modifier: the sheet's, else typical of the style. */
export function styleModifier(sheet: DataSheet): number {
  return sheet.Fd ?? typical[sheet.style].Fd;
}
