import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { robustWindow } from "../../shared/advice/robust";
import { acidBand, freeAcid } from "../../shared/activity/freeAcid";
import { analyse } from "../../shared/analysis";
import { FARADAY, GAS_CONSTANT, LN10 } from "../../shared/constants";
import { difference } from "../../shared/geometry/envelope";
import { energiesAt } from "../../shared/gibbs/energies";
import { valueOf } from "../../shared/outcome";
import { formationOf } from "../../shared/planes/formation";
import { basisAt, STEPS_PER_JOULE } from "../../shared/planes/grid";
import type { Problem } from "../../shared/schemas/problem";
import { deepestPoint } from "../../shared/setpoint/deepestPoint";
import { kelvin } from "../../shared/units";
import { loop } from "../support/border";
import { library, solved } from "../support/solver";

/** docs/method.md, sections 2 to 6: every number of a worked example is written again from the code, and must stand on the page. */
const page = readFileSync("docs/method.md", "utf8").replace(/\s+/g, " ");
const says = (text: string): void => expect(page, "docs/method.md").toContain(text.replace(/\s+/g, " "));

const RT = (t: number): number => GAS_CONSTANT * kelvin(t);
const energies = energiesAt(library, kelvin(25));
const basis = basisAt(energies);
const G = (id: string): number => energies.of(id).G;

const question = (change: Partial<Problem>): Problem => ({
  temperatureC: 25,
  metals: [{ element: "Zn", requirement: "free", activity: 0.08 }],
  ligands: [{ component: "S", activity: 0.5 }],
  leftOut: ["S2O8^2-(aq)"],
  frame: { pH: [0, 14], Eh: [-0.5, 1] },
  controlBand: { pH: 0.15, Eh: 0.03 },
  ...change,
});
const borders = (change: Partial<Problem>): number[] => {
  const { cells } = valueOf(analyse(question(change), library));
  return [...new Set(cells.flatMap((c) => [...c.piece.x]).filter((x) => x > 0 && x < 14))].sort((a, b) => a - b);
};

test("section 2: Fe^2+ and ferrihydrite", () => {
  const formation = (id: string) => formationOf(library.species.get(id)!, "Fe", 1e-3, [], basis).plane;
  const [ion, solid] = [formation("Fe^2+(aq)"), formation("Fe(OH)3(s,ferrihydrite)")];
  const joule = (k: number): string => (k / STEPS_PER_JOULE).toFixed(0);
  const price = (RT(25) * LN10).toFixed(1);
  says(`k = ${G("Fe^2+(aq)")} + ${price} x (-3) = ${joule(ion.k)} J.`);
  says(`k = ${G("Fe(OH)3(s,ferrihydrite)")} + 3 x ${-G("H2O(l)")} = ${joule(solid.k)} J.`);
  const [k, x, y] = difference(ion, solid);
  expect([x / basis.proton, y / basis.electron]).toEqual([-3, -1]);
  says(`${joule(k)} J - 3 x ${price} pH - ${FARADAY.toFixed(0)} Eh`);
  says(`Eh = ${(-k / y).toFixed(4)} - ${(x / y).toFixed(4)} pH`);
});

test("section 3: cells of sulfate and ammonia", () => {
  const both = borders({ ligands: [{ component: "S", activity: 0.5 }, { component: "NH3", activity: 1 }] }); // prettier-ignore
  expect(both.length).toBe(2);
  says(
    `holds the sulfur up to pH ${both[0]!.toFixed(3)} and SO4^2- beyond, NH4^+ the ammonia up to ${both[1]!.toFixed(3)}`,
  );
  const [hot] = borders({ temperatureC: 60 });
  says(`the first border stands at ${hot!.toFixed(3)}`);
  const anchored = energiesAt(library, kelvin(60));
  const pK = (anchored.of("SO4^2-(aq)").G - anchored.of("HSO4^-(aq)").G) / (RT(60) * LN10);
  expect(hot).toBeCloseTo(pK, 5);
});

test("section 4: the ion pair of zinc and sulfate", () => {
  const { cells, metals } = valueOf(analyse(question({}), library));
  const cell = cells.findIndex((c) => c.holders.get("S")!.species.id === "SO4^2-(aq)");
  const planeOf = (id: string) => {
    const at = metals[0]!.formations.findIndex((f) => f.species.id === id);
    return metals[0]!.cells[cell]!.planes[at]!;
  };
  const [ion, pair] = [planeOf("Zn^2+(aq)"), planeOf("ZnSO4(aq)")];
  expect([pair.x, pair.y]).toEqual([ion.x, ion.y]);
  const lower = (ion.k - pair.k) / STEPS_PER_JOULE;
  says(`k = G - ${RT(25).toFixed(1)} x ${(-Math.log(0.08)).toFixed(4)} J`);
  says(`stands ${lower.toFixed(0)} J lower`);
  says(`exp(${lower.toFixed(0)} / ${RT(25).toFixed(1)}) = ${Math.exp(lower / RT(25)).toFixed(1)}.`);
});

describe("section 5: zinc over iron at 60 C", () => {
  const solution = solved({
    temperatureC: 60,
    metals: [
      { element: "Zn", role: "target", requirement: "dissolved", activity: 0.08 },
      { element: "Fe", role: "gangue", requirement: "solid", activity: 1e-5 },
    ],
    ligands: [{ component: "S", activity: 0.5 }],
    solidsBasis: "fresh",
    frame: { pH: [1, 8], Eh: [-0.2, 1.2] },
    controlBand: { pH: 0.15, Eh: 0.03 },
  });
  const [window] = solution.windows;

  test("lines, slope and area", () => {
    const slope = (RT(60) * LN10) / FARADAY;
    const oxygen = solution.waterLines.find((l) => l.which === "oxygen")!;
    says(
      `R T ln 10 / F is ${slope.toFixed(5)} V, the oxygen line ${oxygen.intercept.toFixed(4)} - ${(-oxygen.slope).toFixed(4)} pH`,
    );
    const lower = window!.limits.find((l) => l.outside === "FeSO4(aq)")!;
    says(lower.reaction!);
    says(`3 x ${slope.toFixed(5)} = ${(lower.line[1] / lower.line[2]).toFixed(4)} V a pH`);
    const [low, high] = window!.pH;
    says(`limits at pH ${low.toFixed(4)} and ${high.toFixed(4)}`);
    says(`${(high - low).toFixed(4)} pH wide: ${window!.area.toFixed(4)} pH V`);
  });
});

test("section 6: a triangle, a rectangle, a couple", () => {
  const triangle = deepestPoint(loop([[0, 0], [6, 0], [0, 6]]))!; // prettier-ignore
  says(`the margin is ${triangle.margin.toFixed(1)} at (${triangle.u.toFixed(1)}, ${triangle.v.toFixed(1)})`);
  const rectangle = deepestPoint(loop([[0, 0], [20, 0], [20, 4], [0, 4]]))!; // prettier-ignore
  says(`A rectangle 20 by 4 has margin ${rectangle.margin.toFixed(0)}`);
  says(`the set point is at u = ${rectangle.u.toFixed(0)}`);
  const mg = 0.1 * 1000 * library.molarMass.get("Fe")!;
  says(`Iron at 0.1 is ${mg.toFixed(0)} mg/L; the scarcer form has 10 mg/L where the ratio is ${(mg / 10).toFixed(0)}`);
  says(`that is ${((RT(25) / FARADAY) * Math.log(mg / 10)).toFixed(4)} V from E0`);
});

test("section 7: a limit that is worst just below a rule", () => {
  const problem = (temperatureC: number): Problem => ({
    temperatureC,
    metals: [
      { element: "Au", requirement: "dissolved", activity: 1e-5 },
      { element: "Fe", role: "gangue", requirement: "solid", activity: 1e-6 },
    ],
    ligands: [{ component: "CN", activity: 0.01 }],
    solidsBasis: "fresh",
    frame: { pH: [9, 13], Eh: [-0.8, 0.6] },
    excludedHazards: [{ gas: "HCN", pHAtLeast: 10.5 }],
    controlBand: { pH: 0.15, Eh: 0.03 },
  });
  const high = (t: number) => solved(problem(t)).windows[0]!.pH[1].toFixed(3);
  const { outside } = solved(problem(60)).windows[0]!.limits.find((l) => l.inside === "Fe(OH)3(s,ferrihydrite)" && l.outside?.includes("OH"))!; // prettier-ignore
  expect(outside).toBe("Fe(OH)4^-(aq)");
  says(`at 45 C ${high(45)}, at 60 C ${high(60)}, just below 70 C ${high(69.999999)}`);
  expect(high(70)).toBe("13.000");
  const robust = valueOf(robustWindow(problem(60), { temperatureC: [45, 75] }, library)).windows[0]!;
  says(`From 45 to 75 C the window holds to ${Math.max(...robust.outer.map((p) => p[0])).toFixed(3)}`);
});

test("free acid: a band of 2 g/L at pH 0.8 in half-molar sulfate", () => {
  const { low, high, counted } = valueOf(acidBand(library, 2, 0.8, 0.5, 25));
  says(
    `At pH 0.80 free acid is ${valueOf(freeAcid(library, 0.8, 0.5, 25)).gPerL.toFixed(2)} g/L; +2 and -2 g/L stand at pH ${(0.8 - low).toFixed(3)} and ${(0.8 + high).toFixed(3)}: -${low.toFixed(3)} and +${high.toFixed(3)}, and ${counted.toFixed(3)} counts.`,
  );
  const record = readFileSync("docs/decisions/0014-bands-of-free-acid.md", "utf8");
  expect(record).toContain(`-${low.toFixed(3)} and +${high.toFixed(3)} pH for 2 g/L at pH 0.8`);
});
