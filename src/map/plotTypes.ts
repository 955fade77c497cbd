import type { Hatch } from "../../shared/drawing/hatches";

/** The few parts of Plotly's figure that the map uses, typed tightly; its own schema covers fifty chart kinds. */
export type Coordinate = number | null;

export interface PatternFill extends Hatch {
  fgcolor: string;
  fgopacity: number;
  bgcolor: string;
}

export interface PlotTrace {
  type: "scatter";
  uid: string;
  name: string;
  x: Coordinate[];
  y: Coordinate[];
  mode: "lines" | "lines+markers" | "markers";
  yaxis?: "y" | "y2";
  line?: { color: string; width: number; dash?: string; shape?: "linear"; simplify?: boolean };
  fill?: "toself" | "none";
  fillcolor?: string;
  fillpattern?: PatternFill;
  marker?: {
    color: string | string[];
    size: number[];
    symbol: string | string[];
    opacity: number;
    line: { width: number; color?: string };
  };
  opacity?: number;
  hoverinfo: "skip";
  showlegend: false;
  connectgaps: false;
  cliponaxis?: boolean;
}

export interface PlotAnnotation {
  text: string;
  x: number;
  y: number;
  xref: string;
  yref: string;
  showarrow: false;
  font: { family: string; size: number; color: string; weight?: number };
  xanchor?: "left" | "center" | "right";
  yanchor?: "top" | "middle" | "bottom";
  textangle?: number;
  align?: "left" | "center" | "right";
  bgcolor?: string;
  borderpad?: number;
  opacity?: number;
  xshift?: number;
  yshift?: number;
}

export interface PlotAxis {
  domain: [number, number];
  range: [number, number];
  anchor: string;
  visible?: boolean;
  fixedrange?: boolean;
  showgrid?: boolean;
  zeroline?: boolean;
  showline?: boolean;
  mirror?: boolean | "ticks" | "all";
  linecolor?: string;
  linewidth?: number;
  ticks?: "outside" | "inside" | "";
  showticklabels?: boolean;
  ticklen?: number;
  tickcolor?: string;
  tickfont?: { family: string; size: number; color: string };
  tickformat?: string;
  nticks?: number;
  layer?: "above traces" | "below traces";
  side?: "top" | "bottom" | "left" | "right";
  tickvals?: number[];
  ticktext?: string[];
  tickangle?: number;
  /** "allow" spares Plotly measuring every label */
  ticklabeloverflow?: "allow";
}

export interface PlotLayout {
  width: number;
  height: number;
  margin: { l: number; r: number; t: number; b: number; pad: 0 };
  autosize: false;
  paper_bgcolor: string;
  plot_bgcolor: string;
  showlegend: false;
  hovermode: false;
  dragmode: "zoom" | "pan";
  uirevision?: string;
  font: { family: string; size: number; color: string };
  hoverlabel: { font: { family: string; size: number } };
  xaxis: PlotAxis;
  yaxis: PlotAxis;
  yaxis2?: PlotAxis;
  annotations: PlotAnnotation[];
  /** another number draws the same anew */
  datarevision?: number;
}

export interface Figure {
  data: PlotTrace[];
  layout: PlotLayout;
}

/** What every trace shares: no hover box, no legend, gaps kept. */
export const trace = (parts: Omit<PlotTrace, "type" | "hoverinfo" | "showlegend" | "connectgaps">): PlotTrace => ({
  type: "scatter",
  hoverinfo: "skip",
  showlegend: false,
  connectgaps: false,
  ...parts,
});
