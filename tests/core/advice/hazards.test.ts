import { describe, expect, test } from "vitest";
import { adviceFor } from "../../../shared/advice/openings";
import { MOST_TEMPERATURES, robustWindow } from "../../../shared/advice/robust";
import { tidied } from "../../../shared/advice/tidy";
import { valueOf } from "../../../shared/outcome";
import type { Problem } from "../../../shared/schemas/problem";
import { insideOutline, insideWindows } from "../../support/read";
import { band, library, solved } from "../../support/solver";

/** Zinc has to stay solid, which it does below pH 9.9 or so in this liquor, and cyanide has to stay above 10.5. */
const shut: Problem = {
  temperatureC: 25,
  metals: [{ element: "Zn", requirement: "solid", activity: 1e-5 }],
  ligands: [{ component: "CN", activity: 0.001 }],
  solidsBasis: "fresh",
  frame: { pH: [7, 10.6], Eh: [-0.4, 0.6] },
  excludedHazards: [{ gas: "HCN", pHAtLeast: 10.5 }],
  controlBand: band,
};

describe("a hazard kept out shuts the plan", () => {
  const advice = valueOf(adviceFor(shut, library));

  test("it stands in the conflict beside the metal, with the gap between the two grounds", () => {
    expect(advice.conflicts).toEqual([
      [
        { metal: "Zn", requirement: "solid" },
        { gas: "HCN", pHAtLeast: 10.5 },
      ],
    ]);
    expect(advice.gaps[0]!.members).toEqual(["Zn", "HCN"]);
    const zincTo = Math.max(...solved({ ...shut, excludedHazards: [] }).windows.map((w) => w.pH[1]));
    expect(advice.gaps[0]!.gap!.pH).toBeCloseTo(10.5 - zincTo, 6);
  });

  test("how far its rule stands in the way is told, root found, and never below pH 7", () => {
    const told = advice.openings.find((o) => o.change === "hazardPH")!;
    expect(told).toMatchObject({ of: "HCN", from: 10.5 });
    const at = (pHAtLeast: number) => solved({ ...shut, excludedHazards: [{ gas: "HCN", pHAtLeast }] }).windows.length;
    expect(at(Number(told.to))).toBeGreaterThan(0);
    expect(at(Number(told.to) + 0.001)).toBe(0);
    expect(tidied(told, library)).toBe(told);
  });

  test("by pressure likewise, upward alone", () => {
    const bar = 1e-9;
    const { openings } = valueOf(adviceFor({ ...shut, excludedHazards: [{ gas: "HCN", bar }] }, library));
    const told = openings.find((o) => o.change === "hazardPressure")!;
    expect(told).toMatchObject({ of: "HCN", from: bar });
    expect(Number(told.to)).toBeGreaterThan(bar);
    const at = (b: number) => solved({ ...shut, excludedHazards: [{ gas: "HCN", bar: b }] }).windows.length;
    expect(at(Number(told.to))).toBeGreaterThan(0);
    expect(at(Number(told.to) / 1.01)).toBe(0);
  });
});

test("progress counts up to its total, whatever ends early", () => {
  const told: [number, number][] = [];
  valueOf(adviceFor(shut, library, (done, total) => told.push([done, total])));
  expect(told.length).toBeGreaterThan(3);
  expect(told.every(([done, total], i) => total === told[0]![1] && done <= total && (i === 0 || done >= told[i - 1]![0]))).toBe(true); // prettier-ignore
  expect(told.at(-1)).toEqual([told[0]![1], told[0]![1]]);
  const temperatures: [number, number][] = [];
  const problem: Problem = { ...shut, excludedHazards: [] };
  const { checked } = valueOf(robustWindow(problem, { temperatureC: [20, 40] }, library, (d, t) => temperatures.push([d, t]))); // prettier-ignore
  expect(temperatures.map(([d]) => d)).toEqual(checked.temperatures.map((_, i) => i + 1));
  expect(new Set(temperatures.map(([, t]) => t))).toEqual(new Set([MOST_TEMPERATURES]));
});

describe("over ranges", () => {
  test("what holds at every temperature is clear of the gas at every temperature", () => {
    const problem: Problem = {
      ...shut,
      metals: [{ element: "Au", requirement: "dissolved", activity: 1e-5 }],
      frame: { pH: [8, 13], Eh: [-0.8, 0.6] },
      excludedHazards: [{ gas: "HCN" }],
    };
    const { windows } = valueOf(robustWindow(problem, { temperatureC: [15, 45] }, library));
    const solutions = [15, 20, 27, 33, 41, 45].map((temperatureC) => solved({ ...problem, temperatureC }));
    let [inside, outside] = [0, 0];
    for (let pH = 8.03; pH < 13; pH += 0.11)
      for (let Eh = -0.79; Eh < 0.6; Eh += 0.07) {
        const held = windows.some((w) => insideOutline(w, pH, Eh));
        const always = solutions.every((s) => insideWindows(s, pH, Eh));
        if (held) expect([pH, Eh, always]).toEqual([pH, Eh, true]);
        if (held) inside++;
        else outside++;
      }
    expect(inside).toBeGreaterThan(50);
    expect(outside).toBeGreaterThan(50);
  });

  test("a free metal whose gas is kept out is held at its higher end", () => {
    const problem: Problem = {
      temperatureC: 25,
      metals: [
        { element: "Cu", requirement: "metal", activity: 1e-6 },
        { element: "As", requirement: "free", activity: 1e-4 },
      ],
      ligands: [{ component: "S", activity: 0.5 }],
      frame: { pH: [0, 6], Eh: [-1, 0.4] },
      water: { bound: "none" },
      excludedHazards: [{ gas: "AsH3" }],
      controlBand: band,
    };
    const ranges = { activities: { As: [1e-6, 1e-2] as const } };
    const robust = valueOf(robustWindow(problem, ranges, library));
    expect(robust.checked.activities).toMatchObject([{ metal: "As", at: 1e-2 }]);
    const area = (activity: number) =>
      solved({ ...problem, metals: [problem.metals[0]!, { ...problem.metals[1]!, activity }] }).windows.reduce((s, w) => s + w.area, 0); // prettier-ignore
    const held = robust.windows.reduce((s, w) => s + w.area, 0);
    expect(held).toBeCloseTo(area(1e-2), 9);
    expect(area(1e-6)).toBeGreaterThanOrEqual(area(1e-2));
  });
});
