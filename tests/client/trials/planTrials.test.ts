import { describe, expect, test } from "vitest";
import type { MapTrials } from "../../../shared/schemas/trialRows";
import {
  marksInWords,
  marksOf,
  stageMarkers,
  stageTallies,
} from "../../../src/features/trials/planTrials/planTrialsModel";
import type { PlacedTrial } from "../../../src/lib/judgedTrials";
import { tallySentence } from "../../../src/lib/tallyWords";

const stage = { code: "NL", name: "neutral leach", target: "Zn", gangue: "Fe" };
let made = 0;
function trial(count: PlacedTrial["count"], recoveryPct: number | null, part: Partial<PlacedTrial["figures"]> = {}): PlacedTrial {
  made += 1;
  const judgement = count === "not placed" ? null : { verdict: count === "apart" ? "inside" : count, unsure: false };
  return {
    id: `t${made}`,
    code: `T-${made}`,
    stage: "NL",
    stageOf: stage,
    status: count === "rejected" ? "rejected" : "balanced",
    count,
    judgement,
    comparability: { comparable: count !== "apart", reasons: [], unknown: [] },
    figures: { pH: 5, Eh: 0.5, pHCooled: false, recoveryPct, gangueDissolvedPct: 1, selectivityPct: null, ...part },
  } as unknown as PlacedTrial;
} // prettier-ignore

describe("trials on a plan's map", () => {
  const campaigns = [
    { stages: [stage, { ...stage, code: "WA" }] },
    { stages: [{ ...stage, code: "WA" }, { ...stage, code: "C" }] },
  ] as unknown as MapTrials["campaigns"]; // prettier-ignore

  test("a stage keeps its marker across campaigns", () => {
    const markers = stageMarkers(campaigns);
    expect([...markers.keys()]).toEqual(["NL", "WA", "C"]);
    expect(new Set(markers.values()).size).toBe(3);
  });

  test("rejected ones and those without a place are no points; other conditions are drawn open", () => {
    const trials = [
      trial("inside", 90),
      trial("apart", 80),
      trial("rejected", 10),
      trial("not placed", 50, { Eh: null }),
    ];
    const marks = marksOf(trials, stageMarkers(campaigns), "recoveryPct");
    expect(marks.map(({ value, open }) => [value, open])).toEqual([
      [90, false],
      [80, true],
    ]);
  });

  test("a picture says what its marks mean", () => {
    const markers = stageMarkers(campaigns);
    const marks = marksOf([trial("inside", 90), trial("apart", 80)], markers, "recoveryPct");
    expect(marksInWords(marks, { lo: 80, hi: 90 }, markers, "recoveryPct")).toBe(
      "2 trials by recovery, pale 80 to dark 90 %; circle NL; open: other conditions",
    );
  });

  test("inside and outside are told with n, and an n of its own where a figure is missing", () => {
    const [only] = stageTallies([trial("inside", 90), trial("inside", null), trial("outside", 70), trial("apart", 60)]);
    const say = (count: "inside" | "outside" | "apart") =>
      tallySentence(only!.tally, count, stage).replaceAll("\u202f", " ");
    expect(say("inside")).toBe("Inside, n 2: Zn 90 % (n 1), Fe dissolved 1.0 %.");
    expect(say("outside")).toBe("Outside, n 1: Zn 70 %, Fe dissolved 1.0 %.");
    expect(say("apart")).toBe("Other conditions, n 1: Zn 60 %, Fe dissolved 1.0 %.");
  });

  test("stages with another target are not put into one mean", () => {
    const copper = { ...trial("inside", 95), stageOf: { ...stage, code: "C", target: "Cu", gangue: null } };
    expect(stageTallies([trial("inside", 90), copper]).map((s) => s.target)).toEqual(["Zn", "Cu"]);
  });
});
