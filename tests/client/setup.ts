import { cleanup } from "@testing-library/react";
import { afterEach } from "vitest";

// jsdom lays nothing out; what the components ask of a browser's layout is answered with nothing.
class NoObserver {
  observe() {}
  unobserve() {}
  disconnect() {}
}
globalThis.ResizeObserver ??= NoObserver as unknown as typeof ResizeObserver;
Element.prototype.scrollIntoView ??= () => undefined;
Element.prototype.hasPointerCapture ??= () => false;
Element.prototype.setPointerCapture ??= () => undefined;
Element.prototype.releasePointerCapture ??= () => undefined;
globalThis.CSS ??= { escape: (text: string) => text.replace(/["\\]/g, "\\$&") } as unknown as typeof CSS;

afterEach(cleanup);
