import type { ChemicalTables, SpeciesRow } from "../schemas/chemistry";

/** A species as the solver wants it: numbers parsed, composition over components plus H and O. */
export interface Species {
  readonly id: string;
  readonly formula: string;
  readonly name: string;
  readonly phase: "aq" | "s" | "l" | "g";
  readonly charge: number;
  /** atoms or ligand groups: { Cu: 1, NH3: 4 }; H and O included, not counted again inside a group */
  readonly composition: Readonly<Record<string, number>>;
  readonly row: SpeciesRow;
}

export interface Reaction {
  /** species id -> coefficient, products positive */
  readonly terms: ReadonlyMap<string, number>;
}

/** How a row without an entropy goes to T (extrapolation.csv), its reaction parsed once. */
export interface Extrapolation {
  readonly hold: "logK" | "dG" | "none";
  readonly reaction: Reaction | null;
}

/** The indexed library. Immutable: `withSpecies` (species/library.ts) makes a new one. */
export interface ChemicalData {
  readonly version: string;
  readonly tables: ChemicalTables;
  readonly species: ReadonlyMap<string, Species>;
  /** element or ligand component -> kind; H and O included */
  readonly components: ReadonlyMap<
    string,
    { kind: "element" | "ligand_group"; elements: Readonly<Record<string, number>>; note: string }
  >;
  readonly molarMass: ReadonlyMap<string, number>;
  readonly extrapolation: ReadonlyMap<string, Extrapolation>;
}

/** Standard Gibbs energy of one species at T on the H^+(aq) = 0 convention, with how it came about. */
export interface SpeciesEnergy {
  /** J/mol; apparent: G298 of formation less the integral of S dT */
  readonly G: number;
  /** the temperature model in a few words, for the screen: "Cp polynomial", "entropy correspondence, cation", "log K of the reaction held" ... */
  readonly model: string;
  /** C */
  readonly trusted: readonly [lo: number, hi: number];
  /** why it is not to be trusted at this T, or null */
  readonly warning: string | null;
}

/** Energies at one temperature; each species is worked out once, when first asked for. */
export interface EnergiesAtT {
  readonly T: number; // K
  of(id: string): SpeciesEnergy;
}
