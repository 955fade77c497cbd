import { describe, expect, test } from "vitest";
import { prepare } from "../../../shared/selection/prepare";
import { solve } from "../../../shared/solve";
import type { Failure } from "../../../shared/outcome";
import { library } from "../../support/solver";

/** Every way a question can be wrong: code, path into the input, and a sentence with the bound and the value found. */
const metal = { element: "Cu", requirement: "dissolved", activity: 1e-3 };
const good = {
  temperatureC: 25,
  metals: [metal],
  ligands: [{ component: "Cl", activity: 0.1 }],
  frame: { pH: [0, 14], Eh: [-1, 1.5] },
  controlBand: { pH: 0.15, Eh: 0.03 },
};
const but = (change: object): unknown => ({ ...good, ...change });
const copper = (change: object): unknown => but({ metals: [{ ...metal, ...change }] });
const row = (id: string): Record<string, unknown> => ({ ...library.species.get(id)!.row });

type Wrong = [what: string, input: unknown, code: Failure["code"], path: string, says: RegExp];

const shapes: Wrong[] = [
  ["null", null, "INVALID_INPUT", "", /must be an object; got null/],
  ["nothing", undefined, "INVALID_INPUT", "", /is missing$/],
  ["a number", 42, "INVALID_INPUT", "", /must be an object; got 42/],
  ["a text", "plan", "INVALID_INPUT", "", /must be an object; got "plan"/],
  ["a list", [], "INVALID_INPUT", "", /must be an object; got \[\]/],
  ["an empty object", {}, "INVALID_INPUT", "temperatureC", /^is missing$/],
  ["a key it does not know", but({ sulphateReduction: true }), "INVALID_INPUT", "sulphateReduction", /is not a field here.*got true/],
  ["a misspelt key of a metal", copper({ activty: 2 }), "INVALID_INPUT", "metals.0.activty", /is not a field here.*got 2/],
  ["a misspelt key of the water lines", but({ water: { bound: "both", oxygenv: 0.3 } }), "INVALID_INPUT", "water.oxygenv", /is not a field here/],
  ["metals that are no list", but({ metals: metal }), "INVALID_INPUT", "metals", /must be a list; got/],
  ["no metals", but({ metals: [] }), "INVALID_INPUT", "metals", /at least 1 entry; got \[\]/],
  ["seventeen metals", but({ metals: Array(17).fill(metal) }), "INVALID_INPUT", "metals", /at most 16 entries; got .{60,90}$/],
  ["a requirement it does not know", copper({ requirement: "liquid" }), "INVALID_INPUT", "metals.0.requirement", /"dissolved".*got "liquid"/],
  ["a role it does not know", copper({ role: "boss" }), "INVALID_INPUT", "metals.0.role", /got "boss"/],
  ["a solids basis it does not know", but({ solidsBasis: "old" }), "INVALID_INPUT", "solidsBasis", /"aged".*got "old"/],
  ["a water bound it does not know", but({ water: { bound: "left" } }), "INVALID_INPUT", "water.bound", /"both".*got "left"/],
  ["text for a number", but({ temperatureC: "60" }), "INVALID_INPUT", "temperatureC", /must be a number; got "60"/],
  ["one end of a frame", but({ frame: { pH: [0], Eh: [-1, 1] } }), "INVALID_INPUT", "frame.pH", /got \[0\]/],
]; // prettier-ignore

const numbers: Wrong[] = [
  ["an activity of zero", copper({ activity: 0 }), "OUT_OF_RANGE", "metals.0.activity", /above 0; got 0/],
  ["an activity below zero", copper({ activity: -2 }), "OUT_OF_RANGE", "metals.0.activity", /above 0; got -2/],
  ["an activity too large", copper({ activity: 101 }), "OUT_OF_RANGE", "metals.0.activity", /at most 100; got 101/],
  ["no number", copper({ activity: Number.NaN }), "INVALID_INPUT", "metals.0.activity", /got NaN/],
  ["infinity", copper({ activity: Infinity }), "INVALID_INPUT", "metals.0.activity", /got Infinity/],
  ["a bigint", but({ temperatureC: 25n }), "INVALID_INPUT", "temperatureC", /got 25/],
  ["a tenor of zero", copper({ activity: undefined, gPerL: 0 }), "OUT_OF_RANGE", "metals.0.gPerL", /above 0; got 0/],
  ["a tenor too large", copper({ activity: undefined, gPerL: 1001 }), "OUT_OF_RANGE", "metals.0.gPerL", /at most 1000; got 1001/],
  ["a gamma of zero", copper({ activity: undefined, gPerL: 1, gamma: 0 }), "OUT_OF_RANGE", "metals.0.gamma", /above 0; got 0/],
  ["a gamma too small", copper({ activity: undefined, gPerL: 1, gamma: 1e-7 }), "OUT_OF_RANGE", "metals.0.gamma", /at least 0.000001; got 1e-7/],
  ["activity and tenor", copper({ gPerL: 3 }), "INVALID_INPUT", "metals.0.activity", /either activity or gPerL.*got 0.001/],
  ["neither", copper({ activity: undefined }), "INVALID_INPUT", "metals.0.activity", /either activity or gPerL.*got nothing/],
  ["a temperature below 0 C", but({ temperatureC: -0.1 }), "OUT_OF_RANGE", "temperatureC", /at least 0; got -0.1/],
  ["a temperature above the range", but({ temperatureC: 250.5 }), "OUT_OF_RANGE", "temperatureC", /at most 250; got 250.5/],
  ["a ligand's total of zero", but({ ligands: [{ component: "Cl", activity: 0 }] }), "OUT_OF_RANGE", "ligands.0.activity", /above 0; got 0/],
  ["another component's total below zero", but({ others: [{ component: "K", activity: -1 }] }), "OUT_OF_RANGE", "others.0.activity", /above 0; got -1/],
  ["a frame upside down", but({ frame: { pH: [14, 0], Eh: [-1, 1] } }), "INVALID_INPUT", "frame.pH", /lower end.*got \[14,0\]/],
  ["a frame of no height", but({ frame: { pH: [0, 14], Eh: [1, 1] } }), "INVALID_INPUT", "frame.Eh", /lower end.*got \[1,1\]/],
  ["a frame thinner than a reading", but({ frame: { pH: [0, 14], Eh: [1, 1.0005] } }), "INVALID_INPUT", "frame.Eh", /at least 0.001.*got/],
  ["a frame beyond any liquor", but({ frame: { pH: [0, 31], Eh: [-1, 1] } }), "OUT_OF_RANGE", "frame.pH.1", /at most 30; got 31/],
  ["a control band of zero", but({ controlBand: { pH: 0, Eh: 0.03 } }), "OUT_OF_RANGE", "controlBand.pH", /above 0; got 0/],
  ["a control band no loop can hold", but({ controlBand: { pH: 0.1, Eh: 1e-5 } }), "OUT_OF_RANGE", "controlBand.Eh", /at least 0.0001; got 0.00001/],
  ["an overpotential below zero", but({ water: { bound: "both", oxygenV: -0.1 } }), "OUT_OF_RANGE", "water.oxygenV", /at least 0; got -0.1/],
]; // prettier-ignore

const chemistry: Wrong[] = [
  ["a metal that is none", copper({ element: "Xx" }), "UNKNOWN_METAL", "metals.0.element", /"Xx" is not an element/],
  ["hydrogen", copper({ element: "H" }), "UNKNOWN_METAL", "metals.0.element", /"H" is not an element/],
  ["a ligand for a metal", copper({ element: "S" }), "UNKNOWN_METAL", "metals.0.element", /S is no metal/],
  ["a group for a metal", copper({ element: "NH3" }), "UNKNOWN_METAL", "metals.0.element", /NH3 is no metal/],
  ["a metal without species", copper({ element: "Ti" }), "UNKNOWN_METAL", "metals.0.element", /no species of Ti is left/],
  ["a metal whose species are all left out", but({ only: ["Zn(s)"] }), "UNKNOWN_METAL", "metals.0.element", /no species of Cu is left/],
  ["a metal twice", but({ metals: [metal, metal] }), "INVALID_INPUT", "metals.1.element", /Cu stands twice/],
  ["a metal that has a total as well", but({ metals: [{ ...metal, element: "K" }], others: [{ component: "K", activity: 1 }] }), "INVALID_INPUT", "metals.0.element", /both a metal and a component/],
  ["a component that is none", but({ ligands: [{ component: "Qq", activity: 1 }] }), "UNKNOWN_COMPONENT", "ligands.0.component", /"Qq" is not a component/],
  ["oxygen as a ligand", but({ ligands: [{ component: "O", activity: 1 }] }), "UNKNOWN_COMPONENT", "ligands.0.component", /"O" is not a component/],
  ["another metal as a component", but({ others: [{ component: "Fe", activity: 1 }] }), "UNKNOWN_COMPONENT", "others.0.component", /Fe is a metal/],
  ["a component twice", but({ others: [{ component: "Cl", activity: 1 }] }), "INVALID_INPUT", "others.0.component", /Cl has two totals/],
  ["a component without species", but({ leftOut: [...library.species.keys()].filter((id) => id.includes("Cl")) }), "UNKNOWN_COMPONENT", "ligands.0.component", /Cl has no species left/],
  ["sulfide sulfur with one pool", but({ sulfateReduction: true, ligands: [{ component: "S(sulfide)", activity: 1 }] }), "INVALID_INPUT", "ligands.0.component", /one pool: give its total as S/],
  ["a feed mineral without its ligand", but({ feedMinerals: ["CuO(s,tenorite)", "CuS(s)"].slice(-1) }), "LIGAND_MISSING", "feedMinerals.0", /^CuS\(s\) needs S\(sulfide\), .*: give S\(sulfide\) \(sulfide\) a total, or take covellite out of feedMinerals$/],
  ["a species put back without its partner", but({ metals: [{ ...metal, element: "Fe" }], ligands: [{ component: "S", activity: 1 }], putBack: ["KFe3(SO4)2(OH)6(s,jarosite)"] }), "LIGAND_MISSING", "putBack.0", /needs K, which has no total/],
  ["a species alone without its ligand", but({ only: ["Cu(s)", "Cu(NH3)4^2+(aq)"] }), "LIGAND_MISSING", "only.1", /needs NH3/],
  ["a feed mineral that is none", but({ feedMinerals: ["CuQ(s)"] }), "UNKNOWN_SPECIES", "feedMinerals.0", /"CuQ\(s\)" is not a species/],
  ["a species left out that is none", but({ leftOut: ["Cu(s)", "nothing"] }), "UNKNOWN_SPECIES", "leftOut.1", /"nothing" is not a species/],
]; // prettier-ignore

const ownRows: Wrong[] = [
  ["without a formula", but({ species: [{ id: "Cu(s,own)" }] }), "INVALID_INPUT", "species.0.formula", /^is missing$/],
  ["that is no object", but({ species: [7] }), "INVALID_INPUT", "species.0", /must be an object; got 7/],
  ["whose charge is not its formula's", but({ species: [{ ...row("CuO(s)"), id: "CuO(s,own)", charge: 1 }] }), "BAD_DATA", "species.0.charge", /1, but the formula CuO says 0/],
  ["given twice", but({ species: [row("CuO(s)"), row("CuO(s)")] }), "BAD_DATA", "species.1.id", /given twice/],
  ["with an energy off any scale", but({ species: [{ ...row("CuO(s)"), dGf_kJ: 2e5, dHf_kJ: null, S_J: null }] }), "OUT_OF_RANGE", "species.0.dGf_kJ", /at most 100000.*got 200000/],
  ["with fractions the grid cannot hold", but({ species: [{ ...row("CuO(s)"), id: "Cu1.377O(s)", formula: "Cu1.377O", composition: "Cu:1.377 O:1", dHf_kJ: null, S_J: null }] }), "BAD_DATA", "species.0.composition", /no finer than a twelfth; got Cu:1.377 O:1/],
  ["that others are counted from, without entropy", but({ temperatureC: 60, species: [{ ...row("Cl^-(aq)"), dHf_kJ: null, S_J: null }] }), "BAD_DATA", "species.0.S_J", /Cl\^-\(aq\) needs its entropy/],
  ["for the element itself, without entropy", but({ temperatureC: 60, species: [{ ...row("Cu(s)"), dGf_kJ: 1, dHf_kJ: null, S_J: null }] }), "BAD_DATA", "species.0.S_J", /Cu\(s\) needs its entropy/],
]; // prettier-ignore

test("the question that all of them start from is right", () => expect(prepare(good, library).ok).toBe(true));

describe.each([
  ["shape", shapes],
  ["numbers", numbers],
  ["chemistry", chemistry],
  ["own species", ownRows],
] as const)("wrong %s", (_, list) => {
  test.each(list)("%s", (_what, input, code, path, says) => {
    const outcome = prepare(input, library);
    expect(outcome).toMatchObject({ ok: false, error: { code, path } });
    if (!outcome.ok) expect(outcome.error.message).toMatch(says);
    expect(solve(input, library)).toEqual(outcome);
  });
});
