import { type History, type Series, type SignalRole } from '../core/series.js';
import { seededRandom, seedFrom } from '../core/statistics/seeded-random.js';
import { normal, wanderer } from './smooth-noise.js';

/** How far the instruments of one loop are from the truth. */
export interface Instruments {
  /** fixed factor of the flow meter */
  readonly flowFactor: number;
  /** sd of the factor that wanders over days, relative */
  readonly slowReading: number;
  /** fixed errors, kPa */
  readonly upstreamError: number;
  readonly downstreamError: number;
}

/** Instruments of usual quality, another set for every seed (methods.md §12.1). `drop` is the drop at no flow, kPa. */
export function usualInstruments(seed: number, drop: number): Instruments {
  const random = seededRandom(seedFrom('instruments', seed));
  return {
    flowFactor: 1 + 0.005 * normal(random),
    slowReading: 0.006,
    upstreamError: 0.003 * drop * normal(random),
    downstreamError: 0.003 * drop * normal(random),
  };
}

/**
 * What such instruments would have said of a history known exactly. Set point and process value follow the flow:
 * a controller holds what its meter says.
 */
export function readBy(history: History, instruments: Instruments, seed: number): History {
  const { flow } = history;
  const factor = flow ? readingFactors(flow.time, instruments, seed) : null;
  const read = (role: SignalRole, series: Series): Series => {
    switch (role) {
      case 'flow':
      case 'processValue':
      case 'setPoint':
        return { ...series, value: series.value.map((v, i) => v * (factor?.[i] ?? 1)) };
      case 'upstreamPressure':
        return { ...series, value: series.value.map((v) => v + instruments.upstreamError) };
      case 'downstreamPressure':
        return { ...series, value: series.value.map((v) => v + instruments.downstreamError) };
      case 'demand':
      case 'position':
      case 'temperature':
      case 'density':
      case 'mode':
        return series;
    }
  };
  return mapSeries(history, read);
}

function readingFactors(time: Float64Array, { flowFactor, slowReading }: Instruments, seed: number) {
  const random = seededRandom(seedFrom('reading', seed));
  const step = 600;
  const slow = wanderer(random, (2 * 86_400) / step);
  let at = time[0] ?? 0;
  let [before, after] = [slow(), slow()];
  return time.map((t) => {
    while (t >= at + step) {
      at += step;
      [before, after] = [after, slow()];
    }
    const wander = before + ((after - before) * (t - at)) / step;
    return flowFactor * (1 + slowReading * wander);
  });
}

/** The history with some values lost: bad quality and no number. */
export function withBadValues(history: History, share: number, seed: number): History {
  const random = seededRandom(seedFrom('bad', seed));
  return mapSeries(history, (_, series) => {
    const good = Uint8Array.from(series.good, (g) => (random() < share ? 0 : g));
    return { time: series.time, value: series.value.map((v, i) => (good[i] ? v : NaN)), good };
  });
}

/** The same history with every series made anew. */
export function mapSeries(history: History, make: (role: SignalRole, series: Series) => Series): History {
  const made: Partial<Record<SignalRole, Series>> = {};
  for (const [role, series] of Object.entries(history) as [SignalRole, Series][])
    made[role] = make(role, series);
  return made;
}
