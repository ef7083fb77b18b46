import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { defaultLimits } from '../limits.js';
import { type Prepared } from '../preparation/prepared.js';
import { passingOf } from '../drift/passing.js';
import { aSheet } from '../sample-record.js';
import { loopSample, noWindows } from './loop-sample.js';
import { movementOf } from './movement.js';

const value = fc.oneof(
  { weight: 6, arbitrary: fc.double({ min: -5, max: 105, noNaN: true }) },
  fc.constantFrom(NaN, 0, 50, 100, -1e9, 1e300, 1e-300),
);
const columnOf = (count: number) =>
  fc.oneof(
    fc.constant(null),
    value.map((v) => new Float64Array(count).fill(v)),
    fc.array(value, { minLength: count, maxLength: count }).map((v) => Float64Array.from(v)),
  );

const records = fc
  .record({
    count: fc.integer({ min: 1, max: 400 }),
    step: fc.constantFrom(0.1, 1, 10, 60, 3_600, 86_400),
    seed: fc.integer(),
  })
  .chain(({ count, step }) =>
    fc.record({
      count: fc.constant(count),
      step: fc.constant(step),
      demand: columnOf(count),
      position: columnOf(count),
      flow: columnOf(count),
      upstreamPressure: columnOf(count),
      downstreamPressure: columnOf(count),
      setPoint: columnOf(count),
      state: fc.uint8Array({ minLength: count, maxLength: count }),
    }),
  );

describe('any record at all', () => {
  it('is judged or refused, and never thrown out', () => {
    const base = loopSample({ days: 0.001 });
    fc.assert(
      fc.property(records, (record) => {
        const travel = record.position ?? record.demand ?? new Float64Array(record.count).fill(NaN);
        const prepared: Prepared = {
          ...base,
          ...record,
          state: Uint8Array.from(record.state),
          travel,
          processValue: record.flow,
          spacing: { travel: record.step, flow: record.step, demand: record.step },
        };
        const movement = movementOf(prepared, noWindows('measured'), aSheet(), defaultLimits);
        expect(Number.isNaN(movement.reversalsPerDay)).toBe(false);
        expect(passingOf(prepared, aSheet(), defaultLimits)).toBeDefined();
      }),
      { numRuns: 300, seed: 42 },
    );
  });
});
