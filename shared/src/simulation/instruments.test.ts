import { describe, expect, test } from 'vitest';
import { aSeries } from '../core/sample-record.js';
import { readBy, usualInstruments, withBadValues } from './instruments.js';

const time = Array.from({ length: 2_000 }, (_, i) => 600 * i);
const history = {
  flow: aSeries(time, new Float64Array(2_000).fill(80)),
  setPoint: aSeries(time, new Float64Array(2_000).fill(80)),
  upstreamPressure: aSeries(time, new Float64Array(2_000).fill(900)),
  position: aSeries(time, new Float64Array(2_000).fill(50)),
};

describe('instruments that err', () => {
  test('read a flow by a fixed factor and a slow one, and a pressure by a fixed error', () => {
    const instruments = { flowFactor: 1.02, slowReading: 0.006, upstreamError: 1.5, downstreamError: 0 };
    const read = readBy(history, instruments, 3);
    const mean = (read.flow?.value.reduce((sum, v) => sum + v, 0) ?? 0) / 2_000;
    expect(mean / 80).toBeCloseTo(1.02, 2);
    const steps = read.flow?.value.slice(1).map((v, i) => Math.abs(v - (read.flow?.value[i] ?? NaN)));
    expect(Math.max(...(steps ?? []))).toBeLessThan(0.2);
    expect(read.upstreamPressure?.value[7]).toBe(901.5);
    expect(read.setPoint?.value).toEqual(read.flow?.value);
    expect(read.position?.value[7]).toBe(50);
  });

  test('are the same for the same seed and others for another', () => {
    expect(usualInstruments(1, 400)).toEqual(usualInstruments(1, 400));
    expect(usualInstruments(1, 400)).not.toEqual(usualInstruments(2, 400));
    expect(readBy(history, usualInstruments(1, 400), 1)).toEqual(
      readBy(history, usualInstruments(1, 400), 1),
    );
  });

  test('lose the asked share of values, without a number and without a voucher', () => {
    const { position } = withBadValues({ position: history.position }, 0.1, 5);
    const lost = position?.good.filter((good) => good === 0).length ?? 0;
    expect(lost).toBeGreaterThan(150);
    expect(lost).toBeLessThan(250);
    expect(position?.value.filter(Number.isNaN).length).toBe(lost);
  });
});
