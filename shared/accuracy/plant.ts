import { type DataSheet } from '../src/core/data-sheet.js';
import { type SignalRole } from '../src/core/series.js';
import { seededRandom, seedFrom } from '../src/core/statistics/seeded-random.js';
import { type Gas } from '../src/simulation/as-gas.js';
import { aLoop } from '../src/simulation/a-loop.js';
import { type Duty, type Line, type Loop, type TrueValve } from '../src/simulation/loop-settings.js';
import { type Plant } from './family.js';

/** What a family says of its valves; the rest differs from seed to seed. */
export interface PlantParts {
  readonly valve?: Partial<TrueValve>;
  readonly line?: Partial<Line>;
  readonly duty?: Partial<Duty>;
  readonly loop?: Partial<Omit<Loop, 'valve' | 'line' | 'duty' | 'historian' | 'frozen'>>;
  readonly sheet?: Partial<DataSheet>;
  /** s */
  readonly scan?: number;
  readonly without?: readonly ('position' | 'pressures')[];
  readonly gas?: Gas;
  readonly daysAMonth?: number;
  readonly frozen?: Plant['frozen'];
  /** what only the seed can say */
  readonly bySeed?: (loop: Loop) => Partial<Loop>;
}

const days = 14;
const start = Date.UTC(2026, 2, 2) / 1000;

/** Recorded roles; set point and process value are left to the families of a flow loop without pressures. */
const roles: readonly SignalRole[] = [
  'demand',
  'position',
  'flow',
  'setPoint',
  'processValue',
  'upstreamPressure',
  'downstreamPressure',
];

/**
 * The valves of a family: duty 30 to 75 % of travel, scans of 10 s, position and pressures recorded, fourteen days,
 * unless the family says otherwise. Every seed has another size, rangeability, line, noise and positioner.
 */
export function plants(name: string, parts: PlantParts = {}): (seed: number) => Plant {
  return (seed) => {
    const random = seededRandom(seedFrom('accuracy', name, seed));
    const between = (low: number, high: number) => low + (high - low) * random();
    const plain = aLoop();
    const kind = parts.valve?.kind ?? 'equal percentage';
    const valve: TrueValve = {
      ...plain.valve,
      kind,
      parameter: kind === 'equal percentage' ? between(25, 60) : null,
      ratedCoefficient: [16, 25, 40, 63, 100, 160][Math.floor(6 * random())] as number,
      ripple: 0.02,
      stick: { S: between(0.1, 0.4), J: 0 },
      ...parts.valve,
    };
    const dropShut = between(250, 700);
    const line: Line = {
      ...plain.line,
      dropShut,
      lossShare: between(0.3, 0.65),
      destination: between(0.6, 1.2) * dropShut,
      disturbance: 0.03,
      ...parts.line,
    };
    const shutdown = 86_400 * (2 + Math.floor(10 * random()));
    const left = roles.filter(
      (role) =>
        !(parts.without?.includes('position') && role === 'position') &&
        !(parts.without?.includes('pressures') && role.endsWith('Pressure')),
    );
    const loop: Loop = {
      ...plain,
      seed: seedFrom(name, seed),
      start,
      days: parts.daysAMonth === undefined ? days : 12 * parts.daysAMonth,
      valve,
      line,
      duty: { ...plain.duty, ...parts.duty },
      meterNoise: between(0.003, 0.008),
      shutdowns: [{ from: shutdown, to: shutdown + 3 * 3_600 }],
      ...parts.loop,
      historian: { scan: parts.scan ?? 10, tolerance: 0, longest: 3_600, roles: left },
    };
    return {
      loop: { ...loop, ...parts.bySeed?.(loop) },
      sheet: parts.sheet ?? {},
      tolerance: 0.001,
      gas: parts.gas ?? null,
      daysAMonth: parts.daysAMonth ?? null,
      frozen: parts.frozen ?? [],
    };
  };
}
