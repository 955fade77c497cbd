import { describe, expect, test } from "vitest";
import { toProblem } from "../../../shared/plan/toProblem";
import { planInputs } from "../../../shared/schemas/plan";
import {
  applyOpening,
  holdSetPoint,
  setActivityRange,
  setTemperatureRange,
} from "../../../src/features/workspace/model/adviceEdit";
import { rangesOf } from "../../../shared/plan/rangesOf";
import { planChanges } from "../../../src/lib/planChanges";
import { unusualInputs as inputs } from "../../support/planInputs";
import { library } from "../../support/solver";

describe("a proposal applied to the plan", () => {
  test("changes one number and nothing else", () => {
    const element = inputs.metals[0]!.element;
    const next = applyOpening({ change: "activity", of: element, from: 1, to: 0.002, searched: "" })(inputs);
    expect(next.metals[0]!.value).toBe(0.002);
    expect({ ...next, metals: inputs.metals }).toEqual(inputs);
    expect(next.metals.slice(1)).toEqual(inputs.metals.slice(1));
  });

  test("sets temperature, ligand and basis, and leaves the plan alone where none helps", () => {
    const base = { from: 0, searched: "" };
    expect(applyOpening({ ...base, change: "temperature", to: 71.5 })(inputs).temperatureC).toBe(71.5);
    expect(applyOpening({ ...base, change: "solidsBasis", to: "aged" })(inputs).solidsBasis).toBe("aged");
    const [ligand] = inputs.ligands;
    if (ligand)
      expect(
        applyOpening({ ...base, change: "ligand", of: ligand.component, to: 0.7 })(inputs).ligands[0]!.activity,
      ).toBe(0.7);
    expect(applyOpening({ ...base, change: "temperature", to: null })(inputs)).toBe(inputs);
  });
});

describe("ranges and a held set point", () => {
  test("come and go without a trace, and pass the schema", () => {
    const held = setActivityRange("Zn", [0.05, 0.1])(setTemperatureRange([55, 75])(inputs));
    expect(planInputs.parse(held)).toEqual(held);
    expect(held.ranges).toEqual({ temperatureC: [55, 75], activities: { Zn: [0.05, 0.1] } });
    const back = setActivityRange("Zn", null)(setTemperatureRange(null)(held));
    expect(back).toEqual(inputs);
    expect("ranges" in back).toBe(false);
  });

  test("are refused when they fall or leave the supported temperatures", () => {
    const bad = (ranges: object) => planInputs.safeParse({ ...inputs, ranges }).success;
    expect(bad({ temperatureC: [75, 55] })).toBe(false);
    expect(bad({ temperatureC: [55, 300] })).toBe(false);
    expect(bad({ activities: { Zn: [0, 1] } })).toBe(false);
  });

  test("are no part of the solver's question", () => {
    const more = holdSetPoint([5.1, 0.4])(setTemperatureRange([55, 75])(inputs));
    expect(toProblem(more, library)).toEqual(toProblem(inputs, library));
  });

  test("of metals the plan has lost are not asked about", () => {
    expect(rangesOf({ activities: { Ag: [1, 2] } }, ["Zn"])).toBeNull();
    expect(rangesOf({ temperatureC: [20, 30], activities: { Ag: [1, 2], Zn: [1, 2] } }, ["Zn"])).toEqual({
      temperatureC: [20, 30],
      activities: { Zn: [1, 2] },
    });
    expect(rangesOf(undefined, ["Zn"])).toBeNull();
  });

  test("a set point stays in the frame, and goes away again", () => {
    const held = holdSetPoint([99, -99])(inputs);
    expect(held.heldSetPoint).toEqual({ pH: inputs.frame.pH[1], Eh: inputs.frame.Eh[0] });
    expect(holdSetPoint([99, -99])(held)).toBe(held);
    expect(holdSetPoint(null)(held)).toEqual(inputs);
    expect(holdSetPoint(null)(inputs)).toBe(inputs);
  });

  test("a revision's list of changes tells of both", () => {
    const next = holdSetPoint([5.1, 0.4])(setTemperatureRange([55, 75])(inputs));
    expect(planChanges(inputs, next).map((c) => c.what)).toEqual(["Hold over", "Set point"]);
  });
});
