import { expect, test } from "vitest";
import { robustWindow } from "../../../shared/advice/robust";
import { valueOf } from "../../../shared/outcome";
import type { Problem } from "../../../shared/schemas/problem";
import { insideOutline, insideWindows } from "../../support/read";
import { library, band, solved } from "../../support/solver";

const neutral: Problem = {
  temperatureC: 60,
  metals: [
    { element: "Zn", requirement: "dissolved", activity: 0.08 },
    { element: "Fe", requirement: "solid", activity: 1e-5 },
  ],
  ligands: [{ component: "S", activity: 0.5 }],
  solidsBasis: "fresh",
  frame: { pH: [1, 8], Eh: [-0.2, 1.2] },
  controlBand: band,
};
const ranges = {
  temperatureC: [45, 75] as const,
  activities: { Zn: [0.05, 0.15] as const, Fe: [1e-6, 1e-4] as const },
};

test("a point of the robust window is inside at every corner and at random states in between; points outside fail somewhere", () => {
  const robust = valueOf(robustWindow(neutral, ranges, library));
  expect(robust.checked.settled).toBe(true);
  const states: Problem[] = [];
  for (let i = 0; i <= 12; i++)
    for (const zn of [0.05, 0.09, 0.15])
      for (const fe of [1e-6, 1e-5, 1e-4])
        states.push({
          ...neutral,
          temperatureC: 45 + i * 2.5,
          metals: [
            { element: "Zn", requirement: "dissolved", activity: zn },
            { element: "Fe", requirement: "solid", activity: fe },
          ],
        });
  const solutions = states.map((p) => solved(p));
  let insides = 0;
  for (let i = 0; i < 40; i++)
    for (let j = 0; j < 40; j++) {
      const [pH, Eh] = [1.05 + (i * 6.9) / 39, -0.19 + (j * 1.38) / 39];
      const inside = robust.windows.some((w) => insideOutline(w, pH, Eh));
      const always = solutions.every((s) => insideWindows(s, pH, Eh));
      // between the temperatures checked an edge may stand 0.001 further in; the 40 x 40 points keep clear of that
      expect([pH, Eh, inside]).toEqual([pH, Eh, always]);
      if (inside) insides++;
    }
  expect(insides).toBeGreaterThan(20);
});

test("what was checked is stated: the worse end of each activity, and why", () => {
  const { checked } = valueOf(robustWindow(neutral, ranges, library));
  expect(checked.activities.map((a) => [a.metal, a.at])).toEqual([
    ["Zn", 0.15],
    ["Fe", 1e-6],
  ]);
  expect(checked.temperatures.length).toBeGreaterThanOrEqual(5);
});

test("without ranges it is the window itself", () => {
  const robust = valueOf(robustWindow(neutral, {}, library));
  const [window] = solved(neutral).windows;
  expect(robust.windows[0]!.area).toBeCloseTo(window!.area, 12);
  expect(robust.checked.temperatures).toEqual([60]);
});

test("ranges that do not rise or leave the models are refused with their values", () => {
  expect(robustWindow(neutral, { temperatureC: [80, 20] }, library)).toMatchObject({
    ok: false,
    error: { code: "OUT_OF_RANGE", path: "temperatureC" },
  });
  expect(robustWindow(neutral, { activities: { Zn: [0, 1] } }, library)).toMatchObject({
    ok: false,
    error: { path: "activities.Zn" },
  });
});
