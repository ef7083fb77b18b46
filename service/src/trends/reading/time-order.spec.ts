import fc from 'fast-check';
import { DateTime } from 'luxon';
import { stampReader } from './stamp.js';
import { TimeOrder } from './time-order.js';

const zone = 'Europe/Vienna';
const read = stampReader({ format: 'iso', zone });
/** Local times as a historian writes them, read back in their order. */
const readBack = (seconds: readonly number[]): number[] => {
  const order = new TimeOrder();
  return seconds.map((s) => {
    const stamp = read(DateTime.fromSeconds(s, { zone }).toFormat('yyyy-MM-dd HH:mm:ss'));
    if (stamp.kind !== 'time') throw new Error(stamp.kind);
    return order.place(stamp);
  });
};
/** Steps of under half an hour, from before the clock change of 2026-10-25 to after it. */
const start = Date.parse('2026-10-24T23:00:00Z') / 1000;
const rows = fc
  .array(fc.integer({ min: 1, max: 1_500 }), { minLength: 20, maxLength: 60 })
  .map((steps) => steps.reduce((all, step) => [...all, (all.at(-1) ?? start) + step], [start]));

describe('the order of local times', () => {
  it('tells the two passes of the repeated hour apart, oldest first', () => {
    fc.assert(fc.property(rows, (seconds) => expect(readBack(seconds)).toEqual(seconds)));
  });

  it('tells them apart newest first', () => {
    const end = Date.parse('2026-10-25T03:00:00Z') / 1000;
    fc.assert(
      fc.property(rows, (seconds) => {
        const newestFirst = [end, ...seconds.filter((s) => s < end).reverse()];
        expect(readBack(newestFirst)).toEqual(newestFirst);
      }),
    );
  });
});
