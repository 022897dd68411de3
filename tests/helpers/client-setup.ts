import '@testing-library/jest-dom/vitest';

import { cleanup, configure } from '@testing-library/react';
import { afterEach, vi } from 'vitest';

// A page's code is fetched when it is first opened, which takes a while on a small machine.
configure({ asyncUtilTimeout: 8_000 });
vi.setConfig({ testTimeout: 20_000 });

// What jsdom lacks and the components need: media queries, size observers, scrolling.
if (typeof window !== 'undefined') {
  window.matchMedia ??= (query: string) =>
    ({
      matches: false,
      media: query,
      onchange: null,
      addEventListener: () => undefined,
      removeEventListener: () => undefined,
      addListener: () => undefined,
      removeListener: () => undefined,
      dispatchEvent: () => false,
    }) satisfies MediaQueryList;

  window.ResizeObserver ??= class {
    observe(): void {}
    unobserve(): void {}
    disconnect(): void {}
  };

  window.scrollTo = () => undefined;
  Element.prototype.scrollIntoView ??= () => undefined;
  Element.prototype.getAnimations ??= () => [];
}

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  localStorage.clear();
});
