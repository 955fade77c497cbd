import { readFile } from "node:fs/promises";
import { expect, test } from "vitest";
import { demoAccounts, demoPassword } from "../../server/demo/accounts";
import type { PlanRow } from "../../shared/schemas/plan";
import { openPage, openPageAs } from "../support/browser";
import { savedPath } from "../support/download";
import { Keys } from "./pages/keys";
import { WorkspaceScreen } from "./pages/workspace";

test("the whole job by keyboard alone: sign in, open a plan, change it, move the set point, read the limits, walk the map, undo, save, plan trials, export", async () => {
  const maker = await openPageAs("metallurgist", { path: "about:blank" });
  const heap = (await (await maker.page.request.get("/api/plans/demo-oxide-heap")).json()) as PlanRow;
  const name = `By keys alone ${Date.now()}`;
  const made = await maker.page.request.post("/api/plans/demo-oxide-heap/duplicate", {
    data: { name, projectId: heap.projectId },
  });
  expect(made.status()).toBe(201);

  const { page } = await openPage();
  const keys = new Keys(page);
  const plan = new WorkspaceScreen(page);
  await page.goto("/plans");
  await page.getByRole("button", { name: "Sign in" }).waitFor();
  await keys.watch();
  await keys.tabTo(/^E-mail/);
  await page.keyboard.type(demoAccounts.find((a) => a.role === "metallurgist")?.email ?? "");
  await keys.tabTo(/^Password/);
  await page.keyboard.type(demoPassword);
  await keys.press("Enter");
  await page.getByRole("heading", { name: "Plans" }).waitFor();

  // The project, out of a menu; then the plan, out of the list.
  await keys.tabTo(/ \/ /);
  await keys.press("Enter");
  const project = page.getByRole("menuitemradio", { name: `${heap.siteName} / ${heap.projectName}`, exact: true });
  await project.waitFor();
  for (let i = 0; !(await project.evaluate((item) => item === document.activeElement)); i++) {
    expect(i, "the project stands in the menu").toBeLessThan(20);
    await keys.press("ArrowDown");
  }
  await keys.press("Enter");
  await page.getByRole("link", { name, exact: true }).waitFor();
  await keys.tabTo(/^Skip to the screen/);
  await keys.press("Enter");
  await keys.tabTo(new RegExp(`^${name}`));
  await keys.press("Enter");
  await plan.drawn();
  const before = await plan.answers();

  // An input: typed and taken, and Ctrl Z right after takes it back; stepped by arrows.
  await keys.tabTo(/^Skip to the screen/);
  await keys.press("Enter");
  await keys.tabTo(/^Temperature of the liquor$/);
  await page.keyboard.type("45");
  await keys.press("Enter");
  await expect.poll(() => plan.axisWords()).toContain("pH at 45 °C");
  await keys.press("Control+z");
  await expect.poll(() => plan.answers()).toEqual(before);
  await keys.press("ArrowUp");
  await plan.header().getByText("Unsaved changes").waitFor();

  // The map: zoomed, walked until it follows the cursor, pinned, and whole again.
  await keys.tabTo(/^Window map of/);
  await keys.press("+", "+", "+");
  await expect.poll(() => new URL(page.url()).searchParams.has("pH")).toBe(true);
  const zoomed = new URL(page.url()).searchParams.get("pH");
  await keys.press("Shift+ArrowRight");
  await plan.readOut().getByText("under the cursor").waitFor();
  for (let i = 0; i < 30; i++) await keys.press("Shift+ArrowRight");
  await expect.poll(() => new URL(page.url()).searchParams.get("pH")).not.toBe(zoomed);
  await keys.press("Enter");
  await page.getByTestId("pinned-line").waitFor();
  await keys.press("Escape");
  await page.getByTestId("pinned-line").waitFor({ state: "detached" });
  await keys.press("Home");
  await expect.poll(() => new URL(page.url()).searchParams.has("pH")).toBe(false);

  // The set point by arrows, and back by undo.
  const here = await plan.answers();
  await keys.tabTo(/^Set point, pH/);
  await keys.press("Shift+ArrowRight", "Shift+ArrowRight", "ArrowUp");
  await page.getByTestId("held").waitFor();
  await expect.poll(async () => (await plan.answers()).pH).toBeCloseTo(here.pH + 0.2, 2);
  await keys.press("Control+z");
  await expect.poll(() => plan.answers()).toEqual(here);
  await keys.press("Shift+ArrowRight");
  await page.getByTestId("held").waitFor();

  // The limits: each is reached, and its name shown on the map; those with species lead to them.
  const limits = page.getByRole("region", { name: /^What shuts window/ }).locator("ul > li");
  expect(await limits.count()).toBeGreaterThan(2);
  for (let i = 0; i < (await limits.count()); i++) {
    for (let tries = 0; !(await limits.nth(i).evaluate((li) => li.contains(document.activeElement))); tries++) {
      expect(tries, `limit ${i + 1} is reached`).toBeLessThan(60);
      await keys.press("Tab");
    }
    expect(
      await page.evaluate(
        () => (document.activeElement?.getBoundingClientRect().bottom ?? Infinity) <= window.innerHeight,
      ),
    ).toBe(true);
    const [what = ""] = (await limits.nth(i).innerText()).split("\n");
    await keys.press("Enter");
    await page
      .getByTestId("limit-words")
      .getByText(what.replace(/^(low|high) (pH|Eh) /, ""))
      .waitFor();
    await keys.press("Escape");
    await page.getByTestId("limit-words").waitFor({ state: "detached" });
  }

  // Next trials: proposed, and planned in a campaign of their own.
  await keys.tabTo(/^Propose$/);
  await keys.press("Enter");
  const next = page.getByRole("region", { name: "Next trials" });
  await next.getByRole("listitem").first().waitFor();
  await keys.tabTo(/^Plan these/);
  await keys.press("Enter");
  const dialog = page.getByRole("dialog");
  await dialog.waitFor();
  await keys.tabTo(/^Code/);
  await page.keyboard.type("KEYS-1");
  await keys.tabTo(/^Plan them$/);
  await keys.press("Enter");
  await next.getByText(/trials planned in/).waitFor();

  // A revision, from wherever the focus is; the focus comes back.
  await keys.press("Control+s");
  await dialog.getByLabel("Note").waitFor();
  await keys.tabTo(/^Note/);
  await page.keyboard.type("Saved by keys.");
  await keys.tabTo(/^Save revision$/);
  await keys.press("Enter");
  await plan.header().getByText(/^revision 2, saved/).waitFor(); // prettier-ignore

  // A file, out of the menu.
  await keys.tabTo(/^More commands$/);
  await keys.press("Enter");
  await page.getByRole("menuitem", { name: "Window sheet" }).waitFor();
  await page.keyboard.type("Limits");
  const [download] = await Promise.all([page.waitForEvent("download"), keys.press("Enter")]);
  expect(await readFile(await savedPath(download), "utf8")).toContain("from_Eh_V_SHE");

  // Once all the way round: nothing was left out, and every place showed that it had the focus.
  await keys.tabTo(/^Skip to the screen/, { most: 250 });
  await keys.tabTo(/^Propose$|^How this is worked out/, { most: 250 });
  expect(await keys.notReached()).toEqual([]);
  await keys.expectAllShown();
}, 240_000);
test("lists, menus and help are worked by keys alone, and give the focus back", async () => {
  const { page } = await openPageAs("metallurgist", { path: "/plans/demo-neutral-leach" });
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  const focused = () =>
    page.evaluate(() => document.activeElement?.getAttribute("aria-label") ?? document.activeElement?.textContent);

  await plan.button("More commands").focus();
  await page.keyboard.press("Enter");
  await expect.poll(focused).toBe("Name and description");
  await page.keyboard.press("ArrowDown");
  expect(await focused()).toBe("Duplicate");
  await page.keyboard.press("Escape");
  await expect.poll(focused).toBe("More commands");
  await page.keyboard.press("ArrowDown");
  await expect.poll(focused).toBe("Name and description");
  await page.keyboard.press("Enter");
  await page.getByRole("dialog").getByLabel("Name").waitFor();
  await page.keyboard.press("Escape");
  await expect.poll(focused).toBe("More commands");

  const liquor = page.getByRole("combobox", { name: "Lixiviant" });
  const before = await plan.answers();
  await liquor.focus();
  await page.keyboard.press("ArrowDown");
  const chosen = page.getByRole("option", { name: "sulfate", exact: false, selected: true });
  // The list stands a moment before the chosen line has the focus.
  await expect.poll(() => chosen.evaluate((option) => option === document.activeElement)).toBe(true);
  await page.keyboard.press("ArrowDown");
  await page.keyboard.press("ArrowDown");
  await page.keyboard.press("Enter");
  await expect.poll(focused).toBe("Lixiviant");
  await expect.poll(() => liquor.innerText()).not.toMatch(/^sulfate\n/);
  await expect.poll(() => plan.answers()).not.toEqual(before);

  await page.getByRole("button", { name: "Solids basis: what is this?" }).focus();
  await page.keyboard.press("Enter");
  await page.getByRole("dialog").getByText("Solids basis", { exact: true }).waitFor();
  await page.keyboard.press("Escape");
  await expect.poll(focused).toBe("Solids basis: what is this?");
  expect(await page.getByRole("dialog").count()).toBe(0);
});
