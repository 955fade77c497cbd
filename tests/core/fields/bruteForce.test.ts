import { describe, expect, test } from "vitest";
import type { Problem } from "../../../shared/schemas/problem";
import type { Field } from "../../../shared/solution";
import { oracleFor, type Oracle } from "../../support/oracle";
import { metalsOfLibrary } from "../../support/oracleSpecies";
import { ownerAt } from "../../support/owner";
import { presetChoice, presetsOfData, reductionOf } from "../../support/presets";
import { seeded, type Random } from "../../support/random";
import { library, solved, wideFrame } from "../../support/solver";

/** The field's owner is the cheapest species, tried one by one (tests/support/oracle.ts): for every metal of the library in
 *  water and in each lixiviant preset, on each solids basis, at temperatures from 0 to 150 C. */
const BASES = [undefined, "aged", "fresh"] as const;
const UNIFORM = 667; // x 3 bases: 2001 points for each metal in each preset
const NEAR_CORNERS = 60;
const TIE = 1e-3; // J/mol
/** On purpose close to where fields meet the solver's grid may show: its prices of a proton and an electron are within 2^-11
 *  J/mol, which moves a line by up to 1e-6 pH. */
const TIE_NEAR_CORNERS = 0.1;

const metals = metalsOfLibrary(library).filter((m) => m !== "Ti"); // the library has no species of titanium without iron

function problemOf(metal: string, preset: string, solidsBasis: (typeof BASES)[number], random: Random): Problem {
  return {
    temperatureC: random.between(0, 150),
    metals: [{ element: metal, requirement: "free", activity: random.decade(-8, 0) }],
    ...presetChoice(preset),
    ...reductionOf(preset),
    ...(solidsBasis ? { solidsBasis } : {}),
    frame: wideFrame,
    controlBand: { pH: 0.15, Eh: 0.03 },
  };
}

/** Points anywhere in the frame, and points where fields meet: next to the corners of the fields drawn. */
function* pointsFor(fields: readonly Field[], random: Random): Generator<[pH: number, Eh: number, tie: number]> {
  const { pH, Eh } = wideFrame;
  for (let i = 0; i < UNIFORM; i++) yield [random.between(...pH), random.between(...Eh), TIE];
  for (let i = 0; i < NEAR_CORNERS; i++) {
    const corner = random.pick(random.pick(fields).polygon);
    const reach = random.decade(-4, -1);
    const p = [corner[0] + reach * random.between(-1, 1), corner[1] + 0.06 * reach * random.between(-1, 1)] as const;
    if (p[0] > pH[0] && p[0] < pH[1] && p[1] > Eh[0] && p[1] < Eh[1]) yield [...p, TIE_NEAR_CORNERS];
  }
}

function complaint(
  oracle: Oracle,
  fields: readonly Field[],
  metal: string,
  [pH, Eh, tie]: [number, number, number],
): string | null {
  const cheapest = oracle.cheapest(metal, pH, Eh);
  if (cheapest.lead < tie) return null;
  const owner = ownerAt(fields, pH, Eh);
  if (owner?.species === cheapest.species.id && owner.state === cheapest.state) return null;
  return `pH ${pH}, ${Eh} V: ${owner?.species} drawn, ${cheapest.species.id} is cheaper by at least ${cheapest.lead} J/mol`;
}

describe("every field's owner is the cheapest species", () => {
  test.each(metals)("%s", (metal) => {
    const random = seeded(20261201 + metals.indexOf(metal));
    const complaints: string[] = [];
    for (const preset of presetsOfData)
      for (const basis of BASES) {
        const problem = problemOf(metal, preset, basis, random);
        const { fields } = solved(problem);
        const oracle = oracleFor(problem, library);
        for (const point of pointsFor(fields, random)) {
          const wrong = complaint(oracle, fields, metal, point);
          if (wrong) complaints.push(`${preset}, ${basis ?? "no basis"}, ${problem.temperatureC} C, ${wrong}`);
        }
      }
    expect(complaints).toEqual([]);
  });

  test("28 metals in 10 presets", () => expect([metals.length, presetsOfData.length]).toEqual([28, 10]));
});
