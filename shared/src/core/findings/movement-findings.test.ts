import { describe, expect, it } from 'vitest';
import { assess } from '../assess.js';
import { type Assessment } from '../assessment.js';
import { historyOf, loopSample, type LoopSample } from '../movement/loop-sample.js';
import { type Prepared } from '../preparation/prepared.js';
import { aSheet } from '../sample-record.js';
import { type FindingKind } from './kinds.js';

/** The kinds of chapters 6 and 7.5; the rest is judged elsewhere. */
const kinds: readonly FindingKind[] = [
  'Sticking',
  'Lost motion',
  'Hunting',
  'Excess movement',
  'Position mismatch',
  'Passing when shut',
];

function assessed(prepared: Prepared): Assessment {
  const sheet = aSheet({ rangeability: 30, ratedCoefficient: 100, flowSpan: 100 });
  const span = { from: prepared.start, to: prepared.start + prepared.count * prepared.step };
  return assess({ tag: 'FV-101', dataSheet: sheet }, historyOf(prepared), span);
}
const raised = (a: Assessment) =>
  a.findings.filter((f) => kinds.includes(f.kind)).map((f) => (f.explainedBy ? `(${f.kind})` : f.kind));
const looped = (sample: LoopSample) => assessed(loopSample(sample));

describe('findings on how a valve moves, through the whole assessment', () => {
  it.each([
    [[], { days: 10 }],
    [[], { days: 10, withPosition: false, seed: 2 }],
    [[], { days: 10, scan: 60, disturbance: 0.1, seed: 3 }],
    [['Lost motion'], { days: 10, fS: 1, fD: 1 }],
    [['Lost motion'], { days: 10, fS: 2, fD: 2, withPosition: false }],
    [['Lost motion'], { days: 10, play: 2 }],
    [['Sticking'], { days: 10, fS: 1.5, fD: 0.5 }],
    [['Sticking', '(Hunting)'], { days: 10, fS: 5, fD: 1 }],
    [['Lost motion', 'Hunting'], { days: 10, fS: 3, fD: 1, scan: 60 }],
    [['Hunting'], { days: 10, swing: 2.5, swingPeriod: 1_200 }],
    [['Position mismatch'], { days: 10, offset: -3 }],
    [[], { days: 10, offset: -1.5 }],
  ] satisfies [string[], LoopSample][])('%j are raised, and no other, for %o', (expected, sample) => {
    expect(raised(looped(sample))).toEqual(expected);
  });

  it('says which link loses the motion', () => {
    const rule = (sample: LoopSample) => looped(sample).findings.find((f) => f.kind === 'Lost motion')?.rule;
    expect(rule({ days: 10, fS: 1, fD: 1 })).toBe('demand to position');
    expect(rule({ days: 10, play: 2 })).toBe('position to flow');
    expect(rule({ days: 10, fS: 2, fD: 2, withPosition: false })).toBe('demand to flow');
  });

  it('says that sticking is not excluded where the scan is too slow for jumps', () => {
    const slow = looped({ days: 10, fS: 1, fD: 1, scan: 60 });
    expect(slow.findings.find((f) => f.kind === 'Lost motion')?.evidence.stickingExcluded).toBe(0);
    expect(slow.notJudged).toContainEqual(
      expect.objectContaining({ kind: 'Sticking', reason: 'sampled-too-slowly' }),
    );
  });

  it('raises excess movement for more than 5 000 % of travel a day, explained where it hunts', () => {
    const loop = loopSample({ days: 10 });
    const position = (loop.position as Float64Array).map((x, i) => x + 4 * Math.sin(i));
    const found = assessed({ ...loop, position, travel: position, demand: position }).findings;
    const excess = found.find((f) => f.kind === 'Excess movement');
    expect(excess?.severity).toBeGreaterThan(0.2);
    const hunts = found.some((f) => f.kind === 'Hunting');
    expect(excess?.explainedBy).toBe(hunts ? 'Hunting' : null);
  });

  it('raises passing when shut from two shut spells with flow', () => {
    const loop = loopSample({ days: 10 });
    const columns = {
      demand: (loop.demand as Float64Array).slice(),
      position: (loop.position as Float64Array).slice(),
      flow: (loop.flow as Float64Array).slice(),
    };
    for (const from of [20_000, 50_000]) {
      columns.demand.fill(0, from, from + 1_000);
      columns.position.fill(0, from, from + 1_000);
      for (let i = from; i < from + 1_000; i++) columns.flow[i] = 4 + 0.05 * Math.sin(i);
    }
    const passing = assessed({ ...loop, ...columns, travel: columns.position }).findings.find(
      (f) => f.kind === 'Passing when shut',
    );
    // 4 m³/h at about 100 kPa is Kv 4 of 100
    expect(passing?.x).toBeCloseTo(0.04, 2);
    expect(passing?.evidence.spells).toBe(2);
  });
});
