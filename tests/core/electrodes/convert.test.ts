import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { fromSHE, nernstSlope, referencePotential, toSHE } from "../../../shared/electrodes/convert";
import { checkSolutions, electrodeSeries, type ElectrodeSeries } from "../../../shared/electrodes/series";
import { valueOf } from "../../../shared/outcome";
import { kelvin } from "../../../shared/units";
import { chemistry } from "../../support/chemistry";
import { practiceCheck } from "../../support/practice";

const { tables } = chemistry();
const electrodes = electrodeSeries(tables);
function named(id: string, list: readonly ElectrodeSeries[] = electrodes): ElectrodeSeries {
  const found = list.find((s) => s.id === id);
  if (found === undefined) throw new Error(`no series ${id}`);
  return found;
}

test("the electrodes one can buy are listed, the standard potential is not", () =>
  expect(electrodes.map((s) => s.id)).toEqual([
    "SCE", "SCE-lj", "CAL-3.5M", "CAL-1M", "CAL-0.1M", "AGCL-1M", "AGCL-3M", "AGCL-3.5M", "AGCL-4M", "AGCL-sat-lj", "AGCL-sat",
    "MSE-sat", "CSE-sat",
  ])); // prettier-ignore

test("every row of the table is its series' value at its temperature", () => {
  for (const series of [...electrodes, ...checkSolutions(tables)])
    for (const { tC, mV } of series.points)
      expect(valueOf(referencePotential(series, tC))).toEqual({ E: mV / 1000, basis: "table", uncertainty: 0 });
});

describe("practice checks", () => {
  // F45 to F49: readings turned into Eh
  test.each<[string, string, string, string]>([
    ["F45", "AGCL-sat-lj", "T", "Eh"],
    ["F46", "AGCL-sat-lj", "T", "Eh"],
    ["F47", "AGCL-3.5M", "T", "Eh"],
  ])("%s on %s", (id, electrode, T, Eh) => {
    const check = practiceCheck(id);
    const value = valueOf(toSHE(check.input("reading") / 1000, named(electrode), check.input(T))) * 1000;
    expect(Math.abs(value - check.expected(Eh))).toBeLessThanOrEqual(check.within(Eh));
  });

  test.each<[string, string]>([
    ["F48", "AGCL-3M"],
    ["F49", "SCE"],
  ])("%s on %s over its temperatures", (id, electrode) => {
    const check = practiceCheck(id);
    for (const t of check.list("T")) {
      const value = valueOf(toSHE(check.input("reading") / 1000, named(electrode), t)) * 1000;
      expect(Math.abs(value - check.expected(`Eh_${t}`))).toBeLessThanOrEqual(check.within(`Eh_${t}`));
    }
  });

  test("F50: one liquor on four electrodes", () => {
    const check = practiceCheck("F50");
    for (const [key, electrode] of [
      ["reads_AgAgCl_sat", "AGCL-sat-lj"],
      ["reads_AgAgCl_3M", "AGCL-3M"],
      ["reads_SCE", "SCE"],
      ["reads_Hg_Hg2SO4_satK2SO4", "MSE-sat"],
    ] as const) {
      const reads = valueOf(fromSHE(check.input("Eh") / 1000, named(electrode), check.input("T"))) * 1000;
      expect(Math.abs(reads - check.expected(key))).toBeLessThanOrEqual(check.within(key));
    }
  });

  test("F51: ferri/ferrocyanide against temperature", () => {
    const check = practiceCheck("F51");
    const zobell = named("ZOBELL", checkSolutions(tables));
    for (const t of check.list("T"))
      expect(Math.abs(valueOf(referencePotential(zobell, t)).E * 1000 - check.expected(`Eh_${t}`))).toBeLessThanOrEqual(
        0.1,
      );
    const reads = valueOf(fromSHE(valueOf(referencePotential(zobell, 25)).E, named("AGCL-sat-lj"), 25)) * 1000;
    expect(Math.abs(reads - check.expected("reads_AgAgCl_sat_25"))).toBeLessThanOrEqual(5);
  });

  test("F52: quinhydrone in pH 4 and pH 7 buffer", () => {
    const check = practiceCheck("F52");
    for (const pH of check.list("pH")) {
      const Eh = check.input("E0") / 1000 - nernstSlope(kelvin(25)) * pH;
      const reads = valueOf(fromSHE(Eh, named("AGCL-sat-lj"), 25)) * 1000;
      expect(Math.abs(reads - check.expected(`reads_pH${pH}`))).toBeLessThanOrEqual(check.within(`reads_pH${pH}`));
    }
  });

  test("F43: the Nernst slope against temperature", () => {
    const check = practiceCheck("F43");
    for (const t of check.list("T"))
      expect(Math.abs(nernstSlope(kelvin(t)) * 1000 - check.expected(`slope_${t}`))).toBeLessThanOrEqual(0.01);
  });

  test("F53 and F63: the ferric to ferrous ratio from Eh, and what a wrong millivolt does to it", () => {
    const ratio = practiceCheck("F53");
    const slope = nernstSlope(kelvin(25)) * 1000;
    for (const [E0, key] of [["E0_formal_1M_H2SO4", "ratio_formal"], ["E0_standard", "ratio_standard"]] as const) // prettier-ignore
      expect(Math.abs(10 ** ((ratio.input("Eh") - ratio.input(E0)) / slope) - ratio.expected(key))).toBeLessThanOrEqual(ratio.within(key)); // prettier-ignore
    const factor = practiceCheck("F63");
    for (const mV of factor.list("error"))
      expect(Math.abs(10 ** (mV / slope) - factor.expected(`factor_${mV}mV`))).toBeLessThanOrEqual(factor.within(`factor_${mV}mV`)); // prettier-ignore
  });
});

describe("temperature", () => {
  test("between two rows the line lies between their values, whatever the electrode", () =>
    fc.assert(
      fc.property(
        fc.constantFrom(...electrodes.filter((s) => s.points.length > 1)),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (series, share) => {
          const [lo, hi] = [series.points[0]?.tC ?? 0, series.points.at(-1)?.tC ?? 0];
          const tC = lo + share * (hi - lo);
          const { E, basis } = valueOf(referencePotential(series, tC));
          const around = [series.points.findLast((p) => p.tC <= tC), series.points.find((p) => p.tC >= tC)].map(
            (p) => p?.mV ?? NaN,
          );
          expect(basis).toBe("table");
          expect(E * 1000).toBeGreaterThanOrEqual(Math.min(...around) - 1e-9);
          expect(E * 1000).toBeLessThanOrEqual(Math.max(...around) + 1e-9);
        },
      ),
      { seed: 50 },
    ));

  test("there and back gives the reading again", () =>
    fc.assert(
      fc.property(
        fc.double({ min: -2, max: 2, noNaN: true }),
        fc.double({ min: 0, max: 100, noNaN: true }),
        (reading, tC) => {
          const there = valueOf(toSHE(reading, named("AGCL-3M"), tC));
          expect(valueOf(fromSHE(there, named("AGCL-3M"), tC))).toBeCloseTo(reading, 12);
        },
      ),
      { seed: 51 },
    ));

  test("beyond a table the value is carried on and says how far it may be off", () => {
    expect(valueOf(referencePotential(named("AGCL-sat-lj"), 55))).toEqual({ E: expect.closeTo(0.169, 9) as number, basis: "extrapolated", uncertainty: 0.005 }); // prettier-ignore
    expect(valueOf(referencePotential(named("AGCL-sat-lj"), 80))).toMatchObject({
      basis: "extrapolated",
      uncertainty: 0.01,
    });
    expect(valueOf(referencePotential(named("SCE"), 2))).toMatchObject({ basis: "extrapolated", uncertainty: 0.005 });
  });

  test("1 mol/L Ag/AgCl moves like the standard electrode, as its row says", () =>
    expect(valueOf(referencePotential(named("AGCL-1M"), 60))).toEqual({ E: expect.closeTo(0.21, 9) as number, basis: "borrowed", uncertainty: 0.005 })); // prettier-ignore

  test("an electrode known at one temperature is refused at another", () => {
    expect(valueOf(referencePotential(named("AGCL-4M"), 25))).toMatchObject({ E: 0.2, basis: "table" });
    expect(referencePotential(named("AGCL-4M"), 60)).toEqual({
      ok: false,
      error: {
        code: "OUT_OF_RANGE",
        path: "temperatureC",
        message: "Ag/AgCl, 4 mol/L KCl at 60 C: its potential is known at 25 C only",
      },
    });
    expect(toSHE(0.4, named("CAL-1M"), 40)).toMatchObject({ ok: false });
  });

  test("outside 0 to 100 C nothing is claimed", () => {
    expect(referencePotential(named("SCE"), 101)).toMatchObject({
      ok: false,
      error: { code: "OUT_OF_RANGE", message: "electrode at 101 C: from 0 to 100 C" },
    });
    expect(referencePotential(named("SCE"), Number.NaN)).toMatchObject({ ok: false });
  });
});
