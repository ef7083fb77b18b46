import { type Duty } from './loop-settings.js';
import { normal, wanderer } from './smooth-noise.js';

/**
 * The travel a healthy valve would need, % by second: steps every few hours, a day's cycle, a base load with small
 * moves, or a cascade that wanders.
 */
export function dutyByMinute(duty: Duty, minutes: number, random: () => number): Float64Array {
  const { low, high, kind } = duty;
  const middle = (low + high) / 2;
  const half = (high - low) / 2;
  const travel = new Float64Array(minutes);
  const within = (x: number) => Math.min(high, Math.max(low, x));
  let held = middle;
  let until = 0;
  const slow = wanderer(random, kind === 'cascade' ? 90 : 600);
  for (let i = 0; i < minutes; i++) {
    const wander = slow();
    switch (kind) {
      case 'constant demand':
        travel[i] = middle;
        break;
      case 'cascade':
        travel[i] = within(middle + 0.55 * half * wander);
        break;
      case 'diurnal':
        travel[i] = within(middle + half * (0.8 * Math.sin((2 * Math.PI * i) / 1440) + 0.2 * wander));
        break;
      case 'base load':
      case 'steps':
        if (i >= until) {
          until = i + 60 + Math.round(300 * random());
          held =
            kind === 'steps' ? low + (high - low) * random() : within(middle + 0.3 * half * normal(random));
        }
        travel[i] = held;
        break;
    }
  }
  return travel;
}
