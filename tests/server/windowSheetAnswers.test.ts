import { expect, test } from "vitest";
import { workOf } from "../../server/features/windowSheet/work";
import { checkedWords } from "../../shared/advice/checkedWords";
import { robustWindow } from "../../shared/advice/robust";
import { valueOf } from "../../shared/outcome";
import { toProblem } from "../../shared/plan/toProblem";
import type { PlanInputs } from "../../shared/schemas/plan";
import { marginWords } from "../../shared/windows/limitWords";
import { fixed } from "../../shared/words/numbers";
import { dustInputs, metal, sheetInputs, sheetPlan, sheetRevision } from "../support/sheetFixture";
import { collisions, drawn, outlineDrawn, solved } from "../support/sheets";
import { library, tables } from "../support/testServer";

test("without a window the sheet prints what cannot hold together, and no set point", async () => {
  const inputs = {
    ...sheetInputs,
    metals: [
      metal("Zn", "target", "dissolved", 0.5),
      metal("Fe", "gangue", "dissolved", 0.5),
      metal("Al", "gangue", "solid", 1e-9),
    ],
  };
  const { conflicts, windows } = solved(inputs);
  expect(windows).toEqual([]);
  const sheet = await drawn(inputs);
  expect(sheet.words).toContain("No window is open");
  expect(sheet.words).toContain("What cannot hold together");
  for (const { metal: element } of conflicts.flat())
    expect(sheet.words).toContain(tables.elements.find((e) => e.symbol === element)?.name ?? "?");
  expect(sheet.words).toMatch(/cannot hold together\.( Their grounds lie| Where the others hold)?|Nowhere on this map/);
  expect(sheet.words).not.toContain("Set point");
  expect(collisions(sheet)).toEqual([]);
});

const spaced = (text: string) => text.replace(/[\u2009\u00a0]/g, " ");

test("what holds over the plan's ranges is drawn inside the window, with its deepest point and what was checked", async () => {
  const inputs: PlanInputs = { ...sheetInputs, ranges: { temperatureC: [50, 70], activities: { Fe: [1e-6, 1e-4] } } };
  const problem = toProblem(inputs, library);
  const robust = valueOf(robustWindow(problem, inputs.ranges!, library));
  const [best] = robust.windows;
  expect(robust.windows).toHaveLength(1);
  const sheet = await drawn(inputs);
  expect(outlineDrawn(sheet, best!.outer)).toBe(true);
  expect(sheet.words).toContain("Over the ranges dashed inner outline");
  expect(sheet.words).toContain(
    `Deepest point pH ${fixed(best!.setPoint.pH, 2)}, ${fixed(best!.setPoint.Eh, 2)} V vs SHE, margin ${fixed(best!.setPoint.margin, 1)} ${marginWords(best!.setPoint)}`,
  );
  expect(sheet.words).toContain(spaced(checkedWords(robust, (e) => (e === "Fe" ? "iron" : e))));
  const without = await drawn(sheetInputs);
  expect(without.words).not.toContain("Over the ranges");
  expect(outlineDrawn(without, best!.outer)).toBe(false);
  expect(collisions(sheet)).toEqual([]);
});

test("over ranges a tenor with gamma by Davies becomes an activity anew at every temperature, as on the screen", () => {
  const zinc = metal("Zn", "target", "dissolved", 30, { entry: "gPerL", gammaFrom: "davies" });
  const metals = sheetInputs.metals.map((m) => (m.element === "Zn" ? zinc : m));
  const inputs: PlanInputs = { ...sheetInputs, metals, ionicStrength: 0.4, ranges: { temperatureC: [50, 70] } };
  const { robust } = valueOf(workOf(sheetPlan, sheetRevision(tables.version, inputs), library));
  const over = (plan?: PlanInputs) =>
    valueOf(robustWindow(toProblem(inputs, library), { temperatureC: [50, 70] }, library, undefined, plan));
  expect(robust).toEqual(over(inputs));
  expect(robust).not.toEqual(over());
});

test("overall reactions stand on the sheet as the plan chose them, with reagents per mole, per kg of metal and per tonne", async () => {
  const inputs: PlanInputs = {
    ...dustInputs,
    metals: dustInputs.metals.slice(0, 2),
    overall: { "Zn(s)": { redox: "peroxide" }, "CdSO4(aq)": { products: { Zn: "Zn^2+(aq)" } } },
  };
  const sheet = await drawn(inputs);
  const { words } = sheet;
  expect(collisions(sheet)).toEqual([]);
  expect(words).toContain("Overall reactions at the set point; mol/mol, kg/t of the start");
  expect(words).toMatch(/CdSO4 \+ Zn → Cd \+ SO42− \+ Zn2\+ chosen: Zn2\+/);
  expect(words).toMatch(/Zn dust: Zn 1\.00, 0\.582 kg\/kg Cd, 314 kg\/t; log K/); // practice, section 6: 0.582
  expect(words).toMatch(/H2O2: H2SO4 1\.00, 1\.50 kg\/kg Zn, \d+ kg\/t; H2O2 1\.00, 0\.520 kg\/kg Zn, 520 kg\/t/);
  const refused = { ...inputs, overall: { "CdSO4(aq)": { products: { Cd: "ZnO(s)" } } } };
  expect((await drawn(refused)).words).toContain("Cannot be written: ZnO(s) holds no Cd");
});
