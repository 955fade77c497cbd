import type { BenchApp } from "./app";
import { quantile, workedBy } from "./frames";

export interface Openings {
  /** median and worst, as text */
  ready: [string, string];
  work: [string, string];
  shift: [string, string];
  worstShift: number;
}

/** Opens a page some times, each in a fresh context with nothing in its cache, and measures until the map stands with its set point. */
export async function openingsOf(app: BenchApp, path: string, times: number): Promise<Openings> {
  const ready: number[] = [];
  const work: number[] = [];
  const shift: number[] = [];
  for (let i = 0; i < times; i += 1) {
    const context = await app.signedIn();
    const page = await context.newPage();
    const cdp = await context.newCDPSession(page);
    await cdp.send("Performance.enable", { timeDomain: "threadTicks" });
    await page.addInitScript(() => {
      const seen = window as unknown as { shift: number; readyAt: number };
      seen.shift = 0;
      seen.readyAt = Number.NaN;
      new PerformanceObserver((list) => {
        for (const entry of list.getEntries() as (PerformanceEntry & { value: number; hadRecentInput: boolean })[])
          if (!entry.hadRecentInput) seen.shift += entry.value;
      }).observe({ type: "layout-shift", buffered: true });
      const look = () => {
        if (document.querySelector("[data-drawn] [data-axes]") && document.querySelector("[data-handle]"))
          seen.readyAt = performance.now();
        else requestAnimationFrame(look);
      };
      requestAnimationFrame(look);
    });
    await page.goto(path);
    await page.waitForFunction(() => (window as unknown as { readyAt: number }).readyAt > 0, null, { timeout: 60_000 });
    work.push(await workedBy(cdp));
    // what still comes in late may push as well
    await page.waitForTimeout(3000);
    const seen = await page.evaluate(() => {
      const { shift, readyAt } = window as unknown as { shift: number; readyAt: number };
      return { shift, readyAt };
    });
    ready.push(seen.readyAt);
    shift.push(seen.shift);
    await context.close();
  }
  const both = (list: readonly number[], digits: number): [string, string] => [
    quantile(list, 0.5).toFixed(digits),
    Math.max(...list).toFixed(digits),
  ];
  return { ready: both(ready, 0), work: both(work, 0), shift: both(shift, 4), worstShift: Math.max(...shift) };
}
