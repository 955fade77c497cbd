import { describe, expect, test } from "vitest";
import { electrodeSeries } from "../../../shared/electrodes/series";
import type { TrialFigures } from "../../../shared/schemas/trial";
import { trialFigures } from "../../../shared/trials/figures";
import type { Judgement } from "../../../shared/trials/judge";
import { campaignPair } from "../../../shared/trials/pair";
import { campaignSummary, type SummarisedTrial } from "../../../shared/trials/summary";
import { countOf, tally } from "../../../shared/trials/tally";
import { chemistry } from "../../support/chemistry";
import { exampleFeed, exampleRecord, trialOf, typed } from "../../support/trials";

const { molarMass, tables } = chemistry();
const stage = { code: "OX", name: "oxide leach", target: "Cu", gangue: "Fe" };
const figures = trialFigures(trialOf(exampleRecord()), exampleFeed, stage, molarMass, electrodeSeries(tables));

describe("figures of a trial", () => {
  test("target on the calculated head; what is not there is null", () => {
    expect(figures.recoveryPct).toBeCloseTo(86.2648, 3);
    expect(figures.recoveryBasis).toBe("calculated head");
    expect(figures.accountabilityPct).toBeCloseTo(99.8395, 3);
    expect(figures).toMatchObject({
      gangueDissolvedPct: null,
      selectivityPct: null,
      pH: null,
      Eh: null,
      temperatureC: null,
      flags: [],
    });
  });
  test("without a residue the solution has to do", () => {
    const record = exampleRecord();
    const bare = { ...record, products: { ...record.products, residueDryMass: typed(" g") } };
    const found = trialFigures(trialOf(bare), exampleFeed, stage, molarMass, electrodeSeries(tables));
    expect(found.recoveryBasis).toBe("solution");
    expect(found.recoveryPct).toBeCloseTo(86.1263, 3);
    expect(found.accountabilityPct).toBeNull();
  });
  test("an empty trial gives no figures and no error", () => {
    const found = trialFigures(trialOf({}), exampleFeed, stage, molarMass, electrodeSeries(tables));
    expect(Object.values(found).filter((v) => typeof v === "number")).toEqual([]);
  });
});

const judgement = (verdict: Judgement["verdict"], unsure = false): Judgement => ({
  verdict,
  window: null,
  unsure,
  nearest: null,
});
const made = (
  id: string,
  recoveryPct: number | null,
  more: Partial<SummarisedTrial> = {},
  f: Partial<TrialFigures> = {},
): SummarisedTrial => ({
  id,
  kind: "leach",
  stage: "OX",
  status: "approved",
  feedId: "a",
  feedName: "ore A",
  electrode: "AGCL-3M",
  figures: { ...figures, recoveryPct, gangueDissolvedPct: 5, ...f },
  judgement: judgement("inside"),
  comparability: { comparable: true, reasons: [], unknown: [] },
  ...more,
});

describe("tally", () => {
  const trials = [
    made("1", 90),
    made("2", 80, { judgement: judgement("inside", true) }),
    made("3", 60, { judgement: judgement("outside") }),
    made("4", 10, { comparability: { comparable: false, reasons: ["hot"], unknown: [] } }),
    made("5", 10, { judgement: null }),
    made("6", 10, { status: "rejected" }),
    made("7", null, { judgement: judgement("outside") }),
    made("8", 50, { judgement: judgement("off the map") }),
  ];
  test("each trial is counted once", () => {
    const found = tally(trials);
    expect(Object.values(found).reduce((sum, line) => sum + line.n, 0)).toBe(trials.length);
    expect(trials.map(countOf)).toEqual([
      "inside",
      "inside",
      "outside",
      "apart",
      "not placed",
      "rejected",
      "outside",
      "off the map",
    ]);
  });
  test("recovery and gangue inside and outside with n of each; a blank is not zero", () => {
    const found = tally(trials);
    expect(found.inside).toMatchObject({
      n: 2,
      unsure: 1,
      recovery: { n: 2, mean: 85, min: 80, max: 90 },
      gangueDissolved: { n: 2, mean: 5 },
    });
    expect(found.outside).toMatchObject({ n: 2, recovery: { n: 1, mean: 60 } });
  });
});

describe("summary and pair", () => {
  const campaign = (id: string, stages = [stage]) => ({
    id,
    code: id,
    title: id,
    planId: "p",
    planRevision: 1,
    stages,
  });
  const left = [
    made("1", 80),
    made("2", 90),
    made("3", 85, {}, { accountabilityPct: 91 }),
    made("4", 1, { status: "rejected" }),
  ];
  const right = [made("5", 90), made("6", 92), made("7", 94, {}, { recoveryRangePct: [93, 95] })];

  test("one line a stage, rejected trials apart", () => {
    const [line] = campaignSummary(campaign("L"), left);
    expect(line).toMatchObject({
      n: 3,
      rejected: 1,
      open: 1,
      censored: 0,
      recovery: { n: 3, mean: 85, min: 80, max: 90 },
    });
    expect(line?.places.inside.n).toBe(3);
    expect(line?.places.rejected.n).toBe(1);
  });
  test("side by side: differences of means and no test of significance", () => {
    const found = campaignPair({ campaign: campaign("L"), trials: left }, { campaign: campaign("R"), trials: right });
    expect(found.stages[0]?.recovery).toBeCloseTo(7, 10);
    expect(found.cautions).toEqual([
      "No test of significance is made here: scatter within a campaign shows in its range.",
    ]);
  });
  test("says what stands in the way: feeds, electrodes, revisions, few trials, other targets", () => {
    const other = [made("8", 70, { feedName: "ore B", electrode: "SCE" })];
    const revised = { ...campaign("R", [{ ...stage, target: "Zn" }]), planRevision: 2 };
    const { cautions, stages } = campaignPair(
      { campaign: campaign("L"), trials: left },
      { campaign: revised, trials: other },
    );
    expect(stages[0]?.recovery).toBeNull();
    expect(cautions.map((c) => c.split(/[ :]/).slice(0, 2).join(" "))).toEqual([
      "Different feeds",
      "Laid out",
      "Read against",
      "Stage OX",
      "Stage OX",
      "No test",
    ]);
  });
});
