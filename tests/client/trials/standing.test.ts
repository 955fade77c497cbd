import { describe, expect, test } from "vitest";
import { electrodeSeries } from "../../../shared/electrodes/series";
import { valueOf } from "../../../shared/outcome";
import { toProblem } from "../../../shared/plan/toProblem";
import { trialCreate } from "../../../shared/schemas/trial";
import { solve } from "../../../shared/solve";
import { emptyForm } from "../../../src/features/trials/bench/benchShelf";
import { placeSaid, readingIn } from "../../../src/features/trials/bench/benchModel";
import { overdue } from "../../../src/features/trials/bench/elapsed";
import { chemistry } from "../../support/chemistry";
import { zincInputs } from "../../support/records";

const data = chemistry();
const electrodes = electrodeSeries(data.tables);
const entry = (text: string, unit: string) => ({ text, unit });
const solved = { inputs: zincInputs, data, solution: valueOf(solve(toProblem(zincInputs, data), data)), failure: null };

/** A trial laid out at a pH and 700 mV vs SHE, and what a reading there says of itself. */
function said(plannedPH: string, pH: string, orp: string) {
  const { planned } = trialCreate.parse({
    ...{ campaignId: "c", feedId: "f", code: "T-1", kind: "leach", stage: "NL" },
    planned: { pH: entry(plannedPH, "pH"), orp: { value: entry("700", "mV"), electrode: "SHE" } },
  });
  const form = { ...emptyForm, pH, orp, electrode: "SHE", electrodeTemperature: "25", temperature: "60" };
  return placeSaid(readingIn(form, 10), { planned }, electrodes, solved);
}

describe("what a reading says of itself: held where it was laid out, and where it stands on the map", () => {
  test("inside and as laid out is good twice", () => {
    const found = said("5.0", "5.05", "705");
    expect(found?.held).toEqual({ text: "Held at its planned set point.", tone: "good" });
    expect(found?.place).toMatchObject({ tone: "good" });
    expect(found?.inside).toBe(true);
  });

  test("outside where it was laid out outside is no alarm", () => {
    const found = said("2.5", "2.45", "700");
    expect(found?.held?.tone).toBe("good");
    expect(found).toMatchObject({ inside: false, laidOutside: true, place: { tone: "quiet" } });
    expect(found?.place.text).toMatch(/^Outside as it was laid out, /);
  });

  test("outside where it was laid out inside is one, and so is another place inside the window", () => {
    const outside = said("5.0", "2.45", "700");
    expect(outside).toMatchObject({ inside: false, laidOutside: false, place: { tone: "bad" }, held: { tone: "bad" } });
    expect(outside?.held?.text).toBe("Off its planned set point: pH 2.55 below its planned 5.00.");
    const elsewhere = said("5.0", "5.0", "640");
    expect(elsewhere).toMatchObject({ inside: true, place: { tone: "good" }, held: { tone: "bad" } });
    expect(elsewhere?.held?.text).toMatch(/60.mV below its planned 700.mV vs SHE/);
  });

  test("nothing is said of a reading without a place", () => {
    expect(said("5.0", "", "700")).toBeNull();
    expect(said("5.0", "5.0", "")).toBeNull();
  });
});

test("a trial past its planned time says by how much, a tenth over not yet", () => {
  expect(overdue(entry("6.0", "h"), 396)).toBeNull();
  expect(overdue(entry("6.0", "h"), 480)).toMatch(/^2 h 00 min past its planned 6\.0.h$/);
  expect(overdue(entry("", "h"), 10_000)).toBeNull();
  expect(overdue(entry("6", "h"), null)).toBeNull();
});
