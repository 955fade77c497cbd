import { readFileSync } from "node:fs";
import { evaluate } from "mathjs";
import { describe, expect, test } from "vitest";
import { FARADAY, GAS_CONSTANT, LN10, T_REFERENCE } from "../../shared/constants";
import { absoluteEntropy, correspondenceIntegral } from "../../shared/gibbs/correspondence";
import { energiesAt } from "../../shared/gibbs/energies";
import * as published from "../../shared/gibbs/equilibria";
import { gibbsShift, koppHeatCapacity } from "../../shared/gibbs/heatCapacity";
import { pKwater } from "../../shared/gibbs/water";
import { valueOf } from "../../shared/outcome";
import { parseFormula } from "../../shared/species/formula";
import { parseReaction } from "../../shared/species/reaction";
import { kelvin } from "../../shared/units";
import { chemistry } from "../support/chemistry";
import { csvRows } from "../support/csv";

/** docs/method.md, section 1: its worked examples and its measured errors are what the code gives, to the digit printed. */
const data = chemistry();
const page = readFileSync("docs/method.md", "utf8");

function reactionG(text: string, t: number): number {
  const energies = energiesAt(data, kelvin(t));
  return [...valueOf(parseReaction(text)).terms].reduce((sum, [id, n]) => sum + n * energies.of(id).G, 0);
}
const pK = (text: string, t: number) => reactionG(text, t) / (LN10 * GAS_CONSTANT * kelvin(t));
const steps = (lo: number, hi: number, by = 5) =>
  Array.from({ length: Math.round((hi - lo) / by) + 1 }, (_, i) => lo + by * i);
const largest = (temperatures: number[], gap: (t: number) => number) =>
  Math.max(...temperatures.map((t) => Math.abs(gap(t))));

/** pK by the entropy correspondence alone, from the S of the row, without the published K(T). */
function pKByEntropy(id: string, from: string, sign: 1 | -1, t: number): number {
  const row = data.species.get(id)?.row;
  if (row === undefined || row.S_J === null || row.ion_class === null) throw new Error(id);
  const { a, b, h } = correspondenceIntegral(data.tables.correspondence, row.ion_class, kelvin(t));
  const G = row.dGf_kJ * 1000 - (a + b * absoluteEntropy(row.S_J, row.charge) - row.charge * h);
  return (sign * (G - energiesAt(data, kelvin(t)).of(from).G)) / (LN10 * GAS_CONSTANT * kelvin(t));
}

/** Kopp's rule against every solid that has a heat capacity of its own: relative errors, rising. */
const kopp = [...data.species.values()]
  .filter((s) => s.phase === "s" && s.row.Cp_J !== null)
  .map((s) => Math.abs(koppHeatCapacity(valueOf(parseFormula(s.formula)).atoms) / (s.row.Cp_J ?? NaN) - 1))
  .sort((p, q) => p - q);
const koppQuantile = (share: number) => 100 * (kopp[Math.floor(share * kopp.length)] ?? NaN);

const pKw = csvRows("tests/golden/water.csv");
const silver = csvRows("shared/data/electrodes.csv").filter((r) => r.id?.startsWith("AGCL-E0-"));
const iron = (t: number) => -reactionG("Fe^3+(aq) + e^- = Fe^2+(aq)", t) / FARADAY;

/** dE0/dT at 25 C, mV/K, isothermal; de Bethune, Licht and Swendeman, J. Electrochem. Soc. 106, 616 (1959), from memory. */
const coefficients: readonly [couple: string, half: string, published: number][] = [
  ["Zn^2+/Zn", "Zn^2+(aq) + 2 e^- = Zn(s)", 0.091],
  ["Fe^2+/Fe", "Fe^2+(aq) + 2 e^- = Fe(s)", 0.052],
  ["Cd^2+/Cd", "Cd^2+(aq) + 2 e^- = Cd(s)", -0.093],
  ["Pb^2+/Pb", "Pb^2+(aq) + 2 e^- = Pb(s)", -0.451],
  ["Cu^2+/Cu", "Cu^2+(aq) + 2 e^- = Cu(s)", 0.008],
  ["Fe^3+/Fe^2+", "Fe^3+(aq) + e^- = Fe^2+(aq)", 1.188],
  ["Ag^+/Ag", "Ag^+(aq) + e^- = Ag(s)", -1],
  ["O2/H2O", "O2(g) + 4 H^+(aq) + 4 e^- = 2 H2O(l)", -0.846],
  ["Cl2/Cl^-", "Cl2(g) + 2 e^- = 2 Cl^-(aq)", -1.26],
];
const slope = (half: string): number => {
  const electrons = Math.abs(valueOf(parseReaction(half)).terms.get("e^-") ?? 1);
  return (-1000 * (reactionG(half, 25.5) - reactionG(half, 24.5))) / (electrons * FARADAY);
};

const measured: Readonly<Record<string, () => number>> = {
  "pKw, library": () => Math.max(...pKw.map((r) => Math.abs(pK("H2O(l) = H^+(aq) + OH^-(aq)", Number(r.T_C)) - Number(r.pKw__IAPWSR11)))),
  "pKw, entropy correspondence alone": () => largest(steps(60, 200), (t) => pKByEntropy("OH^-(aq)", "H2O(l)", 1, t) - pKwater(kelvin(t))),
  "pK of HSO4^-, library": () => largest(steps(0, 200), (t) => pK("HSO4^-(aq) = H^+(aq) + SO4^2-(aq)", t) - published.pKBisulfate(kelvin(t))),
  "pK of HSO4^-, library, Marshall and Jones (1966), the older equation (`checks.csv`)": () => largest(steps(25, 200), (t) => {
    const T = kelvin(t); // checks.csv, pK2-HSO4-MJ66-*
    return pK("HSO4^-(aq) = H^+(aq) + SO4^2-(aq)", t) + (56.889 - 19.8858 * Math.log10(T) - 2307.9 / T - 0.006473 * T);
  }),
  "pK of NH4^+ at 100 C, library": () => Math.abs(pK("NH4^+(aq) = H^+(aq) + NH3(aq)", 100) - 7.41),
  "pK1 of CO2, library, Harned and Davis (1943), from memory": () => largest(steps(0, 50), (t) => {
    const T = kelvin(t);
    return pK("CO2(aq) + H2O(l) = H^+(aq) + HCO3^-(aq)", t) - (3404.71 / T - 14.8435 + 0.032786 * T);
  }),
  "pK2 of CO2, library, Harned and Scholes (1941), from memory": () => largest(steps(0, 50), (t) => {
    const T = kelvin(t);
    return pK("HCO3^-(aq) = H^+(aq) + CO3^2-(aq)", t) - (2902.39 / T - 6.498 + 0.02379 * T);
  }),
  "pK of HSO4^-, entropy correspondence alone": () => largest(steps(25, 100), (t) => pKByEntropy("HSO4^-(aq)", "SO4^2-(aq)", -1, t) - published.pKBisulfate(kelvin(t))),
  "pK of NH4^+, library": () => largest(steps(0, 50), (t) => pK("NH4^+(aq) = H^+(aq) + NH3(aq)", t) - published.pKAmmonium(kelvin(t))),
  "pK1 of CO2, library": () => largest(steps(0, 90), (t) => pK("CO2(aq) + H2O(l) = H^+(aq) + HCO3^-(aq)", t) - published.pKCarbonicAcid(kelvin(t))),
  "pK2 of CO2, library": () => largest(steps(0, 90), (t) => pK("HCO3^-(aq) = H^+(aq) + CO3^2-(aq)", t) - published.pKBicarbonate(kelvin(t))),
  "pK of HCN, library": () => largest(steps(10, 45), (t) => pK("HCN(aq) = H^+(aq) + CN^-(aq)", t) - published.pKHydrocyanicAcid(kelvin(t))),
  "pK1 of H2S, entropy and Cp": () => largest(steps(5, 25), (t) => {
    const T = kelvin(t);
    return pK("H2S(aq) = H^+(aq) + HS^-(aq)", t) - (-98.08 + 5765.4 / T + 15.0455 * Math.log(T));
  }),
  "Ag/AgCl, mV": () => Math.max(...silver.map((r) => Math.abs((-1000 * reactionG("AgCl(s,chlorargyrite) + e^- = Ag(s) + Cl^-(aq)", Number(r.T_C))) / FARADAY - Number(r.E_mV)))),
  "oxygen line at 100 C, mV": () => Math.abs((-1000 * reactionG("O2(g) + 4 H^+(aq) + 4 e^- = 2 H2O(l)", 100)) / 4 / FARADAY - 1167),
  "dE0/dT of nine couples, mV/K": () => Math.max(...coefficients.map(([, half, published]) => Math.abs(slope(half) - published))),
  "boiling of water, kJ/mol": () => Math.abs(reactionG("H2O(l) = H2O(g)", 100)) / 1000,
  "Kopp's rule, median, %": () => koppQuantile(0.5),
  "Kopp's rule, nine in ten below, %": () => koppQuantile(0.9),
  "Kopp's rule at 150 C, kJ/mol": () => Math.abs((koppQuantile(0.9) / 100) * (gibbsShift(423.15, 0, { a: 100, b: 0, c: 0, Tmax: Infinity }) / 1000)),
}; // prettier-ignore

/** Lines of the page's tables: first cell, the others. */
const cells = [...page.matchAll(/^\| (.+) \|$/gm)].map(([, line = ""]) => line.split(" | ").map((cell) => cell.trim()));
const digits = (printed: string) => printed.split(".")[1]?.length ?? 0;

describe("measured errors", () => {
  test.each(Object.entries(measured))("%s", (name, measure) => {
    const row = cells.find(([first, against]) => first === name || `${first}, ${against}` === name);
    const printed = row?.at(-1) ?? "missing in docs/method.md";
    expect(`${name}: ${measure().toFixed(digits(printed))}`).toBe(`${name}: ${printed}`);
  });
});

test.each(coefficients)("dE0/dT of %s stands on the page with the published one", (couple, half, published) => {
  const row = cells.find(([first, , , ...rest]) => first === couple && rest.length === 0);
  expect(row).toEqual([couple, slope(half).toFixed(2), published.toFixed(3)]);
});

describe("worked examples", () => {
  const examples = cells.filter(([, id]) => id?.startsWith("`"));
  test("there is one for every rule", () => expect(examples.length).toBe(11));
  test.each(examples)("%s %s %s %s", (_, id = "", t = "", G = "") => {
    const energy = energiesAt(data, kelvin(Number(t)));
    expect((energy.of(id.replaceAll("`", "")).G / 1000).toFixed(digits(G))).toBe(G);
  });
});

describe("the working of each example", () => {
  const bullets = new Map(
    [...page.matchAll(/^- \*\*([^*]+)\*\*,[^`]*`[\s\S]*?(?=\n- |\n\n)/gm)].map(([text, rule = ""]) => [rule, text]),
  );
  const rules = cells.filter(([, id]) => id?.startsWith("`"));
  test.each(rules)("%s", (rule = "", _id, _t, G = "") => {
    const lines = [...(bullets.get(rule) ?? "").matchAll(/`([^`]+) = (-?[\d.]+)`/g)];
    expect(lines.length, `${rule} has a working`).toBeGreaterThan(0);
    for (const [, expression = "", result = ""] of lines) {
      const value = Number(evaluate(expression.replaceAll(" x ", " * ").replaceAll(" ln(", " * ln(").replaceAll("ln(", "log(").replaceAll("+ * log", "+ log"))); // prettier-ignore
      // one and a half in the last digit: the numbers put in are rounded
      expect(Math.abs(value - Number(result)), `${expression} = ${value}`).toBeLessThanOrEqual(1.6 * 10 ** -digits(result)); // prettier-ignore
    }
    expect(lines.at(-1)?.[2]).toBe(G);
  });
  test("the integrals of the correspondence stand as the code has them", () => {
    const { a, b, h } = correspondenceIntegral(data.tables.correspondence, "cation", kelvin(60));
    expect(page).toContain(`are ${a.toFixed(2)}, ${b.toFixed(4)} and ${h.toFixed(2)}`);
  });
});

test("sections are numbered one after the other", () => {
  const numbers = [...page.matchAll(/^## (\d+)?/gm)].map(([, n]) => Number(n));
  expect(numbers).toEqual(numbers.map((_, i) => i + 1));
});

test("the example of iron: E0(Fe^3+/Fe^2+) at 25, 100 and 150 C", () => {
  const line = /E0\(Fe\^3\+\/Fe\^2\+\) is ([\d.]+) V at 25 C, ([\d.]+) V at 100 C and ([\d.]+) V at 150 C/.exec(page);
  expect(line?.slice(1)).toEqual([iron(25), iron(100), iron(150)].map((E) => E.toFixed(3)));
  expect(T_REFERENCE).toBe(298.15);
});
