import { describe, expect, test } from "vitest";
import type { TrialInput } from "../../../shared/schemas/trial";
import { metalAccount, type BasisId, type MetalAccount } from "../../../shared/metallurgy/account/metalAccount";
import { chemistry } from "../../support/chemistry";
import { assays, exampleFeed, exampleRecord, exampleSamples, feedOf, trialOf, typed } from "../../support/trials";

const masses = chemistry().molarMass;
const account = (record: Partial<TrialInput>, feed = exampleFeed, metal = "Cu") =>
  metalAccount(trialOf(record), feed, metal, masses);
const on = (a: MetalAccount, id: BasisId) => a.bases.find((b) => b.id === id)!;
const exact = (i: { lo: number; hi: number } | null) => {
  expect(i).not.toBeNull();
  expect(i!.lo).toBe(i!.hi);
  return i!.lo;
};

describe("the example of the trade (practice-checks.json, F01 to F07 and F29; computed from the definition)", () => {
  const a = account(exampleRecord());

  test("calculated head first, all bases side by side", () => {
    expect(a.bases.map((b) => b.id)).toEqual(["calculatedHead", "residue", "solution", "filtrate"]);
    expect(exact(on(a, "calculatedHead").value)).toBeCloseTo(86.2648, 3);
    expect(exact(on(a, "residue").value)).toBeCloseTo(86.2868, 3);
    expect(exact(on(a, "solution").value)).toBeCloseTo(86.1263, 3);
    expect(exact(a.withoutSamples)).toBeCloseTo(83.1579, 3);
  });
  test("head and accountability", () => {
    expect(100 * exact(a.calculatedHead.value)).toBeCloseTo(1.51756, 4);
    expect(exact(a.accountability.value)).toBeCloseTo(99.8395, 3);
    expect(a.flags.map((f) => f.code)).toEqual(["ASSUMED"]);
    expect(a.missing).toEqual([]);
  });
  test("the curve at 1, 2, 4, 8 h", () => {
    expect(a.curve.map((p) => p.hours)).toEqual([1, 2, 4, 8]);
    const X = a.curve.map((p) => exact(p.extraction));
    [38.9474, 55.6447, 68.7553, 77.8105].forEach((want, i) => expect(X[i]).toBeCloseTo(want, 3));
  });
  test("filtrate plus wash: 3.2600 g", () => {
    expect((exact(on(a, "filtrate").value) * 3.8) / 100).toBeCloseTo(3.26, 4);
  });
  test("one standard deviation a basis", () => {
    expect(on(a, "residue").error).toBeCloseTo(0.495, 2);
    expect(on(a, "solution").error).toBeCloseTo(1.975, 2);
    expect(on(a, "calculatedHead").error).toBeCloseTo(0.38, 2);
  });
  test("the formula stands there with its numbers in and gives the value by hand", () => {
    for (const { worked, value } of [...a.bases, a.accountability]) {
      const steps = worked!.split("; ");
      for (const step of steps) {
        const [left = "", right = ""] = step.replace(/^[MT] = /, "").split(" = ");
        const sum = left.replaceAll("×", "*").replaceAll("−", "-").replaceAll(" %", " / 100");
        // eslint-disable-next-line @typescript-eslint/no-implied-eval -- the account's own text, read as a sum
        const byHand = (new Function(`return ${sum}`) as () => number)();
        expect(byHand, step).toBeCloseTo(Number(right.replace(/ (%|g)$/, "")), 1);
        if (step === steps.at(-1)) expect(byHand).toBeCloseTo(value!.lo, 1);
      }
    }
  });
  test("every number used can be traced to what was typed", () => {
    const wash = on(a, "filtrate").used.find((u) => u.path === "products.washAssays.Cu");
    expect(wash).toMatchObject({ typed: "558 mg/L", value: { lo: 0.558, hi: 0.558 }, unit: "g/L", assumed: false });
    expect(on(a, "filtrate").used.find((u) => u.path === "products.washVolume")?.typed).toBe("0,600 L");
  });
});

describe("make-up", () => {
  test("none: the vessel runs down (F02)", () => {
    const a = account({ ...exampleRecord(), samples: exampleSamples("0 mL") });
    expect(exact(on(a, "solution").value)).toBeCloseTo(81.9684, 3);
  });
  test("raffinate as lixiviant and make-up (F03)", () => {
    const record = exampleRecord();
    const a = account({
      charge: { ...record.charge, liquorAssays: assays({ Cu: "0.30 g/L" }) },
      samples: exampleSamples("10 mL", { Cu: "0.30 g/L" }),
      products: { ...record.products, finalAssays: assays({ Cu: "4.10 g/L" }) },
    });
    expect(exact(on(a, "solution").value)).toBeCloseTo(82.6526, 3);
  });
  test("not written: the account stays open and says so; blank is not zero", () => {
    const a = account({ ...exampleRecord(), samples: exampleSamples(" mL") });
    expect(on(a, "solution").value).toBeNull();
    expect(on(a, "solution").missing[0]).toEqual({
      path: "samples.0.makeUpVolume",
      label: "sample 1, volume put back (0 for none)",
      why: "not measured",
    });
    expect(exact(on(a, "residue").value)).toBeCloseTo(86.2868, 3);
    expect(on(a, "calculatedHead").value).toBeNull();
  });
  test("samples listed out of order are put in the order of their times", () => {
    const a = account({ ...exampleRecord(), samples: exampleSamples("10 mL").reverse() });
    expect(a.curve.map((p) => p.hours)).toEqual([1, 2, 4, 8]);
    expect(exact(a.curve[0]!.extraction)).toBeCloseTo(38.9474, 3);
  });
});

describe("what is missing is listed, never thrown", () => {
  test("an empty record", () => {
    const a = account({}, feedOf({}));
    expect(a.bases.every((b) => b.value === null && b.worked === null)).toBe(true);
    expect(a.missing.map((m) => m.path)).toEqual([
      "charge.wetMass",
      "feed.moisture",
      "feed.heads",
      "charge.liquorVolume",
      "products.finalAssays.Cu",
      "products.residueDryMass",
      "products.residueAssays.Cu",
    ]);
  });
  test("several heads, none marked", () => {
    const feed = {
      ...exampleFeed,
      heads: [...exampleFeed.heads, ...exampleFeed.heads].map((h) => ({ ...h, head: false })),
    };
    expect(account(exampleRecord(), feed).missing).toEqual([
      { path: "feed.heads", label: "head assay, Cu", why: "2 assays stand there and none is marked as the head" },
    ]);
  });
  test("ppm by mass without a density, and with it", () => {
    const record = exampleRecord();
    const ppm = { ...record.products, finalAssays: assays({ Cu: "3950 ppm" }) };
    expect(account({ ...record, products: ppm }).missing).toEqual([
      {
        path: "products.finalAssays.Cu",
        label: "final solution, Cu",
        why: "ppm by mass needs the density of the liquor",
      },
    ]);
    const a = account({ ...record, products: { ...ppm, liquorDensity: typed("1.20 kg/L") } });
    expect(a.dissolved!.lo).toBeCloseTo(0.8 * 3.95 * 1.2 + 0.1128, 4);
  });
  test("mol/L goes by the molar mass", () => {
    const record = exampleRecord();
    const a = account({ ...record, products: { ...record.products, finalAssays: assays({ Cu: "0.06216 mol/L" }) } });
    expect(a.dissolved!.lo).toBeCloseTo(3.2728, 2);
  });
});

describe("censored assays give intervals", () => {
  const record = exampleRecord();
  const a = account({ ...record, products: { ...record.products, residueAssays: assays({ Cu: "<0,05 %" }) } });
  test("ends are those of the residue at zero and at its limit", () => {
    const limit = 231.6 * 0.0005;
    expect(on(a, "residue").value!.hi).toBe(100);
    expect(on(a, "residue").value!.lo).toBeCloseTo(100 * (1 - limit / 3.8), 10);
    expect(on(a, "calculatedHead").value!.lo).toBeCloseTo((100 * 3.2728) / (3.2728 + limit), 6);
    expect(on(a, "calculatedHead").error).toBeNull();
    expect(a.closed).toBeNull();
  });
  test("says which, as typed", () => {
    expect(a.flags.find((f) => f.code === "CENSORED")?.text).toBe("kept as intervals: residue assay, Cu <0,05 %");
  });
});

describe("moisture", () => {
  test("wet mass less moisture of the feed, and its water thins the liquor", () => {
    const record = exampleRecord();
    const feed = feedOf({ Cu: "1.52 %" }, { moisture: typed("6.4 %") });
    const a = account({ ...record, charge: { wetMass: typed("500.0 g"), liquorVolume: typed("0.800 L") } }, feed);
    expect(a.fed!.lo).toBeCloseTo(468 * 0.0152, 10);
    expect(a.dissolved!.lo).toBeCloseTo(0.832 * 3.95 + 0.1128, 10);
  });
});

describe("flags", () => {
  test("an account that finds too little names the likeliest causes, what the record shows first", () => {
    const record = exampleRecord();
    const a = account({ ...record, samples: [], products: { ...record.products, washVolume: typed(" L") } });
    const low = a.flags.find((f) => f.code === "ACCOUNT_HIGH" || f.code === "ACCOUNT_LOW");
    expect(exact(a.accountability.value)).toBeCloseTo((100 * (3.16 + 0.5211)) / 3.8, 3);
    expect(low).toBeUndefined();
    const worse = account({
      ...record,
      samples: [],
      products: { ...record.products, washVolume: typed(" L"), finalAssays: assays({ Cu: "3.20 g/L" }) },
    });
    const flag = worse.flags.find((f) => f.code === "ACCOUNT_LOW")!;
    expect(flag.text).toMatch(/^81\.08 % of the Cu fed was found again, outside 95 to 105 %/);
    expect(flag.causes.slice(0, 2)).toEqual([
      "the wash was not recorded: its metal is not in the account",
      "no sample is recorded: withdrawn metal is left out",
    ]);
    expect(worse.flags.some((f) => f.code === "BASES_APART")).toBe(true);
  });
  test("hot and unmeasured volume: evaporation comes first", () => {
    const record = exampleRecord();
    const a = account({
      ...record,
      measured: { readings: [{ temperature: typed("85 C") }] },
      products: { ...record.products, finalAssays: assays({ Cu: "4.60 g/L" }) },
    });
    expect(a.flags.find((f) => f.code === "ACCOUNT_HIGH")?.causes[0]).toMatch(/evaporation/);
    expect(a.flags.some((f) => f.code === "BEYOND_BOUNDS")).toBe(false);
  });
  test("gold of low grade closes in 90 to 110 %", () => {
    const gold = feedOf({ Au: "2.35 g/t" });
    const record = (Au: string) => ({
      charge: { dryMass: typed("1 kg"), liquorVolume: typed("1.5 L") },
      products: {
        finalAssays: assays({ Au }),
        residueDryMass: typed("998 g"),
        residueAssays: assays({ Au: "0.20 g/t" }),
      },
    });
    expect(account(record("1.28 mg/L"), gold, "Au").flags.map((f) => f.code)).not.toContain("ACCOUNT_LOW");
    expect(account(record("1.20 mg/L"), gold, "Au").flags.map((f) => f.code)).toContain("ACCOUNT_LOW");
  });
  test("samples that took more than a tenth of the liquor", () => {
    const record = exampleRecord();
    const big = exampleSamples("25 mL").map((s) => ({ ...s, volume: typed("25 mL") }));
    expect(account({ ...record, samples: big }).flags.map((f) => f.code)).toContain("WITHDRAWN");
  });
});

test("solids of slurry samples stay in the account", () => {
  const record = exampleRecord();
  const samples = exampleSamples("10 mL").map((s, i) =>
    i === 0 ? { ...s, drySolids: typed("2.0 g"), solidsAssays: assays({ Cu: "0.9 %" }) } : s,
  );
  expect(account({ ...record, samples }).inResidue!.lo).toBeCloseTo(0.5211 + 0.018, 6);
});
