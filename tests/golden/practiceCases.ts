import { ionicStrength } from "../../shared/activity/concentration";
import { davies, DAVIES_LIMIT } from "../../shared/activity/davies";
import { fromSHE, nernstSlope, referencePotential, toSHE } from "../../shared/electrodes/convert";
import { checkSolutions, electrodeSeries, type ElectrodeSeries } from "../../shared/electrodes/series";
import { readEntry } from "../../shared/entry/readEntry";
import { acidBalance, acidFactors, neutralising, usedUp } from "../../shared/metallurgy/acid";
import {
  acidDemand,
  cementationRecovery,
  ferricDemand,
  firstOrder,
  logKOfCementation,
  stoichiometricRatio,
  theoreticalMetal,
  timeToReach,
} from "../../shared/metallurgy/cementation";
import { censoredMean } from "../../shared/metallurgy/censored";
import { closeAccount } from "../../shared/metallurgy/closure";
import { metalWon, perKg, perTonne } from "../../shared/metallurgy/consumption";
import { goldDemand, hcnHenry, hcnOverSolution, hcnShare } from "../../shared/metallurgy/cyanide";
import {
  dissolvedAtEachSample,
  dissolvedInFiltrate,
  dissolvedMetal,
  volumeLeft,
  type Vessel,
} from "../../shared/metallurgy/dissolvedMetal";
import { currentEfficiency, specificEnergy, theoreticalDeposit } from "../../shared/metallurgy/electrowinning";
import {
  accountability,
  calculatedHead,
  extractionByResidue,
  extractionBySolution,
  extractionOnCalculatedHead,
} from "../../shared/metallurgy/extraction";
import { ratioFromEh } from "../../shared/metallurgy/ferricRatio";
import { dryMass, waterWithFeed } from "../../shared/metallurgy/moisture";
import { massRatio, molPerL } from "../../shared/metallurgy/molarMass";
import {
  acidForOxidant,
  electronsGiven,
  oxidantFor,
  oxidantPerMetal,
  utilisation,
} from "../../shared/metallurgy/oxidant";
import { pHShown } from "../../shared/metallurgy/pHMeter";
import { pulpOf } from "../../shared/metallurgy/pulp";
import {
  calculatedHeadError,
  residueError,
  solutionError,
  type RelativeErrors,
} from "../../shared/metallurgy/recoveryError";
import { freeAcid, freeCyanide } from "../../shared/metallurgy/titration";
import { valueOf } from "../../shared/outcome";
import { kelvin } from "../../shared/units";
import { chemistry } from "../support/chemistry";

const { molarMass: masses, tables } = chemistry();

const electrode = (id: string): ElectrodeSeries => electrodeSeries(tables).find((s) => s.id === id)!;
const eh = (mV: number, series: string, tC: number) => 1000 * valueOf(toSHE(mV / 1000, electrode(series), tC));
const reads = (mV: number, series: ElectrodeSeries, tC: number) => 1000 * valueOf(fromSHE(mV / 1000, series, tC));
/** The vessel of F01 to F04, in the records of the checks. */
const samples = [1.85, 2.62, 3.21, 3.6];
const vessel = (lixiviant: number, makeUpVolume: number): Vessel => ({
  volume: 0.8,
  assay: lixiviant,
  withdrawals: samples.map((assay) => ({ volume: 0.01, assay, makeUpVolume, makeUpAssay: lixiviant })),
});
const feedMetal = 250 * 0.0152;
const dissolved = (v: Vessel, final: number) => dissolvedMetal(v, volumeLeft(v), final);

const errors: RelativeErrors = {
  feedMass: 0.001,
  head: 0.02,
  residueMass: 0.002,
  residueAssay: 0.03,
  volume: 0.005,
  solutionAssay: 0.01,
};
const cell = (deposit: number, current: number, metal: string, volts: number) => {
  const theoretical = theoreticalDeposit(current, 24, metal, 2, masses);
  return {
    theoretical,
    current_efficiency: currentEfficiency(deposit, theoretical),
    energy: specificEnergy(volts, current, 24, deposit),
  };
};

/** Each check of practice-checks.json that the core answers: the product's own functions on the inputs of the check.
 *  Keys and units are those of its `expected`. */
export const cases: Record<string, () => Record<string, number | boolean>> = {
  F01: () => {
    const v = vessel(0, 0.01);
    const metal = dissolved(v, 3.95);
    return {
      metal_dissolved: metal,
      extraction: extractionBySolution(metal, feedMetal),
      uncorrected_extraction: extractionBySolution(dissolvedMetal({ ...v, withdrawals: [] }, 0.8, 3.95), feedMetal),
    };
  },
  F02: () => {
    const v = vessel(0, 0);
    const metal = dissolved(v, 3.95);
    const naive = (volume: number) =>
      extractionBySolution(dissolvedMetal({ ...v, withdrawals: [] }, volume, 3.95), feedMetal);
    return {
      final_volume: volumeLeft(v),
      metal_dissolved: metal,
      extraction: extractionBySolution(metal, feedMetal),
      naive_V0_extraction: naive(0.8),
      naive_final_volume_extraction: naive(volumeLeft(v)),
    };
  },
  F03: () => {
    const metal = dissolved(vessel(0.3, 0.01), 4.1);
    return { metal_dissolved: metal, extraction: extractionBySolution(metal, feedMetal) };
  },
  F04: () => {
    const [h1, h2, h4, h8] = dissolvedAtEachSample(vessel(0, 0.01)).map((m) => extractionBySolution(m, feedMetal));
    return { X_1h: h1!, X_2h: h2!, X_4h: h4!, X_8h: h8! };
  },
  F05: () => ({ extraction: extractionByResidue(231.6 * 0.00225, feedMetal) }),
  F06: () => {
    const residue = 231.6 * 0.00225;
    return {
      calculated_head: 100 * calculatedHead(3.2728, residue, 250),
      accountability: accountability(3.2728, residue, feedMetal),
      extraction_on_calculated_head: extractionOnCalculatedHead(3.2728, residue),
    };
  },
  F07: () => ({ metal_dissolved: dissolvedInFiltrate(vessel(0, 0), [0.712, 3.95], [0.6, 0.558]) }),
  F08: () => ({ dry_mass: dryMass(500, 0.064), water_with_ore: waterWithFeed(500, 0.064) }),
  F09: () => {
    const closed = closeAccount({ value: 3.95, s: 0.0593 }, { value: 3.2728, s: 0.0327 }, { value: 0.5211, s: 0.0104 });
    return {
      closure_before: closed.closure,
      feed_adjusted: closed.feed,
      solution_adjusted: closed.solution,
      residue_adjusted: closed.residue,
    };
  },
  F10: () => {
    const used = usedUp(1.6 * 12 + 14.5 * 0.98, 1.6 * 3.1, 0.02 * (7.4 + 5.0 + 3.2));
    const balance = acidBalance(used, 1000, 6.9, 1.2, 0, masses);
    return {
      gross_acid: balance.gross,
      acid_for_copper: balance.copper,
      acid_returned: balance.returned,
      gangue_acid: balance.gangue,
      net_acid_after_SX: balance.netAfterExtraction,
    };
  },
  F11: () => {
    const factors = acidFactors(masses);
    return {
      H2SO4_per_Cu_oxide_or_SX: factors.perCopperOxide,
      returned_goethite_or_hematite: factors.returnedByGoethite,
      returned_jarosite: factors.returnedByJarosite,
      consumed_ferrous_oxidation: factors.perFerrousOxidised,
      H2SO4_per_CaCO3: factors.perCalcite,
    };
  },
  F12: () => {
    const [U, Fe] = [electronsGiven(0.85, "U", 2, masses), electronsGiven(2.4, "Fe", 1, masses)];
    const theoretical = oxidantFor(U + Fe, "NaClO3", masses);
    return {
      electrons_U: U,
      electrons_Fe: Fe,
      NaClO3_theoretical: theoretical,
      utilisation: utilisation(theoretical, 2.1),
      consumption: perTonne(2.1, 1000),
    };
  },
  F13: () => ({
    MnO2: oxidantPerMetal("MnO2", "U", 2, masses),
    NaClO3: oxidantPerMetal("NaClO3", "U", 2, masses),
    H2O2: oxidantPerMetal("H2O2", "U", 2, masses),
    acid_with_MnO2_for_oxidant: acidForOxidant("MnO2", "U", 2, masses),
    acid_with_NaClO3_for_oxidant: acidForOxidant("NaClO3", "U", 2, masses),
  }),
  // 4 FeS2 + 15 O2 + 8 H2O = 2 Fe2O3 + 8 H2SO4: 60 electrons for 8 atoms of sulfur
  F14: () => ({
    O2_per_S: oxidantPerMetal("O2", "S", 7.5, masses),
    acid_made: massRatio("H2SO4", "S", [1, 1], masses),
  }),
  F15: () => {
    const won = 2 * 1.85 - 1.985 * 0.042;
    const consumed = 5.5 - 0.35;
    const ratio = perKg(consumed, won);
    const stoichiometric = stoichiometricRatio("Fe", "Cu", masses);
    const ferric = 2 * 0.6 * ferricDemand("Fe", masses);
    const acid = 1.9 * acidDemand("Fe", masses);
    return {
      recovery: cementationRecovery([2, 1.85], [1.985, 0.042]),
      iron_consumed: consumed,
      metal_ratio: ratio,
      stoichiometric,
      excess_factor: ratio / stoichiometric,
      iron_for_ferric: ferric,
      iron_for_acid: acid,
      iron_unexplained: consumed - won * stoichiometric - ferric - acid,
    };
  },
  F16: () => {
    const theoretical = theoreticalMetal({ Cu: 0.45, Cd: 0.38, Co: 0.018, Ni: 0.012 }, "Zn", masses);
    return { theoretical_zinc: theoretical, excess_factor: 2.5 / theoretical };
  },
  F17: () => ({
    Fe_Cu: stoichiometricRatio("Fe", "Cu", masses),
    Zn_Cu: stoichiometricRatio("Zn", "Cu", masses),
    Zn_Cd: stoichiometricRatio("Zn", "Cd", masses),
    Zn_Co: stoichiometricRatio("Zn", "Co", masses),
    Zn_Ni: stoichiometricRatio("Zn", "Ni", masses),
    Zn_Au: stoichiometricRatio("Zn", "Au", masses),
    Zn_Ag: stoichiometricRatio("Zn", "Ag", masses),
    Al_Cu: stoichiometricRatio("Al", "Cu", masses),
    Fe_Fe3: ferricDemand("Fe", masses),
    Fe_H2SO4: acidDemand("Fe", masses),
  }),
  F18: () => ({ consumption: perTonne(usedUp(1.5 * 1 + 0.62, 1.5 * 0.71, 4 * 0.02 * 0.8), 1000) }),
  F19: () => ({ free_acid: freeAcid(10, 0.2, 12.35, masses) }),
  F20: () => ({ NaCN: 1000 * freeCyanide(25, 0.02, 2.55, masses) }),
  F21: () => ({
    Cu: molPerL(5, "Cu", masses),
    H2SO4: molPerL(12, "H2SO4", masses),
    Fe: molPerL(3, "Fe", masses),
  }),
  F22: () => {
    const Cu = molPerL(0.5, "Cu", masses);
    const I = ionicStrength([
      { m: Cu, z: 2 },
      { m: 0.02, z: 1 },
      { m: Cu + 0.01, z: -2 },
    ]);
    const gamma = davies(2, I);
    return {
      Cu,
      I,
      gamma_z2: gamma,
      activity: gamma * Cu,
      potential_shift: 1000 * (nernstSlope(kelvin(25)) / 2) * Math.log10(gamma),
    };
  },
  F23: () => ({ "gamma_0.3": davies(2, 0.1), "gamma_0.2": davies(2, 0.1, 0.2) }),
  F24: () => ({ in_range: 1.2 <= DAVIES_LIMIT, raw_gamma: davies(2, 1.2) }),
  F25: () => {
    const pulp = pulpOf(0.35, 2.72, 1.035);
    return {
      pulp_density: pulp.density,
      solids_volume: 100 * pulp.solidsByVolume,
      solids: pulp.solidsPerLitre,
      liquid_to_solid: pulp.liquidToSolid,
      solution_per_kg: pulp.liquorPerKg,
    };
  },
  F26: () => ({ gold: metalWon(1200, 2.35, 91.4) }),
  F27: () => cell(6.72, 250, "Cu", 2.05),
  F28: () => cell(0.5405, 20, "Zn", 3.4),
  F29: () => ({
    s_residue: residueError(86.29, errors),
    s_solution: solutionError(86.13, errors),
    s_calc_head: calculatedHeadError(86.26, errors),
  }),
  F34: () => {
    const mean = censoredMean(["<0.01", "<0.01", "0.015", "0.022", "0.031", "0.018"].map(readEntry))!;
    return {
      mean_lower_bound: mean.lo,
      mean_upper_bound: mean.hi,
      mean_half_limit: mean.halfLimit,
      n_censored: mean.censored,
    };
  },
  F43: () => ({
    slope_25: 1000 * nernstSlope(kelvin(25)),
    slope_60: 1000 * nernstSlope(kelvin(60)),
    slope_90: 1000 * nernstSlope(kelvin(90)),
  }),
  F44: () => ({ pH_read: pHShown(2, kelvin(60), kelvin(25)) }),
  F45: () => ({ Eh: eh(425, "AGCL-sat", 25) }),
  F46: () => ({ Eh: eh(425, "AGCL-sat", 40) }),
  F47: () => ({ Eh: eh(300, "AGCL-3.5M", 20) }),
  F48: () => ({
    Eh_5: eh(300, "AGCL-3M", 5),
    Eh_20: eh(300, "AGCL-3M", 20),
    Eh_25: eh(300, "AGCL-3M", 25),
    Eh_40: eh(300, "AGCL-3M", 40),
  }),
  F49: () => ({ Eh_25: eh(400, "SCE", 25), Eh_60: eh(400, "SCE", 60) }),
  F50: () => ({
    reads_AgAgCl_sat: reads(624, electrode("AGCL-sat"), 25),
    reads_AgAgCl_3M: reads(624, electrode("AGCL-3M"), 25),
    reads_SCE: reads(624, electrode("SCE"), 25),
    reads_Hg_Hg2SO4_satK2SO4: reads(624, electrode("MSE-sat"), 25),
  }),
  F51: () => {
    const zobell = checkSolutions(tables).find((s) => s.id === "ZOBELL")!;
    const at = (tC: number) => 1000 * valueOf(referencePotential(zobell, tC)).E;
    return { Eh_25: at(25), Eh_40: at(40), reads_AgAgCl_sat_25: reads(at(25), electrode("AGCL-sat"), 25) };
  },
  F52: () => {
    const at = (pH: number) => reads(699.2 - 1000 * nernstSlope(kelvin(25)) * pH, electrode("AGCL-sat"), 25);
    return { reads_pH4: at(4), reads_pH7: at(7) };
  },
  F53: () => ({
    ratio_formal: ratioFromEh(0.62, 0.68, 1, kelvin(25)),
    ratio_standard: ratioFromEh(0.62, 0.771, 1, kelvin(25)),
  }),
  F54: () => ({
    "HCN_9.0": hcnShare(9),
    "HCN_9.5": hcnShare(9.5),
    "HCN_10.0": hcnShare(10),
    "HCN_10.5": hcnShare(10.5),
    "HCN_11.0": hcnShare(11),
  }),
  F55: () => ({ K_H: hcnHenry(kelvin(25)), equilibrium_gas: hcnOverSolution(1, kelvin(25), masses) }),
  F56: () => ({
    log10K_Fe_Cu: logKOfCementation(0.342, -0.447, 2, kelvin(25)),
    log10K_Zn_Cd: logKOfCementation(-0.403, -0.762, 2, kelvin(25)),
    log10K_Zn_Co: logKOfCementation(-0.28, -0.762, 2, kelvin(25)),
  }),
  F57: () => ({ NaCN_per_Au: goldDemand(masses).NaCN, O2_per_Au: goldDemand(masses).O2 }),
  F58: () => ({
    CaO_per_H2SO4: neutralising("CaO", 2, masses),
    CaCO3_per_H2SO4: neutralising("CaCO3", 2, masses),
    NaOH_per_H2SO4: neutralising("NaOH", 1, masses),
    MgO_per_H2SO4: neutralising("MgO", 2, masses),
    NH3_per_H2SO4: neutralising("NH3", 1, masses),
  }),
  // MnO2 + SO2; MnO2 + 2 Fe^2+; 2 LiCoO2 + H2O2 + 3 H2SO4
  F59: () => ({
    SO2_per_Mn_from_MnO2: massRatio("SO2", "Mn", [1, 1], masses),
    Fe2_per_Mn: massRatio("Fe", "Mn", [2, 1], masses),
    H2O2_per_Co_from_LiCoO2: massRatio("H2O2", "Co", [1, 2], masses),
    H2SO4_per_Co_from_LiCoO2: massRatio("H2SO4", "Co", [3, 2], masses),
  }),
  F60: () => ({ c: firstOrder(450, 0.18, 20), time_to_1_mgL: timeToReach(450, 1, 0.18) }),
  F61: () => ({
    O2_per_Fe2: oxidantPerMetal("O2", "Fe", 1, masses),
    H2O2_per_Fe2: oxidantPerMetal("H2O2", "Fe", 1, masses),
    NaClO3_per_Fe2: oxidantPerMetal("NaClO3", "Fe", 1, masses),
    MnO2_per_Fe2: oxidantPerMetal("MnO2", "Fe", 1, masses),
    Cl2_per_Fe2: oxidantPerMetal("Cl2", "Fe", 1, masses),
    KMnO4_per_Fe2: oxidantPerMetal("KMnO4", "Fe", 1, masses),
    O3_per_Fe2: oxidantPerMetal("O3", "Fe", 1, masses),
  }),
  F62: () => ({
    Cu_metal_or_Cu2S_O2: oxidantPerMetal("O2", "Cu", 2, masses),
    Cu_metal_H2O2: oxidantPerMetal("H2O2", "Cu", 2, masses),
    Cu_metal_or_Cu2S_Fe3: oxidantPerMetal("Fe^3+", "Cu", 2, masses),
    CuFeS2_O2: oxidantPerMetal("O2", "Cu", 4, masses),
    CuFeS2_Fe3: oxidantPerMetal("Fe^3+", "Cu", 4, masses),
    ZnS_O2: oxidantPerMetal("O2", "Zn", 2, masses),
    ZnS_Fe3: oxidantPerMetal("Fe^3+", "Zn", 2, masses),
    UO2_Fe3: oxidantPerMetal("Fe^3+", "U", 2, masses),
    As3_H2O2: oxidantPerMetal("H2O2", "As", 2, masses),
  }),
  F63: () => ({
    factor_10mV: ratioFromEh(0.01, 0, 1, kelvin(25)),
    factor_30mV: ratioFromEh(0.03, 0, 1, kelvin(25)),
  }),
};

/** Checks whose functions come with the statistics and the kinetics. */
export const later: Record<string, string> = {
  F30: "uncertainty of a mean: needs Student's t",
  F31: "Welch's t-test",
  F32: "paired comparison",
  F33: "Holm's adjustment",
  F35: "factorial effects",
  F36: "kinetics",
  F37: "kinetics",
  F38: "kinetics",
  F39: "kinetics",
  F40: "kinetics",
  F41: "kinetics",
  F42: "activation energy",
};
