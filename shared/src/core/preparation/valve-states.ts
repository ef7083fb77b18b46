import { constantSpells } from './frozen.js';
import { type Grid, valveState } from './prepared.js';

/** Columns the state of the valve is read from. */
export interface StateColumns {
  readonly travel: Float64Array;
  readonly demand: Float64Array | null;
  readonly flow: Float64Array | null;
  readonly mode: Float64Array | null;
  readonly processValue: Float64Array | null;
}

/** Thresholds of §1.5, times in s, travel in %, flow in the unit of the column. */
export interface StateRules {
  readonly inServiceTravel: number;
  readonly shutDemand: number;
  readonly shutTravel: number;
  readonly manualSeconds: number;
  readonly startSkipSeconds: number;
  readonly shutSkipSeconds: number;
  readonly meterCutOff: number;
}

/**
 * State of the valve at each grid point: in service, shut, manual, settling.
 *
 * A start is a return to service after at least `shutSkipSeconds` out of it; the record's own beginning is not.
 * Where the mode is not recorded, a demand held to the digit for `manualSeconds` while the process value moves
 * is taken as manual, except at the ends, where a controller that cannot do more stands still as well.
 *
 * @returns bits of valveState; frozen and outage are added by the caller
 * Source: methods.md §1.5
 */
export function valveStates(columns: StateColumns, grid: Grid, rules: StateRules): Uint8Array {
  const { travel, flow, mode } = columns;
  const demand = columns.demand ?? travel;
  const state = new Uint8Array(grid.count);
  const startSkip = Math.ceil(rules.startSkipSeconds / grid.step);
  const shutSkip = Math.ceil(rules.shutSkipSeconds / grid.step);
  let started = startSkip;
  let out = 0;
  let shutFor = 0;
  for (let i = 0; i < grid.count; i++) {
    const x = travel[i] as number;
    if (Number.isNaN(x)) continue;
    const known = demand[i] as number;
    const u = Number.isNaN(known) ? x : known;
    const q = flow === null ? NaN : (flow[i] as number);
    let bits = 0;
    if (u > rules.inServiceTravel && x > rules.inServiceTravel && !(q <= rules.meterCutOff)) {
      if (out >= shutSkip && out > 0) started = 0;
      out = 0;
      shutFor = 0;
      bits = valveState.inService;
      if (started < startSkip) bits |= valveState.settling;
      started++;
    } else {
      out++;
      if (u <= rules.shutDemand && x < rules.shutTravel) {
        bits = valveState.shut;
        if (shutFor < shutSkip) bits |= valveState.settling;
        shutFor++;
      } else shutFor = 0;
    }
    if (mode !== null && mode[i] === 0) bits |= valveState.manual;
    state[i] = bits;
  }
  if (mode === null) markHeldByHand(state, columns, grid, rules);
  return state;
}

function markHeldByHand(state: Uint8Array, columns: StateColumns, grid: Grid, rules: StateRules): void {
  const { demand, processValue } = columns;
  if (demand === null || processValue === null) return;
  let span = 0;
  for (const v of processValue) if (Math.abs(v) > span) span = Math.abs(v);
  for (const spell of constantSpells(demand, grid, rules.manualSeconds)) {
    const held = demand[spell.from] as number;
    if (held <= 1 || held >= 99) continue;
    let low = Infinity;
    let high = -Infinity;
    for (let i = spell.from; i < spell.to; i++) {
      const v = processValue[i] as number;
      if (v < low) low = v;
      if (v > high) high = v;
    }
    if (high - low <= 0.01 * span) continue;
    for (let i = spell.from; i < spell.to; i++) state[i] = (state[i] as number) | valveState.manual;
  }
}
