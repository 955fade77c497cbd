import { domains, type Sheet } from "./boxes";
import type { MapContent } from "./content";
import type { PlotAxis, PlotLayout, PlotTrace } from "./plotTypes";
import { boundaryTraces } from "./traces/fields";
import { gasTraces } from "./traces/gases";
import { openGroundTraces, shutGroundTraces, windowOutlineTraces } from "./traces/ground";
import { equilibriumTraces, hydrogenCyanideTraces, otherBasisTraces, waterTraces } from "./traces/lines";
import { keptTraces } from "./traces/kept";
import { practiceTraces } from "./traces/practice";
import { robustTraces } from "./traces/robust";
import { setPointTraces } from "./traces/setPoint";
import { type MapView, MONO } from "./view";

/** Traces from the ground up: light, hatching, hazard, boundaries, lines, outline, set point. Drawn by svg/Shapes.tsx; axes, names,
 *  strips and bars stand over them (svg/Overlay.tsx). */
export function mapTraces(content: MapContent, view: MapView): PlotTrace[] {
  const { solution } = content;
  const { layers } = view;
  const setPoint = solution.windows[view.window]?.setPoint ?? null;
  const all = [
    ...openGroundTraces(solution, view),
    ...shutGroundTraces(content.shut, view),
    ...keptTraces(content.kept, view),
    ...(layers.hazard && content.cyanide ? hydrogenCyanideTraces(view) : []),
    ...(layers.hazard ? gasTraces(content.gases, view) : []),
    ...(layers.boundaries ? boundaryTraces(content.boundaries, view) : []),
    ...(layers.water ? waterTraces(solution, view) : []),
    ...(layers.equilibriumLines ? equilibriumTraces(content.reaches, view) : []),
    ...(layers.otherBasis && content.moved ? otherBasisTraces(content.moved.limits, view) : []),
    ...windowOutlineTraces(solution, view),
    ...robustTraces(content.robust, view),
    ...(layers.practice ? practiceTraces(content.practice, view) : []),
    ...(layers.setPoint ? setPointTraces(setPoint, view) : []),
  ];
  return all.filter((t) => t.x.length > 0);
}

/** The chart under the hand: two axes without a line or a number, which zoom, pan and the wheel move.
 *  The frame and its ticks are drawn with the rest (svg/Axes.tsx). */
export function mapLayout(
  sheet: Sheet,
  { visible, scale }: Pick<MapView, "visible" | "scale">,
  dragMode: PlotLayout["dragmode"] = "zoom",
): PlotLayout {
  const place = domains(sheet, sheet.map);
  const axis: Partial<PlotAxis> = {
    showgrid: false,
    zeroline: false,
    showline: false,
    ticks: "",
    showticklabels: false,
  };
  const range = (bounds: readonly [number, number]): [number, number] => [
    scale.toShown(bounds[0]),
    scale.toShown(bounds[1]),
  ];
  return {
    width: sheet.width,
    height: sheet.height,
    margin: sheet.margin,
    autosize: false,
    paper_bgcolor: "rgba(0,0,0,0)",
    plot_bgcolor: "rgba(0,0,0,0)",
    showlegend: false,
    hovermode: false,
    dragmode: dragMode,
    font: { family: MONO, size: 12, color: "#000" },
    hoverlabel: { font: { family: MONO, size: 12 } },
    xaxis: { ...axis, domain: place.x, range: [visible.pH[0], visible.pH[1]], anchor: "y" },
    yaxis: { ...axis, domain: place.y, range: range(visible.Eh), anchor: "x" },
    annotations: [],
  };
}
