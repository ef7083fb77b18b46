import { fork } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { type Family } from './family.js';
import { type ValveResult } from './valve-result.js';

/**
 * Runs every family over its seeds in processes of their own. The order in which valves finish changes no result.
 *
 * @param done called when a family's last valve is back, with its results in the order of seeds
 */
export async function runFamilies(
  families: readonly Family[],
  { seeds, jobs }: { seeds: number; jobs: number },
  done: (family: Family, results: readonly ValveResult[]) => void,
): Promise<ValveResult[]> {
  const waiting = families.flatMap((family) =>
    Array.from({ length: seeds }, (_, i) => ({ name: family.name, seed: i + 1 })),
  );
  const results: ValveResult[] = [];
  const byFamily = new Map(families.map((family) => [family.name, { family, results: [] as ValveResult[] }]));
  const take = (result: ValveResult) => {
    results.push(result);
    const own = byFamily.get(result.family);
    own?.results.push(result);
    if (own?.results.length === seeds)
      done(
        own.family,
        own.results.sort((a, b) => a.seed - b.seed),
      );
  };
  const work = () =>
    new Promise<void>((resolve, reject) => {
      // processes, not threads: the TypeScript loader of this one is handed on to them
      const worker = fork(fileURLToPath(new URL('./worker.ts', import.meta.url)), {
        serialization: 'advanced',
      });
      const next = () => {
        const task = waiting.shift();
        if (task) worker.send(task);
        else worker.disconnect();
      };
      worker.on('message', (result: ValveResult) => {
        take(result);
        next();
      });
      worker.on('error', reject);
      worker.on('exit', (code) =>
        code === 0 ? resolve() : reject(new Error(`A worker ended with ${String(code)}.`)),
      );
      next();
    });
  await Promise.all(Array.from({ length: jobs }, work));
  return results;
}
