import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { analyse } from "../../../shared/analysis";
import { GAS_CONSTANT, FARADAY } from "../../../shared/constants";
import { energiesAt } from "../../../shared/gibbs/energies";
import {
  gasPressure,
  hazardGases,
  logPressureAt,
  logPressureLine,
  pressureAt,
  type GasPressure,
  type HazardGas,
} from "../../../shared/hazards/pressures";
import { hazardRegions, regionAbove, usualThreshold } from "../../../shared/hazards/regions";
import { valueOf } from "../../../shared/outcome";
import { halfReaction } from "../../../shared/reactions/halfReaction";
import type { Problem } from "../../../shared/schemas/problem";
import { kelvin } from "../../../shared/units";
import { practiceCheck } from "../../support/practice";
import { insideOutline } from "../../support/read";
import { band, library as data, wideFrame } from "../../support/solver";

const SLOPE = (GAS_CONSTANT * 298.15 * Math.LN10) / FARADAY;

const liquor = (ligands: Record<string, number>, more: Partial<Problem> = {}): Problem => ({
  temperatureC: 25,
  metals: [{ element: "Zn", requirement: "free", activity: 0.01 }],
  ligands: Object.entries(ligands).map(([component, activity]) => ({ component, activity })),
  sulfateReduction: false,
  solidsBasis: "aged",
  ...{ frame: wideFrame, controlBand: band },
  ...more,
});
const analysed = (p: Problem) => valueOf(analyse(p, data));
function pressure(p: Problem, gas: HazardGas): GasPressure {
  const found = gasPressure(analysed(p), gas);
  if ("absent" in found) throw new Error(found.absent);
  return found;
}
const trace = (element: "As" | "Sb", activity = 1e-4): Partial<Problem> => ({
  metals: [{ element, requirement: "free", activity }],
});

describe("known pressures", () => {
  test("hydrogen is 1 bar on the hydrogen line, and a decade more 29.6 mV below it", () => {
    const h2 = pressure(liquor({}), "H2");
    for (const pH of [0, 4, 11]) expect(pressureAt(h2, pH, -SLOPE * pH)).toBeCloseTo(1, 4);
    expect(pressureAt(h2, 0, -SLOPE / 2)).toBeCloseTo(10, 3);
  });
  test("chlorine is 1 bar at 1.358 V over unit chloride, whatever the pH below the hypochlorous field", () => {
    const cl2 = pressure(liquor({ Cl: 1 }), "Cl2");
    for (const pH of [0, 3]) expect(Math.abs(Math.log10(pressureAt(cl2, pH, 1.35827)!))).toBeLessThan(0.08);
    expect(pressureAt(cl2, 1, 1.1)! / pressureAt(cl2, 1, 1.1 - SLOPE / 2)!).toBeCloseTo(10, 3);
  });
  test("HCN over 1 mg/L cyanide in acid: 4.3 ppm by the Henry constant of Ma and others (2010), 5 by that of the tables", () => {
    const hcn = pressure(liquor({ CN: 0.001 / 26.0174 }), "HCN");
    const ppm = pressureAt(hcn, 5, 0)! / 1.01325e-6;
    expect(ppm / practiceCheck("F55").expected("equilibrium_gas")).toBeGreaterThan(1);
    expect(ppm / practiceCheck("F55").expected("equilibrium_gas")).toBeLessThan(1.25);
  });
  test.each([9.5, 10, 10.5, 11])("HCN at pH %d: never below the true share of the acid form, at most twice it near the pKa", (pH) => {
    const hcn = pressure(liquor({ CN: 0.01 }), "HCN");
    const share = 1 / (1 + 10 ** (pH - 9.21)); // practice check F54
    const drawn = pressureAt(hcn, pH, 0)! / pressureAt(hcn, 3, 0)!;
    expect(drawn / share).toBeGreaterThan(0.98); // pKa 9.24 of the tables against 9.21
    expect(drawn / share).toBeLessThan(2.15);
  }); // prettier-ignore
  test("ammonia: 1 mol/L at high pH stands at 1/57.6 bar (checks.csv, henry-NH3)", () =>
    expect(1 / pressureAt(pressure(liquor({ NH3: 1 }), "NH3"), 12, 0.2)!).toBeCloseTo(57.6, 0));
  test("arsine is 1 bar over arsenic where E0(As/AsH3) says, stibine likewise", () => {
    const E0 = (gas: "AsH3" | "SbH3") => -energiesAt(data, kelvin(25)).of(`${gas}(g)`).G / (3 * FARADAY);
    for (const [element, gas] of [["As", "AsH3"], ["Sb", "SbH3"]] as const)
      for (const pH of [1, 3]) {
        const p = pressure(liquor({}, trace(element)), gas);
        expect(Math.log10(pressureAt(p, pH, E0(gas) - SLOPE * pH)!)).toBeCloseTo(0, 4);
      }
  }); // prettier-ignore
});

/** R T ln p of the gas if one species held the whole total: by a balanced reaction, without planes or cells. */
function lnPressureFrom(species: string, gas: HazardGas, element: string, activity: number, T: number, pH: number, Eh: number): number {
  const half = valueOf(halfReaction(data, species, [`${gas}(g)`], true));
  const energies = energiesAt(data, kelvin(T));
  const RT = GAS_CONSTANT * (T + 273.15);
  let sum = 0;
  for (const [id, n] of half) {
    const s = data.species.get(id);
    const G = id === "e^-" ? energies.of("H2(g)").G / 2 - FARADAY * Eh : energies.of(id).G;
    const a = id === "H^+(aq)" ? -RT * Math.LN10 * pH : id === species && s!.phase === "aq" ? RT * Math.log(activity / s!.composition[element]!) : 0;
    sum += n * (G + a);
  }
  return -sum / half.get(`${gas}(g)`)! / RT;
} // prettier-ignore

describe("against every species in turn", () => {
  const cases: [HazardGas, string, string, Problem][] = [
    ["HCN", "CN", "CN", liquor({ CN: 0.02 })],
    ["NH3", "NH3", "NH3", liquor({ NH3: 2 }, { temperatureC: 60 })],
    ["Cl2", "Cl", "Cl", liquor({ Cl: 3 })],
    ["H2S", "S(sulfide)", "S", liquor({ S: 0.5, "S(sulfide)": 0.003 }, { temperatureC: 40 })],
    ["H2S", "S", "S", liquor({ S: 0.5 }, { temperatureC: 180, sulfateReduction: true })],
    ["AsH3", "As", "As", liquor({}, trace("As"))],
    ["SbH3", "Sb", "Sb", liquor({}, { ...trace("Sb"), temperatureC: 80 })],
  ];
  test.each(cases)("%s over %s: the least of all, at random points", (gas, component, element, problem) => {
    const analysis = analysed(problem);
    const { prepared } = analysis;
    const held = prepared.components.find((c) => c.component === component) ?? prepared.metals.find((m) => m.element === component)!;
    const p = pressure(problem, gas);
    fc.assert(
      fc.property(fc.double({ min: -0.9, max: 14.9, noNaN: true }), fc.double({ min: -1.5, max: 1.9, noNaN: true }), (pH, Eh) => {
        const all = held.species.map((s) => lnPressureFrom(s.id, gas, element, held.activity, problem.temperatureC, pH, Eh));
        expect(Math.abs(logPressureAt(p, pH, Eh)! - Math.min(...all) / Math.LN10)).toBeLessThan(1e-4); // the grid of the planes
      }),
      { numRuns: 60 },
    );
  }); // prettier-ignore
});

describe("regions", () => {
  const rich = liquor({ CN: 0.01, NH3: 1, Cl: 1, "S(sulfide)": 0.01 }, {
    metals: [{ element: "As", requirement: "free", activity: 1e-4 }, { element: "Sb", requirement: "free", activity: 1e-4 }],
  }); // prettier-ignore
  const analysis = analysed(rich);
  const map = valueOf(hazardRegions(analysis, { setPoint: { pH: 9, Eh: -0.4 } }));

  test("all seven gases, in order, each with caution, values and month", () => {
    expect(map.regions.map((r) => r.gas)).toEqual(hazardGases);
    expect(map.absent).toEqual([]);
    for (const r of map.regions) {
      expect(r.caution).toMatch(/closed headspace/);
      expect(r.limits).toContain("December 2026");
      expect(r.threshold).toBe(usualThreshold[r.gas]);
    }
    expect(map.deference).toMatch(/does not replace a hazard study/);
  });

  test.each(hazardGases)("%s: a point is inside exactly where its pressure reaches the threshold", (gas) => {
    const p = pressure(rich, gas);
    const { region, threshold } = map.regions.find((r) => r.gas === gas)!;
    fc.assert(
      fc.property(fc.double({ min: -0.99, max: 14.99, noNaN: true }), fc.double({ min: -1.59, max: 1.99, noNaN: true }), (pH, Eh) => {
        const excess = logPressureAt(p, pH, Eh)! - Math.log10(threshold.bar);
        fc.pre(Math.abs(excess) > 1e-6);
        expect(region.some((o) => insideOutline(o, pH, Eh))).toBe(excess > 0);
      }),
      { numRuns: 150 },
    );
  }); // prettier-ignore

  test("along an iso-pressure line the pressure is the threshold", () => {
    for (const { gas, isoLines, threshold } of map.regions) {
      const p = pressure(rich, gas);
      let read = 0;
      for (const line of isoLines)
        for (const [i, [x, y]] of line.entries()) {
          const next = line[i + 1];
          if (next === undefined) continue;
          const at = pressureAt(p, (x + next[0]) / 2, (y + next[1]) / 2);
          if (at === null) continue; // on the frame's own side
          expect(Math.abs(Math.log(at / threshold.bar)), gas).toBeLessThan(1e-4);
          read += 1;
        }
      expect(read, gas).toBeGreaterThan(0);
    }
  });

  test("a lower threshold never gives a smaller region", () => {
    for (const gas of hazardGases) {
      const p = pressure(rich, gas);
      const [low, high] = [1e-8, 1e-3].map((bar) => regionAbove(p, bar).region);
      for (let i = 0; i < 300; i += 1) {
        const [pH, Eh] = [-0.9 + (i % 20) * 0.79, -1.55 + Math.floor(i / 20) * 0.233];
        if (high!.some((o) => insideOutline(o, pH, Eh)))
          expect(
            low!.some((o) => insideOutline(o, pH, Eh)),
            gas,
          ).toBe(true);
      }
    }
  });

  test("all of the frame, or none of it", () => {
    const p = pressure(liquor({ NH3: 1 }, { frame: { pH: [9, 12], Eh: [-0.2, 0.4] } }), "NH3");
    expect(regionAbove(p, 1e-6)).toEqual({
      region: [{ outer: expect.any(Array) as unknown, holes: [] }],
      isoLines: [],
    });
    expect(regionAbove(p, 10)).toEqual({ region: [], isoLines: [] });
  });

  test("HCN over 500 mg/L NaCN reaches 50 ppm below pH 10.6: where the rule of practice warns", () => {
    const { isoLines } = map.regions.find((r) => r.gas === "HCN")!;
    for (const [pH] of isoLines.flat()) expect(pH).toBeCloseTo(10.65, 1);
  });

  test.each([[0.002, 9.9, 10.1], [0.01, 10.5, 10.7]])("over %d mol/L of cyanide 50 ppm lie between pH %d and %d: gold plants run from 10 (practice, R10)", (total, lo, hi) => {
    const { isoLines } = regionAbove(pressure(liquor({ CN: total }), "HCN"), usualThreshold.HCN.bar);
    for (const [pH] of isoLines.flat()) {
      expect(pH).toBeGreaterThan(lo);
      expect(pH).toBeLessThan(hi);
    }
  }); // prettier-ignore

  test("log10 p is a line on each piece", () => {
    const p = pressure(liquor({}), "H2");
    const [k, x, y] = logPressureLine(p, p.pieces[0]!);
    expect(k).toBe(0);
    expect(x).toBeCloseTo(-2, 6);
    expect(y).toBeCloseTo(-2 / SLOPE, 2);
  });

  test("what the plan does not hold is named, not guessed", () => {
    const { absent, regions } = valueOf(hazardRegions(analysed(liquor({ S: 0.5 }))));
    expect(regions.map((r) => r.gas)).toEqual(["H2"]);
    expect(absent.find((a) => a.gas === "H2S")!.why).toBe("the plan holds no sulfide sulfur");
    expect(absent.find((a) => a.gas === "AsH3")!.why).toMatch(/arsenic/);
  });

  test("above 100 C saturation pressure is given and gases are absolute", () => {
    const hot = valueOf(hazardRegions(analysed(liquor({ S: 0.3 }, { temperatureC: 150, sulfateReduction: true }))));
    expect(hot.saturationBar).toBeCloseTo(4.761, 2);
    expect(hot.regions.find((r) => r.gas === "H2S")!.caution).toMatch(/absolute/);
    expect(map.saturationBar).toBeNull();
  });

  test("thresholds and gases can be chosen; a threshold that is no pressure is refused", () => {
    const chosen = valueOf(hazardRegions(analysis, { gases: ["HCN"], thresholdBar: { HCN: 1e-6 } }));
    expect(chosen.regions.map((r) => [r.gas, r.threshold.words])).toEqual([["HCN", "0.000001 bar"]]);
    for (const bad of [0, -1, Number.NaN, Infinity])
      expect(hazardRegions(analysis, { thresholdBar: { H2: bad } })).toMatchObject({
        ok: false,
        error: { code: "OUT_OF_RANGE", path: "thresholdBar.H2" },
      });
  });

  test("at the set point the pressure is read, outside the frame it is not", () => {
    expect(map.regions.find((r) => r.gas === "HCN")!.atSetPoint).toBeCloseTo(0.01 / 7.52, 4);
    expect(valueOf(hazardRegions(analysis, { setPoint: { pH: 20, Eh: 0 } })).regions[0]!.atSetPoint).toBeNull();
  });
});
