import { execFileSync } from "node:child_process";
import { createHash } from "node:crypto";
import { expect, test } from "vitest";
import { windowSheet } from "../../server/features/windowSheet/page";
import { workOf } from "../../server/features/windowSheet/work";
import { projectRoot } from "../../server/root";
import { checkedWords } from "../../shared/advice/checkedWords";
import { robustWindow } from "../../shared/advice/robust";
import { fromSHE } from "../../shared/electrodes/convert";
import { electrodeSeries } from "../../shared/electrodes/series";
import { DEFERENCE } from "../../shared/hazards/exposure";
import { valueOf } from "../../shared/outcome";
import { toProblem } from "../../shared/plan/toProblem";
import type { PlanInputs } from "../../shared/schemas/plan";
import { solve } from "../../shared/solve";
import type { Point } from "../../shared/solution";
import { marginWords } from "../../shared/windows/limitWords";
import { typeset } from "../../shared/species/typeset";
import { fixed } from "../../shared/words/numbers";
import { readPdf, type PdfText, type ReadPdf } from "../support/pdf";
import { metal, sheetInputs, sheetPlan, sheetRevision } from "../support/sheetFixture";
import { bytesOf, collisions, drawn, planOf } from "../support/sheets";
import { library, tables, testServer } from "../support/testServer";

const solved = (inputs: PlanInputs) => valueOf(solve(toProblem(inputs, library), library, { shutGround: true }));
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

/** Whether a closed path of the page has the shape of a ring in (pH, Eh), whatever the scales. */
const outlineDrawn = ({ paths }: ReadPdf, ring: readonly Point[]): boolean => {
  const [xs, ys] = [ring.map((p) => p[0]), ring.map((p) => -p[1])];
  const size = (v: readonly number[]) => Math.max(...v) - Math.min(...v);
  const want = ring.map(([x, y]) => [(x - Math.min(...xs)) / size(xs), (-y - Math.min(...ys)) / size(ys)] as const);
  return paths.some((path) => {
    if (path.length !== ring.length) return false;
    const [px, py] = [path.map((p) => p[0]), path.map((p) => p[1])];
    return path.every(([x, y], i) => {
      const [u, v] = [(x - Math.min(...px)) / size(px), (y - Math.min(...py)) / size(py)];
      return Math.hypot(u - want[i]![0], v - want[i]![1]) < 1e-3;
    });
  });
};
test("window, shut ground and boundaries are the solver's polygons, as vectors", async () => {
  const sheet = await drawn(sheetInputs);
  const { windows, shut = [] } = solved(sheetInputs);
  const outlines = [...windows.flatMap((w) => w.polygons), ...shut.flatMap((s) => s.polygons)];
  expect(outlines.length).toBeGreaterThan(2);
  for (const { outer } of outlines) expect(outlineDrawn(sheet, outer), JSON.stringify(outer)).toBe(true);
  expect(sheet.clips).toBe(shut.filter((s) => s.polygons.length > 0 && s.metal !== "Cu").length);
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
  expect(sheet.words).toMatch(/cannot hold together\.( Their grounds lie| Where the others hold)?|Nowhere on this map/);
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

const plain2 = (text: string) => text.replace(/[\u2009\u00a0]/g, " ");

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
  expect(sheet.words).toContain(plain2(checkedWords(robust, (e) => (e === "Fe" ? "iron" : e))));
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

const dust: PlanInputs = {
  ...sheetInputs,
  temperatureC: 55,
  metals: [
    metal("Cd", "gangue", "metal", 1e-6),
    metal("Zn", "target", "dissolved", 0.1),
    metal("As", "watched", "free", 1e-4),
  ],
  feedMinerals: [],
  dosed: [],
  leftOut: [],
  frame: { pH: [1, 7], Eh: [-1.2, 0.6] },
  water: { bound: "upper" },
};

test("gases are drawn as asked; one that reaches the window is told of, drawn or not, and the deference stands with the cautions", async () => {
  const { as } = await testServer();
  const made = await planOf(await as("metallurgist"), dust);
  const client = await as("technician");
  const path = `/api/plans/${made.id}/revisions/1/window-sheet.pdf`;
  const sheetOf = async (query: string) => readPdf(await bytesOf(client, `${path}${query}`));
  const work = valueOf(workOf(sheetPlan, sheetRevision(tables.version, dust), library));
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

test("overall reactions stand on the sheet as the plan chose them, with reagents per mole, per kg of metal and per tonne", async () => {
  const inputs: PlanInputs = {
    ...dust,
    metals: dust.metals.slice(0, 2),
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

test("what stands around the leach is told beside the cautions that rest on it", async () => {
  const circuit = { sxOrganic: true, oxygenKPa: 350, reagents: ["peroxide", "zinc-dust"] };
  const sheet = await drawn({ ...sheetInputs, circuit });
  expect(sheet.words).toContain("Around the leach H2O2, Zn dust in use; extraction organic met; oxygen at 350 kPa");
  expect(collisions(sheet)).toEqual([]);
  expect((await drawn(sheetInputs)).words).not.toContain("Around the leach");
});

test("the sheet speaks of the window asked for, and of the best where that one is not there", () => {
  const inputs: PlanInputs = { ...sheetInputs, metals: [metal("Zn", "target", "solid", 1e-4)], frame: { pH: [1, 14], Eh: [-1.2, 1.2] } }; // prettier-ignore
  const { windows } = solved(inputs);
  const of = (window: number) => valueOf(workOf(sheetPlan, sheetRevision(tables.version, inputs), library, { window }));
  expect(of(99).window).toEqual(windows[0]);
  windows.forEach((w, i) => expect(of(i).window).toEqual(w));
});
