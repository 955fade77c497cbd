import { describe, expect, test } from "vitest";
import { electrodeSeries } from "../../../shared/electrodes/series";
import { trialCreate } from "../../../shared/schemas/trial";
import { stepped, stepsFrom } from "../../../src/features/trials/model/flow";
import { commonUnit, relabelled, typedIn } from "../../../src/features/trials/model/columnUnit";
import { analytesOf, columnUnit, liquorsOf, withAssay } from "../../../src/features/trials/model/liquors";
import { orpOf } from "../../../src/features/trials/model/orp";
import { sectionOf, trialWords } from "../../../src/features/trials/model/trialWords";
import { nextReading, trialProblems, type TrialValues } from "../../../src/features/trials/model/trialValues";
import { emptyTrial, kindOf, likeIt, nextCode } from "../../../src/features/trials/plan/newTrial";
import { benchProblems, plannedOnElectrode, readingIn, stepFromLast, temperatureSaid, typed } from "../../../src/features/trials/bench/benchModel"; // prettier-ignore
import { emptyForm } from "../../../src/features/trials/bench/benchShelf";
import { elapsed, minutesOf, minutesSince, timeEntry } from "../../../src/features/trials/bench/elapsed";
import { chemistry } from "../../support/chemistry";

const electrodes = electrodeSeries(chemistry().tables);
const entry = (text: string, unit: string) => ({ text, unit });
const trial = (part: object = {}): TrialValues => {
  const { campaignId: _, ...values } = trialCreate.parse({ campaignId: "c", feedId: "f", code: "T-1", kind: "leach", stage: "NL", ...part }); // prettier-ignore
  return values;
};

describe("what is wrong with a record", () => {
  test("an ORP without its electrode cannot be saved, and the field is named", () => {
    const reading = { ...nextReading([]), orp: { value: entry("371", "mV"), electrode: null, electrodeTemperature: entry("", "C") } }; // prettier-ignore
    const [problem] = trialProblems({ measured: { ...trial().measured, readings: [reading] } });
    expect(problem?.path).toBe("measured.readings.0.orp.electrode");
    expect(problem?.message).toContain("no reference electrode");
    expect(sectionOf(problem!.path)).toBe("readings");
  });
  test("half a record is no mistake", () => expect(trialProblems(trial())).toEqual([]));
  test("paths are said as people call the fields", () => {
    expect(trialWords("measured.readings.2.pH.value")).toBe("reading 3, pH");
    expect(trialWords("planned.pH")).toBe("planned pH");
    expect(trialWords("samples.0.assays.1.value.text")).toBe("sample 1, assay 2");
    expect(trialWords("products.residueDryMass")).toBe("products, dry mass of the solids");
  });
});

describe("potential as read", () => {
  const reading = { ...nextReading([]), temperature: entry("60", "C") };
  test("stands on the SHE scale by its electrode, with a pH or without: 371 mV on 3 M at 25 C is 578", () => {
    const orp = { value: entry("371", "mV"), electrode: "AGCL-3M", electrodeTemperature: entry("25", "C") };
    const found = orpOf({ ...reading, orp }, electrodes);
    // 371 + 207 mV: source of the 207 in shared/data/electrodes.csv
    expect(found.kind === "read" && found.point.Eh).toBeCloseTo(0.578, 3);
  });
  test("of an electrode in hot pulp says +-10 mV", () => {
    const orp = { value: entry("371", "mV"), electrode: "AGCL-3M", electrodeTemperature: entry("60", "C") };
    const found = orpOf({ ...reading, orp }, electrodes);
    expect(found.kind === "read" && found.point.EhUncertainty).toBe(0.01);
  });
  test("without an electrode it has no place, and says why", () => {
    const orp = { value: entry("371", "mV"), electrode: null, electrodeTemperature: entry("", "C") };
    expect(orpOf({ ...reading, orp }, electrodes)).toMatchObject({ kind: "open" });
  });
});

describe("columns of typed numbers", () => {
  test("a column speaks for what most of it was typed in", () => {
    expect(commonUnit([entry("1", "h"), entry("2", "h"), entry("90", "min"), entry("", "d")], "d")).toBe("h");
    expect(commonUnit([entry("", "min")], "d")).toBe("d");
  });
  test("another unit goes along with the column and leaves alone what had its own", () => {
    expect(relabelled(entry("1", "h"), "h", "min")).toEqual(entry("1", "min"));
    expect(relabelled(entry("90", "min"), "h", "d")).toEqual(entry("90", "min"));
  });
  test("an empty cell takes the column's unit, a typed one keeps its own", () => {
    expect(typedIn(entry("", "min"), "2", "h")).toEqual(entry("2", "h"));
    expect(typedIn(entry("90", "min"), "95", "h")).toEqual(entry("95", "min"));
  });
});

describe("the matrix of assays", () => {
  const full = trial({
    samples: [
      { at: entry("1", "h"), volume: entry("10", "mL"), makeUpVolume: entry("10", "mL"), assays: [{ analyte: "Zn", value: entry("<0.01", "g/L") }] },
      { at: entry("2", "h"), volume: entry("10", "mL"), makeUpVolume: entry("0", "mL") },
    ],
  }); // prettier-ignore
  test("holds every liquor once, make-up only where some was put back", () =>
    expect(liquorsOf(full).map(({ name }) => name)).toEqual(["Lixiviant", "Sample 1", "Sample 2", "Make-up 1", "Final liquor", "Wash"])); // prettier-ignore
  test("keeps what was typed, and takes an emptied cell out: a blank is no assay", () => {
    const lines = liquorsOf(full);
    expect(columnUnit(lines, "Zn", "mg/L")).toBe("g/L");
    expect(analytesOf(lines, ["Fe"])).toEqual(["Fe", "Zn"]);
    const sample = lines[1]!;
    expect(withAssay(sample.assays, "Zn", "<0,02", "mg/L")[0]?.value).toEqual(entry("<0,02", "g/L"));
    expect(withAssay(sample.assays, "Zn", "", "g/L")).toEqual([]);
    expect(sample.put(full, withAssay(sample.assays, "Fe", "5", "mg/L")).samples[0]?.assays).toHaveLength(2);
  });
});

describe("how a trial goes on", () => {
  const now = new Date("2026-12-01T09:00:00Z");
  test("the start is written once, with its offset", () => {
    const started = stepped(trial(), { to: "running" }, "", now);
    expect(started.status).toBe("running");
    expect(Date.parse(started.startedAt!)).toBe(now.getTime());
    expect(started.startedAt).toMatch(/[+-]\d\d:\d\d$/);
    expect(stepped(started, { to: "running" }, "", new Date(0)).startedAt).toBe(started.startedAt);
    expect(stepped(started, { to: "awaiting assay" }, "", now).endedAt).not.toBeNull();
  });
  test("rejecting asks why, approving is a metallurgist's, an approved one has no step", () => {
    expect(stepsFrom.balanced.find((s) => s.to === "rejected")).toMatchObject({ reason: true, review: true });
    expect(stepsFrom.balanced.find((s) => s.to === "approved")?.review).toBe(true);
    expect(stepsFrom.approved).toEqual([]);
  });
});

describe("a trial laid out", () => {
  test("its code follows the highest one, gaps and other series aside", () => {
    expect(nextCode({ code: "NL-2" }, ["NL-2-09", "NL-2-20", "NL-2-3"])).toBe("NL-2-21");
    expect(nextCode({ code: "NL-2" }, [])).toBe("NL-2-01");
  });
  test("it is of the kind of its stage's trials, else of what the plan asks of the target", () => {
    const stage = { code: "C", name: "", target: "Cu", gangue: null };
    expect(kindOf(stage, [{ stage: "C", kind: "cementation" }], undefined)).toBe("cementation");
    const metals = [{ element: "Cu", role: "target", requirement: "metal" }] as never;
    expect(kindOf(stage, [], { metals })).toBe("cementation");
    expect(kindOf(stage, [], undefined)).toBe("leach");
  });
  test("the next like it keeps the plan and nothing that was read", () => {
    const first = { ...emptyTrial({ feedId: "f", code: "A-1", kind: "leach", stage: "NL" }), operator: "day shift" };
    first.planned = { ...first.planned, pH: entry("5.10", "pH") };
    first.measured = { ...first.measured, readings: [nextReading([])] };
    expect(likeIt(first, "A-2")).toMatchObject({ code: "A-2", operator: "day shift", planned: { pH: entry("5.10", "pH") }, measured: { readings: [] } }); // prettier-ignore
  });
});

describe("at the bench", () => {
  const form = { ...emptyForm, pH: "4.87", orp: "371", electrode: "AGCL-3M", electrodeTemperature: "25", temperature: "60.4" }; // prettier-ignore
  const at = (orp: string) => readingIn({ ...form, orp }, 120);

  test("an entry is refused in words: no electrode, a limit, nothing at all", () => {
    expect(benchProblems(readingIn(form, 132))).toEqual({});
    expect(benchProblems(readingIn({ ...form, electrode: null }, 132)).electrode).toContain("Name the electrode");
    expect(benchProblems(readingIn({ ...form, pH: "<4" }, 132)).pH).toContain("limit");
    expect(benchProblems(readingIn({ ...emptyForm, electrodeTemperature: "" }, 132)).none).toBe("Nothing is typed yet");
  });
  test("a jump from the last reading is told on one scale, whatever each was read against", () => {
    expect(stepFromLast(at("386"), [at("371")], electrodes)).toBe("15 mV higher than the last reading");
    // 578 mV vs SHE as read by a meter that converts is the same potential
    const converted = readingIn({ ...form, orp: "578", electrode: "SHE" }, 120);
    expect(stepFromLast(converted, [at("371")], electrodes)).toBe("as the last reading");
  });
  test("a temperature over 5 K from the plan is off at once", () => {
    const planned = trial({ planned: { temperature: entry("60", "C") } });
    expect(temperatureSaid({ ...form, temperature: "60.4" }, planned)?.tone).toBe("good");
    expect(temperatureSaid({ ...form, temperature: "67" }, planned)).toMatchObject({ tone: "bad" });
  });
  test("the planned potential is told on the electrode in hand", () => {
    const planned = trial({ planned: { orp: { value: entry("580", "mV"), electrode: "SHE", electrodeTemperature: entry("", "C") } } }); // prettier-ignore
    expect(plannedOnElectrode(planned, electrodes, "AGCL-3M", 25)).toContain("373");
    expect(plannedOnElectrode(trial(), electrodes, "AGCL-3M", 25)).toBeNull();
  });
  test("keys type one point and one sign", () => {
    expect(["4", ".", "8", ".", "7", "-"].reduce(typed, "")).toBe("-4.87");
    expect(typed("-4", "-")).toBe("4");
    expect(typed("4.8", "delete")).toBe("4.");
    expect(typed("", ".")).toBe("0.");
  });
  test("time goes on in the unit of the record; what is typed is minutes", () => {
    expect(timeEntry("", 132, "h")).toEqual(entry("2.20", "h"));
    expect(timeEntry("", 132, undefined)).toEqual(entry("132", "min"));
    expect(timeEntry("45", 132, "h")).toEqual(entry("45", "min"));
    expect(minutesOf(entry("2,2", "h"))).toBeCloseTo(132);
    expect(minutesSince("2026-12-01T09:00:00+01:00", new Date("2026-12-01T10:12:30Z"))).toBe(132);
    expect(minutesSince("2026-12-01T09:00:00Z", new Date("2026-12-01T08:00:00Z"))).toBeNull();
    expect([elapsed(48), elapsed(132), elapsed(31459)]).toEqual(["48 min", "2 h 12 min", "21 d 20 h"]);
  });
});
