import { describe, expect, test } from "vitest";
import { debyeHuckelA } from "../../shared/activity/debyeHuckel";
import { freeAcid } from "../../shared/activity/freeAcid";
import { analyse } from "../../shared/analysis";
import { pKwater, saturationPressure } from "../../shared/gibbs/water";
import { gasPressure, pressureAt } from "../../shared/hazards/pressures";
import { hcnShare } from "../../shared/metallurgy/cyanide";
import { valueOf } from "../../shared/outcome";
import { reachesOf, standsAt } from "../../shared/reach/reach";
import { reactionAtT } from "../../shared/reactions/atTemperature";
import { overallOf } from "../../shared/reactions/overall";
import type { Problem } from "../../shared/schemas/problem";
import { kelvin } from "../../shared/units";
import { band, library, solved } from "../support/solver";

/** Twelve numbers that the application shows, each worked out by hand from tables a metallurgist has on the shelf. "From memory" where a
 *  source was not re-read. The tolerance is what the method or the two tables' own disagreement allow, and says which. */
const at = (species: Record<string, number>, temperatureC: number) =>
  valueOf(reactionAtT(library, { species, temperatureC }));
const within = (found: number, hand: number, tolerance: number) =>
  expect(Math.abs(found - hand), `${found}, by hand ${hand}`).toBeLessThanOrEqual(tolerance);
const base = { temperatureC: 25, frame: { pH: [2, 9] as [number, number], Eh: [0, 0.8] as [number, number] }, controlBand: band }; // prettier-ignore

describe("by hand", () => {
  // CRC Handbook (from memory): Zn -0.7618, Cu 0.3419, Ag 0.7996, Fe(III)/Fe(II) 0.771 V; the tables' own Cu^2+ is NBS, 2.5 mV lower
  test.each([
    ["zinc", { "Zn^2+(aq)": -1, "e^-": -2, "Zn(s)": 1 }, 25, -0.7618, 0.001],
    ["copper", { "Cu^2+(aq)": -1, "e^-": -2, "Cu(s)": 1 }, 25, 0.3419, 0.003],
    ["silver", { "Ag^+(aq)": -1, "e^-": -1, "Ag(s)": 1 }, 25, 0.7996, 0.001],
    ["ferric over ferrous", { "Fe^3+(aq)": -1, "e^-": -1, "Fe^2+(aq)": 1 }, 25, 0.771, 0.002],
    // de Bethune, Licht and Swendeman 1959 (from memory): 0.771 + 1.188 mV/K x 35 K; second order left out
    ["ferric over ferrous, 60 C", { "Fe^3+(aq)": -1, "e^-": -1, "Fe^2+(aq)": 1 }, 60, 0.8126, 0.004],
    // 1.2288 - 0.846 mV/K x 125 K + 0.552e-3 mV/K2 x 125^2 / 2
    ["oxygen, 150 C", { "O2(g)": -1, "H^+(aq)": -4, "e^-": -4, "H2O(l)": 2 }, 150, 1.1274, 0.003],
  ])("E0 of %s", (_, species, T, hand, tolerance) => within(at(species, T).E0_V ?? NaN, hand, tolerance));

  test("pKw at 150 C: 11.64 (IAPWS R11-07, table; Marshall and Franck 1981 give 11.64)", () =>
    within(pKwater(kelvin(150)), 11.64, 0.01));

  test("pK2 of bisulfate at 50 C from the printed equation of Clegg, Rard and Pitzer 1994, 0.015 as the method states", () => {
    const T = 323.15;
    const hand = -(562.69486 - 102.5154 * Math.log(T) - 1.117033e-4 * T * T + 0.2477538 * T - 13273.75 / T);
    within(-at({ "HSO4^-(aq)": -1, "H^+(aq)": 1, "SO4^2-(aq)": 1 }, 50).logK, hand, 0.016);
  });

  test("zinc hydroxide comes out of 0.1 mol/L at pH 6.24: Ksp 3e-17 (CRC, from memory), (14.00 x 2 - 16.52 + 1) / 2", () => {
    const problem: Problem = { ...base, metals: [{ element: "Zn", requirement: "dissolved", activity: 0.1 }], ligands: [], solidsBasis: "fresh" }; // prettier-ignore
    within(solved(problem).windows[0]!.pH[1], (28 - 16.52 + 1) / 2, 0.1);
  });

  test("copper on zinc: log K 2 x (0.3419 + 0.7618) / 0.05916 = 37.31; 0.1 is 3 mV", () =>
    within(at({ "Cu^2+(aq)": -1, "Zn(s)": -1, "Cu(s)": 1, "Zn^2+(aq)": 1 }, 25).logK, 37.31, 0.1));

  test("H2S over 1 mmol/L at pH 2: all of it is H2S, 0.001 / 0.101 mol/(L atm) (Sander, from memory), 2 % between the tables", () => {
    const problem: Problem = { ...base, metals: [{ element: "Zn", requirement: "free", activity: 1e-6 }], ligands: [{ component: "S(sulfide)", activity: 1e-3 }], frame: { pH: [0, 14], Eh: [-1, 1] } }; // prettier-ignore
    const gas = gasPressure(valueOf(analyse(problem, library)), "H2S");
    if ("absent" in gas) expect.fail(gas.absent);
    const bar = pressureAt(gas, 2, -0.3) ?? NaN;
    within(bar / ((1e-3 / 0.101) * 1.01325), 1, 0.02);
  });

  test("HCN share at pH 9.2 with pKa 9.21 (CRC): 1 / (1 + 10^-0.01) = 50.6 %; the library's own pKa within 0.025", () => {
    within(hcnShare(9.2), 50.6, 0.1);
    within(-at({ "HCN(aq)": -1, "H^+(aq)": 1, "CN^-(aq)": 1 }, 25).logK, 9.21, 0.025);
  });

  test("free acid at pH 0.8 in half-molar sulfate: Davies at 0.5 gives g1 0.734, g2 0.290; 31.7 g/L", () => {
    const root = Math.SQRT1_2;
    const g = (z: number) => 10 ** (-0.509 * z * z * (root / (1 + root) - 0.3 * 0.5));
    const [h, K2] = [10 ** -0.8, 10 ** -1.99];
    const ratio = (h * g(2)) / (g(1) * K2);
    const hand = (98.07 * (h / g(1) + (0.5 * ratio) / (1 + ratio))) / 2;
    within(valueOf(freeAcid(library, 0.8, 0.5, 25)).gPerL, hand, 0.2);
  });

  test("reach: air and peroxide by practice; their equilibrium lines at pH 2, 1.229 - 0.118 and (CRC, 13 mV above the NBS energies) 1.776 - 0.118 V", () => {
    const [air, peroxide] = reachesOf(library, ["air", "peroxide"], "sulfate", 25);
    expect([air!.practical, peroxide!.practical]).toEqual([[0.45, 0.75], [0.6, 0.9]]); // prettier-ignore
    within(standsAt(air!, 2) ?? NaN, 1.229 - 0.1183, 0.001);
    within(standsAt(peroxide!, 2) ?? NaN, 1.776 - 0.1183, 0.015);
  });

  test("acid for a tonne of ZnO: 98.07 / 81.38 = 1205 kg", () => {
    const question = { from: "ZnO(s)", products: ["Zn^2+(aq)"], temperatureC: 25, pH: 2 };
    const acid = valueOf(overallOf(library, question)).demand.find((d) => d.role === "acid");
    within(acid?.kgPerTonne ?? NaN, (1000 * 98.07) / 81.38, 0.5);
  });

  test("saturation pressure at 180 C: 10.03 bar (steam tables)", () =>
    within(saturationPressure(kelvin(180)) / 1e5, 10.03, 0.01));

  test("Debye-Hueckel A: 0.510 at 25 C, 0.600 at 100 C (Helgeson and Kirkham 1974: 0.5092 and 0.5998, from memory)", () => {
    within(debyeHuckelA(kelvin(25)), 0.5092, 0.001);
    within(debyeHuckelA(kelvin(100)), 0.5998, 0.002);
  });
});
