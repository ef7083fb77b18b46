import { aLoop } from '../../src/simulation/a-loop.js';
import { flowThrough, resistanceOf } from '../../src/simulation/flow.js';
import { type Loop } from '../../src/simulation/loop-settings.js';
import { simulate } from '../../src/simulation/simulate.js';
import { coefficientAt, trimTable } from '../../src/simulation/trim.js';

/**
 * A base load whose set point swings so far that a healthy valve would swing by `amplitude`.
 *
 * @param period s
 * @param amplitude % travel, middle to peak
 */
export const swaying =
  (period: number, amplitude: number) =>
  (plain: Loop): Partial<Loop> => {
    const duty = { kind: 'base load', low: 45, high: 65 } as const;
    const { valve, line } = plain;
    const table = trimTable({ ...valve, ripple: 0, shift: 0 }, () => 0.5);
    const resistance = resistanceOf(line, valve.ratedCoefficient);
    const flowAt = (travel: number) =>
      flowThrough(coefficientAt(table, travel, 0), line.dropShut, resistance, line.density);
    const { flowSpan } = simulate({ ...aLoop(), ...plain, duty, days: 0.01, shutdowns: [] });
    const swing = { period, amplitude: (flowAt(55 + amplitude) - flowAt(55 - amplitude)) / 2 / flowSpan };
    return { duty, swing, tuning: 1 };
  };
