import { type History } from '../core/series.js';

/** A gas, as far as its flow through a valve goes. */
export interface Gas {
  /** kg/kmol */
  readonly molarMass: number;
  /** K */
  readonly temperature: number;
  readonly specificHeatRatio: number;
  readonly xT: number;
}

/** Kv and kPa; flow in m³/h at 0 °C and 101.325 kPa */
const N9 = 24.6;
const waterDensity = 999.1;

/**
 * Flow of gas through a valve between two pressures, m³/h at the normal state.
 *
 * @param C Kv
 * @param upstream kPa(a)
 * @param drop kPa
 * Source: IEC 60534-2-1:2011, compressible fluids; methods.md §2.2
 */
export function gasBetween(C: number, upstream: number, drop: number, gas: Gas): number {
  if (!(drop > 0)) return 0;
  const choked = (gas.specificHeatRatio / 1.4) * gas.xT;
  const x = Math.min(drop / upstream, choked);
  const Y = 1 - x / (3 * choked);
  return N9 * C * upstream * Y * Math.sqrt(x / (gas.molarMass * gas.temperature));
}

/**
 * A liquid's history with gas in its place: the same plug between the same pressures passes what it would of the gas.
 *
 * @param history every scan kept, both pressures recorded; set point and process value go
 * @param density kg/m³ of the liquid that was simulated
 */
export function asGas(history: History, density: number, gas: Gas): History {
  const { flow, upstreamPressure, downstreamPressure } = history;
  if (!flow || !upstreamPressure || !downstreamPressure) return history;
  const gravity = density / waterDensity;
  const value = flow.value.map((q, i) => {
    const upstream = upstreamPressure.value[i] as number;
    const drop = upstream - (downstreamPressure.value[i] as number);
    const C = drop > 0 ? (10 * q * Math.sqrt(gravity)) / Math.sqrt(drop) : 0;
    return gasBetween(C, upstream, drop, gas);
  });
  const rest = { ...history };
  delete rest.setPoint;
  delete rest.processValue;
  return { ...rest, flow: { ...flow, value } };
}
