import { placeLabels, type Box, type LabelWish, type Pixel, type Segment } from "../../../shared/drawing/labels";
import { isLit } from "../../../shared/drawing/lit";
import { lightPalette } from "../../../shared/drawing/palette";
import type { Point } from "../../../shared/solution";
import { windowName } from "../../../shared/windows/limitWords";
import type { Inline, Style } from "./pen";
import type { Plane } from "./plane";
import { roleColour, roleOrder } from "./roles";
import type { SheetWork } from "./work";
import { speciesName } from "./words";

const LINE = 9;

interface Wish extends LabelWish {
  lines: { text: Inline; style: Style }[];
}

function windowWishes({ pen, at }: Plane, { solution }: SheetWork): Wish[] {
  return solution.windows.map((w, i): Wish => {
    const name: Style = { size: 9, face: "bold", colour: "verdigris" };
    const lines = [{ text: `Window ${windowName(i)}`, style: name }];
    const more = !w.controllable
      ? "narrower than the control bands"
      : w.setPoint.cutByFrame
        ? "cut by the frame"
        : null;
    if (more) lines.push({ text: more, style: { size: 6.5, face: "sans", colour: "verdigris" } });
    return {
      id: `window ${i}`,
      pieces: w.polygons.map(({ outer }) => outer.map(at)),
      holes: w.polygons.flatMap(({ holes }) => holes.map((hole) => hole.map(at))),
      width: Math.max(...lines.map((l) => pen.line(l.text, l.style).width)) + 6,
      height: 6 + LINE * lines.length,
      lines,
    };
  });
}

function fieldWishes({ pen, at }: Plane, { solution, revision }: SheetWork): Wish[] {
  const metals = [...revision.inputs.metals].sort((a, b) => roleOrder[a.role] - roleOrder[b.role]);
  return metals.flatMap((metal) => {
    const bySpecies = new Map<string, Pixel[][]>();
    for (const f of solution.fields)
      if (f.metal === metal.element) bySpecies.set(f.species, [...(bySpecies.get(f.species) ?? []), f.polygon.map(at)]);
    const style: Style = { size: 7.5, face: metal.role === "target" ? "bold" : "sans", colour: roleColour[metal.role] };
    return [...bySpecies].map(([species, pieces]): Wish => {
      const text = speciesName(species);
      const width = pen.line(text, style).width + 5;
      return { id: `${metal.element} ${species}`, pieces, width, height: 11, lines: [{ text, style }] };
    });
  });
}

/** Names of windows and fields where they fit, windows first, then by the weight of the metal; what fits nowhere is left out. */
export function drawNames(plane: Plane, work: SheetWork, taken: readonly Box[], boundaries: readonly Point[][]): void {
  const { pen, box, at } = plane;
  const { windows, waterLines, frame } = work.solution;
  const segments = (line: readonly Point[]): Segment[] =>
    line.slice(1).map((p, i): Segment => [at(line[i] ?? p), at(p)]);
  const lines = [
    ...boundaries.flatMap(segments),
    ...waterLines.flatMap(({ intercept, slope }) =>
      segments(frame.pH.map((pH): Point => [pH, intercept + slope * pH])),
    ),
    ...windows.flatMap((w) => w.polygons.flatMap(({ outer }) => segments([...outer, ...outer.slice(0, 1)]))),
  ];
  const inSight = { x0: box.x0 + 3, y0: box.y0 + 2, x1: box.x1 - 3, y1: box.y1 - 2 };
  const wishes = [...windowWishes(plane, work), ...fieldWishes(plane, work)];
  const placed = placeLabels(wishes, inSight, taken, lines);
  for (const wish of wishes) {
    const spot = placed.get(wish.id);
    if (!spot) continue;
    const ground = isLit(windows, ...plane.toPoint(spot)) ? lightPalette.tint : lightPalette.sheet;
    wish.lines.forEach(({ text, style }, i) => {
      const line = pen.line(text, style);
      const y = spot[1] + style.size * 0.35 + (i - (wish.lines.length - 1) / 2) * LINE;
      pen.write(line, spot[0] - line.width / 2, y, ground);
    });
  }
}
