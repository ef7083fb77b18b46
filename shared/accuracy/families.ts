import { type Family, type Figure } from './family.js';

const day = 86_400;

const capacity: Figure = {
  name: 'capacity ratio, %',
  error: (assessment, { loop, capacity: truth }) =>
    100 * ((assessment.deviation?.capacityRatio?.value ?? NaN) / (truth * specifiedRatio(loop)) - 1),
};
/** c of families whose sheet states another rated coefficient is held against that sheet. */
const specifiedRatio = (loop: { readonly valve: { readonly ratedCoefficient: number } }) =>
  loop.valve.ratedCoefficient > 0 ? 1 : NaN;

const p95: Figure = {
  name: '95th percentile of travel, %',
  error: (assessment, { travel }) => (assessment.range?.p95 ?? NaN) - travel.p95,
};
const deadBand = (truth: number): Figure => ({
  name: 'dead band, % travel',
  error: ({ movement }) =>
    movement && 'deadBand' in movement.demandToPosition ? movement.demandToPosition.deadBand - truth : NaN,
});
const play = (truth: number): Figure => ({
  name: 'play, % travel',
  error: ({ movement }) =>
    movement && 'deadBand' in movement.positionToFlow ? movement.positionToFlow.deadBand - truth : NaN,
});
const jump = (truth: number): Figure => ({
  name: 'jump, % travel',
  error: ({ movement }) => (movement && 'median' in movement.jumps ? movement.jumps.median - truth : NaN),
});
const period = (truth: number): Figure => ({
  name: 'period, %',
  error: ({ movement }) =>
    movement?.oscillation && 'period' in movement.oscillation
      ? 100 * (movement.oscillation.period / truth - 1)
      : NaN,
});
const passing = (truth: number): Figure => ({
  name: 'share that passes, % of itself',
  error: ({ passing: found }) => (found && 'share' in found ? 100 * (found.share / truth - 1) : NaN),
});

const linear = { kind: 'linear', parameter: null } as const;

/** Healthy valves under what plants do to them: nothing may be found but Uneven gain. */
export const healthy: readonly Family[] = [
  { name: 'equal percentage, steps', sought: [], loop: () => ({}), figure: capacity },
  {
    name: 'linear, steps',
    sought: [],
    loop: (l) => ({ valve: { ...l.valve, ...linear } }),
    figure: capacity,
  },
  {
    name: 'modified parabolic, steps',
    sought: [],
    loop: (l) => ({ valve: { ...l.valve, kind: 'modified parabolic', parameter: null } }),
    figure: capacity,
  },
  {
    name: 'quick opening, steps',
    sought: [],
    loop: (l) => ({
      valve: { ...l.valve, kind: 'quick opening', parameter: 2 },
      line: { ...l.line, lossShare: 0.15 },
    }),
    figure: capacity,
  },
  {
    name: 'cascade',
    sought: [],
    loop: () => ({ duty: { kind: 'cascade', low: 30, high: 75 } }),
    figure: p95,
  },
  {
    name: 'base load',
    sought: [],
    loop: () => ({ duty: { kind: 'base load', low: 30, high: 75 } }),
    figure: p95,
  },
  {
    name: 'diurnal',
    sought: [],
    loop: () => ({ duty: { kind: 'diurnal', low: 30, high: 75 } }),
    figure: p95,
  },
  {
    name: 'linear, cascade',
    sought: [],
    loop: (l) => ({ valve: { ...l.valve, ...linear }, duty: { kind: 'cascade', low: 30, high: 75 } }),
    figure: p95,
  },
  {
    name: 'scan 60 s',
    sought: [],
    loop: (l) => ({ historian: { ...l.historian, scan: 60 } }),
    figure: capacity,
  },
  {
    name: 'scan 120 s, 30 days',
    sought: [],
    loop: (l) => ({ days: 30, historian: { ...l.historian, scan: 120 } }),
  },
  {
    name: 'coarse archive',
    sought: [],
    loop: (l) => ({ historian: { ...l.historian, tolerance: 0.006 } }),
    figure: capacity,
  },
  { name: 'noisy meter', sought: [], loop: () => ({ meterNoise: 0.015 }), figure: capacity },
  {
    name: 'restless supply',
    sought: [],
    loop: (l) => ({ line: { ...l.line, disturbance: 0.1 } }),
    figure: capacity,
  },
  {
    name: 'one shutdown',
    sought: [],
    loop: () => ({ shutdowns: [{ from: 5 * day, to: 6.5 * day }] }),
    figure: capacity,
  },
  { name: 'three days', sought: [], loop: () => ({ days: 3 }), figure: capacity },
  {
    name: 'trim 4 % off its law',
    sought: [],
    loop: (l) => ({ valve: { ...l.valve, ripple: 0.04 } }),
    figure: capacity,
  },
  {
    name: 'no position',
    sought: [],
    loop: (l) => ({
      historian: { ...l.historian, roles: l.historian.roles.filter((role) => role !== 'position') },
    }),
  },
  {
    name: 'no pressures',
    sought: [],
    loop: (l) => ({ historian: { ...l.historian, roles: ['demand', 'position', 'flow', 'setPoint'] } }),
  },
];

/** Valves with one thing wrong. */
export const faulty: readonly Family[] = [
  {
    name: 'oversized 4–16 %',
    sought: ['Oversized'],
    loop: (l) => ({ valve: { ...l.valve, ...linear }, duty: { kind: 'steps', low: 4, high: 16 } }),
    figure: p95,
  },
  {
    name: 'undersized 75–99 %',
    sought: ['Undersized'],
    related: ['Pinned at limit'],
    loop: () => ({ duty: { kind: 'steps', low: 75, high: 99 } }),
    figure: p95,
  },
  {
    name: 'sheet equal percentage, is linear',
    sought: ['Off characteristic'],
    related: ['Gained capacity', 'Lost capacity', 'Travel offset'],
    loop: (l) => ({ valve: { ...l.valve, ...linear } }),
    sheet: () => ({ characteristic: 'equal percentage', rangeability: 50 }),
  },
  {
    name: 'sheet linear, is equal percentage',
    sought: ['Off characteristic'],
    related: ['Gained capacity', 'Lost capacity', 'Travel offset'],
    loop: () => ({}),
    sheet: () => ({ characteristic: 'linear', rangeability: 50 }),
  },
  {
    name: 'capacity 0.85',
    sought: ['Lost capacity'],
    loop: () => ({}),
    sheet: ({ valve }) => ({ ratedCoefficient: valve.ratedCoefficient / 0.85 }),
  },
  {
    name: 'capacity 1.15',
    sought: ['Gained capacity'],
    loop: () => ({}),
    sheet: ({ valve }) => ({ ratedCoefficient: valve.ratedCoefficient / 1.15 }),
  },
  {
    name: 'shift +6 %, linear 15–75',
    sought: ['Travel offset'],
    related: ['Gained capacity', 'Off characteristic'],
    loop: (l) => ({ valve: { ...l.valve, ...linear, shift: 6 }, duty: { kind: 'steps', low: 15, high: 75 } }),
  },
  ...[0.01, 0.03, 0.08].map((share): Family => ({
    name: `passing ${100 * share} %`,
    sought: ['Passing when shut'],
    related: ['Pinned at limit'],
    loop: (l) => ({
      valve: { ...l.valve, passing: share },
      shutdowns: [
        { from: 3 * day, to: 3.3 * day },
        { from: 9 * day, to: 9.4 * day },
      ],
    }),
    figure: passing(share),
  })),
  ...[
    [2, 1],
    [4, 2],
    [6, 4],
  ].map(([S = 0, J = 0]): Family => ({
    name: `stick S ${S} J ${J}`,
    sought: ['Sticking'],
    related: ['Hunting', 'Lost motion'],
    loop: (l) => ({ valve: { ...l.valve, stick: { S, J } }, duty: { kind: 'cascade', low: 30, high: 75 } }),
    figure: jump(J),
  })),
  ...[2, 4].map((S): Family => ({
    name: `dead band ${S}`,
    sought: ['Lost motion'],
    related: ['Hunting'],
    loop: (l) => ({
      valve: { ...l.valve, stick: { S, J: 0 } },
      duty: { kind: 'cascade', low: 30, high: 75 },
    }),
    figure: deadBand(S),
  })),
  ...[2, 4].map((size): Family => ({
    name: `play ${size}`,
    sought: ['Lost motion'],
    related: ['Hunting'],
    loop: (l) => ({ valve: { ...l.valve, play: size }, duty: { kind: 'cascade', low: 30, high: 75 } }),
    figure: play(size),
  })),
  ...[120, 600, 3_600, 4 * 3_600].map((seconds): Family => ({
    name: `swings every ${seconds} s`,
    sought: ['Hunting'],
    related: ['Excess movement'],
    loop: () => ({
      duty: { kind: 'base load', low: 40, high: 65 },
      swing: { period: seconds, amplitude: 0.06 },
    }),
    figure: period(seconds),
  })),
  {
    name: 'position reads 3 % more',
    sought: ['Position mismatch'],
    related: ['Lost capacity', 'Travel offset'],
    loop: (l) => ({ valve: { ...l.valve, positionError: 3 } }),
  },
  {
    name: 'flow frozen for a day',
    sought: ['Frozen signal'],
    loop: () => ({ frozen: [{ role: 'flow', from: 8 * day, to: 9 * day }] }),
  },
  {
    name: 'choked liquid',
    sought: ['Choked service'],
    loop: (l) => ({
      valve: { ...l.valve, FL: 0.7 },
      line: { ...l.line, dropShut: 900, destination: 180, vapourPressure: 143, lossShare: 0.3 },
    }),
  },
  {
    name: 'step −12 % on day 5',
    sought: ['Lost capacity'],
    loop: (l) => ({ valve: { ...l.valve, step: { at: 5 * day, factor: 0.88 } } }),
  },
];
