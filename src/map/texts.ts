import type { FormulaPart } from "../../shared/species/typeset";

export interface TextLine {
  parts: readonly FormulaPart[];
  /** px */
  size: number;
  bold?: boolean;
}

/** A name that stands on the map, its middle at a point. */
export interface PlacedText {
  id: string;
  lines: readonly TextLine[];
  pH: number;
  /** V vs SHE */
  Eh: number;
  colour: string;
  /** on open ground, where the halo has another colour */
  lit: boolean;
}

/** A name that belongs to a line or a corner: the first of its places that is free is taken, and without one it is left out. */
export interface AnchoredText {
  id: string;
  parts: readonly FormulaPart[];
  size: number;
  colour: string;
  places: readonly (readonly [pH: number, Eh: number])[];
}
