import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['src/**/*.test.ts'],
    testTimeout: 30_000,
    reporters: process.env.TEST_RESULTS ? ['default', 'json'] : ['default'],
    outputFile: process.env.TEST_RESULTS ? { json: `${process.env.TEST_RESULTS}/shared.json` } : undefined,
  },
});
