import { fireEvent, screen } from "@testing-library/react";
import { expect, test } from "vitest";
import { cautionsFor, hazardContext } from "../../../shared/hazards/rules";
import { reagents } from "../../../shared/reach/reagents";
import { planInputs, type PlanInputs } from "../../../shared/schemas/plan";
import { AroundSection } from "../../../src/features/workspace/asks/AroundSection";
import { setCircuit, toggleReagent } from "../../../src/features/workspace/model/circuitEdit";
import { sheetInputs } from "../../support/sheetFixture";
import { renderAsking } from "./askingStage";

const { dosed: _dosed, ...quiet } = sheetInputs;
const start: PlanInputs = { ...quiet, dosed: [] };
const codes = (inputs: PlanInputs) => cautionsFor(hazardContext(inputs, { pH: 2, Eh: 0.6 })).map((c) => c.code);

const open = async () => {
  const fold = document.querySelector("details")!;
  fold.open = true;
  fireEvent(fold, new Event("toggle"));
  // what is folded comes late, and a busy machine takes its time
  return screen.findByLabelText("Solvent extraction organic", {}, { timeout: 10_000 });
};

test("organic, oxygen and reagents named on the plan bring the cautions that ask about them, and go without a trace", async () => {
  const now = renderAsking(<AroundSection />, { from: start });
  expect(screen.getByText(/No reagent in use/)).toBeTruthy();
  const organic = await open();
  expect(codes(now())).toEqual([]);
  fireEvent.click(organic);
  fireEvent.click(screen.getByLabelText("KMnO4 is in use as oxidant"));
  expect(now().circuit).toEqual({ sxOrganic: true, reagents: ["permanganate"] });
  expect(codes(now())).toEqual(["ORGANIC"]);
  const oxygen = screen.getByLabelText("Oxygen partial pressure");
  fireEvent.change(oxygen, { target: { value: "650" } });
  fireEvent.keyDown(oxygen, { key: "Enter" });
  expect(codes(now())).toEqual(["ORGANIC", "OXYGEN"]);
  fireEvent.click(screen.getByLabelText("Zn dust is in use as cementing metal"));
  expect(codes(now())).toEqual(["ARSINE", "HYDROGEN", "ORGANIC", "OXYGEN"]);
  expect(document.querySelector("summary")!.textContent).toBe(
    "KMnO4, Zn dust in use; extraction organic met; oxygen at 650\u2009kPa",
  );
  expect(planInputs.parse(now())).toEqual(now());

  fireEvent.click(organic);
  fireEvent.click(screen.getByLabelText("KMnO4 is in use as oxidant"));
  fireEvent.click(screen.getByLabelText("Zn dust is in use as cementing metal"));
  fireEvent.change(oxygen, { target: { value: "" } });
  fireEvent.keyDown(oxygen, { key: "Enter" });
  expect(now()).not.toHaveProperty("circuit");
  expect(codes(now())).toEqual([]);
});

test("an oxygen pressure that cannot be is refused where it stands, and nothing is lost", async () => {
  const now = renderAsking(<AroundSection />, { from: { ...start, circuit: { oxygenKPa: 300 } } });
  await open();
  const oxygen = screen.getByLabelText("Oxygen partial pressure");
  fireEvent.change(oxygen, { target: { value: "-5" } });
  fireEvent.keyDown(oxygen, { key: "Enter" });
  expect(oxygen).toHaveProperty("value", "-5");
  expect(oxygen.getAttribute("aria-invalid")).toBe("true");
  expect(now().circuit).toEqual({ oxygenKPa: 300 });
});

test("every reagent of the table can be named; looked at only, nothing can be changed", async () => {
  renderAsking(<AroundSection />, { from: start, readOnly: true });
  expect(await open()).toHaveProperty("disabled", true);
  for (const { name, kind } of reagents)
    expect(screen.getByLabelText(`${name} is in use as ${kind}`)).toHaveProperty("disabled", true);
});

test("an edit leaves what it does not name", () => {
  const all = toggleReagent("zinc-dust")(setCircuit({ oxygenKPa: 200, sxOrganic: true })(start));
  expect(setCircuit({ oxygenKPa: undefined })(all).circuit).toEqual({ sxOrganic: true, reagents: ["zinc-dust"] });
  expect(toggleReagent("zinc-dust")(all).circuit).toEqual({ oxygenKPa: 200, sxOrganic: true });
  expect(start).not.toHaveProperty("circuit");
});
