import { type Prepared, valveState } from '../preparation/prepared.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';

/** Travel and pressures while the valve was in service, each entry standing for the same time. */
export interface PressureRecord {
  readonly count: number;
  /** s one entry stands for */
  readonly seconds: number;
  /** kPa(a) */
  readonly upstreamPressure: Float64Array;
  /** kPa, above 0 */
  readonly drop: Float64Array;
  /** % */
  readonly travel: Float64Array;
}

/**
 * The pressures a valve stood in: every grid point in service where both are measured, else the steady windows with a
 * modelled drop.
 *
 * @returns null where neither is known
 */
export function pressureRecord(prepared: Prepared, windows: SteadyWindows): PressureRecord | null {
  const { upstreamPressure, downstreamPressure } = prepared;
  const record =
    upstreamPressure !== null && downstreamPressure !== null
      ? fromGrid(prepared, upstreamPressure, downstreamPressure)
      : fromWindows(windows);
  return record.count > 0 ? record : null;
}

function fromGrid(prepared: Prepared, up: Float64Array, down: Float64Array): PressureRecord {
  const { state, travel, count, step } = prepared;
  const left = valveState.frozen | valveState.outage | valveState.inService;
  const upstreamPressure = new Float64Array(count);
  const drop = new Float64Array(count);
  const at = new Float64Array(count);
  let n = 0;
  for (let i = 0; i < count; i++) {
    const difference = (up[i] as number) - (down[i] as number);
    if (((state[i] as number) & left) !== valveState.inService || !(difference > 0)) continue;
    upstreamPressure[n] = up[i] as number;
    drop[n] = difference;
    at[n] = travel[i] as number;
    n++;
  }
  return {
    count: n,
    seconds: step,
    upstreamPressure: upstreamPressure.subarray(0, n),
    drop: drop.subarray(0, n),
    travel: at.subarray(0, n),
  };
}

function fromWindows(windows: SteadyWindows): PressureRecord {
  const known = Array.from({ length: windows.count }, (_, w) => w).filter(
    (w) => (windows.pressureDrop[w] as number) > 0 && (windows.upstreamPressure[w] as number) > 0,
  );
  return {
    count: known.length,
    seconds: windows.seconds,
    upstreamPressure: Float64Array.from(known, (w) => windows.upstreamPressure[w] as number),
    drop: Float64Array.from(known, (w) => windows.pressureDrop[w] as number),
    travel: Float64Array.from(known, (w) => 100 * (windows.h[w] as number)),
  };
}
