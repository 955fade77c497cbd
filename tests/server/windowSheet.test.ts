import { execFileSync } from "node:child_process";
import { createHash } from "node:crypto";
import { expect, test } from "vitest";
import { windowSheet } from "../../server/features/windowSheet/page";
import { workOf } from "../../server/features/windowSheet/work";
import { projectRoot } from "../../server/root";
import { fromSHE } from "../../shared/electrodes/convert";
import { electrodeSeries } from "../../shared/electrodes/series";
import { DEFERENCE } from "../../shared/hazards/exposure";
import { valueOf } from "../../shared/outcome";
import type { PlanInputs } from "../../shared/schemas/plan";
import { typeset } from "../../shared/species/typeset";
import { fixed } from "../../shared/words/numbers";
import { readPdf } from "../support/pdf";
import { metal, sheetInputs, sheetPlan, sheetRevision } from "../support/sheetFixture";
import { bytesOf, planOf, solved } from "../support/sheets";
import { library, tables, testServer } from "../support/testServer";

const plain = (formula: string) =>
  typeset(formula)
    .map((p) => p.text)
    .join("");

test("the sheet of a revision says what was asked, where to run, what shuts the window and what it rests on, to every role", async () => {
  const { as, now } = await testServer();
  const made = await planOf(await as("metallurgist"));
  now("2026-06-01T23:30:00.000Z");
  const ligands = sheetInputs.ligands.map((l) => ({ ...l, unit: "g/L" as const }));
  const revision = { note: "Peroxide in place of air.", inputs: { ...sheetInputs, ligands, temperatureC: 61.5 } };
  await (await as("admin")).post(`/api/plans/${made.id}/revisions`).send(revision).expect(201);
  const path = `/api/plans/${made.id}/revisions/2/window-sheet.pdf`;
  const first = await bytesOf(await as("metallurgist"), path);
  for (const role of ["technician", "manager", "admin"] as const)
    expect((await bytesOf(await as(role), path)).equals(first)).toBe(true);

  const { words, pages, info, images } = readPdf(first);
  expect(pages).toBe(1);
  expect(images).toBe(0);
  const { windows, setPoint, metals } = solved(revision.inputs);
  const said = [
    "Third tank",
    "North works / Second stage. Saved 1 Jun 2026, 23:30 UTC by The admin. Peroxide in place of air.",
    "WINDOW SHEET revision 2",
    `pH ${fixed(setPoint?.pH ?? NaN, 2)}`,
    `${fixed(setPoint?.Eh ?? NaN, 2)} V vs SHE`,
    `Margin ${fixed(setPoint?.margin ?? NaN, 1)} `,
    "A band is pH ±0.17, Eh ±0.025 V",
    "Zn zinc, target, dissolved; carry 9.25 g/L, γ 0.38 typed:",
    "Fe iron, gangue, solid; at most 3.0×10−6 activity",
    "Cu copper, watched; at 2.0×10−3 activity",
    "61.5 °C, sulfate",
    "S sulfate 0.450 mol/L (43.2 g/L as SO42−), taken as activity",
    "K potassium 0.0200 mol/L, taken as activity",
    "fresh, form in hours",
    "ZnO(s)",
    "peroxide",
    "CuO(s) (never seen in this tank)",
    "both water lines",
    "Eh / V vs SHE",
    "pH at 61.5 °C",
    "Add acid to water, never water to acid.",
    "Thermodynamics says what can happen, not how fast.",
    DEFERENCE,
    `chemistry data ${tables.version}`,
  ];
  for (const sentence of said) expect(words).toContain(sentence);
  expect(metals.find((m) => m.metal === "Zn")?.gamma).toBe(0.38);
  expect(words).not.toContain("INVENTED");
  expect(windows[0]?.limits.length).toBeGreaterThan(3);
  for (const { kind, reactionTerms = [] } of windows[0]?.limits ?? []) {
    if (kind === "frame") continue;
    for (const { formula } of reactionTerms) expect(words).toContain(plain(formula));
  }
  expect(info).toContain("Third tank, window sheet, revision 2");
  expect(info).toContain("D:20260601233000Z");
});

test("the file is the same bytes for the same data: asked twice, and in a process of another place and language", async () => {
  const server = await testServer();
  const client = await server.as("manager");
  const made = await planOf(await server.as("metallurgist"));
  const path = `/api/plans/${made.id}/revisions/1/window-sheet.pdf`;
  const first = await bytesOf(client, path);
  server.now("2027-01-01T00:00:00.000Z");
  expect((await bytesOf(client, path)).equals(first)).toBe(true);

  const work = valueOf(workOf(sheetPlan, sheetRevision(tables.version), library));
  const here = createHash("sha256")
    .update(await windowSheet(work))
    .digest("hex");
  const elsewhere = execFileSync(process.execPath, ["--import", "tsx", "tests/support/sheetHash.ts"], {
    cwd: projectRoot,
    env: { PATH: process.env.PATH, TZ: "Pacific/Chatham", LANG: "de_DE.UTF-8" },
    encoding: "utf8",
  });
  expect(elsewhere).toBe(here);
  const other = sheetRevision(tables.version, { ...sheetInputs, temperatureC: 57.6 });
  const changed = await windowSheet(valueOf(workOf(sheetPlan, other, library)));
  expect(createHash("sha256").update(changed).digest("hex")).not.toBe(here);
});

test("an electrode stands beside SHE where one is asked for, and an unknown one is refused", async () => {
  const { as } = await testServer();
  const made = await planOf(await as("metallurgist"));
  const client = await as("technician");
  const path = `/api/plans/${made.id}/revisions/1/window-sheet.pdf`;
  const series = electrodeSeries(tables).find((s) => s.id === "AGCL-3M");
  const Eh = solved(sheetInputs).setPoint?.Eh ?? NaN;
  const reading = series && fromSHE(Eh, series, 25);
  const { words } = readPdf(await bytesOf(client, `${path}?electrode=AGCL-3M&electrodeC=25`));
  expect(words).toContain(
    `${fixed((reading?.ok ? reading.value : NaN) * 1000, 0)} mV vs Ag/AgCl, 3 mol/L KCl, electrode at 25 °C`,
  );
  expect(words).toContain("E / mV vs Ag/AgCl, 3 mol/L KCl");
  const refused = await client.get(`${path}?electrode=NOSUCH`).expect(400);
  expect(refused.body).toMatchObject({ error: { code: "INVALID_INPUT", path: "electrode" } });
  await client.get(`/api/plans/${made.id}/revisions/7/window-sheet.pdf`).expect(404);
  await client.get(`/api/plans/nothing/revisions/1/window-sheet.pdf`).expect(404);
});

test("the sheet speaks of the window asked for, and of the best where that one is not there", () => {
  const inputs: PlanInputs = { ...sheetInputs, metals: [metal("Zn", "target", "solid", 1e-4)], frame: { pH: [1, 14], Eh: [-1.2, 1.2] } }; // prettier-ignore
  const { windows } = solved(inputs);
  const of = (window: number) => valueOf(workOf(sheetPlan, sheetRevision(tables.version, inputs), library, { window }));
  expect(of(99).window).toEqual(windows[0]);
  windows.forEach((w, i) => expect(of(i).window).toEqual(w));
});
