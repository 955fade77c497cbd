import { useCallback, useMemo } from "react";
import type { Analysis } from "../../../../shared/analysis";
import { type HazardGas, hazardGases } from "../../../../shared/hazards/pressures";
import { sharesGround } from "../../../../shared/hazards/reachesWindow";
import { type HazardMap, hazardRegions } from "../../../../shared/hazards/regions";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import { type HeldSetPoint, heldSetPoint } from "../../../../shared/setpoint/held";
import type { Solution, Window } from "../../../../shared/solution";
import type { useSwitches } from "./useMapSettings";

export interface Standing {
  /** with the held point in place of its window's deepest one */
  solution: Solution | null;
  /** null where the deepest point counts */
  held: HeldSetPoint | null;
}

/** The solution as it stands with the plan's held set point. */
export function useHeld(inputs: PlanInputs, solution: Solution | null, analysis: Analysis | null): Standing {
  const { heldSetPoint: at, controlBand } = inputs;
  return useMemo(() => {
    if (!solution || !analysis || !at) return { solution, held: null };
    const held = heldSetPoint(analysis, solution, [at.pH, at.Eh], controlBand);
    if (held === null) return { solution, held: null };
    const windows = solution.windows.map((w, i) => (i === held.index ? held.window : w));
    return { solution: { ...solution, windows }, held };
  }, [solution, analysis, at, controlBand]);
}

export interface Gases {
  map: HazardMap;
  /** gases that have ground in common with the window */
  reaching: ReadonlySet<HazardGas>;
  /** gases drawn: those that reach the window unless the member chose otherwise */
  shown: ReadonlySet<HazardGas>;
}

const switchOf = (gas: HazardGas) => `gas ${gas}`;

/** Gas over the liquor, by region and at the set point, and which gases the map draws. */
export function useGases(
  analysis: Analysis | null,
  window: Window | null,
  [switches, set]: ReturnType<typeof useSwitches>,
): { gases: Gases | null; choose: (gas: HazardGas, on: boolean) => void } {
  const polygons = window?.polygons;
  const { pH, Eh } = window?.setPoint ?? {};
  const map = useMemo(() => {
    if (!analysis) return null;
    const setPoint = pH === undefined || Eh === undefined ? null : { pH, Eh };
    const outcome = hazardRegions(analysis, { setPoint });
    return outcome.ok ? outcome.value : null;
  }, [analysis, pH, Eh]);
  const gases = useMemo(() => {
    if (!map) return null;
    const reaching = new Set(map.regions.filter((r) => polygons && sharesGround(r.region, polygons)).map((r) => r.gas));
    const shown = new Set(hazardGases.filter((gas) => switches[switchOf(gas)] ?? reaching.has(gas)));
    return { map, reaching, shown };
  }, [map, polygons, switches]);
  const choose = useCallback((gas: HazardGas, on: boolean) => set(switchOf(gas), on), [set]);
  return { gases, choose };
}
