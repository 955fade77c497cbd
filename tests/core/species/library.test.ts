import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { readTables } from "../../../server/chemistry/readTables";
import { chemicalTables, speciesRow, type ChemicalTables, type SpeciesRow } from "../../../shared/schemas/chemistry";
import { libraryFrom, tablesFromRows, withSpecies } from "../../../shared/species/library";
import { chemistry } from "../../support/chemistry";

const copy = (): ChemicalTables => structuredClone(chemistry().tables);
function refusal(change: (tables: ChemicalTables) => void) {
  const tables = copy();
  change(tables);
  const outcome = libraryFrom(tables);
  return outcome.ok ? "accepted" : `${outcome.error.code} ${outcome.error.path}: ${outcome.error.message}`;
}
function speciesOf(tables: ChemicalTables, id: string): SpeciesRow {
  const row = tables.species.find((s) => s.id === id);
  if (row === undefined) throw new Error(id);
  return row;
}

describe("the library", () => {
  test("is read with every species, component and extrapolation", () => {
    const data = chemistry();
    expect(data.species.size).toBe(data.tables.species.length);
    expect(data.species.get("Cu(NH3)4^2+(aq)")?.composition).toEqual({ Cu: 1, NH3: 4 });
    expect(data.components.get("GLY")?.elements).toEqual({ C: 2, H: 4, N: 1, O: 2 });
    expect(data.molarMass.get("Cu")).toBe(63.546);
    expect(data.molarMass.get("NH3")).toBeCloseTo(17.031, 3);
    expect(data.extrapolation.get("Cu(OH)4^2-(aq)")?.reaction?.terms.get("OH^-(aq)")).toBe(-2);
  });

  test("keeps its meaning through JSON, as the server sends it", () => {
    const again = chemicalTables.parse(JSON.parse(JSON.stringify(chemistry().tables)));
    expect(again).toEqual(chemistry().tables);
  });

  test.each<[string, (t: ChemicalTables) => void, string]>([
    ["a charge beside the formula", (t) => (speciesOf(t, "Cu^2+(aq)").charge = 1), "Cu^2+(aq), charge: 1, but the formula Cu^2+ says 2"],
    ["a composition beside the formula", (t) => (speciesOf(t, "CuO(s)").composition = "Cu:2 O:1"), "composition: holds Cu 2, O 1, but the formula CuO holds Cu 1, O 1"],
    ["a group that does not expand to the formula", (t) => (speciesOf(t, "Cu(NH3)4^2+(aq)").composition = "Cu:1 NH3:3"), "composition"],
    ["an unreadable composition", (t) => (speciesOf(t, "CuO(s)").composition = "Cu1 O1"), "cannot be read"],
    ["an unknown component", (t) => (speciesOf(t, "CuO(s)").composition = "Cu:1 EDTA:1"), 'UNKNOWN_COMPONENT species/CuO(s)/composition: CuO(s), composition: no component "EDTA"'],
    ["a broken formula", (t) => { const s = speciesOf(t, "CuO(s)"); s.formula = "Cu("; s.id = "Cu((s)"; }, "BAD_FORMULA"],
    ["an id that is not formula and phase", (t) => (speciesOf(t, "CuO(s)").phase = "aq"), 'id: should be the formula and the phase, "CuO(aq)"'],
    ["G 1.1 kJ off H and S", (t) => (speciesOf(t, "CuO(s)").dGf_kJ -= 1.1), "differs by -"],
    ["H 2 kJ off on an ion", (t) => { const s = speciesOf(t, "Fe^3+(aq)"); s.dHf_kJ = (s.dHf_kJ ?? 0) + 2; }, "differs by"],
    ["an ion with entropy and no class", (t) => (speciesOf(t, "Fe^3+(aq)").ion_class = null), "ion_class: missing"],
    ["a source nobody knows", (t) => (speciesOf(t, "CuO(s)").source = "NBS82; HEARSAY"), 'source "HEARSAY" is not in references.csv'],
    ["no source", (t) => (speciesOf(t, "CuO(s)").source = ""), "no source"],
    ["an id twice", (t) => t.species.push({ ...speciesOf(t, "CuO(s)") }), "stands twice"],
    ["no entropy and no extrapolation", (t) => (speciesOf(t, "CuO(s)").S_J = null), "no entropy and no row in extrapolation.csv"],
    ["an extrapolation of nothing", (t) => t.extrapolation.push({ id: "CuX(s)", hold: "none", reaction: "", logK_25: null, note: "" }), "CuX(s), which is no species"],
    ["an unbalanced extrapolation", (t) => { const e = t.extrapolation[0]; if (e) e.reaction = "Cu^2+(aq) + 2 OH^-(aq) = CuOH^+(aq)"; }, "out of balance in"],
    ["an energy changed without its log K", (t) => (speciesOf(t, "CuOH^+(aq)").dGf_kJ -= 0.5), "log K 6.03, but the energies give 6.1"],
    ["an extrapolation in a circle", (t) => { for (const e of t.extrapolation) { if (e.id === "CdCl^+(aq)") Object.assign(e, { reaction: "CdCl2(aq) = CdCl^+(aq) + Cl^-(aq)", logK_25: -0.66 }); if (e.id === "CdCl2(aq)") Object.assign(e, { reaction: "CdCl^+(aq) + Cl^-(aq) = CdCl2(aq)", logK_25: 0.66 }); } }, "a circle"],
    ["a default of nothing", (t) => t.defaults.push({ id: "Zz(s)", when: "always", reason: "" }), "defaults names Zz(s)"],
    ["a basis line of nothing", (t) => t.solidsBasis.push({ id: "Zz(s)", fresh: "in", below_C: null, reason: "" }), "solidsBasis names Zz(s)"],
    ["a preset that leaves out nothing", (t) => t.presets.push({ preset: "x", component: "S", total_activity: 1, exclude_ids: "Zz(s)", note: "" }), "presets names Zz(s)"],
    ["a preset without activity", (t) => t.presets.push({ preset: "x", component: "S", total_activity: null, exclude_ids: "", note: "" }), "a total activity above zero is needed"],
  ])("refuses %s", (_, change, message) => expect(refusal(change)).toContain(message)); // prettier-ignore
});

describe("own rows", () => {
  const plain = {
    name: "",
    Cp_J: null,
    Cp_a: null,
    Cp_b: null,
    Cp_c: null,
    Cp_Tmax_K: null,
    note: "",
    source: "site assay 12",
  };
  const own: SpeciesRow = speciesRow.parse({
    ...plain, id: "Cu3TeO6(s)", formula: "Cu3TeO6", phase: "s", charge: 0, composition: "Cu:3 Te:1 O:6", dGf_kJ: -900,
    dHf_kJ: null, S_J: null, ion_class: null, grade: "C",
  }); // prettier-ignore

  test("none leave the library as it is", () =>
    expect(withSpecies(chemistry(), [])).toEqual({ ok: true, value: chemistry() }));

  test("replace a row by its id and keep the way to T of the old one", () => {
    const row = {
      ...chemistry().tables.species.find((s) => s.id === "CuOH^+(aq)")!,
      dGf_kJ: -125,
      source: "own titration",
    };
    const made = withSpecies(chemistry(), [row]);
    if (!made.ok) throw new Error(made.error.message);
    expect(made.value.species.get("CuOH^+(aq)")?.row.dGf_kJ).toBe(-125);
    expect(made.value.extrapolation.get("CuOH^+(aq)")?.hold).toBe("logK");
    expect(made.value.tables.species.length).toBe(chemistry().tables.species.length);
    expect(chemistry().species.get("CuOH^+(aq)")?.row.dGf_kJ).toBe(-126.2);
  });

  test("a blank cell is unknown, never zero", () => {
    expect(speciesRow.parse({ ...own, S_J: "  ", dHf_kJ: "", ion_class: " " })).toEqual(own);
    expect(speciesRow.safeParse({ ...own, dGf_kJ: " " }).success).toBe(false);
  });

  test("add a species without entropy: held, no temperature data", () => {
    const row = { ...own, id: "CuSn(s)", formula: "CuSn", composition: "Cu:1 Sn:1" };
    const made = withSpecies(chemistry(), [row]);
    expect(made.ok && made.value.extrapolation.get("CuSn(s)")).toEqual({ hold: "none", reaction: null });
  });

  test("are refused with their place", () => {
    expect(withSpecies(chemistry(), [own])).toEqual({
      ok: false,
      error: {
        code: "UNKNOWN_COMPONENT",
        path: "species.0.composition",
        message: 'Cu3TeO6(s), composition: no component "Te"',
      },
    });
    const twice = { ...own, id: "CuSn(s)", formula: "CuSn", composition: "Cu:1 Sn:1" };
    expect(withSpecies(chemistry(), [twice, twice])).toMatchObject({ ok: false, error: { path: "species.1.id" } });
  });
});

describe("the files", () => {
  const dataDir = "shared/data";
  function withFile(file: string, change: (text: string) => string): string {
    const dir = mkdtempSync(join(tmpdir(), "tables-"));
    try {
      for (const name of readdirSync(dataDir)) {
        const text = readFileSync(join(dataDir, name), "utf8");
        writeFileSync(join(dir, name), name === file ? change(text) : text);
      }
      return readTables(dir).version;
    } catch (error) {
      return String(error);
    } finally {
      rmSync(dir, { recursive: true });
    }
  }

  test("give the same version wherever they stand, another after any change", () => {
    const { version } = readTables();
    expect(version).toMatch(/^[0-9a-f]{12}$/);
    expect(withFile("", (t) => t)).toBe(version);
    expect(withFile("elements.csv", (t) => t.replace("1.008", "1.009"))).not.toBe(version);
  });

  test("a line with a cell too many is named by file and line", () =>
    expect(withFile("species-ligands.csv", (t) => t.replace("-237.129", "-237,129x"))).toMatch(
      /species-ligands\.csv: .*line 2/,
    ));

  test("a wrong cell is named", () => {
    const rows = Object.fromEntries(
      ["elements.csv"].map((f) => [f, [{ symbol: "H", name: "", molar_mass_g_mol: "one", reference_state: "", S_element_J_mol_K: "", source: "" }]]), // prettier-ignore
    );
    const outcome = tablesFromRows(rows, "x");
    expect(outcome).toMatchObject({ ok: false, error: { code: "BAD_DATA", path: "elements.csv/H/molar_mass_g_mol" } });
    expect(outcome.ok || outcome.error.message).toMatch(/elements\.csv, line 2, row H, column molar_mass_g_mol: "one"/);
  });

  test("a missing file is named", () =>
    expect(tablesFromRows({}, "x")).toMatchObject({
      ok: false,
      error: { path: "elements.csv", message: "elements.csv is missing" },
    }));
});
