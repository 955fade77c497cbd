import { useMemo } from "react";
import type { FreeAcidCurve } from "../../../../shared/activity/freeAcid";
import type { HazardRegion } from "../../../../shared/hazards/regions";
import { type Reach, reachesOf } from "../../../../shared/reach/reach";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Problem } from "../../../../shared/schemas/problem";
import type { Outline, Point, Solution } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import type { PotentialScale } from "../../../lib/potential";
import type { ThemeColours } from "../../../lib/theme";
import { useRested } from "../../../lib/useRested";
import type { ContentWishes } from "../../../map/content";
import type { ShownRange } from "../../../map/traces/practice";
import { trustOf } from "../../../map/trust";
import type { Layers, MapMetal, MapView } from "../../../map/view";
import { usePractice } from "./usePractice";
import type { Sight } from "./useSight";
import { useOtherBasis } from "./useSolved";

export interface MapModel {
  /** what the map shows of the plan; worked out where it is drawn */
  asked: ContentWishes;
  view: MapView;
  metals: readonly MapMetal[];
  reaches: readonly Reach[];
  /** published ranges that fit the plan; empty while the layer is off */
  practice: readonly ShownRange[];
  /** the point the crosscuts run through */
  through: Point;
}

interface Wishes {
  inputs: PlanInputs;
  problem: Problem;
  /** null before any answer */
  solution: Solution | null;
  data: ChemicalData;
  scale: PotentialScale;
  colours: ThemeColours;
  layers: Layers;
  plain: boolean;
  sight: Sight;
  chosen: number;
  reagents: readonly string[];
  /** what holds over the plan's ranges */
  robust: readonly Outline[];
  /** gases to be drawn */
  gases: readonly HazardRegion[];
  /** of a sulfate liquor */
  freeAcid: FreeAcidCurve | null;
}

/** ms: the thin edges of the other solids basis may stay so long behind the hand */
const OTHER_BASIS_AFTER = 100;

const middle = ([lo, hi]: readonly [number, number]) => (lo + hi) / 2;

/** All that the map, its pictures and its read-out need; parts keep their identity while what they rest on stands. */
export function useMapModel(w: Wishes): MapModel | null {
  const { inputs, problem, solution, data, scale, colours, layers, plain, sight, chosen, reagents } = w;
  const { robust, gases, freeAcid } = w;
  const { focus, hidden, pair, pinned, zoom } = sight;
  const { metals: planMetals, controlBand, preset } = inputs;
  const frame = solution?.frame ?? inputs.frame;
  const temperatureC = solution?.temperatureC ?? inputs.temperatureC;
  const rested = useRested(problem, OTHER_BASIS_AFTER);
  const other = useOtherBasis(rested, data, layers.otherBasis && !plain);
  const setPoint = solution?.windows[chosen]?.setPoint ?? null;
  const metals = useMemo(
    () => planMetals.map(({ element, role, requirement }) => ({ element, role, requirement })),
    [planMetals],
  );
  const through = useMemo(
    (): Point => (setPoint ? [setPoint.pH, setPoint.Eh] : [middle(frame.pH), middle(frame.Eh)]),
    [setPoint, frame],
  );
  const reaches = useMemo(
    () => reachesOf(data, reagents, preset, temperatureC),
    [data, reagents, preset, temperatureC],
  );
  const practice = usePractice(layers.practice, { preset, metals: planMetals, temperatureC });
  const cyanide = inputs.ligands.some((l) => l.component === "CN");
  const asked = useMemo(
    () => solution && { metals, solution, other, through, pinned, reaches, cyanide, robust, gases, practice, freeAcid },
    [metals, solution, other, through, pinned, reaches, cyanide, robust, gases, practice, freeAcid],
  );
  const trust = useMemo(() => (solution ? trustOf(solution, data) : undefined), [solution, data]);
  const view = useMemo(
    (): MapView => ({
      metals,
      frame,
      visible: zoom ?? frame,
      controlBand,
      scale,
      colours,
      plain,
      focus,
      hidden: new Set(hidden),
      pair,
      layers,
      window: chosen,
      ...(trust ? { trust } : {}),
    }),
    [metals, frame, zoom, controlBand, scale, colours, plain, focus, hidden, pair, layers, chosen, trust],
  );
  return useMemo(
    () => asked && { asked, view, metals, reaches, practice, through },
    [asked, view, metals, reaches, practice, through],
  );
}
