import { chromium, type Browser, type BrowserContextOptions, type Page } from "playwright-core";
import { afterAll, afterEach, beforeAll, expect, inject, onTestFinished } from "vitest";
import { demoAccounts, demoPassword } from "../../server/demo/accounts";
import type { MemberRole } from "../../shared/schemas/member";

/** The browser of all tests; a worker is connected to it once. */
let browser: Promise<Browser> | undefined;
const launched = () => (browser ??= chromium.connect(inject("chromium")));

/** Of the application that is this worker's own. */
const address = (): string => {
  const all = inject("baseUrls");
  const mine = all[Number(process.env.VITEST_POOL_ID) - 1];
  if (mine === undefined) throw new Error(`worker ${process.env.VITEST_POOL_ID} of ${all.length} has no application`);
  return mine;
};

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

async function opened({ expected = [], ...options }: PageOptions): Promise<OpenPage> {
  const baseUrl = address();
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
  return { page, baseUrl, complaints };
}

const quiet = ({ complaints }: OpenPage) => expect(complaints.join("\n"), "the console").toBe("");

/** A page of a fresh browser context (1280x800 unless given), not signed in. */
export async function openPage(options: PageOptions = {}): Promise<OpenPage> {
  const open = await opened(options);
  onTestFinished(async () => {
    await open.page.context().close();
    quiet(open);
  });
  return open;
}

/** Signs the page's browser in with the demo account of a role, whose preferences are then those of a new member. */
async function signIn({ page }: OpenPage, role: MemberRole): Promise<void> {
  const { request } = page.context();
  const email = demoAccounts.find((account) => account.role === role)?.email;
  const answer = await request.post("/api/session", { data: { email, password: demoPassword } });
  expect(answer.status()).toBe(200);
  expect((await request.put("/api/me/preferences", { data: {} })).status()).toBe(200);
}

/** A page signed in with the demo account of a role, whose preferences are those of a new member. */
export async function openPageAs(
  role: MemberRole,
  { path = "/", ...options }: SignedInOptions = {},
): Promise<OpenPage> {
  const open = await openPage(options);
  await signIn(open, role);
  await open.page.goto(path);
  return open;
}

/** One page for all tests of a file or of a describe: opening a plan takes longer than most tests of it. Each test leaves the plan as it
 *  found it, or says what the next one finds.
 *  @returns  the page, from the first test on */
export function sharedPageAs(role: MemberRole, { path = "/", ...options }: SignedInOptions = {}): () => OpenPage {
  let open: OpenPage | undefined;
  beforeAll(async () => {
    open = await opened(options);
    await signIn(open, role);
    await open.page.goto(path);
  });
  afterEach(() => {
    if (open) quiet({ ...open, complaints: open.complaints.splice(0) });
  });
  afterAll(() => open?.page.context().close());
  return () => {
    if (!open) throw new Error("The page opens before the first test, not earlier.");
    return open;
  };
}

/** Goes to an address as a link inside the app does: nothing is loaded anew, which takes a tenth of the time. What this browser kept of
 *  plans and records is dropped on the way, so that the screen there begins as the server has it. */
export async function turnTo(page: Page, path: string): Promise<void> {
  const go = (to: string) =>
    page.evaluate((to) => {
      window.history.pushState({ key: crypto.randomUUID(), idx: window.history.length }, "", to);
      window.dispatchEvent(new PopStateEvent("popstate", { state: window.history.state as unknown }));
    }, to);
  await go("/between-two-tests");
  await page.getByText("There is nothing at this address").waitFor();
  await page.evaluate(() => localStorage.clear());
  await go(path);
}
