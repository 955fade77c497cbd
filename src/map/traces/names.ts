import type { Field, Limit, Point, Solution } from "../../../shared/solution";
import { HCN_PH } from "../../../shared/hazards/words";
import { speciesParts } from "../../../shared/species/parts";
import { mapPixels, type Sheet } from "../boxes";
import { isLit } from "../../../shared/drawing/lit";
import { type Box, type LabelWish, type Pixel, placeLabels, type Segment } from "../../../shared/drawing/labels";
import type { MapContent } from "../content";
import { gasNames } from "./gases";
import { keptNames } from "./kept";
import { practiceNames } from "./practice";
import { metalColour } from "../metalStyle";
import type { PlotTrace } from "../plotTypes";
import { speciesHtml } from "../speciesText";
import { type PlacedText, textTrace } from "../texts";
import { type MapView, windowName } from "../view";

const SIZE = 11;
const HEIGHT = 16;
const WINDOW_SIZE = 13;
const SMALL_SIZE = 10;

interface Wish extends LabelWish {
  html: string;
  colour: string;
  size: number;
}

/** The fields of one species gathered; largest metals' roles first, so that they find room before the watched ones. */
function fieldWishes(fields: readonly Field[], view: MapView, toPixel: (pH: number, Eh: number) => Pixel): Wish[] {
  const order = { target: 0, gangue: 1, watched: 2 };
  const metals = [...view.metals].sort((a, b) => order[a.role] - order[b.role]);
  return metals.flatMap((metal) => {
    if (view.focus !== null && view.focus !== metal.element) return [];
    const bySpecies = new Map<string, Pixel[][]>();
    for (const f of fields) {
      if (f.metal !== metal.element) continue;
      const ring = f.polygon.map(([pH, Eh]) => toPixel(pH, Eh));
      bySpecies.set(f.species, [...(bySpecies.get(f.species) ?? []), ring]);
    }
    return [...bySpecies].map(([species, pieces]): Wish => {
      const { html, width } = speciesHtml(species, SIZE);
      return {
        id: `${metal.element} ${species}`,
        pieces,
        width: width + 6,
        height: HEIGHT,
        html: metal.role === "target" ? `<b>${html}</b>` : html,
        colour: metalColour(metal, view),
        size: SIZE,
      };
    });
  });
}

function windowWishes(
  solution: Pick<Solution, "windows">,
  view: MapView,
  toPixel: (pH: number, Eh: number) => Pixel,
): Wish[] {
  return solution.windows.map((window, i): Wish => {
    const ring = (points: readonly Point[]) => points.map(([pH, Eh]) => toPixel(pH, Eh));
    const pieces = window.polygons.map(({ outer }) => ring(outer));
    const holes = window.polygons.flatMap((polygon) => polygon.holes.map(ring));
    const words = [`Window ${windowName(i)}`];
    if (!window.controllable) words.push("narrower than the control bands");
    else if (window.setPoint.cutByFrame) words.push("cut by the frame");
    const longest = Math.max(...words.map((w, k) => w.length * 0.6 * (k === 0 ? WINDOW_SIZE : SMALL_SIZE)));
    return {
      id: `window ${i}`,
      pieces,
      holes,
      width: longest + 8,
      height: words.length > 1 ? 32 : 18,
      html: `<b>${words[0]}</b>${words[1] ? `<br><span style="font-size:10px">${words[1]}</span>` : ""}`,
      colour: view.colours.verdigris,
      size: WINDOW_SIZE,
    };
  });
}

/** Names inside the fields and windows; what finds no room is left to the read-out. Names on open ground come apart, since
 *  their halo has another colour. */
export function nameTraces(content: MapContent, sheet: Sheet, view: MapView): PlotTrace[] {
  const { solution, boundaries } = content;
  const { box, toPixel, toPoint } = mapPixels(sheet, view.visible);
  const inSight: Box = { x0: box.x0 + 4, y0: box.y0 + 3, x1: box.x1 - 4, y1: box.y1 - 3 };
  const windows = view.plain && view.focus !== null ? [] : windowWishes(solution, view, toPixel);
  const wishes = [...windows, ...(view.layers.labels ? fieldWishes(solution.fields, view, toPixel) : [])];
  const taken: Box[] = [];
  const at = solution.windows[view.window]?.setPoint;
  if (at && view.layers.setPoint) {
    const [x0, y1] = toPixel(at.pH - view.controlBand.pH, at.Eh - view.controlBand.Eh);
    const [x1, y0] = toPixel(at.pH + view.controlBand.pH, at.Eh + view.controlBand.Eh);
    taken.push({ x0: x0 - 3, y0: y0 - 3, x1: x1 + 3, y1: y1 + 3 });
  }
  const segments = (line: readonly Point[]): Segment[] =>
    line.slice(1).map((p, i): Segment => [toPixel(...(line[i] as Point)), toPixel(...p)]);
  const lines = [
    ...[...boundaries.values()].flat().flatMap(segments),
    ...solution.windows.flatMap((w) => w.polygons.flatMap(({ outer }) => segments([...outer, outer[0] as Point]))),
    ...solution.waterLines.flatMap(({ intercept, slope }) =>
      segments(view.frame.pH.map((pH): Point => [pH, intercept + slope * pH])),
    ),
    ...(content.moved && view.layers.otherBasis ? content.moved.limits.flatMap((l) => segments([l.from, l.to])) : []),
  ];
  const fixed = [
    ...otherBasisName(content, view),
    ...hydrogenCyanideName(content, view),
    ...keptNames(content.kept, view),
    ...(view.layers.hazard ? gasNames(content.gases, view) : []),
    ...(view.layers.practice ? practiceNames(content.practice, view) : []),
  ];
  for (const text of fixed) {
    const [x, y] = toPixel(text.x, view.scale.fromShown(text.y));
    const half = (text.html.length * 0.6 * text.size) / 2 + 4;
    taken.push({ x0: x - half, y0: y - 9, x1: x + half, y1: y + 9 });
  }
  const placed = placeLabels(wishes, inSight, taken, lines);
  const texts = wishes.flatMap((wish) => {
    const spot = placed.get(wish.id);
    if (!spot) return [];
    const [pH, Eh] = toPoint(spot[0], spot[1]);
    const text: PlacedText = {
      html: wish.html,
      x: pH,
      y: view.scale.toShown(Eh),
      colour: wish.colour,
      size: wish.size,
    };
    return [{ text, lit: isLit(solution.windows, pH, Eh) }];
  });
  const on = (lit: boolean) => texts.filter((t) => t.lit === lit).map((t) => t.text);
  return [
    textTrace("names-on-sheet", "Names on shut ground", [...on(false), ...fixed]),
    textTrace("names-on-lit", "Names on open ground", on(true)),
  ];
}

/** Name on the thin edge of the other solids basis, at its longest stretch: the solid that forms there and the basis. */
function otherBasisName({ moved }: Pick<MapContent, "moved">, view: MapView): PlacedText[] {
  if (!moved || !view.layers.otherBasis) return [];
  const length = ({ from, to }: Limit) => Math.hypot(to[0] - from[0], 10 * (to[1] - from[1]));
  const longest = [...moved.limits].sort((a, b) => length(b) - length(a))[0];
  if (!longest) return [];
  const solid = [longest.inside, longest.outside].find((s) => s !== undefined && speciesParts(s).phase === "s");
  const what = solid === undefined ? "" : speciesParts(solid).form || speciesHtml(solid, SMALL_SIZE).html;
  return [
    {
      html: [what, moved.basis].filter(Boolean).join(", "),
      x: (longest.from[0] + longest.to[0]) / 2,
      y: view.scale.toShown((longest.from[1] + longest.to[1]) / 2),
      colour: view.colours.verdigris,
      size: SMALL_SIZE,
    },
  ];
}

/** Words on the edge of the HCN region, at the top of the map. */
function hydrogenCyanideName({ cyanide }: Pick<MapContent, "cyanide">, view: MapView): PlacedText[] {
  const [lo, hi] = view.visible.pH;
  const edge = Math.min(HCN_PH, hi);
  if (!cyanide || !view.layers.hazard || edge <= lo) return [];
  return [
    {
      html: "HCN below pH 10.5",
      x: edge - 0.13 * (hi - lo) > lo ? edge - 0.13 * (hi - lo) : (lo + edge) / 2,
      y: view.scale.toShown(view.visible.Eh[1] - 0.035 * (view.visible.Eh[1] - view.visible.Eh[0])),
      colour: view.colours.signal,
      size: SIZE,
    },
  ];
}
