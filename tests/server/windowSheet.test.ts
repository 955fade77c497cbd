import { execFileSync } from "node:child_process";
import { createHash } from "node:crypto";
import type { Agent } from "supertest";
import { expect, test } from "vitest";
import { windowSheet } from "../../server/features/windowSheet/page";
import { workOf } from "../../server/features/windowSheet/work";
import { projectRoot } from "../../server/root";
import { fromSHE } from "../../shared/electrodes/convert";
import { electrodeSeries } from "../../shared/electrodes/series";
import { DEFERENCE } from "../../shared/hazards/exposure";
import { valueOf } from "../../shared/outcome";
import { toProblem } from "../../shared/plan/toProblem";
import type { ProjectRow } from "../../shared/schemas/api";
import type { PlanInputs, PlanRow } from "../../shared/schemas/plan";
import { solve } from "../../shared/solve";
import type { Point } from "../../shared/solution";
import { typeset } from "../../shared/species/typeset";
import { fixed } from "../../shared/words/numbers";
import { readPdf, type PdfText, type ReadPdf } from "../support/pdf";
import { metal, sheetInputs, sheetPlan, sheetRevision } from "../support/sheetFixture";
import { library, tables, testServer } from "../support/testServer";

async function planOf(client: Agent, inputs: PlanInputs = sheetInputs, name = "Third tank"): Promise<PlanRow> {
  const site = { siteName: "North works", name: "Second stage" };
  const project = (await client.post("/api/projects").send(site).expect(201)).body as ProjectRow;
  const values = { projectId: project.id, name, description: "", inputs };
  return (await client.post("/api/plans").send(values).expect(201)).body as PlanRow;
}

const bytesOf = async (client: Agent, path: string): Promise<Buffer> => {
  const answer = await client.get(path).buffer(true).expect(200).expect("Content-Type", "application/pdf");
  return answer.body as Buffer;
};

const solved = (inputs: PlanInputs) => valueOf(solve(toProblem(inputs, library), library, { shutGround: true }));
const plain = (formula: string) =>
  typeset(formula)
    .map((p) => p.text)
    .join("");

/** A sheet of inputs, drawn without a server. */
async function drawn(inputs: PlanInputs, plan = sheetPlan, note = "Peroxide in place of air."): Promise<ReadPdf> {
  const work = valueOf(workOf(plan, { ...sheetRevision(tables.version, inputs), note }, library, null));
  return readPdf(await windowSheet(work));
}

const boxOf = ({ x, y, width, size }: PdfText) => ({ x0: x, x1: x + width, y0: y - 0.68 * size, y1: y + 0.12 * size });

/** Pieces of text that cover each other, or hang over the edge of the page. */
function collisions({ texts }: ReadPdf): string[] {
  const level = texts.filter((t) => !t.turned && !t.halo && t.text.trim() !== "");
  const found = level
    .filter((t) => t.x < 14 || t.x + t.width > 581 || t.y < 14 || t.y > 828)
    .map((t) => `over the edge: ${t.text}`);
  level.forEach((a, i) => {
    const p = boxOf(a);
    for (const b of level.slice(i + 1)) {
      const q = boxOf(b);
      const wide = Math.min(p.x1, q.x1) - Math.max(p.x0, q.x0);
      const high = Math.min(p.y1, q.y1) - Math.max(p.y0, q.y0);
      if (wide > 0.4 && high > 0.4) found.push(`${a.text} | ${b.text}`);
    }
  });
  return found;
}

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

  const work = valueOf(workOf(sheetPlan, sheetRevision(tables.version), library, null));
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
  const changed = await windowSheet(valueOf(workOf(sheetPlan, other, library, null)));
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

test("window, shut ground and boundaries are the solver's polygons, as vectors", async () => {
  const { paths, clips } = await drawn(sheetInputs);
  const { windows, shut = [] } = solved(sheetInputs);
  const shape = (points: readonly Point[]) => {
    const [xs, ys] = [points.map((p) => p[0]), points.map((p) => p[1])];
    const [x, y, w, h] = [
      Math.min(...xs),
      Math.min(...ys),
      Math.max(...xs) - Math.min(...xs),
      Math.max(...ys) - Math.min(...ys),
    ];
    return points.map((p): Point => [(p[0] - x) / w, (p[1] - y) / h]);
  };
  const outlines = [...windows.flatMap((w) => w.polygons), ...shut.flatMap((s) => s.polygons)];
  expect(outlines.length).toBeGreaterThan(2);
  for (const { outer } of outlines) {
    const want = shape(outer.map(([pH, Eh]) => [pH, -Eh]));
    const same = paths.some((path) => {
      if (path.length !== want.length) return false;
      return shape(path).every(([x, y], i) => Math.hypot(x - want[i]![0], y - want[i]![1]) < 1e-3);
    });
    expect(same, JSON.stringify(outer)).toBe(true);
  }
  expect(clips).toBe(shut.filter((s) => s.polygons.length > 0 && s.metal !== "Cu").length);
});

test("subscripts stand lower and charges higher, both smaller", async () => {
  const { texts } = await drawn(sheetInputs);
  const at = texts.findIndex((t, i) => t.text === "SO" && texts[i + 1]?.text === "4" && texts[i + 2]?.text === "2−");
  const [base, sub, sup] = texts.slice(at, at + 3) as [PdfText, PdfText, PdfText];
  expect(sub.size).toBeLessThan(0.8 * base.size);
  expect(sup.size).toBeLessThan(0.8 * base.size);
  expect(sub.y - base.y).toBeGreaterThan(0.1 * base.size);
  expect(base.y - sup.y).toBeGreaterThan(0.25 * base.size);
});

const crowd: PlanInputs = {
  ...sheetInputs,
  metals: [
    metal("Zn", "target", "dissolved", 0.08),
    metal("Fe", "gangue", "solid", 1e-5),
    ...["Cu", "Cd", "Pb", "Co", "Ni", "Mn", "As", "Sb", "Ag", "Au", "Al", "Mg", "Ca", "Cr"].map((e, i) =>
      metal(e, "watched", "free", 1e-4 / (i + 1), { entry: "gPerL", gammaFrom: "typed", gamma: 0.123 }),
    ),
  ],
  temperatureC: 180,
  leftOut: Array.from({ length: 30 }, (_, i) => ({
    species: "CuO(s)",
    reason: `reason ${i} of many in this long list`,
  })),
  circuit: { reagents: ["zinc-dust", "oxygen", "chlorine"] },
  ranges: { temperatureC: [150, 200], activities: { Zn: [0.01, 0.1], Fe: [1e-6, 1e-4] } },
};

test("ten and more metals, long names and long lists stay on one page: nothing overlaps, what is left out is counted", async () => {
  const long = {
    ...sheetPlan,
    name: "A plan whose name is as long as a name may be, ".repeat(3).slice(0, 120),
    invented: true,
  };
  for (const inputs of [crowd, { ...crowd, metals: crowd.metals.slice(0, 10) }, sheetInputs]) {
    const sheet = await drawn(inputs, long, "Why this was done is told at length here. ".repeat(12).slice(0, 500));
    expect(sheet.pages).toBe(1);
    expect(collisions(sheet)).toEqual([]);
    expect(sheet.words).toContain("INVENTED DEMO DATA");
    expect(sheet.words).toContain(DEFERENCE);
    for (const { element } of inputs.metals)
      expect(sheet.words).toMatch(new RegExp(`\\b${element} ([a-z]+, )*(target, |gangue, )?(dissolved|solid|watched)`));
    if (inputs !== sheetInputs) expect(sheet.words).toMatch(/… and \d+ more \w+ in the plan/);
  }
});

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
  expect(sheet.words).toMatch(/cannot hold together(\.|: their grounds stand)|Nowhere on this map/);
  expect(sheet.words).not.toContain("Set point");
  expect(collisions(sheet)).toEqual([]);
});

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
