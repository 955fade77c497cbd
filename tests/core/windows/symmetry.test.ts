import { describe, expect, test } from "vitest";
import { FARADAY, GAS_CONSTANT, LN10 } from "../../../shared/constants";
import type { Frame, Problem } from "../../../shared/schemas/problem";
import type { Species } from "../../../shared/species/chemicalData";
import { speciesOfMetal } from "../../support/oracleSpecies";
import { randomProblem } from "../../support/problems";
import { seeded } from "../../support/random";
import { insideWindows } from "../../support/read";
import { areaOfWindows, expectSameWindows } from "../../support/sameWindows";
import { library, solved } from "../../support/solver";

const some = (n: number, seed: number): Problem[] => {
  const random = seeded(seed);
  return Array.from({ length: n }, () => randomProblem(random));
};

describe("the order of the question does not matter", () => {
  test("of metals, ligands and lists", () => {
    const random = seeded(3);
    for (const p of some(40, 20261203)) {
      const turned: Problem = {
        ...p,
        metals: random.shuffled(p.metals),
        ligands: random.shuffled(p.ligands),
        leftOut: random.shuffled(p.leftOut ?? []),
      };
      expectSameWindows(solved(p), solved(turned));
    }
  });

  test("of the species it brings along", () => {
    const random = seeded(4);
    for (const p of some(25, 20261204)) {
      const rows = p.metals.flatMap((m) => speciesOfMetal(m.element, p, library)).map((s) => s.row);
      expectSameWindows(solved({ ...p, species: rows }), solved({ ...p, species: random.shuffled(rows) }));
      expectSameWindows(solved(p), solved({ ...p, species: rows })); // rows as they are change nothing
    }
  });
});

describe("what cannot change an answer does not", () => {
  test("every activity times one, a tenor instead of the activity it makes, a free metal more", () => {
    for (const p of some(20, 20261205)) {
      const answer = solved(p);
      expectSameWindows(answer, solved({ ...p, metals: p.metals.map((m) => ({ ...m, activity: m.activity! * 1 })) }));
      const asTenor = p.metals.map(({ activity, ...m }) => ({
        ...m,
        gPerL: Math.max(1e-12, (activity! * library.molarMass.get(m.element)!) / 0.5),
        gamma: 0.5,
      }));
      expectSameWindows(answer, solved({ ...p, metals: asTenor }));
      const another = ["Sn", "Mo", "Pd"].find((e) => !p.metals.some((m) => m.element === e))!;
      const more = [...p.metals, { element: another, requirement: "free" as const, activity: 1e-9 }];
      expectSameWindows(
        { ...answer, windows: answer.windows.filter((w) => w.setPoint.mixedPotential) },
        dropCouples(p, more),
      );
    }
  });

  test("a smaller frame shows the same states", () => {
    const random = seeded(6);
    for (const p of some(25, 20261206)) {
      const { pH, Eh } = p.frame;
      const inner: Frame = { pH: [pH[0] + 0.21 * (pH[1] - pH[0]), pH[1] - 0.13 * (pH[1] - pH[0])], Eh: [Eh[0] + 0.08 * (Eh[1] - Eh[0]), Eh[1] - 0.3 * (Eh[1] - Eh[0])] }; // prettier-ignore
      const [whole, part] = [solved(p), solved({ ...p, frame: inner })];
      for (let i = 0; i < 60; i++) {
        const at = [random.between(...inner.pH), random.between(...inner.Eh)] as const;
        expect(insideWindows(part, ...at)).toBe(insideWindows(whole, ...at));
      }
    }
  });
});

/** The same question with a metal more; its windows that have no couple, since a rich free metal may bring one. */
function dropCouples(p: Problem, metals: Problem["metals"]) {
  const answer = solved({ ...p, metals });
  return { ...answer, windows: answer.windows.filter((w) => w.setPoint.mixedPotential) };
}

describe("areas add up", () => {
  test("dissolved and solid make all; metal and compound make solid", () => {
    for (const p of some(25, 20261207)) {
      const [first, ...others] = p.metals;
      const water = p.water ?? { bound: "both" as const }; // its default hangs on the requirement
      const areaWith = (requirement: Problem["metals"][number]["requirement"]) =>
        areaOfWindows(solved({ ...p, water, metals: [{ ...first!, requirement }, ...others] }));
      const [free, dissolved, solid, metal, compound] = (["free", "dissolved", "solid", "metal", "compound"] as const).map(areaWith); // prettier-ignore
      expect(dissolved! + solid!).toBeCloseTo(free!, 9);
      expect(metal! + compound!).toBeCloseTo(solid!, 9);
    }
  });

  test("less to carry dissolves further", () => {
    for (const p of some(25, 20261208)) {
      const [first, ...others] = p.metals;
      const areaAt = (activity: number) =>
        areaOfWindows(solved({ ...p, metals: [{ ...first!, requirement: "dissolved", activity }, ...others] }));
      const [much, little, least] = [1, 1e-3, 1e-6].map(areaAt);
      expect(little!).toBeGreaterThanOrEqual(much! - 1e-9);
      expect(least!).toBeGreaterThanOrEqual(little! - 1e-9);
    }
  });
});

describe("a change of zero moves the picture and nothing else", () => {
  const step = (joule: number): number => Math.round(joule * 1024) / 1024; // the grid's own price, so that the shift is exact
  const [proton, electron] = [step(GAS_CONSTANT * 298.15 * LN10), step(FARADAY)];
  const base = (metal: string, requirement: "dissolved" | "solid"): Problem => ({
    temperatureC: 25,
    metals: [{ element: metal, requirement, activity: 1e-3 }],
    ligands: [],
    frame: { pH: [-1, 15], Eh: [-1.6, 2] },
    water: { bound: "none" },
    controlBand: { pH: 0.15, Eh: 0.03 },
  });
  /** Twins of all species of the metal with so much more energy, alone. */
  const shifted = (p: Problem, more: (s: Species) => number): Pick<Problem, "species" | "only"> => {
    const species = speciesOfMetal(p.metals[0]!.element, p, library).map((s) => ({
      ...s.row,
      id: `${s.id.slice(0, -1)},twin)`,
      dGf_kJ: s.row.dGf_kJ + more(s) / 1000,
      dHf_kJ: null,
      S_J: null,
    }));
    return { species, only: species.map((s) => s.id) };
  };
  const protons = (s: Species): number => (s.composition["H"] ?? 0) - 2 * (s.composition["O"] ?? 0);

  const metals = ["Cu", "Fe", "Zn", "Mn", "Pb", "As", "U", "Al"];
  test.each(metals)("%s", (metal) => {
    for (const requirement of ["dissolved", "solid"] as const) {
      const p = base(metal, requirement);
      const answer = solved(p);
      const perAtom = solved({ ...p, ...shifted(p, (s) => 12345 * s.composition[metal]!) });
      expectSameWindows(answer, perAtom);
      const inPH = solved({
        ...p,
        frame: { ...p.frame, pH: [-3, 13] },
        ...shifted(p, (s) => 2 * proton * protons(s)),
      });
      expectSameWindows(answer, inPH, [-2, 0]);
      const inEh = solved({
        ...p,
        frame: { ...p.frame, Eh: [-1.1, 2.5] },
        ...shifted(p, (s) => -0.5 * electron * (protons(s) - s.charge)),
      });
      expectSameWindows(answer, inEh, [0, 0.5]);
    }
  });
});
