import { FREE_ACID_BELOW, type FreeAcidCurve } from "../../shared/activity/freeAcid";
import type { HazardRegion } from "../../shared/hazards/regions";
import type { Reach } from "../../shared/reach/reach";
import { crosscut } from "../../shared/setpoint/crosscut";
import type { Limit, Outline, Point, Solution } from "../../shared/solution";
import type { Crosscut } from "./svg/stripModel";
import { boundariesByMetal } from "./traces/fields";
import { movedLimits } from "./traces/lines";
import type { ProposedMark } from "./proposalStore";
import type { ShownRange } from "./traces/practice";
import type { ColourScale, TrialMark } from "./trialMarks";
import type { MapMetal } from "./view";

/** Everything a map shows, worked out before the view comes in, so that a theme or a zoom redoes none of it. */
export interface MapContent {
  solution: Solution;
  /** of the liquor, C: one, or two laid over each other */
  temperatures: readonly number[];
  shut: ReadonlyMap<string, readonly Outline[]>;
  boundaries: ReadonlyMap<string, readonly (readonly Point[])[]>;
  /** the point the crosscuts run through; null hides them */
  through: Point | null;
  crosscuts: readonly Crosscut[];
  /** a second pair of crosscuts to compare, through a point elsewhere */
  pinned: { through: Point; crosscuts: readonly Crosscut[] } | null;
  reaches: readonly Reach[];
  /** edges that the other solids basis would move, with its name */
  moved: { basis: string; limits: readonly Limit[] } | null;
  /** ground of hazards kept out of the windows */
  kept: NonNullable<Solution["kept"]>;
  /** cyanide has a total and HCN is not kept out anyway: its region is drawn */
  cyanide: boolean;
  /** what holds over the plan's ranges */
  robust: readonly Outline[];
  /** gases whose region is drawn */
  gases: readonly HazardRegion[];
  practice: readonly ShownRange[];
  trials: { marks: readonly TrialMark[]; scale: ColourScale } | null;
  /** free acid against pH, where the frame holds a pH at which it counts; null elsewhere and without sulfate */
  freeAcid: FreeAcidCurve | null;
  /** next trials, for a picture */
  proposals: readonly ProposedMark[];
}

export interface ContentWishes {
  metals: readonly MapMetal[];
  /** solved with the shut ground outlined */
  solution: Solution;
  /** of the liquor, C, where two solutions are laid over each other; else the solution's own */
  temperatures?: readonly number[];
  /** the same question on the other solids basis */
  other: { basis: string; solution: Solution } | null;
  /** where the crosscuts run: the set point of the window in hand */
  through: Point | null;
  /** a point the user pinned, to compare its crosscuts */
  pinned?: Point | null;
  reaches: readonly Reach[];
  cyanide: boolean;
  robust?: readonly Outline[];
  gases?: readonly HazardRegion[];
  practice?: readonly ShownRange[];
  trials?: MapContent["trials"];
  freeAcid?: FreeAcidCurve | null;
  proposals?: readonly ProposedMark[];
}

export function mapContent(wishes: ContentWishes): MapContent {
  const { metals, solution, other, through, reaches, cyanide, robust = [], gases = [], practice = [] } = wishes;
  const { trials = null, pinned = null, freeAcid = null, proposals = [] } = wishes;
  const cutsThrough = (at: Point) =>
    metals.map((metal) => ({
      metal,
      alongPH: crosscut(solution, metal.element, "pH", at),
      alongEh: crosscut(solution, metal.element, "Eh", at),
    }));
  return {
    solution,
    temperatures: wishes.temperatures ?? [solution.temperatureC],
    shut: new Map((solution.shut ?? []).map(({ metal, polygons }) => [metal, polygons])),
    boundaries: boundariesByMetal(solution.fields, solution.frame),
    through,
    crosscuts: through === null ? [] : cutsThrough(through),
    pinned: pinned && { through: pinned, crosscuts: cutsThrough(pinned) },
    reaches,
    moved: other && { basis: other.basis, limits: movedLimits(solution, other.solution) },
    kept: solution.kept ?? [],
    cyanide: cyanide && !solution.kept?.some((k) => k.gas === "HCN"),
    robust,
    gases,
    practice,
    trials,
    freeAcid: solution.frame.pH[0] < FREE_ACID_BELOW ? freeAcid : null,
    proposals,
  };
}
