import type { ReactionValues } from "../../../shared/reactions/atTemperature";
import type { ThemeColours } from "../../lib/theme";
import { type Figure, type PlotAxis, trace } from "../../map/plotTypes";
import { MONO } from "../../map/view";

export const curveNames = ["logK", "dG", "dH", "E0"] as const;
export type CurveName = (typeof curveNames)[number];

export const curveWords: Readonly<Record<CurveName, { label: string; unit: string; digits: number }>> = {
  logK: { label: "log K", unit: "", digits: 2 },
  dG: { label: "ΔG", unit: "kJ/mol", digits: 2 },
  dH: { label: "ΔH", unit: "kJ/mol", digits: 2 },
  E0: { label: "E°", unit: "V vs SHE", digits: 4 },
};

export function curveValue(row: ReactionValues, name: CurveName): number | null {
  switch (name) {
    case "logK":
      return row.logK;
    case "dG":
      return row.dG_kJ;
    case "dH":
      return row.dH_kJ;
    case "E0":
      return row.E0_V;
  }
}

/** Ends that leave the curve some air; a constant gets a range all the same. */
function ends(values: readonly number[]): [number, number] {
  const [lo, hi] = [Math.min(...values), Math.max(...values)];
  const air = Math.max(0.06 * (hi - lo), 1e-3 * Math.max(1, Math.abs(hi)));
  return [lo - air, hi + air];
}

/** One quantity of the reaction against temperature. */
export function curveFigure(
  rows: readonly ReactionValues[],
  name: CurveName,
  colours: ThemeColours,
  size: { width: number; height: number },
): Figure {
  const points = rows.flatMap((row): [number, number][] => {
    const value = curveValue(row, name);
    return value === null ? [] : [[row.temperatureC, value]];
  });
  const { label, unit } = curveWords[name];
  const axis: Omit<PlotAxis, "range" | "anchor"> = {
    domain: [0, 1],
    showgrid: false,
    zeroline: false,
    showline: true,
    mirror: true,
    linecolor: colours.ink,
    linewidth: 1,
    ticks: "outside",
    ticklen: 5,
    tickcolor: colours.ink,
    tickfont: { family: MONO, size: 12, color: colours.ink },
    nticks: 7,
    fixedrange: true,
  };
  const words = { xref: "x domain", yref: "y domain", showarrow: false as const };
  const font = { family: MONO, size: 11, color: colours.muted };
  return {
    data: [
      trace({
        uid: "curve",
        name: label,
        mode: "lines",
        line: { color: colours.verdigris, width: 2 },
        x: points.map(([t]) => t),
        y: points.map(([, v]) => v),
      }),
    ],
    layout: {
      ...size,
      margin: { l: 72, r: 12, t: 24, b: 40, pad: 0 },
      autosize: false,
      paper_bgcolor: "rgba(0,0,0,0)",
      plot_bgcolor: colours.sheet,
      showlegend: false,
      hovermode: false,
      dragmode: "pan",
      uirevision: `${name} ${rows.length}`,
      font: { family: MONO, size: 12, color: colours.ink },
      hoverlabel: { font: { family: MONO, size: 12 } },
      xaxis: { ...axis, range: ends(points.map(([t]) => t)), anchor: "y" },
      yaxis: { ...axis, range: ends(points.map(([, v]) => v)), anchor: "x" },
      annotations: [
        {
          ...words,
          text: unit ? `${label} / ${unit}` : label,
          x: 0,
          y: 1,
          xanchor: "left",
          yanchor: "bottom",
          yshift: 4,
          font,
        },
        { ...words, text: "T / °C", x: 1, y: 0, xanchor: "right", yanchor: "top", yshift: -20, font },
      ],
    },
  };
}
