import { type Series } from '@tailrace/shared/core/series';

/**
 * Samples to bytes and back, to the bit. Plant data are decimal text sampled nearly evenly, so times become
 * differences of differences of whole ms and values differences of whole multiples of a power of ten, both as
 * variable-length integers: about a byte and a half a sample. What does not fit is kept as plain doubles.
 *
 * Layout: one byte of form, then times, values, and runs of good and bad samples.
 */
const wholeTimes = 1;
const wholeValues = 2;
const allGood = 4;

/** Values may have so many decimals and still be whole numbers a double holds exactly. */
const mostDecimals = 9;
const largestWhole = 2 ** 50;
/** stands where a value is NaN among whole values: no zig-zag difference is as large as this */
const absent = 2 ** 53 - 1;

/** Encodes samples; the result is a copy of its own. */
export function encodeBlock({ time, value, good }: Series): Uint8Array {
  const n = time.length;
  const writer = new ByteWriter(64 + n * 24);
  const timesFit = time.every(
    (t) => Number.isSafeInteger(Math.round(t * 1000)) && Math.round(t * 1000) / 1000 === t,
  );
  const scale = commonScale(value);
  const goodAll = good.every((g) => g === 1);
  writer.byte((timesFit ? wholeTimes : 0) | (scale === null ? 0 : wholeValues) | (goodAll ? allGood : 0));
  if (timesFit) writeTimes(writer, time);
  else for (const t of time) writer.double(t);
  if (scale === null) for (const v of value) writer.double(v);
  else writeWhole(writer, value, scale);
  if (!goodAll) writeRuns(writer, good);
  return writer.bytes();
}

/** Decodes `count` samples. */
export function decodeBlock(bytes: Uint8Array, count: number): Series {
  const time = new Float64Array(count);
  const value = new Float64Array(count);
  const good = new Uint8Array(count);
  decodeInto(bytes, count, { time, value, good }, 0);
  return { time, value, good };
}

/** Decodes `count` samples into columns the caller keeps, from index `at` on. */
export function decodeInto(
  bytes: Uint8Array,
  count: number,
  { time, value, good }: Series,
  at: number,
): void {
  const reader = new ByteReader(bytes);
  const form = reader.byte();
  if (form & wholeTimes) readTimes(reader, time, at, count);
  else for (let i = 0; i < count; i++) time[at + i] = reader.double();
  if (form & wholeValues) readWhole(reader, value, at, count);
  else for (let i = 0; i < count; i++) value[at + i] = reader.double();
  if (form & allGood) good.fill(1, at, at + count);
  else readRuns(reader, good, at, count);
}

/** Decimals that make every value a whole number; null where none does. */
function commonScale(value: Float64Array): number | null {
  let decimals = 0;
  for (let i = 0; i < value.length; i++) {
    const v = value[i] as number;
    if (Number.isNaN(v)) continue;
    while (!isWholeAt(v, decimals)) if (++decimals > mostDecimals) return null;
  }
  // A later value may need more decimals than an earlier one survives.
  for (let i = 0; i < value.length; i++) {
    const v = value[i] as number;
    if (!Number.isNaN(v) && !isWholeAt(v, decimals)) return null;
  }
  return decimals;
}

function isWholeAt(v: number, decimals: number): boolean {
  const scale = 10 ** decimals;
  const whole = Math.round(v * scale);
  return Math.abs(whole) < largestWhole && Object.is(whole / scale, v);
}

function writeTimes(writer: ByteWriter, time: Float64Array): void {
  let former = 0;
  let step = 0;
  for (let i = 0; i < time.length; i++) {
    const ms = Math.round((time[i] as number) * 1000);
    const difference = ms - former;
    writer.signed(difference - step);
    step = i === 0 ? 0 : difference;
    former = ms;
  }
}

function readTimes(reader: ByteReader, time: Float64Array, at: number, count: number): void {
  let former = 0;
  let step = 0;
  for (let i = 0; i < count; i++) {
    const difference = reader.signed() + step;
    former += difference;
    step = i === 0 ? 0 : difference;
    time[at + i] = former / 1000;
  }
}

function writeWhole(writer: ByteWriter, value: Float64Array, decimals: number): void {
  writer.byte(decimals);
  const scale = 10 ** decimals;
  let former = 0;
  for (let i = 0; i < value.length; i++) {
    const v = value[i] as number;
    if (Number.isNaN(v)) {
      writer.unsigned(absent);
      continue;
    }
    const whole = Math.round(v * scale);
    writer.signed(whole - former);
    former = whole;
  }
}

function readWhole(reader: ByteReader, value: Float64Array, at: number, count: number): void {
  const scale = 10 ** reader.byte();
  let former = 0;
  for (let i = 0; i < count; i++) {
    const code = reader.unsigned();
    if (code === absent) {
      value[at + i] = NaN;
      continue;
    }
    former += code % 2 === 0 ? code / 2 : -(code + 1) / 2;
    value[at + i] = former / scale;
  }
}

/** Lengths of runs, good ones first. */
function writeRuns(writer: ByteWriter, good: Uint8Array): void {
  let state = 1;
  let length = 0;
  for (const g of good) {
    if (g === state) {
      length += 1;
      continue;
    }
    writer.unsigned(length);
    state = g;
    length = 1;
  }
  writer.unsigned(length);
}

function readRuns(reader: ByteReader, good: Uint8Array, at: number, count: number): void {
  let state = 1;
  for (let i = 0; i < count;) {
    const length = reader.unsigned();
    good.fill(state, at + i, at + i + length);
    i += length;
    state = 1 - state;
  }
}

class ByteWriter {
  private readonly buffer: Uint8Array;
  private readonly view: DataView;
  private length = 0;

  constructor(capacity: number) {
    this.buffer = new Uint8Array(capacity);
    this.view = new DataView(this.buffer.buffer);
  }

  byte(value: number): void {
    this.buffer[this.length++] = value;
  }

  double(value: number): void {
    this.view.setFloat64(this.length, value, true);
    this.length += 8;
  }

  unsigned(value: number): void {
    let rest = value;
    while (rest >= 128) {
      this.buffer[this.length++] = (rest % 128) + 128;
      rest = Math.floor(rest / 128);
    }
    this.buffer[this.length++] = rest;
  }

  signed(value: number): void {
    this.unsigned(value >= 0 ? 2 * value : -2 * value - 1);
  }

  bytes(): Uint8Array {
    return this.buffer.slice(0, this.length);
  }
}

class ByteReader {
  private readonly view: DataView;
  private at = 0;

  constructor(private readonly buffer: Uint8Array) {
    this.view = new DataView(buffer.buffer, buffer.byteOffset, buffer.byteLength);
  }

  byte(): number {
    return this.buffer[this.at++] as number;
  }

  double(): number {
    const value = this.view.getFloat64(this.at, true);
    this.at += 8;
    return value;
  }

  unsigned(): number {
    let byte = this.buffer[this.at++] as number;
    if (byte < 128) return byte;
    let value = byte - 128;
    let weight = 128;
    do {
      byte = this.buffer[this.at++] as number;
      value += (byte % 128) * weight;
      weight *= 128;
    } while (byte >= 128);
    return value;
  }

  signed(): number {
    const code = this.unsigned();
    return code % 2 === 0 ? code / 2 : -(code + 1) / 2;
  }
}
