import type { Page } from "playwright-core";
import { describe, expect, test } from "vitest";
import type { Page as Listing } from "../../shared/schemas/api";
import type { MapTrials } from "../../shared/schemas/trialRows";
import { graveFaults } from "../support/axe";
import { openPage, openPageAs, sharedPageAs, turnTo } from "../support/browser";
import { WorkspaceScreen } from "./pages/workspace";

const desk = { width: 1280, height: 800 };
const tablet = { width: 834, height: 1112 };
const onTop = "[role=dialog], [role=menu], [role=listbox]";

/** Looks at one state after the other and gathers the grave faults of all. */
function walk(page: Page) {
  const faults: string[] = [];
  const note = (state: string, found: readonly string[]) => faults.push(...found.map((fault) => `${state}: ${fault}`));
  /** Where the style sheet reads it. */
  const theme = (name: "dark" | "light") =>
    page.evaluate((name) => {
      document.documentElement.dataset.theme = name;
    }, name);
  /** In the light, and in the dark, which differs in nothing but colour.
   *  @param within  what alone is new since the last look */
  const look = async (state: string, within?: string): Promise<void> => {
    const part = within === undefined ? {} : { within };
    note(state, await graveFaults(page, part));
    await theme("dark");
    note(`${state}, dark`, await graveFaults(page, { ...part, rules: ["color-contrast"] }));
    await theme("light");
  };
  /** What opens over the page, and is closed again. */
  const over = async (state: string, open: () => Promise<unknown>): Promise<void> => {
    await open();
    await page.locator(onTop).last().waitFor();
    await look(state, onTop);
    await page.keyboard.press("Escape");
    await page.locator(onTop).last().waitFor({ state: "detached" });
  };
  return { faults, look, over };
}

describe("a plan is free of grave accessibility faults, light and dark,", () => {
  const path = "/plans/demo-neutral-leach";
  const shared = sharedPageAs("metallurgist", { path, expected: [404] });

  test("as it opens, with every dialog, menu and list", async () => {
    const { page } = shared();
    const plan = new WorkspaceScreen(page);
    const { faults, look, over } = walk(page);
    await plan.drawn();
    await page.getByRole("region", { name: "Fields drawn" }).waitFor();
    await look("plan");
    await page.setViewportSize(tablet);
    await look("plan on a tablet");
    await page.setViewportSize(desk);
    await plan.openMetal("Cu");
    await look("a metal in hand", "section[aria-label=Metals]");
    await over("more commands", () => plan.button("More commands").click());
    await over("lixiviants", () => page.getByRole("combobox", { name: "Lixiviant" }).click());
    await over("help", () => page.getByRole("button", { name: "Solids basis: what is this?" }).click());
    await over("metals on the map", () => plan.button("metals").click());
    await over("potential scale", () => plan.asks("On the map").getByRole("button", { name: "V vs SHE" }).click());
    await over("revisions", () => page.keyboard.press("r"));
    await over("keys", () => page.keyboard.press("?"));
    await over("name and description", () => plan.command("Name and description"));
    await over("duplicate", () => plan.command("Duplicate"));
    await over("archive", () => plan.command("Archive"));
    await plan.type("Temperature of the liquor", "900");
    await page.getByRole("alert").first().waitFor();
    await look("a number that cannot be", "section[aria-label=Liquor], section:has([role=alert])");
    await plan.type("Temperature of the liquor", "71");
    await plan.header().getByText("Unsaved changes").waitFor();
    await over("save", () => page.keyboard.press("Control+s"));
    expect(faults).toEqual([]);
  }, 240_000);

  test("with trials, compared, as text, talked about, and without a window", async () => {
    const { page } = shared();
    const plan = new WorkspaceScreen(page);
    const { faults, look } = walk(page);
    const turn = async (query: string) => {
      await turnTo(page, `${path}${query}`);
      await plan.drawn();
    };
    await turn("?view=1&side=trials&brush=4..5.2,0.4..0.9&on=practice");
    await page.getByText(/in the box$/).waitFor();
    await look("trials, practice");
    await turn("?view=1&pair=Zn,Fe&pin=2.5,0.2&text=1&comments=1");
    await page.getByRole("region", { name: "Comments" }).getByLabel("New comment").waitFor();
    await look("two metals, pinned, as text, comments");
    await turn("?view=1&plain=1&focus=Zn");
    await look("all fields of one metal");
    await plan.type("pH, to", "3.5");
    await page.getByRole("region", { name: "No window" }).getByRole("button", { name: /^Set / }).first().waitFor(); // prettier-ignore
    await look("no window");
    expect(faults).toEqual([]);
  }, 240_000);

  test("varied, frozen, proposed, side by side, with next trials, and where it cannot be opened", async () => {
    const { page } = shared();
    const plan = new WorkspaceScreen(page);
    const { faults, look, over } = walk(page);
    await turnTo(page, `${path}?view=1&vary=temperature&over=25..95`);
    await page.getByTestId("film").getByRole("listitem").first().waitFor();
    await look("one setting varied", "[data-testid=film]");
    await turnTo(page, `${path}?revision=1`);
    await plan.drawn();
    await look("a saved revision");
    await turnTo(page, `${path}?settings=3~temperatureC:85&hide=Xx`);
    await page.getByRole("region", { name: "Settings from a link" }).waitFor();
    await look("settings from a link");
    await turnTo(page, `${path}/compare?a=1&b=2`);
    await page.getByTestId("verdict").waitFor();
    await look("side by side");
    await page.setViewportSize(tablet);
    await look("side by side on a tablet");
    await page.setViewportSize(desk);
    await turnTo(page, "/plans/demo-oxide-heap");
    const next = page.getByRole("region", { name: "Next trials" });
    await next.getByRole("button", { name: "Propose" }).click();
    await page.getByTestId("proposed-1").waitFor();
    await look("next trials proposed", "[aria-label='Next trials'], [data-testid=window-map]");
    await over("plan these trials", () => next.getByRole("button", { name: /^Plan these/ }).click());
    await turnTo(page, "/plans/no-such-plan");
    await page.getByText("The plan could not be opened").waitFor();
    await look("a plan that is not there");
    expect(faults).toEqual([]);
  }, 240_000);
});

/** Ids of the demo to look at. */
async function someOf(page: Page) {
  const rows = async <T>(url: string) => (await (await page.request.get(url)).json()) as T;
  const { rows: trials } = await rows<MapTrials>("/api/plans/demo-neutral-leach/trials");
  const feeds = await rows<Listing<{ id: string }>>("/api/feeds?projectId=demo-calcine&limit=1");
  const trial = trials[0]!;
  return { trial: trial.id, campaign: trial.campaignId, feed: feeds.rows[0]!.id };
}

test("every other screen of a metallurgist is free of grave accessibility faults, light and dark, on a tablet", async () => {
  const { page } = await openPageAs("metallurgist", { path: "/plans", viewport: tablet, expected: [400] });
  const { faults, look, over } = walk(page);
  const { trial, campaign, feed } = await someOf(page);
  const press = (name: string | RegExp) => page.getByRole("button", { name }).first().click();
  await page.getByRole("row").nth(1).click();
  await page.getByRole("complementary", { name: /^Plan/ }).waitFor();
  await look("plans");
  await over("a new plan", () => press("New plan"));
  await over("a new project", () => press("New project"));
  await page.getByRole("radio", { name: "Archived" }).click();
  await page.getByText("Nothing archived").or(page.getByRole("row").nth(1)).first().waitFor();
  await look("archived plans", "#screen");
  const screens: [state: string, path: string, there: () => Promise<unknown>][] = [
    ["chemistry", "/chemistry", () => page.getByRole("complementary", { name: /^Species/ }).waitFor()],
    ["method", "/method", () => page.getByRole("navigation", { name: "Contents" }).waitFor()],
    ["feeds", "/feeds", () => page.getByRole("row").nth(1).waitFor()],
    ["a feed", `/feeds/${feed}`, () => page.getByRole("textbox", { name: "Name" }).first().waitFor()],
    ["campaigns", "/campaigns", () => page.getByRole("row").nth(1).waitFor()],
    ["a campaign", `/campaigns/${campaign}`, () => page.getByText(/^Judging/).waitFor({ state: "detached" })],
    ["a campaign edited", `/campaigns/${campaign}/edit`, () => page.getByLabel("Title").waitFor()],
    ["a trial", `/trials/${trial}`, () => page.getByRole("tab", { name: "Record" }).waitFor()],
    ["a trial planned", `/trials/plan?campaign=${campaign}`, () => page.getByText(/^Take the set point/).waitFor()],
    ["nothing there", "/nowhere", () => page.getByText("There is nothing at this address").waitFor()],
  ];
  for (const [state, path, there] of screens) {
    await turnTo(page, path);
    await there();
    await look(state, "#screen");
    if (state === "a trial") {
      await page.getByRole("tab", { name: "Accounts" }).click();
      await page.getByText(/by calculated head/).first().waitFor(); // prettier-ignore
      await look("accounts of a trial", "#screen");
    }
    if (state === "feeds") await over("a new feed", () => press("New feed"));
    if (state === "campaigns") await over("a new campaign", () => press("New campaign"));
    if (state === "chemistry") await over("a species added", () => press("Add a species"));
  }
  await turnTo(page, "/reactions");
  await page.getByRole("textbox", { name: "Reaction" }).fill("Cu^2+ + Zn = Cu");
  await press("Work it out");
  await page.getByRole("alert").first().waitFor();
  await look("a reaction that does not balance", "#screen");
  expect(faults).toEqual([]);
}, 240_000);

test("what the other roles alone see is free of grave accessibility faults, light and dark", async () => {
  const { page } = await openPageAs("technician", { path: "/bench", viewport: tablet });
  const bench = walk(page);
  await page.getByRole("heading", { name: "Bench" }).waitFor();
  await bench.look("the bench");
  const { trial } = await someOf(page);
  await turnTo(page, `/bench/${trial}`);
  await page.getByRole("heading", { level: 1 }).waitFor();
  await bench.look("a trial at the bench");
  expect(bench.faults).toEqual([]);

  const { page: office } = await openPageAs("admin", { path: "/members" });
  const members = walk(office);
  await office.getByRole("row").nth(1).click();
  await office.getByRole("complementary", { name: /^Member/ }).waitFor();
  await members.look("members");
  await members.over("invite", () => office.getByRole("button", { name: "Invite a member" }).click());
  await members.over("who is signed in", () => office.getByRole("button", { name: "admin", exact: true }).click());
  await turnTo(office, "/mailbox");
  await office.getByRole("heading", { name: "Letters" }).waitFor();
  await members.look("letters");
  expect(members.faults).toEqual([]);

  const { page: outside } = await openPage();
  const door = walk(outside);
  await outside.goto("/");
  await outside.getByRole("button", { name: "Sign in" }).waitFor();
  await door.look("sign in");
  expect(door.faults).toEqual([]);
});
