import { describe, expect, test } from "vitest";
import { FARADAY, GAS_CONSTANT } from "../../../shared/constants";
import { valueOf } from "../../../shared/outcome";
import { liquorCouples } from "../../../shared/reach/liquorCouples";
import { reactionDesk } from "../../../shared/reactions/desk";
import type { Problem } from "../../../shared/schemas/problem";
import { band, library as data, wideFrame } from "../../support/solver";

const liquor = (metals: Record<string, number>, ligands: Record<string, number> = {}, temperatureC = 25): Problem => ({
  temperatureC,
  metals: Object.entries(metals).map(([element, activity]) => ({ element, requirement: "free", activity })),
  ligands: Object.entries(ligands).map(([component, activity]) => ({ component, activity })),
  solidsBasis: "fresh",
  ...{ frame: wideFrame, controlBand: band },
});
const couples = (problem: Problem, pH: number) => valueOf(liquorCouples(problem, data, pH));
const decade = (T: number) => (GAS_CONSTANT * (T + 273.15) * Math.LN10) / FARADAY;

describe("from Nernst, by the desk", () => {
  test.each<[string, string, number, number]>([
    ["Fe", "Fe^3+ + e^- = Fe^2+", 25, 1],
    ["Fe", "Fe^3+ + e^- = Fe^2+", 60, 0.5],
    ["As", "H3AsO4(aq) + 2 H^+ + 2 e^- = H3AsO3(aq) + H2O", 25, 1.5],
    ["V", "VO2^+ + 2 H^+ + e^- = VO^2+ + H2O", 25, 0.5],
  ])("%s by %s at %d C, pH %d", (metal, reaction, T, pH) => {
    const { E0_V, terms } = valueOf(reactionDesk(data, { reaction, temperatureC: T }));
    const n = (id: string) => terms.find((t) => t.species === id)?.coefficient ?? 0;
    const middle = E0_V! - decade(T) * (n("H^+(aq)") / n("e^-")) * pH;
    const found = couples(liquor({ [metal]: 0.01 }, {}, T), pH).find((c) => Math.abs(c.middle - middle) < 0.002)!;
    expect(found.range[0]).toBeCloseTo(middle + (2 * decade(T)) / n("e^-"), 4);
    expect(found.range[1]).toBeCloseTo(middle - (2 * decade(T)) / n("e^-"), 4);
  });
  test("ferric over ferrous in acid: 0.77 V and two decades to either side", () => {
    const [iron] = couples(liquor({ Fe: 0.05 }), 1);
    expect(iron).toMatchObject({ metal: "Fe", reduced: "Fe^2+(aq)", oxidised: "Fe^3+(aq)", shutBy: [] });
    expect(iron!.range[0]).toBeCloseTo(0.771 - 0.118, 2);
    expect(iron!.range[1]).toBeCloseTo(0.771 + 0.118, 2);
    expect(iron!.scarcerMgPerL).toBeCloseTo((0.05 * 55845) / 101, 0);
  });
});

describe("ligands shift what a couple holds", () => {
  test("sulfate lowers ferric: formal potentials in sulfuric acid stand near 0.68 V (handbook)", () => {
    const middle = couples(liquor({ Fe: 0.01 }, { S: 0.3 }), 0.5)[0]!.middle;
    expect(middle).toBeLessThan(0.73);
    expect(middle).toBeGreaterThan(0.62);
  });
  test("in brine cupric becomes an oxidant: 0.5 to 0.6 V (practice) lie in what it holds", () => {
    const copper = couples(liquor({ Cu: 0.1 }, { Cl: 4 }), 1.5)[0]!;
    expect(copper.range[0]).toBeLessThan(0.5);
    expect(copper.range[1]).toBeGreaterThan(0.6);
    expect(copper.held).toEqual(copper.range);
  });
});

describe("what ends it", () => {
  test("without chloride copper metal takes all that cupric and cuprous would hold", () => {
    const copper = couples(liquor({ Cu: 0.01 }), 1.5)[0]!;
    expect(copper.held).toBeNull();
    expect(copper.shutBy.map((s) => s.species)).toEqual(["Cu(s)"]);
  });
  test("ferrihydrite takes the iron above a potential, and the held part ends there", () => {
    const iron = couples(liquor({ Fe: 0.01 }), 2.5)[0]!;
    expect(iron.shutBy).toHaveLength(1);
    expect(iron.held![1]).toBeCloseTo(iron.shutBy[0]!.from, 9);
    expect(iron.held![1]).toBeLessThan(iron.range[1]);
  });
  test("a state that never rules among the dissolved is passed over: U(IV) to U(VI), not U(V)", () => {
    const uranium = couples(liquor({ U: 0.001 }), 1.5);
    expect(uranium.map((c) => c.oxidised)).toContain("UO2^2+(aq)");
    expect(uranium.flatMap((c) => [c.reduced, c.oxidised])).not.toContain("UO2^+(aq)");
  });
  test("a metal with one dissolved state has no couple", () =>
    expect(couples(liquor({ Zn: 0.1, Ni: 0.1 }), 3)).toEqual([]));
});

test("a problem that is wrong is refused as the solver does", () =>
  expect(liquorCouples(liquor({ Xx: 1 }), data, 2)).toMatchObject({ ok: false, error: { code: "UNKNOWN_METAL" } }));
