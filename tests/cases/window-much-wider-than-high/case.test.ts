import { expect, test } from "vitest";
import { deepestPoint } from "../../../shared/setpoint/deepestPoint";
import { loop } from "../../support/border";

// The first squares of the search were as wide as an eighth of the longer side; where that was more than the height, the
// search began with none, found nothing, and the solver broke.
test("a notched strip a hundred times wider than high has its deepest point", () => {
  const strip = loop([[0, 0], [100, 0], [100, 1], [60, 1], [60, 0.9], [40, 0.9], [40, 1], [0, 1]]); // prettier-ignore
  expect(deepestPoint(strip)).toMatchObject({
    margin: expect.closeTo(0.5, 6) as number,
    v: expect.closeTo(0.5, 6) as number,
  });
});
