import { type Duty } from '../../src/simulation/loop-settings.js';
import { type Family } from '../family.js';
import { deadBand, jump, mismatch, period, play, stickBand } from './figures.js';
import {
  cascade,
  historian,
  linear,
  together,
  valve,
  withoutBoth,
  withoutPosition,
  withoutPressures,
} from './parts.js';
import { swaying } from './swaying.js';

const stick = (S: number, J: number) => valve({ stick: { S, J } });
const base: Duty = { kind: 'base load', low: 30, high: 75 };
const moving = () => ({ duty: cascade });

const sticking: readonly Family[] = [
  { name: 'stick S2 J1', sought: ['Sticking'], loop: together(stick(2, 1), moving), figure: jump(1) },
  { name: 'stick S4 J2', sought: ['Sticking'], loop: together(stick(4, 2), moving), figure: jump(2) },
  { name: 'stick S6 J4', sought: ['Sticking'], loop: together(stick(6, 4), moving), figure: jump(4) },
  { name: 'stick S4 J2, its band', sought: ['Sticking'], loop: stick(4, 2), figure: stickBand(4) },
  {
    name: 'stick S4 J2 linear',
    sought: ['Sticking'],
    loop: together(valve(linear), stick(4, 2)),
    figure: jump(2),
  },
  {
    name: 'stick S4 J2 base load',
    sought: ['Sticking'],
    loop: together(stick(4, 2), () => ({ duty: base })),
    figure: jump(2),
  },
  {
    name: 'stick S4 J2 scan 60 s',
    sought: ['Sticking', 'Lost motion'],
    either: true,
    loop: together(stick(4, 2), historian({ scan: 60 })),
    figure: deadBand(4),
  },
  {
    name: 'stick S4 J2 no position',
    sought: ['Sticking', 'Lost motion'],
    either: true,
    loop: together(stick(4, 2), historian({ roles: withoutPosition })),
    figure: deadBand(4),
  },
];

const lost: readonly Family[] = [
  { name: 'dead band 2', sought: ['Lost motion'], loop: stick(2, 0), figure: deadBand(2) },
  { name: 'dead band 4', sought: ['Lost motion'], loop: stick(4, 0), figure: deadBand(4) },
  {
    name: 'dead band 4 base load',
    sought: ['Lost motion'],
    loop: together(stick(4, 0), () => ({ duty: base })),
    figure: deadBand(4),
  },
  {
    name: 'dead band 4 no position',
    sought: ['Lost motion'],
    loop: together(stick(4, 0), historian({ roles: withoutPosition })),
    figure: deadBand(4),
  },
  {
    name: 'dead band 4 no position, no pressures',
    sought: ['Lost motion'],
    loop: together(stick(4, 0), historian({ roles: withoutBoth })),
    figure: deadBand(4),
  },
  {
    name: 'dead band 2 scan 60 s',
    sought: ['Lost motion'],
    loop: together(stick(2, 0), historian({ scan: 60 })),
    figure: deadBand(2),
  },
  { name: 'play 2', sought: ['Lost motion'], loop: valve({ play: 2 }), figure: play(2) },
  {
    name: 'play 4, controller that answers noise',
    sought: ['Lost motion'],
    loop: together(valve({ play: 4 }), () => ({ tuning: 1 })),
    figure: play(4),
  },
  { name: 'play 4', sought: ['Lost motion'], loop: valve({ play: 4 }), figure: play(4) },
  {
    name: 'play 3 linear',
    sought: ['Lost motion'],
    loop: valve({ ...linear, play: 3 }),
    figure: play(3),
  },
  {
    name: 'play 3 no pressures',
    sought: ['Lost motion'],
    loop: together(valve({ play: 3 }), historian({ roles: withoutPressures })),
    figure: play(3),
  },
];

const swinging: readonly Family[] = [
  [60, 6],
  [150, 3],
  [600, 5],
  [1_200, 2],
  [3_600, 3],
  [4 * 3_600, 3],
].map(([seconds = 0, amplitude = 0]): Family => ({
  name: `swings ${amplitude} % every ${seconds} s`,
  sought: ['Hunting'],
  related: ['Excess movement'],
  loop: swaying(seconds, amplitude),
  figure: period(seconds),
}));

/** Valves that stick, lose motion, swing or report a wrong position (methods.md §12.3). */
export const movements: readonly Family[] = [
  ...sticking.map((family): Family => ({ ...family, related: ['Hunting', 'Excess movement'] })),
  ...lost.map(
    // a dead band keeps the stem off its seat when told to shut: what passes then is true
    (family): Family => ({ ...family, related: ['Hunting', 'Excess movement', 'Passing when shut'] }),
  ),
  ...swinging,
  {
    name: 'swings 3 % every 600 s, scan 60 s',
    sought: ['Hunting'],
    related: ['Excess movement'],
    loop: together(swaying(600, 3), historian({ scan: 60 })),
    figure: period(600),
  },
  {
    // it swings faster than four scans: no period can be told (methods.md §12.4)
    name: 'controller too fast for the scan',
    sought: ['Excess movement'],
    related: ['Hunting'],
    loop: () => ({ tuning: 8 }),
  },
  {
    name: 'position reads 3 % more',
    sought: ['Position mismatch'],
    related: ['Lost capacity', 'Travel offset'],
    loop: valve({ positionError: 3 }),
    figure: mismatch(3),
  },
];
