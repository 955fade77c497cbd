import type { PresetName } from "../schemas/plan";

/** A half-reaction written ox + n e^- + h H^+ = red, with every activity one and gases at 1 bar. */
export interface Couple {
  /** ox/red as formulas in the notation of the tables */
  oxidised: string;
  reduced: string;
  /** V vs SHE at 25 C */
  E0: number;
  electrons: number;
  /** H^+ taken up with the electrons */
  protons: number;
}

export type ReagentKind = "oxidant" | "reductant" | "cementing metal";

export interface Reagent {
  id: string;
  /** short enough to stand beside a bar */
  name: string;
  kind: ReagentKind;
  /** absent where no single couple speaks for the reagent */
  couple?: Couple;
  /** V vs SHE that a stirred vessel commonly shows on platinum; an open upper end is null; absent where no common figure is known */
  reached?: readonly [lo: number, hi: number | null];
  /** liquors the practical range was read in; elsewhere only the equilibrium line is drawn */
  reachedIn: readonly PresetName[];
  /** liquors in which it is commonly considered */
  usedIn: readonly PresetName[];
  note: string;
  source: string;
}

const acid: readonly PresetName[] = ["sulfate", "sulfate_sulfide", "chloride", "water"];
const all: readonly PresetName[] = [
  ...acid,
  "ammonia",
  "ammonia_carbonate",
  "cyanide",
  "carbonate",
  "thiosulfate_ammonia",
  "glycine",
];
const HANDBOOK = "E0: handbook value, from memory. Range: common practice, no source.";
const METAL =
  "E0: handbook value, from memory. What a slurry with the metal in it shows depends on the dissolved metal: no range given.";

/** What can move a slurry's potential. Practical ranges are what platinum commonly reads, not what the couple would give. */
export const reagents: readonly Reagent[] = [
  {
    id: "air",
    name: "air",
    kind: "oxidant",
    couple: { oxidised: "O2", reduced: "H2O", E0: 1.229, electrons: 4, protons: 4 },
    reached: [0.45, 0.75],
    reachedIn: acid,
    usedIn: all,
    note: "through iron in acid; gas transfer limits it, far below the oxygen line",
    source: HANDBOOK,
  },
  {
    id: "ferric",
    name: "ferric",
    kind: "oxidant",
    couple: { oxidised: "Fe^3+", reduced: "Fe^2+", E0: 0.771, electrons: 1, protons: 0 },
    reached: [0.55, 0.8],
    reachedIn: acid,
    usedIn: ["sulfate", "sulfate_sulfide", "chloride", "water"],
    note: "hydrolyses above pH 2; 0.68 V in 1 mol/L sulfuric acid",
    source: HANDBOOK,
  },
  {
    id: "peroxide",
    name: "H2O2",
    kind: "oxidant",
    couple: { oxidised: "H2O2", reduced: "H2O", E0: 1.776, electrons: 2, protons: 2 },
    reached: [0.6, 0.9],
    reachedIn: acid,
    usedIn: ["sulfate", "chloride", "water", "carbonate", "glycine"],
    note: "decomposes on iron, copper and manganese, with gas and heat",
    source: HANDBOOK,
  },
  {
    id: "manganese-dioxide",
    name: "MnO2",
    kind: "oxidant",
    couple: { oxidised: "MnO2", reduced: "Mn^2+", E0: 1.224, electrons: 2, protons: 4 },
    reached: [0.6, 0.75],
    reachedIn: ["sulfate", "sulfate_sulfide", "water"],
    usedIn: ["sulfate", "water"],
    note: "manganese goes to the effluent; takes acid",
    source: HANDBOOK,
  },
  {
    id: "chlorate",
    name: "NaClO3",
    kind: "oxidant",
    couple: { oxidised: "ClO3^-", reduced: "Cl^-", E0: 1.451, electrons: 6, protons: 6 },
    reached: [0.6, 0.9],
    reachedIn: acid,
    usedIn: ["sulfate", "chloride"],
    note: "slow cold and at low acid; Cl2 and ClO2 with strong acid, fire with organics",
    source: HANDBOOK,
  },
  {
    id: "chlorine",
    name: "Cl2",
    kind: "oxidant",
    couple: { oxidised: "Cl2", reduced: "Cl^-", E0: 1.358, electrons: 2, protons: 0 },
    reached: [0.9, 1.2],
    reachedIn: ["chloride"],
    usedIn: ["chloride"],
    note: "in acid; chlorine gas leaves the liquor",
    source: HANDBOOK,
  },
  {
    id: "hypochlorite",
    name: "OCl^-",
    kind: "oxidant",
    // E0 0.84 V in base is at pH 14; the line is written from pH 0 with two protons for two electrons.
    couple: { oxidised: "ClO^-", reduced: "Cl^-", E0: 1.668, electrons: 2, protons: 2 },
    reached: [0.6, 0.8],
    reachedIn: ["chloride", "cyanide", "carbonate", "ammonia", "ammonia_carbonate", "glycine"],
    usedIn: ["chloride"],
    note: "alkaline; Cl2 on acid, chloramines and CNCl below about pH 8.5-10",
    source: "E0 0.84 V in base: handbook value, from memory. Range: common practice, no source.",
  },
  {
    id: "permanganate",
    name: "KMnO4",
    kind: "oxidant",
    couple: { oxidised: "MnO4^-", reduced: "Mn^2+", E0: 1.507, electrons: 5, protons: 8 },
    reached: [1.0, null],
    reachedIn: acid,
    usedIn: ["sulfate"],
    note: "leaves MnO2 solids; destroys organics",
    source: HANDBOOK,
  },
  {
    id: "ozone",
    name: "O3",
    kind: "oxidant",
    couple: { oxidised: "O3", reduced: "O2", E0: 2.076, electrons: 2, protons: 2 },
    reached: [1.0, 1.3],
    reachedIn: acid,
    usedIn: ["sulfate", "chloride", "water"],
    note: "mass transfer limits it; exposure limit 0.1 ppm",
    source: HANDBOOK,
  },
  {
    id: "peroxomonosulfuric",
    name: "H2SO5",
    kind: "oxidant",
    couple: { oxidised: "HSO5^-", reduced: "HSO4^-", E0: 1.8, electrons: 2, protons: 2 },
    reached: [0.7, 1.0],
    reachedIn: acid,
    usedIn: ["sulfate"],
    note: "unstable, made on site; strong heat",
    source: HANDBOOK,
  },
  {
    id: "so2-oxygen",
    name: "SO2/O2",
    kind: "oxidant",
    reached: [0.5, 0.9],
    reachedIn: ["sulfate", "sulfate_sulfide", "water", "cyanide"],
    usedIn: ["sulfate"],
    note: "radical chain, by ratio; excess SO2 turns it reducing",
    source: "Range: common practice, no source. No couple: a radical chain.",
  },
  {
    id: "nitrate",
    name: "HNO3",
    kind: "oxidant",
    couple: { oxidised: "NO3^-", reduced: "NO", E0: 0.957, electrons: 3, protons: 4 },
    reached: [0.7, 0.95],
    reachedIn: acid,
    usedIn: ["sulfate", "chloride", "water"],
    note: "NO and NO2 fumes",
    source: HANDBOOK,
  },
  {
    id: "cupric-chloride",
    name: "CuCl2",
    kind: "oxidant",
    couple: { oxidised: "Cu^2+", reduced: "Cu^+", E0: 0.153, electrons: 1, protons: 0 },
    reached: [0.45, 0.7],
    reachedIn: ["chloride"],
    usedIn: ["chloride"],
    note: "chloride makes it an oxidant: 0.5-0.6 V in brine; air regenerates it",
    source: HANDBOOK,
  },
  {
    id: "persulfate",
    name: "S2O8^2-",
    kind: "oxidant",
    couple: { oxidised: "S2O8^2-", reduced: "SO4^2-", E0: 2.0, electrons: 2, protons: 0 },
    reachedIn: [],
    usedIn: ["sulfate"],
    note: "costly; no common working range",
    source: "E0: handbook value, from memory.",
  },
  {
    id: "sulfite",
    name: "SO2",
    kind: "reductant",
    couple: { oxidised: "SO4^2-", reduced: "H2SO3", E0: 0.16, electrons: 2, protons: 4 },
    reached: [0.25, 0.45],
    reachedIn: ["sulfate", "sulfate_sulfide", "chloride", "water"],
    usedIn: ["sulfate", "sulfate_sulfide", "water"],
    note: "SO2 gas; dithionate with manganese",
    source: HANDBOOK,
  },
  {
    id: "ferrous",
    name: "ferrous",
    kind: "reductant",
    couple: { oxidised: "Fe^3+", reduced: "Fe^2+", E0: 0.771, electrons: 1, protons: 0 },
    reached: [0.3, 0.6],
    reachedIn: acid,
    usedIn: ["sulfate", "sulfate_sulfide", "chloride"],
    note: "or scrap iron; an iron load to remove afterwards",
    source: HANDBOOK,
  },
  {
    id: "sulfide",
    name: "NaHS",
    kind: "reductant",
    couple: { oxidised: "S", reduced: "H2S", E0: 0.142, electrons: 2, protons: 2 },
    reached: [-0.1, 0.25],
    reachedIn: ["sulfate", "sulfate_sulfide", "chloride", "water"],
    usedIn: ["sulfate_sulfide"],
    note: "H2S below about pH 8-9",
    source: HANDBOOK,
  },
  {
    id: "organic",
    name: "sugar",
    kind: "reductant",
    reached: [0.2, 0.5],
    reachedIn: acid,
    usedIn: ["sulfate", "water"],
    note: "molasses or oxalic acid too; foaming, organics to solvent extraction",
    source: "Range: common practice, no source.",
  },
  {
    id: "zinc-dust",
    name: "Zn dust",
    kind: "cementing metal",
    couple: { oxidised: "Zn^2+", reduced: "Zn", E0: -0.762, electrons: 2, protons: 0 },
    reachedIn: [],
    usedIn: ["sulfate", "chloride", "cyanide", "water"],
    note: "hydrogen; AsH3 and SbH3 with arsenic or antimony; re-dissolution",
    source: METAL,
  },
  {
    id: "iron-scrap",
    name: "Fe scrap",
    kind: "cementing metal",
    couple: { oxidised: "Fe^2+", reduced: "Fe", E0: -0.447, electrons: 2, protons: 0 },
    reachedIn: [],
    usedIn: ["sulfate", "chloride", "water"],
    note: "ferric, acid and air waste iron",
    source: METAL,
  },
  {
    id: "aluminium",
    name: "Al",
    kind: "cementing metal",
    couple: { oxidised: "Al^3+", reduced: "Al", E0: -1.662, electrons: 3, protons: 0 },
    reachedIn: [],
    usedIn: ["chloride"],
    note: "needs chloride; hydrogen, heat, runaway",
    source: METAL,
  },
];

export const reagentById: ReadonlyMap<string, Reagent> = new Map(reagents.map((r) => [r.id, r]));
