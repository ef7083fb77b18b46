import { type Passing } from '../assessment.js';
import { type DataSheet } from '../data-sheet.js';
import { flowCoefficient } from '../flow-coefficient/flow-coefficient.js';
import { type Limits } from '../limits.js';
import { type Prepared, valveState } from '../preparation/prepared.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { median } from '../statistics/quantile.js';

/** Points of a shut spell looked at: a median needs no more. */
const looks = 400;

/**
 * What flows through while the valve is shut, as a share of its rated coefficient.
 *
 * Only shut spells of `passingSeconds` count, without their first minutes, with the pressure drop at least a quarter
 * of its normal and the flow recorded. Flow at or below the meter's cut-off is unknown: it is taken as nothing
 * seen, and the smallest leak that would have been seen is said.
 *
 * @returns a refusal without pressures, rated coefficient or shut spells, or where the meter could not see a leak
 * of the raise threshold and none larger was seen
 * Source: methods.md §7.5
 */
export function passingOf(prepared: Prepared, sheet: DataSheet, limits: Limits): Passing | CannotJudge {
  const { flow, upstreamPressure, downstreamPressure } = prepared;
  if (flow === null) return cannotJudge('no-flow');
  if (upstreamPressure === null || downstreamPressure === null) return cannotJudge('no-pressures');
  const rated = sheet.ratedCoefficient;
  if (rated === null || !(rated > 0)) return cannotJudge('no-rated-coefficient');
  if (sheet.fluid === null) return cannotJudge('no-fluid-data');
  const signals = { ...prepared, flow, upstreamPressure, downstreamPressure };
  const spells = shutSpells(signals, limits).map((spell) => spellOf(signals, spell, sheet, limits));
  const seen = spells.filter((spell) => Number.isFinite(spell.cutOff));
  if (seen.length === 0) return cannotJudge('no-shut-spells');
  const rules = limits.drift;
  const leak = median(seen.map((spell) => spell.coefficient)) / rated;
  const cutOff = median(seen.map((spell) => spell.cutOff)) / rated;
  const raise = limits.findings.kinds['Passing when shut'].raise;
  const smallestVisible = Math.max(raise, rules.passingCutOffs * cutOff);
  if (smallestVisible > raise && leak < smallestVisible)
    return cannotJudge('meter-cut-off', { smallest: smallestVisible });
  const passing = seen.filter((spell) => spell.coefficient / rated >= smallestVisible);
  return {
    share: leak,
    coefficient: leak * rated,
    spells: passing.length,
    seconds: passing.reduce((sum, spell) => sum + spell.seconds, 0),
    smallestVisible,
  };
}

interface Signals extends Prepared {
  readonly flow: Float64Array;
  readonly upstreamPressure: Float64Array;
  readonly downstreamPressure: Float64Array;
}

interface Spell {
  readonly from: number;
  readonly to: number;
}

/** Spells shut throughout and long enough, less their first minutes, with supply pressure on. */
function shutSpells(signals: Signals, limits: Limits): Spell[] {
  const { state, step, count } = signals;
  const rules = limits.drift;
  const least = rules.passingDropShare * normalDrop(signals);
  const spells: Spell[] = [];
  for (let from = 0; from < count;) {
    if (((state[from] as number) & valveState.shut) === 0) {
      from++;
      continue;
    }
    let to = from + 1;
    while (to < count && ((state[to] as number) & valveState.shut) !== 0) to++;
    let settled = from;
    while (settled < to && ((state[settled] as number) & valveState.settling) !== 0) settled++;
    if ((to - from) * step >= rules.passingSeconds && dropOf(signals, settled, to) >= least)
      spells.push({ from: settled, to });
    from = to;
  }
  return spells;
}

/** Median drop in service, from points spread over the record; 0 where it never was. */
function normalDrop({ state, upstreamPressure, downstreamPressure, count }: Signals): number {
  const stride = Math.max(1, Math.floor(count / 20_000));
  const drops: number[] = [];
  for (let i = 0; i < count; i += stride)
    if (((state[i] as number) & valveState.inService) !== 0)
      drops.push((upstreamPressure[i] as number) - (downstreamPressure[i] as number));
  const drop = median(drops);
  return Number.isNaN(drop) ? 0 : drop;
}

function dropOf({ upstreamPressure, downstreamPressure }: Signals, from: number, to: number): number {
  const stride = Math.max(1, Math.floor((to - from) / looks));
  const drops: number[] = [];
  for (let i = from; i < to; i += stride)
    drops.push((upstreamPressure[i] as number) - (downstreamPressure[i] as number));
  return median(drops);
}

/** Median coefficient of a spell, and the coefficient the meter's cut-off would have shown. */
function spellOf(signals: Signals, { from, to }: Spell, sheet: DataSheet, limits: Limits) {
  const { flow, upstreamPressure, downstreamPressure, temperature, density, step } = signals;
  const cutOff = limits.preparation.meterCutOffShare * signals.flowSpan;
  const stride = Math.max(1, Math.floor((to - from) / looks));
  const leaks: number[] = [];
  const hidden: number[] = [];
  for (let i = from; i < to; i += stride) {
    const q = flow[i] as number;
    if (Number.isNaN(q)) continue;
    const at = {
      upstreamPressure: upstreamPressure[i] as number,
      downstreamPressure: downstreamPressure[i] as number,
      temperature: temperature === null ? null : (temperature[i] as number),
      density: density === null ? null : (density[i] as number),
    };
    const least = flowCoefficient({ ...at, flow: cutOff }, sheet).coefficient;
    if (!Number.isFinite(least)) continue;
    hidden.push(least);
    leaks.push(q > cutOff ? flowCoefficient({ ...at, flow: q }, sheet).coefficient : 0);
  }
  return { coefficient: median(leaks), cutOff: median(hidden), seconds: (to - from) * step };
}
