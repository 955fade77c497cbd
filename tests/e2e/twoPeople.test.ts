import type { Page } from "playwright-core";
import { expect, test } from "vitest";
import type { PlanRow } from "../../shared/schemas/plan";
import { graveFaults } from "../support/axe";
import { openPageAs } from "../support/browser";
import { WorkspaceScreen } from "./pages/workspace";

const temperature = "Temperature of the liquor";

/** Looks at the page again, as somebody who comes back to it: the plan is asked for anew. */
const comeBack = (page: Page) => page.evaluate(() => document.dispatchEvent(new Event("visibilitychange")));

test("two people change one plan: the later is told and shown the difference, puts both together or decides, and nothing is lost", async () => {
  const mine = await openPageAs("metallurgist", { path: "about:blank", expected: [412] });
  const source = (await (await mine.page.request.get("/api/plans/demo-neutral-leach")).json()) as PlanRow;
  const made = await mine.page.request.post("/api/plans/demo-neutral-leach/duplicate", {
    data: { name: `Two at one plan ${Date.now()}`, projectId: source.projectId },
  });
  const { id } = (await made.json()) as PlanRow;
  const theirs = await openPageAs("admin", { path: `/plans/${id}` });
  await mine.page.goto(`/plans/${id}`);
  const [me, other] = [new WorkspaceScreen(mine.page), new WorkspaceScreen(theirs.page)];
  await me.drawn();
  await other.drawn();
  const stored = async () => (await (await mine.page.request.get(`/api/plans/${id}`)).json()) as PlanRow;
  const latest = async () => (await stored()).latest;
  const degrees = (plan: WorkspaceScreen) => plan.number(temperature).inputValue();
  const told = (plan: WorkspaceScreen, number: number) =>
    plan.page.getByRole("status").filter({ hasText: `Revision ${number} was saved` });
  const dialog = (plan: WorkspaceScreen, number: number) =>
    plan.page.getByRole("dialog", { name: new RegExp(`^Revision ${number} beside your`) });
  const lines = async (plan: WorkspaceScreen, number: number, region: string) =>
    (await dialog(plan, number).getByRole("region", { name: region }).locator("tbody tr").allInnerTexts()).map((line) =>
      line.replace(/\s+/g, " ").trim(),
    );

  // Different settings: nothing contradicts, everything is taken.
  await me.type(temperature, "71");
  await other.openMetal("Zn");
  await other.type("Zn: carry", "0.12");
  await other.saveRevision("More zinc.");
  await comeBack(me.page);
  await told(me, 2).getByText("“More zinc.”").waitFor();
  await told(me, 2).getByText("Your changes are from revision 1 and are all still here.").waitFor();
  expect(await degrees(me)).toBe("71");
  await me.button("Show the difference").click();
  await dialog(me, 2).getByText("2 settings changed by one, or alike").waitFor();
  expect(await dialog(me, 2).getByRole("region", { name: "Changed by both" }).count()).toBe(0);
  const taken = await lines(me, 2, "Taken as they are");
  expect(taken.find((line) => line.startsWith("Temperature"))).toMatch(/60.*71.*you$/);
  expect(taken.find((line) => line.startsWith("Zn"))).toMatch(/0\.08|8\.0?e−2.*0\.12|1\.2.*Administrator/);
  expect(await graveFaults(me.page, { within: "[role=dialog]" })).toEqual([]);
  await dialog(me, 2).getByRole("button", { name: "Put together" }).click();
  await me.header().getByText("from revision 2").waitFor();
  expect(await told(me, 2).count()).toBe(0);
  await me.openMetal("Zn");
  expect([await degrees(me), Number(await me.number("Zn: carry").inputValue())]).toEqual(["71", 0.12]);
  // One step of undo takes it apart again, base and all.
  await me.button("Undo").click();
  await told(me, 2).waitFor();
  expect([await degrees(me), Number(await me.number("Zn: carry").inputValue())]).toEqual(["71", 0.08]);
  await me.button("Redo").click();
  await me.header().getByText("from revision 2").waitFor();
  await me.saveRevision("Both together.");
  await me.header().getByText(/^revision 3, saved/).waitFor(); // prettier-ignore
  const third = (await latest()).inputs;
  expect([third.temperatureC, third.metals.find((m) => m.element === "Zn")?.value]).toEqual([71, 0.12]);

  // Who changed nothing is told as well, and goes on from there.
  await comeBack(other.page);
  await told(other, 3).getByText("Here still stands revision 2.").waitFor();
  await other.button("Show the difference").click();
  await dialog(other, 3).getByRole("button", { name: "Go to revision 3" }).click();
  await other.header().getByText(/^revision 3, saved/).waitFor(); // prettier-ignore
  expect(await degrees(other)).toBe("71");

  // The same setting, and not told before saving: the save brings the difference in its place; note and changes stay.
  // The page asks for the plan every twenty seconds: until the save it is told what it knows.
  const before = await stored();
  await me.page.route(`**/api/plans/${id}`, (route) => route.fulfill({ json: before }));
  await other.type(temperature, "80");
  await other.saveRevision("Hotter.");
  await me.type(temperature, "65");
  await me.type("pH, to", "9");
  await me.page.keyboard.press("Control+s");
  const save = me.page.getByRole("dialog", { name: "Save revision 4" });
  await save.getByLabel("Note").fill("Cooler.");
  await save.getByRole("button", { name: "Save revision" }).click();
  await dialog(me, 4).getByText("1 setting changed by both").waitFor();
  await me.page.unroute(`**/api/plans/${id}`);
  expect(await lines(me, 4, "Changed by both")).toEqual([expect.stringMatching(/^Temperature.*71.*65.*80/)]);
  expect(await dialog(me, 4).getByRole("button", { name: "1 to decide" }).isDisabled()).toBe(true);
  expect(await graveFaults(me.page, { within: "[role=dialog]" })).toEqual([]);
  await dialog(me, 4).getByRole("button", { name: "Cancel" }).click();
  expect([await degrees(me), Number(await me.number("pH, to").inputValue())]).toEqual(["65", 9]);
  await told(me, 4).waitFor();

  // A reload loses neither the draft nor what it stands on.
  await me.page.reload();
  await me.drawn();
  await told(me, 4).getByText("Your changes are from revision 3 and are all still here.").waitFor();
  await me.page.keyboard.press("Control+s");
  await dialog(me, 4).getByRole("button", { name: "All theirs" }).click();
  await dialog(me, 4).getByRole("radio", { name: "mine" }).click();
  await dialog(me, 4).getByRole("button", { name: "Put together and go on to save" }).click();
  const again = me.page.getByRole("dialog", { name: "Save revision 5" });
  await again.getByLabel("Note").fill("Cooler all the same.");
  await again.getByRole("row", { name: /Temperature.*80.*65/ }).waitFor();
  await again.getByRole("button", { name: "Save revision" }).click();
  await me.header().getByText(/^revision 5, saved/).waitFor(); // prettier-ignore
  const fifth = (await latest()).inputs;
  expect([fifth.temperatureC, fifth.frame.pH[1]]).toEqual([65, 9]);

  // Theirs is taken where that is decided.
  await other.type(temperature, "77");
  await comeBack(other.page);
  await other.button("Show the difference").click();
  await dialog(other, 5).getByRole("button", { name: "All theirs" }).click();
  await dialog(other, 5).getByRole("button", { name: "Put together" }).click();
  await other.header().getByText(/^revision 5, saved/).waitFor(); // prettier-ignore
  expect([await degrees(other), Number(await other.number("pH, to").inputValue())]).toEqual(["65", 9]);
});
