import type { Point, Solution } from "../../../shared/solution";
import { lineCoordinates, ringCoordinates } from "../geometry/rings";
import { type PlotTrace, trace } from "../plotTypes";
import type { MapView } from "../view";

type Kept = NonNullable<Solution["kept"]>[number];

/** Sides of the kept ground that are its own edge, not the frame's. */
export function edgesOf({ polygons }: Kept, { frame }: Pick<MapView, "frame">): Point[][] {
  const onFrame = (a: Point, b: Point): boolean =>
    ([0, 1] as const).some((axis) =>
      (axis === 0 ? frame.pH : frame.Eh).some((v) => Math.abs(a[axis] - v) < 1e-9 && Math.abs(b[axis] - v) < 1e-9),
    );
  return polygons.flatMap(({ outer, holes }) =>
    [outer, ...holes].flatMap((ring) =>
      ring.flatMap((a, i) => {
        const b = ring[(i + 1) % ring.length] ?? a;
        return onFrame(a, b) ? [] : [[a, b]];
      }),
    ),
  );
}

/** Ground kept out of windows for its gas: upright hatching and a firm edge in the signal colour, whether or not the hazard layer is on, for it
 *  shuts the window as a metal does. */
export const keptTraces = (kept: readonly Kept[], view: MapView): PlotTrace[] =>
  kept.flatMap((k) => [
    trace({
      uid: `kept-${k.gas}`,
      name: `${k.gas} kept out`,
      mode: "lines",
      line: { color: "rgba(0,0,0,0)", width: 0 },
      fill: "toself",
      fillpattern: {
        shape: "|",
        size: 16,
        solidity: 0.07,
        fgcolor: view.colours.signal,
        fgopacity: 0.55,
        bgcolor: "rgba(0,0,0,0)",
      },
      ...ringCoordinates(k.polygons, view.scale.toShown),
    }),
    trace({
      uid: `kept-edge-${k.gas}`,
      name: `Edge of ${k.gas} kept out`,
      mode: "lines",
      line: { color: view.colours.signal, width: 1.6 },
      ...lineCoordinates(edgesOf(k, view), view.scale.toShown),
    }),
  ]);
