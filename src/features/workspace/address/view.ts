import type { Frame } from "../../../../shared/schemas/problem";
import type { Point } from "../../../../shared/solution";
import type { Varied } from "../../../../shared/whatif/vary";
import type { ScaleChoice } from "../../../lib/scaleChoice";
import type { Brushed } from "../../../map/trialStore";

/** The filmstrip of one setting: what is varied, over which range, in how many small maps. */
export interface FilmWish {
  vary: Varied;
  range: readonly [number, number];
  frames: number;
}

/** How a plan is looked at: everything the screen shows that is neither the plan itself nor a matter of the person (theme). An address carries it. */
export interface PlanView {
  /** ranges in sight, V vs SHE; null: the whole frame */
  visible: Frame | null;
  /** element in focus */
  focus: string | null;
  /** elements left out of the drawing */
  hidden: readonly string[];
  /** the two metals that alone are drawn, to be compared */
  pair: readonly [string, string] | null;
  /** switches by layer ("labels") or gas ("gas HCN"); null: as the member has them */
  layers: Readonly<Record<string, boolean>> | null;
  plain: boolean | null;
  /** index of the window the answers speak of */
  window: number;
  /** where a second pair of crosscuts runs; the first runs through the set point */
  pin: Point | null;
  /** reagents drawn; null: as chosen in this browser, else what is usual */
  reagents: readonly string[] | null;
  /** null: as the member has it */
  scale: ScaleChoice | null;
  side: "answers" | "trials";
  trialsOf: "plan" | "project";
  colouredBy: "recoveryPct" | "gangueDissolvedPct" | "selectivityPct";
  /** campaigns whose trials are not drawn, by id */
  without: readonly string[];
  /** the box of the map whose trials are listed; null: all of them */
  brush: Brushed | null;
  /** the comments stand in place of the answers */
  comments: boolean;
  /** the map stands as text */
  asText: boolean;
  /** null: the map stands there */
  film: FilmWish | null;
}

/** A plan opened by its bare address. */
export const bareView: PlanView = {
  visible: null,
  focus: null,
  hidden: [],
  pair: null,
  layers: null,
  plain: null,
  window: 0,
  pin: null,
  reagents: null,
  scale: null,
  side: "answers",
  trialsOf: "plan",
  colouredBy: "recoveryPct",
  without: [],
  brush: null,
  comments: false,
  asText: false,
  film: null,
};
