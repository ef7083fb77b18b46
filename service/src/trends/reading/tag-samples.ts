import { type Series } from '@tailrace/shared/core/series';
import { type TimeOrder } from './time-order.js';

/**
 * The samples of one tag as they are read, in columns that are handed on whenever they are full. The buffers are
 * kept and filled again: fresh memory costs far more than copying out of kept memory.
 */
export class TagSamples {
  private readonly time: Float64Array;
  private readonly value: Float64Array;
  private readonly good: Uint8Array;
  private count = 0;
  taken = 0;
  bad = 0;
  from = Infinity;
  to = -Infinity;

  constructor(
    readonly tag: string,
    private readonly capacity: number,
    /** the tag's own, or in a wide file the one all tags share */
    readonly order: TimeOrder,
  ) {
    this.time = new Float64Array(capacity);
    this.value = new Float64Array(capacity);
    this.good = new Uint8Array(capacity);
  }

  get full(): boolean {
    return this.count === this.capacity;
  }

  /** @param value NaN for a sample the historian could not vouch for */
  add(time: number, value: number, good: boolean): void {
    this.time[this.count] = time;
    this.value[this.count] = value;
    this.good[this.count] = good ? 1 : 0;
    this.count += 1;
    this.taken += 1;
    if (!good) this.bad += 1;
    if (time < this.from) this.from = time;
    if (time > this.to) this.to = time;
  }

  /** What was read since the last time, ascending, one sample a time (the last good one wins); null for nothing. */
  take(): Series | null {
    if (this.count === 0) return null;
    const n = this.count;
    this.count = 0;
    const time = this.time.slice(0, n);
    const value = this.value.slice(0, n);
    const good = this.good.slice(0, n);
    if (this.order.direction < 0) {
      time.reverse();
      value.reverse();
      good.reverse();
    }
    return onePerTime({ time, value, good }, this.order.direction < 0);
  }
}

/** Keeps one of several samples at a time: the last received good one, else the last (methods.md §1.1). */
function onePerTime(series: Series, reversed: boolean): Series {
  const { time, value, good } = series;
  let kept = 0;
  for (let i = 0; i < time.length; i++) {
    if (kept > 0 && time[kept - 1] === time[i]) {
      const laterReceived = !reversed;
      const better = good[i] !== good[kept - 1] ? good[i] === 1 : laterReceived;
      if (!better) continue;
      kept -= 1;
    }
    time[kept] = time[i] as number;
    value[kept] = value[i] as number;
    good[kept] = good[i] as number;
    kept += 1;
  }
  return kept === time.length
    ? series
    : { time: time.slice(0, kept), value: value.slice(0, kept), good: good.slice(0, kept) };
}
