import type { Point } from "../../../shared/solution";
import { lineCoordinates, ringCoordinates } from "../geometry/rings";
import { type PlotTrace, trace } from "../plotTypes";
import type { MapView } from "../view";

/** Two dotted lines through the point that the crosscuts follow, the control-band box and the set point itself. */
export function setPointTraces(
  at: { pH: number; Eh: number } | null,
  through: Point | null,
  view: MapView,
): PlotTrace[] {
  const { frame, controlBand: band, colours, scale } = view;
  const guide = through
    ? trace({
        uid: "guides",
        name: "Lines the crosscuts follow",
        mode: "lines",
        line: { color: colours.verdigris, width: 1, dash: "1px,3px" },
        ...lineCoordinates(
          [
            [
              [frame.pH[0], through[1]],
              [frame.pH[1], through[1]],
            ],
            [
              [through[0], frame.Eh[0]],
              [through[0], frame.Eh[1]],
            ],
          ],
          scale.toShown,
        ),
      })
    : null;
  if (at === null) return guide ? [guide] : [];
  const box: Point[] = [
    [at.pH - band.pH, at.Eh - band.Eh],
    [at.pH + band.pH, at.Eh - band.Eh],
    [at.pH + band.pH, at.Eh + band.Eh],
    [at.pH - band.pH, at.Eh + band.Eh],
  ];
  const outline = ringCoordinates([{ outer: box, holes: [] }], scale.toShown);
  return [
    ...(guide ? [guide] : []),
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
