import { cleanup } from "@testing-library/react";
import { afterEach, vi } from "vitest";

// jsdom lays nothing out; what the components ask of a browser's layout is answered with nothing.
class NoObserver {
  observe() {}
  unobserve() {}
  disconnect() {}
}
globalThis.ResizeObserver ??= NoObserver as unknown as typeof ResizeObserver;
globalThis.CSS ??= { escape: (text: string) => text.replace(/["\\]/g, "\\$&") } as unknown as typeof CSS;

const missing = {
  scrollIntoView: () => undefined,
  hasPointerCapture: () => false,
  setPointerCapture: () => undefined,
  releasePointerCapture: () => undefined,
};
for (const [name, answer] of Object.entries(missing)) {
  if (!(name in Element.prototype)) Object.defineProperty(Element.prototype, name, { value: answer });
}

// Files share a worker: nothing of a test is left to the next.
afterEach(() => {
  cleanup();
  localStorage.clear();
  vi.useRealTimers();
  vi.unstubAllGlobals();
});
