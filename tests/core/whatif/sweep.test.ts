import { describe, expect, test } from "vitest";
import { adviceFor } from "../../../shared/advice/openings";
import { toProblem } from "../../../shared/plan/toProblem";
import { valueOf } from "../../../shared/outcome";
import type { PlanInputs, PlanMetal } from "../../../shared/schemas/plan";
import { solve } from "../../../shared/solve";
import { sweep, type Sweep, type SweepWish } from "../../../shared/whatif/sweep";
import { settingOf, steps, usualRange, variedOf, withSetting } from "../../../shared/whatif/vary";
import { unusualInputs } from "../../support/planInputs";
import { band, library } from "../../support/solver";

const line = (element: string, requirement: PlanMetal["requirement"], value: number): PlanMetal => ({
  element,
  role: requirement === "free" ? "watched" : requirement === "dissolved" ? "target" : "gangue",
  requirement,
  entry: "activity",
  value,
  gammaFrom: "one",
  gamma: null,
});
const plan = (metals: PlanMetal[], more: Partial<PlanInputs> = {}): PlanInputs => ({
  temperatureC: 60,
  preset: "sulfate",
  metals,
  ligands: [{ component: "S", activity: 0.5 }],
  others: [],
  ionicStrength: null,
  sulfateReduction: false,
  solidsBasis: "fresh",
  feedMinerals: [],
  dosed: [],
  leftOut: [],
  putBack: [],
  frame: { pH: [1, 8], Eh: [-0.2, 1.2] },
  water: { bound: "both" },
  controlBand: band,
  ...more,
});
const neutral = plan([line("Zn", "dissolved", 0.08), line("Fe", "solid", 1e-5)]);
const swept = (inputs: PlanInputs, wish: SweepWish): Sweep => valueOf(sweep(inputs, wish, library));
const solvedAt = (inputs: PlanInputs) => valueOf(solve(toProblem(inputs, library), library));

describe("settings", () => {
  test("what a plan has to vary: temperature, metals that ask, totals", () => {
    expect(variedOf({ ...neutral, metals: [...neutral.metals, line("Cu", "free", 1e-3)] })).toEqual([
      { kind: "temperature" },
      { kind: "amount", of: "Zn" },
      { kind: "amount", of: "Fe" },
      { kind: "total", of: "S" },
    ]);
  });
  test("a setting changed reads back, and nothing else is other", () => {
    for (const varied of [...variedOf(unusualInputs), { kind: "amount", of: "Cu" } as const]) {
      const other = withSetting(unusualInputs, varied, 0.123);
      expect(settingOf(other, varied)).toBe(0.123);
      expect(withSetting(other, varied, settingOf(unusualInputs, varied) ?? NaN)).toEqual(unusualInputs);
    }
    expect(settingOf(neutral, { kind: "total", of: "Cl" })).toBeNull();
  });
  test("steps are even, logarithmic for amounts, with exact ends", () => {
    expect(steps({ kind: "temperature" }, [20, 95], 4)).toEqual([20, 45, 70, 95]);
    const amounts = steps({ kind: "amount", of: "Zn" }, [1e-3, 1], 4);
    expect([amounts[0], amounts[3]]).toEqual([1e-3, 1]);
    expect(amounts[1]).toBeCloseTo(1e-2, 12);
    expect(usualRange(neutral, { kind: "temperature" })).toEqual([20, 95]);
  });
});

describe("the sweep", () => {
  test("each sample is what the solver answers there; the frames are among the samples, both ends too", () => {
    const told: number[] = [];
    const wish: SweepWish = { varied: { kind: "temperature" }, range: [25, 95], frames: 5, between: 3, kept: [5, 0.5] };
    const s = valueOf(sweep(neutral, wish, library, (share) => told.push(share)));
    expect(s.frames.map((f) => f.at)).toEqual([25, 42.5, 60, 77.5, 95]);
    // 17 even settings, and both sides of the jump where goethite sets in
    expect(s.samples.length).toBe(19);
    expect(told.length).toBe(17);
    expect(told.at(-1)).toBe(1);
    for (const { at, area, setPoint, windows } of s.samples) {
      const solution = solvedAt({ ...neutral, temperatureC: at });
      expect([windows, setPoint]).toEqual([solution.windows.length, solution.setPoint]);
      expect(area).toBeCloseTo(
        solution.windows.reduce((t, w) => t + w.area, 0),
        12,
      );
    }
    // a point that is kept is never deeper than the one chosen anew, where both count alike
    for (const { kept, setPoint } of s.samples) expect(kept ?? -1).toBeLessThanOrEqual((setPoint?.margin ?? 0) + 1e-6);
    expect(s.frames.every((f) => (f.solution.shut ?? []).length === 2)).toBe(true);
  });

  test("monotone: the more zinc must be carried the less ground, the more iron may dissolve the more", () => {
    const area = (of: string) => swept(neutral, { varied: { kind: "amount", of }, range: [1e-6, 1], frames: 7, between: 4 }).samples.map((x) => x.area); // prettier-ignore
    const [zinc, iron] = [area("Zn"), area("Fe")];
    for (let i = 1; i < zinc.length; i++) {
      expect(zinc[i]).toBeLessThanOrEqual(zinc[i - 1]! + 1e-9);
      expect(iron[i]).toBeGreaterThanOrEqual(iron[i - 1]! - 1e-9);
    }
    expect(zinc.at(-1)).toBeLessThan(zinc[0]! - 0.1);
    expect(iron.at(-1)).toBeGreaterThan(iron[0]! + 0.1);
  });

  test("published practice stays open: zinc neutral leach, pH 4.5 to 5.4 at 65 C (R14), over what such tanks run at", () => {
    const s = swept(plan([line("Zn", "dissolved", 1), line("Fe", "solid", 3e-4)], { solidsBasis: "aged" }), {
      varied: { kind: "temperature" },
      range: [55, 75],
      frames: 5,
      between: 1,
      kept: [5, 0.5],
    });
    expect(s.turns.filter((t) => t.kind === "closes" || t.kind === "opens")).toEqual([]);
    expect(s.samples.every((x) => x.windows > 0 && (x.kept ?? -1) > 0)).toBe(true);
  });
});

describe("where windows open and close", () => {
  // Both limits stand upright, and the wall of M^2+ moves by 1/2 pH a decade: M(OH)2 or MO + 2 H^+ = M^2+ + H2O.
  const walls = plan([line("Zn", "dissolved", 1e-4), line("Cu", "compound", 1e-6)], {
    temperatureC: 25,
    preset: "water",
    ligands: [],
    frame: { pH: [3, 9], Eh: [0.6, 1.0] },
    water: { bound: "none" },
  });

  test("the root is the one by hand: where zinc's wall meets copper's", () => {
    const wall = (inputs: PlanInputs, metal: string, end: 0 | 1) =>
      solvedAt({ ...inputs, metals: inputs.metals.filter((m) => m.element === metal) }).windows[0]!.pH[end];
    const root = -4 + 2 * (wall(walls, "Zn", 1) - wall(walls, "Cu", 0));
    const { turns, tolerance } = swept(walls, { varied: { kind: "amount", of: "Zn" }, range: [1e-5, 100], frames: 7, between: 2 }); // prettier-ignore
    const closes = turns.filter((t) => t.kind === "closes");
    expect(closes.length).toBe(1);
    expect(Math.abs(Math.log10(closes[0]!.at) - root)).toBeLessThan(2 * tolerance);
    expect(Math.log10(closes[0]!.between[1] / closes[0]!.between[0])).toBeLessThanOrEqual(tolerance * 1.0001);
    expect(closes[0]!.limits.map((l) => [l.metal, l.outside]).sort()).toEqual([
      ["Cu", "Cu^2+(aq)"],
      ["Zn", closes[0]!.limits.find((l) => l.metal === "Zn")!.outside],
    ]);
    expect(closes[0]!.conflicts.map((c) => c.map((r) => r.metal))).toEqual([["Zn", "Cu"]]);
    expect(closes[0]!.abrupt).toBe(false);
  });

  test("the margin of one control band is passed half a band before: walls one band from the middle", () => {
    const { turns } = swept(walls, { varied: { kind: "amount", of: "Zn" }, range: [1e-5, 100], frames: 7, between: 2 });
    const [slips, closes] = [turns.find((t) => t.kind === "slips")!, turns.find((t) => t.kind === "closes")!];
    // two bands of pH between the walls, at 1/2 pH a decade
    expect(Math.log10(closes.at / slips.at)).toBeCloseTo(2 * 2 * band.pH, 3);
    expect(slips.at).toBeLessThan(closes.at);
  });

  test("it opens where the advice for a plan without a window says that it does", () => {
    const shut = withSetting(walls, { kind: "amount", of: "Zn" }, 50);
    const advice = valueOf(adviceFor(toProblem(shut, library), library));
    const to = advice.openings.find((o) => o.change === "activity" && o.of === "Zn")?.to;
    const { turns } = swept(shut, { varied: { kind: "amount", of: "Zn" }, range: [1e-5, 100], frames: 5, between: 3 });
    expect(Math.abs(Math.log10(Number(to) / turns.find((t) => t.kind === "closes")!.at))).toBeLessThan(3e-4);
  });

  test("a sweep that starts shut opens; the same turns are found whatever the number of steps", () => {
    const wish = (frames: number, between: number): SweepWish => ({ varied: { kind: "amount", of: "Cu" }, range: [1e-9, 1], frames, between }); // prettier-ignore
    const shut = withSetting(walls, { kind: "amount", of: "Zn" }, 1);
    const [coarse, fine] = [swept(shut, wish(3, 0)), swept(shut, wish(9, 5))];
    const opens = (s: Sweep) => s.turns.filter((t) => t.kind === "opens").map((t) => Math.log10(t.at));
    expect(opens(coarse).length).toBe(1);
    expect(opens(coarse)[0]).toBeCloseTo(opens(fine)[0]!, 3);
  });

  test("ranges that fall, leave the models or speak of what the plan has not are refused with their values", () => {
    const wish: SweepWish = { varied: { kind: "temperature" }, range: [80, 20], frames: 5, between: 1 };
    expect(sweep(walls, wish, library)).toMatchObject({ ok: false, error: { code: "OUT_OF_RANGE", path: "range" } });
    expect(sweep(walls, { ...wish, range: [20, 300] }, library)).toMatchObject({ ok: false, error: { path: "range" } });
    expect(sweep(walls, { ...wish, range: [20, 80], frames: 1 }, library)).toMatchObject({ ok: false, error: { path: "frames" } }); // prettier-ignore
    expect(sweep(walls, { ...wish, range: [1, 2], varied: { kind: "total", of: "Cl" } }, library)).toMatchObject({ ok: false, error: { path: "varied" } }); // prettier-ignore
  });
});
