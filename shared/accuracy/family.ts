import { type Assessment } from '../src/core/assessment.js';
import { type DataSheet } from '../src/core/data-sheet.js';
import { type FindingKind } from '../src/core/findings/kinds.js';
import { seededRandom, seedFrom } from '../src/core/statistics/seeded-random.js';
import { aLoop } from '../src/simulation/a-loop.js';
import { type Gas } from '../src/simulation/as-gas.js';
import { type Loop } from '../src/simulation/loop-settings.js';
import { type Simulated } from '../src/simulation/simulate.js';

export type Truth = Simulated['truth'] & { readonly loop: Loop };

/** The figure a family is about, as an error against the truth; NaN where the assessment gave none. */
export interface Figure {
  readonly name: string;
  readonly error: (assessment: Assessment, truth: Truth) => number;
}

/** Loops of one description, another one for every seed. */
export interface Family {
  readonly name: string;
  /** all of these are to be found; none: the valves are healthy */
  readonly sought: readonly FindingKind[];
  /** one of `sought` is enough */
  readonly either?: boolean;
  /** true as well, so neither sought nor unrelated */
  readonly related?: readonly FindingKind[];
  /** what differs from the plain loop of a seed */
  readonly loop: (plain: Loop) => Partial<Loop>;
  /** what the sheet says where that is not the truth */
  readonly sheet?: (loop: Loop) => Partial<DataSheet>;
  readonly figure?: Figure;
  /** a gas flows instead of a liquid */
  readonly gas?: Gas;
  /** the record is laid out over months with this many days in each */
  readonly daysAMonth?: number;
}

const days = 14;

/**
 * The plain loop of a seed: another size, rangeability, line, noise and positioner for each; duty 30 to 75 % of
 * travel, scans of 10 s, position and pressures recorded, fourteen days with one shutdown (methods.md §12.1).
 */
export function plainLoop(seed: number): Loop {
  const random = seededRandom(seedFrom('accuracy', seed));
  const between = (low: number, high: number) => low + (high - low) * random();
  const plain = aLoop();
  const dropShut = between(250, 700);
  const shutdown = 86_400 * Math.floor(between(1, 11));
  return {
    ...plain,
    seed: seedFrom('loop', seed),
    days,
    valve: {
      ...plain.valve,
      parameter: between(25, 60),
      ratedCoefficient: [16, 25, 40, 63, 100, 160][Math.floor(6 * random())] as number,
      ripple: 0.02,
      stick: { S: between(0.1, 0.4), J: 0 },
    },
    line: {
      ...plain.line,
      dropShut,
      lossShare: between(0.3, 0.65),
      destination: between(0.6, 1.2) * dropShut,
      disturbance: 0.03,
    },
    meterNoise: between(0.003, 0.008),
    // loops are slowed until their meter's noise no longer wears the stem
    tuning: between(0.3, 0.6),
    shutdowns: [{ from: shutdown, to: shutdown + 3 * 3_600 }],
    historian: { ...plain.historian, scan: 10, tolerance: 0.001 },
  };
}
