import { type ServiceStress } from '../assessment.js';
import { type DataSheet } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { type Prepared } from '../preparation/prepared.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';
import { cannotJudge } from '../reasons.js';
import { median } from '../statistics/quantile.js';
import { type ChokingLimit, chokingLimit } from './choking-limit.js';
import { pressureRecord, type PressureRecord } from './pressure-record.js';

const secondsPerHour = 3_600;
/** Travel below which flow cuts the seat, % (methods.md §8). */
const lowTravel = { globe: 5, rotary: 10 };

/**
 * How hard the service is on the valve: time choked and near it, flashing, hours by xF (liquid) or x (gas), cavitation
 * index, hours at low travel under more than half of the shut drop.
 *
 * By time in service where both pressures are measured, by steady windows where they are modelled. A share of choked
 * time is given only with the sheet's own FL or xT (and vapour pressure); within a tenth of the limit it is "near", for
 * both factors change with travel. No verdict on cavitation: that takes the maker's own index.
 *
 * @returns reason set, and null figures, for whatever the record or the sheet does not let be said; never a throw
 * Source: methods.md §8 (ISA-RP75.23 for σ)
 */
export function serviceStress(
  prepared: Prepared,
  windows: SteadyWindows,
  sheet: DataSheet,
  limits: Limits,
): ServiceStress {
  const nothing = {
    chokedShare: null,
    nearChokedShare: null,
    flashingHours: null,
    bands: [],
    medianCavitationIndex: null,
    lowTravelHours: null,
  };
  const record = pressureRecord(prepared, windows);
  if (record === null) return { ...nothing, reason: cannotJudge('no-pressures') };
  const lowTravelHours = hoursAtLowTravel(record, windows, sheet);
  const middle = median(windows.coefficient);
  const limit = chokingLimit(sheet, Number.isFinite(middle) ? middle : null);
  if ('reason' in limit) {
    const { bands, medianCavitationIndex, flashingHours } = withoutLimit(record, sheet);
    return { ...nothing, bands, medianCavitationIndex, flashingHours, lowTravelHours, reason: limit };
  }
  let choked = 0;
  let near = 0;
  for (let i = 0; i < record.count; i++) {
    const share = (record.drop[i] as number) / limit.chokedDropAt(record.upstreamPressure[i] as number);
    if (share >= limits.stress.chokedShare) choked++;
    if (Math.abs(share - 1) <= limits.stress.nearChoked) near++;
  }
  return {
    chokedShare: choked / record.count,
    nearChokedShare: near / record.count,
    ...liquidFigures(record, limit.vapourPressure),
    bands: hoursByRatio(record, limit.ratioAt, limit.ratio),
    lowTravelHours,
    reason: null,
  };
}

/** Bands and cavitation index need only the vapour pressure, not the recovery factor. */
function withoutLimit(record: PressureRecord, { fluid }: DataSheet) {
  const Pv = fluid?.phase === 'liquid' ? fluid.vapourPressure : null;
  if (Pv === null) return { bands: [], medianCavitationIndex: null, flashingHours: null };
  return {
    bands: hoursByRatio(record, (P1, drop) => drop / (P1 - Pv), null),
    ...liquidFigures(record, Pv),
  };
}

function liquidFigures(record: PressureRecord, Pv: number | null) {
  if (Pv === null) return { flashingHours: null, medianCavitationIndex: null };
  let flashing = 0;
  const index = new Float64Array(record.count);
  for (let i = 0; i < record.count; i++) {
    const P1 = record.upstreamPressure[i] as number;
    const drop = record.drop[i] as number;
    if (P1 - drop < Pv) flashing++;
    index[i] = (P1 - Pv) / drop;
  }
  return {
    flashingHours: (flashing * record.seconds) / secondsPerHour,
    medianCavitationIndex: median(index),
  };
}

/** Hours below 0.5, 0.5 to 0.7, 0.7 to the limit, and beyond it; edges beyond the limit are left out. */
function hoursByRatio(
  record: PressureRecord,
  ratioAt: ChokingLimit['ratioAt'],
  limit: number | null,
): ServiceStress['bands'] {
  const edges = [0, 0.5, 0.7].filter((edge) => limit === null || edge < limit);
  if (limit !== null) edges.push(limit);
  const counts = edges.map(() => 0);
  let highest = 1;
  for (let i = 0; i < record.count; i++) {
    const ratio = ratioAt(record.upstreamPressure[i] as number, record.drop[i] as number);
    // a liquid at or below its vapour pressure before the valve: beyond every edge
    const band = ratio >= 0 ? edges.findLastIndex((edge) => ratio >= edge) : edges.length - 1;
    counts[band] = (counts[band] as number) + 1;
    if (ratio > highest && Number.isFinite(ratio)) highest = ratio;
  }
  return edges.map((from, band) => ({
    from,
    to: edges[band + 1] ?? highest,
    hours: ((counts[band] as number) * record.seconds) / secondsPerHour,
  }));
}

function hoursAtLowTravel(record: PressureRecord, { line }: SteadyWindows, { style }: DataSheet): number {
  const below = style === 'globe' ? lowTravel.globe : lowTravel.rotary;
  // without a line model the largest drop seen stands for the drop at shut
  let shutDrop = line?.a ?? 0;
  if (line === null) for (const drop of record.drop) if (drop > shutDrop) shutDrop = drop;
  let low = 0;
  for (let i = 0; i < record.count; i++)
    if ((record.travel[i] as number) < below && (record.drop[i] as number) > 0.5 * shutDrop) low++;
  return (low * record.seconds) / secondsPerHour;
}
