import { expect, test } from "vitest";
import { planChanges } from "../../src/lib/planChanges";
import type { PlanInputs } from "../../shared/schemas/plan";

const inputs: PlanInputs = {
  temperatureC: 25,
  preset: "sulfate",
  metals: [
    {
      element: "Zn",
      role: "target",
      requirement: "dissolved",
      entry: "activity",
      value: 0.08,
      gammaFrom: "one",
      gamma: null,
    },
    {
      element: "Fe",
      role: "gangue",
      requirement: "solid",
      entry: "activity",
      value: 1e-5,
      gammaFrom: "one",
      gamma: null,
    },
  ],
  ligands: [{ component: "S", activity: 0.5 }],
  others: [],
  ionicStrength: null,
  sulfateReduction: false,
  solidsBasis: "aged",
  feedMinerals: [],
  dosed: [],
  leftOut: [],
  putBack: [],
  frame: { pH: [1, 8], Eh: [-0.2, 1.2] },
  water: { bound: "both" },
  controlBand: { pH: 0.15, Eh: 0.03 },
};

test("equal inputs have no changes", () => {
  expect(planChanges(inputs, structuredClone(inputs))).toEqual([]);
});

test("says what changed, from what, to what, in the order of the panels", () => {
  const [zinc, iron] = inputs.metals as [PlanInputs["metals"][0], PlanInputs["metals"][0]];
  const after: PlanInputs = {
    ...inputs,
    temperatureC: 60,
    solidsBasis: "fresh",
    metals: [
      { ...zinc, entry: "gPerL", value: 120 },
      { ...iron, element: "Cu", role: "watched", requirement: "free", value: 1e-3 },
    ],
    ligands: [],
    frame: { pH: [1, 7], Eh: [-0.2, 1.2] },
    leftOut: [{ species: "ZnO(s)", reason: "slow" }],
  };
  expect(planChanges(inputs, after)).toEqual([
    { what: "Zn", from: "target, dissolved, carry 0.080", to: "target, dissolved, carry 120\u2009g/L" },
    { what: "Fe", from: "gangue, solid, at most 1.0e\u22125", to: null },
    { what: "Cu", from: null, to: "watched, free, at 1.0e\u22123" },
    { what: "S, total", from: "0.500\u2009mol/L", to: null },
    { what: "Temperature", from: "25.0\u2009°C", to: "60.0\u2009°C" },
    { what: "Solids basis", from: "aged, most stable", to: "fresh, form in hours" },
    { what: "Left out: ZnO(s)", from: null, to: "slow" },
    {
      what: "Frame",
      from: "pH 1.0 to 8.0, Eh \u22120.20 to 1.20 V vs SHE",
      to: "pH 1.0 to 7.0, Eh \u22120.20 to 1.20 V vs SHE",
    },
  ]);
});

test("every field of the inputs is looked at", () => {
  const other: PlanInputs = {
    temperatureC: 60,
    preset: "chloride",
    metals: [],
    ligands: [{ component: "Cl", activity: 3 }],
    others: [{ component: "K", activity: 0.1 }],
    ionicStrength: 0.3,
    sulfateReduction: true,
    solidsBasis: "feed",
    feedMinerals: ["ZnO(s)"],
    dosed: ["peroxide"],
    leftOut: [{ species: "ZnO(s)", reason: "slow" }],
    putBack: ["FeOOH(s,goethite)"],
    frame: { pH: [0, 7], Eh: [-1, 1] },
    water: { bound: "upper", oxygenV: 0.4 },
    controlBand: { pH: 0.2, Eh: 0.04 },
  };
  for (const key of Object.keys(inputs) as (keyof PlanInputs)[]) {
    const changed = { ...inputs, [key]: other[key] };
    expect(planChanges(inputs, changed), key).not.toEqual([]);
  }
});

test("a change that rounding would hide is told in full", () => {
  const [zinc, iron] = inputs.metals as [PlanInputs["metals"][0], PlanInputs["metals"][0]];
  const after: PlanInputs = {
    ...inputs,
    temperatureC: 25.04,
    metals: [{ ...zinc, value: 0.0801 }, iron],
    ligands: [{ component: "S", activity: 0.50004 }],
    heldSetPoint: { pH: 5.101, Eh: 0.7104 },
  };
  const before: PlanInputs = { ...inputs, heldSetPoint: { pH: 5.1, Eh: 0.7101 } };
  const said = planChanges(before, after).map(({ what, from, to }) => [what, from, to].join(" | "));
  expect(said.map((line) => line.replaceAll("\u2009", " "))).toEqual([
    "Zn | target, dissolved, carry 0.08 | target, dissolved, carry 0.0801",
    "S, total | 0.5 mol/L | 0.50004 mol/L",
    "Temperature | 25 °C | 25.04 °C",
    "Set point | pH 5.1, 0.7101 V vs SHE, by hand | pH 5.101, 0.7104 V vs SHE, by hand",
  ]);
});
