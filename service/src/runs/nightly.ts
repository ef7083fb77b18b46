import { DateTime } from 'luxon';

/** The nightly analysis of a site: a local time of day in the site's zone. */
export interface NightlySchedule {
  /** HH:mm */
  readonly at: string;
  /** IANA zone */
  readonly zone: string;
}

function timeOfDay(at: string): { hour: number; minute: number } {
  const [hour, minute] = at.split(':').map(Number);
  return { hour: hour ?? 0, minute: minute ?? 0 };
}

/** The latest instant at or before `now` (ms UTC) at which the nightly run was due. */
export function lastDue(schedule: NightlySchedule, now: number): number {
  const local = DateTime.fromMillis(now, { zone: schedule.zone });
  const today = local.set({ ...timeOfDay(schedule.at), second: 0, millisecond: 0 });
  return (today.toMillis() <= now ? today : today.minus({ days: 1 })).toMillis();
}

/** The first instant after `now` (ms UTC) at which the nightly run is due. */
export function nextDue(schedule: NightlySchedule, now: number): number {
  const local = DateTime.fromMillis(lastDue(schedule, now), { zone: schedule.zone });
  return local.plus({ days: 1 }).set(timeOfDay(schedule.at)).toMillis();
}
