import type { PresetName } from "../schemas/plan";
import { oxidants } from "./oxidants";
import { cementingMetals, reductants } from "./reductants";

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
  /** what it can do to people or plant beside its work */
  hazard: string;
  source: string;
}

/** What can move a slurry's potential. Practical ranges are what platinum commonly reads, not what the couple would give. */
export const reagents: readonly Reagent[] = [...oxidants, ...reductants, ...cementingMetals];

export const reagentById: ReadonlyMap<string, Reagent> = new Map(reagents.map((r) => [r.id, r]));
