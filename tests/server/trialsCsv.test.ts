import { parse } from "csv-parse/sync";
import type { Agent } from "supertest";
import { expect, test } from "vitest";
import { csvLine } from "../../server/http/csv";
import { freeAcid } from "../../shared/activity/freeAcid";
import { formulaVersion } from "../../shared/metallurgy/formulaVersion";
import { valueOf } from "../../shared/outcome";
import { chemistry } from "../support/chemistry";
import { bench, typed, unusualTrial } from "../support/records";
import { testServer } from "../support/testServer";

type Line = Record<string, string>;

async function file(client: Agent, query: object = {}) {
  const { text, headers } = await client.get("/api/trials.csv").query(query).expect(200);
  expect(text.startsWith("\ufeff")).toBe(true);
  return { text, headers, rows: parse<Line>(text, { bom: true, columns: true }) };
}

test("a file of trials has units, electrodes, what was typed and what was worked out from it", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { addTrial, feed } = await bench(metallurgist);
  const first = await addTrial({ code: "NL-01" });
  const { id, figures } = await addTrial({ replicateOf: first.id });
  const manager = await as("manager");
  const { rows, headers } = await file(manager, { sort: "code", order: "asc" });
  expect(headers).toMatchObject({
    "content-type": "text/csv; charset=utf-8",
    "content-disposition": 'attachment; filename="trials-2026-05-04.csv"',
  });
  expect(rows.map((row) => row.trial)).toEqual(["NL-01", "NL-07"]);
  expect(rows[1]).toMatchObject({
    project: "Calcine",
    campaign: "C-26A",
    stage: "NL",
    kind: "leach",
    "target metal": "Zn",
    "gangue metal": "Fe",
    feed: feed.name,
    status: "balanced",
    started: "2026-04-29T08:15:00+02:00",
    "repeats trial": "NL-01",
    invented: "no",
    "recovery / %": String(figures.recoveryPct),
    "recovery by": "calculated head",
    "accountability / %": String(figures.accountabilityPct),
    pH: "4.35",
    "pH of a cooled sample": "yes",
    "Eh / V vs SHE": String(figures.Eh),
    "reference electrode": "AGCL-3M",
    "temperature / °C": "61",
    "formula version": formulaVersion,
    "head assay of the target metal, as typed": "55.8",
    "head assay of the target metal, unit": "%",
    "head assay of the gangue metal, as typed": "9.1",
    "moisture of the feed, as typed": "1,5",
    "planned ORP, as typed": "430",
    "planned ORP, unit": "mV",
    "planned ORP, electrode": "AGCL-3M",
    "dry mass, as typed": "50,0",
    "dry mass, unit": "g",
    "starting liquor, as typed": "500",
    "starting liquor, unit": "mL",
    "starting liquor, Zn, as typed": "45",
    "final liquor, H2SO4, as typed": "2",
    "residue or cement, Fe, as typed": "32",
    "residue or cement, Fe, unit": "%",
    "cementing metal dosed, as typed": "2",
    readings: "2",
    version: "1",
    "trial id": id,
  });
  expect(rows[1]?.["potential, as read and converted"]).toMatch(/^412 mV \+ 207 mV .* = 619 mV vs SHE$/);
});

test("below pH 1.5 the file gives the free acid titrated, that by pH, and the difference; above, neither", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { addTrial } = await bench(metallurgist);
  const { measured } = unusualTrial;
  const readings = measured.readings.map((r) => ({ ...r, pH: { ...r.pH, value: typed("1.20", "pH") } }));
  await addTrial({ code: "NL-01" });
  await addTrial({ code: "NL-02", measured: { ...measured, readings } });
  const { rows } = await file(metallurgist, { sort: "code", order: "asc" });
  const acid = (row: Line | undefined) =>
    ["titrated", "by pH, indicative"].map((by) => row?.[`free acid at a pH below 1.5, ${by} / g/L H2SO4`] ?? "");
  expect(acid(rows[0])).toEqual(["", ""]);
  const [titrated, byPH] = acid(rows[1]).map(Number) as [number, number];
  expect(titrated).toBe(2);
  // of the cooled sample the pH was read in, not of the pulp
  const expected = valueOf(freeAcid(chemistry(), 1.2, 1.3, 25)).gPerL;
  expect(byPH).toBeCloseTo(expected, 9);
  expect(Number(rows[1]?.["free acid, titrated less by pH / g/L H2SO4"])).toBeCloseTo(2 - expected, 9);
});

test("text that a spreadsheet would run as a formula is kept text; negative numbers stay numbers", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { addTrial } = await bench(metallurgist);
  await addTrial({ operator: "@SUM(1+1)", code: "+1+1", statusReason: "-2+3", notes: 'a "quoted"\nline, with comma' });
  const { text, rows } = await file(metallurgist);
  expect(rows[0]).toMatchObject({
    trial: "'+1+1",
    operator: "'@SUM(1+1)",
    "reason of the status": "'-2+3",
    notes: 'a "quoted"\nline, with comma',
  });
  expect(text).not.toMatch(/(^|,)"?[=@]/m);
  const { rows: readings } = await file(metallurgist, { lines: "readings" });
  expect(readings[0]?.["ORP, as typed"]).toBe("-12");
});

test.each([
  ["=1+1", "'=1+1"],
  ["-0,5", '"-0,5"'],
  ["-1.5e-3", "-1.5e-3"],
  ["+450", "+450"],
  ["-A1", "'-A1"],
  ["\tx", "'\tx"],
  ["<0.01", "<0.01"],
  [-0.25, "-0.25"],
  [null, ""],
  [true, "yes"],
  ['say "x"', '"say ""x"""'],
  ["=a,b", `"'=a,b"`],
] as const)("the cell %j is written %s", (cell, written) => {
  expect(csvLine([cell])).toBe(`${written}\r\n`);
});

test("a file of readings and a file of assays hold every line as it was typed", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { addTrial } = await bench(metallurgist);
  await addTrial();
  const { rows: readings, headers } = await file(metallurgist, { lines: "readings" });
  expect(headers["content-disposition"]).toContain("readings-");
  expect(readings).toHaveLength(2);
  expect(readings[0]).toEqual({
    campaign: "C-26A",
    trial: "NL-07",
    stage: "NL",
    feed: "Roast 7, north bin",
    status: "balanced",
    reading: "1",
    "time since start, as typed": "1",
    "time since start, unit": "h",
    "pulp temperature, as typed": "58,5",
    "pulp temperature, unit": "C",
    "pH, as typed": "3.9",
    "pH, own temperature, as typed": "58.5",
    "pH, own temperature, unit": "C",
    "pH of a cooled sample": "no",
    "ORP, as typed": "-12",
    "ORP, unit": "mV",
    "ORP, reference electrode": "SCE",
    "ORP, electrode temperature, as typed": "22",
    "ORP, electrode temperature, unit": "C",
    note: "foam",
  });

  const { rows: assays } = await file(metallurgist, { lines: "assays" });
  // 3 in the starting liquor, 2 + 1 + 1 of the sample, 3 final, 1 wash, 2 residue
  expect(assays).toHaveLength(13);
  expect(assays.find(({ stream, analyte }) => stream === "sample" && analyte === "Fe")).toMatchObject({
    sample: "1",
    "time since start, as typed": "1",
    "amount, as typed": "10",
    "amount, unit": "mL",
    "assay, as typed": "<0.005",
    "assay, unit": "g/L",
    method: "ICP",
  });
});

test("the file takes the filters and the order of the list, and names what was assayed in its trials alone", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { addTrial } = await bench(metallurgist);
  const products = {
    ...unusualTrial.products,
    finalAssays: [{ analyte: "Ge", value: typed("1", "mg/L"), method: "" }],
  };
  await addTrial({ code: "NL-1", products });
  await addTrial({ code: "NL-2", operator: "Zed" });
  const { rows } = await file(metallurgist, { search: "zed" });
  expect(rows.map((row) => row.trial)).toEqual(["NL-2"]);
  expect(Object.keys(rows[0] ?? {})).not.toContain("final liquor, Ge, as typed");
  const all = await file(metallurgist, { sort: "code", order: "desc" });
  expect(all.rows.map((row) => [row.trial, row["final liquor, Ge, as typed"]])).toEqual([
    ["NL-2", ""],
    ["NL-1", "1"],
  ]);
  const none = await file(metallurgist, { search: "nothing like it" });
  expect(none.rows).toEqual([]);
  await metallurgist.get("/api/trials.csv?lines=all").expect(400);
});

test("a file longer than one piece holds every trial once", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { addTrial } = await bench(metallurgist);
  const codes = Array.from({ length: 230 }, (_, i) => `N-${i}`);
  for (const code of codes) await addTrial({ code, samples: [] });
  const { rows } = await file(metallurgist, { sort: "code", order: "asc" });
  expect(rows.map((row) => row.trial)).toEqual(codes);
});
