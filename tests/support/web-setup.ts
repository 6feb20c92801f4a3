import '@testing-library/jest-dom/vitest';
import { cleanup } from '@testing-library/react';
import { afterEach } from 'vitest';

/** What jsdom lacks and the screens need: sizes, observers, media queries. Every element is 1200 by 800, every symbol 100 by 60. */

afterEach(() => {
  cleanup();
  localStorage.clear();
});

class InstantResizeObserver implements ResizeObserver {
  constructor(private readonly callback: ResizeObserverCallback) {}
  observe(target: Element): void {
    this.callback([{ target, contentRect: target.getBoundingClientRect() } as unknown as ResizeObserverEntry], this);
  }
  unobserve(): void {}
  disconnect(): void {}
}

class FlatMatrix {
  readonly m22: number;
  constructor(transform?: string) {
    this.m22 = Number(/scale\(([0-9.]+)\)/.exec(transform ?? '')?.[1] ?? 1);
  }
}

globalThis.ResizeObserver = InstantResizeObserver;
globalThis.DOMMatrixReadOnly = FlatMatrix as unknown as typeof DOMMatrixReadOnly;

Object.defineProperties(HTMLElement.prototype, {
  offsetWidth: { configurable: true, get: () => 100 },
  offsetHeight: { configurable: true, get: () => 60 },
  clientWidth: { configurable: true, get: () => 1200 },
  clientHeight: { configurable: true, get: () => 800 },
});
(SVGElement.prototype as unknown as { getBBox: () => DOMRect }).getBBox = () => ({ x: 0, y: 0, width: 100, height: 60 }) as DOMRect;

window.matchMedia = (query: string) =>
  ({
    matches: query.includes('min-width'),
    media: query,
    onchange: null,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
    addListener: () => undefined,
    removeListener: () => undefined,
    dispatchEvent: () => false,
  }) as MediaQueryList;
