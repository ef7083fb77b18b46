import { type EndReadings } from '../assessment.js';
import { type Limits } from '../limits.js';
import { type Prepared } from '../preparation/prepared.js';
import { median } from '../statistics/quantile.js';

/** Demand from which a valve is told to be wide open for this purpose, %. */
const openDemand = 99.5;

/**
 * What the position reported while the demand stood at an end for ten minutes or more: at shut with no flow, and
 * wide open. The only evidence of a travel offset in an equal-percentage valve.
 *
 * @returns null for an end without such a spell, and for both where position or demand is not recorded
 * Source: methods.md §4.4
 */
export function endReadings(prepared: Prepared, limits: Limits): EndReadings {
  const { position, demand, flow } = prepared;
  if (position === null || demand === null) return { shut: null, open: null };
  const cutOff = limits.preparation.meterCutOffShare * prepared.flowSpan;
  const shutDemand = limits.preparation.shutDemand;
  return {
    shut: readings(prepared, position, limits, (i) => {
      const q = flow === null ? 0 : (flow[i] as number);
      return (demand[i] as number) <= shutDemand && q <= cutOff;
    }),
    open: readings(prepared, position, limits, (i) => (demand[i] as number) >= openDemand),
  };
}

function readings(
  prepared: Prepared,
  position: Float64Array,
  limits: Limits,
  atEnd: (i: number) => boolean,
): EndReadings['shut'] {
  const least = Math.ceil(limits.comparison.shutReadingSeconds / prepared.step);
  const travels: number[] = [];
  let from = -1;
  for (let i = 0; i <= prepared.count; i++) {
    const here = i < prepared.count && atEnd(i);
    if (here && from < 0) from = i;
    if (here || from < 0) continue;
    // the first half of a spell may still be the stroke itself
    if (i - from >= least) travels.push(median(position.subarray((from + i) >> 1, i)));
    from = -1;
  }
  const travel = median(travels);
  return Number.isFinite(travel) ? { travel, spells: travels.length } : null;
}
