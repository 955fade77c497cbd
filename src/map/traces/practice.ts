import type { Frame } from "../../../shared/schemas/problem";
import { boxOf } from "../../../shared/practice/box";
import type { PublishedRange } from "../../../shared/practice/ranges";
import { ringCoordinates } from "../geometry/rings";
import { type PlotTrace, trace } from "../plotTypes";
import type { PlacedText } from "../texts";
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

/** Ids at the lower left corners, one above the other where they would meet. */
export function practiceNames(ranges: readonly ShownRange[], view: MapView): PlacedText[] {
  const [lo, hi] = view.visible.Eh;
  const [left, right] = view.visible.pH;
  const taken: { x: number; y: number }[] = [];
  const [wide, high] = [0.06 * (right - left), 0.04 * (hi - lo)];
  return ranges.flatMap(({ range }) => {
    const box = boxOf(range, view.visible);
    if (!box) return [];
    const x = box.pH[0] + 0.025 * (right - left);
    let y = box.Eh[0] + 0.03 * (hi - lo);
    while (taken.some((t) => Math.abs(t.x - x) < wide && Math.abs(t.y - y) < 0.99 * high)) y += high;
    taken.push({ x, y });
    return [
      {
        html: range.id,
        x,
        y: view.scale.toShown(y),
        colour: view.colours.muted,
        size: 10,
      },
    ];
  });
}
