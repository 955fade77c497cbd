import { expect, test } from "vitest";
import { deepestPoint } from "../../../shared/setpoint/deepestPoint";
import { loop } from "../../support/border";

// Between two redox limits of one slope the deepest set is a sloped stretch; the set point stood near one end of it.
test("a parallelogram has its set point in its centre", () => {
  const band = loop([[0, 0], [40, -20], [40, -14], [0, 6]]); // prettier-ignore
  // two walls v = -u / 2 and v = 6 - u / 2: a box of half-width m needs m (1 + 1 / 2) = 3
  expect(deepestPoint(band)).toMatchObject({
    u: expect.closeTo(20, 6) as number,
    v: expect.closeTo(-7, 6) as number,
    margin: expect.closeTo(2, 6) as number,
  });
});
