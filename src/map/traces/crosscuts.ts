import type { CrosscutPart } from "../../../shared/setpoint/crosscut";
import type { Point } from "../../../shared/solution";
import { speciesHtml } from "../speciesText";
import { hatchesOf, metalColour, patternOf, shuts } from "../metalStyle";
import { type Coordinate, type PlotAnnotation, type PlotTrace, trace } from "../plotTypes";
import { type PlacedText, textTrace } from "../texts";
import { type MapMetal, type MapView, MONO } from "../view";

/** What one metal is along both lines through a point, from low to high. */
export interface Crosscut {
  metal: MapMetal;
  alongPH: readonly CrosscutPart[];
  alongEh: readonly CrosscutPart[];
}

/** share of a strip's row that stays blank on either side */
const PAD = 0.09;
type Direction = "pH" | "Eh";
const axes = { pH: { xaxis: "x", yaxis: "y2" }, Eh: { xaxis: "x2", yaxis: "y" } } as const;

/** A rectangle of a strip as a closed ring; `row` counts from the first metal. */
function rectangle(
  direction: Direction,
  row: number,
  from: number,
  to: number,
  view: MapView,
): { x: number[]; y: number[] } {
  const across = [row + PAD, row + PAD, row + 1 - PAD, row + 1 - PAD, row + PAD];
  const along = [from, to, to, from, from].map((v) => (direction === "Eh" ? view.scale.toShown(v) : v));
  return direction === "pH" ? { x: along, y: across } : { x: across, y: along };
}

function rings(list: readonly { x: number[]; y: number[] }[]): { x: Coordinate[]; y: Coordinate[] } {
  const x: Coordinate[] = [];
  const y: Coordinate[] = [];
  list.forEach((ring, i) => {
    if (i > 0) {
      x.push(null);
      y.push(null);
    }
    x.push(...ring.x);
    y.push(...ring.y);
  });
  return { x, y };
}

/** Strips of every metal: the part that is as required tinted, the rest hatched as on the map, species parted by hairlines. */
export function crosscutTraces(cuts: readonly Crosscut[], through: Point, view: MapView): PlotTrace[] {
  const hatches = hatchesOf(view.metals);
  const strips = (direction: Direction): PlotTrace[] => {
    const stretches = cuts.flatMap((cut, row) =>
      (direction === "pH" ? cut.alongPH : cut.alongEh).map((s) => ({ ...s, row, metal: cut.metal })),
    );
    const ring = (s: (typeof stretches)[number]) => rectangle(direction, s.row, s.from, s.to, view);
    const fulfilled = stretches.filter((s) => s.fulfilled && shuts(s.metal));
    return [
      trace({
        uid: `cut-${direction}-frames`,
        name: "Species along the line",
        mode: "lines",
        ...axes[direction],
        line: { color: view.colours.ink, width: 1 },
        fill: "toself",
        fillcolor: view.colours.sheet,
        ...rings(stretches.map(ring)),
      }),
      trace({
        uid: `cut-${direction}-open`,
        name: "As required",
        mode: "lines",
        ...axes[direction],
        line: { color: "rgba(0,0,0,0)", width: 0 },
        fill: "toself",
        fillcolor: view.colours.tint,
        ...rings(fulfilled.map(ring)),
      }),
      ...cuts.flatMap(({ metal }) => {
        const hatch = hatches.get(metal.element);
        if (!shuts(metal) || !hatch) return [];
        return [
          trace({
            uid: `cut-${direction}-${metal.element}`,
            name: `${metal.element} not as required`,
            mode: "lines",
            ...axes[direction],
            line: { color: "rgba(0,0,0,0)", width: 0 },
            fill: "toself",
            fillpattern: patternOf(metal, hatch, view),
            ...rings(stretches.filter((s) => !s.fulfilled && s.metal === metal).map(ring)),
          }),
        ];
      }),
      trace({
        uid: `cut-${direction}-here`,
        name: "Where the set point stands",
        mode: "lines",
        ...axes[direction],
        line: { color: view.colours.verdigris, width: 1.8 },
        ...(direction === "pH"
          ? { x: [through[0], through[0]], y: [-0.2, cuts.length + 0.1] }
          : { x: [-0.3, cuts.length + 0.1], y: [view.scale.toShown(through[1]), view.scale.toShown(through[1])] }),
      }),
    ];
  };
  return [...strips("pH"), ...strips("Eh")];
}

export interface StripSizes {
  /** px per pH unit and per V vs SHE of the visible map */
  pxPerPH: number;
  pxPerVolt: number;
}

const SIZE = 11;

interface StripName extends PlacedText {
  lit: boolean;
  row: number;
  middle: number;
}

/** Names of the species in those stretches that are long enough for them. */
function stripNames(cuts: readonly Crosscut[], direction: Direction, pxPerUnit: number, view: MapView): StripName[] {
  const [lo, hi] = direction === "pH" ? view.visible.pH : view.visible.Eh;
  return cuts.flatMap(({ metal, alongPH, alongEh }, row) => {
    const aside = view.focus !== null && view.focus !== metal.element;
    const colour = aside ? view.colours.rule : metal.role === "target" ? metalColour(metal, view) : view.colours.ink;
    return (direction === "pH" ? alongPH : alongEh).flatMap((part): StripName[] => {
      const [from, to] = [Math.max(part.from, lo), Math.min(part.to, hi)];
      const { html, width } = speciesHtml(part.species, SIZE);
      if ((to - from) * pxPerUnit < width + 6) return [];
      const middle = (from + to) / 2;
      return [{ html, x: middle, y: row + 0.5, colour, size: SIZE, lit: part.fulfilled && shuts(metal), row, middle }];
    });
  });
}

/** Names in the strips along pH, as text traces. */
export function alongPHNames(cuts: readonly Crosscut[], view: MapView, { pxPerPH }: StripSizes): PlotTrace[] {
  const names = stripNames(cuts, "pH", pxPerPH, view);
  return [true, false].map((lit) =>
    textTrace(
      `strips-on-${lit ? "lit" : "sheet"}`,
      "Species along pH",
      names.filter((n) => n.lit === lit),
      { xaxis: "x", yaxis: "y2" },
    ),
  );
}

/** Names in the upright strips along Eh; only annotations can stand on end. */
export const alongEhNames = (cuts: readonly Crosscut[], view: MapView, { pxPerVolt }: StripSizes): PlotAnnotation[] =>
  stripNames(cuts, "Eh", pxPerVolt, view).map(({ html, row, middle, colour, lit }) => ({
    text: html,
    x: row + 0.5,
    y: view.scale.toShown(middle),
    xref: "x2",
    yref: "y",
    xanchor: "center",
    yanchor: "middle",
    textangle: -90,
    showarrow: false,
    font: { family: MONO, size: SIZE, color: colour },
    bgcolor: lit ? view.colours.tint : view.colours.sheet,
    borderpad: 1,
  }));

/** Metals at the head of their strips, as the ticks of the strips' own axis. */
export const stripHeads = (cuts: readonly Crosscut[], view: MapView): { tickvals: number[]; ticktext: string[] } => ({
  tickvals: cuts.map((_, row) => row + 0.5),
  ticktext: cuts.map(({ metal }) => {
    const aside = view.focus !== null && view.focus !== metal.element;
    return `<b><span style="color:${aside ? view.colours.rule : metalColour(metal, view)}">${metal.element}</span></b>`;
  }),
});
