import { describe, expect, test } from "vitest";
import { library as data } from "../../support/solver";
import { equilibriumEh, reachesOf, standsAt, usualReagents } from "../../../shared/reach/reach";
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

  test("a practical range read in acid is not claimed for a cyanide liquor; the couple still stands somewhere", () => {
    const [air] = reachesOf(data, ["air"], "cyanide", 25);
    expect(air!.practical).toBeNull();
    expect(standsAt(air!, 10.5)).toBeCloseTo(1.229 - 0.05916 * 10.5, 3);
    expect(reachesOf(data, ["air"], "sulfate", 25)[0]!.practical).toEqual([0.45, 0.75]);
  });

  test("reagents come in the order of the table, unknown ids leave nothing", () => {
    const ids = reachesOf(data, ["zinc-dust", "nonsense", "air"], "sulfate", 60).map((r) => r.reagent.id);
    expect(ids).toEqual(["air", "zinc-dust"]);
  });

  test("a reagent without a couple stands nowhere", () => {
    const [sugar] = reachesOf(data, ["organic"], "sulfate", 60);
    expect(standsAt(sugar!, 2)).toBeNull();
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
