import type { HazardGas } from "./hazards/gases";
import type { Requirement } from "./schemas/problem";

/** What the solver answers (docs/solver.md). Potentials in V vs SHE at T; polygons counter-clockwise in (pH, Eh). */
export type Point = readonly [pH: number, Eh: number];
export type State = "dissolved" | "metal" | "compound";

export interface Field {
  metal: string;
  species: string;
  state: State;
  /** one convex piece */
  polygon: Point[];
}

/** One term of a balanced reaction; left-hand side negative. `e^-` and `H^+(aq)`, `H2O(l)` included. */
export interface ReactionTerm {
  species: string;
  formula: string;
  coefficient: number;
}

export type LimitKind = "metal" | "water" | "frame" | "hazard";

/** A gas kept out of windows: where its equilibrium pressure reaches `bar`, or below a pH. */
export type ExcludedGas =
  { gas: HazardGas; bar: number; pHAtLeast?: undefined } | { gas: HazardGas; pHAtLeast: number; bar?: undefined };

/** What a window must do: carry a metal as required, or keep a gas out. */
export type Demand =
  | { metal: string; requirement: Requirement; gas?: undefined }
  | (ExcludedGas & { metal?: undefined; requirement?: undefined });

/** The name of a demand: element or gas. */
export const demandName = (d: Demand): string => d.metal ?? d.gas;

export interface Limit {
  kind: LimitKind;
  metal?: string;
  /** hazard limits: the gas, and the pressure in bar or the pH that may not be passed */
  gas?: HazardGas;
  bar?: number;
  pHAtLeast?: number;
  /** species of the metal on the window's side and beyond the limit; for a hazard what carries the gas, and the gas */
  inside?: string;
  outside?: string;
  /** balanced, as text; `reactionTerms` for typesetting */
  reaction?: string;
  reactionTerms?: ReactionTerm[];
  /** water limits: "oxygen" or "hydrogen"; frame limits: the side */
  side?: string;
  /** k + x pH + y Eh = 0 on the limit, positive inside the window */
  line: [k: number, x: number, y: number];
  from: Point;
  to: Point;
  /** from the set point, counted in control bands */
  distance: number;
  /** signed distance from the set point along pH at its Eh, and along Eh at its pH; null where that line misses the limit */
  distancePH: number | null;
  distanceEh: number | null;
}

export interface SetPoint {
  pH: number;
  Eh: number;
  /** control bands to the nearest limit */
  margin: number;
  /** true where no couple of the liquor holds both forms above about 10 mg/L: margin counts pH alone, Eh is a range */
  mixedPotential: boolean;
  EhRange?: [number, number];
  /** the couple that sets Eh, for example ["Fe^2+(aq)", "Fe^3+(aq)"] */
  couple?: [string, string];
  cutByFrame: boolean;
}

/** Counter-clockwise outside, holes clockwise. */
export interface Outline {
  outer: Point[];
  holes: Point[][];
}

export interface Window {
  polygons: Outline[];
  /** pH x V */
  area: number;
  pH: [number, number];
  Eh: [number, number];
  /** wide enough for the control bands */
  controllable: boolean;
  setPoint: SetPoint;
  limits: Limit[];
}

export type WarningCode =
  | "TEMPERATURE_TRUST" // a drawn field rests on a G outside its trusted range
  | "LIGAND_DRAWN_DOWN"
  | "METASTABLE"
  | "KINETICS"
  | "SATURATION_PRESSURE";

export interface SolutionWarning {
  code: WarningCode;
  species?: string;
  metal?: string;
  text: string;
}

export interface WaterLine {
  which: "oxygen" | "hydrogen";
  /** Eh = intercept + slope pH */
  intercept: number;
  slope: number;
}

export interface Solution {
  temperatureC: number;
  fields: Field[];
  windows: Window[];
  /** of the best window (largest margin), null without a window */
  setPoint: SetPoint | null;
  conflicts: Demand[][];
  leftOut: { species: string; reason: string }[];
  warnings: SolutionWarning[];
  waterLines: WaterLine[];
  /** requirement and activity each metal was solved at, with gamma where it came from a tenor */
  metals: { metal: string; requirement: Requirement; activity: number; gPerL?: number; gamma?: number }[];
  /** ground shut by each metal: the union of its fields that are not as required, outlines with holes; on request only */
  shut?: { metal: string; polygons: Outline[] }[];
  /** ground of each hazard kept out, where it has some inside the frame; on request only */
  kept?: (ExcludedGas & { polygons: Outline[] })[];
  frame: { pH: [number, number]; Eh: [number, number] };
}
