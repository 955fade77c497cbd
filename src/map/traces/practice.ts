import type { Frame } from "../../../shared/schemas/problem";
import { boxOf } from "../../../shared/practice/box";
import type { PublishedRange } from "../../../shared/practice/ranges";
import { ringCoordinates } from "../geometry/rings";
import { type PlotTrace, trace } from "../plotTypes";
import type { MapView } from "../view";

/** A published range that the map shows. */
export interface ShownRange {
  range: PublishedRange;
  /** the plan's temperature lies within 5 C of the range's */
  atTemperature: boolean;
}

const corners = ({ pH, Eh }: Frame): [number, number][] => [
  [pH[0], Eh[0]],
  [pH[1], Eh[0]],
  [pH[1], Eh[1]],
  [pH[0], Eh[1]],
];

/** Published operating ranges as outlined boxes: dash and dot where the plan's temperature fits, dotted where it does not. An axis the
 *  source does not speak of spans the frame. */
export function practiceTraces(ranges: readonly ShownRange[], view: MapView): PlotTrace[] {
  return [true, false].map((fits) =>
    trace({
      uid: `practice-${fits ? "here" : "elsewhere"}`,
      name: fits ? "Published practice" : "Published practice at another temperature",
      mode: "lines",
      line: { color: view.colours.muted, width: 1.3, dash: fits ? "9px,3px,2px,3px" : "2px,3px" },
      ...ringCoordinates(
        ranges
          .filter((r) => r.atTemperature === fits)
          .flatMap(({ range }) => {
            const box = boxOf(range, view.frame);
            return box ? [{ outer: corners(box), holes: [] }] : [];
          }),
        view.scale.toShown,
      ),
    }),
  );
}
