import { describe, expect, test } from "vitest";
import { areaOf, clip, rectangle, type Convex } from "../../../shared/geometry/convex";
import type { Line } from "../../../shared/geometry/line";
import { connect } from "../../../shared/geometry/region";
import { signedArea } from "../../support/shapes";

const square = rectangle([-4, 4], [-4, 4], [-1, -2, -3, -4]);
const flip = (l: Line): Line => [-l[0], -l[1], -l[2]];

/** The square cut by lines through its centre, wedges in the order of their angle. */
function wedges(lines: readonly Line[]): Convex[] {
  const pieces = lines.reduce<Convex[]>(
    (all, l, i) => all.flatMap((p) => [clip(p, l, i), clip(p, flip(l), i)].filter((q) => q !== null)),
    [square],
  );
  const angle = (p: Convex): number => {
    const mean = (list: readonly number[]) => list.reduce((a, b) => a + b, 0) / list.length;
    return Math.atan2(mean(p.y), mean(p.x));
  };
  return pieces.sort((a, b) => angle(a) - angle(b));
}

describe("wedges round one point", () => {
  test.each([
    ["two lines", [[0, 1, 0], [0, 0, 1]]],
    ["three", [[0, 1, 0], [0, 1, -2], [0, 1, 2]]],
    ["four", [[0, 1, 0], [0, 0, 1], [0, 1, 1], [0, 1, -1]]],
    ["five", [[0, 1, 0], [0, 0, 1], [0, 1, 1], [0, 1, -1], [0, 1, 3]]],
  ] as [string, Line[]][])("any choice of those between %s: neighbours join, the point does not", (_, lines) => {
    const all = wedges(lines);
    const n = all.length;
    expect(n).toBe(2 * lines.length);
    for (let choice = 1; choice < 1 << n; choice++) {
      const kept = [...all.keys()].filter((i) => choice & (1 << i));
      const regions = connect(kept.map((i) => all[i]!));
      // runs of neighbours round the point; all of them together are one
      const runs = kept.filter((i) => !(choice & (1 << ((i + n - 1) % n)))).length;
      if (regions.length !== Math.max(1, runs)) expect([lines, kept, regions.length]).toEqual([lines, kept, runs]);
      for (const r of regions) {
        const area = r.pieces.reduce((sum, i) => sum + areaOf(all[kept[i]!]!), 0);
        const outline = signedArea(r.outer.map((s) => s.from));
        if (r.holes.length > 0 || Math.abs(outline - area) > 1e-9) expect([lines, kept, outline]).toEqual([lines, kept, area]);
      }
    }
  }); // prettier-ignore
});

test("no pieces, no regions", () => expect(connect([])).toEqual([]));
