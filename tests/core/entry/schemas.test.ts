import { describe, expect, test } from "vitest";
import { feedCreate, feedUpdate } from "../../../shared/schemas/feed";
import { campaignCreate, campaignUpdate } from "../../../shared/schemas/campaign";
import { trialCreate, trialUpdate } from "../../../shared/schemas/trial";

const issues = (result: { success: boolean; error?: { issues: { path: PropertyKey[]; message: string }[] } }) =>
  (result.error?.issues ?? []).map(({ path, message }) => `${path.join(".")}: ${message}`);

const least = { campaignId: "c", feedId: "f", code: "NL-01", kind: "leach", stage: "NL" } as const;

describe("a trial", () => {
  test("can be saved with hardly anything in it", () => {
    const made = trialCreate.parse(least);
    expect(made.status).toBe("planned");
    expect(made.charge.dryMass).toEqual({ text: "", unit: "g" });
    expect(made.charge.liquorVolume).toEqual({ text: "", unit: "L" });
    expect(made.samples).toEqual([]);
    expect(made.planned.orp.electrode).toBeNull();
  });

  test("keeps the typed text to the character", () => {
    const made = trialCreate.parse({
      ...least,
      products: { finalAssays: [{ analyte: "Cu", value: { text: " <0,01 ", unit: "mg/L" } }] },
    });
    expect(made.products.finalAssays[0]?.value).toEqual({ text: " <0,01 ", unit: "mg/L" });
  });

  test("refuses an ORP without its electrode, in words that say what to do", () => {
    const tried = trialCreate.safeParse({
      ...least,
      measured: { readings: [{ orp: { value: { text: "450", unit: "mV" } } }] },
    });
    expect(issues(tried)).toEqual([
      "measured.readings.0.orp.electrode: ORP 450 mV has no reference electrode; name the one it was read against, as AGCL-3M, or SHE",
    ]);
    expect(trialCreate.safeParse({ ...least, planned: { orp: { value: { text: "450", unit: "mV" } } } }).success).toBe(
      false,
    );
    expect(
      trialCreate.safeParse({ ...least, measured: { readings: [{ orp: { value: { text: "", unit: "mV" } } }] } })
        .success,
    ).toBe(true);
  });

  test("refuses numbers that cannot be read and says why and where", () => {
    const bad = (value: { text: string; unit: string }) =>
      issues(trialCreate.safeParse({ ...least, charge: { wetMass: value } }))[0];
    expect(bad({ text: "1.000,5", unit: "g" })).toMatch(/^charge.wetMass.text: .*more than one decimal sign/);
    expect(bad({ text: "about 5", unit: "g" })).toMatch(/not a number/);
    expect(bad({ text: "-5", unit: "g" })).toMatch(/below zero/);
    expect(bad({ text: "<5", unit: "g" })).toMatch(/is a limit/);
    expect(bad({ text: "5", unit: "lb" })).toMatch(/none of g, kg, mg, t/);
  });

  test("refuses 150 % and two assays of one analyte", () => {
    const tried = trialCreate.safeParse({
      ...least,
      products: {
        residueAssays: [
          { analyte: "Zn", value: { text: "150", unit: "%" } },
          { analyte: "Zn", value: { text: "1", unit: "%" } },
        ],
      },
    });
    expect(issues(tried)).toEqual([
      "products.residueAssays.0.value.text: assay of a solid 150 % is too high: the most is 1 g/g",
      "products.residueAssays.1.analyte: Zn stands twice in one list of assays",
    ]);
  });

  test("needs a reason to be rejected", () => {
    expect(trialUpdate.safeParse({ status: "rejected" }).success).toBe(false);
    expect(trialUpdate.safeParse({ status: "rejected", statusReason: "spilt" }).success).toBe(true);
  });
});

test("an update changes what it names and nothing else", () => {
  expect(trialUpdate.parse({ notes: "x" })).toEqual({ notes: "x" });
  expect(feedUpdate.parse({ name: "x" })).toEqual({ name: "x" });
  expect(campaignUpdate.parse({ title: "x" })).toEqual({ title: "x" });
});

test("a feed has one head an element, a campaign one stage a code", () => {
  const value = { text: "1,52", unit: "%" };
  const heads = [
    { element: "Cu", value, head: true },
    { element: "Cu", value, head: true },
  ];
  expect(issues(feedCreate.safeParse({ projectId: "p", name: "ore", heads }))).toEqual([
    "heads.1.head: Cu has two assays marked as the head; only one can be",
  ]);
  const stage = { code: "NL", name: "neutral leach", target: "Zn", gangue: "Fe" };
  const campaign = { projectId: "p", code: "C1", title: "t", planId: "x", planRevision: 1 };
  expect(campaignCreate.safeParse({ ...campaign, stages: [stage] }).success).toBe(true);
  expect(issues(campaignCreate.safeParse({ ...campaign, stages: [stage, stage] }))).toEqual([
    "stages.1.code: stage NL stands twice",
  ]);
});
