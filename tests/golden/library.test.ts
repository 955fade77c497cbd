import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { davies } from "../../shared/activity/davies";
import { debyeHuckelA, extendedDebyeHuckel } from "../../shared/activity/debyeHuckel";
import { protonatedShare } from "../../shared/activity/protonation";
import { FARADAY, GAS_CONSTANT, LN10 } from "../../shared/constants";
import { nernstSlope, toSHE } from "../../shared/electrodes/convert";
import { electrodeSeries } from "../../shared/electrodes/series";
import { energiesAt } from "../../shared/gibbs/energies";
import { pKwaterMarshallFranck } from "../../shared/gibbs/water";
import { valueOf } from "../../shared/outcome";
import { balance } from "../../shared/reactions/balance";
import { parseFormula } from "../../shared/species/formula";
import { parseReaction } from "../../shared/species/reaction";
import { kelvin, type Kelvin } from "../../shared/units";
import { chemistry } from "../support/chemistry";
import { checkRows, type CheckRow } from "../support/csv";
import { deposits, massRatios } from "./checkMasses";
import { checkReactions, type CheckReaction } from "./checkReactions";

/** Published values against the library: one runner over tests/golden/checks.csv. Boundary rows are about the Atlas's own potentials and
 *  run with those (boundaries.test.ts). */
const data = chemistry();
const rows = checkRows();
const celsius = ({ conditions }: CheckRow) => Number(/^(\d+) C/.exec(conditions)?.[1] ?? 25);

function fromReaction({ reaction, read }: CheckReaction, T: Kelvin): number {
  const energies = energiesAt(data, T);
  const { terms } = valueOf(parseReaction(reaction));
  const G = [...terms].reduce((sum, [id, n]) => sum + n * energies.of(id).G, 0);
  const logK = -G / (LN10 * GAS_CONSTANT * T);
  if (read === "E0") return G / (FARADAY * (terms.get("e^-") ?? Number.NaN));
  if (read === "K") return 10 ** logK;
  return read === "pK" ? -logK : logK;
}

function mass(formula: string): number {
  const { atoms } = valueOf(parseFormula(formula));
  return Object.entries(atoms).reduce((sum, [symbol, n]) => sum + n * (data.molarMass.get(symbol) ?? Number.NaN), 0);
}
/** g/(A h) at n electrons an atom */
const deposited = (element: string, n: number) => (3600 * mass(element)) / (n * FARADAY);

/** dE/dpH of the boundary between two species. */
function boundarySlope(inside: string, outside: string, metal: string): number {
  const terms = valueOf(balance(data, inside, outside, [], metal));
  const n = (id: string) => terms.find((t) => t.species === id)?.coefficient ?? 0;
  return -nernstSlope(kelvin(25)) * (n("H^+(aq)") / n("e^-"));
}

const electrode = (id: string) => {
  const found = electrodeSeries(data.tables).find((s) => s.id === id);
  if (found === undefined) throw new Error(id);
  return found;
};

const special: Readonly<Record<string, (row: CheckRow) => number>> = {
  "const-F": () => FARADAY,
  "const-slope25": () => nernstSlope(kelvin(25)),
  "const-slope100": () => nernstSlope(kelvin(100)),
  "const-slope150": () => nernstSlope(kelvin(150)),
  "practice-slope": () => boundarySlope("CuO(s)", "Cu2O(s)", "Cu"),
  "practice-flat": () => boundarySlope("Fe^3+(aq)", "Fe^2+(aq)", "Fe"),
  "pKw-MF-0": (row) => pKwaterMarshallFranck(kelvin(celsius(row))),
  "pKw-MF-25": (row) => pKwaterMarshallFranck(kelvin(celsius(row))),
  "pKw-MF-60": (row) => pKwaterMarshallFranck(kelvin(celsius(row))),
  "pKw-MF-100": (row) => pKwaterMarshallFranck(kelvin(celsius(row))),
  "pKw-MF-150": (row) => pKwaterMarshallFranck(kelvin(celsius(row))),
  "pKw-MF-250": (row) => pKwaterMarshallFranck(kelvin(celsius(row))),
  "act-davies-z1-0.1": () => davies(1, 0.1),
  "act-davies-z2-0.1": () => davies(2, 0.1),
  "act-davies-z3-0.1": () => davies(3, 0.1),
  "act-davies-z1-0.5": () => davies(1, 0.5),
  "act-davies-b02-z2-0.5": () => davies(2, 0.5, 0.2),
  "act-edh-H-0.1": () => extendedDebyeHuckel(1, 0.1, 9),
  "act-edh-SO4-0.1": () => extendedDebyeHuckel(2, 0.1, 4),
  "act-edh-Ca-0.1": () => extendedDebyeHuckel(2, 0.1, 6),
  "act-edh-Cl-0.01": () => extendedDebyeHuckel(1, 0.01, 3),
  "act-dh-A-25": () => debyeHuckelA(kelvin(25)),
  "act-dh-A-250": () => debyeHuckelA(kelvin(250)),
  "far-Cu-CE": () => 55 / (10 * 5 * deposited("Cu", 2)),
  "haz-HCN-10.5": () => 100 * protonatedShare(10.5, 9.21),
  "haz-HCN-8": () => 100 * protonatedShare(8, 9.21),
  "haz-H2S-7": () => 100 * protonatedShare(7, 7.05),
  "haz-AsH3-pH2": () => {
    const E0 = fromReaction(checkReactions["haz-AsH3"] as CheckReaction, kelvin(25));
    return E0 - nernstSlope(kelvin(25)) * (2 + Math.log10(1e-6) / 3);
  },
  "orp-1": () => 1000 * valueOf(toSHE(0.45, electrode("AGCL-3M"), 25)),
  "orp-2": () => 1000 * valueOf(toSHE(0.45, electrode("SCE"), 25)),
};

function valueFor(row: CheckRow): number | undefined {
  const reaction = checkReactions[row.id];
  if (reaction !== undefined) return fromReaction(reaction, kelvin(celsius(row)));
  const ratio = massRatios[row.id];
  if (ratio !== undefined) return (ratio[0] * mass(ratio[1])) / (ratio[2] * mass(ratio[3]));
  const deposit = deposits[row.id];
  if (deposit !== undefined) return deposited(...deposit);
  return special[row.id]?.(row);
}

/** Kinetics belong to the metallurgy of trials, the two stoichiometric mean coefficients to the speciated liquor; neither is built yet. */
const later = (row: CheckRow) => row.topic === "kinetics" || row.id.startsWith("act-mean-");

/** The table of docs/data.md under "Checks that are explained instead": | check | published | its source | library | its source | why | */
const explained = new Map(
  [
    ...readFileSync("docs/data.md", "utf8").matchAll(
      /^\| `([^`]+)` \| (\S+)[^|]*\|([^|]+)\| (\S+)[^|]*\|([^|]+)\|(.+)\|$/gm,
    ),
  ].map(
    ([, id = "", published, publishedSource = "", library, librarySource = "", why = ""]) =>
      [id, { published: Number(published), publishedSource, library: library ?? "", librarySource, why }] as const,
  ),
);

describe.each([...new Set(rows.map((r) => r.topic).filter((t) => t !== "boundary" && t !== "kinetics"))])(
  "%s",
  (topic) => {
    test.each(
      rows.filter((r) => r.topic === topic && !later(r) && !explained.has(r.id)).map((r) => [r.id, r] as const),
    )("%s", (_, row) => expect(Math.abs((valueFor(row) ?? NaN) - row.value)).toBeLessThanOrEqual(row.tolerance));
  },
);

test("every row is run, explained, a boundary, or waits for its part of the product", () => {
  const idle = rows.filter(
    (r) => r.topic !== "boundary" && !later(r) && !explained.has(r.id) && valueFor(r) === undefined,
  );
  expect(idle.map((r) => r.id)).toEqual([]);
  expect(rows.filter(later).length).toBe(12);
});

describe("checks that are explained", () => {
  test("are at most twelve", () => {
    expect(explained.size).toBeGreaterThan(0);
    expect(explained.size).toBeLessThanOrEqual(12);
  });

  test.each([...explained])(
    "%s: both values as printed, both sources, and it does miss",
    (id, { published, publishedSource, library, librarySource, why }) => {
      const row = rows.find((r) => r.id === id);
      if (row === undefined) throw new Error(`docs/data.md explains ${id}, which checks.csv does not have`);
      const value = valueFor(row) ?? Number.NaN;
      expect(published).toBe(row.value);
      expect(publishedSource).toContain(row.source);
      expect(value).toBeCloseTo(Number(library), library.split(".")[1]?.length ?? 0);
      for (const code of librarySource.match(/[A-Z][A-Z0-9-]+/g) ?? [])
        expect(data.tables.references.some((r) => r.code === code)).toBe(true);
      expect(why.trim().length).toBeGreaterThan(30);
      expect(Math.abs(value - row.value)).toBeGreaterThan(row.tolerance);
    },
  );
});
