import { type Family } from '../family.js';
import { passing, travel } from './figures.js';
import { earlyChokingAir } from './gases.js';
import { day, line, linear, steps, together, valve } from './parts.js';

const shutSpells = () => ({
  shutdowns: [
    { from: 3 * day, to: 3.3 * day },
    { from: 9 * day, to: 9.4 * day },
  ],
});

/** Valves of a wrong size, that pass when shut, choke, or whose transmitter stands still (methods.md §12.3). */
export const operations: readonly Family[] = [
  {
    name: 'oversized 3 to 14 %',
    sought: ['Oversized'],
    loop: together(valve(linear), () => ({ duty: steps(3, 14) })),
    figure: travel,
  },
  {
    name: 'oversized 8 to 18 %',
    sought: ['Oversized'],
    // so low in a wide meter range its noise does move the stem
    related: ['Excess movement'],
    loop: () => ({ duty: steps(8, 18) }),
    figure: travel,
  },
  {
    name: 'undersized 80 to 99 %',
    sought: ['Undersized'],
    related: ['Pinned at limit'],
    loop: () => ({ duty: steps(80, 99) }),
    figure: travel,
  },
  ...[0.01, 0.03, 0.08].map((share): Family => ({
    name: `passing ${100 * share} %`,
    sought: ['Passing when shut'],
    related: ['Pinned at limit'],
    // a meter range whose cut-off lies below what passes
    loop: together(valve({ passing: share }), shutSpells),
    figure: passing(share),
  })),
  {
    name: 'flow frozen for a day',
    sought: ['Frozen signal'],
    loop: () => ({ frozen: [{ role: 'flow', from: 6 * day, to: 7 * day }] }),
  },
  {
    name: 'position frozen for a day',
    sought: ['Frozen signal'],
    loop: () => ({ frozen: [{ role: 'position', from: 6 * day, to: 7 * day }] }),
  },
  {
    name: 'flow frozen for a day over a shutdown',
    sought: ['Frozen signal'],
    loop: () => ({
      shutdowns: [{ from: 6.4 * day, to: 6.5 * day }],
      frozen: [{ role: 'flow', from: 6 * day, to: 7 * day }],
    }),
  },
  {
    name: 'choked liquid',
    sought: ['Choked service'],
    loop: together(
      valve({ FL: 0.7 }),
      line({ dropShut: 900, destination: 180, vapourPressure: 143, lossShare: 0.3 }),
    ),
  },
  {
    name: 'choked gas',
    sought: ['Choked service'],
    loop: line({ dropShut: 600, destination: 300, lossShare: 0.3 }),
    gas: earlyChokingAir,
  },
];
