import { describe, expect, it } from 'vitest';
import { defaultLimits } from '../limits.js';
import { type DataSheet } from '../data-sheet.js';
import { waterDensity } from './constants.js';
import { flowThrough, lineModel, type LineModel, neighbouringModels, pressureDropAt } from './line-model.js';

function sheetWith(
  ...cases: readonly (readonly [flow: number, P1: number | null, P2: number | null])[]
): DataSheet {
  return {
    characteristic: null,
    ratedCoefficient: null,
    rangeability: null,
    table: null,
    style: 'globe',
    fluid: null,
    FL: null,
    xT: null,
    Fd: null,
    valveSize: null,
    pipeSize: null,
    trip: false,
    criticality: 'normal',
    designBand: null,
    flowBasis: 'volume',
    flowSpan: null,
    designCases: cases.map(([flow, upstreamPressure, downstreamPressure], i) => ({
      name: `case ${i}`,
      flow,
      upstreamPressure,
      downstreamPressure,
    })),
  };
}

describe('the line model', () => {
  const model = lineModel(sheetWith([60, 760, 600], [20, 900, 500])) as LineModel;

  it('has a 4.3 bar and b 0.00075 bar/(m³/h)² for the check values of methods.md §12.5', () => {
    expect(model.a).toBeCloseTo(430, 10);
    expect(model.b).toBeCloseTo(0.075, 12);
  });

  it('passes 48.06712 m³/h through Kv 30 with slope 0.9565595 (methods.md §12.5)', () => {
    const { flow, slope } = flowThrough(model, 30, 0.1);
    expect(flow).toBeCloseTo(48.06712, 5);
    expect(pressureDropAt(model, flow)).toBeCloseTo(256.7164, 4);
    expect(slope).toBeCloseTo(0.9565595, 7);
  });

  it('answers only from half the lowest to 1.2 times the highest design flow', () => {
    expect(pressureDropAt(model, 9.9)).toBeNaN();
    expect(pressureDropAt(model, 10)).toBeCloseTo(422.5, 9);
    expect(pressureDropAt(model, 72)).toBeCloseTo(41.2, 9);
    expect(pressureDropAt(model, 72.1)).toBeNaN();
  });

  it('is flat where the drop grows with flow', () => {
    expect(lineModel(sheetWith([20, 600, 500], [60, 800, 500]))).toMatchObject({ a: 200, b: 0, flat: true });
  });

  it('is refused without two cases of different flow that carry both pressures', () => {
    for (const sheet of [
      sheetWith(),
      sheetWith([20, 900, 500]),
      sheetWith([20, 900, 500], [20, 760, 600]),
      sheetWith([20, 900, 500], [60, 760, null]),
      sheetWith([20, 900, 500], [60, 500, 600]),
    ])
      expect(lineModel(sheet)).toMatchObject({ judged: false, reason: 'no-pressures' });
  });

  it('has four neighbours within the tolerance of design figures', () => {
    const five = neighbouringModels(model, defaultLimits.uncertainty);
    expect(five.map(({ a, b }) => [a / model.a, b / model.b].map((f) => Math.round(f * 1e6) / 1e6))).toEqual([
      [1, 1],
      [1.1, 1],
      [0.9, 1],
      [1, 1.2],
      [1, 0.8],
    ]);
  });

  it('gives mass flow where the conductance carries the density', () => {
    const density = 800;
    const root = 0.1 / Math.sqrt(density / waterDensity);
    const perMass: LineModel = { ...model, b: model.b / density ** 2 };
    expect(flowThrough(perMass, 30, root * density).flow / density).toBeCloseTo(
      flowThrough(model, 30, root).flow,
      9,
    );
  });
});
