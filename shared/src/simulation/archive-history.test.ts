import { describe, expect, test } from 'vitest';
import { aSeries } from '../core/sample-record.js';
import { archiveHistory, spreadOverMonths } from './archive-history.js';

const day = 86_400;
const scan = 600;
const count = (4 * day) / scan;
const time = Array.from({ length: count }, (_, i) => i * scan);
const record = { flow: aSeries(time, new Float64Array(count).fill(30)) };
const keeping = { scan, tolerance: 0.01, longest: 7_200, span: () => 100 };

describe('a record laid out over months', () => {
  test('keeps its days together and puts a month between their starts', () => {
    const { flow } = spreadOverMonths(record, 0, 2);
    const second = (2 * day) / scan;
    expect(flow?.time[second - 1]).toBe(2 * day - scan);
    expect(flow?.time[second]).toBe(30.4375 * day);
  });

  test('is archived with a bad value where the collection stopped, and nothing across the hole', () => {
    const { flow } = archiveHistory(spreadOverMonths(record, 0, 2), keeping);
    const bad = flow?.good.indexOf(0) ?? -1;
    expect(flow?.time[bad]).toBe(2 * day);
    expect(flow?.time[bad + 1]).toBe(30.4375 * day);
    expect(flow?.good.filter((good) => good === 0).length).toBe(1);
  });

  test('stores a constant no oftener than the longest time asks', () => {
    const { flow } = archiveHistory(record, keeping);
    const gaps = flow?.time.slice(1, -1).map((t, i) => t - (flow.time[i] ?? NaN));
    expect(new Set(gaps)).toEqual(new Set([7_200]));
  });
});
