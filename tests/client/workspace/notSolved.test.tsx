import { fireEvent, screen } from "@testing-library/react";
import { expect, test } from "vitest";
import { toProblem } from "../../../shared/plan/toProblem";
import type { PlanInputs } from "../../../shared/schemas/plan";
import { solve } from "../../../shared/solve";
import NotSolved from "../../../src/features/workspace/asks/NotSolved";
import { newPlanInputs } from "../../../src/lib/newPlan";
import { library } from "../../support/solver";
import { renderAsking } from "./askingStage";

const leach = newPlanInputs({ step: "leach", preset: "sulfate", target: "Cu", other: "Fe", temperatureC: 25 }, library);
const failureOf = (inputs: PlanInputs) => {
  const outcome = solve(toProblem(inputs, library), library);
  return outcome.ok ? null : outcome.error;
};

test("a sulfide mineral without sulfide says what is missing, and one press gives it and nothing else", () => {
  const from = { ...leach, feedMinerals: ["CuFeS2(s)", "CuS(s)"] };
  const now = renderAsking(<NotSolved />, { from, failureOf });
  const said = screen.getByRole("alert").textContent;
  expect(said).toContain("A total is missing.");
  expect(said).toMatch(/CuFeS2.* \(chalcopyrite\) and CuS.* \(covellite\) hold sulfide, .*sulfate does not count/);
  fireEvent.click(screen.getByRole("button", { name: "Give sulfide 0.01 mol/L" }));
  expect(screen.queryByRole("alert")).toBeNull();
  expect(now()).toEqual({ ...from, ligands: [...from.ligands, { component: "S(sulfide)", activity: 0.01 }] });
});

test("a reader is told and offered nothing; any other refusal keeps its sentence and its place", () => {
  renderAsking(<NotSolved />, { from: { ...leach, feedMinerals: ["CuS(s)"] }, readOnly: true, failureOf });
  expect(screen.getByRole("alert").textContent).toContain("holds sulfide");
  expect(screen.queryByRole("button")).toBeNull();
  renderAsking(<NotSolved />, {
    from: { ...leach, leftOut: [{ species: "XyZ", reason: "no such thing" }] },
    failureOf,
  });
  expect(screen.getAllByRole("alert")[1]!.textContent).toMatch(/XyZ.*At leftOut\./);
});
