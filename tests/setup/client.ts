import '@testing-library/jest-dom/vitest';
import { cleanup } from '@testing-library/react';
import { afterEach, beforeEach } from 'vitest';
import { startConsoleWatch, stopConsoleWatch } from '../support/console-watch.ts';

beforeEach(() => {
  startConsoleWatch();
});

afterEach(() => {
  cleanup();
  stopConsoleWatch();
});

// jsdom lacks these; components from radix-ui and react-dropzone ask for them.
class QuietObserver {
  observe(): void {}
  unobserve(): void {}
  disconnect(): void {}
}
const missing = {
  ResizeObserver: QuietObserver,
  IntersectionObserver: QuietObserver,
};
for (const [name, value] of Object.entries(missing)) {
  if (!(name in globalThis)) Object.defineProperty(globalThis, name, { value, writable: true });
}
if (!('matchMedia' in window)) {
  Object.defineProperty(window, 'matchMedia', {
    writable: true,
    value: (query: string) => ({
      matches: false,
      media: query,
      addEventListener: () => {},
      removeEventListener: () => {},
      addListener: () => {},
      removeListener: () => {},
      dispatchEvent: () => false,
    }),
  });
}
Element.prototype.scrollIntoView ??= () => {};
Element.prototype.hasPointerCapture ??= () => false;
Element.prototype.setPointerCapture ??= () => {};
Element.prototype.releasePointerCapture ??= () => {};
