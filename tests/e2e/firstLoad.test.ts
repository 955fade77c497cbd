import { statSync } from "node:fs";
import { join } from "node:path";
import type { Page } from "playwright-core";
import { expect, test } from "vitest";
import { projectRoot } from "../../server/root";
import { openPage, openPageAs } from "../support/browser";
import { WorkspaceScreen } from "./pages/workspace";

const LIMIT = 250_000;
/** Plotly, and what is of no use without it: the build names both. */
const plotChunk = /\/(plotly|map)-/;

/** Bytes a script takes on its way: the build makes a compressed copy of all but the smallest. */
function compressed(path: string): number {
  const file = join(projectRoot, "dist/client", path);
  return (statSync(`${file}.gz`, { throwIfNoEntry: false }) ?? statSync(file)).size;
}

/** Scripts that an address fetches, until the network rests and what is waited for stands. */
async function scriptsOf(page: Page, path: string, until: () => Promise<void> = async () => {}): Promise<string[]> {
  const scripts = new Set<string>();
  page.on("response", (response) => {
    const { pathname } = new URL(response.url());
    if (pathname.endsWith(".js")) scripts.add(pathname);
  });
  await page.goto(path, { waitUntil: "networkidle" });
  await until();
  await page.waitForLoadState("networkidle");
  return [...scripts];
}

const total = (scripts: readonly string[]) => scripts.reduce((sum, path) => sum + compressed(path), 0);

test("sign-in and plans fetch at most 250 kB of compressed JavaScript, and no plot", async () => {
  const { page } = await openPage({ cold: true });
  const signIn = await scriptsOf(page, "/");
  await page.getByRole("button", { name: "Sign in" }).waitFor();
  const { page: inside } = await openPageAs("metallurgist", { path: "about:blank", cold: true });
  const plans = await scriptsOf(inside, "/plans");
  await inside.getByRole("link", { name: "Zinc-dust purification" }).waitFor();
  for (const scripts of [signIn, plans]) {
    expect(scripts.filter((path) => plotChunk.test(path))).toEqual([]);
    expect(total(scripts)).toBeGreaterThan(50_000);
    expect(total(scripts)).toBeLessThanOrEqual(LIMIT);
  }
});

test("a plan opened by its address fetches at most 250 kB of compressed JavaScript beside the plot", async () => {
  const { page } = await openPageAs("metallurgist", { path: "about:blank", cold: true });
  const scripts = await scriptsOf(page, "/plans/demo-neutral-leach", () => new WorkspaceScreen(page).drawn());
  const plot = scripts.filter((path) => plotChunk.test(path));
  expect(total(plot)).toBeGreaterThan(400_000);
  expect(total(scripts) - total(plot)).toBeLessThanOrEqual(LIMIT);
});
