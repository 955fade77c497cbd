import type { HazardRegion } from "../../../shared/hazards/regions";
import { lineCoordinates, ringCoordinates } from "../geometry/rings";
import { type PlotTrace, trace } from "../plotTypes";
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
