import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { valueOf } from "../../../shared/outcome";
import { overallReaction, type SetPointQuestion } from "../../../shared/reactions/atSetPoint";
import { balance } from "../../../shared/reactions/balance";
import { imbalance } from "../../../shared/reactions/elements";
import { halfReaction } from "../../../shared/reactions/halfReaction";
import { nullSpace, wholeRatio } from "../../../shared/reactions/nullSpace";
import { overallOf } from "../../../shared/reactions/overall";
import { redoxReagents } from "../../../shared/reactions/redoxReagents";
import { reagentById } from "../../../shared/reach/reagents";
import type { Problem } from "../../../shared/schemas/problem";
import { componentKind } from "../../../shared/selection/components";
import { presetChoice } from "../../support/presets";
import { band, library as data, wideFrame } from "../../support/solver";

const plan = (preset: string, metals: Problem["metals"], more: Partial<Problem> = {}): Problem => ({
  ...{ temperatureC: 25, metals, ...presetChoice(preset), solidsBasis: "fresh", frame: wideFrame, controlBand: band },
  ...more,
});
const metal = (element: string, activity: number, requirement: Problem["metals"][number]["requirement"] = "dissolved") => ({
  ...{ element, activity, requirement },
}); // prettier-ignore
const copperLeach = plan("sulfate", [metal("Cu", 0.005)]);
const goldLeach = plan("cyanide", [metal("Au", 1e-5)]);
const at = (pH: number, Eh: number) => ({ at: { pH, Eh } });
const overall = (problem: Problem, asked: SetPointQuestion) => valueOf(overallReaction(problem, data, asked));
const refusal = (problem: Problem, asked: SetPointQuestion) => {
  const outcome = overallReaction(problem, data, asked);
  if (outcome.ok) throw new Error(`${outcome.value.text}: this should be refused`);
  return outcome.error;
};

describe("textbook reactions, found from the set point", () => {
  test.each<[string, Problem, SetPointQuestion, string]>([
    ["gold in cyanide with air", goldLeach, { from: "Au(s)", ...at(10.5, 0), redox: "air" }, "4 Au + O2 + 8 CN^- + 2 H2O = 4 Au(CN)2^- + 4 OH^-"],
    ["gold won on zinc", plan("cyanide", [metal("Au", 1e-7, "metal")]), { from: "Au(CN)2^-(aq)", ...at(10.5, -0.8), redox: "zinc-dust" }, "2 Au(CN)2^- + Zn = 2 Au + Zn(CN)4^2-"],
    ["copper on iron", plan("water", [metal("Cu", 1e-4, "metal")]), { from: "Cu^2+(aq)", ...at(2, -0.2), redox: "iron-scrap" }, "Cu^2+ + Fe = Cu + Fe^2+"],
    ["chalcopyrite with ferric iron", plan("water", [metal("Cu", 0.01)]), { from: "CuFeS2(s)", ...at(1.5, 0.65), redox: "ferric" }, "CuFeS2 + 4 Fe^3+ = Cu^2+ + 5 Fe^2+ + 2 S"],
    ["chalcopyrite with air", plan("water", [metal("Cu", 0.01)]), { from: "CuFeS2(s)", ...at(1.5, 0.65), redox: "air" }, "CuFeS2 + O2 + 4 H^+ = Cu^2+ + Fe^2+ + 2 S + 2 H2O"],
    ["tenorite in acid", plan("water", [metal("Cu", 0.01)]), { from: "CuO(s)", ...at(1.5, 0.6) }, "CuO + 2 H^+ = Cu^2+ + H2O"],
    ["pyrite in an autoclave", plan("sulfate_sulfide", [metal("Fe", 0.01)], { temperatureC: 220 }), { from: "FeS2(s,pyrite)", ...at(1, 0.7), redox: "air" }, "4 FeS2 + 15 O2 + 8 H2O = 2 Fe2O3 + 8 HSO4^- + 8 H^+"],
    ["calcite, which takes acid for nothing", plan("water", [metal("Cu", 0.01)]), { from: "CaCO3(s,calcite)", ...at(1.5, 0.6) }, "CaCO3 + 2 H^+ = Ca^2+ + CO2 + H2O"],
    ["pyrolusite with sulfur dioxide", plan("water", [metal("Mn", 0.1)]), { from: "MnO2(s,pyrolusite)", ...at(1.5, 0.6), redox: "sulfite" }, "MnO2 + H2SO3 = Mn^2+ + SO4^2- + H2O"],
    ["cathode powder with peroxide", plan("water", [metal("Co", 0.1), metal("Li", 0.1)]), { from: "LiCoO2(s)", ...at(0.5, 0.8), redox: "peroxide-reductant", metal: "Co" }, "2 LiCoO2 + H2O2 + 6 H^+ = 2 Co^2+ + 2 Li^+ + O2 + 4 H2O"],
    ["pentlandite, whose formula is broken", plan("water", [metal("Ni", 0.01)]), { from: "Fe4.5Ni4.5S8(s)", ...at(1.5, 0.65), redox: "ferric" }, "2 Fe4.5Ni4.5S8 + 36 Fe^3+ = 45 Fe^2+ + 9 Ni^2+ + 16 S"],
  ])("%s", (_what, problem, asked, text) => {
    const found = overall(problem, asked);
    const sides = (t: string) => t.split(" = ").map((side) => side.split(" + ").sort());
    expect(sides(found.text)).toEqual(sides(text));
    expect(found.terms[0]!.species).toBe(asked.from);
  }); // prettier-ignore
});

describe("what a plan does not say is assumed, and said", () => {
  test("iron and sulfide sulfur of chalcopyrite in a plan for copper", () =>
    expect(overall(copperLeach, { from: "CuFeS2(s)", ...at(1.5, 0.65), redox: "ferric" }).assumed).toEqual([
      { component: "Fe", activity: 0.01 },
      { component: "S(sulfide)", activity: 0.1 },
    ]));
  test("a product can be chosen by hand: sulfate where the plan stops at sulfur", () => {
    const asked = { from: "CuFeS2(s)", ...at(1.5, 0.65), redox: "air" };
    const sulfur = overall(copperLeach, asked);
    const sulfate = overall(copperLeach, { ...asked, products: { "S(sulfide)": "SO4^2-(aq)" } });
    expect(sulfur.products.get("S(sulfide)")).toBe("S(s,rhombic)");
    expect([sulfur.electrons, sulfate.electrons]).toEqual([4, 16]);
    expect(imbalance(data, sulfate.terms.map((t) => [data.species.get(t.species)!, t.coefficient]))).toEqual([]);
  }); // prettier-ignore
  test("without a reagent the electrons stay in the reaction", () => {
    const half = overall(copperLeach, { from: "Cu(s)", ...at(1.5, 0.65) });
    expect(half.open).toBe(true);
    expect(half.terms.find((t) => t.species === "e^-")!.coefficient).toBe(2);
    expect(half.energetics.E0_V).not.toBeNull();
  });
  test("where nothing is oxidised a reagent takes no part", () =>
    expect(overall(copperLeach, { from: "CuO(s)", ...at(1.5, 0.65), redox: "air" }).redox).toBeNull());
});

describe("reagents", () => {
  const demand = (problem: Problem, asked: SetPointQuestion) =>
    overall(problem, asked).demand.map((d) => `${d.role} ${d.direction} ${d.formula} ${d.molPerMol}`);
  test("a basic liquor is never told to take acid", () => {
    const rows = demand(goldLeach, { from: "Au(s)", ...at(10.5, 0), redox: "air", base: "NaOH" });
    expect(rows).toEqual(["base made NaOH 1", "oxidant used O2 0.25", "ligand used NaCN 2"]);
  });
  test("cyanide drawn as HCN is dosed as NaCN and asks for no acid less", () => {
    const asked = { from: "Au(s)", redox: "air", base: "NaOH" } as const;
    expect(demand(goldLeach, { ...asked, ...at(8.5, 0.2) })).toEqual(demand(goldLeach, { ...asked, ...at(10.5, 0) }));
  });
  test("bisulfate or sulfate, the acid is the same", () => {
    const acid = (pH: number) => overall(plan("sulfate", [metal("Zn", 0.1)]), { from: "ZnO(s)", ...at(pH, 0.5) }).demand[0]!;
    expect(acid(1)).toEqual(acid(3));
    expect(acid(1)).toMatchObject({ role: "acid", formula: "H2SO4", molPerMol: 1, direction: "used" });
  }); // prettier-ignore
  test("in chloride the acid is hydrochloric", () =>
    expect(demand(plan("chloride", [metal("Cu", 0.01)]), { from: "CuO(s)", ...at(1, 0.6) })).toEqual([
      "acid used HCl 2",
    ]));
  test("hydrolysis gives acid back, and says what base would hold the pH", () => {
    const rows = demand(plan("water", [metal("Fe", 1e-5, "solid")], { temperatureC: 80 }), { from: "Fe^3+(aq)", ...at(3, 0.8), base: "CaCO3" });
    expect(rows).toEqual(["acid made H2SO4 1.5", "base used CaCO3 1.5"]);
  }); // prettier-ignore
  test("weights close: what is used weighs what is made", () => {
    const { terms } = overall(copperLeach, { from: "CuFeS2(s)", ...at(1.5, 0.65), redox: "air" });
    const grams = terms.reduce((sum, { species, coefficient }) => {
      const composition = Object.entries(data.species.get(species)!.composition);
      return sum + coefficient * composition.reduce((m, [c, n]) => m + n * data.molarMass.get(c)!, 0);
    }, 0);
    expect(Math.abs(grams)).toBeLessThan(1e-9);
  });
});

describe("what is refused", () => {
  test("a start that is what stands there", () => expect(refusal(copperLeach, { from: "CuSO4(aq)", ...at(2.5, 0.6) }).path).toBe("from"));
  test("a reductant for an oxidation", () =>
    expect(refusal(copperLeach, { from: "Cu(s)", ...at(1.5, 0.65), redox: "zinc-dust" }).message).toMatch(/needs an oxidant/));
  test("an unknown reagent, and an unknown mineral with near names", () => {
    expect(refusal(copperLeach, { from: "Cu(s)", ...at(1.5, 0.65), redox: "magic" }).message).toMatch(/"magic"/);
    expect(refusal(copperLeach, { from: "CuFeS2", ...at(1.5, 0.65) }).message).toMatch(/CuFeS2\(s\)/);
  });
  test("products that leave a part uncarried", () => {
    const outcome = overallOf(data, { from: "CuFeS2(s)", products: ["Cu^2+(aq)", "S(s,rhombic)"], temperatureC: 25, pH: 1 });
    expect(outcome).toMatchObject({ ok: false, error: { code: "LIGAND_MISSING", message: expect.stringContaining("Fe") as string } });
  });
  test("products that leave a choice", () => {
    const outcome = overallOf(data, { from: "CuO(s)", products: ["Cu^2+(aq)", "Cu(s)"], temperatureC: 25, pH: 1 });
    expect(outcome).toMatchObject({ ok: false, error: { code: "INVALID_INPUT", path: "products" } });
  });
}); // prettier-ignore

describe("the reagents' half-reactions", () => {
  test.each(redoxReagents.map((r) => [r.id, r] as const))("%s balances and works the way its role says", (_id, reagent) => {
    for (const half of [reagent.half, ...(reagent.halfInBase ? [reagent.halfInBase] : [])]) {
      const terms = [...half].map(([id, n]) => [id === "e^-" ? id : data.species.get(id)!, n] as const);
      expect(imbalance(data, terms)).toEqual([]);
      expect(half.get(reagent.used)!).toBeLessThan(0);
      expect(Math.sign(half.get("e^-")!)).toBe(reagent.role === "oxidant" ? -1 : 1);
    }
  }); // prettier-ignore
  test("they bear the names that reach uses for the same reagent", () => {
    for (const { id, role } of redoxReagents) {
      const known = reagentById.get(id);
      if (known !== undefined) expect([id, known.kind]).toEqual([id, role]);
    }
  });
});

describe("null space", () => {
  test("dimension and vector of a matrix worked out by hand", () => {
    // H2 + 1/2 O2 = H2O
    const { dimension, vector } = nullSpace([[2, 0, 2], [0, 2, 1]]); // prettier-ignore
    expect(dimension).toBe(1);
    expect(wholeRatio(vector!)).toEqual(wholeRatio(vector!).map((n) => n));
    expect(wholeRatio(vector!).map(Math.abs)).toEqual([2, 1, 2]);
    expect(nullSpace([[1, 1, 1]]).dimension).toBe(2);
    expect(nullSpace([[1, 0], [0, 1]])).toEqual({ dimension: 0, vector: null }); // prettier-ignore
  });
  test("whole numbers in any ratio are found again", () => {
    const number = fc.integer({ min: -60, max: 60 });
    fc.assert(
      fc.property(fc.array(number, { minLength: 1, maxLength: 9 }), fc.double({ min: 0.01, max: 9, noNaN: true }), (n, factor) => {
        fc.pre(n.some((v) => v !== 0));
        const whole = wholeRatio(n.map((v) => v * factor));
        const k = n.find((v) => v !== 0)! / whole[n.findIndex((v) => v !== 0)]!;
        expect(whole.map((v) => v * k + 0)).toEqual(n.map((v) => v + 0));
      }),
    ); // prettier-ignore
  });
  test("it gives what exact elimination gives, for pairs of species of every metal", () => {
    const byMetal = [...data.components.keys()].filter((c) => componentKind(data, c) === "metal");
    const plain = (m: string) =>
      [...data.species.values()].filter((s) => m in s.composition && Object.keys(s.composition).every((c) => [m, "H", "O"].includes(c)));
    let compared = 0;
    for (const m of byMetal) {
      const [first, ...rest] = plain(m);
      for (const other of rest) {
        const exact = valueOf(balance(data, first!.id, other.id, [], m));
        const found = valueOf(halfReaction(data, first!.id, [other.id], true));
        expect(Object.fromEntries(found)).toEqual(Object.fromEntries(exact.map((t) => [t.species, t.coefficient])));
        compared += 1;
      }
    }
    expect(compared).toBeGreaterThan(150);
  }); // prettier-ignore
});

test("any mineral at any point of any lixiviant: balanced in atoms and charge, smallest whole numbers, or a reason why not", () => {
  const minerals = [...data.species.values()].filter((s) => s.phase === "s").map((s) => s.id);
  const presets = ["water", "sulfate", "chloride", "ammonia", "cyanide", "carbonate", "glycine", "sulfate_sulfide"];
  let balanced = 0;
  fc.assert(
    fc.property(
      fc.constantFrom(...minerals),
      fc.constantFrom(...presets),
      fc.double({ min: 0, max: 13, noNaN: true }),
      fc.double({ min: -0.8, max: 1.2, noNaN: true }),
      fc.constantFrom(undefined, "air", "ferric", "peroxide", "sulfite", "iron-scrap", "zinc-dust"),
      (from, preset, pH, Eh, redox) => {
        const outcome = overallReaction(plan(preset, [metal("Cu", 0.01)]), data, { from, at: { pH, Eh }, ...(redox ? { redox } : {}) });
        if (!outcome.ok) {
          expect(outcome.error.message).not.toBe("");
          return;
        }
        const { terms, demand } = outcome.value;
        const known = terms.map((t) => [t.species === "e^-" ? t.species : data.species.get(t.species)!, t.coefficient] as const);
        expect(imbalance(data, known), outcome.value.text).toEqual([]);
        const gcd = (a: number, b: number): number => (b === 0 ? Math.abs(a) : gcd(b, a % b));
        expect(terms.every((t) => Number.isInteger(t.coefficient)), outcome.value.text).toBe(true);
        expect(terms.map((t) => t.coefficient).reduce(gcd, 0), outcome.value.text).toBe(1);
        expect(terms[0]!.species).toBe(from);
        for (const d of demand) expect(d.kgPerTonne).toBeGreaterThan(0);
        balanced += 1;
      },
    ),
    { numRuns: 300 },
  ); // prettier-ignore
  expect(balanced).toBeGreaterThan(100);
});
