import { expect, test } from "vitest";
import { sharedPageAs, turnTo } from "../support/browser";
import { demoInputs, solved } from "./pages/core";
import { WorkspaceScreen } from "./pages/workspace";

const shared = sharedPageAs("metallurgist", { path: "/plans/demo-neutral-leach" });
const rule = { gas: "HCN", pHAtLeast: 10.5 };

test("practice is off until asked for; a range of temperature is drawn inside the window; without a window a change opens one", async () => {
  const { page } = shared();
  const plan = new WorkspaceScreen(page);
  await plan.drawn();

  // Published practice is off at first; switched on it names each range with its source.
  const practice = async () => (await plan.traces()).filter((t) => t.uid.startsWith("practice"));
  expect(await practice()).toEqual([]);
  await page.getByRole("checkbox", { name: "Published practice" }).check();
  await expect.poll(async () => (await practice()).length).toBeGreaterThan(0);
  const list = page.getByRole("list", { name: "Published ranges shown" });
  await list.getByRole("button", { name: /zinc neutral leach/ }).click();
  await page.getByRole("dialog").getByText(/The Extractive Metallurgy of Zinc/).waitFor(); // prettier-ignore
  await page.keyboard.press("Escape");
  await page.getByRole("checkbox", { name: "Published practice" }).uncheck();
  await expect.poll(practice).toEqual([]);

  // What holds over a range of temperature is drawn inside the window, and what was checked is stated.
  const whole = await plan.trace("open-0");
  await plan.button("Hold over a range of Temperature").click();
  const over = page.getByRole("region", { name: "Over the ranges" });
  await over.getByText("Deepest point").waitFor({ timeout: 60_000 });
  await over.getByText(/temperatures/).waitFor();
  await expect.poll(async () => (await plan.trace("robust"))?.x.length ?? 0).toBeGreaterThan(3);
  const inner = (await plan.trace("robust"))!.x.filter((x) => x !== null);
  const outer = whole!.x.filter((x) => x !== null);
  expect(Math.min(...inner)).toBeGreaterThan(Math.min(...outer));
  expect(Math.max(...inner)).toBeLessThan(Math.max(...outer));
  await plan.button("Undo").click();
  await expect.poll(() => plan.trace("robust")).toBeUndefined();

  // Without a window the conflict is named, a change opens one in one action, and undo takes it back.
  await plan.type("pH, to", "3.5"); // ferrihydrite dissolves below pH 4.06 here
  const shut = page.getByRole("region", { name: "No window" });
  await shut.getByText("Nowhere on this map is").waitFor();
  expect(await shut.textContent()).toContain("Nowhere on this map is iron solid.");
  const apply = shut.getByRole("button", { name: /^Set / }).first();
  await apply.waitFor({ timeout: 60_000 });
  await apply.click();
  await shut.waitFor({ state: "detached" });
  expect(await page.getByTestId("set-point").count()).toBe(1);
  await plan.button("Undo").click();
  await shut.getByText("Nowhere on this map is").waitFor();
});

test("HCN kept out is a limit by name; let in, the margin reaches its ground and the gas speaks with caution and deference", async () => {
  const id = "demo-cyanide-leach";
  const { page } = shared();
  await turnTo(page, `/plans/${id}`);
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  const inputs = demoInputs(id);
  expect(inputs.excludedHazards).toEqual([rule]);
  const kept = await plan.answers();
  expect(kept.limits.find((l) => l.what.startsWith("low pH"))).toMatchObject({ what: "low pH HCN: pH falls below 10.5 (kept out)" }); // prettier-ignore
  expect(kept.pH).toBe(Number(solved(inputs).setPoint!.pH.toFixed(2)));
  expect(Math.max(...(await plan.trace("kept-HCN"))!.x.filter((x) => x !== null))).toBeCloseTo(10.5, 3);
  await plan.pointAt(9.6, 0.2);
  await plan.readOut().getByText(/pH at or above 10.5 against/).waitFor(); // prettier-ignore
  const gases = page.getByRole("region", { name: "Gas over the liquor" });
  await gases.getByText(/closed headspace/).waitFor();
  await gases.getByText(/does not replace a hazard study/).waitFor();
  expect((await plan.trace("gas-HCN"))?.hatched).toBe(true);

  await plan.button("No longer keep HCN out").click();
  const free = { ...inputs, excludedHazards: [] };
  await expect.poll(async () => (await plan.answers()).pH).toBe(Number(solved(free).setPoint!.pH.toFixed(2)));
  expect((await plan.answers()).limits.some((l) => l.what.includes("kept out"))).toBe(false);
  expect(await plan.trace("kept-HCN")).toBeUndefined();
  await plan.button("Undo").click();
  await expect.poll(async () => (await plan.answers()).pH).toBe(kept.pH);
});
