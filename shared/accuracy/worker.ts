import { families } from './families.js';
import { valveResult } from './valve-result.js';

/** One valve a message: the family's name and the seed come in, its result goes out. */
process.on('message', ({ name, seed }: { name: string; seed: number }) => {
  const family = families.find((one) => one.name === name);
  if (family) process.send?.(valveResult(family, seed));
});
