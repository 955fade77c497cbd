import { AxeBuilder } from "@axe-core/playwright";
import type { Page } from "playwright-core";
import { expect, test } from "vitest";
import { openPageAs } from "../support/browser";
import { PlansScreen } from "./pages/plans";
import { WorkspaceScreen } from "./pages/workspace";

/** Every fault that axe calls serious or critical; nothing on the page is left out. */
async function graveFaults(page: Page, ...rules: string[]): Promise<string[]> {
  const axe = new AxeBuilder({ page });
  const { violations } = await (rules.length > 0 ? axe.withRules(rules) : axe).analyze();
  const grave = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
  return grave.flatMap(({ id, nodes }) => nodes.map((node) => `${id}: ${node.html}`));
}

// The sign-in page is looked at with the accounts.
test("plans, a plan on the table and the chemistry are free of grave accessibility faults, light and dark", async () => {
  const { page } = await openPageAs("metallurgist", { path: "/plans" });
  await new PlansScreen(page).row("Zinc-dust purification").waitFor();
  expect(await graveFaults(page)).toEqual([]);

  await new PlansScreen(page).open("Zinc-dust purification");
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  await plan.openMetal("Cu");
  expect(await graveFaults(page)).toEqual([]);
  // Dark differs in nothing but colour.
  await page.emulateMedia({ colorScheme: "dark" });
  await page.locator("html[data-theme=dark]").waitFor();
  expect(await graveFaults(page, "color-contrast")).toEqual([]);

  await page.getByRole("link", { name: "Chemistry" }).click();
  await page.getByRole("complementary", { name: /^Species/ }).waitFor();
  expect(await graveFaults(page, "color-contrast")).toEqual([]);
  await page.emulateMedia({ colorScheme: "light" });
  await page.locator("html[data-theme=light]").waitFor();
  expect(await graveFaults(page)).toEqual([]);
}, 120_000);

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
  await page.getByRole("option", { name: "sulfate", exact: false, selected: true }).waitFor();
  await page.keyboard.press("ArrowDown");
  await page.keyboard.press("ArrowDown");
  await page.keyboard.press("Enter");
  await expect.poll(focused).toBe("Lixiviant");
  expect(await liquor.innerText()).not.toMatch(/^sulfate\n/);
  await expect.poll(() => plan.answers()).not.toEqual(before);

  await page.getByRole("button", { name: "Solids basis: what is this?" }).focus();
  await page.keyboard.press("Enter");
  await page.getByRole("dialog").getByText("Solids basis", { exact: true }).waitFor();
  await page.keyboard.press("Escape");
  await expect.poll(focused).toBe("Solids basis: what is this?");
  expect(await page.getByRole("dialog").count()).toBe(0);
});
