import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { parseFormula } from "../../../shared/species/formula";
import { formulaPlain, typeset } from "../../../shared/species/typeset";
import { chemistry } from "../../support/chemistry";

const read = (text: string) => {
  const outcome = parseFormula(text);
  return outcome.ok ? { ...outcome.value.atoms, charge: outcome.value.charge } : outcome.error.message;
};

describe("a formula is read", () => {
  test.each([
    ["Cu(NH3)4^2+", { Cu: 1, N: 4, H: 12, charge: 2 }],
    ["KFe3(SO4)2(OH)6", { K: 1, Fe: 3, S: 2, O: 14, H: 6, charge: 0 }],
    ["CuSO4.5H2O", { Cu: 1, S: 1, O: 9, H: 10, charge: 0 }],
    ["CuSO4·5H2O", { Cu: 1, S: 1, O: 9, H: 10, charge: 0 }],
    ["FeAsO4.2H2O", { Fe: 1, As: 1, O: 6, H: 4, charge: 0 }],
    ["MgSO4.H2O", { Mg: 1, S: 1, O: 5, H: 2, charge: 0 }],
    ["CaSO4.0.5H2O", { Ca: 1, S: 1, O: 4.5, H: 1, charge: 0 }],
    ["Fe4.5Ni4.5S8", { Fe: 4.5, Ni: 4.5, S: 8, charge: 0 }],
    ["Fe0.9S", { Fe: 0.9, S: 1, charge: 0 }],
    ["(H3O)Fe3(SO4)2(OH)6", { H: 9, O: 15, Fe: 3, S: 2, charge: 0 }],
    ["Ca4(OH)2(AsO4)2.4H2O", { Ca: 4, O: 14, H: 10, As: 2, charge: 0 }],
    ["Fe(CN)6^4-", { Fe: 1, C: 6, N: 6, charge: -4 }],
    ["Pt((CN)2)2^2-", { Pt: 1, C: 4, N: 4, charge: -2 }],
    ["H^+", { H: 1, charge: 1 }],
    ["e^-", { charge: -1 }],
    ["CO", { C: 1, O: 1, charge: 0 }],
    ["Co", { Co: 1, charge: 0 }],
  ])("%s", (text, expected) => expect(read(text)).toEqual(expected));

  test.each([
    ["", "character 1: an element is missing here"],
    ["Cu(NH3", 'character 3: a "(" that is never closed'],
    ["CuNH3)4", 'character 6: a ")" that closes nothing'],
    ["Cu()", "character 3: an empty bracket"],
    ["Xq2", 'character 1: "Xq" is no element'],
    ["FeSo4", 'character 3: "So" is no element'],
    ["cu^2+", 'character 1: "c" where an element should stand'],
    ["Fe0", "character 3: a subscript of zero"],
    ["Fe^+3", "character 3: a charge is written number before sign"],
    ["Fe^3", "character 3: a charge is written number before sign"],
    ["Na^1+", 'character 4: a charge of "1+"'],
    ["Na+", 'character 3: "+" where the formula should end'],
    ["Fe 2", 'character 3: " " where the formula should end'],
    ["CuSO4.H", "character 6: a point that starts no hydrate"],
    ["2H2O", 'character 1: "2" where an element should stand'],
    ["SO4^2-x", "character 4: a charge is written number before sign"],
  ])("or refused with the place: %s", (text, message) => {
    const outcome = parseFormula(text, "species.0.formula");
    expect(outcome).toMatchObject({ ok: false, error: { code: "BAD_FORMULA", path: "species.0.formula" } });
    expect(read(text)).toContain(message);
  });

  test("any text gives a value or a failure, never an exception", () =>
    fc.assert(
      fc.property(fc.string({ unit: fc.constantFrom(..."CuFe()SO4.5H2^+-·e9") }), (text) => {
        const outcome = parseFormula(text);
        if (outcome.ok) expect(Object.values(outcome.value.atoms).every((n) => n > 0)).toBe(true);
        else expect(outcome.error.message).toMatch(/character \d+: /);
      }),
      { seed: 20, numRuns: 2000 },
    ));

  test("brackets multiply: (X)n holds n times X", () =>
    fc.assert(
      fc.property(
        fc.constantFrom("NH3", "CN", "SO4", "OH", "H2O", "S2O3"),
        fc.integer({ min: 2, max: 99 }),
        (group, n) => {
          const one = parseFormula(group);
          const many = parseFormula(`(${group})${n}`);
          if (!one.ok || !many.ok) throw new Error("both are formulas");
          for (const [symbol, count] of Object.entries(one.value.atoms))
            expect(many.value.atoms[symbol]).toBe(n * count);
        },
      ),
      { seed: 21 },
    ));
});

describe("a formula is set", () => {
  test.each([
    ["Cu(NH3)4^2+", "Cu(NH<sub>3</sub>)<sub>4</sub><sup>2+</sup>"],
    ["SO4^2-", "SO<sub>4</sub><sup>2−</sup>"],
    ["HSO4^-", "HSO<sub>4</sub><sup>−</sup>"],
    ["CuSO4.5H2O", "CuSO<sub>4</sub>·5H<sub>2</sub>O"],
    ["MgSO4.H2O", "MgSO<sub>4</sub>·H<sub>2</sub>O"],
    ["CaSO4.0.5H2O", "CaSO<sub>4</sub>·0.5H<sub>2</sub>O"],
    ["Fe4.5Ni4.5S8", "Fe<sub>4.5</sub>Ni<sub>4.5</sub>S<sub>8</sub>"],
    ["H2V10O28^4-", "H<sub>2</sub>V<sub>10</sub>O<sub>28</sub><sup>4−</sup>"],
    ["e^-", "e<sup>−</sup>"],
  ])("%s", (formula, marked) =>
    expect(
      typeset(formula)
        .map(({ text, kind }) => (kind === "plain" ? text : `<${kind}>${text}</${kind}>`))
        .join(""),
    ).toBe(marked),
  );

  test("in plain text the charge stands apart", () => expect(formulaPlain("Cu(NH3)4^2+")).toBe("Cu(NH3)4 2+"));

  test("the parts of every formula of the library read the formula again", () => {
    for (const { formula } of chemistry().species.values()) {
      const caret = formula.indexOf("^");
      const joined = typeset(formula)
        .map(({ text, kind }) => (kind === "sup" ? `^${text}` : text))
        .join("");
      expect(joined.replace("−", "-").replace("·", ".")).toBe(formula);
      expect(typeset(formula).some((p) => p.kind === "sup")).toBe(caret >= 0);
    }
  });
});
