import type { HazardRegion } from "../../../shared/hazards/regions";
import type { Point } from "../../../shared/solution";
import { formulaHtml } from "../../../shared/species/typeset";
import { lineCoordinates, ringCoordinates } from "../geometry/rings";
import { type PlotTrace, trace } from "../plotTypes";
import type { PlacedText } from "../texts";
import type { MapView } from "../view";

/** Hatches that tell the gases apart in a grey print; the colour says hazard and nothing else. */
const hatch = ["/", "\\", "|", "-", "x", "+", "."] as const;

/** Where the equilibrium pressure of each gas reaches its threshold: sparse hatching and an edge in the signal colour. */
export function gasTraces(regions: readonly HazardRegion[], view: MapView): PlotTrace[] {
  const { colours, scale } = view;
  return regions.flatMap((region, i) => [
    trace({
      uid: `gas-${region.gas}`,
      name: `${region.gas} above ${region.threshold.words}`,
      mode: "lines",
      line: { color: "rgba(0,0,0,0)", width: 0 },
      fill: "toself",
      fillpattern: {
        shape: hatch[i % hatch.length] ?? "/",
        size: 18,
        solidity: 0.06,
        fgcolor: colours.signal,
        fgopacity: 0.5,
        bgcolor: "rgba(0,0,0,0)",
      },
      ...ringCoordinates(region.region, scale.toShown),
    }),
    trace({
      uid: `gas-edge-${region.gas}`,
      name: `${region.gas} at ${region.threshold.words}`,
      mode: "lines",
      line: { color: colours.signal, width: 1.4 },
      ...lineCoordinates(region.isoLines, scale.toShown),
    }),
  ]);
}

/** The point of a line in sight that is nearest to a share of the map's width. */
function onLine(lines: readonly (readonly Point[])[], view: MapView, share: number): Point | null {
  const { pH, Eh } = view.visible;
  const wanted = pH[0] + share * (pH[1] - pH[0]);
  const found = lines
    .flatMap((line) => line.slice(1).map((b, i): [Point, Point] => [line[i] ?? b, b]))
    .map(([a, b]): Point => {
      const t = b[0] === a[0] ? 0.5 : Math.min(1, Math.max(0, (wanted - a[0]) / (b[0] - a[0])));
      return [a[0] + t * (b[0] - a[0]), a[1] + t * (b[1] - a[1])];
    })
    .filter(([x, y]) => x >= pH[0] && x <= pH[1] && y > Eh[0] && y < Eh[1])
    .sort((a, b) => Math.abs(a[0] - wanted) - Math.abs(b[0] - wanted))[0];
  return found ?? null;
}

/** The gas on its edge: "H2S, 100 ppm". */
export const gasNames = (regions: readonly HazardRegion[], view: MapView): PlacedText[] =>
  regions.flatMap((region, i) => {
    const at = onLine(region.isoLines, view, 0.22 + 0.16 * (i % 5));
    if (!at) return [];
    const [threshold = ""] = region.threshold.words.split(",");
    return [
      {
        html: `${formulaHtml(region.gas)}, ${threshold.replace(" by volume", "")}`,
        x: at[0],
        y: view.scale.toShown(at[1]),
        colour: view.colours.signal,
        size: 11,
      },
    ];
  });
