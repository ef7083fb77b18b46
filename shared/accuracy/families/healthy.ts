import { type Duty, type Loop } from '../../src/simulation/loop-settings.js';
import { type Family, type Figure } from '../family.js';
import { air } from './gases.js';
import { capacity, change, travel } from './figures.js';
import {
  cascade,
  day,
  historian,
  line,
  linear,
  steps,
  together,
  trim,
  valve,
  withoutBoth,
  withoutPosition,
  withoutPressures,
} from './parts.js';

const healthyFamily = (
  name: string,
  loop: (plain: Loop) => Partial<Loop>,
  figure?: Figure,
  rest: Partial<Family> = {},
): Family => ({ name, sought: [], loop, ...(figure ? { figure } : {}), ...rest });

const diurnal: Duty = { kind: 'diurnal', low: 30, high: 75 };
const base: Duty = { kind: 'base load', low: 30, high: 75 };

/** Healthy valves under what plants do to them: nothing may be found but Uneven gain (methods.md §12.3). */
export const healthy: readonly Family[] = [
  healthyFamily('equal percentage steps', () => ({}), capacity()),
  healthyFamily('linear steps', valve(linear), capacity()),
  healthyFamily('modified parabolic steps', valve(trim('modified parabolic')), capacity()),
  healthyFamily('quick opening steps', valve(trim('quick opening')), capacity()),
  healthyFamily('equal percentage cascade', () => ({ duty: cascade }), travel),
  healthyFamily(
    'linear cascade',
    together(valve(linear), () => ({ duty: cascade })),
    travel,
  ),
  healthyFamily('equal percentage base load', () => ({ duty: base }), travel),
  healthyFamily(
    'linear base load',
    together(valve(linear), () => ({ duty: base })),
    travel,
  ),
  healthyFamily('equal percentage diurnal', () => ({ duty: diurnal }), travel),
  healthyFamily('scan 60 s', historian({ scan: 60 }), capacity()),
  healthyFamily(
    'scan 120 s, 30 days',
    together(historian({ scan: 120 }), () => ({ days: 30 })),
    capacity(),
  ),
  healthyFamily('coarse archive', historian({ tolerance: 0.004 }), capacity()),
  healthyFamily('every scan kept', historian({ tolerance: 0 }), capacity()),
  healthyFamily('controller that answers noise', () => ({ tuning: 1 }), capacity()),
  healthyFamily(
    'quick opening, controller that answers noise',
    together(valve(trim('quick opening')), () => ({ tuning: 1 })),
    capacity(),
  ),
  healthyFamily('noisy meter, slow controller', () => ({ meterNoise: 0.02, tuning: 0.2 }), capacity()),
  healthyFamily('disturbances of 10 %', line({ disturbance: 0.1 }), capacity()),
  healthyFamily('trim 3.5 % off its law', valve({ ripple: 0.035 }), capacity()),
  healthyFamily('gas', () => ({}), capacity(), { gas: air }),
  healthyFamily('three days', () => ({ days: 3, shutdowns: [] }), capacity()),
  healthyFamily('seven days', () => ({ days: 7, shutdowns: [{ from: day, to: 1.2 * day }] }), capacity()),
  healthyFamily('long shutdown', () => ({ shutdowns: [{ from: 5 * day, to: 6.5 * day }] }), capacity()),
  healthyFamily('no position', historian({ roles: withoutPosition }), capacity()),
  healthyFamily('no pressures', historian({ roles: withoutPressures }), travel),
  healthyFamily(
    'linear, no position',
    together(valve(linear), historian({ roles: withoutPosition })),
    capacity(),
  ),
  healthyFamily(
    'linear cascade, no position, no pressures',
    together(valve(linear), historian({ roles: withoutBoth }), () => ({ duty: cascade })),
  ),
  healthyFamily(
    'disturbances of 10 %, no position, no pressures',
    together(line({ disturbance: 0.1 }), historian({ roles: withoutBoth })),
  ),
  healthyFamily(
    'linear 15 to 75 %',
    together(valve(linear), () => ({ duty: steps(15, 75) })),
    capacity(),
  ),
  healthyFamily(
    'parabolic 15 to 60 %',
    together(valve(trim('modified parabolic')), () => ({ duty: steps(15, 60) })),
    capacity(),
  ),
  healthyFamily('twelve months', () => ({ days: 72, shutdowns: [] }), change(1), { daysAMonth: 6 }),
  healthyFamily(
    'twelve months, linear',
    together(valve(linear), () => ({ days: 72, shutdowns: [] })),
    change(1),
    { daysAMonth: 6 },
  ),
];
