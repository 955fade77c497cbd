import { describe, expect, test } from "vitest";
import { freeAcid } from "../../../shared/activity/freeAcid";
import { valueOf } from "../../../shared/outcome";
import { gramsPerMole } from "../../../shared/plan/totals";
import { titratedAcid, trialAcid, type AcidTrial } from "../../../shared/trials/trialAcid";
import { library as data } from "../../support/solver";

const total = (text: string, unit = "mol/L") => [{ component: "S", value: { text, unit } }];
const trial = (measured: AcidTrial["measured"]["ligands"], planned: AcidTrial["planned"]["ligands"] = []) => ({
  measured: { ligands: measured },
  planned: { ligands: planned },
});
const at = (pH: number | null, temperatureC: number | null = 60) => ({ pH, temperatureC });
const byPH = (pH: number, sulfate: number) => valueOf(freeAcid(data, pH, sulfate, 60)).gPerL;

describe("free acid beside the pH of a trial", () => {
  test("titrated and by pH stand side by side, and the difference is said", () => {
    const acid = trialAcid(trial(total("0.8")), at(1.1), 48, { sulfate: 0.5, sulfateReduction: false }, data)!;
    expect(acid.titrated).toBe(48);
    expect(acid.byPH).toBeCloseTo(byPH(1.1, 0.8), 9);
    expect(acid.difference).toBeCloseTo(48 - byPH(1.1, 0.8), 9);
    expect(acid.sulfate).toEqual({ molPerL: expect.closeTo(0.8, 9) as number, from: "measured" });
    expect(acid.doubts).toHaveLength(1);
  });
  test("the trial's own sulfate counts, measured before planned, the plan's last", () => {
    expect(
      trialAcid(trial([], total("0.3")), at(1.2), null, { sulfate: 0.5, sulfateReduction: false }, data)!.sulfate?.from,
    ).toBe("planned");
    expect(trialAcid(trial([]), at(1.2), null, { sulfate: 0.5, sulfateReduction: false }, data)!.sulfate).toEqual({
      molPerL: 0.5,
      from: "plan",
    });
  });
  test("grams of a total are grams of sulfate, as in a plan: 48.03 g/L is half a mole a litre, not one and a half", () => {
    const acid = trialAcid(trial(total("48.03", "g/L")), at(1.2), null, null, data)!;
    expect(acid.sulfate!.molPerL).toBeCloseTo(0.5, 3);
    // where the plan's sulfur is one pool, S is weighed as S: 32.06 g/mol
    const pool = { sulfate: null, sulfateReduction: true };
    expect(trialAcid(trial(total("16.03", "g/L")), at(1.2), null, pool, data)!.sulfate!.molPerL).toBeCloseTo(0.5, 3);
    expect(trialAcid(trial(total("0.5")), at(1.2), null, pool, data)!.sulfate!.molPerL).toBe(0.5);
    expect(trialAcid(trial(total("48030", "mg/L")), at(1.2), null, null, data)!.sulfate!.molPerL).toBeCloseTo(0.5, 3);
    expect(acid.sulfate!.molPerL).toBeCloseTo(48.03 / gramsPerMole(data, "S", false), 12);
  });
  test("what is not known stays open: no sulfate, no temperature, no titration", () => {
    expect(trialAcid(trial([]), at(1.2), 20, null, data)).toMatchObject({ titrated: 20, byPH: null, sulfate: null });
    expect(trialAcid(trial(total("0.5")), at(1.2, null), 20, null, data)).toMatchObject({ byPH: null, difference: null });
    expect(trialAcid(trial(total("0.5")), at(1.2), null, null, data)).toMatchObject({ titrated: null, difference: null });
  }); // prettier-ignore
  test("at pH 1.5 and above pH says it better, and without a pH there is nothing to say", () => {
    expect(trialAcid(trial(total("0.5")), at(1.5), 12, null, data)).toBeNull();
    expect(trialAcid(trial(total("0.5")), at(null), 12, null, data)).toBeNull();
  });
  test("a pH that the sulfate cannot balance gives no number, and says why", () => {
    const acid = trialAcid(trial(total("0.05")), at(0.3), 30, null, data)!;
    expect(acid.byPH).toBeNull();
    expect(acid.doubts.join()).toMatch(/more acid than the sulfate balances/);
  });
});

test("titrated acid is the assay of H2SO4 in the final liquor, in g/L whatever it was typed in; a limit is none", () => {
  const blank = { text: "", unit: "g/mL" };
  const record = (text: string, unit: string) => ({
    charge: { liquorDensity: blank } as never,
    products: { liquorDensity: blank, finalAssays: [{ analyte: "H2SO4", value: { text, unit }, method: "" }] } as never,
  });
  const masses = data.molarMass;
  expect(titratedAcid(record("12,5", "g/L"), masses)).toBeCloseTo(12.5, 9);
  expect(titratedAcid(record("12500", "mg/L"), masses)).toBeCloseTo(12.5, 9);
  expect(titratedAcid(record("< 5", "g/L"), masses)).toBeNull();
  expect(titratedAcid(record("", "g/L"), masses)).toBeNull();
});
