import { chromium, type Browser, type ConsoleMessage, type Page, type Request } from "playwright-core";
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
export interface PageOptions {
  expected?: number[];
  viewport?: { width: number; height: number };
  /** a browser context of its own, with nothing in its cache, for what is fetched at first */
  cold?: boolean;
}

/** `path`: where to start; the start page unless given. */
export interface SignedInOptions extends PageOptions {
  path?: string;
}

/** Pages that no test has now. A renderer that has run the application's scripts opens a plan in a third of the time of a new one. */
const idle: Page[] = [];

/** Everything a site can leave in a browser goes, and the document with it: what is kept is the compiled code and the HTTP cache. */
async function emptied(page: Page): Promise<void> {
  await page.unrouteAll({ behavior: "ignoreErrors" });
  await page.goto("/api/health");
  await page.mouse.move(-9, -9);
  const context = page.context();
  await context.clearCookies();
  await page.evaluate(() => sessionStorage.clear());
  const devtools = await context.newCDPSession(page);
  await devtools.send("Storage.clearDataForOrigin", { origin: new URL(page.url()).origin, storageTypes: "all" });
  await devtools.send("Page.resetNavigationHistory");
  await devtools.detach();
}

async function freshPage(baseUrl: string): Promise<Page> {
  const context = await (await launched()).newContext({ baseURL: baseUrl });
  return context.newPage();
}

interface TakenPage extends OpenPage {
  /** Ends the test's hold of the page; one that stayed in order is there for another test. */
  giveBack: (inOrder: boolean) => Promise<void>;
}

async function opened({
  expected = [],
  viewport = { width: 1280, height: 800 },
  cold,
}: PageOptions): Promise<TakenPage> {
  const baseUrl = address();
  const page = (cold ? undefined : idle.pop()) ?? (await freshPage(baseUrl));
  await page.setViewportSize(viewport);
  const complaints: string[] = [];
  const provoked = (text: string) => expected.some((status) => text.includes(`status of ${status}`));
  const onConsole = (message: ConsoleMessage) => {
    const bad = message.type() === "error" || message.type() === "warning";
    if (bad && !provoked(message.text()))
      complaints.push(`${message.type()}: ${message.text()} ${message.location().url}`);
  };
  const onError = (error: Error) => complaints.push(`uncaught: ${error.message}`);
  const onFailed = (request: Request) => {
    const reason = request.failure()?.errorText ?? "";
    // A page that moves on drops what it had asked for.
    if (reason !== "net::ERR_ABORTED") complaints.push(`request failed: ${request.url()} ${reason}`);
  };
  page.on("console", onConsole).on("pageerror", onError).on("requestfailed", onFailed);
  const giveBack = async (inOrder: boolean) => {
    page.off("console", onConsole).off("pageerror", onError).off("requestfailed", onFailed);
    const pages = page.context().pages();
    if (cold || !inOrder || page.isClosed() || pages.length > 1) return page.context().close();
    await emptied(page);
    idle.push(page);
  };
  return { page, baseUrl, complaints, giveBack };
}

const quiet = ({ complaints }: OpenPage) => expect(complaints.join("\n"), "the console").toBe("");

/** A page (1280x800 unless given) that knows nothing of the tests before it, not signed in. */
export async function openPage(options: PageOptions = {}): Promise<OpenPage> {
  const open = await opened(options);
  onTestFinished(async ({ task }) => {
    await open.giveBack(task.result?.state !== "fail" && open.complaints.length === 0);
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
  let open: TakenPage | undefined;
  let inOrder = true;
  beforeAll(async () => {
    open = await opened(options);
    await signIn(open, role);
    await open.page.goto(path);
  });
  afterEach(({ task }) => {
    inOrder &&= task.result?.state !== "fail";
    if (open) quiet({ ...open, complaints: open.complaints.splice(0) });
  });
  afterAll(() => open?.giveBack(inOrder));
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
