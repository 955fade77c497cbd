import type { HazardRegion } from "../../../shared/hazards/regions";
import { HCN_PH, pressureWords } from "../../../shared/hazards/words";
import { boxOf } from "../../../shared/practice/box";
import type { Limit, Point } from "../../../shared/solution";
import { speciesParts } from "../../../shared/species/parts";
import { typeset } from "../../../shared/species/typeset";
import type { MapContent } from "../content";
import { NAME_SIZE } from "./fieldNames";
import { plainText, speciesText } from "../speciesText";
import type { AnchoredText } from "../texts";
import { edgesOf } from "../traces/kept";
import type { ShownRange } from "../traces/practice";
import type { MapView } from "../view";
import { typeSize } from "../typeSize";

const SMALL_SIZE = typeSize(10);

/** The points of lines in sight that are nearest to some shares of the map's width. */
function onLines(lines: readonly (readonly Point[])[], { visible: { pH, Eh } }: MapView, shares: number[]): Point[] {
  const stretches = lines.flatMap((line) => line.slice(1).map((b, i): [Point, Point] => [line[i] ?? b, b]));
  return shares.flatMap((share) => {
    const wanted = pH[0] + share * (pH[1] - pH[0]);
    const found = stretches
      .map(([a, b]): Point => {
        const t = b[0] === a[0] ? 0.5 : Math.min(1, Math.max(0, (wanted - a[0]) / (b[0] - a[0])));
        return [a[0] + t * (b[0] - a[0]), a[1] + t * (b[1] - a[1])];
      })
      .filter(([x, y]) => x >= pH[0] && x <= pH[1] && y > Eh[0] && y < Eh[1])
      .sort((a, b) => Math.abs(a[0] - wanted) - Math.abs(b[0] - wanted))[0];
    return found ? [found] : [];
  });
}

/** The gas on its edge: "H2S, 100 ppm". */
export const gasNames = (regions: readonly HazardRegion[], view: MapView): AnchoredText[] =>
  regions.map((region, i) => {
    const [threshold = ""] = region.threshold.words.split(",");
    const first = 0.22 + 0.16 * (i % 5);
    return {
      id: `gas ${region.gas}`,
      parts: [...typeset(region.gas), ...plainText(`, ${threshold.replace(" by volume", "")}`)],
      size: NAME_SIZE,
      colour: view.colours.signal,
      places: onLines(region.isoLines, view, [first, 0.3, 0.45, 0.6, 0.75, 0.9, 0.15]),
    };
  });

/** Words beside each edge of ground that is kept out: "HCN kept out, pH 10.5". A pH rule's stand at the top of the map, left of the line;
 *  the others on theirs. */
export const keptNames = ({ kept }: Pick<MapContent, "kept">, view: MapView): AnchoredText[] =>
  kept.map((k) => {
    const { pH, Eh } = view.visible;
    const upright = k.bar === undefined;
    const middles = edgesOf(k, view)
      .map(([a, b]): Point => [((a?.[0] ?? 0) + (b?.[0] ?? 0)) / 2, ((a?.[1] ?? 0) + (b?.[1] ?? 0)) / 2])
      .filter(([x, y]) => x > pH[0] && x < pH[1] && y > Eh[0] && y < Eh[1]);
    const beside = ([x]: Point): Point[] =>
      [0.035, 0.085, 0.135, 0.185].map((share): Point => {
        const left = x - 0.13 * (pH[1] - pH[0]);
        return [left > pH[0] ? left : (pH[0] + x) / 2, Eh[1] - share * (Eh[1] - Eh[0])];
      });
    return {
      id: `kept ${k.gas}`,
      parts: [...typeset(k.gas), ...plainText(` kept out, ${upright ? `pH ${k.pHAtLeast}` : pressureWords(k.bar)}`)],
      size: NAME_SIZE,
      colour: view.colours.signal,
      places: upright ? middles.slice(0, 1).flatMap(beside) : middles,
    };
  });

/** Ids of published ranges at the lower left corners of their boxes, higher up where another name stands. */
export const practiceNames = (ranges: readonly ShownRange[], view: MapView): AnchoredText[] => {
  const [wide, high] = [view.visible.pH[1] - view.visible.pH[0], view.visible.Eh[1] - view.visible.Eh[0]];
  return ranges.flatMap(({ range }): AnchoredText[] => {
    const box = boxOf(range, view.visible);
    if (!box) return [];
    return [
      {
        id: `practice ${range.id}`,
        parts: plainText(range.id),
        size: SMALL_SIZE,
        colour: view.colours.muted,
        places: Array.from({ length: 8 }, (_, k): Point => [
          box.pH[0] + 0.025 * wide,
          box.Eh[0] + (0.03 + 0.04 * k) * high,
        ]),
      },
    ];
  });
};

/** Name on the thin edge of the other solids basis, at its longest stretch that has room: the solid that forms there and the basis. */
export function otherBasisNames({ moved }: Pick<MapContent, "moved">, view: MapView): AnchoredText[] {
  if (!moved || !view.layers.otherBasis) return [];
  const length = ({ from, to }: Limit) => Math.hypot(to[0] - from[0], 10 * (to[1] - from[1]));
  const [longest] = [...moved.limits].sort((a, b) => length(b) - length(a));
  if (!longest) return [];
  const solid = [longest.inside, longest.outside].find((s) => s !== undefined && speciesParts(s).phase === "s");
  const form = solid === undefined ? "" : speciesParts(solid).form;
  const what = solid === undefined ? [] : form ? plainText(form) : speciesText(solid);
  const { from, to } = longest;
  return [
    {
      id: "other basis",
      parts: [...what, ...plainText(what.length > 0 ? `, ${moved.basis}` : moved.basis)],
      size: SMALL_SIZE,
      colour: view.colours.verdigris,
      places: [0.5, 0.3, 0.7, 0.15, 0.85].map((t): Point => [
        from[0] + t * (to[0] - from[0]),
        from[1] + t * (to[1] - from[1]),
      ]),
    },
  ];
}

/** Words on the edge of the HCN region, at the top of the map or below what stands there. */
export function hydrogenCyanideNames({ cyanide }: Pick<MapContent, "cyanide">, view: MapView): AnchoredText[] {
  const [lo, hi] = view.visible.pH;
  const edge = Math.min(HCN_PH, hi);
  if (!cyanide || !view.layers.hazard || edge <= lo) return [];
  const beside = edge - 0.13 * (hi - lo);
  const [bottom, top] = view.visible.Eh;
  return [
    {
      id: "HCN",
      parts: plainText("HCN below pH 10.5"),
      size: NAME_SIZE,
      colour: view.colours.signal,
      places: [0.035, 0.085, 0.135].map((share): Point => [
        beside > lo ? beside : (lo + edge) / 2,
        top - share * (top - bottom),
      ]),
    },
  ];
}
