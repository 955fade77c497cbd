import { describe, expect, test } from "vitest";
import { equilibriumEh, judgeReach, reachAt, usualReagents } from "../../../shared/reach/reach";
import { reagentById, reagents } from "../../../shared/reach/reagents";

describe("equilibrium potential of a couple", () => {
  test("the oxygen couple falls by 59.16 mV a pH unit at 25 C (CODATA constants)", () => {
    const oxygen = reagentById.get("air")!.couple!;
    expect(equilibriumEh(oxygen, 0, 25)).toBe(1.229);
    expect(equilibriumEh(oxygen, 0, 25) - equilibriumEh(oxygen, 1, 25)).toBeCloseTo(0.05916, 5);
  });

  test("manganese dioxide takes four protons for two electrons: twice the slope", () => {
    const manganese = reagentById.get("manganese-dioxide")!.couple!;
    expect(equilibriumEh(manganese, 1, 25)).toBeCloseTo(1.224 - 2 * 0.05916, 4);
  });

  test("hypochlorite gives its alkaline handbook potential, 0.84 V, at pH 14", () => {
    expect(equilibriumEh(reagentById.get("hypochlorite")!.couple!, 14, 25)).toBeCloseTo(0.84, 2);
  });

  test("a couple without protons does not move with pH, at any temperature", () => {
    const ferric = reagentById.get("ferric")!.couple!;
    for (const T of [0, 60, 150]) expect(equilibriumEh(ferric, 6, T)).toBe(0.771);
  });
});

describe("the table of reagents", () => {
  test("every row names its source, ids are unique, ranges run upwards", () => {
    expect(new Set(reagents.map((r) => r.id)).size).toBe(reagents.length);
    for (const r of reagents) {
      expect(r.source, r.id).not.toBe("");
      if (r.reached && r.reached[1] !== null) expect(r.reached[0], r.id).toBeLessThan(r.reached[1]);
      if (!r.reached) expect(r.reachedIn, r.id).toEqual([]);
    }
  });

  test("a practical range read in acid is not claimed for a cyanide liquor", () => {
    const [air] = reachAt(["air"], "cyanide", 10.5, 25);
    expect(air!.reached).toBeNull();
    expect(air!.equilibrium).toBeCloseTo(1.229 - 0.05916 * 10.5, 3);
  });

  test("zinc purification shows zinc dust, a leach the usual oxidants", () => {
    const metal = (element: string, requirement: "metal" | "dissolved") =>
      ({ element, requirement, role: "target", entry: "activity", value: 1, gammaFrom: "one", gamma: null }) as const;
    expect(usualReagents({ preset: "sulfate", metals: [metal("Zn", "dissolved"), metal("Cu", "metal")] })).toEqual([
      "zinc-dust",
    ]);
    expect(usualReagents({ preset: "sulfate", metals: [metal("Zn", "dissolved")] })).toContain("air");
  });
});

describe("the verdict on a practical range", () => {
  const reach = (id: string) => reachAt([id], "sulfate", 5, 60)[0]!;
  test("air, 0.45 to 0.75 V, holds a set point at 0.58 V and shares 0.45 to 0.75 V with the window", () => {
    expect(judgeReach(reach("air"), [0.4, 0.86], 0.58)).toEqual({ verdict: "holds", overlap: [0.45, 0.75] });
  });
  test("it enters a window without holding the set point", () => {
    expect(judgeReach(reach("air"), [0.7, 1.0], 0.85)).toEqual({ verdict: "inside", overlap: [0.7, 0.75] });
  });
  test("an oxidant below the window falls short, a reductant below it goes beyond", () => {
    expect(judgeReach(reach("air"), [0.9, 1.0], 0.95).verdict).toBe("short");
    expect(judgeReach(reach("sulfite"), [0.9, 1.0], 0.95).verdict).toBe("beyond");
    expect(judgeReach(reach("sulfite"), [-0.2, 0.1], 0).verdict).toBe("short");
  });
  test("an open upper end reaches as far up as the window does", () => {
    expect(judgeReach(reach("permanganate"), [0.8, 1.4], 1.2)).toEqual({ verdict: "holds", overlap: [1.0, 1.4] });
  });
});
