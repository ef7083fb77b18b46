import '@testing-library/jest-dom/vitest';
import { cleanup, configure } from '@testing-library/react';
import { afterAll, afterEach, beforeAll } from 'vitest';
import { endSession } from './lib/session';
import { queryClient } from './lib/query-client';
import { plantServer } from './test-plant';

// generous, so that a busy machine does not fail a test that only waits
configure({ asyncUtilTimeout: 6_000 });

beforeAll(() => plantServer.listen({ onUnhandledRequest: 'error' }));
afterEach(() => {
  cleanup();
  plantServer.resetHandlers();
  queryClient.clear();
  endSession();
});
afterAll(() => plantServer.close());

// jsdom has neither of the two; components only need them to exist.
const wideAndLight = (media: string): MediaQueryList => ({
  matches: false,
  media,
  onchange: null,
  addEventListener: () => undefined,
  removeEventListener: () => undefined,
  addListener: () => undefined,
  removeListener: () => undefined,
  dispatchEvent: () => false,
});
Object.defineProperty(window, 'matchMedia', { value: wideAndLight, writable: true });
window.scrollTo = () => undefined;
globalThis.ResizeObserver ??= class {
  observe() {}
  unobserve() {}
  disconnect() {}
};
