import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { valueOf } from "../../../shared/outcome";
import { balance, reactionText } from "../../../shared/reactions/balance";
import { chemistry } from "../../support/chemistry";

const data = chemistry();
const text = (inside: string, outside: string, ligands: string[], metal: string) =>
  reactionText(valueOf(balance(data, inside, outside, ligands, metal)));

describe("a limit's reaction", () => {
  test.each<[string, string, string[], string, string]>([
    ["Fe(OH)3(s,ferrihydrite)", "Fe(SO4)2^-(aq)", ["SO4^2-(aq)"], "Fe", "Fe(OH)3 + 2 SO4^2- + 3 H^+ = Fe(SO4)2^- + 3 H2O"],
    ["Fe^3+(aq)", "Fe^2+(aq)", [], "Fe", "Fe^3+ + e^- = Fe^2+"],
    ["Fe^2+(aq)", "Fe2O3(s,hematite)", [], "Fe", "2 Fe^2+ + 3 H2O = Fe2O3 + 6 H^+ + 2 e^-"],
    ["Cu^2+(aq)", "Cu(s)", [], "Cu", "Cu^2+ + 2 e^- = Cu"],
    ["Cu(NH3)4^2+(aq)", "CuO(s)", ["NH4^+(aq)"], "Cu", "Cu(NH3)4^2+ + H2O + 2 H^+ = CuO + 4 NH4^+"],
    ["Cu(NH3)4^2+(aq)", "CuO(s)", ["NH3(aq)"], "Cu", "Cu(NH3)4^2+ + H2O = CuO + 4 NH3 + 2 H^+"],
    ["CuFeS2(s)", "Cu^2+(aq)", ["S(s,rhombic)", "Fe^2+(aq)"], "Cu", "CuFeS2 = Cu^2+ + 2 S + Fe^2+ + 4 e^-"],
    ["CuFeS2(s)", "Cu^2+(aq)", ["HSO4^-(aq)", "Fe^3+(aq)"], "Cu", "CuFeS2 + 8 H2O = Cu^2+ + 2 HSO4^- + Fe^3+ + 14 H^+ + 17 e^-"],
    ["Fe4.5Ni4.5S8(s)", "Ni^2+(aq)", ["S(s,rhombic)", "Fe^2+(aq)"], "Ni", "2 Fe4.5Ni4.5S8 = 9 Ni^2+ + 16 S + 9 Fe^2+ + 36 e^-"],
    ["KFe3(SO4)2(OH)6(s,jarosite)", "Fe2O3(s,hematite)", ["HSO4^-(aq)", "K^+(aq)"], "Fe", "2 KFe3(SO4)2(OH)6 = 3 Fe2O3 + 4 HSO4^- + 2 K^+ + 3 H2O + 2 H^+"],
    ["Cu4SO4(OH)6(s)", "CuSO4(aq)", ["SO4^2-(aq)"], "Cu", "Cu4SO4(OH)6 + 3 SO4^2- + 6 H^+ = 4 CuSO4 + 6 H2O"],
    ["Au(s)", "Au(CN)2^-(aq)", ["CN^-(aq)"], "Au", "Au + 2 CN^- = Au(CN)2^- + e^-"],
    ["FeOOH(s,goethite)", "FeOOH(s,lepidocrocite)", [], "Fe", "FeOOH(s,goethite) = FeOOH(s,lepidocrocite)"],
    ["PbSO4(s)", "PbSO4(aq)", ["SO4^2-(aq)"], "Pb", "PbSO4(s) = PbSO4(aq)"],
    ["Cu(C2H4NO2)2(aq)", "CuO(s)", ["C2H5NO2(aq)"], "Cu", "Cu(C2H4NO2)2 + H2O = CuO + 2 C2H5NO2"],
    ["HV10O28^5-(aq)", "V2O5(s,shcherbinaite)", [], "V", "HV10O28^5- + 5 H^+ = 5 V2O5 + 3 H2O"],
  ])("%s to %s with %s", (inside, outside, ligands, metal, want) => expect(text(inside, outside, ligands, metal)).toBe(want)); // prettier-ignore

  test("sulfate and sulfide sulfur do not turn into each other where both are given", () =>
    expect(text("CuS(s)", "CuSO4(aq)", ["SO4^2-(aq)", "H2S(aq)"], "Cu")).toBe("CuS + SO4^2- + 2 H^+ = CuSO4 + H2S"));

  test("nor does one oxidise a metal and turn into the other", () =>
    expect(text("Fe^2+(aq)", "Fe(OH)3(s,ferrihydrite)", ["SO4^2-(aq)", "H2S(aq)"], "Fe")).toBe(
      "Fe^2+ + 3 H2O = Fe(OH)3 + 3 H^+ + e^-",
    ));

  test("with one sulfur they do", () =>
    expect(text("CuS(s)", "CuSO4(aq)", ["SO4^2-(aq)"], "Cu")).toBe("CuS + 4 H2O = CuSO4 + 8 H^+ + 8 e^-"));

  test("what cannot be is refused in words", () => {
    expect(balance(data, "Fe(OH)3(s,ferrihydrite)", "FeSO4^+(aq)", [], "Fe")).toEqual({
      ok: false,
      error: {
        code: "LIGAND_MISSING",
        path: "reaction",
        message: "Fe(OH)3(s,ferrihydrite) to FeSO4^+(aq): no partner for S",
      },
    });
    expect(balance(data, "Fe(s)", "Cu(s)", [], "Fe")).toMatchObject({ error: { code: "UNKNOWN_METAL" } });
    expect(balance(data, "Fe(s)", "Xx(s)", [], "Fe")).toMatchObject({ error: { code: "UNKNOWN_SPECIES" } });
  });
});

/** The free form of every component but H and O, where the library has one. */
const freeForms = [
  "SO4^2-(aq)", "Cl^-(aq)", "F^-(aq)", "CO3^2-(aq)", "NO3^-(aq)", "PO4^3-(aq)", "NH3(aq)", "CN^-(aq)", "S2O3^2-(aq)", "SCN^-(aq)",
  "C2H4NO2^-(aq)", "C2O4^2-(aq)", "K^+(aq)", "Na^+(aq)", "Li^+(aq)", "Ca^2+(aq)", "Mg^2+(aq)", "Al^3+(aq)", "H4SiO4(aq)", "Fe^3+(aq)",
  "Cu^2+(aq)", "Zn^2+(aq)", "Ni^2+(aq)", "Co^2+(aq)", "Mn^2+(aq)", "HAsO4^2-(aq)", "Cr^3+(aq)", "MoO4^2-(aq)", "UO2^2+(aq)",
]; // prettier-ignore
const metals = [
  "Fe",
  "Cu",
  "Zn",
  "Ni",
  "Co",
  "Mn",
  "As",
  "Pb",
  "Cd",
  "Ag",
  "Au",
  "Al",
  "U",
  "V",
  "Cr",
  "Hg",
  "Sb",
  "Sn",
  "Mo",
  "Pt",
];
const pairs = fc.constantFrom(...metals).chain((metal) => {
  const holding = [...data.species.values()].filter((s) => metal in s.composition).map((s) => s.id);
  const ligands = freeForms.filter((id) => !(metal in (data.species.get(id)?.composition ?? {})));
  return fc.record({
    metal: fc.constant(metal),
    inside: fc.constantFrom(...holding),
    outside: fc.constantFrom(...holding),
    ligands: fc.constant(ligands),
  });
});

test("components and charge are kept, coefficients are whole and have no common factor, whatever the pair", () =>
  fc.assert(
    fc.property(pairs, ({ metal, inside, outside, ligands }) => {
      fc.pre(inside !== outside);
      const terms = valueOf(balance(data, inside, outside, ligands, metal));
      const totals = new Map<string, number>();
      for (const { species, coefficient } of terms) {
        expect(Number.isInteger(coefficient)).toBe(true);
        const known = data.species.get(species);
        const charge = known?.charge ?? -1;
        totals.set("charge", (totals.get("charge") ?? 0) + coefficient * charge);
        for (const [c, n] of Object.entries(known?.composition ?? {}))
          totals.set(c, (totals.get(c) ?? 0) + coefficient * n);
      }
      for (const sum of totals.values()) expect(Math.abs(sum)).toBeLessThan(1e-9);
      const divisor = terms.reduce((g, t) => { let [a, b] = [g, Math.abs(t.coefficient)]; while (b) [a, b] = [b, a % b]; return a; }, 0); // prettier-ignore
      expect(divisor).toBe(1);
      expect(terms[0]?.species).toBe(inside);
      expect(terms.find((t) => t.species === outside)?.coefficient).toBeGreaterThan(0);
    }),
    { seed: 40, numRuns: 500 },
  ));

test("the reverse reaction is the same reaction", () =>
  fc.assert(
    fc.property(pairs, ({ metal, inside, outside, ligands }) => {
      fc.pre(inside !== outside);
      const there = valueOf(balance(data, inside, outside, ligands, metal));
      const back = valueOf(balance(data, outside, inside, ligands, metal));
      const sorted = (terms: typeof there, sign: number) =>
        terms.map((t) => `${t.species} ${sign * t.coefficient}`).sort();
      expect(sorted(back, -1)).toEqual(sorted(there, 1));
    }),
    { seed: 41, numRuns: 200 },
  ));
