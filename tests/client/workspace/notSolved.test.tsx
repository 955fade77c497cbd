import "../setup";
import { fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { expect, test } from "vitest";
import { toProblem } from "../../../shared/plan/toProblem";
import type { PlanInputs } from "../../../shared/schemas/plan";
import { solve } from "../../../shared/solve";
import { AskingContext } from "../../../src/features/workspace/asks/context";
import NotSolved from "../../../src/features/workspace/asks/NotSolved";
import { newPlanInputs } from "../../../src/lib/newPlan";
import { potentialScale } from "../../../src/lib/potential";
import { library } from "../../support/solver";

const leach = newPlanInputs({ step: "leach", preset: "sulfate", target: "Cu", other: "Fe", temperatureC: 25 }, library);
let now: PlanInputs;
function Stage({ from, readOnly = false }: { from: PlanInputs; readOnly?: boolean }) {
  const [inputs, setInputs] = useState(from);
  now = inputs;
  const outcome = solve(toProblem(inputs, library), library);
  const asking = {
    ...{ inputs, data: library, solution: null, setPoint: null, scale: potentialScale("V"), readOnly, focus: null },
    edit: (change: (p: PlanInputs) => PlanInputs) => setInputs(change),
    settle: () => {},
    failure: outcome.ok ? null : outcome.error,
    onFocus: () => {},
  };
  return (
    <AskingContext value={asking}>
      <NotSolved />
    </AskingContext>
  );
}

test("a sulfide mineral without sulfide says what is missing, and one press gives it and nothing else", () => {
  const from = { ...leach, feedMinerals: ["CuFeS2(s)", "CuS(s)"] };
  render(<Stage from={from} />);
  const said = screen.getByRole("alert").textContent;
  expect(said).toContain("A total is missing.");
  expect(said).toMatch(/CuFeS2.* \(chalcopyrite\) and CuS.* \(covellite\) hold sulfide, .*sulfate does not count/);
  fireEvent.click(screen.getByRole("button", { name: "Give sulfide 0.01 mol/L" }));
  expect(screen.queryByRole("alert")).toBeNull();
  expect(now).toEqual({ ...from, ligands: [...from.ligands, { component: "S(sulfide)", activity: 0.01 }] });
});

test("a reader is told and offered nothing; any other refusal keeps its sentence and its place", () => {
  render(<Stage from={{ ...leach, feedMinerals: ["CuS(s)"] }} readOnly />);
  expect(screen.getByRole("alert").textContent).toContain("holds sulfide");
  expect(screen.queryByRole("button")).toBeNull();
  render(<Stage from={{ ...leach, leftOut: [{ species: "XyZ", reason: "no such thing" }] }} />);
  expect(screen.getAllByRole("alert")[1]!.textContent).toMatch(/XyZ.*At leftOut\./);
});
