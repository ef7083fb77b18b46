import { type History, type Series, type SignalRole } from '../core/series.js';
import { archive } from './historian.js';
import { mapSeries } from './instruments.js';

export interface Keeping {
  /** s between the scans of the history handed over */
  readonly scan: number;
  /** share of span the archive may be wrong by; 0: every scan is kept */
  readonly tolerance: number;
  /** longest time without a stored value, s */
  readonly longest: number;
  /** span of each signal in its unit */
  readonly span: (role: SignalRole) => number;
}

/** What a historian keeps of a history recorded scan by scan; a hole in its times is kept as a hole. */
export function archiveHistory(history: History, { scan, tolerance, longest, span }: Keeping): History {
  const stepped = (role: SignalRole) => role === 'mode' || role === 'setPoint';
  return mapSeries(history, (role, series) => {
    if (tolerance === 0) return series;
    const settings = {
      scan,
      longest,
      decimals: 3,
      tolerance: stepped(role) ? 1e-9 : tolerance * span(role),
    };
    return joined(
      spells(series, scan).map(({ from, to }) =>
        archive(series.time[from] as number, series.value.subarray(from, to), settings),
      ),
      scan,
    );
  });
}

/** Runs of samples without a hole, as index ranges. */
function spells({ time }: Series, scan: number): { from: number; to: number }[] {
  const found: { from: number; to: number }[] = [];
  let from = 0;
  for (let i = 1; i <= time.length; i++) {
    if (i < time.length && (time[i] as number) - (time[i - 1] as number) <= 1.5 * scan) continue;
    found.push({ from, to: i });
    from = i;
  }
  return found;
}

/** Spells one after the other; a collection that stops says so by a value it does not vouch for. */
function joined(parts: readonly Series[], scan: number): Series {
  const stops = Math.max(0, parts.length - 1);
  const count = parts.reduce((sum, { time }) => sum + time.length, stops);
  const whole = {
    time: new Float64Array(count),
    value: new Float64Array(count),
    good: new Uint8Array(count),
  };
  let at = 0;
  parts.forEach((part, i) => {
    whole.time.set(part.time, at);
    whole.value.set(part.value, at);
    whole.good.set(part.good, at);
    at += part.time.length;
    if (i === stops) return;
    whole.time[at] = (part.time.at(-1) ?? NaN) + scan;
    whole.value[at] = NaN;
    at++;
  });
  return whole;
}

/**
 * A record of some days laid out over months: its first days stand at the start of the first month, the next at the
 * start of the second, with nothing in between (methods.md §12.3, families of twelve months).
 *
 * @param start s UTC of the record
 */
export function spreadOverMonths(history: History, start: number, daysAMonth: number): History {
  const piece = daysAMonth * 86_400;
  const month = 30.4375 * 86_400;
  return mapSeries(history, (_, series) => ({
    ...series,
    time: series.time.map((t) => t + Math.floor((t - start) / piece) * (month - piece)),
  }));
}
