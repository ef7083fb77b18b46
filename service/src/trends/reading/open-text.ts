import { createReadStream } from 'node:fs';
import { stat } from 'node:fs/promises';
import { pipeline, type Readable, Transform, type TransformCallback } from 'node:stream';
import { createGunzip } from 'node:zlib';
import { Refusal } from './refusal.js';

/** How much a gzip may unpack to: trends shrink to a tenth or a twentieth, not to a thousandth. */
export interface GzipLimits {
  /** bytes unpacked, whatever the ratio */
  readonly most: number;
  readonly ratio: number;
  /** bytes unpacked before the ratio is looked at */
  readonly ratioFrom: number;
}

export const gzipLimits: GzipLimits = { most: 20 * 1024 ** 3, ratio: 200, ratioFrom: 16 * 1024 ** 2 };

export interface OpenText {
  /** UTF-8 bytes without a byte-order mark */
  readonly stream: Readable;
  /** share of the file read so far, 0 to 1 */
  progress(): number;
}

/**
 * Opens a trend file as a stream of text bytes: a gzip is unpacked as it is read, within limits. Bytes that are
 * no text end the stream with a Refusal.
 */
export async function openText(path: string, limits: GzipLimits = gzipLimits): Promise<OpenText> {
  const { size } = await stat(path);
  if (size === 0) throw Refusal.because('empty');
  const packed = await isGzip(path);
  const file = createReadStream(path, { highWaterMark: 1 << 18 });
  const stages: Transform[] = packed ? [createGunzip(), new UnpackLimit(() => file.bytesRead, limits)] : [];
  const stream = new PlainTextCheck();
  // An error of any stage ends the last stream with it; the reader of that stream hears of it there.
  pipeline([file, ...stages, stream], () => undefined);
  return { stream, progress: () => Math.min(1, file.bytesRead / size) };
}

async function isGzip(path: string): Promise<boolean> {
  for await (const chunk of createReadStream(path, { end: 1 })) {
    const bytes = chunk as Buffer;
    return bytes[0] === 0x1f && bytes[1] === 0x8b;
  }
  return false;
}

/** Stops a gzip that unpacks to far more than a trend would. */
class UnpackLimit extends Transform {
  private unpacked = 0;

  constructor(
    private readonly packedRead: () => number,
    private readonly limits: GzipLimits,
  ) {
    super();
  }

  override _transform(chunk: Buffer, _encoding: BufferEncoding, done: TransformCallback): void {
    this.unpacked += chunk.length;
    const { most, ratio, ratioFrom } = this.limits;
    const tooMuch =
      this.unpacked > most ||
      (this.unpacked > ratioFrom && this.unpacked > ratio * Math.max(1, this.packedRead()));
    if (tooMuch)
      done(Refusal.because('gzipBomb', `${Math.round(Math.min(most, this.unpacked) / 1024 ** 2)} MB`));
    else done(null, chunk);
  }
}

/** Drops a byte-order mark and refuses bytes that no text holds. */
class PlainTextCheck extends Transform {
  private first = true;
  private line = 1;

  override _transform(chunk: Buffer, _encoding: BufferEncoding, done: TransformCallback): void {
    let text = chunk;
    if (this.first) {
      this.first = false;
      if ((text[0] === 0xff && text[1] === 0xfe) || (text[0] === 0xfe && text[1] === 0xff))
        return done(Refusal.because('wideCharacters'));
      if (text[0] === 0xef && text[1] === 0xbb && text[2] === 0xbf) text = text.subarray(3);
    }
    const nul = text.indexOf(0);
    if (nul >= 0) return done(Refusal.because('notText', this.line + newlines(text.subarray(0, nul))));
    this.line += newlines(text);
    done(null, text);
  }
}

function newlines(bytes: Buffer): number {
  let count = 0;
  for (let at = bytes.indexOf(10); at >= 0; at = bytes.indexOf(10, at + 1)) count++;
  return count;
}

/** The error a broken stream ends with, as a Refusal where the file is to blame. */
export function asRefusal(error: unknown): unknown {
  if (error instanceof Refusal) return error;
  const { code } = error as { code?: unknown };
  if (typeof code === 'string' && (code.startsWith('Z_') || code === 'ERR_STREAM_PREMATURE_CLOSE'))
    return Refusal.because('gzipBroken');
  return error;
}
