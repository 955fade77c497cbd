import fc from "fast-check";
import { expect, test } from "vitest";
import { monotoneCubic } from "../../../shared/gibbs/monotone";
import { quadrature } from "../../support/quadrature";

const nodes = fc
  .array(fc.tuple(fc.double({ min: 0.1, max: 50, noNaN: true }), fc.double({ min: -100, max: 100, noNaN: true })), {
    minLength: 2,
    maxLength: 8,
  })
  .map((steps) => {
    let x = 0;
    return { x: steps.map(([dx]) => (x += dx)), y: steps.map(([, y]) => y) };
  });

test("the curve goes through its nodes, and its integral is that of the curve", () =>
  fc.assert(
    fc.property(nodes, fc.double({ min: -0.2, max: 1.2, noNaN: true }), ({ x, y }, share) => {
      const curve = monotoneCubic(x, y);
      x.forEach((at, k) => expect(curve.at(at)).toBeCloseTo(y[k] ?? Number.NaN, 9));
      const [from = 0, to = 0] = [x[0], x.at(-1)];
      const end = from + share * (to - from);
      const breaks = [from, ...x.filter((at) => at > from && at < end), end];
      const slow = breaks.slice(1).reduce((sum, b, k) => sum + quadrature((v) => curve.at(v), breaks[k] ?? 0, b), 0);
      expect(curve.integral(end)).toBeCloseTo(slow, 6);
    }),
    { seed: 30 },
  ));

test("between two nodes the curve never leaves their band", () =>
  fc.assert(
    fc.property(nodes, fc.double({ min: 0, max: 1, noNaN: true }), ({ x, y }, t) => {
      const curve = monotoneCubic(x, y);
      for (let k = 0; k + 1 < x.length; k += 1) {
        const [x0 = 0, x1 = 0, y0 = 0, y1 = 0] = [x[k], x[k + 1], y[k], y[k + 1]];
        const value = curve.at(x0 + t * (x1 - x0));
        expect(value).toBeGreaterThanOrEqual(Math.min(y0, y1) - 1e-9);
        expect(value).toBeLessThanOrEqual(Math.max(y0, y1) + 1e-9);
      }
    }),
    { seed: 31 },
  ));

test("value and slope are continuous at the nodes", () => {
  const curve = monotoneCubic([0, 1, 3, 4], [0, 2, 2.5, 7]);
  for (const at of [1, 3]) {
    const h = 1e-6;
    expect((curve.at(at + h) - curve.at(at)) / h).toBeCloseTo((curve.at(at) - curve.at(at - h)) / h, 4);
  }
});
