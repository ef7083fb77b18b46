import { type DataSheet } from '../data-sheet.js';
import { type Prepared } from '../preparation/prepared.js';

/** Where the sheet gives none: the common values of IEC 60534-2-1 examples for globe bodies, our choice. */
const usualRatioFactor = 0.7;
const usualHeatRatio = 1.4;

/**
 * ln of flow coefficient up to a constant, at a grid point: the response of a dead-band split, for which
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
): ((i: number) => number) | null {
  const { flow, upstreamPressure, downstreamPressure } = prepared;
  if (flow === null) return null;
  if (!pressures || upstreamPressure === null || downstreamPressure === null)
    return (i) => logAbove(flow[i] as number, flowLow);
  const gas = sheet.fluid?.phase === 'gas';
  const choked = ((sheet.fluid?.specificHeatRatio ?? usualHeatRatio) / 1.4) * (sheet.xT ?? usualRatioFactor);
  return (i) => {
    const before = upstreamPressure[i] as number;
    const drop = before - (downstreamPressure[i] as number);
    if (!(drop > 0)) return NaN;
    const lnFlow = logAbove(flow[i] as number, flowLow);
    if (!gas) return lnFlow - 0.5 * Math.log(drop);
    const x = Math.min(drop / before, choked);
    return lnFlow - Math.log(1 - x / (3 * choked)) - 0.5 * Math.log(x * before * before);
  };
}

function logAbove(flow: number, low: number): number {
  return flow > low ? Math.log(flow) : NaN;
}
