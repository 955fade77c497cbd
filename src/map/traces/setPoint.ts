import type { Point } from "../../../shared/solution";
import { ringCoordinates } from "../geometry/rings";
import { type PlotTrace, trace } from "../plotTypes";
import type { MapView } from "../view";

/** The set point in its control-band box. */
export function setPointTraces(at: { pH: number; Eh: number } | null, view: MapView): PlotTrace[] {
  const { controlBand: band, colours, scale } = view;
  if (at === null) return [];
  const box: Point[] = [
    [at.pH - band.pH, at.Eh - band.Eh],
    [at.pH + band.pH, at.Eh - band.Eh],
    [at.pH + band.pH, at.Eh + band.Eh],
    [at.pH - band.pH, at.Eh + band.Eh],
  ];
  const outline = ringCoordinates([{ outer: box, holes: [] }], scale.toShown);
  return [
    // One trace: the corners of the box carry no mark, the point behind the gap does.
    trace({
      uid: "set-point",
      name: "Set point in its control bands",
      mode: "lines+markers",
      line: { color: colours.verdigris, width: 1.8 },
      marker: {
        color: colours.verdigris,
        size: [...outline.x.map(() => 0), 0, 8],
        symbol: "circle",
        opacity: 1,
        line: { width: 0 },
      },
      x: [...outline.x, null, at.pH],
      y: [...outline.y, null, scale.toShown(at.Eh)],
    }),
  ];
}
