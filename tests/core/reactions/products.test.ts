import { describe, expect, test } from "vitest";
import { valueOf } from "../../../shared/outcome";
import { overallReaction, type SetPointQuestion } from "../../../shared/reactions/atSetPoint";
import { imbalance } from "../../../shared/reactions/elements";
import { productsFor } from "../../../shared/reactions/products";
import type { Problem } from "../../../shared/schemas/problem";
import { presetChoice } from "../../support/presets";
import { band, library as data, wideFrame } from "../../support/solver";

const plan = (preset: string, metals: Problem["metals"], more: Partial<Problem> = {}): Problem => ({
  ...{ temperatureC: 90, metals, ...presetChoice(preset), solidsBasis: "fresh", frame: wideFrame, controlBand: band },
  ...more,
});
const copper: Problem["metals"][number] = { element: "Cu", requirement: "dissolved", activity: 0.01 };
const leach = plan("sulfate", [copper], { temperatureC: 25 });
const hotIron = plan("sulfate", [{ element: "Fe", requirement: "solid", activity: 1e-4 }]);
const JAROSITE = "KFe3(SO4)2(OH)6(s,jarosite)";
const overall = (problem: Problem, asked: SetPointQuestion) => valueOf(overallReaction(problem, data, asked));
const message = (problem: Problem, asked: SetPointQuestion): string => {
  const outcome = overallReaction(problem, data, asked);
  if (outcome.ok) throw new Error(`${outcome.value.text}: this should be refused`);
  return outcome.error.message;
};
const closes = (terms: { species: string; coefficient: number }[]) =>
  imbalance(data, terms.flatMap((t) => (t.species === "e^-" ? [] : [[data.species.get(t.species)!, t.coefficient] as const]))); // prettier-ignore

describe("iron out of an acid liquor at 90 C, as the plant lets it out", () => {
  const from = { from: "Fe^3+(aq)", at: { pH: 1.7, Eh: 0.75 }, base: "CaO" } as const;
  const acidMade = (products?: Record<string, string>) => {
    const found = overall(hotIron, products ? { ...from, products } : from);
    expect(closes([...found.terms])).toEqual([]);
    return found.demand.find((d) => d.role === "acid")!.kgPerKgMetal!;
  };
  // practice.md 3.6: hydrolysis returns 2.634 kg H2SO4 a kg of iron as goethite or hematite, 1.756 as jarosite.
  test.each([
    ["goethite", "FeOOH(s,goethite)", 2.634],
    ["hematite", "Fe2O3(s,hematite)", 2.634],
    ["potassium jarosite", "KFe3(SO4)2(OH)6(s,jarosite)", 1.756],
    ["sodium jarosite", "NaFe3(SO4)2(OH)6(s,natrojarosite)", 1.756],
    // 3 Fe^3+ + 2 SO4^2- + 7 H2O = (H3O)Fe3(SO4)2(OH)6 + 5 H^+: five protons where the others give six
    ["hydronium jarosite", "(H3O)Fe3(SO4)2(OH)6(s,hydronium-jarosite)", (1.756 * 5) / 6],
  ])("%s gives back its acid", (_what, id, kg) => expect(acidMade({ Fe: id })).toBeCloseTo(kg, 2));
  test("what the plan does not hold is taken and said: potassium for the jarosite", () => {
    const found = overall(hotIron, { ...from, products: { Fe: JAROSITE } });
    expect(found.assumed.map((a) => a.component)).toEqual(["K"]);
    expect(found.demand.map((d) => d.formula)).toContain("K2SO4");
  });
});

test("jarosites are among what iron may become", () =>
  expect(productsFor(data, "CuFeS2(s)", "Fe", false)).toEqual(
    expect.arrayContaining([JAROSITE, "FeOOH(s,goethite)", "Fe2O3(s,hematite)", "Fe^3+(aq)"]),
  ));

describe("sulfur of a sulfide", () => {
  const from = { from: "CuFeS2(s)", at: { pH: 1.5, Eh: 0.65 }, redox: "air" } as const;
  test("sulfur or sulfate: four electrons or sixteen, oxygen and acid with them", () => {
    const sulfur = overall(leach, from);
    const sulfate = overall(leach, { ...from, products: { "S(sulfide)": "SO4^2-(aq)" } });
    expect([sulfur.electrons, sulfate.electrons]).toEqual([4, 16]);
    const oxygen = (o: typeof sulfur) => o.demand.find((d) => d.formula === "O2")!.molPerMol;
    expect([oxygen(sulfur), oxygen(sulfate)]).toEqual([1, 4]);
  });
  test("jarosite and sulfate together still close", () => {
    for (const sulfur of ["S(s,rhombic)", "SO4^2-(aq)"])
      expect(closes([...overall(leach, { ...from, products: { Fe: JAROSITE, "S(sulfide)": sulfur } }).terms])).toEqual(
        [],
      );
  });
});

describe("a cementing metal", () => {
  const gold = plan("cyanide", [{ element: "Au", requirement: "metal", activity: 1e-7 }], { temperatureC: 25 });
  const from = { from: "Au(CN)2^-(aq)", at: { pH: 10.5, Eh: -0.8 }, redox: "zinc-dust" } as const;
  test("goes where it is told: to hydroxide in place of the cyanide complex", () => {
    expect(overall(gold, from).text).toContain("Zn(CN)4^2-");
    const named = overall(gold, { ...from, products: { Zn: "Zn(OH)2(s,epsilon)" } });
    expect(named.text).toContain("Zn(OH)2");
    expect(closes([...named.terms])).toEqual([]);
  });
  test("its choice waits while another reagent closes the electrons", () =>
    expect(overall(gold, { ...from, redox: "aluminium", products: { Zn: "Zn(OH)2(s,epsilon)" } }).text).not.toMatch(
      /Zn/,
    ));
});

describe("what cannot be a product is refused in a sentence", () => {
  const from = { from: "CuFeS2(s)", at: { pH: 1.5, Eh: 0.65 } } as const;
  test.each<[Record<string, string>, RegExp]>([
    [{ Cu: "Fe^2+(aq)" }, /Fe\^2\+\(aq\) holds no Cu/],
    [{ "S(sulfide)": "Cu(s)" }, /Cu\(s\) holds no S/],
    [{ Fe: "CuFeS2(s)" }, /cannot be made of itself/],
    [{ Fe: "ZnFe2O4(s)" }, /holds Zn, which neither CuFeS2\(s\) nor the liquor brings/],
    [{ Cl: "AgCl(s,chlorargyrite)" }, /CuFeS2\(s\) holds no Cl/],
    [{ Fe: "FeOOH(s,gothite)" }, /not in the library; near to it: FeOOH\(s,goethite\)/],
  ])("%j", (products, words) => expect(message(leach, { ...from, products })).toMatch(words));
});

test("what is offered can be written: every choice for every part of a mineral balances", () => {
  for (const from of ["CuFeS2(s)", "FeS2(s,pyrite)", "ZnS(s,sphalerite)", "Cu2(OH)2CO3(s,malachite)"]) {
    if (!data.species.has(from)) continue;
    const parts = Object.keys(data.species.get(from)!.composition).filter((c) => !"HO".includes(c));
    for (const part of parts.map((c) => (c === "S" ? "S(sulfide)" : c)))
      for (const id of productsFor(data, from, part, false)) {
        const found = overallReaction(leach, data, { from, at: { pH: 1.5, Eh: 0.65 }, products: { [part]: id } });
        expect(found.ok ? [] : [from, part, id, found.error.message]).toEqual([]);
      }
  }
});
