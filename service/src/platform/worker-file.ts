import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

/**
 * Address of a compiled worker file. Worker threads run plain JavaScript: where the caller runs from the sources,
 * as tests do, the worker comes from the last build.
 *
 * @param name path below `src` without ending, such as `runs/assess.worker`
 */
export function workerFile(name: string): string {
  const here = new URL(`../${name}.js`, import.meta.url);
  return existsSync(fileURLToPath(here)) ? here.href : new URL(`../../dist/${name}.js`, import.meta.url).href;
}
