import { useCallback, useEffect, useMemo, useState } from "react";
import { z } from "zod";
import { usualReagents } from "../../../../shared/reach/reach";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import { usePreferences } from "../../../lib/preferences";
import { defaultLayers, type LayerName, layerNames, type Layers } from "../../../map/view";

/** Layers and the plain view, remembered for the member. */
export function useMapSettings() {
  const [preferences, change] = usePreferences();
  const kept = preferences.layers;
  const layers = useMemo(
    () =>
      Object.fromEntries(layerNames.map((name) => [name, kept[name] ?? defaultLayers[name]])) as Record<
        LayerName,
        boolean
      >,
    [kept],
  );
  const setLayer = useCallback(
    (name: LayerName, on: boolean) => change({ layers: { ...kept, [name]: on } }),
    [change, kept],
  );
  const setPlain = useCallback((plainMap: boolean) => change({ plainMap }), [change]);
  return { layers: layers as Layers, setLayer, plain: preferences.plainMap, setPlain };
}

const shelf = (planId: string) => `gangueway.reagents.${planId}`;
const ids = z.array(z.string());

function keptReagents(planId: string): string[] | null {
  try {
    const parsed = ids.safeParse(JSON.parse(localStorage.getItem(shelf(planId)) ?? "null"));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/** Reagents drawn beside the Eh axis: what is usual in the liquor until somebody chooses; the choice stays in this browser. */
export function useReagents(planId: string, inputs: Pick<PlanInputs, "preset" | "metals">) {
  const [chosen, setChosen] = useState(() => keptReagents(planId));
  const { preset, metals } = inputs;
  const usual = useMemo(() => usualReagents({ preset, metals }), [preset, metals]);
  useEffect(() => {
    try {
      if (chosen) localStorage.setItem(shelf(planId), JSON.stringify(chosen));
      else localStorage.removeItem(shelf(planId));
    } catch {
      // remembered for this visit only
    }
  }, [chosen, planId]);
  return { reagents: chosen ?? usual, chosen: chosen !== null, choose: setChosen };
}
