import type { Outline } from "../../../shared/solution";
import { ringCoordinates } from "../geometry/rings";
import { type PlotTrace, trace } from "../plotTypes";
import type { MapView } from "../view";

/** What holds over all ranges: an outline inside the window's own, thinner and dashed. */
export const robustTraces = (windows: readonly Outline[], view: MapView): PlotTrace[] => [
  trace({
    uid: "robust",
    name: "Holds over all the ranges",
    mode: "lines",
    line: { color: view.colours.verdigris, width: 1.6, dash: "7px,3px" },
    ...ringCoordinates(windows, view.scale.toShown),
  }),
];
