import { expect, test } from "vitest";
import { energiesAt } from "../../shared/gibbs/energies";
import { kelvin } from "../../shared/units";
import { chemistry } from "../support/chemistry";
import { openPageAs } from "../support/browser";
import { ChemistryScreen } from "./pages/chemistry";

const id = "FeOOH(s,goethite)";

test("a species is found by element and phase, with G, citation, grade, temperature model and G at a chosen temperature", async () => {
  const { page } = await openPageAs("technician", { path: "/chemistry" });
  const library = new ChemistryScreen(page);
  await library.choose("Fe, iron", "solid");
  const ofIron = [...chemistry().species.values()].filter((s) => s.phase === "s" && s.composition.Fe !== undefined);
  await page.getByText(`${ofIron.length} shown`).waitFor();
  expect(new Set(await library.column(3))).toEqual(new Set(["solid"]));
  await page.getByRole("row", { name: /goethite/ }).click();

  const shown = library.detail(id);
  expect(await library.value(id, "G of formation")).toBe(-489.8);
  await shown.getByText("grade A").waitFor();
  await shown.getByText(/Majzlan J\. et al\. \(2003\) Thermodynamics of Fe oxides/).waitFor();
  const energy = energiesAt(chemistry(), kelvin(60)).of(id);
  await shown.getByText(energy.model).waitFor();
  await shown.getByRole("spinbutton", { name: "Temperature" }).fill("60");
  await page.keyboard.press("Enter");
  await shown.getByText(/^G at 60\s°C$/).waitFor();
  expect(await library.value(id, /^G at 60\s°C$/)).toBe(Number((energy.G / 1000).toFixed(2)));

  await library.find("no such rock");
  await page.getByText("No species has all of that.").waitFor();
});
