import { describe, expect, test } from "vitest";
import type { Reach } from "../../../shared/reach/reach";
import { reagentById } from "../../../shared/reach/reagents";
import { sheetBoxes } from "../../../src/map/boxes";
import { mapContent } from "../../../src/map/content";
import { mapFigure } from "../../../src/map/figure";
import { isLit } from "../../../shared/drawing/lit";
import { hatchesOf } from "../../../src/map/metalStyle";
import type { PlotTrace } from "../../../src/map/plotTypes";
import { speciesHtml } from "../../../src/map/speciesText";
import { boundariesByMetal, boundaryTraces } from "../../../src/map/traces/fields";
import { openGroundTraces, shutGroundTraces, windowOutlineTraces } from "../../../src/map/traces/ground";
import { hydrogenCyanideTraces, movedLimits, waterTraces } from "../../../src/map/traces/lines";
import { reachTraces } from "../../../src/map/traces/reachBars";
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
    const band = byUid(setPointTraces({ pH: 5, Eh: 0.5 }, [5, 0.5], view), "set-point");
    const x = band.x.filter((v) => v !== null);
    expect(Math.max(...x) - Math.min(...x)).toBeCloseTo(0.3);
    expect(band.marker!.size.filter((size) => size > 0)).toHaveLength(1);
    expect([x.at(-1), shown(band).at(-1)]).toEqual([5, 300]);
    expect(Math.max(...shown(band)) - Math.min(...shown(band))).toBeCloseTo(60);
  });
  test("without a window the lines stay and box and point go", () =>
    expect(setPointTraces(null, [5, 0.5], view).map((t) => t.uid)).toEqual(["guides"]));
});

describe("reach bars", () => {
  test("solid over the practical range, thin from its end on to the equilibrium, inside the frame", () => {
    const [thin, solid] = reachTraces([air], 5, view);
    shown(solid!).forEach((v, i) => expect(v).toBeCloseTo(([0.45, 0.75][i]! - 0.2) * 1000));
    expect(shown(solid!)).toHaveLength(2);
    expect(Math.max(...shown(thin!))).toBeCloseTo((1.2 - 5 * 0.066 - 0.2) * 1000);
    expect(thin!.line!.width).toBeLessThan(solid!.line!.width);
  });
  test("on the map the equilibrium is capped level; beyond it an arrow points on", () => {
    const wings = (equilibrium: number) => {
      const [thin] = reachTraces([{ ...air, line: { intercept: equilibrium, slope: 0, from: "library" } }], 5, view);
      const at = thin!.x.flatMap((x, i) => (x !== null && Math.abs(x - 0.5) > 0.1 ? [thin!.y[i]!] : []));
      return { tip: Math.max(...shown(thin!)), wings: at };
    };
    expect(wings(0.9)).toEqual({ tip: 700, wings: [700, 700] });
    const beyond = wings(1.4);
    expect(beyond.tip).toBe(800);
    for (const y of beyond.wings) expect(y).toBeLessThan(800);
  });
});

describe("the figure", () => {
  const figure = mapFigure(content, sheet, view);
  test("has scatter traces only, each with an id of its own and no hover", () => {
    expect(new Set(figure.data.map((t) => t.uid)).size).toBe(figure.data.length);
    for (const t of figure.data) expect([t.type, t.hoverinfo]).toEqual(["scatter", "skip"]);
  });
  test("strips share the map's axes", () => {
    expect(byUid(figure.data, "cut-pH-open")).toMatchObject({ xaxis: "x", yaxis: "y2" });
    expect(byUid(figure.data, "cut-Eh-open")).toMatchObject({ xaxis: "x2", yaxis: "y" });
    expect(byUid(figure.data, "reach-solid")).toMatchObject({ xaxis: "x3", yaxis: "y" });
  });
  test("along pH zinc is tinted to pH 6 and hatched beyond", () => {
    const hatched = byUid(figure.data, "cut-pH-Zn").x.filter((x) => x !== null);
    expect([Math.min(...hatched), Math.max(...hatched)]).toEqual([6, 10]);
  });
  test("along Eh at pH 1 iron is as required throughout", () =>
    expect(byUid(figure.data, "cut-Eh-Fe")).toBeUndefined());
  test("ranges and names are on the chosen scale, and the axis says which", () => {
    expect(figure.layout.yaxis.range).toEqual([-200, 800]);
    expect(figure.layout.annotations.map((a) => a.text)).toContain("Eh / mV vs Ag/AgCl");
  });
  test("uirevision stands while the solution moves and changes with frame and scale", () => {
    const moved = mapFigure({ ...content, solution: { ...solution, temperatureC: 70 } }, sheet, view);
    expect(moved.layout.uirevision).toBe(figure.layout.uirevision);
    expect(mapFigure(content, sheet, { ...view, frame: { pH: [0, 9], Eh: [0, 1] } }).layout.uirevision).not.toBe(
      figure.layout.uirevision,
    );
  });
  test("names stand in the fields, typeset, those on open ground apart", () => {
    const names = figure.data.filter((t) => t.uid.startsWith("names-")).flatMap((t) => t.text!);
    expect(names).toContain("<b>ZnO</b>");
    expect(names).toContain("FeOOH");
    expect(names.some((n) => n.includes("Window A") && n.includes("cut by the frame"))).toBe(true);
    expect(names).toContain("<b>Zn<sup>2+</sup></b>");
    for (const [uid, lit] of [
      ["names-on-lit", true],
      ["names-on-sheet", false],
    ] as const) {
      const { x, y } = byUid(figure.data, uid);
      expect(x.length).toBeGreaterThan(0);
      x.forEach((pH, i) => expect(isLit(solution.windows, pH!, view.scale.fromShown(y[i]!))).toBe(lit));
    }
  });
  test("layers switched off leave nothing behind", () => {
    const off = Object.fromEntries(Object.keys(view.layers).map((k) => [k, false])) as typeof view.layers;
    const bare = mapFigure(content, sheetBoxes(740, 640, { metals: 2, reagents: 2, crosscuts: false, reach: false }), {
      ...view,
      layers: off,
    });
    expect(bare.data.map((t) => t.uid)).toEqual([
      "ground",
      "open-0",
      "shut-Zn",
      "shut-Fe",
      "outline-0",
      "names-on-lit",
    ]);
    expect([bare.layout.xaxis2, bare.layout.xaxis3, bare.layout.yaxis2]).toEqual([undefined, undefined, undefined]);
  });
});

test("a neutral dissolved species says that it is dissolved; ions and solids need not", () => {
  expect(speciesHtml("FeSO4(aq)", 11).html).toBe("FeSO<sub>4</sub>(aq)");
  expect(speciesHtml("Fe^3+(aq)", 11).html).toBe("Fe<sup>3+</sup>");
  expect(speciesHtml("FeOOH(s,goethite)", 11).html).toBe("FeOOH");
});
