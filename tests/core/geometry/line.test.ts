import { describe, expect, test } from "vitest";
import { orderAlong, sameLine, sideOfCrossing, turn, type Line } from "../../../shared/geometry/line";
import { seeded, type Random } from "../../support/random";

/** Signs from whole numbers without end: what the predicates must say. */
type Big = readonly [bigint, bigint, bigint];
const big = (l: Line): Big => [BigInt(l[0]), BigInt(l[1]), BigInt(l[2])];
const sign = (n: bigint): number => (n > 0n ? 1 : n < 0n ? -1 : 0);
const det2 = (a: Big, b: Big): bigint => a[1] * b[2] - a[2] * b[1];
const det3 = (a: Big, b: Big, c: Big): bigint =>
  a[0] * (b[1] * c[2] - b[2] * c[1]) - a[1] * (b[0] * c[2] - b[2] * c[0]) + a[2] * (b[0] * c[1] - b[1] * c[0]);

/** p at the crossing of q and r: k + x pH + y E with pH, E by Cramer's rule. */
const trueSide = (p: Line, q: Line, r: Line): number => sign(det3(big(p), big(q), big(r))) * sign(det2(big(q), big(r)));

/** Lines of the sizes that formations of large species have, nearly through one point: k off by a few grid steps. */
function nearlyConcurrent(random: Random): [Line, Line, Line] {
  const [P, F] = [5_845_000 + random.whole(0, 999), 98_801_000 + random.whole(0, 999)];
  const line = (): Line => {
    const [x, y] = [random.whole(-14, 14) * P, random.whole(-14, 14) * F];
    return [random.whole(-3, 3) - 7 * x - random.whole(-1, 1) * y, x, y];
  };
  return [line(), line(), line()];
}

describe("signs are true to the last step of the grid", () => {
  test("of a line at the crossing of two others", () => {
    const random = seeded(1);
    const seen = [0, 0, 0];
    for (let i = 0; i < 20_000; i++) {
      const [p, q, r] = nearlyConcurrent(random);
      const expected = trueSide(p, q, r) + 0;
      seen[expected + 1]!++;
      if (sideOfCrossing(p, q, r) + 0 !== expected)
        expect([p, q, r, sideOfCrossing(p, q, r)]).toEqual([p, q, r, expected]);
      if (turn(q, r) + 0 !== sign(det2(big(q), big(r)))) expect([q, r]).toBe("turn");
    }
    for (const n of seen) expect(n).toBeGreaterThan(200); // all three signs occur
  });

  test("of the order of two crossings along a line", () => {
    const random = seeded(2);
    for (let i = 0; i < 10_000; i++) {
      const [on, p, q] = nearlyConcurrent(random);
      if (turn(on, p) === 0 || turn(on, q) === 0) continue;
      // place along (y, -x) of the crossing with p: (k_p y_on ... ) / det, compared as fractions
      const place = (l: Line): [bigint, bigint] => {
        const [a, b] = [big(on), big(l)];
        const d = det2(a, b);
        const X = a[2] * b[0] - b[2] * a[0];
        const Y = b[1] * a[0] - a[1] * b[0];
        return [X * a[2] - Y * a[1], d];
      };
      const [[n1, d1], [n2, d2]] = [place(p), place(q)];
      const expected = sign(n1 * d2 - n2 * d1) * sign(d1) * sign(d2);
      if (orderAlong(on, p, q) + 0 !== expected + 0)
        expect([on, p, q, orderAlong(on, p, q)]).toEqual([on, p, q, expected]);
    }
  });

  test("of two lines that are one", () => {
    const line: Line = [-40_003_071, 5_845_123, 98_801_337];
    expect(sameLine(line, [3 * line[0], 3 * line[1], 3 * line[2]])).toBe(true);
    expect(sameLine(line, [-line[0], -line[1], -line[2]])).toBe(true);
    expect(sameLine(line, [3 * line[0] + 1, 3 * line[1], 3 * line[2]])).toBe(false);
    expect(sameLine(line, [line[0], line[1] + 1, line[2]])).toBe(false);
  });
});
