import { describe, expect, test } from "vitest";
import { energiesAt } from "../../../shared/gibbs/energies";
import type { Problem } from "../../../shared/schemas/problem";
import { kelvin } from "../../../shared/units";
import { lasting, slowCouples } from "../../../shared/warnings/kinetics";
import { band, library, solved } from "../../support/solver";

const neutral: Problem = {
  temperatureC: 60,
  metals: [
    { element: "Zn", role: "target", requirement: "dissolved", activity: 0.08 },
    { element: "Fe", role: "gangue", requirement: "solid", activity: 1e-5 },
  ],
  ligands: [{ component: "S", activity: 0.5 }],
  solidsBasis: "fresh",
  frame: { pH: [1, 8], Eh: [-0.2, 1.2] },
  controlBand: band,
};
const said = (problem: Problem, code: string) => solved(problem).warnings.filter((w) => w.code === code);
const texts = (problem: Problem, code: string) => said(problem, code).map((w) => w.text).join("\n"); // prettier-ignore

describe("LIGAND_DRAWN_DOWN", () => {
  const cyanide = (total: number, silver: number): Problem => ({
    temperatureC: 25,
    metals: [{ element: "Ag", role: "target", requirement: "dissolved", activity: silver }],
    ligands: [{ component: "CN", activity: total }],
    frame: { pH: [9, 12], Eh: [-0.8, 0.4] },
    controlBand: band,
  });

  test("a total of which the dissolved metal would bind more than a third is said to be drawn down", () => {
    // by the formula alone: a dicyano or tricyano complex binds two or three cyanides a silver
    const ruling = solved(cyanide(0.01, 0.003)).fields.map((f) => /^Ag\(CN\)([234])/.exec(f.species)?.[1]);
    const bound = Math.max(...ruling.map((n) => Number(n ?? 0))) * 0.003;
    expect(bound).toBeGreaterThan(0.01 / 3);
    const [warning, ...more] = said(cyanide(0.01, 0.003), "LIGAND_DRAWN_DOWN");
    expect(more).toEqual([]);
    expect(warning).toMatchObject({ metal: "Ag" });
    expect(warning!.text).toBe(
      `Ag at activity 3.0e−3 would bind ${bound.toExponential(1).replace("-", "−")} mol/L of CN, more than a third of its total of 0.010 mol/L: the total is not drawn down here`,
    );
  });

  test("not where there is plenty, nor where no complex of the ligand has a field", () => {
    expect(said(cyanide(0.05, 1e-4), "LIGAND_DRAWN_DOWN")).toEqual([]);
    const trace = { ...neutral, ligands: [{ component: "Cl", activity: 1e-6 }] };
    expect(said(trace, "LIGAND_DRAWN_DOWN")).toEqual([]);
  });
});

describe("METASTABLE", () => {
  test("a limit on ferrihydrite names the more stable solid left out, and by how much", () => {
    const [warning, ...more] = said(neutral, "METASTABLE").filter((w) => w.metal === "Fe");
    expect(more).toEqual([]);
    expect(warning!.species).toBe("Fe(OH)3(s,ferrihydrite)");
    // 2 Fe(OH)3 = Fe2O3 + 3 H2O by the tables' own energies
    const energies = energiesAt(library, kelvin(60));
    const gain =
      energies.of("Fe(OH)3(s,ferrihydrite)").G - (energies.of("Fe2O3(s,hematite)").G + 3 * energies.of("H2O(l)").G) / 2;
    expect(warning!.text).toContain(`Fe2O3(s,hematite) is ${(gain / 1000).toPrecision(2)} kJ a mole of Fe more stable`);
    expect(warning!.text).toContain("fresh solids");
  });

  test("not where the stable solid itself counts, nor for a field that no window, set point or target touches", () => {
    const all = { ...neutral, solidsBasis: undefined } as Problem;
    delete all.solidsBasis;
    expect(said(all, "METASTABLE").filter((w) => w.metal === "Fe")).toEqual([]);
    const watched: Problem = {
      ...neutral,
      metals: [neutral.metals[0]!, { element: "Fe", role: "watched", requirement: "free", activity: 1e-5 }],
      frame: { pH: [1, 4.6], Eh: [-0.2, 1.2] },
    };
    const ruling = solved(watched).fields.map((f) => f.species);
    expect(ruling).toContain("Fe(OH)3(s,ferrihydrite)"); // drawn at the right edge, far from the set point
    expect(said(watched, "METASTABLE")).toEqual([]);
  });

  test("dissolved species are never called so for a solid's sake", () => {
    for (const w of said(neutral, "METASTABLE")) expect(w.species).toMatch(/\(s/);
  });
});

describe("KINETICS", () => {
  test("iron's hydrolysis in acid, where a limit rests on it; not on the alkaline side", () => {
    expect(texts(neutral, "KINETICS")).toMatch(/iron hydrolyses over hours.*common practice, no source/);
    const alkaline: Problem = { ...neutral, frame: { pH: [9, 13.5], Eh: [-0.2, 0.6] } };
    expect(texts(alkaline, "KINETICS")).not.toMatch(/hydrolyses/);
  });

  test("cobalt won by zinc dust, with its source; cobalt that is only to stay dissolved, not", () => {
    const cement: Problem = {
      ...neutral,
      metals: [
        { element: "Co", role: "target", requirement: "metal", activity: 1e-5 },
        { element: "Zn", role: "gangue", requirement: "dissolved", activity: 0.5 },
      ],
      frame: { pH: [1, 6], Eh: [-1, 0.4] },
      water: { bound: "none" },
    };
    expect(texts(cement, "KINETICS")).toMatch(/cement slowly.*Lew 1994/);
    const stay = { ...cement, metals: [{ ...cement.metals[0]!, requirement: "dissolved" as const }, cement.metals[1]!] };
    expect(texts(stay, "KINETICS")).not.toMatch(/cement/);
  }); // prettier-ignore

  test("manganese held by air's reach, silent once a strong oxidant is dosed", () => {
    const manganese: Problem = {
      ...neutral,
      metals: [{ element: "Mn", role: "gangue", requirement: "dissolved", activity: 0.01 }],
    };
    expect(texts(manganese, "KINETICS")).toMatch(/air does not oxidise Mn\(II\)/);
    expect(texts({ ...manganese, dosed: ["persulfate"] }, "KINETICS")).not.toMatch(/Mn\(II\)/);
  });

  test("chalcopyrite in the feed of a copper leach; not where copper is only watched", () => {
    const copper: Problem = {
      ...neutral,
      sulfateReduction: true,
      metals: [
        { element: "Cu", role: "target", requirement: "dissolved", activity: 0.05 },
        { element: "Fe", role: "gangue", requirement: "free", activity: 1e-3 },
      ],
      feedMinerals: ["CuFeS2(s)"],
    };
    expect(said(copper, "KINETICS").find((w) => w.species === "CuFeS2(s)")!.text).toMatch(/passivates.*Nicol/);
    const watched = { ...copper, metals: [{ ...copper.metals[0]!, role: "watched" as const }, copper.metals[1]!] };
    expect(said(watched, "KINETICS").find((w) => w.species === "CuFeS2(s)")).toBeUndefined();
  });

  test("cyanide lasts by kinetics alone; a liquor without it says nothing of it", () => {
    const gold: Problem = {
      ...neutral,
      metals: [{ element: "Au", role: "target", requirement: "dissolved", activity: 1e-5 }],
      ligands: [{ component: "CN", activity: 0.01 }],
      frame: { pH: [9, 13], Eh: [-0.8, 0.6] },
    };
    expect(texts(gold, "KINETICS")).toMatch(/cyanate is the stable form/);
    expect(texts(neutral, "KINETICS")).not.toMatch(/cyan/);
  });

  test("every rule spoken of stands in the tables", () => {
    const rules = new Set(library.tables.defaults.map((r) => r.id));
    for (const { rule } of [...slowCouples, ...lasting]) expect(rules).toContain(rule);
  });
});

describe("TEMPERATURE_TRUST of a ligand's holder", () => {
  const hot = (temperatureC: number): Problem => ({
    ...neutral,
    temperatureC,
    metals: [{ element: "Ni", role: "target", requirement: "dissolved", activity: 0.01 }],
    ligands: [{ component: "CN", activity: 0.01 }],
    frame: { pH: [4, 12], Eh: [-0.6, 0.6] },
  });
  const holders = (t: number) => said(hot(t), "TEMPERATURE_TRUST").map((w) => w.species);
  test("warns where the cell's species is beyond its range, and is silent within", () => {
    const energies = energiesAt(library, kelvin(170));
    expect(energies.of("CN^-(aq)").warning ?? energies.of("HCN(aq)").warning).not.toBeNull();
    expect(holders(170).some((id) => id === "CN^-(aq)" || id === "HCN(aq)")).toBe(true);
    expect(holders(25).filter((id) => id === "CN^-(aq)" || id === "HCN(aq)")).toEqual([]);
  });
});
