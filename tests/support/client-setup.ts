import '@testing-library/jest-dom/vitest';
import { cleanup } from '@testing-library/react';
import { afterEach, beforeEach } from 'vitest';

/** jsdom lays nothing out; charts and virtual rows ask for a size and would draw nothing at zero. */
const SIZE = { width: 800, height: 400 };

class SizedResizeObserver implements ResizeObserver {
  readonly #report: ResizeObserverCallback;

  constructor(report: ResizeObserverCallback) {
    this.#report = report;
  }

  observe(target: Element): void {
    const box = [{ inlineSize: SIZE.width, blockSize: SIZE.height }];
    const contentRect = DOMRect.fromRect(SIZE);
    this.#report(
      [{ target, contentRect, borderBoxSize: box, contentBoxSize: box, devicePixelContentBoxSize: box }],
      this,
    );
  }

  unobserve(): void {}

  disconnect(): void {}
}

globalThis.ResizeObserver = SizedResizeObserver;

// A warning of React or of the browser is a fault of ours. A test that expects one spies on console itself.
let complaints: string[] = [];

beforeEach(() => {
  complaints = [];
  const note = (...parts: unknown[]) => complaints.push(parts.map(String).join(' '));
  console.error = note;
  console.warn = note;
});

afterEach(() => {
  cleanup();
  if (complaints.length > 0) throw new Error(`console.error or console.warn:\n${complaints.join('\n')}`);
});
