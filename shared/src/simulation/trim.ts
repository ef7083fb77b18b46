import { relativeCoefficient } from '../core/characteristic/models.js';
import { type TrueValve } from './loop-settings.js';
import { smoothDeparture } from './smooth-noise.js';

const steps = 2000;

/** Kv of the real trim against plug travel in %, as a table: the law, its departure and its shift, without capacity. */
export function trimTable(valve: TrueValve, random: () => number): Float64Array {
  const departure = smoothDeparture(random);
  const table = new Float64Array(steps + 1);
  for (let i = 0; i <= steps; i++) {
    const h = Math.min(1, Math.max(0, i / steps + valve.shift / 100));
    const law = relativeCoefficient(valve.kind, h, valve.parameter);
    table[i] = valve.ratedCoefficient * law * Math.exp(valve.ripple * departure(h));
  }
  return table;
}

/** A globe plug leaves its law near the seat and shuts; below this travel the coefficient runs to what passes, %. */
const seatTravel = 2;

/** Kv at a plug travel in %. */
export function coefficientAt(table: Float64Array, travel: number, passing: number): number {
  const at = Math.min(steps, Math.max(0, (travel / 100) * steps));
  const i = Math.min(steps - 1, Math.floor(at));
  const low = table[i] as number;
  const law = low + (at - i) * ((table[i + 1] as number) - low);
  if (travel >= seatTravel) return law;
  return passing + Math.max(0, travel / seatTravel) * Math.max(0, law - passing);
}
