import { type Movement } from '../assessment.js';
import { type Grid } from '../preparation/prepared.js';
import { type Legs } from './zig-zag.js';

const secondsPerDay = 86_400;

/**
 * Reversals and way travelled, by calendar day (UTC) and per 24 h in service. A leg belongs to the day it ends in.
 *
 * @param legs zig-zag of the travel, %
 * @param usable 1 where the valve was in service
 * @returns zeros where it never was
 * Source: methods.md §6.1
 */
export function dailyMovement(
  legs: Legs,
  travel: Float64Array,
  usable: Uint8Array,
  grid: Grid,
): Pick<Movement, 'reversalsPerDay' | 'travelPerDay' | 'perDay'> {
  const firstDay = Math.floor(grid.start / secondsPerDay);
  const lastDay = Math.floor((grid.start + Math.max(0, grid.count - 1) * grid.step) / secondsPerDay);
  const days = lastDay - firstDay + 1;
  const reversals = new Float64Array(days);
  const way = new Float64Array(days);
  let allReversals = 0;
  let allWay = 0;
  for (let k = 0; k < legs.count; k++) {
    const end = legs.to[k] as number;
    const d = Math.floor((grid.start + end * grid.step) / secondsPerDay) - firstDay;
    const turned = legs.afterReversal[k] as number;
    const height = Math.abs((travel[end] as number) - (travel[legs.from[k] as number] as number));
    reversals[d] = (reversals[d] as number) + turned;
    way[d] = (way[d] as number) + height;
    allReversals += turned;
    allWay += height;
  }
  let inService = 0;
  for (let i = 0; i < grid.count; i++) inService += usable[i] as number;
  const serviceDays = (inService * grid.step) / secondsPerDay;
  const perDay: { day: number; reversals: number; travel: number }[] = [];
  for (let d = 0; d < days; d++)
    perDay.push({
      day: (firstDay + d) * secondsPerDay,
      reversals: reversals[d] as number,
      travel: way[d] as number,
    });
  return {
    reversalsPerDay: serviceDays > 0 ? allReversals / serviceDays : 0,
    travelPerDay: serviceDays > 0 ? allWay / serviceDays : 0,
    perDay,
  };
}
