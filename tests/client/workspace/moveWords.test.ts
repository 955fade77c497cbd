import { expect, test } from "vitest";
import { moveWords } from "../../../src/features/workspace/model/moveWords";

const naming = { metalName: () => "iron", componentName: () => "sulfate" };
const moves = [
  { by: { kind: "metal", component: "Fe", factor: 0.1 }, pH: 1 / 3, Eh: 0.0661 },
  { by: { kind: "ligand", component: "S", factor: 0.1 }, pH: -0.667, Eh: null },
  { by: { kind: "ligand", component: "CN", factor: 0.1 }, pH: 0.0001, Eh: 0.00001 },
  { by: { kind: "temperature", kelvin: 10 }, pH: -0.0824, Eh: -0.017 },
] as const;
const words = (axis: "pH" | "Eh", side: "low pH" | "high pH" | "high Eh") =>
  moveWords({ axis, side }, moves, naming)?.replaceAll("\u202f", " ");

test("what moves a limit, how far and which way, and what that does to the window", () => {
  expect(words("pH", "low pH")).toBe(
    "Ten times less iron moves it 0.33 pH up and narrows the window; ten times less sulfate moves it 0.67 pH down and widens it; " +
      "+10 K moves it 0.08 pH down and widens it.",
  );
  expect(words("pH", "high pH")).toContain("0.33 pH up and widens the window");
});
test("along Eh in millivolts, only what has a move there", () => {
  expect(words("Eh", "high Eh")).toBe(
    "Ten times less iron moves it 66 mV up and widens the window; +10 K moves it 17 mV down and narrows it.",
  );
});
test("a limit that nothing moves has no words", () =>
  expect(moveWords({ axis: "pH", side: "low pH" }, [], naming)).toBeNull());
