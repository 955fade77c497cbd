import type { Page } from "playwright-core";
import { expect, test } from "vitest";
import { openPageAs, sharedPageAs, turnTo } from "../support/browser";
import { WorkspaceScreen } from "./pages/workspace";

const path = "/plans/demo-neutral-leach";
const shared = sharedPageAs("metallurgist", {
  path: `${path}?settings=3~temperatureC:85&focus=Zn&pH=2..7&Eh=0..1&hide=Xx`,
});

test("a link's settings are a proposal until they are kept, and its view is what is seen; what cannot be read is named", async () => {
  const { page } = shared();
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  await page.getByText("hide=Xx (the plan has no Xx)").waitFor();
  const proposal = page.getByRole("region", { name: "Settings from a link" });
  await proposal.getByText("1 difference from revision 3").waitFor();
  expect(await plan.axisWords()).toContain("pH at 85 °C");
  await proposal.getByRole("button", { name: "Keep as my draft" }).click();
  await plan.header().getByText("Unsaved changes").waitFor();
  await plan.button("Undo").click();
  await expect.poll(() => plan.number("Temperature of the liquor").inputValue()).toBe("60");
  await expect.poll(() => new URL(page.url()).search).toBe("?view=1&pH=2..7&Eh=0..1&focus=Zn");
});

test("two revisions stand side by side with what was lost; a setting varied shows where a window opens, and a small map sets the plan", async () => {
  const { page } = shared();
  await turnTo(page, `${path}/compare?a=1&b=2`);
  await expect
    .poll(() => page.getByTestId("verdict").innerText())
    .toMatch(/less open ground than A: ground is only lost/);
  await turnTo(page, `${path}?view=1&vary=amount-Fe&over=1e-9..0.1`);
  const plan = new WorkspaceScreen(page);
  const film = page.getByTestId("film");
  await film.getByText("a window opens").waitFor();
  await film.getByRole("button", { name: /^4\.64e−3: margin/ }).click();
  await plan.header().getByText("Unsaved changes").waitFor();
  await plan.button("Undo").click();
  // "Back" from the moment the address has followed, drawn or not.
  const back = page.evaluate(
    () =>
      new Promise<void>((resolve) => {
        const push = history.pushState.bind(history);
        history.pushState = (...entry) => {
          push(...entry);
          history.pushState = push;
          history.back();
          resolve();
        };
      }),
  );
  await film.getByRole("button", { name: "back to the map" }).click();
  await back;
  await film.waitFor();
  expect(new URL(page.url()).searchParams.get("vary")).toBe("amount-Fe");
});

test("B is taken into the plan from beside A in one step, which one Undo takes back", async () => {
  const { page } = shared();
  await turnTo(page, `${path}/compare?a=3&b=3~temperatureC:40`);
  await page.getByRole("button", { name: "Take B into the plan" }).click();
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  await plan.header().getByText("Unsaved changes").waitFor();
  await expect.poll(() => plan.number("Temperature of the liquor").inputValue()).toBe("40");
  await plan.button("Undo").click();
  await expect.poll(() => plan.number("Temperature of the liquor").inputValue()).toBe("60");
});

test("a draft beside a revision is what the address says, in the scale it was read in, for somebody else as well", async () => {
  const { page } = shared();
  await turnTo(page, path);
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  await plan.type("Temperature of the liquor", "45");
  await plan.header().getByText("Unsaved changes").waitFor();
  // Gone at once: what was typed is kept on the way out.
  await page.goto(`${path}/compare?a=3&b=draft&scale=mV,SHE,liquor`);
  const sideB = (of: Page) => of.getByRole("combobox", { name: "Side B" });
  const words = (of: Page) => of.getByRole("region", { name: "The difference in words" });
  await expect.poll(() => sideB(page).innerText()).toMatch(/^my draft/);
  await expect.poll(() => new URL(page.url()).searchParams.get("b")).toBe("3~temperatureC:45");
  await expect.poll(() => words(page).innerText()).toMatch(/mV/);
  const { page: other } = await openPageAs("manager", { path: `${path}/compare${new URL(page.url()).search}` });
  await expect.poll(() => sideB(other).innerText()).toMatch(/^settings from revision 3/);
  await expect.poll(async () => (await words(other).innerText()).replaceAll("settings from revision 3", "my draft")).toBe(await words(page).innerText()); // prettier-ignore
  await expect.poll(() => new URL(other.url()).search).toBe(new URL(page.url()).search);
});

/** What of a view shows: the figure, the words over it, the list beside it. */
async function seen(page: Page) {
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  const table = page.getByRole("grid", { name: "Trials on the map" });
  // Where the corners stand is compared apart: an address rounds what is in sight.
  const traces = await plan.traces();
  return {
    figure: traces.map(({ uid, name, fillcolor, hatched, x }) => ({
      uid,
      name,
      fillcolor,
      hatched,
      corners: x.length,
    })),
    ticks: await page.locator("[data-testid=window-map] [data-axes] text").allTextContents(),
    names: (await page.getByTestId("map-names").locator("[data-name]").allTextContents()).sort(),
    tools: await page.getByRole("button", { name: /metals$|^as a|^as text$| with / }).allInnerTexts(),
    pinned: await page.getByTestId("pinned-line").allInnerTexts(),
    practice: await page.getByRole("list", { name: "Published ranges shown" }).allInnerTexts(),
    rows: (await table.count()) > 0 ? await table.getAttribute("aria-rowcount") : null,
    box: await page.getByText(/^\d+ in the box$/).allInnerTexts(),
    colour: await page.getByRole("radio", { name: "gangue", checked: true }).count(),
    comments: await page.getByRole("region", { name: "Comments" }).count(),
    text: await page.getByRole("region", { name: "The map as text" }).allInnerTexts(),
  };
}

/** Every corner of one figure within a thousandth of a pH or V of the other's. */
async function expectSameGround(a: Page, b: Page) {
  const [here, there] = await Promise.all([a, b].map((page) => new WorkspaceScreen(page).traces()));
  for (const [i, { uid, x, y }] of (here ?? []).entries())
    for (const [axis, values] of [x, y].entries())
      for (const [k, value] of values.entries()) {
        const other = there?.[i]?.[axis === 0 ? "x" : "y"][k] ?? null;
        if (value === null) expect(other, uid).toBeNull();
        else expect(Math.abs(value - (other ?? NaN)), uid).toBeLessThan(2e-3);
      }
}

test("whatever is seen of a plan comes back from its address, for somebody else as well", async () => {
  const { page } = shared();
  await turnTo(page, path);
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  const query = () => new URL(page.url()).searchParams;
  await page.getByRole("tab", { name: /^Trials/ }).click();
  await page.getByRole("radio", { name: "gangue" }).click();
  await page.keyboard.down("Shift");
  await plan.pointAt(4, 0.4);
  await page.mouse.down();
  await page.mouse.move(...(await plan.pixelOf(5.2, 0.9)), { steps: 3 });
  await page.mouse.up();
  await page.keyboard.up("Shift");
  await page.getByText(/^\d+ in the box$/).waitFor();
  await plan.button("metals").click();
  await page.getByRole("checkbox", { name: "Draw Fe" }).uncheck();
  await page.keyboard.press("Escape");
  await page.getByRole("checkbox", { name: "Published practice" }).check();
  await plan.pointAt(2.5, 0.2);
  await page.mouse.down();
  await page.mouse.up();
  await page.getByTestId("pinned-line").waitFor();
  await plan.button("Zoom in").click();
  await expect.poll(() => [...query().keys()].sort()).toEqual(["Eh", "brush", "colour", "hide", "on", "pH", "pin", "side", "view"]); // prettier-ignore
  const there = await seen(page);
  expect(there.tools).toContain("3 of 4 metals");
  expect([there.pinned.length, there.practice.length, there.box.length, there.colour]).toEqual([1, 1, 1, 1]);

  const { page: other } = await openPageAs("manager", { path: `${path}${new URL(page.url()).search}` });
  await expect.poll(() => seen(other)).toEqual(there);
  await expectSameGround(page, other);
  expect(new URL(other.url()).search).toBe(new URL(page.url()).search);

  // Two metals compared, the map as text, the comments in place of the answers.
  await plan.button("3 of 4 metals").click();
  await page
    .getByRole("dialog")
    .getByRole("button", { name: /compare/i })
    .click();
  await page.keyboard.press("Escape");
  await plan.button("as text").click();
  await page.keyboard.press("c");
  await expect.poll(() => ["pair", "text", "comments"].every((key) => query().has(key))).toBe(true);
  const talking = await seen(page);
  expect([talking.comments, talking.text.length]).toEqual([1, 1]);
  await turnTo(other, `${path}${new URL(page.url()).search}`);
  await expect.poll(() => seen(other)).toEqual(talking);
});
