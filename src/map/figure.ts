import { domains, type Sheet } from "./boxes";
import type { MapContent } from "./content";
import type { Figure, PlotAnnotation, PlotAxis, PlotLayout, PlotTrace } from "./plotTypes";
import { acidRow } from "./traces/acidAxis";
import { alongEhNames, alongPHNames, crosscutTraces, stripHeads, type StripSizes } from "./traces/crosscuts";
import { boundaryTraces } from "./traces/fields";
import { gasTraces } from "./traces/gases";
import { groundTrace, openGroundTraces, shutGroundTraces, windowOutlineTraces } from "./traces/ground";
import { equilibriumTraces, hydrogenCyanideTraces, otherBasisTraces, waterTraces } from "./traces/lines";
import { nameTraces } from "./traces/names";
import { keptTraces } from "./traces/kept";
import { proposalTraces } from "./traces/proposals";
import { practiceTraces } from "./traces/practice";
import { reachHeads, reachTraces } from "./traces/reachBars";
import { robustTraces } from "./traces/robust";
import { setPointTraces } from "./traces/setPoint";
import { trialTraces } from "./traces/trials";
import { type MapView, MONO } from "./view";

const stripSizes = ({ map }: Sheet, { visible }: MapView): StripSizes => ({
  pxPerPH: (map.x1 - map.x0) / (visible.pH[1] - visible.pH[0]),
  pxPerVolt: (map.y1 - map.y0) / (visible.Eh[1] - visible.Eh[0]),
});

/** Traces from the ground up: sheet, light, hatching, hazard, boundaries, lines, outline, set point, names; then strips and bars. */
export function mapTraces(content: MapContent, sheet: Sheet, view: MapView): PlotTrace[] {
  const { solution, through } = content;
  const { layers } = view;
  const setPoint = solution.windows[view.window]?.setPoint ?? null;
  const all = [
    groundTrace(view),
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
    ...(layers.setPoint ? setPointTraces(setPoint, layers.crosscuts ? through : null, view) : []),
    ...nameTraces(content, sheet, view),
    ...(view.traceTrials && layers.trials && content.trials
      ? trialTraces(content.trials.marks, content.trials.scale, view)
      : []),
    ...(view.traceTrials ? proposalTraces(content.proposals, view) : []),
    ...(sheet.alongPH && through
      ? [
          ...crosscutTraces(content.crosscuts, through, view),
          ...alongPHNames(content.crosscuts, view, stripSizes(sheet, view)),
        ]
      : []),
    ...(sheet.reach ? reachTraces(content.reaches, through?.[0] ?? view.frame.pH[0], view) : []),
  ];
  return all.filter((t) => t.x.length > 0);
}

function annotations(content: MapContent, sheet: Sheet, view: MapView): PlotAnnotation[] {
  const muted = { family: MONO, size: 11, color: view.colours.muted };
  const axisWords: PlotAnnotation[] = [
    {
      text: `pH at ${content.solution.temperatureC} °C`,
      x: 1,
      y: 0,
      xref: "x domain",
      yref: "y domain",
      xanchor: "right",
      yanchor: "top",
      yshift: -20,
      showarrow: false,
      font: muted,
    },
    {
      text: `Eh / ${view.scale.unit} vs ${view.scale.short}`,
      x: 0,
      y: 0.5,
      xref: "x domain",
      yref: "y domain",
      xanchor: "center",
      yanchor: "middle",
      xshift: -50,
      textangle: -90,
      showarrow: false,
      font: muted,
    },
  ];
  const reachHead: PlotAnnotation[] = sheet.reach
    ? [
        {
          text: "reach",
          x: 0.5,
          y: 1,
          xref: "x3 domain",
          yref: "y domain",
          xanchor: "center",
          yanchor: "bottom",
          showarrow: false,
          font: muted,
        },
      ]
    : [];
  return [
    ...axisWords,
    ...reachHead,
    ...(sheet.alongEh && content.through ? alongEhNames(content.crosscuts, view, stripSizes(sheet, view)) : []),
  ];
}

/** Axes, ranges and words around the map. `uirevision` changes with frame and scale only, so a zoom outlives every other change. */
export function mapLayout(content: MapContent, sheet: Sheet, view: MapView): PlotLayout {
  const { frame, visible, colours, scale } = view;
  const place = domains(sheet, sheet.map);
  const axis: Partial<PlotAxis> = {
    showgrid: false,
    zeroline: false,
    showline: true,
    mirror: true,
    linecolor: colours.ink,
    linewidth: 1.2,
    ticks: "outside",
    ticklen: 5,
    tickcolor: colours.ink,
    tickfont: { family: MONO, size: 12, color: colours.ink },
    layer: "above traces",
    tickangle: 0,
    ticklabeloverflow: "allow",
  };
  const range = (bounds: readonly [number, number]): [number, number] => [
    scale.toShown(bounds[0]),
    scale.toShown(bounds[1]),
  ];
  const bare: Partial<PlotAxis> = {
    fixedrange: true,
    showgrid: false,
    zeroline: false,
    showline: false,
    // an invisible tick keeps the word off the strip
    ticks: "outside",
    ticklen: 4,
    tickcolor: "rgba(0,0,0,0)",
    tickangle: 0,
    ticklabeloverflow: "allow",
    tickfont: { family: MONO, size: 11, color: colours.ink },
  };
  const acid = acidRow(content.freeAcid, sheet, view);
  const heads = stripHeads(content.crosscuts, view);
  const rows = content.crosscuts.length;
  const layout: PlotLayout = {
    width: sheet.width,
    height: sheet.height,
    margin: sheet.margin,
    autosize: false,
    paper_bgcolor: "rgba(0,0,0,0)",
    plot_bgcolor: "rgba(0,0,0,0)",
    showlegend: false,
    hovermode: false,
    dragmode: "zoom",
    uirevision: [frame.pH, frame.Eh, scale.unit, scale.short].flat().join(" "),
    font: { family: MONO, size: 12, color: colours.ink },
    hoverlabel: { font: { family: MONO, size: 12 } },
    xaxis: { ...axis, domain: place.x, range: [visible.pH[0], visible.pH[1]], anchor: "y", nticks: 9 },
    yaxis: {
      ...axis,
      domain: place.y,
      range: range(visible.Eh),
      anchor: "x",
      nticks: 9,
      tickformat: scale.unit === "V" ? ".1f" : "d",
    },
    annotations: [...annotations(content, sheet, view), ...acid.annotations],
    shapes: acid.shapes,
  };
  if (sheet.alongPH)
    layout.yaxis2 = { ...bare, ...heads, domain: domains(sheet, sheet.alongPH).y, range: [rows, 0], anchor: "x" };
  if (sheet.alongEh)
    layout.xaxis2 = {
      ...bare,
      ...heads,
      side: "top",
      domain: domains(sheet, sheet.alongEh).x,
      range: [0, rows],
      anchor: "y",
    };
  if (sheet.reach)
    layout.xaxis3 = {
      ...bare,
      ...reachHeads(content.reaches),
      tickangle: -90,
      domain: domains(sheet, sheet.reach).x,
      range: [0, Math.max(1, content.reaches.length)],
      anchor: "y",
    };
  return layout;
}

export const mapFigure = (content: MapContent, sheet: Sheet, view: MapView): Figure => ({
  data: mapTraces(content, sheet, view),
  layout: mapLayout(content, sheet, view),
});
