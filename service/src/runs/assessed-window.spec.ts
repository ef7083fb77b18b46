import { assessedWindow } from './assessed-window.js';

const at = (iso: string) => Date.parse(iso) / 1000;

describe('the window a run looks at', () => {
  it('ends at the last full local day, however late in the day the run is', () => {
    const morning = assessedWindow(
      at('2026-01-01T00:00:00Z'),
      at('2026-03-10T06:00:00Z'),
      'Europe/Vienna',
      30,
    );
    const evening = assessedWindow(
      at('2026-01-01T00:00:00Z'),
      at('2026-03-10T20:00:00Z'),
      'Europe/Vienna',
      30,
    );
    expect(morning).toEqual(evening);
    expect(morning.to).toBe(at('2026-03-09T23:00:00Z'));
  });

  it('keeps local midnights across a clock change', () => {
    const span = assessedWindow(at('2026-01-01T00:00:00Z'), at('2026-04-10T12:00:00Z'), 'Europe/Vienna', 30);
    expect(span.from).toBe(at('2026-03-10T23:00:00Z'));
    expect(span.to).toBe(at('2026-04-09T22:00:00Z'));
  });

  it('takes a day as full when its newest sample is in its last minutes', () => {
    const span = assessedWindow(at('2026-01-01T00:00:00Z'), at('2026-03-10T22:59:00Z'), 'Europe/Vienna', 30);
    expect(span.to).toBe(at('2026-03-10T23:00:00Z'));
  });

  it('takes a record shorter than a day as it is', () => {
    const span = assessedWindow(at('2026-03-10T10:00:00Z'), at('2026-03-10T10:20:00Z'), 'UTC', 30);
    expect(span).toEqual({ from: at('2026-03-10T10:00:00Z'), to: at('2026-03-10T10:20:00Z') + 1 });
  });

  it('does not reach back before the oldest sample', () => {
    const span = assessedWindow(at('2026-03-05T10:00:00Z'), at('2026-03-10T10:20:00Z'), 'UTC', 30);
    expect(span.from).toBe(at('2026-03-05T10:00:00Z'));
  });
});
