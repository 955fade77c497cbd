import { FREE_ACID_BELOW, type FreeAcidCurve } from "../../../shared/activity/freeAcid";
import type { Sheet } from "../boxes";
import type { PlotAnnotation, PlotShape } from "../plotTypes";
import { type MapView, MONO } from "../view";

export interface AcidTick {
  gPerL: number;
  pH: number;
}

/** px below the map: the line of the second row, the foot of its ticks, the head of its numbers */
const LINE = 24;
const TICK = 29;
const NUMBERS = 30;
/** px from one number to the next */
const GAP = 19;
const TITLE = "free acid, g/L H<sub>2</sub>SO<sub>4</sub>";
const TITLE_WIDTH = 150;

/** Round numbers, the roundest first: 10, 50, 20, 30 ... 15. */
const mantissas = [1, 5, 2, 3, 4, 6, 8, 7, 9, 1.5, 2.5, 3.5, 4.5, 5.5, 6.5, 7.5, 8.5, 9.5];
const decades = [1, 2, 0, -1, -2].map((k) => 10 ** k);

/** Free acids that stand under a pH axis, as round and as many as there is room for; none where pH 1.5 and below is out of sight.
 *  @param curve  of the liquor     @param pH  in sight     @param pxPerPH  of the axis     @returns  by rising pH */
export function acidTicks(curve: FreeAcidCurve, pH: readonly [number, number], pxPerPH: number): AcidTick[] {
  const [lo, hi] = [pH[0], Math.min(pH[1], FREE_ACID_BELOW)];
  const ticks: AcidTick[] = [];
  for (const m of mantissas)
    for (const decade of decades) {
      const gPerL = Number((m * decade).toPrecision(2));
      const at = curve.pHOf(gPerL);
      if (at === null || at < lo || at > hi) continue;
      if (ticks.every((t) => Math.abs(t.pH - at) * pxPerPH >= GAP)) ticks.push({ gPerL, pH: at });
    }
  return ticks.sort((a, b) => a.pH - b.pH);
}

/** The second row under the pH axis: free acid where pH is below 1.5, as far as the sulfate of the liquor balances it. */
export function acidRow(
  curve: FreeAcidCurve | null,
  { map }: Sheet,
  view: MapView,
): { annotations: PlotAnnotation[]; shapes: PlotShape[] } {
  const [p0, p1] = view.visible.pH;
  const width = map.x1 - map.x0;
  const pxPerPH = width / (p1 - p0);
  const ticks = curve === null ? [] : acidTicks(curve, [p0, p1], pxPerPH);
  const [first] = ticks;
  if (first === undefined) return { annotations: [], shapes: [] };
  const { muted } = view.colours;
  const end = Math.min(p1, FREE_ACID_BELOW);
  // Beside the row where there is room, else over its own right end, whose numbers give way.
  const titleAt = Math.min((end - p0) * pxPerPH + 12, width - TITLE_WIDTH);
  const shown = ticks.filter((t) => (t.pH - p0) * pxPerPH < titleAt - 8);
  const down = (px: number) => -px / (map.y1 - map.y0);
  const line = (x0: number, x1: number, y0: number, y1: number): PlotShape => ({
    type: "line",
    xref: "x",
    yref: "y domain",
    ...{ x0, x1, y0: down(y0), y1: down(y1) },
    line: { color: muted, width: 1 },
  });
  const word = (text: string, x: number, anchor: "center" | "left"): PlotAnnotation => ({
    text,
    x,
    y: 0,
    xref: "x",
    yref: "y domain",
    xanchor: anchor,
    yanchor: "top",
    yshift: -NUMBERS,
    showarrow: false,
    font: { family: MONO, size: 11, color: muted },
    borderpad: 0,
  });
  return {
    annotations: [
      ...shown.map((t) => word(String(t.gPerL), t.pH, "center")),
      word(TITLE, p0 + titleAt / pxPerPH, "left"),
    ],
    shapes: [
      line(
        Math.max(p0, Math.min(first.pH, p0 + titleAt / pxPerPH)),
        Math.min(end, p0 + (titleAt - 8) / pxPerPH),
        LINE,
        LINE,
      ),
      ...shown.map((t) => line(t.pH, t.pH, LINE, TICK)),
    ],
  };
}
