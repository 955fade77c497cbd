import { describe, expect, test } from "vitest";
import { valueOf } from "../../../shared/outcome";
import type { Problem } from "../../../shared/schemas/problem";
import { prepare } from "../../../shared/selection/prepare";
import type { Species } from "../../../shared/species/chemicalData";
import { speciesOfComponent, speciesOfMetal } from "../../support/oracleSpecies";
import { randomProblem } from "../../support/problems";
import { seeded } from "../../support/random";
import { library } from "../../support/solver";

const ids = (list: readonly Species[]): string[] => list.map((s) => s.id).sort();
const base: Problem = {
  temperatureC: 25,
  metals: [{ element: "Fe", requirement: "solid", activity: 1e-3 }],
  ligands: [{ component: "S", activity: 0.5 }],
  frame: { pH: [0, 14], Eh: [-1, 1.5] },
  controlBand: { pH: 0.15, Eh: 0.03 },
};
const chosen = (change: Partial<Problem> = {}): string[] =>
  ids(valueOf(prepare({ ...base, ...change }, library)).metals[0]!.species);
const reasonFor = (id: string, change: Partial<Problem> = {}): string | undefined =>
  valueOf(prepare({ ...base, ...change }, library)).leftOut.find((l) => l.species === id)?.reason;

test("the species chosen are those a plain reading of the tables finds", () => {
  const random = seeded(20261212);
  for (let i = 0; i < 150; i++) {
    const p: Problem = {
      ...randomProblem(random),
      dosed: random.shuffled(["persulfate", "chlorate", "peroxide", "sulfite"]).slice(0, random.whole(0, 2)),
    };
    if (random.chance(0.5)) p.metals = p.metals.map((m) => ({ ...m, role: "gangue" as const }));
    const { metals, components } = valueOf(prepare(p, library));
    for (const m of metals) expect(ids(m.species)).toEqual(ids(speciesOfMetal(m.element, p, library)));
    for (const c of components) expect(ids(c.species)).toEqual(ids(speciesOfComponent(c.component, p, library)));
  }
});

describe("the solids basis", () => {
  const hematite = "Fe2O3(s,hematite)";
  const ferrihydrite = "Fe(OH)3(s,ferrihydrite)";
  test("none: nothing is left out but the plan's own list", () => {
    expect(chosen()).toContain(hematite);
    expect(chosen({ leftOut: [hematite] })).not.toContain(hematite);
    expect(reasonFor(hematite, { leftOut: [hematite] })).toBe("left out by the plan");
  });
  test("aged: the defaults, with their temperatures", () => {
    expect(chosen({ solidsBasis: "aged" })).not.toContain(hematite);
    expect(chosen({ solidsBasis: "aged", temperatureC: 100 })).toContain(hematite);
    expect(chosen({ solidsBasis: "aged", temperatureC: 99.9 })).toContain(ferrihydrite);
    expect(chosen({ solidsBasis: "aged", temperatureC: 100 })).not.toContain(ferrihydrite);
    expect(reasonFor(hematite, { solidsBasis: "aged" })).toMatch(/forms from solution only above/);
  });
  test("fresh: what forms in hours", () => {
    expect(chosen({ solidsBasis: "fresh", temperatureC: 60 })).not.toContain("FeOOH(s,goethite)");
    expect(chosen({ solidsBasis: "aged", temperatureC: 60 })).toContain("FeOOH(s,goethite)");
    expect(reasonFor("FeOOH(s,goethite)", { solidsBasis: "fresh" })).toMatch(/^fresh solids: takes days cold/);
    expect(chosen({ solidsBasis: "fresh", temperatureC: 70 })).toContain("FeOOH(s,goethite)");
  });
  test("what is named for the feed or put back stays, on every basis", () => {
    for (const solidsBasis of ["feed", "fresh", "aged"] as const) {
      expect(chosen({ solidsBasis, feedMinerals: [hematite] })).toContain(hematite);
      expect(chosen({ solidsBasis, putBack: [hematite] })).toContain(hematite);
      expect(chosen({ solidsBasis, putBack: [hematite], leftOut: [hematite] })).not.toContain(hematite);
    }
  });
  test("a reagent dosed brings its forms", () => {
    const peroxide = (dosed: string[]) =>
      valueOf(prepare({ ...base, solidsBasis: "aged", ligands: [{ component: "Cl", activity: 1 }], dosed }, library)).leftOut.map((l) => l.species); // prettier-ignore
    expect(peroxide([])).toContain("ClO3^-(aq)");
    expect(peroxide(["chlorate"])).not.toContain("ClO3^-(aq)");
  });
});

describe("sulfur", () => {
  const sulfide = "FeS(s,troilite)";
  test("is two pools below 150 C unless asked otherwise; a sulfide waits for a total of sulfide sulfur", () => {
    expect(chosen()).not.toContain(sulfide);
    expect(chosen({ temperatureC: 149.9 })).not.toContain(sulfide);
    expect(chosen({ temperatureC: 150 })).toContain(sulfide);
    expect(chosen({ temperatureC: 150, sulfateReduction: false })).not.toContain(sulfide);
    expect(chosen({ sulfateReduction: true })).toContain(sulfide);
    expect(chosen({ ligands: [...base.ligands, { component: "S(sulfide)", activity: 1e-3 }] })).toContain(sulfide);
  });
  test("of the two pools holds its own species", () => {
    const { components } = valueOf(
      prepare({ ...base, ligands: [...base.ligands, { component: "S(sulfide)", activity: 1e-3 }] }, library),
    );
    const [sulfate, reduced] = components.map((c) => ids(c.species));
    expect(sulfate).toEqual(expect.arrayContaining(["SO4^2-(aq)", "HSO4^-(aq)", "S2O8^2-(aq)"]));
    expect(reduced).toEqual(expect.arrayContaining(["H2S(aq)", "HS^-(aq)", "S(s,rhombic)", "H2SO3(aq)"]));
    expect(sulfate!.filter((id) => reduced!.includes(id))).toEqual([]);
  });
});

describe("what else a species holds", () => {
  test("a second metal: left out, and the solution says so", () => {
    expect(chosen({ sulfateReduction: true })).not.toContain("CuFeS2(s)");
    expect(reasonFor("CuFeS2(s)", { sulfateReduction: true })).toBe(
      "holds Cu as well: a second metal is not solved here",
    );
  });
  test("another component without a total: left out, and the solution says so", () => {
    expect(reasonFor("KFe3(SO4)2(OH)6(s,jarosite)")).toBe("K has no total");
    expect(chosen({ others: [{ component: "K", activity: 0.1 }] })).toContain("KFe3(SO4)2(OH)6(s,jarosite)");
  });
  test("a ligand of another lixiviant: not of this question, and nothing is said", () => {
    expect(chosen()).not.toContain("FeCl^2+(aq)");
    expect(reasonFor("FeCl^2+(aq)")).toBeUndefined();
  });
  test("gases never count", () => expect(chosen().some((id) => id.endsWith("(g)"))).toBe(false));
});

describe("own species and `only`", () => {
  test("a row with a known id takes its place, a new one is added", () => {
    const row = { ...library.species.get("Fe^2+(aq)")!.row };
    const own = [{ ...row, dGf_kJ: -90, dHf_kJ: null }, { ...row, id: "Fe^2+(aq,ours)", dHf_kJ: null }]; // prettier-ignore
    const { data, metals } = valueOf(prepare({ ...base, species: own }, library));
    expect(data.species.get("Fe^2+(aq)")!.row.dGf_kJ).toBe(-90);
    expect(ids(metals[0]!.species)).toEqual(expect.arrayContaining(["Fe^2+(aq)", "Fe^2+(aq,ours)"]));
    expect(library.species.get("Fe^2+(aq)")!.row.dGf_kJ).not.toBe(-90);
  });
  test("only: of the metals nothing else; the ligands keep their species", () => {
    const only = ["Fe(s)", "Fe^2+(aq)"];
    const { metals, components } = valueOf(prepare({ ...base, only }, library));
    expect(ids(metals[0]!.species)).toEqual(only);
    expect(components[0]!.species.length).toBeGreaterThan(1);
  });
  test("a tenor becomes molality times gamma, gamma 1 unless said", () => {
    const metal = { element: "Fe", requirement: "solid" as const, gPerL: 5.5845 };
    const activity = (gamma?: number) =>
      valueOf(prepare({ ...base, metals: [gamma === undefined ? metal : { ...metal, gamma }] }, library)).metals[0]!
        .activity;
    expect(activity()).toBeCloseTo(0.1, 6);
    expect(activity(0.25)).toBeCloseTo(0.025, 6);
  });
  test("a choice remembered is that of its own question", () => {
    const first = chosen({ solidsBasis: "fresh", temperatureC: 69 });
    chosen({ solidsBasis: "aged", temperatureC: 69 });
    expect(chosen({ solidsBasis: "fresh", temperatureC: 71 })).not.toEqual(first);
    expect(chosen({ solidsBasis: "fresh", temperatureC: 69 })).toEqual(first);
  });
});
