import { chromium, type Browser, type BrowserContextOptions, type Page } from "playwright-core";
import { afterAll, expect, inject, onTestFinished } from "vitest";
import { findChromium } from "../../server/tools/chromium.mjs";
import { demoAccounts, demoPassword } from "../../server/demo/accounts";
import type { MemberRole } from "../../shared/schemas/member";

/** Without these the browser looks for its maker's servers. */
const quiet = [
  "--disable-gpu",
  "--disable-quic",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];

let browser: Promise<Browser> | undefined;
function launched(): Promise<Browser> {
  const executablePath = findChromium();
  if (executablePath === undefined) {
    throw new Error("No Chromium: install one (Debian: apt-get install chromium) or name it in CHROMIUM_PATH.");
  }
  return (browser ??= chromium.launch({ executablePath, args: quiet }));
}
afterAll(async () => {
  await (await browser)?.close();
  browser = undefined;
});

export interface OpenPage {
  page: Page;
  baseUrl: string;
  /** what the console complained of, and requests that failed, so far; the test fails at its end if any is left */
  complaints: string[];
}

/** Refusals that a test provokes show in the console as well: `expected` names the status codes that are no complaint. */
export interface PageOptions extends BrowserContextOptions {
  expected?: number[];
}

/** `path`: where to start; the start page unless given. */
export interface SignedInOptions extends PageOptions {
  path?: string;
}

/** A page of a fresh browser context (1280x800 unless given), not signed in. */
export async function openPage({ expected = [], ...options }: PageOptions = {}): Promise<OpenPage> {
  const baseUrl = inject("baseUrl");
  const context = await (
    await launched()
  ).newContext({ baseURL: baseUrl, viewport: { width: 1280, height: 800 }, ...options });
  const page = await context.newPage();
  const complaints: string[] = [];
  const provoked = (text: string) => expected.some((status) => text.includes(`status of ${status}`));
  page.on("console", (message) => {
    const bad = message.type() === "error" || message.type() === "warning";
    if (bad && !provoked(message.text()))
      complaints.push(`${message.type()}: ${message.text()} ${message.location().url}`);
  });
  page.on("pageerror", (error) => complaints.push(`uncaught: ${error.message}`));
  page.on("requestfailed", (request) => {
    const reason = request.failure()?.errorText ?? "";
    // A page that moves on drops what it had asked for.
    if (reason !== "net::ERR_ABORTED") complaints.push(`request failed: ${request.url()} ${reason}`);
  });
  onTestFinished(async () => {
    await context.close();
    expect(complaints, "the console").toEqual([]);
  });
  return { page, baseUrl, complaints };
}

/** A page signed in with the demo account of a role, whose preferences are those of a new member. */
export async function openPageAs(
  role: MemberRole,
  { path = "/", ...options }: SignedInOptions = {},
): Promise<OpenPage> {
  const opened = await openPage(options);
  const { request } = opened.page.context();
  const email = demoAccounts.find((account) => account.role === role)?.email;
  const answer = await request.post("/api/session", { data: { email, password: demoPassword } });
  expect(answer.status()).toBe(200);
  expect((await request.put("/api/me/preferences", { data: {} })).status()).toBe(200);
  await opened.page.goto(path);
  return opened;
}
