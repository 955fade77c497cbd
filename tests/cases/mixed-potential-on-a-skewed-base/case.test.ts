import { expect, test } from "vitest";
import { setPointOf } from "../../../shared/setpoint/setPoint";
import { loop } from "../../support/border";

// One band up from a wide base the window lies to one side. pH stayed in the middle of the base, next to the wall or beyond.
test("pH stands in the middle of the chord at the Eh that was chosen", () => {
  const triangle = loop([[0, 0], [10, 0], [10, 8]]).map((s) => ({ ...s, frame: false })); // prettier-ignore
  const at = setPointOf(triangle, { pH: 1, Eh: 1 }, () => null)!;
  // chord of the base: 0 to 10, range there 0 to 4, one band up: Eh 1, chord 1.25 to 10
  expect(at).toMatchObject({ mixedPotential: true, pH: 5.625, Eh: 1, margin: 4.375, EhRange: [0, 4.5] });
});
