import { type ColumnPlan } from '@tailrace/shared/contracts/trends';
import fc from 'fast-check';
import { DateTime } from 'luxon';
import { stampReader } from './stamp.js';

const read = (format: ColumnPlan['time']['format'], text: string, zone = 'UTC') => {
  const stamp = stampReader({ format, zone })(text);
  return stamp.kind === 'time' ? new Date(stamp.first * 1000).toISOString() : stamp.kind;
};

describe('a time cell', () => {
  it.each([
    ['iso', '2026-03-04T05:06:07Z', '2026-03-04T05:06:07.000Z'],
    ['iso', '2026-03-04T05:06:07.25+02:00', '2026-03-04T03:06:07.250Z'],
    ['iso', '2026-03-04 05:06', '2026-03-04T05:06:00.000Z'],
    ['year first', '2026/03/04 05:06:07', '2026-03-04T05:06:07.000Z'],
    ['day first', '04.03.2026 05:06:07', '2026-03-04T05:06:07.000Z'],
    ['month first', '3/4/2026 5:06:07 PM', '2026-03-04T17:06:07.000Z'],
    ['month first', '3/4/26 12:06 AM', '2026-03-04T00:06:00.000Z'],
    ['epoch seconds', '1772600000', '2026-03-04T04:53:20.000Z'],
    ['epoch milliseconds', '1772600000500', '2026-03-04T04:53:20.500Z'],
  ] as const)('in format %s, %s is %s', (format, text, instant) => {
    expect(read(format, text)).toBe(instant);
  });

  it.each(['31.02.2026 10:00:00', 'yesterday', '2026-03-04', ''])('%s is not a day-first time', (text) => {
    expect(read('day first', text)).toBe('not understood');
  });

  it('is wall time in the zone of the plan when it names no offset', () => {
    expect(read('iso', '2026-07-01 12:00:00', 'Europe/Vienna')).toBe('2026-07-01T10:00:00.000Z');
    expect(read('iso', '2026-01-01 12:00:00', 'Europe/Vienna')).toBe('2026-01-01T11:00:00.000Z');
  });

  it('does not exist in the hour the spring clock change skips', () => {
    expect(read('iso', '2026-03-29 02:30:00', 'Europe/Vienna')).toBe('does not exist');
  });

  it('has two readings in the hour the autumn clock change repeats', () => {
    const stamp = stampReader({ format: 'iso', zone: 'Europe/Vienna' })('2026-10-25 02:30:00');
    expect(stamp).toEqual({
      kind: 'time',
      first: Date.parse('2026-10-25T00:30:00Z') / 1000,
      second: Date.parse('2026-10-25T01:30:00Z') / 1000,
    });
  });

  it('agrees with luxon on every local time that exists once', () => {
    const zone = 'America/New_York';
    const reader = stampReader({ format: 'iso', zone });
    fc.assert(
      fc.property(fc.integer({ min: 1_500_000_000, max: 1_900_000_000 }), (seconds) => {
        const text = DateTime.fromSeconds(seconds, { zone }).toFormat('yyyy-MM-dd HH:mm:ss');
        const stamp = reader(text);
        expect(stamp.kind === 'time' && (stamp.first === seconds || stamp.second === seconds)).toBe(true);
      }),
    );
  });
});
