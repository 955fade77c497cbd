import { expect, test } from "vitest";
import { holdSetPoint } from "../../../src/features/workspace/model/adviceEdit";
import * as edits from "../../../src/features/workspace/model/edit";
import type { Edit } from "../../../src/features/workspace/model/edit";
import { history, startHistory } from "../../../src/features/workspace/model/history";
import { planChanges } from "../../../src/lib/planChanges";
import type { PlanInputs } from "../../../shared/schemas/plan";
import { chemistry } from "../../support/chemistry";
import { sheetInputs } from "../../support/sheetFixture";

/** Nothing in it can be written to. */
function frozen<Value>(value: Value): Value {
  if (typeof value === "object" && value !== null) Object.values(Object.freeze(value)).forEach(frozen);
  return value;
}
const start = frozen(structuredClone(sheetInputs));
const set =
  (change: Partial<PlanInputs>): Edit =>
  (inputs) => ({ ...inputs, ...change });

const every: readonly (readonly [string, Edit])[] = [
  ["a metal's role", edits.setMetal(1, { role: "target" })],
  ["a metal's requirement", edits.setMetal(0, { requirement: "solid" })],
  ["a metal's amount", edits.setMetal(0, { entry: "activity", value: 0.2 })],
  ["a metal's gamma", edits.setMetal(0, { gammaFrom: "typed", gamma: 0.5 })],
  ["a metal added", edits.addMetal("Cd")],
  ["a metal taken out", edits.removeMetal(2)],
  ["another order of metals", edits.moveMetal(0, 1)],
  ["another lixiviant", edits.setPreset("ammonia", chemistry())],
  ["a total", edits.setTotal("ligands", "S", 0.9)],
  ["a total added", edits.addTotal("others", { component: "Na", activity: 0.1 })],
  ["a total taken out", edits.removeTotal("others", "K")],
  ["a species left out", edits.leaveOut("ZnO(s)", "not seen")],
  ["a species of the plan's list put back", edits.putBack("CuO(s)")],
  ["a species of the defaults put back", edits.putBack("FeOOH(s,goethite)")],
  ["a feed mineral", edits.toggleIn("feedMinerals", "CuO(s)")],
  ["a reagent no longer dosed", edits.toggleIn("dosed", "peroxide")],
  ["a set point by hand", holdSetPoint([5, 0.6])],
  ["temperature", set({ temperatureC: 71 })],
  ["solids basis", set({ solidsBasis: "aged" })],
  ["sulfate reduction", set({ sulfateReduction: true })],
  ["ionic strength", set({ ionicStrength: 0.3 })],
  ["the frame", set({ frame: { pH: [0, 9], Eh: [-0.5, 1] } })],
  ["water lines", set({ water: { bound: "upper", hydrogenV: 0.7 } })],
  ["control bands", set({ controlBand: { pH: 0.3, Eh: 0.05 } })],
  ["a total typed in another unit", edits.setTotalUnit("ligands", "S", "g/L")],
  ["a band of free acid", edits.setAcidBand({ gPerL: 5, atPH: 0.9 }, 0.0831)],
  ["a gas kept out", edits.keepOut({ gas: "H2S" })],
  ["a gas kept out by another pressure", edits.keepOut({ gas: "H2S", bar: 2e-5 })],
  ["around the leach", set({ circuit: { sxOrganic: true, oxygenKPa: 600, reagents: ["permanganate"] } })],
  ["ranges to hold over", set({ ranges: { temperatureC: [50, 70] } })],
];

test("every kind of edit is one step: undone it leaves no trace, redone it stands again, and nothing is written in place", () => {
  let state = startHistory(start);
  const states = [start];
  for (const [, edit] of every) {
    state = history(state, { type: "change", to: frozen(edit(state.present)), at: 0 });
    states.push(state.present);
  }
  for (const [i, [name]] of [...every.entries()].reverse()) {
    expect(state.present, name).toBe(states[i + 1]);
    state = history(state, { type: "undo" });
    expect(state.present, name).toBe(states[i]);
  }
  expect(state.present).toEqual(sheetInputs);
  expect(history(state, { type: "undo" })).toBe(state);
  for (const [i, [name]] of every.entries()) {
    state = history(state, { type: "redo" });
    expect(state.present, name).toBe(states[i + 1]);
  }
});

test.each(every)("%s is told in the difference of two revisions", (_, edit) => {
  expect(planChanges(start, edit(start)).length).toBeGreaterThan(0);
});

test("metals in another order are told as that, and nothing else", () => {
  expect(planChanges(start, edits.moveMetal(0, 1)(start))).toEqual([
    { what: "Order of metals", from: "Zn, Fe, Cu", to: "Fe, Zn, Cu" },
  ]);
  // One taken out leaves the others where they were.
  expect(planChanges(start, edits.removeMetal(0)(start)).map((c) => c.what)).toEqual(["Zn"]);
});
