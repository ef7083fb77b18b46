import { Inject, Injectable, type OnModuleInit } from '@nestjs/common';
import { createHash, randomUUID } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { mkdir, readdir, rename, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { Readable, Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { CONFIG, type Config } from '../platform/config.js';
import { Problem } from '../platform/problem.js';

/** What is known of a file once it is whole. */
export interface Received {
  readonly key: string;
  readonly size: number;
  readonly sha256: string;
}

/** Raw files in a folder beside the database. What breaks off on the way in is never seen under its name. */
@Injectable()
export class FileStore implements OnModuleInit {
  private readonly folder: string;

  constructor(@Inject(CONFIG) private readonly config: Pick<Config, 'dataDir' | 'maxUpload'>) {
    this.folder = join(config.dataDir, 'trend-files');
  }

  /** Makes the folder and removes what a killed service left half-received. */
  async onModuleInit(): Promise<void> {
    await mkdir(this.folder, { recursive: true, mode: 0o700 });
    for (const name of await readdir(this.folder))
      if (name.endsWith('.part')) await rm(join(this.folder, name), { force: true });
  }

  /**
   * Receives a stream of bytes as a file.
   *
   * @throws Problem `too-large` beyond the limit, `upload-cut` where the stream ends before its time; nothing is kept
   */
  async receive(bytes: Readable): Promise<Received> {
    const key = randomUUID();
    const part = join(this.folder, `${key}.part`);
    const hash = createHash('sha256');
    let size = 0;
    const { maxUpload } = this.config;
    const measure = new Transform({
      transform(chunk: Buffer, _encoding, done) {
        size += chunk.length;
        hash.update(chunk);
        if (size > maxUpload)
          done(
            new Problem('too-large', {
              text: `The file is larger than the ${Math.round(maxUpload / 1024 ** 2)} MB allowed here. Split the export and bring in the parts, or compress it with gzip.`,
            }),
          );
        else done(null, chunk);
      },
    });
    try {
      await pipeline(bytes, measure, createWriteStream(part, { mode: 0o600, flags: 'wx' }));
      await rename(part, this.path(key));
    } catch (error) {
      await rm(part, { force: true });
      throw error instanceof Problem ? error : new Problem('upload-cut', null, [], { cause: error });
    }
    return { key, size, sha256: hash.digest('hex') };
  }

  path(key: string): string {
    return join(this.folder, key);
  }

  async keepAs(key: string, name: string): Promise<void> {
    await rename(this.path(key), this.path(name));
  }

  async remove(key: string): Promise<void> {
    await rm(this.path(key), { force: true });
  }

  async exists(key: string): Promise<boolean> {
    return stat(this.path(key)).then(
      () => true,
      () => false,
    );
  }
}
