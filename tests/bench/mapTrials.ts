/** npm run build && npm run bench -- mapTrials
 *  Opens the plan workspace in Chromium with 2,000 trials on one map and with the same map without them, and prints how long the page
 *  takes from an input to the frame that shows it, while the map is panned, zoomed, pointed over and brushed. Nothing is asserted: the
 *  machine may be busy. `MAP_TRIALS=500` for fewer, `CLIENT_FOLDER=…` for a client built elsewhere. */
import type { CDPSession, Page } from "playwright-core";
import { setPreferences } from "../../server/features/members/service";
import { benchMember, startBenchApp } from "./browser/app";
import { fillTrials } from "./fill/trials";
import { table } from "./rivals/measure";

const wanted = Number(process.env.MAP_TRIALS ?? 2000);

/** The part of the page's window that the measurement needs. */
interface Timed {
  waits: number[];
}

/** In the page: from the time stamp of every input to the end of the task after the next frame. */
function watch(): void {
  const waits: number[] = [];
  (window as unknown as Timed).waits = waits;
  const channel = new MessageChannel();
  const after: (() => void)[] = [];
  channel.port1.onmessage = () => after.shift()?.();
  for (const kind of ["pointermove", "wheel", "pointerup"])
    window.addEventListener(
      kind,
      (event) =>
        requestAnimationFrame(() => {
          after.push(() => waits.push(performance.now() - event.timeStamp));
          channel.port2.postMessage(null);
        }),
      { capture: true, passive: true },
    );
}

const taken = (page: Page): Promise<number[]> => page.evaluate(() => (window as unknown as Timed).waits.splice(0));

const quantile = (list: readonly number[], q: number): number =>
  [...list].sort((a, b) => a - b)[Math.min(list.length - 1, Math.floor(q * list.length))] ?? Number.NaN;

type Gesture = (page: Page, box: { x: number; y: number; width: number; height: number }) => Promise<void>;

const gestures: Record<string, Gesture> = {
  pan: async (page, { x, y }) => {
    // Two zooms first: a whole frame has nowhere to go.
    await page.mouse.move(x + 300, y + 200);
    await page.mouse.wheel(0, -240);
    await page.waitForTimeout(600);
    await taken(page);
    // The ends of an axis pan it; so does the map itself with the modifier of the chart.
    for (let i = 0; i < 6; i += 1) {
      await page.mouse.move(x + 300, y + 528);
      await page.mouse.down();
      for (let k = 1; k <= 12; k += 1) await page.mouse.move(x + 300 + (i % 2 ? -8 : 8) * k, y + 528);
      await page.mouse.up();
      await page.waitForTimeout(250);
    }
  },
  zoom: async (page, { x, y }) => {
    await page.mouse.move(x + 320, y + 260);
    for (let i = 0; i < 24; i += 1) {
      await page.mouse.wheel(0, i % 8 < 4 ? -120 : 120);
      await page.waitForTimeout(60);
    }
    await page.waitForTimeout(500);
  },
  point: async (page, { x, y }) => {
    for (let i = 0; i < 120; i += 1) await page.mouse.move(x + 120 + 3 * i, y + 160 + 120 * Math.abs(Math.sin(i / 9)));
  },
  brush: async (page, { x, y }) => {
    await page.keyboard.down("Shift");
    for (let i = 0; i < 5; i += 1) {
      await page.mouse.move(x + 140, y + 90);
      await page.mouse.down();
      for (let k = 1; k <= 20; k += 1) await page.mouse.move(x + 140 + 14 * k, y + 90 + 14 * k);
      await page.mouse.up();
      await page.waitForTimeout(80);
    }
    await page.keyboard.up("Shift");
  },
};

interface Found {
  /** ms from each input to its frame */
  waits: number[];
  /** ms the page's main thread worked, on the processor */
  work: number;
}

/** What the main thread has worked since it began, in s of processor time: other work on the machine does not count. */
async function workedBy(cdp: CDPSession): Promise<number> {
  const { metrics } = await cdp.send("Performance.getMetrics");
  return metrics.find((m) => m.name === "TaskDuration")?.value ?? Number.NaN;
}

async function measured(page: Page, url: string): Promise<Map<string, Found>> {
  const cdp = await page.context().newCDPSession(page);
  await cdp.send("Performance.enable", { timeDomain: "threadTicks" });
  await page.goto(url);
  const map = page.getByTestId("window-map");
  await map.waitFor();
  await page.waitForFunction(() => document.querySelector("[data-drawn]") !== null);
  await page.waitForTimeout(2500);
  const tab = page.getByRole("tab", { name: /^Trials/ });
  if ((await tab.count()) > 0) await tab.click();
  await page.waitForTimeout(500);
  await page.evaluate(watch);
  const found = new Map<string, Found>();
  for (const [name, gesture] of Object.entries(gestures)) {
    const box = (await map.boundingBox())!;
    await taken(page);
    const before = await workedBy(cdp);
    await gesture(page, box);
    const work = 1000 * ((await workedBy(cdp)) - before);
    found.set(name, { waits: await taken(page), work });
    await page.mouse.move(2, 2);
    await page
      .getByRole("button", { name: "whole frame" })
      .click({ timeout: 1000 })
      .catch(() => undefined);
    await page.waitForTimeout(600);
  }
  return found;
}

async function main(): Promise<void> {
  let planId = "";
  const app = await startBenchApp(({ open, chemistry }) => {
    // About half of the demo's trials lie on the plan that is opened.
    ({ planId } = fillTrials(open, chemistry, Math.ceil(wanted * 2.06)));
  });
  const runs: { trials: number; found: Map<string, Found> }[] = [];
  for (const trials of [false, true]) {
    setPreferences(app.open.db, benchMember, { layers: { trials } });
    const context = await app.signedIn();
    const page = await context.newPage();
    const found = await measured(page, `/plans/${planId}`);
    const shown = await page.getByRole("tab", { name: /^Trials/ }).allTextContents();
    runs.push({ trials: Number(/\d+/.exec(shown[0] ?? "")?.[0] ?? 0), found });
    await context.close();
  }
  await app.end();

  const [without, withThem] = runs as [(typeof runs)[0], (typeof runs)[0]];
  console.log(
    `${withThem.trials} trials on the map against none, one run after the other. Wait: ms from an input to its frame, on the wall.\n` +
      "Work: ms of processor time of the page's main thread for each input; on a machine with other work that is the number to trust.\n",
  );
  table(
    [
      "gesture",
      "inputs",
      "wait p50",
      "wait p95",
      "wait p50, none",
      "wait p95, none",
      "work",
      "work, none",
      "work ratio",
    ],
    Object.keys(gestures).map((gesture) => {
      const none = { waits: [], work: Number.NaN };
      const [a, b] = [without.found.get(gesture) ?? none, withThem.found.get(gesture) ?? none];
      const each = ({ waits, work }: Found) => work / waits.length;
      return [
        gesture,
        String(b.waits.length),
        ...[b, a].flatMap(({ waits }) => [quantile(waits, 0.5).toFixed(0), quantile(waits, 0.95).toFixed(0)]),
        each(b).toFixed(1),
        each(a).toFixed(1),
        (each(b) / each(a)).toFixed(2),
      ];
    }),
  );
}

await main();
