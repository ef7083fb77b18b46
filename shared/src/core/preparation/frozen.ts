import { quantile } from '../statistics/quantile.js';
import { type Grid } from './prepared.js';

/** A spell in which a column did not change, first and one past the last grid point. */
export interface Spell {
  readonly from: number;
  readonly to: number;
}

/** What a frozen signal is measured against (§1.3). */
export interface FrozenRules {
  readonly seconds: number;
  /** % travel the partner has to move, 5th to 95th percentile */
  readonly partnerMove: number;
}

/**
 * Spells in which a column is the same to the digit for at least `seconds`.
 *
 * @param ignoreUpTo values at or below this are not looked at: a flow under its meter's cut-off stands at zero rightly
 */
export function constantSpells(
  column: Float64Array,
  grid: Grid,
  seconds: number,
  ignoreUpTo = -Infinity,
): Spell[] {
  const least = Math.max(2, Math.ceil(seconds / grid.step) + 1);
  const spells: Spell[] = [];
  let from = 0;
  for (let i = 1; i <= column.length; i++) {
    if (i < column.length && column[i] === column[i - 1]) continue;
    if (i - from >= least && (column[from] as number) > ignoreUpTo) spells.push({ from, to: i });
    from = i;
  }
  return spells;
}

/** True where one of the partners moved by at least `move` % travel inside the spell. */
export function partnerMoved(
  partners: readonly (Float64Array | null)[],
  spell: Spell,
  move: number,
): boolean {
  return partners.some((partner) => {
    if (partner === null) return false;
    const stride = Math.max(1, Math.floor((spell.to - spell.from) / 1_000));
    const looked = new Float64Array(Math.ceil((spell.to - spell.from) / stride));
    // outside 0 to 100 % the stem does not follow, and standing still is right
    for (let k = 0; k < looked.length; k++)
      looked[k] = Math.min(100, Math.max(0, partner[spell.from + k * stride] as number));
    return quantile(looked, 0.95) - quantile(looked, 0.05) >= move;
  });
}

/**
 * Spells in which a signal stood still while its partner moved, told apart from a collection outage: more than
 * half of the valve's measured signals standing still together.
 *
 * A column that never changes in the whole record counts neither way.
 *
 * @param column the signal; `partners` are demand or position
 * @param others the valve's other measured columns
 * Source: methods.md §1.3
 */
export function frozenSpells(
  column: Float64Array,
  partners: readonly (Float64Array | null)[],
  others: readonly Float64Array[],
  grid: Grid,
  rules: FrozenRules & { readonly ignoreUpTo: number; readonly outageShare: number },
): { readonly frozen: Spell[]; readonly outage: Spell[] } {
  const frozen: Spell[] = [];
  const outage: Spell[] = [];
  for (const spell of constantSpells(column, grid, rules.seconds, rules.ignoreUpTo)) {
    if (!partnerMoved(partners, spell, rules.partnerMove)) continue;
    const living = others.filter((other) => changes(other, 0, other.length));
    const still = living.filter((other) => !changes(other, spell.from, spell.to)).length;
    const together = living.length >= 2 && (still + 1) / (living.length + 1) > rules.outageShare;
    (together ? outage : frozen).push(spell);
  }
  return { frozen, outage };
}

function changes(column: Float64Array, from: number, to: number): boolean {
  let first = NaN;
  for (let i = from; i < to; i++) {
    const v = column[i] as number;
    if (Number.isNaN(first)) first = v;
    else if (v !== first && !Number.isNaN(v)) return true;
  }
  return false;
}
