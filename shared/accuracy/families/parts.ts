import { type CharacteristicKind } from '../../src/core/data-sheet.js';
import { type SignalRole } from '../../src/core/series.js';
import { type Duty, type Line, type Loop, type TrueValve } from '../../src/simulation/loop-settings.js';

/** Short ways to say what differs from a plain loop. */
export const day = 86_400;

export const steps = (low: number, high: number): Duty => ({ kind: 'steps', low, high });
export const cascade: Duty = { kind: 'cascade', low: 30, high: 75 };

export const valve =
  (parts: Partial<TrueValve>) =>
  (loop: Loop): Pick<Loop, 'valve'> => ({ valve: { ...loop.valve, ...parts } });

export const line =
  (parts: Partial<Line>) =>
  (loop: Loop): Pick<Loop, 'line'> => ({ line: { ...loop.line, ...parts } });

export const historian =
  (parts: Partial<Loop['historian']>) =>
  (loop: Loop): Pick<Loop, 'historian'> => ({ historian: { ...loop.historian, ...parts } });

/** A trim of another kind than equal percentage, with the kind's usual parameter. */
export const trim = (kind: CharacteristicKind): Pick<TrueValve, 'kind' | 'parameter'> => ({
  kind,
  parameter: null,
});
export const linear = trim('linear');

const all: readonly SignalRole[] = [
  'demand',
  'position',
  'flow',
  'setPoint',
  'upstreamPressure',
  'downstreamPressure',
];
export const withoutPosition = all.filter((role) => role !== 'position');
export const withoutPressures = all.filter((role) => !role.endsWith('Pressure'));
export const withoutBoth = withoutPosition.filter((role) => !role.endsWith('Pressure'));

/** Several changes of a plain loop, one after the other. */
export const together =
  (...changes: readonly ((loop: Loop) => Partial<Loop>)[]) =>
  (plain: Loop): Partial<Loop> =>
    changes.reduce((loop, change) => ({ ...loop, ...change(loop) }), plain);
