import { lastDue, nextDue } from './nightly.js';

const schedule = { at: '02:00', zone: 'Europe/Vienna' };
const at = (iso: string) => Date.parse(iso);

describe('the nightly schedule', () => {
  it('is due at the local time of the site', () => {
    expect(lastDue(schedule, at('2026-01-10T12:00:00Z'))).toBe(at('2026-01-10T01:00:00Z'));
    expect(nextDue(schedule, at('2026-01-10T12:00:00Z'))).toBe(at('2026-01-11T01:00:00Z'));
  });

  it('was due yesterday when the time of day has not come yet', () => {
    expect(lastDue(schedule, at('2026-01-10T00:30:00Z'))).toBe(at('2026-01-09T01:00:00Z'));
  });

  it('comes once on the night whose local time is skipped', () => {
    // 29 March 2026: local 02:00 to 03:00 does not exist.
    const before = at('2026-03-28T12:00:00Z');
    const due = nextDue(schedule, before);
    expect(due).toBe(at('2026-03-29T01:00:00Z'));
    expect(nextDue(schedule, due)).toBe(at('2026-03-30T00:00:00Z'));
  });
});
