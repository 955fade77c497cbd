import { describe, expect, test } from "vitest";
import { history, type HistoryAction, sameInputs, startHistory } from "../../../src/features/workspace/model/history";
import type { PlanInputs } from "../../../shared/schemas/plan";
import { unusualInputs } from "../../support/planInputs";

const at = (temperatureC: number) => ({ ...unusualInputs, temperatureC });
const change = (t: number, time: number, about?: string): HistoryAction<PlanInputs> => ({
  type: "change",
  to: at(t),
  at: time,
  ...(about === undefined ? {} : { about }),
});
const run = (...actions: HistoryAction<PlanInputs>[]) => actions.reduce(history, startHistory(at(20)));

describe("undo and redo over all inputs", () => {
  test("one drag is one step", () => {
    const state = run(change(21, 0, "T"), change(25, 16, "T"), change(40, 32, "T"));
    expect(state.past).toHaveLength(1);
    expect(history(state, { type: "undo" }).present.temperatureC).toBe(20);
  });
  test("a pause, another control or letting go starts a new step", () => {
    expect(run(change(21, 0, "T"), change(25, 5000, "T")).past).toHaveLength(2);
    expect(run(change(21, 0, "T"), change(25, 10, "Zn")).past).toHaveLength(2);
    expect(run(change(21, 0, "T"), { type: "settle" }, change(25, 10, "T")).past).toHaveLength(2);
  });
  test("changes of no gesture are steps of their own", () =>
    expect(run(change(21, 0), change(25, 1)).past).toHaveLength(2));
  test("redo brings back what undo took, and a new change forgets it", () => {
    const undone = run(change(30, 0), change(40, 1), { type: "undo" });
    expect(history(undone, { type: "redo" }).present.temperatureC).toBe(40);
    expect(history(history(undone, change(50, 2)), { type: "redo" }).present.temperatureC).toBe(50);
  });
  test("at either end nothing happens", () => {
    const start = startHistory(at(20));
    expect(history(start, { type: "undo" })).toBe(start);
    expect(history(start, { type: "redo" })).toBe(start);
  });
});

test("inputs are the same whatever the order of their keys, and not when a number differs", () => {
  const turned = Object.fromEntries(Object.entries(unusualInputs).reverse()) as unknown as typeof unusualInputs;
  expect(sameInputs(unusualInputs, turned)).toBe(true);
  expect(sameInputs(unusualInputs, at(99))).toBe(false);
  expect(sameInputs(unusualInputs, { ...unusualInputs, metals: [...unusualInputs.metals].reverse() })).toBe(false);
});

test("what holds of every state is changed in those undone as well", () => {
  const state = run(change(30, 0), change(40, 1), { type: "undo" });
  const next = history(state, { type: "every", change: (p) => ({ ...p, solidsBasis: "feed" as const }) });
  expect(next.present).toMatchObject({ temperatureC: 30, solidsBasis: "feed" });
  expect(history(next, { type: "redo" }).present).toMatchObject({ temperatureC: 40, solidsBasis: "feed" });
  expect(history(next, { type: "undo" }).present).toMatchObject({ temperatureC: 20, solidsBasis: "feed" });
});
