import { type DataSheet } from '../data-sheet.js';
import { type Prepared } from '../preparation/prepared.js';

/** Where the sheet gives none: the common values of IEC 60534-2-1 examples for globe bodies, our choice. */
const usualRatioFactor = 0.7;
const usualHeatRatio = 1.4;

/**
 * ln of flow coefficient up to a constant, at every grid point: the response of a dead-band split, for which
 * constant factors fall out. Without both pressures: ln of flow.
 *
 * Liquid: ln q − ½ ln ΔP. Gas: ln q − ½ ln(ΔP·P1) − ln Y, with Y and x held at choking (IEC 60534-2-1); changes of
 * density and temperature are slow against reversals and are left out.
 *
 * @param pressures whether both pressures are measured well enough to be used
 * @param flowLow smallest flow the meter is believed at, unit of the flow basis
 * @returns NaN where flow or drop is not positive; null without flow
 * Source: methods.md §6.3
 */
export function flowResponse(
  prepared: Prepared,
  pressures: boolean,
  sheet: DataSheet,
  flowLow: number,
): Float64Array | null {
  const { flow, upstreamPressure, downstreamPressure, count } = prepared;
  if (flow === null) return null;
  const y = new Float64Array(count);
  const gas = sheet.fluid?.phase === 'gas';
  const choked = ((sheet.fluid?.specificHeatRatio ?? usualHeatRatio) / 1.4) * (sheet.xT ?? usualRatioFactor);
  for (let i = 0; i < count; i++) {
    const q = flow[i] as number;
    if (!(q > flowLow)) {
      y[i] = NaN;
      continue;
    }
    if (!pressures || upstreamPressure === null || downstreamPressure === null) {
      y[i] = Math.log(q);
      continue;
    }
    const before = upstreamPressure[i] as number;
    const drop = before - (downstreamPressure[i] as number);
    if (!(drop > 0)) {
      y[i] = NaN;
      continue;
    }
    if (!gas) {
      y[i] = Math.log(q) - 0.5 * Math.log(drop);
      continue;
    }
    const x = Math.min(drop / before, choked);
    y[i] = Math.log(q / (1 - x / (3 * choked))) - 0.5 * Math.log(x * before * before);
  }
  return y;
}
