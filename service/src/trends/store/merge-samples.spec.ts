import { type Series } from '@tailrace/shared/core/series';
import fc from 'fast-check';
import { mergeSamples } from './merge-samples.js';

const aSeries = (samples: Map<number, number>): Series => {
  const rows = [...samples].sort(([a], [b]) => a - b);
  return {
    time: Float64Array.from(rows, ([t]) => t),
    value: Float64Array.from(rows, ([, v]) => v),
    good: new Uint8Array(rows.length).fill(1),
  };
};
const samples = fc
  .array(fc.tuple(fc.integer({ min: 0, max: 40 }), fc.integer()), { maxLength: 30 })
  .map((rows) => new Map(rows));

describe('merging two records of a tag', () => {
  it('keeps every time once, ascending, with the newer value where both have one', () => {
    fc.assert(
      fc.property(samples, samples, (older, newer) => {
        const merged = mergeSamples(aSeries(older), aSeries(newer));
        expect(merged).toEqual(aSeries(new Map([...older, ...newer])));
      }),
    );
  });

  it('changes nothing when the same record comes again', () => {
    fc.assert(
      fc.property(samples, (record) => {
        expect(mergeSamples(aSeries(record), aSeries(record))).toEqual(aSeries(record));
      }),
    );
  });
});
