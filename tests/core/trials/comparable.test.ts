import { describe, expect, test } from "vitest";
import { demoPlans } from "../../../server/demo/plans";
import type { TrialInput } from "../../../shared/schemas/trial";
import { comparable, tenorOfLine } from "../../../shared/trials/comparable";
import { couldCarry } from "../../../shared/trials/couldCarry";
import { chemistry } from "../../support/chemistry";
import { assays, feedOf, trialOf, typed } from "../../support/trials";

const plan = (id: string) => demoPlans.find((p) => p.id === id)!.revisions.at(-1)!.inputs;
const heap = plan("demo-oxide-heap"); // 25 C, Cu 0.02 as activity, S 0.1
const stage = { code: "OX", name: "oxide leach", target: "Cu", gangue: "Fe" };
const judged = (record: Partial<TrialInput>, T: number | null = 25, inputs = heap) =>
  comparable(trialOf(record), T, stage, inputs, chemistry());
const final = (Cu: string): Partial<TrialInput> => ({ products: { finalAssays: assays({ Cu }) } });
const sulfate = (S: string) => ({ ligands: [{ component: "S", value: typed(S) }] });

describe("temperature", () => {
  test("5 K is near enough, more is not", () => {
    expect(judged({}, 30).comparable).toBe(true);
    expect(judged({}, 30.1)).toMatchObject({
      comparable: false,
      reasons: ["30.1 °C, the plan 25 °C: more than 5 K apart"],
    });
  });
  test("not recorded is not held against the trial, but said", () => {
    expect(judged({}, null).unknown).toContain("temperature not recorded");
  });
});

describe("tenor", () => {
  test("against the plan's activity by its gamma: 0.02 is 1.271 g/L", () => {
    expect(judged(final("3.8 g/L")).comparable).toBe(true);
    expect(judged(final("3.9 g/L")).reasons).toEqual(["Cu 3.9 g/L, the plan 1.27 g/L: more than a factor 3 apart"]);
    expect(judged(final("0.40 g/L")).comparable).toBe(false);
  });
  test("against the tenor the trial was laid out on, where it has one", () => {
    const record = { ...final("3.9 g/L"), planned: { tenor: typed("4 g/L") } };
    expect(judged(record).comparable).toBe(true);
  });
  test("against g/L as entered, before both", () => {
    const inputs = {
      ...heap,
      metals: heap.metals.map((m) => (m.element === "Cu" ? { ...m, entry: "gPerL" as const, value: 1 } : m)),
    };
    expect(judged({ ...final("3.9 g/L"), planned: { tenor: typed("4 g/L") } }, 25, inputs).comparable).toBe(false);
  });
  test("an activity at gamma 1 says nothing of the tenor of a strong liquor; with its gamma it does", () => {
    const zinc = plan("demo-neutral-leach"); // 60 C, Zn 0.08 as activity: the liquor holds some 84 g/L
    const neutral = { ...stage, target: "Zn" };
    const of = (record: Partial<TrialInput>, gamma: number | null) =>
      comparable(
        trialOf(record),
        60,
        neutral,
        {
          ...zinc,
          metals: zinc.metals.map((m) =>
            m.element === "Zn" && gamma !== null ? { ...m, gammaFrom: "typed" as const, gamma } : m,
          ),
        },
        chemistry(),
      );
    const record = { products: { finalAssays: assays({ Zn: "84 g/L" }) } };
    expect(of(record, null)).toMatchObject({ comparable: true });
    expect(of(record, null).unknown).toContain("Zn tenor not planned");
    // 0.08 / 0.063 = 1.27 mol/L, 83 g/L
    expect(of(record, 0.063).unknown).not.toContain("Zn tenor not planned");
    expect(of(record, 0.063).comparable).toBe(true);
    expect(of(record, 1).reasons).toEqual(["Zn 84 g/L, the plan 5.23 g/L: more than a factor 3 apart"]);
    // Davies without an ionic strength, and "typed" with nothing typed, are gamma 1 that nobody gave
    const line = zinc.metals.find((m) => m.element === "Zn")!;
    const says = (gammaFrom: "davies" | "typed", ionicStrength: number | null) =>
      tenorOfLine({ ...line, gammaFrom, gamma: null }, { ...zinc, ionicStrength }, chemistry());
    expect([says("davies", null), says("typed", 0.4)]).toEqual([null, null]);
    expect(says("davies", 0.4)).toBeGreaterThan(5.23);
  });
  test("a censored tenor counts by its nearer end", () => {
    expect(judged(final("<0.9 g/L")).comparable).toBe(true);
    expect(judged(final("<0.3 g/L")).comparable).toBe(false);
  });
});

describe("a leach that recovered little", () => {
  const feed = feedOf({ Cu: "0.92 %" });
  const record = {
    charge: { dryMass: typed("500 g"), liquorVolume: typed("1 L") },
    products: { finalAssays: assays({ Cu: "0.3 g/L" }) },
    planned: { tenor: typed("4.1 g/L") },
  };
  const trial = trialOf(record);
  const carried = couldCarry(trial, feed, "Cu", chemistry().molarMass);
  test("is held to what its liquor could carry, so that its failure does not excuse it", () => {
    expect(carried).toBeCloseTo(4.6, 10);
    expect(comparable({ ...trial, couldCarry: carried }, 25, stage, heap, chemistry()).comparable).toBe(true);
    expect(comparable(trial, 25, stage, heap, chemistry()).comparable).toBe(false);
  });
  test("what the lixiviant brought counts, and water of the charge thins it", () => {
    const more = trialOf({
      charge: {
        wetMass: typed("520 g"),
        dryMass: typed("500 g"),
        liquorVolume: typed("1 L"),
        liquorAssays: assays({ Cu: "1 g/L" }),
      },
    });
    expect(couldCarry(more, feed, "Cu", chemistry().molarMass)).toBeCloseTo(5.6 / 1.02, 10);
  });
  test("without head or charge it is not known", () => {
    expect(couldCarry(trial, feedOf({}), "Cu", chemistry().molarMass)).toBeNull();
    expect(couldCarry(trialOf({}), feed, "Cu", chemistry().molarMass)).toBeNull();
  });
});

test("ligands: the total the trial was laid out on counts before the plan's activity", () => {
  expect(judged({ measured: sulfate("0.35 mol/L") }).reasons).toEqual([
    "S 0.35 mol/L, the plan 0.1 mol/L: more than a factor 3 apart",
  ]);
  expect(judged({ measured: sulfate("0.35 mol/L"), planned: sulfate("0.3 mol/L") }).comparable).toBe(true);
  expect(judged({}).unknown).toContain("S total not measured");
  // 9.606 g/L of sulfate is the plan's 0.1 mol/L; as sulfur it would be 0.3
  expect(judged({ measured: sulfate("9.606 g/L"), planned: sulfate("0.1 mol/L") }).reasons).toEqual([]);
  expect(judged({ measured: sulfate("33.6 g/L") }).reasons).toEqual([
    "S 0.35 mol/L, the plan 0.1 mol/L: more than a factor 3 apart",
  ]);
});

test("where the plan lets sulfate be reduced its S is all sulfur, and a trial's grams are weighed as S", () => {
  const pool = { ...heap, sulfateReduction: true };
  expect(judged({ measured: sulfate("3.206 g/L"), planned: sulfate("0.1 mol/L") }, 25, pool).reasons).toEqual([]);
  expect(judged({ measured: sulfate("11.2 g/L") }, 25, pool).reasons).toEqual([
    "S 0.349 mol/L, the plan 0.1 mol/L: more than a factor 3 apart",
  ]);
});

test("in a cementation the starting tenor counts, and never what may be left", () => {
  const cement = { code: "CD", name: "zinc dust", target: "Cd", gangue: null };
  const record = (Cd: string): Partial<TrialInput> => ({
    kind: "cementation",
    stage: "CD",
    planned: { tenor: typed("400 mg/L") },
    charge: { liquorAssays: assays({ Cd }) },
    products: { finalAssays: assays({ Cd: "0.2 mg/L" }) },
  });
  const run = (Cd: string) => comparable(trialOf(record(Cd)), 55, cement, plan("demo-zinc-dust"), chemistry());
  expect(run("380 mg/L").comparable).toBe(true);
  expect(run("100 mg/L").comparable).toBe(false);
});
