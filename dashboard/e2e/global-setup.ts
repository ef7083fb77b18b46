import { type TestProject } from 'vitest/node';
import { startPlant } from './plant';

/** One service with the demo plant for all browser tests: bringing it in takes half a minute. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const plant = await startPlant();
  project.provide('url', plant.url);
  return () => plant.stop();
}

declare module 'vitest' {
  export interface ProvidedContext {
    url: string;
  }
}
