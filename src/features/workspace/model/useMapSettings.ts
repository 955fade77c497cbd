import { useCallback, useMemo } from "react";
import { z } from "../../../../shared/schemas/z";
import { usualReagents } from "../../../../shared/reach/reach";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import { usePreferences } from "../../../lib/preferences";
import type { ChangeView } from "../address/useView";
import type { PlanView } from "../address/view";
import { defaultLayers, type LayerName, layerNames, type Layers } from "../../../map/view";

/** Switches of layers and gases by name: as the address brought them, else as the member has them. What is switched is remembered
 *  for the member either way, one switch at a time. */
export function useSwitches(
  view: PlanView,
  changeView: ChangeView,
): [Readonly<Record<string, boolean | undefined>>, (name: string, on: boolean) => void] {
  const [{ layers: own }, remember] = usePreferences();
  const { layers: brought } = view;
  const set = useCallback(
    (name: string, on: boolean) => {
      if (brought) changeView({ layers: { ...brought, [name]: on } });
      remember({ layers: { ...own, [name]: on } });
    },
    [brought, own, changeView, remember],
  );
  return [brought ?? own, set];
}

/** Layers and the plain view, remembered for the member. */
export function useMapSettings(view: PlanView, changeView: ChangeView) {
  const [preferences, remember] = usePreferences();
  const [switches, set] = useSwitches(view, changeView);
  const layers = useMemo(
    () =>
      Object.fromEntries(layerNames.map((name) => [name, switches[name] ?? defaultLayers[name]])) as Record<
        LayerName,
        boolean
      >,
    [switches],
  );
  const setLayer: (name: LayerName, on: boolean) => void = set;
  const setPlain = useCallback(
    (plainMap: boolean) => {
      changeView({ plain: plainMap });
      remember({ plainMap });
    },
    [changeView, remember],
  );
  return { layers: layers as Layers, setLayer, plain: view.plain ?? preferences.plainMap, setPlain, switches };
}

const shelf = (planId: string) => `gangueway.reagents.${planId}`;
const ids = z.array(z.string());

/** Reagents chosen in this browser; null where nobody chose. */
export function keptReagents(planId: string): string[] | null {
  try {
    const parsed = ids.safeParse(JSON.parse(localStorage.getItem(shelf(planId)) ?? "null"));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

function keepReagents(planId: string, chosen: readonly string[] | null): void {
  try {
    if (chosen) localStorage.setItem(shelf(planId), JSON.stringify(chosen));
    else localStorage.removeItem(shelf(planId));
  } catch {
    // remembered for this visit only
  }
}

/** Reagents drawn beside the Eh axis: what is usual in the liquor until somebody chooses; the choice stays in this browser. */
export function useReagents(
  planId: string,
  inputs: Pick<PlanInputs, "preset" | "metals">,
  view: PlanView,
  changeView: ChangeView,
) {
  const { preset, metals } = inputs;
  const usual = useMemo(() => usualReagents({ preset, metals }), [preset, metals]);
  const choose = useCallback(
    (reagents: string[] | null) => {
      keepReagents(planId, reagents);
      changeView({ reagents });
    },
    [planId, changeView],
  );
  return { reagents: view.reagents ?? usual, choose };
}
