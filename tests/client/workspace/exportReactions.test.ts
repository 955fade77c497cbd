import { expect, test } from "vitest";
import { DEFERENCE } from "../../../shared/hazards/exposure";
import { hazardRegions } from "../../../shared/hazards/regions";
import { analyse } from "../../../shared/analysis";
import { reachesOf } from "../../../shared/reach/reach";
import { valueOf } from "../../../shared/outcome";
import { toProblem } from "../../../shared/plan/toProblem";
import { planReactions } from "../../../shared/reactions/ofPlan";
import type { PlanInputs } from "../../../shared/schemas/plan";
import type { Exported } from "../../../src/features/workspace/model/exportPlan";
import {
  overallTable,
  planFile,
  reactionsTable,
  sheetQuery,
} from "../../../src/features/workspace/model/exportReactions";
import { view } from "../map/fixture";
import { metal, sheetInputs } from "../../support/sheetFixture";
import { library as data, solved } from "../../support/solver";

const inputs: PlanInputs = {
  ...sheetInputs,
  temperatureC: 25,
  metals: [metal("Cu", "target", "dissolved", 0.01), metal("Cd", "watched", "free", 0.001)],
  ligands: [...sheetInputs.ligands, { component: "S(sulfide)", activity: 0.01 }],
  feedMinerals: ["CuFeS2(s)", "CuO(s)"],
  dosed: [],
  leftOut: [],
  circuit: { oxygenKPa: 500 },
  overall: {
    "CuFeS2(s)": { redox: "ferric", products: { Fe: "Fe^2+(aq)", "S(sulfide)": "SO4^2-(aq)" } },
    "Cd(s)": { products: { Cd: "ZnO(s)" } },
  },
};
const problem = toProblem(inputs, data);
const solution = solved(problem);
const at = { pH: 1.5, Eh: 0.65 };

test("reactions as a table: the choices, the reaction, and a line a reagent per mole, per kg of metal and per tonne", () => {
  const reactions = planReactions(problem, data, inputs, solution, at);
  const { header, rows } = overallTable(reactions, at, 25);
  for (const row of rows) expect(row).toHaveLength(header.length);
  const lines = rows.map((row) => Object.fromEntries(header.map((h, i) => [h, row[i]])));
  const ferric = lines.find((l) => l.from === "CuFeS2(s)" && l.role === "oxidant")!;
  expect(ferric).toMatchObject({
    chosen_by_hand: "Fe=Fe^2+(aq); S(sulfide)=SO4^2-(aq)",
    redox_reagent: "ferric",
    electrons_per_mol: 16,
    reagent: "Fe^3+",
    direction: "used",
    mol_per_mol: 16,
    metal: "Cu",
    temperature_C: 25,
    set_point_pH: 1.5,
    not_written_because: null,
  });
  expect(ferric.kg_per_kg_metal).toBeCloseTo((16 * 55.845) / 63.546, 3);
  expect(ferric.kg_per_t).toBeCloseTo((1000 * 16 * 55.845) / 183.52, -1); // of pure chalcopyrite
  expect(ferric.products).toContain("S(sulfide)=SO4^2-(aq)");
  const oxide = lines.find((l) => l.from === "CuO(s)")!;
  expect(oxide.kg_per_kg_metal).toBeCloseTo(1.543, 2); // practice, section 3.6: acid of a copper oxide
  expect(oxide).toMatchObject({ role: "acid", reagent: "H2SO4", chosen_by_hand: "", redox_reagent: null });
  const refused = lines.find((l) => l.from === "Cd(s)")!;
  expect(refused).toMatchObject({ reaction: null, chosen_by_hand: "Cd=ZnO(s)" });
  expect(refused.not_written_because).toMatch(/ZnO\(s\) holds no Cd/);
});

const gases = valueOf(hazardRegions(valueOf(analyse(problem, data)))).regions;
const exported = (state: string, hazard = true): Exported => ({
  plan: { id: "p", name: "Leach", invented: true },
  state,
  revision: 2,
  scale: { reference: null },
  trialWords: null,
  ...{ inputs, problem, solution, data },
  model: {
    asked: { metals: [], solution, other: null, through: null, reaches: [], cyanide: false, gases },
    view: { ...view, window: 0, layers: { ...view.layers, hazard } },
    metals: [],
    reaches: reachesOf(data, ["peroxide", "air"], inputs.preset, inputs.temperatureC),
    practice: [],
    through: [1, 0],
  },
});

test("the plan as a file holds its choices, what they give, and its cautions with the deference", () => {
  const file = planFile(exported("revision 2"));
  expect(reactionsTable(exported("revision 2"))?.rows.length).toBeGreaterThan(3);
  expect(file.inputs.overall).toEqual(inputs.overall);
  const written = file.overallReactions.find((r) => r.from === "CuFeS2(s)")!;
  expect(written).toMatchObject({ chosenByHand: inputs.overall!["CuFeS2(s)"]!.products, redox: "ferric" });
  expect(JSON.parse(JSON.stringify(written))).toMatchObject({ products: { "S(sulfide)": "SO4^2-(aq)" } });
  expect(file.cautions.map((c) => c.code)).toContain("OXYGEN");
  expect(file).toMatchObject({ deference: DEFERENCE, dataVersion: data.version, state: "revision 2" });
});

test("the sheet is asked for the window in hand, the gases drawn and the reagents looked at; a draft leaves window and gases to the saved state", () => {
  expect(sheetQuery(exported("revision 2"))).toBe(
    `?window=0&gases=${gases.map((g) => g.gas).join("%2C")}&reach=air%2Cperoxide`,
  );
  expect(sheetQuery(exported("revision 2", false))).toBe("?window=0&gases=&reach=air%2Cperoxide");
  expect(sheetQuery(exported("draft on revision 2"))).toBe("?reach=air%2Cperoxide");
});
