import { type Line } from './loop-settings.js';

/** Density water at 15 °C, kg/m³. */
const waterDensity = 999.1;

/**
 * Flow through a valve in its line, where its drop is `drop` − b·q²: q = C√(a/SG)/√(1 + C²b/SG).
 *
 * @param C Kv
 * @param drop kPa at no flow
 * @param resistance kPa per (m³/h)²
 * @returns m³/h
 * Source: IEC 60534-2-1 with the two-point line of methods.md §5.4
 */
export function flowThrough(C: number, drop: number, resistance: number, density: number): number {
  const gravity = density / waterDensity;
  const perRoot = (0.1 * C) / Math.sqrt(gravity);
  return (perRoot * Math.sqrt(Math.max(0, drop))) / Math.sqrt(1 + perRoot * perRoot * resistance);
}

/** kPa per (m³/h)²: such that the line takes its share of the drop at the flow of the full-open valve. */
export function resistanceOf(line: Line, ratedCoefficient: number): number {
  const gravity = line.density / waterDensity;
  const perRoot = (0.1 * ratedCoefficient) / Math.sqrt(gravity);
  return line.lossShare / (1 - line.lossShare) / (perRoot * perRoot);
}
