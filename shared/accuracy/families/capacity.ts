import { type CharacteristicKind } from '../../src/core/data-sheet.js';
import { type Family } from '../family.js';
import { capacity, change, shift, trend } from './figures.js';
import { day, linear, steps, together, trim, valve } from './parts.js';

const months = () => ({ days: 72, shutdowns: [] });
const against = (stated: number): Partial<Family> => ({
  sheet: ({ valve: { ratedCoefficient } }) => ({ ratedCoefficient: ratedCoefficient / stated }),
  figure: capacity(stated),
});
const offKind = (name: string, is: CharacteristicKind, sheet: CharacteristicKind): Family => ({
  name,
  sought: ['Off characteristic'],
  related: ['Gained capacity', 'Lost capacity', 'Travel offset'],
  loop: (l) =>
    is === 'equal percentage' ? { valve: { ...l.valve, kind: is } } : { valve: { ...l.valve, ...trim(is) } },
  sheet: () => ({ characteristic: sheet, rangeability: 50 }),
});

/** Valves that pass more or less than their sheet says, or change, or are of another kind (methods.md §12.3). */
export const capacities: readonly Family[] = [
  offKind('sheet linear, is equal percentage', 'equal percentage', 'linear'),
  offKind('sheet equal percentage, is linear', 'linear', 'equal percentage'),
  offKind('sheet equal percentage, is parabolic', 'modified parabolic', 'equal percentage'),
  { name: 'capacity 0.85', sought: ['Lost capacity'], loop: () => ({}), ...against(0.85) },
  { name: 'capacity 1.15', sought: ['Gained capacity'], loop: () => ({}), ...against(1.15) },
  { name: 'capacity 0.85 linear', sought: ['Lost capacity'], loop: valve(linear), ...against(0.85) },
  {
    name: 'shift +6 linear 15 to 75 %',
    sought: ['Travel offset'],
    related: ['Gained capacity'],
    loop: together(valve({ ...linear, shift: 6 }), () => ({ duty: steps(15, 75) })),
    figure: shift(6),
  },
  {
    name: 'shift -6 linear 15 to 75 %',
    sought: ['Travel offset'],
    related: ['Lost capacity'],
    loop: together(valve({ ...linear, shift: -6 }), () => ({ duty: steps(15, 75) })),
    figure: shift(-6),
  },
  {
    name: 'wear +10 % in twelve months',
    sought: ['Gained capacity'],
    loop: together(valve({ drift: 0.1 }), months),
    daysAMonth: 6,
    figure: trend(1.1),
  },
  {
    name: 'fouling -10 % in twelve months',
    sought: ['Lost capacity'],
    loop: together(valve({ drift: -0.1 }), months),
    daysAMonth: 6,
    figure: trend(0.9),
  },
  {
    name: 'wear +4 % in twelve months',
    sought: ['Gained capacity'],
    loop: together(valve({ drift: 0.04 }), months),
    daysAMonth: 6,
    figure: trend(1.04),
  },
  {
    name: 'fouling -4 % in twelve months',
    sought: ['Lost capacity'],
    loop: together(valve({ drift: -0.04 }), months),
    daysAMonth: 6,
    figure: trend(0.96),
  },
  {
    name: 'step -6 % in month 7',
    sought: ['Lost capacity'],
    loop: together(valve({ step: { at: 37 * day, factor: 0.94 } }), months),
    daysAMonth: 6,
    figure: change(0.94),
  },
  {
    name: 'step -12 % on day 8 of 14',
    sought: ['Lost capacity'],
    loop: together(valve({ step: { at: 8 * day, factor: 0.88 } }), () => ({ shutdowns: [] })),
    figure: change(0.88),
  },
];

const kinds: readonly CharacteristicKind[] = [
  'equal percentage',
  'linear',
  'modified parabolic',
  'quick opening',
];

/** Healthy valves by the width of the travel they visit: how often their kind is told (methods.md §12.2). */
export const spans: readonly Family[] = kinds.flatMap((kind) =>
  [12, 20, 30, 40, 55].map((width): Family => ({
    name: `kind of ${kind}, span ${width} %`,
    sought: [],
    loop: (l) => ({
      valve: kind === 'equal percentage' ? l.valve : { ...l.valve, ...trim(kind) },
      duty: steps(50 - width / 2, 50 + width / 2),
    }),
    figure: capacity(),
  })),
);
