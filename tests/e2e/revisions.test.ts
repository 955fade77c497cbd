import { expect, test } from "vitest";
import { openPageAs } from "../support/browser";
import { PlansScreen } from "./pages/plans";
import { WorkspaceScreen } from "./pages/workspace";

test("a plan is duplicated, changed, saved with a note, brought back to an older revision, renamed and archived", async () => {
  const { page } = await openPageAs("metallurgist", { path: "/plans" });
  const plans = new PlansScreen(page);
  await plans.duplicate("Neutral leach, second tank", "Neutral leach, hot trial");
  await plans.open("Neutral leach, hot trial");
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  await plan
    .header()
    .getByText(/^revision 1, saved/)
    .waitFor();
  // Nothing has changed: nothing to save.
  expect(await plan.button("Save revision").isDisabled()).toBe(true);
  const first = await plan.answers();

  await plan.type("Temperature of the liquor", "85");
  await plan.header().getByText("Unsaved changes").waitFor();
  const hot = await plan.answers();
  expect(hot).not.toEqual(first);
  await plan.saveRevision("Steam coil on: 85 °C for a week.");
  await plan
    .header()
    .getByText(/^revision 2, saved \d\d:\d\d by Metallurgist/)
    .waitFor();

  const revisions = page.getByRole("dialog", { name: "Revisions of Neutral leach, hot trial" });
  await plan.button("Revisions").click();
  await revisions.getByText("Steam coil on: 85 °C for a week.").waitFor();
  await revisions.getByRole("row", { name: /Temperature.*60.*85/ }).waitFor();
  await revisions.getByRole("list", { name: "Revisions" }).getByRole("button").last().click();
  await revisions.getByRole("button", { name: "Open revision 1 as it was" }).click();

  await page.getByText("Revision 1 as it was saved").waitFor();
  await plan.drawn();
  expect(await plan.answers()).toEqual(first);
  expect(await page.getByRole("slider").count()).toBe(0);
  await plan.button("Restore as draft").click();
  await plan.header().getByText("from revision 2").waitFor();
  await plan.drawn();
  expect(await plan.answers()).toEqual(first);

  // Neither saved nor lost: the draft is there after a reload, and says so.
  await plan.type("Temperature of the liquor", "71");
  const draft = await plan.answers();
  await page.reload();
  await plan.drawn();
  await plan.header().getByText("Unsaved changes").waitFor();
  expect(await plan.number("Temperature of the liquor").inputValue()).toBe("71");
  expect(await plan.answers()).toEqual(draft);
  await plan.button("go back to revision 2").click();
  await expect.poll(() => plan.answers()).toEqual(hot);

  await plan.command("Name and description");
  const rename = page.getByRole("dialog");
  await rename.getByLabel("Name").fill("Neutral leach, steam coil");
  await rename.getByRole("button", { name: "Save" }).click();
  await page.getByRole("heading", { name: "Neutral leach, steam coil" }).waitFor();
  await plan.command("Archive");
  await page.getByRole("dialog").getByRole("button", { name: "Archive" }).click();
  await plan.header().getByText("archived").waitFor();

  await page.getByRole("link", { name: "Plans" }).click();
  await plans.row("Zinc-dust purification").waitFor();
  expect(await plans.row("Neutral leach, steam coil").count()).toBe(0);
  await plans.show("Archived");
  await plans.row("Neutral leach, steam coil").waitFor();
});
