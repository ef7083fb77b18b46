import { defineConfig } from 'vitest/config';

const results = process.env.TEST_RESULTS;

/** Browser tests: the real service and Debian's chromium, one file after the other because they share two cores. */
export default defineConfig({
  test: {
    environment: 'node',
    include: ['e2e/**/*.test.ts'],
    globalSetup: ['e2e/global-setup.ts'],
    testTimeout: 120_000,
    hookTimeout: 240_000,
    fileParallelism: false,
    reporters: results ? ['default', ['json', { outputFile: `${results}/e2e.json` }]] : ['default'],
  },
});
