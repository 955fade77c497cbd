import { useSyncExternalStore } from "react";
import type { Sheet } from "./boxes";
import type { PlotTrace } from "./plotTypes";
import { Shapes } from "./svg/Shapes";
import type { MapView } from "./view";
import type { MovingView } from "./zoom";

/** The shapes under the axes, which move with them under the hand. */
export function Under({
  traces,
  sheet,
  view,
  live,
}: {
  traces: readonly PlotTrace[];
  sheet: Sheet;
  view: MapView;
  live: MovingView;
}) {
  const moving = useSyncExternalStore(live.subscribe, live.get);
  return <Shapes traces={traces} sheet={sheet} visible={moving ?? view.visible} view={view} />;
}
