import { describe, expect, test } from "vitest";
import { themeColours } from "../../../src/lib/theme";
import { lookOf, placedMarks, symbolPath } from "../../../src/map/paintTrials";
import { nearestMark } from "../../../src/map/TrialsLayer";
import { colourScale, markSymbols, resultColour, type TrialMark } from "../../../src/map/trialMarks";
import { inBrush, TrialStore } from "../../../src/map/trialStore";

const colours = themeColours.light;
const mark = (id: string, part: Partial<TrialMark> = {}): TrialMark => ({
  id,
  code: id,
  pH: 5,
  Eh: 0.5,
  symbol: "circle",
  value: 80,
  open: false,
  cooled: false,
  ...part,
});
const scale = { lo: 0, hi: 100 };
/** 100 px a pH, 1000 px a volt, y downwards from 1 V */
const toPixel = (pH: number, Eh: number): [number, number] => [100 * pH, 1000 * (1 - Eh)];
const box = { x0: 0, y0: 0, x1: 1000, y1: 1000 };
const painting = (marks: TrialMark[], brushed: ReadonlySet<string> | null = null) => ({ marks, scale, colours, toPixel, box, brushed }); // prettier-ignore

const lightness = (hex: string) => [1, 3, 5].reduce((sum, i) => sum + parseInt(hex.slice(i, i + 2), 16), 0);

describe("colour of a result", () => {
  test("runs through its five stops and only gets darker", () => {
    expect(resultColour(0, scale, colours)).toBe(colours.result[0]);
    expect(resultColour(50, scale, colours)).toBe(colours.result[2]);
    expect(resultColour(100, scale, colours)).toBe(colours.result[4]);
    const steps = Array.from({ length: 101 }, (_, i) => lightness(resultColour(i, scale, colours)));
    expect(steps.every((l, i) => i === 0 || l <= (steps[i - 1] ?? 0))).toBe(true);
  });
  test("beyond its ends it stays, and what is not known has no colour of the scale", () => {
    expect(resultColour(-40, scale, colours)).toBe(colours.result[0]);
    expect(resultColour(140, scale, colours)).toBe(colours.result[4]);
    expect(resultColour(null, scale, colours)).toBe(colours.rule);
  });
  test("the scale has round ends that hold every value, blanks left out", () => {
    expect(colourScale([12.9, 90.4, null])).toEqual({ lo: 0, hi: 100 });
    expect(colourScale([0.1, 2.4])).toEqual({ lo: 0, hi: 2.5 });
    expect(colourScale([88, 88])).toEqual({ lo: 88, hi: 88.2 });
    expect(colourScale([null])).toEqual({ lo: 0, hi: 100 });
  });
});

describe("trials painted", () => {
  test("open under filled, those outside the brush under those inside", () => {
    const marks = [mark("a"), mark("b", { pH: 4, open: true }), mark("c", { pH: 6 })];
    expect(placedMarks(painting(marks)).map((p) => p.mark.id)).toEqual(["b", "a", "c"]);
    const brushed = placedMarks(painting(marks, new Set(["a"])));
    expect(brushed.map((p) => [p.mark.id, p.back])).toEqual([
      ["b", true],
      ["c", true],
      ["a", false],
    ]);
  });
  test("what is out of sight or wholly covered is left out; the upper one stays", () => {
    const marks = [mark("under", { pH: 5.001 }), mark("above"), mark("away", { pH: 40 })];
    expect(placedMarks(painting(marks)).map((p) => p.mark.id)).toEqual(["above"]);
  });
  test("thousands of values share a few dozen looks", () => {
    const looks = new Set(
      Array.from({ length: 2000 }, (_, i) =>
        JSON.stringify(lookOf(mark(String(i), { value: i / 20 }), scale, colours)),
      ),
    );
    expect(looks.size).toBeLessThanOrEqual(41);
    expect(lookOf(mark("a", { open: true }), scale, colours).fill).toBeNull();
  });
  test("every marker has an outline of its own", () =>
    expect(new Set(markSymbols.map((symbol) => symbolPath(symbol))).size).toBe(markSymbols.length));
});

describe("trials under the hand", () => {
  const marks = [mark("a"), mark("b", { pH: 5.05 })];
  test("the nearest within reach is meant", () => {
    expect(nearestMark(marks, toPixel, 501, 500)?.id).toBe("a");
    expect(nearestMark(marks, toPixel, 504, 500)?.id).toBe("b");
    expect(nearestMark(marks, toPixel, 540, 500)).toBeNull();
  });
  test("a brush holds what lies inside it, edges counted", () => {
    const brush = { pH: [4.9, 5] as const, Eh: [0.5, 0.6] as const };
    expect(marks.map((m) => inBrush(m, brush))).toEqual([true, false]);
  });
  test("map and table hear of each other only when something changed", () => {
    const store = new TrialStore();
    let told = 0;
    const stop = store.hovered.subscribe(() => (told += 1));
    store.hovered.set("a");
    store.hovered.set("a");
    store.hovered.set(null);
    stop();
    store.hovered.set("b");
    expect(told).toBe(2);
  });
});
