import type { Sweep } from "../../../../shared/whatif/sweep";
import { isLogarithmic } from "../../../../shared/whatif/vary";
import { significant } from "../../../lib/format";
import type { ThemeColours } from "../../../lib/theme";
import { type Figure, type PlotAxis, type PlotTrace, trace } from "../../../map/plotTypes";
import { MONO } from "../../../map/view";

/** Margin above, open ground below, against one setting; dots where it was worked out, upright lines where windows open or close. */
export function sweepFigure(
  { varied, samples, turns }: Sweep,
  name: string,
  here: number | null,
  colours: ThemeColours,
  size: { width: number; height: number },
): Figure {
  const log = isLogarithmic(varied);
  const x = (at: number) => (log ? Math.log10(at) : at);
  const xs = samples.map((s) => x(s.at));
  const range: [number, number] = [Math.min(...xs), Math.max(...xs)];
  const margins = samples.map((s) => s.setPoint?.margin ?? 0);
  const kept = samples.map((s) => s.kept);
  const low = Math.min(0, ...kept.filter((k) => k !== null).map((k) => Math.max(k, -2)));
  const marginRange: [number, number] = [low, 1.1 * Math.max(1.2, ...margins)];
  const areaRange: [number, number] = [0, 1.1 * Math.max(1e-6, ...samples.map((s) => s.area))];
  const axis: Omit<PlotAxis, "range" | "anchor" | "domain"> = {
    showgrid: false,
    zeroline: false,
    showline: true,
    mirror: true,
    linecolor: colours.ink,
    linewidth: 1,
    ticks: "outside",
    ticklen: 4,
    tickcolor: colours.ink,
    tickfont: { family: MONO, size: 11, color: colours.ink },
    nticks: 5,
    fixedrange: true,
  };
  const ticks = log
    ? Array.from({ length: Math.floor(range[1]) - Math.ceil(range[0]) + 1 }, (_, i) => Math.ceil(range[0]) + i)
    : null;
  const line = (
    uid: string,
    label: string,
    ys: (number | null)[],
    y: "y" | "y2",
    color: string,
    dash = "solid",
  ): PlotTrace => trace({ uid, name: label, mode: "lines", yaxis: y, line: { color, width: 1.8, dash }, x: xs, y: ys });
  const dots = (uid: string, label: string, ys: (number | null)[], y: "y" | "y2"): PlotTrace =>
    trace({
      uid,
      name: label,
      mode: "markers",
      yaxis: y,
      marker: { color: colours.verdigris, size: xs.map(() => 4), symbol: "circle", opacity: 1, line: { width: 0 } },
      x: xs,
      y: ys,
    });
  const upright = (uid: string, label: string, at: readonly number[], color: string, dash: string): PlotTrace[] =>
    (["y", "y2"] as const).map((y) =>
      trace({
        uid: `${uid}-${y}`,
        name: label,
        mode: "lines",
        yaxis: y,
        line: { color, width: 1.2, dash },
        x: at.flatMap((a) => [x(a), x(a), null]),
        y: at.flatMap(() => [...(y === "y" ? marginRange : areaRange), null]),
      }),
    );
  const font = { family: MONO, size: 11, color: colours.muted };
  const words = (text: string, y: string) => ({ text, x: 0, y: 1, xref: "x domain", yref: `${y} domain`, xanchor: "left" as const, yanchor: "bottom" as const, yshift: 2, showarrow: false as const, font }); // prettier-ignore
  return {
    data: [
      ...upright(
        "turns",
        "Opens or closes",
        turns.map((t) => t.at),
        colours.ink,
        "3px,3px",
      ),
      ...(here === null ? [] : upright("here", "The plan", [here], colours.verdigris, "solid")),
      line(
        "one",
        "One control band",
        xs.map(() => 1),
        "y",
        colours.rule,
      ),
      line("kept", "Set point kept where it is", kept, "y", colours.muted, "6px,3px"),
      line("margin", "Margin, set point chosen anew", margins, "y", colours.verdigris),
      dots("margin-at", "Worked out", margins, "y"),
      line(
        "area",
        "Open ground",
        samples.map((s) => s.area),
        "y2",
        colours.verdigris,
      ),
      dots(
        "area-at",
        "Worked out",
        samples.map((s) => s.area),
        "y2",
      ),
    ].filter((t) => t.x.length > 0),
    layout: {
      ...size,
      margin: { l: 56, r: 12, t: 22, b: 38, pad: 0 },
      autosize: false,
      paper_bgcolor: "rgba(0,0,0,0)",
      plot_bgcolor: "rgba(0,0,0,0)",
      showlegend: false,
      hovermode: false,
      dragmode: "pan",
      uirevision: name,
      font: { family: MONO, size: 11, color: colours.ink },
      hoverlabel: { font: { family: MONO, size: 11 } },
      xaxis: {
        ...axis,
        domain: [0, 1],
        range,
        anchor: "y2",
        ...(ticks ? { tickvals: ticks, ticktext: ticks.map((t) => significant(10 ** t, 1)) } : {}),
      },
      yaxis: { ...axis, domain: [0.57, 1], range: marginRange, anchor: "x" },
      yaxis2: { ...axis, domain: [0, 0.43], range: areaRange, anchor: "x" },
      annotations: [
        words("margin / control bands (dashed: set point kept)", "y"),
        words("open ground / pH·V", "y2"),
        { text: log ? name : `${name} / °C`, x: 1, y: 0, xref: "x domain", yref: "y2 domain", xanchor: "right", yanchor: "top", yshift: -20, showarrow: false, font }, // prettier-ignore
      ],
    },
  };
}
