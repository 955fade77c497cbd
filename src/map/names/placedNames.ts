import { type Box, type Pixel, placeLabels, type Segment } from "../../../shared/drawing/labels";
import { isLit } from "../../../shared/drawing/lit";
import type { Point } from "../../../shared/solution";
import { mapPixels, type Sheet } from "../boxes";
import type { MapContent } from "../content";
import { textWidth } from "../speciesText";
import type { TrialMark } from "../trialMarks";
import type { AnchoredText, PlacedText } from "../texts";
import { isDrawn, type MapView } from "../view";
import { gasNames, hydrogenCyanideNames, keptNames, otherBasisNames, practiceNames } from "./anchoredNames";
import { fieldWishes, pairWishes, windowWishes } from "./fieldNames";

/** px from the middle of a trial's mark that a name should rather keep clear of */
const MARK = 7;

type Mark = Pick<TrialMark, "pH" | "Eh">;
const NONE: readonly Mark[] = [];

export interface NamingAround {
  /** of trials painted over the names: a name goes where fewest cover it */
  marks?: readonly Mark[];
  /** names as they stood: those that still fit stay where they are */
  before?: readonly PlacedText[];
}

/** Names inside the fields and windows, none over another; what finds no room is left to the read-out. */
export function placedNames(
  content: MapContent,
  sheet: Sheet,
  view: MapView,
  { marks = content.trials?.marks ?? NONE, before = [] }: NamingAround = {},
): PlacedText[] {
  const { solution, boundaries } = content;
  const { box, toPixel, toPoint } = mapPixels(sheet, view.visible);
  const inSight: Box = { x0: box.x0 + 4, y0: box.y0 + 3, x1: box.x1 - 4, y1: box.y1 - 3 };
  const taken: Box[] = [];
  const at = solution.windows[view.window]?.setPoint;
  if (at && view.layers.setPoint) {
    const [x0, y1] = toPixel(at.pH - view.controlBand.pH, at.Eh - view.controlBand.Eh);
    const [x1, y0] = toPixel(at.pH + view.controlBand.pH, at.Eh + view.controlBand.Eh);
    taken.push({ x0: x0 - 3, y0: y0 - 3, x1: x1 + 3, y1: y1 + 3 });
  }
  const lit = (pH: number, Eh: number) => isLit(solution.windows, pH, Eh);

  const covered = view.layers.trials ? cells(marks, toPixel) : [];
  const anchored: AnchoredText[] = [
    ...otherBasisNames(content, view),
    ...hydrogenCyanideNames(content, view),
    ...keptNames(content, view),
    ...(view.layers.hazard ? gasNames(content.gases, view) : []),
    ...(view.layers.practice ? practiceNames(content.practice, view) : []),
  ];
  const fixed = anchored.flatMap(({ id, parts, size, colour, places }): PlacedText[] => {
    const [w, h] = [textWidth(parts, size) / 2 + 4, size * 0.8];
    const free = places.flatMap(([pH, Eh]) => {
      const [x, y] = toPixel(pH, Eh);
      const own: Box = { x0: x - w, x1: x + w, y0: y - h, y1: y + h };
      return within(own, inSight) && !taken.some((other) => overlap(own, other)) ? [{ pH, Eh, own }] : [];
    });
    const under = ({ own }: { own: Box }) => covered.some((mark) => overlap(own, mark));
    const best = free.find((place) => !under(place)) ?? free[0];
    if (!best) return [];
    taken.push(best.own);
    return [{ id, lines: [{ parts, size }], pH: best.pH, Eh: best.Eh, colour, lit: lit(best.pH, best.Eh) }];
  });

  const wishes = [
    ...(view.plain && view.focus !== null ? [] : windowWishes(solution, view, toPixel)),
    ...(!view.layers.labels
      ? []
      : view.pair
        ? pairWishes(solution.fields, view, toPixel)
        : fieldWishes(solution.fields, view, toPixel)),
  ];
  const segments = (line: readonly Point[]): Segment[] =>
    line.slice(1).map((p, i): Segment => [toPixel(...(line[i] as Point)), toPixel(...p)]);
  const drawn = [...boundaries].filter(([metal]) => isDrawn(metal, view));
  const lines = [
    ...drawn.flatMap(([, of]) => of.flatMap(segments)),
    ...solution.windows.flatMap((w) => w.polygons.flatMap(({ outer }) => segments([...outer, outer[0] as Point]))),
    ...solution.waterLines.flatMap(({ intercept, slope }) =>
      segments(view.frame.pH.map((pH): Point => [pH, intercept + slope * pH])),
    ),
    ...(content.moved && view.layers.otherBasis ? content.moved.limits.flatMap((l) => segments([l.from, l.to])) : []),
    ...covered.map(({ x0, y0, x1, y1 }): Segment => [
      [x0, y0],
      [x1, y1],
    ]),
  ];
  const placed = placeLabels(
    wishes,
    inSight,
    taken,
    lines,
    new Map(before.map(({ id, pH, Eh }) => [id, toPixel(pH, Eh)])),
  );
  const found = wishes.flatMap((wish): PlacedText[] => {
    const spot = placed.get(wish.id);
    if (!spot) return [];
    const [pH, Eh] = toPoint(spot[0], spot[1]);
    return [{ id: wish.id, lines: wish.lines, pH, Eh, colour: wish.colour, lit: lit(pH, Eh) }];
  });
  return [...fixed, ...found];
}

/** Marks as boxes; of those that lie on one another, one. */
function cells(marks: readonly Mark[], toPixel: (pH: number, Eh: number) => Pixel): Box[] {
  const found = new Map<string, Box>();
  for (const { pH, Eh } of marks) {
    const [x, y] = toPixel(pH, Eh);
    const cell = `${Math.round(x / MARK)} ${Math.round(y / MARK)}`;
    if (!found.has(cell)) found.set(cell, { x0: x - MARK, y0: y - MARK, x1: x + MARK, y1: y + MARK });
  }
  return [...found.values()];
}

const overlap = (a: Box, b: Box): boolean => a.x0 < b.x1 && b.x0 < a.x1 && a.y0 < b.y1 && b.y0 < a.y1;
const within = (a: Box, b: Box): boolean => a.x0 >= b.x0 && a.x1 <= b.x1 && a.y0 >= b.y0 && a.y1 <= b.y1;
