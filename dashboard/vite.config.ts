import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const results = process.env.TEST_RESULTS;

export default defineConfig({
  plugins: [react()],
  server: { port: 5173, proxy: { '/api': `http://localhost:${process.env.PORT ?? '4600'}` } },
  build: { target: 'es2023', reportCompressedSize: false },
  test: {
    environment: 'jsdom',
    include: ['src/**/*.test.{ts,tsx}'],
    setupFiles: ['src/test-setup.ts'],
    css: false,
    restoreMocks: true,
    testTimeout: 20_000,
    reporters: results ? ['default', ['json', { outputFile: `${results}/dashboard.json` }]] : ['default'],
  },
});
