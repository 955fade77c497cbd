import { expect, test } from "vitest";
import { marginSides } from "../../../src/features/workspace/model/distances";

const band = { pH: 0.15, Eh: 0.03 };

test("a margin below zero is that of a point placed outside the window, and is said so", () => {
  expect(marginSides({ margin: 2, mixedPotential: false }, band)).toMatch(/^0\.30.pH and 60.mV to either side$/);
  expect(marginSides({ margin: -2, mixedPotential: false }, band)).toMatch(/^0\.30.pH and 60.mV outside the window$/);
  expect(marginSides({ margin: -2, mixedPotential: true }, band)).toMatch(/^0\.30.pH outside the window$/);
});
