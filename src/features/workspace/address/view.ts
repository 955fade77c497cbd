import type { Frame } from "../../../../shared/schemas/problem";
import type { Point } from "../../../../shared/solution";
import type { Varied } from "../../../../shared/whatif/vary";
import type { ScaleChoice } from "../../../lib/scaleChoice";

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
  /** elements set against each other */
  pair: readonly string[];
  /** switches by layer ("labels") or gas ("gas HCN"); null: as the member has them */
  layers: Readonly<Record<string, boolean>> | null;
  plain: boolean | null;
  /** index of the window the answers speak of */
  window: number;
  /** where the crosscuts run; null: through the set point */
  pin: Point | null;
  /** where a second pair of crosscuts runs */
  pin2: Point | null;
  /** reagents drawn; null: as chosen in this browser, else what is usual */
  reagents: readonly string[] | null;
  /** null: as the member has it */
  scale: ScaleChoice | null;
  side: "answers" | "trials";
  trialsOf: "plan" | "project";
  colouredBy: "recoveryPct" | "gangueDissolvedPct" | "selectivityPct";
  /** campaigns whose trials are not drawn, by id */
  without: readonly string[];
  /** null: the map stands there */
  film: FilmWish | null;
}

/** A plan opened by its bare address. */
export const bareView: PlanView = {
  visible: null,
  focus: null,
  hidden: [],
  pair: [],
  layers: null,
  plain: null,
  window: 0,
  pin: null,
  pin2: null,
  reagents: null,
  scale: null,
  side: "answers",
  trialsOf: "plan",
  colouredBy: "recoveryPct",
  without: [],
  film: null,
};
