import { describe, expect, test } from "vitest";
import { setPointOf, type BorderSegment } from "../../../shared/setpoint/setPoint";
import { chordAt, widestChord } from "../../../shared/setpoint/widestChord";
import { loop } from "../../support/border";

const band = { pH: 0.2, Eh: 0.05 };
const couple: () => [string, string] = () => ["Fe^2+(aq)", "Fe^3+(aq)"];
const none = (): null => null;

/** Corners in pH and V, sides by number that belong to the frame. */
const border = (corners: [number, number][], frame: number[] = []): BorderSegment[] =>
  loop(corners.map(([pH, Eh]) => [pH / band.pH, Eh / band.Eh] as const)).map((s, i) => ({
    ...s,
    frame: frame.includes(i),
  }));

const close = (n: number): number => expect.closeTo(n, 6) as number;

describe("where a couple sets Eh", () => {
  test("the box is in control bands: pH 2 to 4 is 10 bands, 0.3 to 0.9 V is 12", () =>
    expect(setPointOf(border([[2, 0.3], [4, 0.3], [4, 0.9], [2, 0.9]]), band, couple)).toEqual({
      pH: close(3),
      Eh: close(0.6),
      margin: close(5),
      mixedPotential: false,
      couple: ["Fe^2+(aq)", "Fe^3+(aq)"],
      cutByFrame: false,
    })); // prettier-ignore

  test("cut by the frame only where a side of the frame is as near as the nearest limit", () => {
    const box: [number, number][] = [[2, 0.3], [4, 0.3], [4, 0.9], [2, 0.9]]; // prettier-ignore
    const cut = (sides: number[]) => setPointOf(border(box, sides), band, couple)!.cutByFrame;
    expect([cut([1]), cut([3]), cut([0, 2])]).toEqual([true, true, false]);
  });

  test("the couple is asked for at the deepest point", () => {
    let asked: readonly [number, number] | null = null;
    setPointOf(border([[2, 0.3], [4, 0.3], [4, 0.9], [2, 0.9]]), band, (at) => ((asked = at), null)); // prettier-ignore
    expect(asked).toEqual([close(3), close(0.6)]);
  });

  test("no border, no set point", () => expect(setPointOf([], band, couple)).toBeNull());
});

describe("a mixed potential: pH alone counts", () => {
  test("the widest chord, in the middle of the Eh it holds over", () =>
    expect(setPointOf(border([[2, 0.3], [4, 0.3], [4, 0.9], [2, 0.9]]), band, none)).toEqual({
      pH: close(3),
      Eh: close(0.6),
      margin: close(5),
      mixedPotential: true,
      EhRange: [close(0.3), close(0.9)],
      cutByFrame: false,
    })); // prettier-ignore

  test("a wide base: one band above it", () => {
    const at = setPointOf(border([[2, 0], [6, 0], [4, 0.8]]), band, none)!; // prettier-ignore
    expect(at).toMatchObject({ pH: close(4), Eh: close(0.05), margin: close((4 * (1 - 0.05 / 0.8)) / 2 / 0.2), EhRange: [close(0), close(0.8)] }); // prettier-ignore
  });

  test("less than two bands of Eh: their middle", () => {
    const at = setPointOf(border([[2, 0], [6, 0], [6, 0.08], [2, 0.08]]), band, none)!; // prettier-ignore
    expect(at).toMatchObject({ pH: close(4), Eh: close(0.04), margin: close(10) });
  });

  test("cut by the frame when a side of it ends the chord", () => {
    const at = (sides: number[]) => setPointOf(border([[2, 0.3], [4, 0.3], [4, 0.9], [2, 0.9]], sides), band, none)!.cutByFrame; // prettier-ignore
    expect([at([1]), at([3]), at([0]), at([2])]).toEqual([true, true, false, false]);
  });
});

describe("the widest chord", () => {
  test.each([
    ["a rectangle: its centre", loop([[0, 0], [6, 0], [6, 4], [0, 4]]), 3, 2, 3],
    ["a triangle: its base", loop([[0, 0], [8, 0], [2, 4]]), 4, 0, 4],
    ["a hexagon: its waist", loop([[2, 0], [6, 0], [8, 3], [6, 5], [2, 5], [0, 3]]), 4, 3, 4],
    ["two rooms alike: the lower u", loop([[0, 0], [4, 0], [4, 5], [6, 5], [6, 0], [10, 0], [10, 6], [9, 6], [9, 7], [1, 7], [1, 6], [0, 6]]), 5, 5.5, 5],
    ["the longer of two stretches alike", loop([[0, 0], [4, 0], [4, 2], [3, 2], [3, 3], [4, 3], [4, 8], [0, 8], [0, 3], [1, 3], [1, 2], [0, 2]]), 2, 5.5, 2],
  ] as const)("%s", (_, border, u, v, margin) =>
    expect(widestChord([...border])).toEqual({ u: close(u), v: close(v), margin: close(margin) })); // prettier-ignore

  test("nothing for nothing", () => expect(widestChord([])).toBeNull());

  test("stretches along Eh at one pH, low to high", () => {
    const u = loop([[0, 0], [5, 0], [5, 5], [0, 5], [0, 4], [4, 4], [4, 1], [0, 1]]); // prettier-ignore
    expect(chordAt(u, 2)).toEqual([[0, 1], [4, 5]]); // prettier-ignore
    expect(chordAt(u, 4.5)).toEqual([[0, 5]]);
    expect(chordAt(u, 6)).toEqual([]);
  });
});
