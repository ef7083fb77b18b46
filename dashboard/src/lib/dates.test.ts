import { expect, test } from 'vitest';
import { siteTime, startOfDay, utcTime } from './dates';

test('a time shows in the site’s zone, and in UTC on hover', () => {
  expect(siteTime('2026-07-01T22:30:00Z', 'Europe/Zurich')).toBe('2 Jul 2026, 00:30');
  expect(siteTime('2026-07-01T22:30:00Z', 'America/Chicago', 'day')).toBe('1 Jul 2026');
  expect(utcTime('2026-07-02T00:30:05+02:00')).toBe('2026-07-01 22:30:05 UTC');
});

test('what is not a time shows as a dash', () => {
  expect(siteTime(null, 'UTC')).toBe('–');
  expect(siteTime('yesterday', 'UTC')).toBe('–');
  expect(utcTime('yesterday')).toBe('');
});

test.each([
  ['2026-11-30', 'Europe/Zurich', '2026-11-29T23:00:00.000Z'],
  ['2026-03-29', 'Europe/Zurich', '2026-03-28T23:00:00.000Z'],
  ['2026-03-30', 'Europe/Zurich', '2026-03-29T22:00:00.000Z'],
  ['2026-10-25', 'Europe/Zurich', '2026-10-24T22:00:00.000Z'],
  ['2026-11-01', 'America/New_York', '2026-11-01T04:00:00.000Z'],
  ['2026-06-01', 'Asia/Kolkata', '2026-05-31T18:30:00.000Z'],
])('%s begins in %s at %s, also around a change of clocks', (day, zone, instant) => {
  expect(startOfDay(day, zone)).toBe(instant);
});
