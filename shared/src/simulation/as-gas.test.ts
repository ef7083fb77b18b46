import { describe, expect, test } from 'vitest';
import { flowCoefficient } from '../core/flow-coefficient/flow-coefficient.js';
import { aSheet } from '../core/sample-record.js';
import { aLoop } from './a-loop.js';
import { asGas, type Gas, gasBetween } from './as-gas.js';
import { simulate } from './simulate.js';

const air: Gas = { molarMass: 28.96, temperature: 293, specificHeatRatio: 1.4, xT: 0.7 };

describe('gas through a valve', () => {
  test('flows no more once it chokes', () => {
    // x choked is Fγ·xT = 0.7 here (IEC 60534-2-1:2011)
    expect(gasBetween(10, 1_000, 900, air)).toBe(gasBetween(10, 1_000, 701, air));
    expect(gasBetween(10, 1_000, 600, air)).toBeLessThan(gasBetween(10, 1_000, 700, air));
  });

  test('gives back the coefficient it was made with', () => {
    const sheet = aSheet({
      xT: 0.7,
      flowBasis: 'normal volume',
      fluid: {
        phase: 'gas',
        density: null,
        vapourPressure: null,
        criticalPressure: null,
        viscosity: null,
        molarMass: 28.96,
        specificHeatRatio: 1.4,
        compressibility: 1,
        temperature: 293,
      },
    });
    const flow = gasBetween(25, 900, 250, air);
    const conditions = {
      flow,
      upstreamPressure: 900,
      downstreamPressure: 650,
      temperature: 293,
      density: NaN,
    };
    // the standard prints N9 to three digits; the core works it out from the molar volume
    expect(flowCoefficient(conditions, sheet).coefficient / 25).toBeCloseTo(1, 2);
  });

  test('takes a liquid record over without its set point', () => {
    const { history } = simulate(aLoop({ days: 0.1 }));
    const gas = asGas(history, 999.1, air);
    expect(gas.setPoint).toBeUndefined();
    expect(gas.flow?.time).toEqual(history.flow?.time);
    expect(gas.position).toBe(history.position);
  });
});
