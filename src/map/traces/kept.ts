import { pressureWords } from "../../../shared/hazards/words";
import type { Point, Solution } from "../../../shared/solution";
import { formulaHtml } from "../../../shared/species/typeset";
import { lineCoordinates, ringCoordinates } from "../geometry/rings";
import { type PlotTrace, trace } from "../plotTypes";
import type { PlacedText } from "../texts";
import type { MapView } from "../view";

type Kept = NonNullable<Solution["kept"]>[number];

/** Sides of the kept ground that are its own edge, not the frame's. */
function edgesOf({ polygons }: Kept, { frame }: Pick<MapView, "frame">): Point[][] {
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

/** Words beside each edge: "HCN kept out, pH 10.5". A pH rule's stand at the top of the map, left of the line; the others on theirs. */
export const keptNames = (kept: readonly Kept[], view: MapView): PlacedText[] =>
  kept.flatMap((k, i) => {
    const { pH, Eh } = view.visible;
    const inSight = edgesOf(k, view)
      .map(([a, b]): Point => [((a?.[0] ?? 0) + (b?.[0] ?? 0)) / 2, ((a?.[1] ?? 0) + (b?.[1] ?? 0)) / 2])
      .filter(([x, y]) => x > pH[0] && x < pH[1] && y > Eh[0] && y < Eh[1]);
    const [x, y] = inSight[0] ?? [];
    if (x === undefined || y === undefined) return [];
    const upright = k.bar === undefined;
    const left = x - 0.13 * (pH[1] - pH[0]);
    return [
      {
        html: `${formulaHtml(k.gas)} kept out, ${upright ? `pH ${k.pHAtLeast}` : pressureWords(k.bar)}`,
        x: upright ? (left > pH[0] ? left : (pH[0] + x) / 2) : x,
        y: view.scale.toShown(upright ? Eh[1] - (0.035 + 0.05 * i) * (Eh[1] - Eh[0]) : y),
        colour: view.colours.signal,
        size: 11,
      },
    ];
  });
