import busboy from 'busboy';
import { type Request } from 'express';
import { type Readable } from 'node:stream';
import { Problem } from '../platform/problem.js';

export interface Upload<T> {
  readonly name: string;
  readonly fields: ReadonlyMap<string, string>;
  readonly received: T;
}

/**
 * Reads one file and a few short fields from a multipart request as it streams in.
 *
 * @param receive takes the file's bytes; it is awaited, and what it throws is thrown
 * @throws Problem `invalid-input` for a request without exactly one file, `upload-cut` for one that breaks off
 */
export async function receiveUpload<T>(
  request: Request,
  receive: (bytes: Readable) => Promise<T>,
): Promise<Upload<T>> {
  const form = openForm(request);
  const fields = new Map<string, string>();
  let name = '';
  let receiving: Promise<T> | null = null;
  let refuse: (reason: unknown) => void = () => undefined;
  const refused = new Promise<never>((_, reject) => (refuse = reject));
  form.on('field', (field, value) => fields.set(field, value));
  form.on('file', (field, bytes, { filename }) => {
    if (receiving || field !== 'file') {
      bytes.resume();
      return;
    }
    // A part may come without a file name; the types do not say so.
    name = filename ?? '';
    receiving = receive(bytes);
    receiving.catch(refuse);
  });
  const cut = new Promise<never>((_, reject) => {
    const broken = () => {
      const problem = new Problem('upload-cut');
      form.destroy(problem);
      reject(problem);
    };
    request.once('aborted', broken);
    request.once('error', broken);
  });
  const parsed = new Promise<void>((resolve, reject) => {
    form.once('close', resolve);
    form.once('error', reject);
  });
  request.pipe(form);
  try {
    await Promise.race([parsed, cut, refused]);
  } catch (error) {
    // What still comes is let go: a client that is cut while it sends would not hear why.
    request.unpipe(form);
    request.resume();
    form.destroy();
    await settled(receiving);
    throw error instanceof Problem ? error : new Problem('upload-cut', null, [], { cause: error });
  }
  const started = receiving as Promise<T> | null;
  if (!started)
    throw new Problem('invalid-input', null, [
      { pointer: '/file', detail: 'Send one file in the field “file”.' },
    ]);
  return { name, fields, received: await started };
}

async function settled(work: Promise<unknown> | null): Promise<void> {
  await work?.catch(() => undefined);
}

function openForm(request: Request): busboy.Busboy {
  try {
    return busboy({
      headers: request.headers,
      defParamCharset: 'utf8',
      limits: { files: 1, fields: 10, fieldSize: 1_000, fieldNameSize: 100 },
    });
  } catch (cause) {
    throw new Problem(
      'invalid-input',
      null,
      [{ pointer: '/file', detail: 'Send the file as multipart/form-data in the field “file”.' }],
      { cause },
    );
  }
}
