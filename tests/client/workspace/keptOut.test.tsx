import { fireEvent, screen } from "@testing-library/react";
import { describe, expect, test } from "vitest";
import { toProblem } from "../../../shared/plan/toProblem";
import { planInputs } from "../../../shared/schemas/plan";
import { beyondWords } from "../../../shared/hazards/words";
import { limitSentences, namingOf } from "../../../shared/windows/limitWords";
import { keptAt } from "../../../shared/windows/shutGround";
import { KeptOutSection } from "../../../src/features/workspace/asks/KeptOutSection";
import { addTotal, keepOut, letIn, setPreset } from "../../../src/features/workspace/model/edit";
import { limitsTable } from "../../../src/features/workspace/model/exports";
import { limitName } from "../../../src/features/trials/model/placeWords";
import { newPlanInputs } from "../../../src/lib/newPlan";
import { planChanges } from "../../../src/lib/planChanges";
import { mapContent } from "../../../src/map/content";
import { keptNames } from "../../../src/map/names/anchoredNames";
import { keptTraces } from "../../../src/map/traces/kept";
import { view } from "../map/fixture";
import { library, solved } from "../../support/solver";
import { renderAsking } from "./askingStage";

const gold = newPlanInputs({ step: "leach", preset: "cyanide", target: "Au", other: "Fe", temperatureC: 25 }, library);
const rule = { gas: "HCN", pHAtLeast: 10.5 } as const;

describe("in a plan", () => {
  test("a new cyanide plan keeps HCN out by pH 10.5, another plan nothing", () => {
    expect(gold.excludedHazards).toEqual([rule]);
    expect(planInputs.parse(gold)).toEqual(gold);
    expect(toProblem(gold, library).excludedHazards).toEqual([rule]);
    const zinc = newPlanInputs({ step: "leach", preset: "sulfate", target: "Zn", other: null, temperatureC: 25 }, library);
    expect(zinc).not.toHaveProperty("excludedHazards");
    expect(toProblem(zinc, library)).not.toHaveProperty("excludedHazards");
  }); // prettier-ignore

  test("cyanide that comes in later brings the rule, and leaves one that is there alone", () => {
    const { excludedHazards: _none, ...before } = gold;
    expect(setPreset("cyanide", library)(before).excludedHazards).toEqual([rule]);
    expect(addTotal("ligands", { component: "CN", activity: 0.01 })(before).excludedHazards).toEqual([rule]);
    expect(addTotal("ligands", { component: "Cl", activity: 0.01 })(before)).not.toHaveProperty("excludedHazards");
    const own = { ...gold, excludedHazards: [{ gas: "HCN", pHAtLeast: 11 } as const] };
    expect(setPreset("cyanide", library)(own).excludedHazards).toEqual(own.excludedHazards);
  });

  test("is kept, changed in place and let in again, and the change is told", () => {
    const more = keepOut({ gas: "H2", bar: 0.5 })(gold);
    const changed = keepOut({ gas: "HCN", bar: 5e-5 })(more);
    expect(changed.excludedHazards?.map((h) => h.gas)).toEqual(["HCN", "H2"]);
    expect(letIn("H2")(letIn("HCN")(changed))).not.toHaveProperty("excludedHazards");
    expect(planChanges(gold, changed)).toEqual([
      {
        what: "Kept out of windows: HCN",
        from: "pH at or above 10.5 against HCN",
        to: "HCN below 49.3 ppm over the liquor",
      },
      { what: "Kept out of windows: H2", from: null, to: "H2 below 0.5 bar over the liquor" },
    ]);
  });
});

describe("in the answers", () => {
  const solution = solved(toProblem(gold, library), { shutGround: true });
  const [window] = solution.windows;

  test("the limit is named in the ledger, the table and a trial's place", () => {
    const sentences = limitSentences(window!, namingOf(library, solution));
    expect(sentences.find((s) => s.limit.kind === "hazard")).toMatchObject({ side: "low pH", what: "HCN: pH falls below 10.5 (kept out)" }); // prettier-ignore
    const { header, rows } = limitsTable(solution.windows);
    const row = rows.find((r) => r[1] === "hazard")!;
    expect(row[header.indexOf("kept_out")]).toBe(`${beyondWords(rule)} (kept out)`);
    expect(row[header.indexOf("outside")]).toBe("HCN(g)");
    const limit = window!.limits.find((l) => l.kind === "hazard")!;
    expect(limitName(limit, gold)).toBe("where pH falls below 10.5 (HCN)");
  });

  test("its ground is known under the cursor, drawn and named", () => {
    expect(keptAt(solution, [10.4, 0]).map((k) => k.gas)).toEqual(["HCN"]);
    expect(keptAt(solution, [10.6, 0])).toEqual([]);
    const content = mapContent({ metals: [], solution, other: null, through: null, reaches: [], cyanide: true });
    expect(content.cyanide).toBe(false); // one drawing of it is enough
    const here = { ...view, frame: gold.frame, visible: gold.frame };
    const [, edge] = keptTraces(content.kept, here);
    expect(new Set(edge?.x.filter((x) => x !== null))).toEqual(new Set([10.5]));
    const [name] = keptNames(content, here);
    expect(name?.parts.map((p) => p.text).join("")).toBe("HCN kept out, pH 10.5");
  });
});

test("the asks: the rule's pH is typed, changed to a pressure, and let in", async () => {
  const now = renderAsking(<KeptOutSection />, { from: gold });
  const pH = await screen.findByLabelText("Lowest pH against HCN");
  fireEvent.change(pH, { target: { value: "11" } });
  fireEvent.keyDown(pH, { key: "Enter" });
  expect(now().excludedHazards).toEqual([{ gas: "HCN", pHAtLeast: 11 }]);
  fireEvent.click(screen.getByRole("radio", { name: "by pressure" }));
  expect(screen.getByLabelText("Highest pressure of HCN")).toHaveProperty("value", "50");
  fireEvent.click(screen.getByRole("button", { name: "No longer keep HCN out" }));
  expect(now().excludedHazards ?? []).toEqual([]);
});

test("a gas that the liquor cannot give off says that it cuts nothing", async () => {
  renderAsking(<KeptOutSection />, { from: { ...gold, ligands: [], preset: "water" } });
  expect(await screen.findByText(/Cuts nothing: the plan holds no cyanide/)).toBeTruthy();
});
