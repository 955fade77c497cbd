import { describe, expect, test } from "vitest";
import { library } from "../../support/solver";
import { valueOf } from "../../../shared/outcome";
import { freeAcidCurve } from "../../../shared/activity/freeAcid";
import type { Reach } from "../../../shared/reach/reach";
import { reagentById } from "../../../shared/reach/reagents";
import { sheetBoxes } from "../../../src/map/boxes";
import { mapContent } from "../../../src/map/content";
import { mapLayout, mapTraces } from "../../../src/map/figure";
import { isLit } from "../../../shared/drawing/lit";
import { hatchesOf } from "../../../src/map/metalStyle";
import type { PlotTrace } from "../../../src/map/plotTypes";
import { placedNames } from "../../../src/map/names/placedNames";
import { speciesText } from "../../../src/map/speciesText";
import { reachBar } from "../../../src/map/svg/ReachBars";
import { differingStretches, limitMarks } from "../../../src/map/svg/stripModel";
import { boundariesByMetal, boundaryTraces } from "../../../src/map/traces/fields";
import { openGroundTraces, shutGroundTraces, windowOutlineTraces } from "../../../src/map/traces/ground";
import { hydrogenCyanideTraces, movedLimits, waterTraces } from "../../../src/map/traces/lines";
import { setPointTraces } from "../../../src/map/traces/setPoint";
import type { MapMetal } from "../../../src/map/view";
import { solution, view, window } from "./fixture";

const air: Reach = {
  reagent: reagentById.get("air")!,
  practical: [0.45, 0.75],
  line: { intercept: 1.2, slope: -0.066, from: "library" },
};
const shut = new Map(solution.shut!.map((s) => [s.metal, s.polygons]));
const sheet = sheetBoxes(740, 640, { metals: 2, reagents: 2, crosscuts: true, reach: true });
const content = mapContent({
  metals: view.metals,
  solution,
  other: null,
  through: [1, 0.5],
  reaches: [air, { ...air, reagent: reagentById.get("ferric")! }],
  cyanide: false,
});
const byUid = (traces: PlotTrace[], uid: string) => traces.find((t) => t.uid === uid)!;
const shown = (t: PlotTrace) => t.y.filter((v) => v !== null);

describe("shut and open ground", () => {
  test("one toself trace a metal, each with its own hatch, the target in copper and the gangue in ink", () => {
    const traces = shutGroundTraces(shut, view);
    expect(traces.map((t) => t.uid)).toEqual(["shut-Zn", "shut-Fe"]);
    for (const t of traces) expect(t.fill).toBe("toself");
    expect(traces[0]!.fillpattern!.fgcolor).toBe(view.colours.copper);
    expect(traces[1]!.fillpattern!.fgcolor).toBe(view.colours.ink);
    expect(traces[0]!.fillpattern!.shape).not.toBe(traces[1]!.fillpattern!.shape);
  });
  test("a metal that is free shuts nothing, and the plain view hatches nothing", () => {
    const free = view.metals.map((m) => (m.element === "Zn" ? { ...m, requirement: "free" as const } : m));
    expect(shutGroundTraces(shut, { ...view, metals: free }).map((t) => t.uid)).toEqual(["shut-Fe"]);
    expect(shutGroundTraces(shut, { ...view, plain: true })).toEqual([]);
  });
  test("out of focus a metal's hatching steps back", () => {
    const [zinc, iron] = shutGroundTraces(shut, { ...view, focus: "Zn" });
    expect(zinc!.fillpattern!.fgopacity).toBeGreaterThan(3 * iron!.fillpattern!.fgopacity);
  });
  test("ten metals of whatever roles never share shape and spacing, nor do sixteen", () => {
    const roles = ["target", "gangue", "watched"] as const;
    for (let n = 0; n < 400; n++) {
      const metals = Array.from({ length: n < 200 ? 10 : 16 }, (_, i) => ({
        element: String(i),
        role: roles[(n * (i + 3) * 7 + Math.floor((n * i) / 5)) % 3]!,
      }));
      const seen = [...hatchesOf(metals).values()].map((h) => `${h.shape} ${h.size}`);
      expect(new Set(seen).size).toBe(metals.length);
    }
  });
  test("metals of one role never share angle and spacing", () => {
    const metals = ["A", "B", "C", "D", "E", "F", "G"].map((element): MapMetal => ({
      element,
      role: "gangue",
      requirement: "solid",
    }));
    const hatches = [...hatchesOf(metals).values()].map((h) => `${h.shape} ${h.size}`);
    expect(new Set(hatches).size).toBe(metals.length);
  });
  test("the window is lit with its hole kept, its potentials on the chosen scale", () => {
    const [open] = openGroundTraces(solution, view);
    expect(open!.fillcolor).toBe(view.colours.tint);
    expect(open!.x.filter((v) => v === null)).toHaveLength(1);
    expect([Math.min(...shown(open!)), Math.max(...shown(open!))]).toEqual([-200, 800]);
  });
  test("a window too narrow to be held is outlined in dashes", () => {
    const outline = (controllable: boolean) =>
      windowOutlineTraces({ windows: [{ ...window, controllable }] }, view)[0]!.line!.dash;
    expect(outline(true)).toBe("solid");
    expect(outline(false)).not.toBe("solid");
  });
});

describe("lines", () => {
  test("field boundaries are weighted by role, the target heavier than the watched", () => {
    const lines = boundariesByMetal(solution.fields, solution.frame);
    const watched = view.metals.map((m) => (m.element === "Fe" ? { ...m, role: "watched" as const } : m));
    const traces = boundaryTraces(lines, { ...view, metals: watched });
    expect(byUid(traces, "fields-target").line!.width).toBeGreaterThan(byUid(traces, "fields-watched").line!.width);
    expect(byUid(traces, "fields-target").x.every((x) => x === null || Math.abs(x - 6) < 1e-9)).toBe(true);
    const one = boundaryTraces(lines, { ...view, focus: "Zn" });
    expect(byUid(one, "fields-target").opacity).toBe(1);
    expect(byUid(one, "fields-gangue-aside").opacity).toBeLessThan(0.5);
  });
  test("water lines run from side to side of the frame", () => {
    const [oxygen] = waterTraces(solution, view);
    expect(oxygen!.x).toEqual([0, 10, null, 0, 10]);
    expect(oxygen!.y[0]).toBeCloseTo((1.2 - 0.2) * 1000);
    expect(oxygen!.y[1]).toBeCloseTo((1.2 - 0.66 - 0.2) * 1000);
    expect(oxygen!.y[3]).toBeCloseTo(-200);
  });
  test("HCN ends at pH 10.5, or at the frame without an edge line", () => {
    const wide = hydrogenCyanideTraces({ ...view, frame: { pH: [9, 13], Eh: [0, 1] } });
    expect(Math.max(...wide[0]!.x.map((x) => x ?? 0))).toBe(10.5);
    expect(wide[1]!.x).toEqual([10.5, 10.5]);
    expect(hydrogenCyanideTraces(view)[1]!.x).toEqual([]);
    expect(hydrogenCyanideTraces({ ...view, frame: { pH: [11, 13], Eh: [0, 1] } })).toEqual([]);
  });
  test("of the other basis only edges that moved are kept", () => {
    const far = {
      ...window.limits[1]!,
      line: [1, -1, 0] as [number, number, number],
      from: [1, 0.4] as const,
      to: [1, 0.6] as const,
    };
    const other = { windows: [{ ...window, limits: [window.limits[0]!, far, window.limits[2]!] }] };
    expect(movedLimits(solution, other)).toEqual([far]);
    expect(movedLimits(solution, solution)).toEqual([]);
  });
});

describe("set point", () => {
  test("its box is two control bands wide and high, on the chosen scale", () => {
    const band = byUid(setPointTraces({ pH: 5, Eh: 0.5 }, view), "set-point");
    const x = band.x.filter((v) => v !== null);
    expect(Math.max(...x) - Math.min(...x)).toBeCloseTo(0.3);
    expect(band.marker!.size.filter((size) => size > 0)).toHaveLength(1);
    expect([x.at(-1), shown(band).at(-1)]).toEqual([5, 300]);
    expect(Math.max(...shown(band)) - Math.min(...shown(band))).toBeCloseTo(60);
  });
  test("without a window there is none", () => expect(setPointTraces(null, view)).toEqual([]));
});

describe("reach bars", () => {
  const bar = (equilibrium: number, slope = 0) =>
    reachBar({ ...air, line: { intercept: equilibrium, slope, from: "library" } }, 5, view.frame.Eh);
  test("solid over the practical range, thin from its end on to the equilibrium, inside the frame", () => {
    const { solid, thin, cap } = bar(1.2, -0.066);
    expect(solid).toEqual([0.45, 0.75]);
    expect(thin![0]).toBe(0.75);
    expect(thin![1]).toBeCloseTo(1.2 - 5 * 0.066);
    expect(cap).toEqual({ at: thin![1], beyond: 0 });
  });
  test("an equilibrium beyond what is in sight is an arrow at its end", () =>
    expect(bar(1.4).cap).toEqual({ at: 1, beyond: 1 }));
  test("an equilibrium inside the practical range needs no thin line", () => expect(bar(0.6).thin).toBeNull());
});

describe("crosscuts", () => {
  test("the way to the nearest limit on either side, in pH and mV, with the metal that shuts", () => {
    const eh = { ...window.limits[1]!, distancePH: null, distanceEh: -0.1234 };
    const far = { ...window.limits[0]!, distancePH: 7 };
    const marked = { ...window, limits: [...window.limits, eh, far] };
    expect(limitMarks(marked, "pH").map((m) => [m.at, m.kind, m.metal, m.text])).toEqual([
      [0, "frame", null, "−1.00\u2009pH"],
      [2, "metal", "Fe", "+1.00\u2009pH"],
    ]);
    // in a sulfate liquor a limit below pH 1.5 is told in g/L too, as the curve has it
    const curve = valueOf(freeAcidCurve(library, 0.5, 25));
    const acid = { ...window, setPoint: { ...window.setPoint, pH: 1.8 }, limits: [{ ...window.limits[1]!, distancePH: -0.8 }] }; // prettier-ignore
    expect(limitMarks(acid, "pH", curve)[0]!.text).toBe(`−0.80\u2009pH, ${curve.at(1).gPerL.toFixed(0)}\u2009g/L`);
    expect(limitMarks({ ...acid, setPoint: { ...acid.setPoint, pH: 2.4 } }, "pH", curve)[0]!.text).toBe(
      "−0.80\u2009pH",
    );
    expect(limitMarks(marked, "Eh").map((m) => [m.metal, m.text])).toEqual([["Fe", "−123\u2009mV"]]);
  });
  test("two lines differ where a metal is something else on each", () => {
    const part = (species: string, from: number, to: number) =>
      ({ species, from, to, state: "dissolved", fulfilled: true }) as const;
    const first = [part("a", 0, 4), part("b", 4, 10)];
    expect(differingStretches(first, first)).toEqual([]);
    expect(differingStretches(first, [part("a", 0, 2), part("c", 2, 5), part("b", 5, 10)])).toEqual([[2, 5]]);
  });
});

describe("the figure", () => {
  test("has traces with an id of their own", () => {
    const traces = mapTraces(content, view);
    expect(traces.length).toBeGreaterThan(5);
    expect(new Set(traces.map((t) => t.uid)).size).toBe(traces.length);
  });
  test("ranges are on the chosen scale, and hold what is in sight", () => {
    expect(mapLayout(sheet, view).yaxis.range).toEqual([-200, 800]);
    const zoomed = mapLayout(sheet, { ...view, visible: { pH: [2, 4], Eh: [0.45, 0.7] } });
    expect(zoomed.xaxis.range).toEqual([2, 4]);
    expect(zoomed.yaxis.range).toEqual([250, expect.closeTo(500, 6)]);
  });
  test("names stand in the fields, typeset, those on open ground told apart", () => {
    const names = placedNames(content, sheet, view);
    const plain = (id: string) => names.find((n) => n.id === id)?.lines.map((l) => l.parts.map((p) => p.text).join(""));
    expect(plain("Zn ZnO(s)")).toEqual(["ZnO"]);
    expect(plain("Fe FeOOH(s,goethite)")).toEqual(["FeOOH"]);
    expect(plain("window 0")).toEqual(["Window A", "cut by the frame"]);
    expect(names.find((n) => n.id === "Zn Zn^2+(aq)")?.lines[0]?.parts).toContainEqual({ text: "2+", kind: "sup" });
    expect(new Set(names.map((n) => n.lit))).toEqual(new Set([true, false]));
    for (const { pH, Eh, lit } of names) expect(isLit(solution.windows, pH, Eh)).toBe(lit);
  });
  test("names keep clear of the marks of trials where there is room, and stay where there is none", () => {
    const at = (marks: { pH: number; Eh: number }[], id: string) =>
      placedNames(content, sheet, view, { marks }).find((n) => n.id === id)!;
    const before = at([], "Zn Zn^2+(aq)");
    const after = at([{ pH: before.pH, Eh: before.Eh }], "Zn Zn^2+(aq)");
    expect([after.pH, after.Eh]).not.toEqual([before.pH, before.Eh]);
    const { pH, Eh } = view.visible;
    const everywhere = Array.from({ length: 60 * 60 }, (_, i) => ({
      pH: pH[0] + ((pH[1] - pH[0]) * (i % 60)) / 59,
      Eh: Eh[0] + ((Eh[1] - Eh[0]) * Math.floor(i / 60)) / 59,
    }));
    expect(placedNames(content, sheet, view, { marks: everywhere }).map((n) => n.id)).toEqual(
      placedNames(content, sheet, view, { marks: [] }).map((n) => n.id),
    );
  });
  test("a metal that is hidden is not drawn, and counts in the window all the same", () => {
    const bare = { ...view, hidden: new Set(["Fe"]) };
    const uids = mapTraces(content, bare).map((t) => t.uid);
    expect(uids).not.toContain("shut-Fe");
    expect(uids).not.toContain("fields-gangue");
    expect(uids).toContain("open-0");
    expect(placedNames(content, sheet, bare).some((n) => n.id.startsWith("Fe "))).toBe(false);
  });
  test("of two that are compared every piece of ground says what both are", () => {
    const names = placedNames(content, sheet, { ...view, pair: ["Zn", "Fe"] }).map((n) => n.id);
    expect(names).toContain("Zn ZnO(s), Fe FeOOH(s,goethite)");
    expect(names).toContain("Zn Zn^2+(aq), Fe Fe^2+(aq)");
    expect(names).not.toContain("Zn ZnO(s), Fe Fe^2+(aq)");
    expect(names).not.toContain("Zn ZnO(s)");
  });
  test("layers switched off leave nothing behind", () => {
    const off = Object.fromEntries(Object.keys(view.layers).map((k) => [k, false])) as typeof view.layers;
    expect(mapTraces(content, { ...view, layers: off }).map((t) => t.uid)).toEqual([
      "open-0",
      "shut-Zn",
      "shut-Fe",
      "outline-0",
    ]);
  });
});

test("a neutral dissolved species says that it is dissolved; ions and solids need not", () => {
  const text = (id: string) =>
    speciesText(id)
      .map((p) => p.text)
      .join("");
  expect(text("FeSO4(aq)")).toBe("FeSO4(aq)");
  expect(text("Fe^3+(aq)")).toBe("Fe3+");
  expect(text("FeOOH(s,goethite)")).toBe("FeOOH");
});
