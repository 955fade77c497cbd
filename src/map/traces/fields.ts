import type { Field, Point } from "../../../shared/solution";
import { boundaryLines } from "../geometry/boundaries";
import { lineCoordinates } from "../geometry/rings";
import { emphasis, metalColour } from "../metalStyle";
import { type PlotTrace, trace } from "../plotTypes";
import type { MapView } from "../view";

const style = {
  target: { width: 1.7, dash: "solid" },
  gangue: { width: 1.5, dash: "solid" },
  watched: { width: 1, dash: "5px,3px" },
} as const;

/** Lines between the fields of every metal, worked out once a solution and kept while the view changes.
 *  @returns  polylines by metal, V vs SHE */
export function boundariesByMetal(fields: readonly Field[], frame: MapView["frame"]): Map<string, Point[][]> {
  const metals = [...new Set(fields.map((f) => f.metal))];
  return new Map(
    metals.map((m) => [
      m,
      boundaryLines(
        fields.filter((f) => f.metal === m),
        frame,
      ),
    ]),
  );
}

/** Predominance boundaries, one trace a metal, weighted by role; gangue and target above the watched. */
export function boundaryTraces(lines: ReadonlyMap<string, readonly (readonly Point[])[]>, view: MapView): PlotTrace[] {
  const order = { watched: 0, gangue: 1, target: 2 };
  return [...view.metals]
    .sort((a, b) => order[a.role] - order[b.role])
    .map((metal) =>
      trace({
        uid: `fields-${metal.element}`,
        name: `Field boundaries of ${metal.element}`,
        mode: "lines",
        line: { color: metalColour(metal, view), ...style[metal.role] },
        opacity: emphasis(metal.element, view),
        ...lineCoordinates(lines.get(metal.element) ?? [], view.scale.toShown),
      }),
    );
}
