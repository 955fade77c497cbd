import { expect, test } from "vitest";
import { deepestPoint } from "../../../shared/setpoint/deepestPoint";
import { insideOf } from "../../../shared/setpoint/segments";
import { loop } from "../../support/border";

// The middle of one of the first squares lay on the border; the climb from there went out into the open and found a "margin"
// far outside. Corners from a square cut by four lines of small whole numbers.
test("the search never leaves the region", () => {
  const [w, h] = [16.33177211997267, 13.331826547053023];
  const border = loop([
    [0, -h], [9.186621817484626, -5.832674114335697], [w, -7.776898819114264], [w, 0], [w, h], [-14.290300604976085, h],
    [-w, h], [-w, 1.1109855455877518], [-w, 0], [-14.290300604976085, -3.3329566367632557], [-14.290300604976085, -h],
    [-8.165886059986335, -h], [-5.44392403999089, -h],
  ]); // prettier-ignore
  const deepest = deepestPoint(border)!;
  expect(insideOf(border, deepest.u, deepest.v)).toBe(true);
  expect(deepest.margin).toBeLessThan(h);
});
