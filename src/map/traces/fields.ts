import type { Field, Point } from "../../../shared/solution";
import { boundaryStyle } from "../../../shared/drawing/hatches";
import { boundaryLines } from "../../../shared/drawing/boundaries";
import { lineCoordinates } from "../geometry/rings";
import { emphasis, metalColour } from "../metalStyle";
import { type PlotTrace, trace } from "../plotTypes";
import { drawnMetals, type MapView } from "../view";

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

/** Predominance boundaries weighted by role, the target's on top. Metals that are drawn alike share a trace: each trace costs at
 *  every step of a drag. */
export function boundaryTraces(lines: ReadonlyMap<string, readonly (readonly Point[])[]>, view: MapView): PlotTrace[] {
  return (["watched", "gangue", "target"] as const).flatMap((role) =>
    [false, true].flatMap((aside) => {
      const metals = drawnMetals(view).filter((m) => m.role === role && emphasis(m.element, view) < 1 === aside);
      const [first] = metals;
      if (!first) return [];
      return [
        trace({
          uid: `fields-${role}${aside ? "-aside" : ""}`,
          name: `Field boundaries of ${metals.map((m) => m.element).join(", ")}`,
          mode: "lines",
          line: { color: metalColour(first, view), ...boundaryStyle[role] },
          opacity: emphasis(first.element, view),
          ...lineCoordinates(
            metals.flatMap((m) => lines.get(m.element) ?? []),
            view.scale.toShown,
          ),
        }),
      ];
    }),
  );
}
