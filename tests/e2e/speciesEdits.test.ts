import { expect, onTestFinished, test } from "vitest";
import type { SpeciesEditRow } from "../../shared/schemas/speciesEdit";
import { chemistry } from "../support/chemistry";
import { openPageAs } from "../support/browser";
import { ChemistryScreen } from "./pages/chemistry";
import { PlansScreen } from "./pages/plans";

const cadmium = "CdSO4(aq)";
const plan = "Neutral leach, second tank";

test("a metallurgist overrides a species with its source, the plans that used it say so, and the edit is taken back", async () => {
  const { page } = await openPageAs("metallurgist", {
    path: `/chemistry/${encodeURIComponent(cadmium)}`,
    expected: [400],
  });
  // Whatever becomes of this test, the library is left as shipped for those after it.
  onTestFinished(async () => {
    await page.evaluate(async (species) => {
      const at = `/api/chemistry/edits?species=${encodeURIComponent(species)}&active=true`;
      const { rows } = (await (await fetch(at)).json()) as { rows: (SpeciesEditRow & { version: number })[] };
      for (const { id, version } of rows)
        await fetch(`/api/chemistry/edits/${id}`, { method: "DELETE", headers: { "if-match": `"${version}"` } });
    }, cadmium);
  });
  const library = new ChemistryScreen(page);
  const shipped = chemistry().species.get(cadmium)!.row;
  const shown = library.detail(cadmium);
  await shown.getByText("None: the row is as shipped.").waitFor();
  await shown.getByRole("button", { name: "override" }).click();
  const dialog = page.getByRole("dialog");
  const G = dialog.getByRole("spinbutton", { name: "G of formation" });
  await G.fill(String(shipped.dGf_kJ + 5));
  await dialog.getByRole("button", { name: "Override" }).click();
  await dialog.getByText("Name the source: author, year, table or page").waitFor();
  await dialog.getByLabel("Author, year, table or page").fill("Site sheet 12 (invented), 2026, table 3");
  await dialog.getByRole("button", { name: "Override" }).click();
  // G, H and S of the row must agree: the whole library is checked before it is taken.
  await dialog.getByRole("alert").first().waitFor();
  expect(await dialog.getByLabel("Author, year, table or page").inputValue()).toContain("Site sheet 12");
  for (const name of ["H of formation", "Entropy"]) {
    await dialog.getByRole("spinbutton", { name }).fill("");
    await dialog.getByRole("spinbutton", { name }).press("Tab");
  }
  await dialog.getByRole("button", { name: "Override" }).click();
  await shown.getByText("Overridden here: these are not the shipped numbers.").waitFor();
  await expect.poll(() => library.value(cadmium, /^G of formation$/)).toBeCloseTo(shipped.dGf_kJ + 5, 2);
  await shown.getByText("Site sheet 12 (invented), 2026, table 3").first().waitFor();

  await page.getByRole("link", { name: "Plans", exact: true }).click();
  const plans = new PlansScreen(page);
  await plans.row(plan).click();
  await plans.detail(plan).getByText("The revision keeps the numbers it used").waitFor();
  expect(await plans.detail(plan).innerText()).toMatch(/CdSO/);

  await page.getByRole("link", { name: "Chemistry", exact: true }).click();
  await page.goto(`/chemistry/${encodeURIComponent(cadmium)}`);
  await shown.getByRole("button", { name: /take back/i }).click();
  await page.getByRole("dialog").getByLabel(/^Why/).fill("The sheet was for chloride");
  await page
    .getByRole("dialog")
    .getByRole("button", { name: /take back/i })
    .click();
  await shown.getByText("As shipped again: every edit was taken back.").waitFor();
  await expect.poll(() => library.value(cadmium, /^G of formation$/)).toBeCloseTo(shipped.dGf_kJ, 2);
  await page.goto("/plans");
  await plans.row(plan).click();
  await plans.detail(plan).getByRole("link", { name: "Open" }).waitFor();
  expect(await plans.detail(plan).getByText("The revision keeps the numbers it used").count()).toBe(0);
});

test("a species of the site's own is added with its source, found in the library, and taken back", async () => {
  const { page } = await openPageAs("metallurgist", { path: "/chemistry" });
  await page.getByRole("button", { name: "Add a species" }).click();
  const dialog = page.getByRole("dialog");
  await dialog.getByLabel("Formula", { exact: true }).fill("Cd(SO4)3^4-");
  await dialog.getByLabel("Name", { exact: true }).fill("trisulfato cadmium (invented)");
  const G = dialog.getByRole("spinbutton", { name: "G of formation" });
  await G.fill("-2320");
  await G.press("Tab");
  await dialog.getByLabel("Author, year, table or page").fill("Site sheet 13 (invented), 2026");
  await dialog.getByRole("button", { name: "Add", exact: true }).click();
  const library = new ChemistryScreen(page);
  const shown = library.detail("Cd(SO4)3^4-(aq)");
  await shown.getByText("Added here: the shipped library does not have it.").waitFor();
  expect(await library.value("Cd(SO4)3^4-(aq)", /^G of formation$/)).toBe(-2320);
  await shown.getByRole("button", { name: /take back/i }).click();
  await page.getByRole("dialog").getByLabel(/^Why/).fill("Only a trial");
  await page
    .getByRole("dialog")
    .getByRole("button", { name: /take back/i })
    .click();
  await page
    .getByText(/Taken back|The library has no species/)
    .first()
    .waitFor();
});

test("a technician may read the library, not edit it", async () => {
  const { page } = await openPageAs("technician", { path: `/chemistry/${encodeURIComponent(cadmium)}` });
  await new ChemistryScreen(page).detail(cadmium).getByText("G of formation", { exact: true }).first().waitFor();
  expect(await page.getByRole("button", { name: /override|Add a species|take back/ }).count()).toBe(0);
});
