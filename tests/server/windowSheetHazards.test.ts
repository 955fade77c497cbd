import { expect, test } from "vitest";
import { windowSheet } from "../../server/features/windowSheet/page";
import { workOf } from "../../server/features/windowSheet/work";
import { DEFERENCE } from "../../shared/hazards/exposure";
import { valueOf } from "../../shared/outcome";
import type { PlanInputs } from "../../shared/schemas/plan";
import { readPdf } from "../support/pdf";
import { dustInputs, metal, sheetInputs, sheetPlan, sheetRevision } from "../support/sheetFixture";
import { bytesOf, collisions, drawn, planOf } from "../support/sheets";
import { library, tables, testServer } from "../support/testServer";

test("cyanide, a gas over the liquor and a set point by hand are told with their cautions", async () => {
  const inputs: PlanInputs = {
    ...sheetInputs,
    temperatureC: 25,
    preset: "cyanide",
    metals: [metal("Au", "target", "dissolved", 1e-5), metal("Fe", "gangue", "solid", 1e-6)],
    ligands: [{ component: "CN", activity: 0.01 }],
    others: [],
    feedMinerals: [],
    dosed: [],
    leftOut: [],
    frame: { pH: [9, 13], Eh: [-0.8, 0.6] },
    heldSetPoint: { pH: 9.8, Eh: 0.1 },
  };
  const { words, texts } = await drawn(inputs);
  expect(words).toContain("HCN below pH 10.5");
  expect(words).toContain("Placed by hand.");
  expect(words).toContain("pH 9.80");
  expect(words).toContain("Never acidify it");
  expect(words).toContain("This set point runs under a named procedure:");
  expect(words).toContain("IDLH 50 ppm");
  expect(texts.some((t) => t.text.includes("\ufffd"))).toBe(false);
});

test("gases are drawn as asked; one that reaches the window is told of, drawn or not, and the deference stands with the cautions", async () => {
  const { as } = await testServer();
  const made = await planOf(await as("metallurgist"), dustInputs);
  const client = await as("technician");
  const path = `/api/plans/${made.id}/revisions/1/window-sheet.pdf`;
  const sheetOf = async (query: string) => readPdf(await bytesOf(client, `${path}${query}`));
  const work = valueOf(workOf(sheetPlan, sheetRevision(tables.version, dustInputs), library));
  const reaching = work.reachingGases.map((g) => g.gas);
  expect(reaching).toEqual(["AsH3", "H2"]);

  const usual = await sheetOf("");
  expect((await sheetOf("?gases=AsH3,H2")).clips).toBe(usual.clips);
  const one = await sheetOf("?gases=H2");
  const none = await sheetOf("?gases=");
  expect([usual.clips - one.clips, one.clips - none.clips]).toEqual([1, 1]);
  expect(one.words).toMatch(/AsH3: (at the set point it|part of the window) reaches 3 ppm[^.]*\(region not drawn\)/);
  expect(usual.words).not.toContain("region not drawn");
  for (const sheet of [usual, one, none]) {
    expect(sheet.words).toContain("lower flammable limit");
    expect(sheet.words).toContain("OSHA 0.05 ppm");
    const [cautions, deference, foot] = ["Cautions", DEFERENCE, "Thermodynamics says what"].map((w) => sheet.words.indexOf(w)); // prettier-ignore
    expect(cautions! >= 0 && cautions! < deference! && deference! < foot!).toBe(true);
  }
  const refused = await client.get(`${path}?gases=H2,CO`).expect(400);
  expect(refused.body).toMatchObject({ error: { path: "gases.1", message: expect.stringContaining("CO") as string } });
});

test("a gas drawn that keeps off the window says so", async () => {
  const inputs: PlanInputs = {
    ...sheetInputs,
    temperatureC: 25,
    ligands: [{ component: "S", activity: 0.45 }, { component: "Cl", activity: 1 }], // prettier-ignore
    frame: { pH: [0, 8], Eh: [-0.2, 1.6] },
  };
  const work = valueOf(workOf(sheetPlan, sheetRevision(tables.version, inputs), library, { gases: ["Cl2"] }));
  expect(work.reachingGases.map((g) => g.gas)).not.toContain("Cl2");
  const { words } = readPdf(await windowSheet(work));
  expect(words).toMatch(/Cl2: outside the window the ground drawn reaches 10 ppm/);
  expect(words).toContain("NIOSH 0.5 ppm ceiling");
});

test("what stands around the leach is told beside the cautions that rest on it", async () => {
  const circuit = { sxOrganic: true, oxygenKPa: 350, reagents: ["peroxide", "zinc-dust"] };
  const sheet = await drawn({ ...sheetInputs, circuit });
  expect(sheet.words).toContain("Around the leach H2O2, Zn dust in use; extraction organic met; oxygen at 350 kPa");
  expect(collisions(sheet)).toEqual([]);
  expect((await drawn(sheetInputs)).words).not.toContain("Around the leach");
});
