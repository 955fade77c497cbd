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
