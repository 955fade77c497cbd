import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { GAS_CONSTANT } from "../../../shared/constants";
import { valueOf } from "../../../shared/outcome";
import { reactionAtT } from "../../../shared/reactions/atTemperature";
import { reactionDesk, reactionSeries } from "../../../shared/reactions/desk";
import { readReaction } from "../../../shared/reactions/readReaction";
import { chemistry } from "../../support/chemistry";

const data = chemistry();
const desk = (reaction: string, temperatureC = 25) => valueOf(reactionDesk(data, { reaction, temperatureC }));
const speciesOf = (text: string) => valueOf(readReaction(data, text)).species;
const refusal = (input: unknown) => {
  const outcome = reactionDesk(data, input);
  if (outcome.ok) throw new Error("this should be refused");
  return outcome.error;
};

describe("standard potentials of the handbook (CRC; OpenStax Chemistry, appendix L), typed as printed", () => {
  test.each<[string, number, number]>([
    ["Cu^2+ + 2 e^- = Cu", 0.34, 0.003],
    ["Zn^2+ + 2 e^- = Zn", -0.762, 0.002],
    ["Fe^3+ + e^- = Fe^2+", 0.771, 0.003],
    ["O2 + 4 H^+ + 4 e^- = 2 H2O", 1.229, 0.001],
    ["MnO2(s,pyrolusite) + 4 H^+ + 2 e^- = Mn^2+ + 2 H2O", 1.23, 0.01],
    ["Cl2(g) + 2 e^- = 2 Cl^-", 1.35827, 0.002],
    ["Ag(NH3)2^+ + e^- = Ag + 2 NH3(aq)", 0.373, 0.005],
    ["2 H^+ + 2 e^- = H2", 0, 1e-12],
  ])("%s: %d V", (text, E0, tolerance) => {
    expect(Math.abs(desk(text).E0_V! - E0)).toBeLessThanOrEqual(tolerance);
  });

  test("an oxidation as written gives the same reduction potential", () => {
    expect(desk("Zn = Zn^2+ + 2 e^-").E0_V).toBeCloseTo(desk("Zn^2+ + 2 e^- = Zn").E0_V!, 12);
    expect(desk("Zn = Zn^2+ + 2 e^-").dG_kJ).toBeLessThan(0);
  });

  test("without electrons there is no potential", () => expect(desk("CuO(s) + 2 H^+ = Cu^2+ + H2O").E0_V).toBeNull());
});

describe("enthalpy by Gibbs-Helmholtz", () => {
  test.each<[string, number, number, number]>([
    // dHf of CODATA (Cox, Wagman and Medvedev 1989)
    ["H2 + 0.5 O2 = H2O", 25, -285.83, 0.01],
    ["H2 + 0.5 O2 = H2O(g)", 25, -241.826, 0.02],
    ["0.5 H2 + 0.5 Cl2(g) = HCl(g)", 25, -92.31, 0.02],
    ["Zn + 0.5 O2 = ZnO", 25, -350.46, 0.3],
    // heat of vaporisation at the boiling point (steam tables): 40.66 kJ/mol, real vapour; the ideal gas at 1 bar lies 0.2 above
    ["H2O(l) = H2O(g)", 100, 40.86, 0.15],
    // ionisation of water: 55.81 kJ/mol (CODATA); the slope of the IAPWS R11-07 curve, which OH^- follows, gives 56.4
    ["H2O = H^+ + OH^-", 25, 55.81, 0.6],
    // second ionisation of sulfuric acid from the curve of Dickson and others 1990: -22.8 kJ/mol
    ["HSO4^- = H^+ + SO4^2-", 25, -22.8, 0.5],
  ])("%s at %d C: %d kJ", (text, T, dH, tolerance) => {
    expect(Math.abs(desk(text, T).dH_kJ - dH)).toBeLessThanOrEqual(tolerance);
  });

  test("van 't Hoff: the slope of ln K over 1/T is -dH/R, at every T and at both ends of the range", () => {
    fc.assert(
      fc.property(
        fc.constantFrom("Fe2O3(s,hematite) + 6 H^+ = 2 Fe^3+ + 3 H2O", "CuO(s) + 2 H^+ = Cu^2+ + H2O", "2 H2S(g) + O2 = 2 S + 2 H2O"),
        fc.double({ min: 1, max: 249, noNaN: true }),
        (text, T) => {
          const [a, b, c] = [T - 0.5, T, T + 0.5].map((t) => desk(text, t));
          const slope = ((c!.logK - a!.logK) * Math.LN10) / (1 / (c!.temperatureC + 273.15) - 1 / (a!.temperatureC + 273.15));
          expect(Math.abs(-GAS_CONSTANT * slope - 1000 * b!.dH_kJ)).toBeLessThan(150); // J; Cp of the ions jumps at 25 C
        },
      ),
      { numRuns: 60 },
    ); // prettier-ignore
    for (const T of [0, 250])
      expect(
        Math.abs(desk("H2 + 0.5 O2 = H2O", T).dH_kJ - desk("H2 + 0.5 O2 = H2O", Math.abs(T - 1)).dH_kJ),
      ).toBeLessThan(0.1);
  });

  test("dG = dH - T dS", () => {
    for (const T of [0, 25, 80, 250]) {
      const r = desk("ZnS(s,sphalerite) + 2 H^+ = Zn^2+ + H2S(g)", T);
      expect(r.dH_kJ - ((T + 273.15) * r.dS_J) / 1000).toBeCloseTo(r.dG_kJ, 9);
    }
  });
});

test("the numbers go with the reaction as written: doubled, all but E0 double; turned round, they change sign", () => {
  const once = desk("Fe^3+ + e^- = Fe^2+", 60);
  const twice = desk("2 Fe^3+ + 2 e^- = 2 Fe^2+", 60);
  const back = desk("Fe^2+ = Fe^3+ + e^-", 60);
  expect(twice.logK).toBeCloseTo(2 * once.logK, 9);
  expect(twice.dH_kJ).toBeCloseTo(2 * once.dH_kJ, 6);
  expect(twice.E0_V).toBeCloseTo(once.E0_V!, 12);
  expect(back.logK).toBeCloseTo(-once.logK, 12);
});

describe("where the numbers come from", () => {
  test("every species but the conventions has grade, source and model; the worst grade stands for the reaction", () => {
    const r = desk("Fe2O3(s,hematite) + 6 H^+ = 2 Fe^3+ + 3 H2O");
    expect(r.grades.map((g) => g.species)).toEqual(["Fe2O3(s,hematite)", "Fe^3+(aq)", "H2O(l)"]);
    expect(r.grade).toBe("B");
    for (const g of r.grades) expect(g.source + g.model).not.toBe("");
  });
  test("beyond a trusted range it says so", () => {
    expect(desk("Cu(NH3)4^2+ = Cu^2+ + 4 NH3(aq)", 25).warnings).toEqual([]);
    expect(desk("Cu(NH3)4^2+ = Cu^2+ + 4 NH3(aq)", 140).warnings.join()).toMatch(/trusted/);
  });
  test("above 100 C gases are absolute", () =>
    expect(desk("2 H^+ + 2 e^- = H2", 180).warnings.join()).toMatch(/absolute/));
  test("a ligand group that the maps never break is named", () =>
    expect(desk("2 NH3(aq) = N2 + 3 H2").warnings.join()).toMatch(/group NH3/));
});

describe("a series over T", () => {
  test("rows rise from end to end and agree with single questions", () => {
    const species = speciesOf("Cu^2+ + 2 e^- = Cu");
    const rows = valueOf(reactionSeries(data, species, { fromC: 0, toC: 250, stepC: 12.5 }));
    expect(rows.map((r) => r.temperatureC)).toEqual(Array.from({ length: 21 }, (_, i) => i * 12.5));
    for (const row of rows)
      expect(valueOf(reactionAtT(data, { species, temperatureC: row.temperatureC }))).toMatchObject(row);
  });
  test("it comes with the desk's answer", () => {
    const input = {
      reaction: "O2 + 4 H^+ + 4 e^- = 2 H2O",
      temperatureC: 25,
      series: { fromC: 0, toC: 100, stepC: 50 },
    };
    const { series } = valueOf(reactionDesk(data, input));
    // dE0/dT of the oxygen electrode at 25 C: -0.8456 mV/K (Bratsch 1989)
    expect((series![2]!.E0_V! - series![0]!.E0_V!) * 10).toBeCloseTo(-0.84, 1);
  });
  test("one that is too long, or runs backwards, is refused", () => {
    const input = { reaction: "Cu^2+ + 2 e^- = Cu", temperatureC: 25 };
    expect(refusal({ ...input, series: { fromC: 0, toC: 250, stepC: 0.01 } }).path).toBe("series.stepC");
    expect(refusal({ ...input, series: { fromC: 90, toC: 25, stepC: 5 } }).path).toBe("series.toC");
  });
});

describe("what is refused", () => {
  test("a reaction that does not balance: in what, and by how much", () => {
    expect(refusal({ species: { "Cu^2+(aq)": -1, "e^-": -1, "Cu(s)": 1 }, temperatureC: 25 })).toEqual({
      code: "UNBALANCED",
      path: "species",
      message: "the right-hand side is off in charge by -1",
    });
    expect(refusal({ reaction: "Fe2O3 + 6 H^+ = Fe^3+ + 3 H2O", temperatureC: 25 })).toEqual({
      code: "UNBALANCED",
      path: "reaction",
      message: "the right-hand side is off in Fe by -1, charge by -3",
    });
  });
  test("an unknown id, with what may have been meant", () => {
    const error = refusal({ species: { "Cu2+(aq)": -1, "Cu(s)": 1 }, temperatureC: 25 });
    expect(error).toMatchObject({ code: "UNKNOWN_SPECIES", path: "species.Cu2+(aq)" });
    expect(error.message).toContain("Cu^2+(aq)");
  });
  test.each<[string, unknown, string, string]>([
    ["a temperature beyond the models", { species: { "Cu(s)": 1 }, temperatureC: 251 }, "OUT_OF_RANGE", "temperatureC"],
    ["a coefficient of zero", { species: { "Cu(s)": 0 }, temperatureC: 25 }, "INVALID_INPUT", "species.Cu(s)"],
    ["a coefficient that is text", { species: { "Cu(s)": "1" }, temperatureC: 25 }, "INVALID_INPUT", "species.Cu(s)"],
    ["no species", { species: {}, temperatureC: 25 }, "INVALID_INPUT", "species"],
    ["neither species nor text", { temperatureC: 25 }, "INVALID_INPUT", "species"],
    ["both", { species: { "Cu(s)": 1 }, reaction: "Cu = Cu", temperatureC: 25 }, "INVALID_INPUT", "species"],
    ["no temperature", { species: { "Cu(s)": 1 } }, "INVALID_INPUT", "temperatureC"],
    ["nothing", null, "INVALID_INPUT", ""],
  ])("%s", (_what, input, code, path) => expect(refusal(input)).toMatchObject({ code, path }));
});
