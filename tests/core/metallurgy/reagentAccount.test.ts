import { describe, expect, test } from "vitest";
import { reagentAccount } from "../../../shared/metallurgy/account/reagentAccount";
import type { TrialInput } from "../../../shared/schemas/trial";
import { chemistry } from "../../support/chemistry";
import { assays, feedOf, trialOf, typed } from "../../support/trials";

const masses = chemistry().molarMass;
const feed = feedOf({ Cu: "0.8 %" });
const account = (record: Partial<TrialInput>, grams: number | null = 6.9) =>
  reagentAccount(
    trialOf(record),
    feed,
    { name: "Cu", grams: grams === null ? null : { lo: grams, hi: grams } },
    masses,
  );

/** practice-checks.json F10: 1.000 kg ore, 1.60 L at 12.0 g/L, 14.50 g of 98 % acid, three samples of 20 mL replaced by water. */
const samples = (withAcid: boolean) =>
  ["7.4", "5.0", "3.2"].map((acid) => ({
    volume: typed("20 mL"),
    assays: withAcid ? assays({ H2SO4: `${acid} g/L` }) : [],
    makeUpVolume: typed("20 mL"),
  }));
const heap = (withAcid = true): Partial<TrialInput> => ({
  charge: { dryMass: typed("1.000 kg"), liquorVolume: typed("1.60 L"), liquorAssays: assays({ H2SO4: "12.0 g/L" }) },
  measured: { doses: [{ role: "acid", reagent: "H2SO4", amount: typed("14.50 g"), strength: typed("98 % w/w") }] },
  samples: samples(withAcid),
  products: { finalAssays: assays({ H2SO4: "3.10 g/L" }) },
});

describe("acid (practice-checks.json, F10; computed from the definition)", () => {
  const a = account(heap());
  const acid = a.rows.find((r) => r.reagent === "H2SO4")!;
  test("added 33.41, consumed 28.138 kg/t, 4.08 kg per kg of copper", () => {
    expect(acid.addedPerTonne.value?.lo).toBeCloseTo(33.41, 6);
    expect(acid.consumedPerTonne.value?.lo).toBeCloseTo(28.138, 6);
    expect(acid.consumedPerKg.value?.lo).toBeCloseTo(4.078, 3);
    expect(a.missing).toEqual([]);
  });
  test("copper's share 10.649, net after extraction 17.489 kg/t", () => {
    expect(a.acid?.metal.lo).toBeCloseTo(10.6489, 3);
    expect(a.acid?.netAfterExtraction?.lo).toBeCloseTo(17.4891, 3);
  });
  test("samples that were not titrated bound the consumption instead of spoiling it", () => {
    const open = account(heap(false)).rows[0]!.consumedPerTonne.value!;
    expect(open.lo).toBeLessThan(28.138);
    expect(open.hi).toBeGreaterThan(28.138);
    expect(open.hi - open.lo).toBeCloseTo((0.06 * 33.41) / 1.6, 6);
  });
});

test("cyanide, bottle roll: 0.991 kg NaCN/t (practice-checks.json F18)", () => {
  const a = account({
    charge: { dryMass: typed("1.000 kg"), liquorVolume: typed("1.5 L"), liquorAssays: assays({ NaCN: "1.0 g/L" }) },
    measured: { doses: [{ role: "lixiviant", reagent: "NaCN", amount: typed("620 mg"), reason: "top-up" }] },
    samples: Array.from({ length: 4 }, () => ({
      volume: typed("20 mL"),
      assays: assays({ NaCN: "0.80 g/L" }),
      makeUpVolume: typed("20 mL"),
    })),
    products: { finalAssays: assays({ NaCN: "710 mg/L" }) },
  });
  expect(a.rows[0]?.consumedPerTonne.value?.lo).toBeCloseTo(0.991, 6);
  expect(a.acid).toBeNull();
});

describe("a dose", () => {
  const dosed = (dose: Record<string, unknown>) =>
    account({ measured: { doses: [{ role: "acid", reagent: "H2SO4", ...dose } as never] } }).rows[0]!.dosed;
  test("by volume needs strength and density", () => {
    const by = { amount: typed("10 mL"), strength: typed("98 % w/w"), density: typed("1.84 kg/L") };
    expect(dosed(by).value?.lo).toBeCloseTo(18.032, 6);
    expect(dosed({ amount: typed("10 mL") }).missing.map((m) => m.why)).toEqual(["a volume needs a strength"]);
    expect(dosed({ amount: typed("10 mL"), strength: typed("98 % w/w") }).missing.map((m) => m.path)).toEqual([
      "measured.doses.0.density",
    ]);
  });
  test("by mol/L goes by the formula", () => {
    expect(dosed({ amount: typed("10 mL"), strength: typed("1.0 mol/L") }).value?.lo).toBeCloseTo(0.98072, 6);
    const nameless = dosed({ reagent: "spent electrolyte", amount: typed("10 mL"), strength: typed("1.0 mol/L") });
    expect(nameless.missing[0]?.why).toMatch(/^mol\/L needs a formula/);
  });
  test("without an amount is missing, not zero", () => {
    expect(dosed({}).value).toBeNull();
  });
});

test("no reagent recorded: no rows, nothing to complain about", () => {
  expect(account({}, null)).toEqual({ rows: [], acid: null, missing: [] });
});
