import type { CDPSession, Page } from "playwright-core";

/** What one input led to, read in the task after the frame that shows it. */
export interface Frame {
  /** ms from the input's own time stamp to the end of that task */
  wait: number;
  /** which solution the figure shows: corners of fields' boundaries and windows, as one text */
  polygons: string;
  /** where the figure has the set point, and where its handle lies over it, px */
  mark: [number, number] | null;
  handle: [number, number] | null;
  /** "pH 5.10 0.58 V": right side and read-out */
  answer: string;
  readOut: string;
  /** limits with their distances */
  limits: string;
}

/** The part of the page's window that the measurement needs. */
interface Timed {
  frames: Frame[];
  mode: "drag" | "redraw";
  /** when the input came that no frame has shown yet */
  since: number | null;
  last: Frame;
  overMap: boolean;
  look: () => void;
}

/** In the page: from the time stamp of every pointer move to the end of the task after the frame in which polygons, set point, its handle
 *  and the read-out had all followed.
 *  In the mode "redraw" every shape of the same figure is drawn again at every move, its data unchanged, and nothing else is done. */
function watch(): void {
  const timed = window as unknown as Timed;
  const holder = document.querySelector("[data-testid=window-map]") as HTMLElement;
  const attributes = ["d", "x", "y", "width", "height", "x1", "x2", "y1", "y2", "cx", "cy", "transform"];
  const redraw = () => {
    for (const shape of holder.querySelectorAll("svg :is(path, rect, line, circle, text)"))
      for (const name of attributes) {
        const value = shape.getAttribute(name);
        if (value === null) continue;
        // set to what it was, an attribute may be passed over
        shape.removeAttribute(name);
        shape.setAttribute(name, value);
      }
  };
  timed.frames = [];
  timed.mode = "drag";
  const text = (selector: string) =>
    document.querySelector<HTMLElement>(selector)?.innerText.replace(/\s+/g, " ") ?? "";
  const seen = (wait: number): Frame => {
    const mark = document.querySelector("[data-trace=set-point] circle");
    const grip = document.querySelector<HTMLElement>("[data-handle]");
    const paths = ["fields", "open", "outline", "shut"].flatMap((of) => [
      ...document.querySelectorAll(`[data-trace^=${of}-] path`),
    ]);
    return {
      wait,
      polygons: paths.map((path) => path.getAttribute("d")).join(),
      mark: mark ? [Number(mark.getAttribute("cx")), Number(mark.getAttribute("cy"))] : null,
      handle: grip ? [parseFloat(grip.style.left), parseFloat(grip.style.top)] : null,
      answer: text("[data-testid=set-point]"),
      readOut: text("[data-testid=read-out] > span"),
      // what would move a limit is worked out after the hand
      limits: Array.from(
        document.querySelectorAll<HTMLElement>("section[aria-label^='What shuts'] li > div:first-child"),
        (line) => line.innerText,
      ).join(),
    };
  };
  const channel = new MessageChannel();
  const after: (() => void)[] = [];
  channel.port1.onmessage = () => after.shift()?.();
  timed.since = null;
  timed.last = seen(0);
  timed.look = () => {
    if (timed.since === null) return;
    const now = seen(performance.now() - timed.since);
    const { mark, handle, answer, readOut } = now;
    const moved = now.polygons !== timed.last.polygons || String(mark) !== String(timed.last.mark);
    // neither stands where no window is open
    const together =
      mark === null || handle === null ? mark === handle : Math.hypot(mark[0] - handle[0], mark[1] - handle[1]) < 1.5;
    // over the map the read-out speaks of the pointer
    const read = timed.overMap ? readOut !== timed.last.readOut : readOut.startsWith(answer);
    if (timed.mode === "drag" && !(moved && together && read)) return;
    timed.since = null;
    timed.last = now;
    timed.frames.push(now);
  };
  // In the task after a frame: what is seen then is what was painted.
  const drawn = () =>
    requestAnimationFrame(() => {
      after.push(timed.look);
      channel.port2.postMessage(null);
    });
  new MutationObserver(drawn).observe(holder, { attributes: true, attributeFilter: ["data-drawn"] });
  window.addEventListener(
    "pointermove",
    (event) => {
      timed.since ??= event.timeStamp;
      timed.overMap = event.target instanceof Element && event.target.closest("[data-testid=window-map]") !== null;
      if (timed.mode === "drag") return;
      redraw();
      drawn();
    },
    { capture: true, passive: true },
  );
}

export const watchFrames = (page: Page): Promise<void> => page.evaluate(watch);

export const setMode = (page: Page, mode: Timed["mode"]): Promise<void> =>
  page.evaluate((m) => void ((window as unknown as Timed).mode = m), mode);

export const takeFrames = (page: Page): Promise<Frame[]> =>
  page.evaluate(() => (window as unknown as Timed).frames.splice(0));

/** Waits until the last input is on the screen, at most 400 ms. An input that changes nothing draws nothing.
 *  @returns  "shown", "nothing" changed, or "late": something changed and not all followed */
export async function settled(page: Page, count: number): Promise<"shown" | "nothing" | "late"> {
  const shown = await page
    .waitForFunction((n) => (window as unknown as Timed).frames.length >= n, count, { timeout: 400, polling: 4 })
    .then(
      () => true,
      () => false,
    );
  if (shown) return "shown";
  return page.evaluate(() => {
    const timed = window as unknown as Timed;
    const before = JSON.stringify({ ...timed.last, wait: 0, readOut: "" });
    timed.since ??= 0;
    const kept = timed.frames.length;
    timed.mode = "redraw";
    timed.look();
    timed.mode = "drag";
    timed.frames.length = kept;
    return JSON.stringify({ ...timed.last, wait: 0, readOut: "" }) === before ? "nothing" : "late";
  });
}

/** What the main thread has worked since it began, in ms of processor time: other work on the machine does not count. */
export async function workedBy(cdp: CDPSession): Promise<number> {
  const { metrics } = await cdp.send("Performance.getMetrics");
  return 1000 * (metrics.find((m) => m.name === "TaskDuration")?.value ?? Number.NaN);
}

export const quantile = (list: readonly number[], q: number): number =>
  [...list].sort((a, b) => a - b)[Math.min(list.length - 1, Math.floor(q * list.length))] ?? Number.NaN;
