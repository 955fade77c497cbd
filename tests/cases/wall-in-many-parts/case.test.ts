import { expect, test } from "vitest";
import { deepestPoint } from "../../../shared/setpoint/deepestPoint";
import { cutUp, loop } from "../../support/border";

// A long window whose walls are shut by several species in turn: the middle of the deepest set was looked for between the
// ends of the wall's parts only, and the set point jumped from part to part.
test.each([1, 2, 5, 9])("a corridor with walls in %i parts has its set point in the middle", (n) => {
  const corridor = cutUp(loop([[4, 0], [7, 0], [7, 40], [4, 40]]), n); // prettier-ignore
  expect(deepestPoint(corridor)).toMatchObject({
    u: expect.closeTo(5.5, 6) as number,
    v: expect.closeTo(20, 6) as number,
    margin: expect.closeTo(1.5, 6) as number,
  });
});
