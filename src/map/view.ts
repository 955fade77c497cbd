import type { Trust } from "./trust";
import type { Frame, Requirement } from "../../shared/schemas/problem";
import type { PotentialScale } from "../lib/potential";
import type { ThemeColours } from "../lib/theme";

export type Role = "target" | "gangue" | "watched";

export interface MapMetal {
  element: string;
  role: Role;
  requirement: Requirement;
}

/** What the map needs of the potential scale; the core stays in V vs SHE, and here the scale enters. */
export type ShownScale = Pick<PotentialScale, "unit" | "short" | "toShown" | "fromShown">;

/** The layers a user can switch; the map's ground and window always stay. */
export const layerNames = [
  "boundaries",
  "labels",
  "water",
  "setPoint",
  "crosscuts",
  "reach",
  "equilibriumLines",
  "otherBasis",
  "hazard",
  "practice",
  "trials",
] as const;
export type LayerName = (typeof layerNames)[number];
export type Layers = Readonly<Record<LayerName, boolean>>;

export const layerWords: Readonly<Record<LayerName, string>> = {
  boundaries: "Field boundaries",
  labels: "Field names",
  water: "Water lines",
  setPoint: "Set point and band",
  crosscuts: "Crosscuts",
  reach: "Reach bars",
  equilibriumLines: "Reagents’ equilibria",
  otherBasis: "Other solids basis",
  hazard: "Hazard regions",
  practice: "Published practice",
  trials: "Trials",
};

export const defaultLayers: Layers = {
  boundaries: true,
  labels: true,
  water: true,
  setPoint: true,
  crosscuts: true,
  reach: true,
  equilibriumLines: false,
  otherBasis: true,
  hazard: true,
  practice: false,
  trials: true,
};

/** Everything that decides how a solution is drawn, none of it what is drawn. */
export interface MapView {
  metals: readonly MapMetal[];
  frame: Frame;
  controlBand: { pH: number; Eh: number };
  /** the ranges in sight, V vs SHE; the frame until somebody zooms */
  visible: Frame;
  scale: ShownScale;
  colours: ThemeColours;
  /** all-fields view: every field named, nothing hatched */
  plain: boolean;
  /** element in focus: the others step back */
  focus: string | null;
  /** elements that are not drawn; they count in the windows all the same */
  hidden: ReadonlySet<string>;
  /** two metals that are compared: only they are drawn, and the fields named are those of both together */
  pair: readonly [string, string] | null;
  layers: Layers;
  /** index into solution.windows */
  window: number;
  /** of the species that rule fields; without it none is marked */
  trust?: Trust;
}

/** Whether a metal is drawn at all. */
export const isDrawn = (element: string, { hidden, pair }: Pick<MapView, "hidden" | "pair">): boolean =>
  pair === null ? !hidden.has(element) : pair.includes(element);

/** The metals that are drawn, in the order of the plan. */
export const drawnMetals = (view: Pick<MapView, "metals" | "hidden" | "pair">): MapMetal[] =>
  view.metals.filter(({ element }) => isDrawn(element, view));

export const MONO = "JetBrains Mono, Gangueway Signs, ui-monospace, monospace";

export { windowName } from "../../shared/windows/limitWords";
