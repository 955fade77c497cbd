import { describe, expect, test } from "vitest";
import { electrodeSeries } from "../../../shared/electrodes/series";
import { lastTemperature, measuredPoint } from "../../../shared/trials/measuredPoint";
import { plannedPoint } from "../../../shared/trials/plannedPoint";
import type { TrialInput } from "../../../shared/schemas/trial";
import { chemistry } from "../../support/chemistry";
import { trialOf, typed } from "../../support/trials";

const electrodes = electrodeSeries(chemistry().tables);
type Reading = NonNullable<NonNullable<TrialInput["measured"]>["readings"]>[number];
const at = (...readings: Reading[]) => measuredPoint(trialOf({ measured: { readings } }), electrodes);
const reading = (pH: string, mV: string, electrode: string, T: string, more: Reading = {}): Reading => ({
  temperature: typed(`${T} C`),
  pH: { value: typed(`${pH} pH`) },
  orp: { value: typed(`${mV} mV`), electrode, electrodeTemperature: typed("25 C") },
  ...more,
});

test("ORP goes to SHE by its electrode at the electrode's own temperature (3 M Ag/AgCl, 207 mV at 25 C: probe manual)", () => {
  const { point, missing } = at(reading("1.5", "450", "AGCL-3M", "60"));
  expect(missing).toEqual([]);
  expect(point?.Eh).toBeCloseTo(0.657, 9);
  expect(point?.conversion).toBe("450 mV + 207 mV (Ag/AgCl, 3 mol/L KCl at 25 °C) = 657 mV vs SHE");
  expect(point).toMatchObject({ pH: 1.5, temperatureC: 60, EhUncertainty: 0, electrode: "AGCL-3M", marks: [] });
});

test("one liquor, three electrodes: the same point (practice-checks.json F50)", () => {
  const Eh = (["AGCL-sat 425", "AGCL-3M 417", "SCE 382.8"] as const).map((words) => {
    const [electrode = "", mV = ""] = words.split(" ");
    return at(reading("2", mV, electrode, "25")).point!.Eh;
  });
  for (const e of Eh) expect(Math.abs(e - 0.624)).toBeLessThanOrEqual(0.006);
});

test("above 40 C at the electrode +-10 mV are stated, at 40 C none", () => {
  const hot = (T: string) =>
    at(
      reading("2", "400", "AGCL-3M", T, {
        orp: { value: typed("400 mV"), electrode: "AGCL-3M", electrodeTemperature: typed(`${T} C`) },
      }),
    );
  expect(hot("40").point?.EhUncertainty).toBe(0);
  expect(hot("41").point?.EhUncertainty).toBe(0.01);
  expect(hot("41").point?.marks.map((m) => m.mark)).toEqual(["HOT_REFERENCE"]);
});

test("electrode temperature not written: the pulp's stands in and says so", () => {
  const { point } = at({
    ...reading("2", "400", "AGCL-3M", "60"),
    orp: { value: typed("400 mV"), electrode: "AGCL-3M" },
  });
  expect(point?.marks.map((m) => m.mark)).toEqual(["HOT_REFERENCE", "REFERENCE_AT_PULP"]);
  expect(point!.Eh).toBeLessThan(0.607);
});

test("pH of a cooled sample stays as read, with its own temperature and a mark", () => {
  const { point } = at({
    ...reading("1.41", "450", "AGCL-3M", "60"),
    pH: { value: typed("1.41 pH"), temperature: typed("25 C"), cooledSample: true },
  });
  expect(point).toMatchObject({ pH: 1.41, pHTemperatureC: 25, cooledSample: true });
  expect(point?.marks[0]).toEqual({
    mark: "COOLED_SAMPLE",
    text: "pH of a cooled sample, read at 25 °C: not corrected to the pulp",
  });
});

describe("several readings", () => {
  const three = [
    reading("1.2", "430", "AGCL-3M", "60", { at: typed("4 h") }),
    reading("1.6", "450", "AGCL-3M", "60", { at: typed("30 min") }),
    { at: typed("8 h"), pH: { value: typed("1.1 pH") }, temperature: typed("58 C") },
  ];
  test("the last with both stands for the trial, with the spread of all", () => {
    const { point } = at(...three);
    expect(point?.pH).toBe(1.2);
    expect(point?.hours).toBe(4);
    expect(point?.range.pH).toEqual([1.2, 1.6]);
    expect(point?.readings).toBe(2);
  });
  test("the temperature is the last written", () => {
    expect(lastTemperature(trialOf({ measured: { readings: three } }))).toBe(58);
    expect(lastTemperature(trialOf({}))).toBeNull();
  });
});

describe("what cannot be placed says why", () => {
  test("no reading with both", () => {
    expect(at().missing).toEqual([{ path: "measured.readings", label: "pH and ORP", why: "no reading has both" }]);
  });
  test("an electrode that is not in the tables", () => {
    expect(at(reading("2", "400", "PT-1000", "25")).missing[0]?.why).toBe("no electrode PT-1000 in the tables");
  });
  test("no temperature at all", () => {
    const { point, missing } = at({ pH: { value: typed("2 pH") }, orp: { value: typed("400 mV"), electrode: "SCE" } });
    expect(point).toBeNull();
    expect(missing[0]?.path).toBe("measured.readings.0.orp.electrodeTemperature");
  });
  test("SHE needs none", () => {
    expect(at({ pH: { value: typed("2 pH") }, orp: { value: typed("0,657 V"), electrode: "SHE" } }).point?.Eh).toBe(
      0.657,
    );
  });
});

describe("where a planned trial is to stand", () => {
  const plan = (planned: TrialInput["planned"]) => plannedPoint(trialOf({ planned }), electrodes);
  test("its ORP on the SHE scale by the electrode it was planned against", () => {
    const orp = { value: typed("380 mV"), electrode: "AGCL-3M", electrodeTemperature: typed("25 C") };
    const at = plan({ temperature: typed("60 C"), pH: typed("4.8 pH"), orp });
    expect(at).toMatchObject({ pH: 4.8, temperatureC: 60 });
    expect(at?.Eh).toBeCloseTo(0.587, 9);
  });
  test("nowhere without pH or without a potential", () => {
    expect(plan({ pH: typed("4.8 pH") })).toBeNull();
    expect(plan({ orp: { value: typed("380 mV"), electrode: "SHE" } })).toBeNull();
  });
});
