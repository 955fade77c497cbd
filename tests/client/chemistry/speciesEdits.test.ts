import { describe, expect, test } from "vitest";
import type { SpeciesRow } from "../../../shared/schemas/chemistry";
import {
  blankSpecies,
  compositionOf,
  differencesOf,
  fromFormula,
  inFormWords,
} from "../../../src/features/speciesEdits/editModel";

const zincite: SpeciesRow = { ...blankSpecies, id: "ZnO(s)", formula: "ZnO", phase: "s", dGf_kJ: -320.5, S_J: 43.7, source: "X1", composition: "Zn:1 O:1" }; // prettier-ignore

describe("a species of the site's own", () => {
  test("its id, charge and composition follow the formula", () => {
    expect(fromFormula(blankSpecies, "Zn^2+", "")).toMatchObject({ id: "Zn^2+(aq)", charge: 2, composition: "Zn:1" });
    expect(fromFormula({ ...blankSpecies, phase: "s" }, "FeOOH", "goethite").id).toBe("FeOOH(s,goethite)");
  });
  test("a composition written by hand is not overwritten while the formula is typed on", () => {
    const own = { ...fromFormula(blankSpecies, "Zn(NH3)2^2+", ""), composition: "Zn:1 NH3:2" };
    expect(fromFormula(own, "Zn(NH3)3^2+", "").composition).toBe("Zn:1 NH3:2");
    expect(fromFormula(fromFormula(blankSpecies, "ZnO", ""), "ZnO2", "").composition).toBe(compositionOf("ZnO2"));
  });
  test("half a formula is kept as typed", () => expect(fromFormula(blankSpecies, "Zn(", "")).toMatchObject({ formula: "Zn(", charge: 0 })); // prettier-ignore
});

describe("what an edit changed", () => {
  test("numbers with their unit, a blank as not known", () => {
    const row = { ...zincite, dGf_kJ: -320.9, S_J: null, source: "" };
    expect(differencesOf(zincite, { row })).toEqual([
      { label: "G of formation", from: "\u2212320.5 kJ/mol", to: "\u2212320.9 kJ/mol" },
      { label: "Entropy", from: "43.7 J/(mol K)", to: "not known" },
    ]);
  });
  test("against nothing, for a species that was not there", () =>
    expect(differencesOf(null, { row: zincite })[0]).toEqual({
      label: "G of formation",
      from: "",
      to: "\u2212320.5 kJ/mol",
    }));
});

test("a refusal of the library is said in the words of the form", () => {
  expect(inFormWords("ZnO(s), dGf_kJ: -300 differs by 20.53 kJ/mol from dHf_kJ and S_J; at most 1 is allowed")).toBe(
    "\u2212300 differs by 20.53 kJ/mol from H and S; at most 1 is allowed",
  );
  expect(inFormWords("FeOOH(s,goethite), composition: holds Fe 1")).toBe("holds Fe 1");
});
