import { describe, expect, test } from "vitest";
import { cementationAccount } from "../../../shared/metallurgy/account/cementationAccount";
import type { TrialInput } from "../../../shared/schemas/trial";
import { chemistry } from "../../support/chemistry";
import { assays, trialOf, typed } from "../../support/trials";

const masses = chemistry().molarMass;
const account = (record: Partial<TrialInput>, metal = "Cu") =>
  cementationAccount(trialOf({ kind: "cementation", stage: "CU", ...record }), metal, masses);

/** practice-checks.json F15: 2.000 L at 1.85 g/L Cu and 0.60 g/L ferric, 5.50 g iron in, 0.35 g left. */
const launder: Partial<TrialInput> = {
  charge: {
    liquorVolume: typed("2.000 L"),
    liquorAssays: assays({ Cu: "1.85 g/L", "Fe(III)": "0.60 g/L", H2SO4: "1.50 g/L" }),
  },
  measured: { cementingMetal: { metal: "Fe", dosed: typed("5.50 g"), unreacted: typed("0.35 g") } },
  products: {
    vesselVolume: typed("1.985 L"),
    finalAssays: assays({ Cu: "42 mg/L", "Fe(III)": "0 g/L", H2SO4: "0.554156 g/L" }),
  },
};

describe("copper on iron (practice-checks.json, F15; computed from the definition)", () => {
  const a = account(launder);
  test("recovery, ratio, excess", () => {
    expect(a.bases.find((b) => b.id === "solution")?.value?.lo).toBeCloseTo(97.7468, 3);
    expect(a.ratioConsumed.value?.lo).toBeCloseTo(1.42398, 4);
    expect(a.stoichiometric).toBeCloseTo(0.878812, 5);
    expect(a.excessConsumed?.lo).toBeCloseTo(1.62034, 4);
    expect(a.ratioDosed.value?.lo).toBeCloseTo(5.5 / 3.61663, 4);
    expect(a.dosedPerLitre).toBeCloseTo(2.75, 10);
  });
  test("where the iron went: copper 3.178, ferric 0.60, acid 1.082, not explained 0.290 g", () => {
    expect(a.split.map((s) => s.by)).toEqual(["Cu", "Fe(III)", "H2SO4", null]);
    const grams = a.split.map((s) => s.grams.lo);
    [3.17834, 0.6, 1.08191, 0.289747].forEach((want, i) => expect(grams[i]).toBeCloseTo(want, 3));
  });
  test("without an assay of the cement the account stays open, and says so", () => {
    expect(a.accountability.value).toBeNull();
    expect(a.accountability.missing.map((m) => m.path)).toEqual([
      "products.residueDryMass",
      "products.residueAssays.Cu",
    ]);
    expect(a.missing).toEqual([]);
  });
  test("with it, the calculated feed comes first", () => {
    const closed = account({
      ...launder,
      products: { ...launder.products, residueDryMass: typed("3.90 g"), residueAssays: assays({ Cu: "92 %" }) },
    });
    const won = 3.9 * 0.92;
    expect(closed.bases[0]?.id).toBe("calculatedHead");
    expect(closed.bases[0]?.value?.lo).toBeCloseTo((100 * won) / (won + 0.08337), 4);
    expect(closed.accountability.value?.lo).toBeCloseTo((100 * (won + 0.08337)) / 3.7, 4);
    expect(closed.flags.map((f) => f.code)).toEqual([]);
  });
});

test("ferric not assayed at the end: from none to all of it", () => {
  const a = account({ ...launder, products: { ...launder.products, finalAssays: assays({ Cu: "42 mg/L" }) } });
  const ferric = a.split.find((s) => s.by === "Fe(III)")!;
  expect(ferric.grams.lo).toBe(0);
  expect(ferric.grams.hi).toBeCloseTo(0.6, 10);
  expect(ferric.note).toMatch(/not assayed at the end/);
  const rest = a.split.at(-1)!.grams;
  expect(rest.hi - rest.lo).toBeCloseTo(0.6 + 3 * 0.569429, 3);
});

test("zinc dust: theory counts every metal removed (practice-checks.json, F16)", () => {
  const start = { Cu: "0.450 g/L", Cd: "380 mg/L", Co: "18 mg/L", Ni: "12 mg/L", Zn: "140 g/L" };
  const end = { Cu: "0 mg/L", Cd: "0 mg/L", Co: "0 mg/L", Ni: "0 mg/L", Zn: "141 g/L" };
  const a = account(
    {
      charge: { liquorVolume: typed("1 L"), liquorAssays: assays(start) },
      measured: { cementingMetal: { metal: "Zn", dosed: typed("2.50 g") } },
      products: { vesselVolume: typed("1 L"), finalAssays: assays(end) },
    },
    "Cd",
  );
  expect(a.theoretical.value?.lo).toBeCloseTo(0.717332, 5);
  expect(a.excessDosed?.lo).toBeCloseTo(3.48514, 3);
  expect(a.excessConsumed).toBeNull();
  expect(a.missing.map((m) => m.path)).toEqual(["measured.cementingMetal.unreacted"]);
});

test("a censored barren gives an interval", () => {
  const a = account({ ...launder, products: { ...launder.products, finalAssays: assays({ Cu: "<1 mg/L" }) } });
  const { lo, hi } = a.bases.find((b) => b.id === "solution")!.value!;
  expect(hi).toBe(100);
  expect(lo).toBeCloseTo(100 * (1 - 0.001985 / 3.7), 8);
});

test("a starting liquor that was not assayed is missing: it cannot be assumed absent", () => {
  const a = account({ ...launder, charge: { liquorVolume: typed("2.000 L") } });
  expect(a.missing.map((m) => m.path)).toEqual(["charge.liquorAssays.Cu"]);
  expect(a.split.map((s) => s.by)).toEqual([null]);
});

test("nothing recorded: everything is listed, nothing thrown", () => {
  expect(account({}).missing.map((m) => m.path)).toEqual([
    "charge.liquorVolume",
    "charge.liquorAssays.Cu",
    "products.finalAssays.Cu",
    "measured.cementingMetal",
  ]);
});
