import { describe, expect, test } from "vitest";
import type { Field, Point } from "../../../shared/solution";
import { sheetBoxes, domains, mapPixels } from "../../../src/map/boxes";
import { boundaryLines, chained } from "../../../shared/drawing/boundaries";
import { clipToBox, placeLabels, type Pixel } from "../../../shared/drawing/labels";
import { isLit } from "../../../shared/drawing/lit";
import { lineCoordinates, ringCoordinates, signedArea2 } from "../../../src/map/geometry/rings";
import { afterRelayout } from "../../../src/map/zoom";
import { fields, millivolts, solution } from "./fixture";

const square = (x0: number, x1: number): Point[] => [
  [x0, x0],
  [x1, x0],
  [x1, x1],
  [x0, x1],
];
/** the rings between the gaps, each closed */
function rings(x: (number | null)[], y: (number | null)[]): Point[][] {
  const out: Point[][] = [[]];
  x.forEach((value, i) => (value === null ? out.push([]) : out[out.length - 1]!.push([value, y[i]!])));
  return out;
}

describe("rings of one trace", () => {
  test.each([
    ["as the core gives them", square(0, 10), [...square(4, 6)].reverse()],
    ["both turned", [...square(0, 10)].reverse(), square(4, 6)],
  ])("outer rings run counter-clockwise and holes clockwise, %s", (_, outer, hole) => {
    const { x, y } = ringCoordinates([{ outer, holes: [hole] }], (E) => E);
    const [first, second, ...rest] = rings(x, y);
    expect(rest).toEqual([]);
    expect(signedArea2(first!)).toBeCloseTo(200);
    expect(signedArea2(second!)).toBeCloseTo(-8);
    for (const ring of [first!, second!]) expect(ring[0]).toEqual(ring[ring.length - 1]);
  });

  test("with nonzero filling the hole stays empty and the ring around it is filled", () => {
    const { x, y } = ringCoordinates([{ outer: square(0, 10), holes: [square(4, 6)] }], (E) => E);
    const winding = ([px, py]: Point) =>
      rings(x, y).reduce((sum, ring) => {
        for (let i = 0; i + 1 < ring.length; i++) {
          const [[x0, y0], [x1, y1]] = [ring[i]!, ring[i + 1]!];
          const side = (x1 - x0) * (py - y0) - (px - x0) * (y1 - y0);
          if (y0 <= py && y1 > py && side > 0) sum++;
          if (y0 > py && y1 <= py && side < 0) sum--;
        }
        return sum;
      }, 0);
    expect(winding([5, 5])).toBe(0);
    expect(winding([2, 2])).toBe(1);
    expect(winding([11, 5])).toBe(0);
  });

  test("lines are parted by gaps and go through the scale", () => {
    expect(lineCoordinates([square(0, 1).slice(0, 2), square(2, 3).slice(0, 2)], (E) => E * 1000)).toEqual({
      x: [0, 1, null, 2, 3],
      y: [0, 0, null, 2000, 2000],
    });
  });
});

describe("boundaries between fields", () => {
  const frame = solution.frame;
  const zinc = fields.filter((f) => f.metal === "Zn");
  const iron = fields.filter((f) => f.metal === "Fe");
  const total = (lines: Point[][]) =>
    lines.reduce(
      (sum, line) => sum + line.slice(1).reduce((s, p, i) => s + Math.hypot(p[0] - line[i]![0], p[1] - line[i]![1]), 0),
      0,
    );

  test("the seam between two pieces of one species and the frame's sides are not drawn", () => {
    const lines = boundaryLines(zinc, frame);
    expect(lines).toHaveLength(1);
    expect(total(lines)).toBeCloseTo(1, 9);
    for (const [pH] of lines[0]!) expect(pH).toBeCloseTo(6, 9);
  });

  test("a field inside another is outlined once, although its neighbours' corners stand elsewhere", () => {
    const lines = boundaryLines(iron, frame);
    expect(total(lines)).toBeCloseTo(2 * 2 + 2 * 0.2, 6);
  });

  test("a boundary whose far side changes species half way is drawn on its whole length", () => {
    const three: Field[] = [
      {
        metal: "X",
        species: "a",
        state: "dissolved",
        polygon: [
          [0, 0],
          [10, 0],
          [10, 0.5],
          [0, 0.5],
        ],
      },
      {
        metal: "X",
        species: "b",
        state: "compound",
        polygon: [
          [0, 0.5],
          [5, 0.5],
          [5, 1],
          [0, 1],
        ],
      },
      {
        metal: "X",
        species: "c",
        state: "metal",
        polygon: [
          [5, 0.5],
          [10, 0.5],
          [10, 1],
          [5, 1],
        ],
      },
    ];
    expect(total(boundaryLines(three, frame))).toBeCloseTo(10 + 0.5, 6);
  });

  test("segments join where two meet and stop where three do", () => {
    const joined = chained([
      [
        [0, 0],
        [1, 0],
      ],
      [
        [2, 0],
        [1, 0],
      ],
      [
        [2, 0],
        [2, 1],
      ],
      [
        [2, 0],
        [3, 0],
      ],
    ]);
    expect(joined.map((l) => l.length).sort()).toEqual([2, 2, 3]);
  });
});

describe("names in the fields", () => {
  const view = { x0: 0, y0: 0, x1: 400, y1: 300 };
  const block = (x0: number, y0: number, x1: number, y1: number): Pixel[] => [
    [x0, y0],
    [x1, y0],
    [x1, y1],
    [x0, y1],
  ];
  const wish = (id: string, ...pieces: Pixel[][]) => ({ id, pieces, width: 60, height: 16 });

  test("a name lies wholly in its field", () => {
    const at = placeLabels([wish("a", block(100, 50, 180, 90))], view, []).get("a")!;
    expect(at[0] - 30).toBeGreaterThanOrEqual(100);
    expect(at[0] + 30).toBeLessThanOrEqual(180);
    expect(at[1] - 8).toBeGreaterThanOrEqual(50);
    expect(at[1] + 8).toBeLessThanOrEqual(90);
  });
  test("a field too small for its name goes without", () => {
    expect(placeLabels([wish("a", block(0, 0, 50, 90)), wish("b", block(60, 0, 200, 14))], view, []).size).toBe(0);
  });
  test("a name may lie across the seam of two pieces", () =>
    expect(placeLabels([wish("a", block(0, 0, 40, 40), block(40, 0, 80, 40))], view, []).has("a")).toBe(true));
  test("a name keeps out of a hole in its field", () => {
    const hole = block(60, 0, 340, 300);
    const at = placeLabels([{ ...wish("a", block(0, 0, 400, 300)), width: 40, holes: [hole] }], view, []).get("a")!;
    expect(at[0] + 20 <= 60 || at[0] - 20 >= 340).toBe(true);
  });
  test("a field with a bay takes a name beside the bay, not across it", () => {
    const bay: Pixel[] = [
      [0, 0],
      [400, 0],
      [400, 300],
      [220, 300],
      [220, 60],
      [180, 60],
      [180, 300],
      [0, 300],
    ];
    const at = placeLabels([{ ...wish("a", bay), height: 80 }], view, []).get("a")!;
    expect(at[0] + 30 <= 180 || at[0] - 30 >= 220).toBe(true);
  });
  test("names do not cover each other, nor what is already there", () => {
    const placed = placeLabels([wish("a", block(0, 0, 400, 40)), wish("b", block(0, 0, 400, 40))], view, [
      { x0: 0, y0: 0, x1: 120, y1: 40 },
    ]);
    const [a, b] = [placed.get("a")!, placed.get("b")!];
    expect(Math.abs(a[0] - b[0]) >= 60 || Math.abs(a[1] - b[1]) >= 16).toBe(true);
    for (const p of [a, b]) expect(p[0] - 30).toBeGreaterThanOrEqual(120);
  });
  test("a name stays where it stood while it fits there, and is placed anew when it no longer does", () => {
    const stood = new Map([["a", [70, 40] as const]]);
    const at = (x1: number) => placeLabels([wish("a", block(0, 0, x1, 300))], view, [], [], stood).get("a");
    expect(at(400)).toEqual([70, 40]);
    expect(at(400)).not.toEqual(placeLabels([wish("a", block(0, 0, 400, 300))], view, []).get("a"));
    expect(at(90)![0] + 30).toBeLessThanOrEqual(90);
    const beside = placeLabels(
      [wish("a", block(0, 0, 400, 300))],
      view,
      [{ x0: 60, y0: 30, x1: 80, y1: 50 }],
      [],
      stood,
    );
    expect(beside.get("a")).not.toEqual([70, 40]);
  });
  test("a name keeps off a line that crosses its field where it can", () => {
    const at = placeLabels(
      [wish("a", block(0, 0, 400, 300))],
      view,
      [],
      [
        [
          [0, 150],
          [400, 150],
        ],
      ],
    ).get("a")!;
    expect(Math.abs(at[1] - 150)).toBeGreaterThan(8);
  });
  test("a name holds still while its field grows by a few pixels", () => {
    const at = (w: number) => placeLabels([wish("a", block(0, 0, w, 200))], view, []).get("a");
    expect(at(301)).toEqual(at(304));
  });
  test("what lies outside the view is cut away", () => {
    expect(clipToBox(block(-50, -50, 50, 50), view)).toHaveLength(4);
    expect(clipToBox(block(-50, -50, -10, 50), view)).toHaveLength(0);
  });
});

test("a point in the window is lit, one in its hole or outside is not", () => {
  expect(isLit(solution.windows, 1, 0.5)).toBe(true);
  expect(isLit(solution.windows, 3, 0.5)).toBe(false);
  expect(isLit(solution.windows, 8, 0.5)).toBe(false);
});

describe("the sheet", () => {
  const wishes = { metals: 4, reagents: 3, crosscuts: true, reach: true };
  test("boxes do not overlap and stay on the sheet", () => {
    const sheet = sheetBoxes(740, 640, wishes);
    expect(sheet.map.x1).toBeLessThan(sheet.reach!.x0);
    expect(sheet.reach!.x1).toBeLessThan(sheet.alongEh!.x0);
    expect(sheet.alongEh!.x1).toBeLessThanOrEqual(740);
    expect(sheet.alongPH!.y1).toBeLessThan(sheet.map.y0);
    expect(sheet.alongPH!.x0).toBe(sheet.map.x0);
    expect(sheet.alongEh!.y1).toBe(sheet.map.y1);
  });
  test("without strips and bars the map takes their room", () => {
    const bare = sheetBoxes(740, 640, { ...wishes, crosscuts: false, reach: false });
    expect(bare.alongPH ?? bare.alongEh ?? bare.reach).toBeNull();
    expect(bare.map.x1).toBeGreaterThan(sheetBoxes(740, 640, wishes).map.x1);
  });
  test("domains are shares of the area inside the margins", () => {
    const sheet = sheetBoxes(740, 640, wishes);
    const { x, y } = domains(sheet, sheet.map);
    expect(x[0]).toBe(0);
    expect(y[1]).toBe(1);
    expect(sheet.margin.l + x[1] * (740 - sheet.margin.l - sheet.margin.r)).toBeCloseTo(sheet.map.x1);
  });
  test("pixels and points are inverse to each other; up is higher potential", () => {
    const { toPixel, toPoint, box } = mapPixels(sheetBoxes(740, 640, wishes), { pH: [1, 8], Eh: [-0.2, 1.2] });
    const [pH, Eh] = toPoint(...toPixel(5.1, 0.58));
    expect(pH).toBeCloseTo(5.1);
    expect(Eh).toBeCloseTo(0.58);
    expect(toPixel(1, 1.2)).toEqual([box.x0, box.y0]);
  });
});

describe("what is in sight after a zoom", () => {
  const frame = solution.frame;
  const after = (change: Record<string, unknown>, from = frame) => afterRelayout(change, from, frame, millivolts);
  test("ranges come in either notation, potentials back from the shown scale", () => {
    expect(after({ "xaxis.range[0]": 2, "xaxis.range[1]": 4, "yaxis.range": [0, 300] })).toEqual({
      pH: [2, 4],
      Eh: [0.2, 0.5],
    });
  });
  test("an axis that did not move keeps its range", () =>
    expect(after({ "xaxis.range[0]": 2, "xaxis.range[1]": 4 }, { pH: [0, 9], Eh: [0.1, 0.2] })).toEqual({
      pH: [2, 4],
      Eh: [0.1, 0.2],
    }));
  test("the whole frame is no zoom", () => {
    expect(
      after({ "xaxis.range[0]": 0, "xaxis.range[1]": 10, "yaxis.range[0]": -200, "yaxis.range[1]": 800 }),
    ).toBeNull();
    expect(after({ "xaxis.autorange": true })).toBeNull();
  });
});
