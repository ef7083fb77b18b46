import { healthy } from './families/healthy.js';
import { families } from './families.js';
import { rms, share } from './table.js';
import { type ValveResult } from './valve-result.js';

/** One promise of methods.md §12.4 or of the accuracy asked of the core, and the share or figure it is held to. */
export interface Bar {
  readonly promise: string;
  /** which valves it is about */
  readonly about: (result: ValveResult) => boolean;
  readonly measure: (results: readonly ValveResult[]) => number;
  readonly need: { readonly atLeast: number } | { readonly atMost: number };
}

const healthyNames = new Set(healthy.map(({ name }) => name));
const soughtBy = new Map(families.map(({ name, sought }) => [name, sought]));
const isHealthy = ({ family }: ValveResult) => healthyNames.has(family);
const isFaulty = ({ family }: ValveResult) => (soughtBy.get(family)?.length ?? 0) > 0;
const named =
  (...starts: readonly string[]) =>
  ({ family }: ValveResult) =>
    starts.some((start) => family.startsWith(start));

const shareOf = (holds: (result: ValveResult) => boolean) => (results: readonly ValveResult[]) =>
  share(results, holds);
const foundShare = shareOf(({ found }) => found);
const within = (limit: number) => shareOf(({ figure }) => Math.abs(figure) <= limit);

function found(promise: string, atLeast: number, ...starts: readonly string[]): Bar {
  return { promise, about: named(...starts), measure: foundShare, need: { atLeast } };
}

function near(promise: string, limit: number, atLeast: number, ...starts: readonly string[]): Bar {
  return { promise, about: named(...starts), measure: within(limit), need: { atLeast } };
}

const ofKind = named('kind of');
const withCapacity = (result: ValveResult) =>
  (isHealthy(result) || ofKind(result)) && Number.isFinite(result.capacity);
const spanning = (from: number, to: number) => (result: ValveResult) =>
  ofKind(result) && result.span >= from && result.span < to;
const withRangeability = (from: number) => (result: ValveResult) =>
  (isHealthy(result) || ofKind(result)) && result.span >= from && Number.isFinite(result.rangeability);

export const bars: readonly Bar[] = [
  {
    promise: 'healthy valves with any finding, Uneven gain apart',
    about: (result) => !isFaulty(result),
    measure: shareOf(({ unrelated }) => unrelated.length > 0),
    need: { atMost: 0 },
  },
  {
    promise: 'faulty valves with an unrelated finding',
    about: isFaulty,
    measure: shareOf(({ unrelated }) => unrelated.length > 0),
    need: { atMost: 0.01 },
  },
  {
    promise: 'capacity ratio within 3 %',
    about: withCapacity,
    measure: shareOf(({ capacity }) => Math.abs(capacity) <= 3),
    need: { atLeast: 0.8 },
  },
  {
    promise: 'capacity ratio within 5 %',
    about: withCapacity,
    measure: shareOf(({ capacity }) => Math.abs(capacity) <= 5),
    need: { atLeast: 0.95 },
  },
  {
    promise: 'absolute interval of the capacity ratio holds the truth',
    about: withCapacity,
    measure: shareOf(({ covered }) => covered),
    need: { atLeast: 0.9 },
  },
  {
    promise: 'kind right, span from 40 %',
    about: spanning(40, 100),
    measure: shareOf(({ kind }) => kind === 'right'),
    need: { atLeast: 0.95 },
  },
  {
    promise: 'kind right, duty over 30 % and more',
    about: ({ family }) => /kind of .* span (30|40|55) %/.test(family),
    measure: shareOf(({ kind }) => kind === 'right'),
    need: { atLeast: 0.97 },
  },
  {
    promise: 'kind wrong, anywhere',
    about: () => true,
    measure: shareOf(({ kind }) => kind === 'wrong'),
    need: { atMost: 0.01 },
  },
  {
    promise: 'kind named below a span of 18 %',
    about: (result) => result.span < 18,
    measure: shareOf(({ kind }) => kind !== 'cannot tell'),
    need: { atMost: 0 },
  },
  {
    promise: 'rangeability within 20 %, span from 40 %',
    about: withRangeability(40),
    measure: shareOf(({ rangeability }) => Math.abs(rangeability) <= 20),
    need: { atLeast: 0.9 },
  },
  {
    promise: 'percentiles of travel within 1 % travel',
    about: (result) => isHealthy(result) && Number.isFinite(result.travel),
    measure: shareOf(({ travel }) => travel <= 1),
    need: { atLeast: 1 },
  },
  found('Oversized', 0.98, 'oversized'),
  found('Undersized', 0.98, 'undersized'),
  found('Off characteristic', 0.98, 'sheet '),
  found('Lost or gained capacity of 15 %', 0.98, 'capacity '),
  found('drift of 10 % in twelve months', 0.9, 'wear +10', 'fouling -10'),
  found('drift of 4 % in twelve months', 0.9, 'wear +4', 'fouling -4'),
  found('step of 6 % in twelve months', 0.8, 'step -6'),
  {
    promise: 'change of capacity between months of one valve, rms %',
    about: named('twelve months'),
    measure: (results) => rms(results.map(({ figure }) => figure)),
    need: { atMost: 1 },
  },
  near('travel shift of 6 % within 2 % travel', 2, 0.9, 'shift '),
  found('Passing when shut from twice the cut-off', 0.98, 'passing 3', 'passing 8'),
  near('share that passes within 15 %', 15, 0.98, 'passing 3', 'passing 8'),
  found(
    'Sticking, scan 10 s with position',
    0.95,
    ...['stick S2 J1', 'stick S4 J2, its', 'stick S4 J2 linear', 'stick S4 J2 base', 'stick S6'],
  ),
  near(
    'jump within 0.3 % travel',
    0.3,
    0.95,
    'stick S2 J1',
    'stick S6 J4',
    'stick S4 J2 linear',
    'stick S4 J2 base',
  ),
  near('stick band within 25 %', 25, 0.95, 'stick S4 J2, its'),
  found('Lost motion or Sticking, scan 60 s or without position', 0.95, 'stick S4 J2 scan', 'stick S4 J2 no'),
  found('dead band of 2 to 4 %', 0.98, 'dead band'),
  near('dead band within 0.5 % travel (2 %) ', 0.5, 0.98, 'dead band 2'),
  near('dead band within 0.8 % travel (4 %)', 0.8, 0.98, 'dead band 4'),
  found('play of 2 to 4 %', 0.98, 'play 2', 'play 3', 'play 4'),
  near('play within 0.6 % travel', 0.6, 0.98, 'play '),
  found('oscillation from 6 scans to 4 h', 0.95, 'swings'),
  near('its period within 5 %', 5, 0.95, 'swings'),
  found('Position mismatch of 3 %', 0.98, 'position reads'),
  near('mismatch within 0.3 % travel', 0.3, 0.98, 'position reads'),
  found('frozen for a day', 0.98, 'flow frozen', 'position frozen'),
  found('Excess movement, period below 4 scans', 0.95, 'controller too fast'),
  found('Choked service', 0.98, 'choked'),
];

/** A bar's line: what was measured, what is asked, and whether it holds. */
export function barRow(bar: Bar, all: readonly ValveResult[]): { text: string; holds: boolean } | null {
  const results = all.filter(bar.about);
  if (results.length === 0) return null;
  const measured = bar.measure(results);
  const holds = 'atLeast' in bar.need ? measured >= bar.need.atLeast : measured <= bar.need.atMost;
  const need = 'atLeast' in bar.need ? `≥ ${bar.need.atLeast}` : `≤ ${bar.need.atMost}`;
  return {
    holds,
    text: `| ${bar.promise.trim()} | ${results.length} | ${need} | ${measured.toFixed(3)} | ${holds ? 'holds' : '**missed**'} |`,
  };
}
