import { expect, test } from "vitest";
import { openPage, openPageAs, turnTo } from "../support/browser";
import { demoInputs, expectSetPoint, speciesThere } from "./pages/core";
import { PlansScreen } from "./pages/plans";
import { SignInScreen } from "./pages/signIn";
import { type Answers, WorkspaceScreen } from "./pages/workspace";

const id = "demo-neutral-leach";
const asks = demoInputs(id);

test("a metallurgist opens the neutral leach and sees the window and what shuts it; they follow the hand, and undo brings them back", async () => {
  const { page } = await openPage();
  await new SignInScreen(page).enter("metallurgist");
  await new PlansScreen(page).open("Neutral leach, second tank");
  const plan = new WorkspaceScreen(page);
  await plan.drawn();

  const start = await plan.answers();
  expectSetPoint(start, asks);
  expect(start.pH).toBeCloseTo(5.1, 1);
  expect(start.limits.map((l) => l.what).sort()).toEqual([
    "high Eh water gives oxygen",
    "high pH zinc precipitates",
    "low Eh iron is reduced and dissolves",
    "low pH iron dissolves",
  ]);
  for (const { reaction } of start.limits) expect(reaction).toMatch(/\w.* → .*\w/);
  expect(await plan.shutGround()).toEqual(["shut-Zn", "shut-Fe"]);
  const window = await plan.trace("open-0");
  expect(window?.name).toBe("Window A");
  expect(window?.x.length).toBeGreaterThan(3);
  await page.getByText("Window A", { exact: true }).waitFor();

  // Hotter: all that is said and drawn has changed while the thumb is still held.
  const hot = await plan.drag("Temperature of the liquor", 40, async () => {
    const temperatureC = Number(await plan.number("Temperature of the liquor").inputValue());
    expect(temperatureC).toBeGreaterThan(asks.temperatureC);
    await expect.poll(() => plan.answers()).not.toEqual(start);
    expectSetPoint(await plan.answers(), { ...asks, temperatureC });
    return { answers: await plan.answers(), window: await plan.trace("open-0") };
  });
  expect(hot.window).not.toEqual(window);
  expect(hot.answers.limits.map((l) => l.distance)).not.toEqual(start.limits.map((l) => l.distance));
  await plan.header().getByText("Unsaved changes").waitFor();
  const letGo = await plan.restedAnswers();

  // More zinc to be carried: zinc precipitates earlier. One drag, one step of undo.
  await plan.openMetal("Zn");
  const strong = await plan.drag("Zn: carry", 25, async () => {
    await expect.poll(() => plan.answers()).not.toEqual(letGo);
    return { answers: await plan.answers(), window: await plan.trace("open-0") };
  });
  expect(Number(await plan.number("Zn: carry").inputValue())).toBeGreaterThan(0.08);
  expect(Math.max(...numbers(strong.window?.x))).toBeLessThan(Math.max(...numbers(hot.window?.x)));
  await plan.button("Undo").click();
  await expect.poll(() => plan.answers()).toEqual(letGo);
  await plan.button("Undo").click();
  await expect.poll(() => plan.answers()).toEqual(start);
  expect(await plan.trace("open-0")).toEqual(window);

  // Aged solids: goethite holds iron back from pH 3.06, ferrihydrite only from 4.06.
  const ironEdge = async () => {
    const { pH, limits } = await plan.answers();
    return pH - (limits.find((l) => l.what === "low pH iron dissolves")?.distance ?? NaN);
  };
  expect(await ironEdge()).toBeCloseTo(4.06, 1);
  await plan.chooseBasis("aged");
  await expect.poll(ironEdge).toBeCloseTo(3.06, 1);
  expectSetPoint(await plan.answers(), { ...asks, solidsBasis: "aged" });
  expect(Math.min(...numbers((await plan.trace("open-0"))?.x))).toBeCloseTo(await ironEdge(), 1);
});

test("the read-out names every metal's species under the cursor; all fields are one key away and remembered; potentials on another scale; a number that cannot be is told where it stands", async () => {
  const { page } = await openPageAs("metallurgist", { path: `/plans/${id}` });
  const plan = new WorkspaceScreen(page);
  await plan.drawn();

  for (const [pH, Eh] of [
    [2, 0.3],
    [7.6, 1.1],
    [4.5, 0.0],
  ] as const) {
    await plan.pointAt(pH, Eh);
    await plan.readOut().getByText("under the cursor").waitFor();
    const species = speciesThere(asks, pH, Eh);
    expect(species).toHaveLength(4);
    await expect
      .poll(() => plan.speciesRead())
      .toEqual(asks.metals.map((m, i) => `${m.element} ${plainId(species[i])}`));
  }

  const kept = page.waitForResponse((answer) => answer.url().endsWith("/me/preferences") && answer.request().method() === "PUT"); // prettier-ignore
  await page.keyboard.press("f");
  await plan.button("open ground").waitFor();
  await expect.poll(() => plan.shutGround()).toEqual([]);
  await page.waitForURL(/plain=1/);
  await kept;
  // The bare address states no view: what the member chose last stands.
  await page.goto(`/plans/${id}`);
  await plan.drawn();
  await plan.button("open ground").waitFor();
  expect(await plan.shutGround()).toEqual([]);
  await page.keyboard.press("f");
  await expect.poll(() => plan.shutGround()).toEqual(["shut-Zn", "shut-Fe"]);

  const onSHE = await plan.answers();
  expect(onSHE.EhText).toMatch(/\sV$/);
  expect(await plan.axisWords()).toContain("Eh / V vs SHE");
  await plan.asks("On the map").getByRole("button", { name: "V vs SHE" }).click();
  const dialog = page.getByRole("dialog");
  await dialog.getByRole("radio", { name: "mV" }).click();
  await dialog.getByRole("combobox", { name: "Electrode" }).click();
  await page.getByRole("option", { name: "Ag/AgCl, 3 mol/L KCl" }).click();
  await dialog.getByRole("button", { name: "Close" }).click();
  const onProbe = await plan.answers();
  expect(onProbe.EhText).toMatch(/\smV$/);
  expect(onProbe.pH).toBe(onSHE.pH);
  // Silver chloride in 3 mol/L chloride stands some 0.2 V above hydrogen.
  expect(onProbe.Eh).toBeGreaterThan(1000 * onSHE.Eh - 230);
  expect(onProbe.Eh).toBeLessThan(1000 * onSHE.Eh - 150);
  await expect.poll(async () => (await plan.axisWords()).filter((w) => /^Eh \/ mV vs .*AgCl/.test(w)).length).toBe(1);
  // Distances are differences, told in millivolts as the crosscuts tell them: the same whatever scale and electrode.
  const toOxygen = (answers: Answers) => answers.limits.find((l) => l.what.startsWith("high Eh"))?.distance ?? NaN;
  expect(toOxygen(onProbe)).toBe(toOxygen(onSHE));

  // A number that cannot be is told in a sentence where it stands, and stays as it was typed.
  await turnTo(page, `/plans/${id}`);
  await plan.drawn();
  const before = await plan.answers();
  const zinc = await plan.openMetal("Zn");
  const field = plan.number("Zn: carry");
  for (const [typed, sentence] of [
    ["0", "0 is too low: it must be above 0"],
    ["plenty", "“plenty” is not a number"],
  ] as const) {
    await plan.type("Zn: carry", typed);
    await zinc.getByRole("alert").getByText(sentence).waitFor();
    expect(await field.inputValue()).toBe(typed);
    expect(await field.getAttribute("aria-invalid")).toBe("true");
    expect(await plan.answers()).toEqual(before);
  }
  await field.press("Escape");
  expect(await field.inputValue()).toBe("8.0e-2");
  await plan.type("Zn: carry", "0,12");
  await expect.poll(() => plan.answers()).not.toEqual(before);
});

const numbers = (values: readonly (number | null)[] = []): number[] => values.filter((x) => x !== null);

/** As the read-out writes an id: "FeOOH(s,goethite)" as "FeOOH(s) goethite". */
const plainId = (id = ""): string => id.replace(/\(s,(.*)\)$/, "(s) $1");
