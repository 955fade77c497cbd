import { describe, expect, test } from "vitest";
import { analyse } from "../../../shared/analysis";
import { valueOf } from "../../../shared/outcome";
import type { Problem } from "../../../shared/schemas/problem";
import { coupleAt } from "../../../shared/setpoint/couple";
import { library, solved } from "../../support/solver";
import { presetChoice } from "../../support/presets";

const iron = (activity: number, change: Partial<Problem> = {}): Problem => ({
  temperatureC: 25,
  metals: [{ element: "Fe", requirement: "dissolved", activity }],
  ligands: [],
  frame: { pH: [-1, 3], Eh: [0.2, 1.2] },
  controlBand: { pH: 0.15, Eh: 0.03 },
  ...change,
});

function couple(problem: Problem, at: [number, number]): [string, string] | null {
  const { prepared, cells, metals, basis } = valueOf(analyse(problem, library));
  return coupleAt(prepared.data, cells, metals, basis, at);
}

describe("a couple sets Eh where both of its forms are above 10 mg/L", () => {
  // 0.1 mol/L of iron is 5585 mg/L: the scarcer form is 10 mg/L where log10 of the ratio is 2.747, 0.1625 V from E0
  const E0 = 0.771;
  const reach = 0.05916 * Math.log10((0.1 * 55845) / 10);

  test.each([
    ["above", 1],
    ["below", -1],
  ] as const)("%s E0, to the millivolt", (_, side) => {
    // prettier-ignore
    expect(couple(iron(0.1), [0, E0 + side * (reach - 0.003)])).toEqual(["Fe^2+(aq)", "Fe^3+(aq)"]);
    expect(couple(iron(0.1), [0, E0 + side * (reach + 0.003)])).toBeNull();
  });

  test("a poor liquor has none anywhere", () => {
    for (let E = 0.5; E < 1; E += 0.01) expect(couple(iron(1e-4), [0, E])).toBeNull();
  });

  test("the forms named are the richest of their oxidation states", () => {
    const { ligands, leftOut } = presetChoice("sulfate", { S: 1 });
    expect(couple(iron(0.1, { ligands, leftOut }), [1, 0.7])).toEqual(["FeSO4(aq)", "Fe(SO4)2^-(aq)"]);
  });

  test("of two metals the one whose scarcer form is the richer", () => {
    const both: Problem = {
      ...iron(0.1),
      metals: [...iron(0.1).metals, { element: "V", requirement: "free", activity: 1e-3 }],
    };
    expect(couple(both, [0, 0.77])).toEqual(["Fe^2+(aq)", "Fe^3+(aq)"]);
  });

  test("outside the frame there is none", () => expect(couple(iron(0.1), [9, 0.77])).toBeNull());
});

test("a window round E0 has a couple and a box, one far below it a mixed potential and a range", () => {
  const near = solved(iron(0.1, { frame: { pH: [-1, 1], Eh: [0.65, 0.9] } })).setPoint!;
  expect(near).toMatchObject({ mixedPotential: false, couple: ["Fe^2+(aq)", "Fe^3+(aq)"], cutByFrame: true });
  expect(near.EhRange).toBeUndefined();
  const far = solved(iron(0.1, { frame: { pH: [-1, 1], Eh: [0, 0.3] } })).setPoint!;
  expect(far).toMatchObject({ mixedPotential: true, cutByFrame: true });
  expect(far.couple).toBeUndefined();
  expect(far.EhRange![1]).toBeCloseTo(0.3, 9);
});
