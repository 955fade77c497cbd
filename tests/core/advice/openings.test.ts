import { describe, expect, test } from "vitest";
import { adviceFor } from "../../../shared/advice/openings";
import { gapBetween } from "../../../shared/advice/gap";
import { rectangle } from "../../../shared/geometry/convex";
import { valueOf } from "../../../shared/outcome";
import type { Problem } from "../../../shared/schemas/problem";
import { solve } from "../../../shared/solve";
import { library, band } from "../../support/solver";

const shut: Problem = {
  temperatureC: 25,
  metals: [
    { element: "Ni", requirement: "dissolved", activity: 1 },
    { element: "Fe", requirement: "solid", activity: 1e-6 },
    { element: "Cu", requirement: "compound", activity: 1e-9 },
  ],
  ligands: [{ component: "S", activity: 0.5 }],
  solidsBasis: "fresh",
  frame: { pH: [0, 12], Eh: [-1, 1.4] },
  controlBand: band,
};

describe("without a window", () => {
  const advice = valueOf(adviceFor(shut, library));

  test("the conflicting pair is named, iron is not", () => {
    expect(advice.conflicts.map((c) => c.map((r) => r.metal))).toEqual([["Ni", "Cu"]]);
  });

  test("the gap is the distance between the two limits, read from each metal alone", () => {
    const alone = (i: number) => valueOf(solve({ ...shut, metals: [shut.metals[i]!] }, library)).windows;
    const nickelTo = Math.max(...alone(0).map((w) => w.pH[1]));
    const copperFrom = Math.min(...alone(2).map((w) => w.pH[0]));
    // both limits are upright here, so the gap along pH is their distance
    expect(advice.gaps[0]!.gap!.pH).toBeCloseTo(copperFrom - nickelTo, 6);
  });

  test.each(advice.openings.map((o) => [`${o.change} ${o.of ?? ""}`, o] as const))(
    "%s: the change opens a window and a little less of it does not",
    (_, o) => {
      if (o.to === null) return expect(o.problem).toBeUndefined();
      expect(valueOf(solve(o.problem, library)).windows.length).toBeGreaterThan(0);
      if (typeof o.to !== "number" || typeof o.from !== "number" || o.change === "temperature") return;
      const less = 10 ** (Math.log10(o.to) - Math.sign(Math.log10(o.to / o.from)) * 0.001);
      const metals = o.problem!.metals.map((m) => (m.element === o.of ? { ...m, activity: less } : m));
      expect(valueOf(solve({ ...o.problem, metals }, library)).windows).toEqual([]);
    },
  );

  test("activities that would have to leave the conflict alone open nothing", () => {
    expect(advice.openings.find((o) => o.of === "Fe")!.to).toBeNull();
    expect(advice.openings.find((o) => o.of === "Ni")!.to).toBeLessThan(1);
    expect(advice.openings.find((o) => o.of === "Cu")!.to).toBeGreaterThan(1e-9);
  });
});

test("with a window there is nothing to advise", () => {
  const open = { ...shut, metals: [shut.metals[0]!, shut.metals[1]!].map((m) => ({ ...m, activity: 1e-4 })) };
  expect(valueOf(adviceFor(open, library)).openings).toEqual([]);
});

test("gaps of rectangles: along pH where their Eh ranges overlap, none where no line meets both", () => {
  const tags = [-1, -2, -3, -4] as const;
  const a = rectangle([0, 1], [0, 1], tags);
  expect(gapBetween([a], [rectangle([3, 4], [0.5, 2], tags)])).toEqual({ pH: 2, Eh: null });
  expect(gapBetween([a], [rectangle([3, 4], [5, 6], tags)])).toEqual({ pH: null, Eh: null });
  expect(gapBetween([a], [rectangle([0.5, 4], [1, 2], tags)])).toEqual({ pH: 0, Eh: 0 });
});

test("bad input comes back as its failure", () => {
  expect(adviceFor({ ...shut, temperatureC: 400 }, library)).toMatchObject({
    ok: false,
    error: { code: "OUT_OF_RANGE", path: "temperatureC" },
  });
});
