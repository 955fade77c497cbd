import { expect, test } from "vitest";
import { adviceFor } from "../../../shared/advice/openings";
import { tidied } from "../../../shared/advice/tidy";
import { valueOf } from "../../../shared/outcome";
import type { Problem } from "../../../shared/schemas/problem";
import { solve } from "../../../shared/solve";
import { band, library } from "../../support/solver";

const shut: Problem = {
  temperatureC: 25,
  metals: [
    { element: "Ni", requirement: "dissolved", activity: 1 },
    { element: "Cu", requirement: "compound", activity: 1e-9 },
  ],
  ligands: [{ component: "S", activity: 0.5 }],
  solidsBasis: "fresh",
  frame: { pH: [0, 12], Eh: [-1, 1.4] },
  controlBand: band,
};
const openings = valueOf(adviceFor(shut, library)).openings;

test("a tidied proposal has three figures, lies beyond the root, and still opens a window", () => {
  const helpful = openings.filter((o) => o.problem !== undefined && typeof o.to === "number");
  expect(helpful.length).toBeGreaterThan(0);
  for (const before of helpful) {
    const after = tidied(before, library);
    const [from, root, to] = [before.from, before.to, after.to].map(Number) as [number, number, number];
    expect(Math.sign(to - root) * Math.sign(root - from)).toBeGreaterThanOrEqual(0);
    expect(Math.abs(Math.log(to / root))).toBeLessThan(0.011);
    if (before.change !== "temperature") expect(to).toBe(Number(to.toPrecision(3)));
    expect(valueOf(solve(after.problem, library)).windows.length).toBeGreaterThan(0);
  }
});

test("what opens nothing stays as it is", () => {
  const none = { change: "temperature", from: 25, to: null, searched: "0 to 250 C" } as const;
  expect(tidied(none, library)).toBe(none);
});
