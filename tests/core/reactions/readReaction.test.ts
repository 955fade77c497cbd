import { describe, expect, test } from "vitest";
import { valueOf } from "../../../shared/outcome";
import { findSpecies, nearNames } from "../../../shared/reactions/names";
import { readReaction } from "../../../shared/reactions/readReaction";
import { chemistry } from "../../support/chemistry";

const data = chemistry();
const copper = { "Cu^2+(aq)": -1, "e^-": -2, "Cu(s)": 1 };
const refusal = (text: string) => {
  const outcome = readReaction(data, text);
  if (outcome.ok) throw new Error(`"${text}" should be refused`);
  return outcome.error;
};

describe("one reaction in many hands", () => {
  test.each([
    "Cu^2+ + 2 e^- = Cu",
    "Cu^2++2e^-=Cu",
    "Cu^2+(aq) + 2 e^- = Cu(s)",
    "Cu²⁺ + 2 e⁻ ⇌ Cu",
    "Cu²⁺ + 2e- → Cu",
    "  2 e^-  +  Cu^2+  ->  Cu ",
    "Cu^2+ + 4/2 e^- = 1.0 Cu",
    "Cu + Cu^2+ + 2 e^- = 2 Cu",
  ])("%s", (text) => expect(valueOf(readReaction(data, text)).species).toEqual(copper));
});

describe("names and phases", () => {
  test.each<[string, string]>([
    ["H2O", "H2O(l)"],
    ["O2", "O2(g)"],
    ["S", "S(s,rhombic)"],
    ["Hg", "Hg(l)"],
    ["CuO", "CuO(s)"],
    ["Fe2O3", "Fe2O3(s,hematite)"],
    ["Fe2O3(s)", "Fe2O3(s,hematite)"],
    ["goethite", "FeOOH(s,goethite)"],
    ["CaSO4·2H2O", "CaSO4.2H2O(s,gypsum)"],
    ["CO2(g)", "CO2(g)"],
    ["SO₄²⁻", "SO4^2-(aq)"],
    ["e-", "e^-"],
  ])("%s is %s", (typed, id) => expect(valueOf(findSpecies(data, typed)).id).toBe(id));

  test("what was chosen for the user is said", () => {
    expect(valueOf(readReaction(data, "2 H2 + O2 = 2 H2O")).assumed).toEqual([
      "H2 read as H2(g)",
      "O2 read as O2(g)",
      "H2O read as H2O(l)",
    ]);
    expect(valueOf(readReaction(data, "CuO + 2 H^+ = Cu^2+ + H2O(l)")).assumed).toEqual([]);
  });

  test.each([
    ["FeOOH + 3 H^+ = Fe^3+ + 2 H2O", ["FeOOH(s,goethite)", "FeOOH(s,lepidocrocite)"]],
    ["NH3 + H^+ = NH4^+", ["NH3(aq)", "NH3(g)"]],
    ["PbSO4 = Pb^2+ + SO4^2-", ["PbSO4(s)", "PbSO4(aq)"]],
  ])("%s is ambiguous, and lists what it may be", (text, candidates) => {
    const error = refusal(text);
    expect(error.code).toBe("AMBIGUOUS_SPECIES");
    for (const id of candidates) expect(error.message).toContain(id);
  });

  test.each([
    ["Cu2+(aq)", "Cu^2+(aq)"],
    ["hemtite", "Fe2O3(s,hematite)"],
    ["so4^2-(aq)", "SO4^2-(aq)"],
    ["AuCN2^-", "Au(CN)2^-(aq)"],
    ["NH4+(aq)", "NH4^+(aq)"],
  ])("near %s stands %s first", (typed, id) => expect(nearNames(data, typed)[0]).toBe(id));
  test("far from everything there is no guess", () => expect(nearNames(data, "unobtainium")).toEqual([]));
});

test("every formula with a charge, and every id, is read back as itself", () => {
  for (const { id, formula, charge } of data.species.values()) {
    expect(valueOf(findSpecies(data, id)).id).toBe(id);
    expect(valueOf(readReaction(data, `2 ${id} = e^-`)).species[id], id).toBe(-2);
    if (charge !== 0) expect(valueOf(findSpecies(data, formula)).id).toBe(id);
  }
});

describe("what cannot be read", () => {
  test.each([
    ["Cu^2+ + 2 e^-", /two sides/],
    ["Cu^2+ = Cu = Cu", /two sides/],
    ["Cu2+ + 2 e^- = Cu", /term is missing.*charge is written/],
    ["Cu^2+ + = Cu", /term is missing/],
    ["= Cu", /term is missing/],
    ["Cu = Cu", /both sides are the same/],
    ["Xq^2+ = Cu", /not in the library/],
  ])("%s", (text, message) => expect(refusal(text).message).toMatch(message));
});
