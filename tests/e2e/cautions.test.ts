import { expect, test } from "vitest";
import { themeColours } from "../../src/lib/theme";
import { sharedPageAs, turnTo } from "../support/browser";
import { demoInputs, expectSetPoint } from "./pages/core";
import { WorkspaceScreen } from "./pages/workspace";

const shared = sharedPageAs("metallurgist", { path: "/plans/demo-zinc-dust" });
const deference = "It does not replace a hazard study";

test("zinc-dust purification shows the cementation window with its caution, and follows the theme", async () => {
  const id = "demo-zinc-dust";
  const { page } = shared();
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  expectSetPoint(await plan.answers(), demoInputs(id));
  expect(await plan.shutGround()).toEqual(["shut-Cu", "shut-Cd", "shut-Zn"]);
  // At the set point copper and cadmium are metal while zinc stays dissolved.
  expect(await plan.speciesRead()).toEqual(["Cu Cu(s)", "Cd Cd(s)", expect.stringMatching(/^Zn .*(\(aq\)|[+−])$/)]);
  await plan.cautions().getByText("also makes hydrogen from the liquor: vent it").waitFor();
  await plan.cautions().getByText("arsine or stibine where the liquor holds arsenic or antimony").waitFor();
  expect(await plan.cautions().getByText(deference).count()).toBe(1);

  expect(await plan.ground()).toBe(themeColours.light.sheet);
  await plan.button("metallurgist").click();
  await page.getByRole("menuitemradio", { name: "Dark" }).click();
  await page.keyboard.press("Escape");
  await expect.poll(() => plan.ground()).toBe(themeColours.dark.sheet);
  const paper = await page.locator("html").evaluate((html) => getComputedStyle(html).backgroundColor);
  expect(paper).toBe("rgb(15, 26, 23)");
});

test("cyanide below pH 10.5 is warned of beside the set point, and drawn on the map", async () => {
  const id = "demo-cyanide-leach";
  const { page } = shared();
  await turnTo(page, `/plans/${id}`);
  const plan = new WorkspaceScreen(page);
  await plan.drawn();
  await plan.button("No longer keep HCN out").click();
  await expect.poll(() => plan.trace("hazard-hcn")).toBeDefined();
  const region = await plan.trace("hazard-hcn");
  expect(region?.hatched).toBe(true);
  expect(Math.max(...(region?.x ?? []).filter((x) => x !== null))).toBeCloseTo(10.5, 3);
  const warning = plan.cautions().getByText("set point stands below pH 10.5");

  await plan.type("pH, to", "13");
  await plan.type("pH, from", "10.8");
  await expect.poll(async () => (await plan.answers()).pH).toBeGreaterThan(10.5);
  expect(await warning.count()).toBe(0);
  // The liquor's own caution stands whatever the set point.
  await plan.cautions().getByText("Keep the liquor above pH 10.5").waitFor();

  await plan.type("pH, from", "9");
  await plan.type("pH, to", "10.4");
  await warning.waitFor();
  expect((await plan.answers()).pH).toBeLessThan(10.5);
  await plan.cautions().getByText(deference).waitFor();
});
