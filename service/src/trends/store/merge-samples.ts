import { type Series } from '@tailrace/shared/core/series';

/** Two ascending records of one tag as one; where both have a sample at a time, the newer record's stands. */
export function mergeSamples(older: Series, newer: Series): Series {
  const most = older.time.length + newer.time.length;
  const time = new Float64Array(most);
  const value = new Float64Array(most);
  const good = new Uint8Array(most);
  let n = 0;
  let i = 0;
  let j = 0;
  const put = (from: Series, at: number) => {
    time[n] = from.time[at] as number;
    value[n] = from.value[at] as number;
    good[n] = from.good[at] as number;
    n += 1;
  };
  while (i < older.time.length || j < newer.time.length) {
    const a = i < older.time.length ? (older.time[i] as number) : Infinity;
    const b = j < newer.time.length ? (newer.time[j] as number) : Infinity;
    if (a === b) i += 1;
    if (a < b) put(older, i++);
    else put(newer, j++);
  }
  return { time: time.slice(0, n), value: value.slice(0, n), good: good.slice(0, n) };
}
