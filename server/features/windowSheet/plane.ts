import type { Hatch } from "../../../shared/drawing/hatches";
import { hatchStrokes } from "../../../shared/drawing/hatchStrokes";
import type { Box, Pixel } from "../../../shared/drawing/labels";
import { lightPalette } from "../../../shared/drawing/palette";
import type { Frame } from "../../../shared/schemas/problem";
import type { Outline, Point } from "../../../shared/solution";
import type { Colour, Pen } from "./pen";

/** Points of paper for one px of the screen's map. */
export const UNIT = 0.75;

/** Fills a box with a hatch, inside outlines already clipped to. */
export function drawHatch(pen: Pen, hatch: Hatch, box: Box, colour: string, opacity: number, unit = UNIT): void {
  const { doc } = pen;
  const { lines, dots, width } = hatchStrokes(hatch, box, unit);
  doc.undash();
  if (dots.length > 0) {
    doc.fillColor(colour).fillOpacity(opacity);
    for (const [x, y] of dots) doc.circle(x, y, Math.max(0.35, width / 2));
    doc.fill().fillOpacity(1);
    return;
  }
  doc.lineWidth(Math.max(0.35, width)).strokeColor(colour).strokeOpacity(opacity);
  for (const [[ax, ay], [bx, by]] of lines) doc.moveTo(ax, ay).lineTo(bx, by);
  doc.stroke().strokeOpacity(1);
}

/** The plane of pH and Eh on paper: from the solver's coordinates to points, and paths along them. */
export class Plane {
  constructor(
    readonly pen: Pen,
    /** the frame on paper */
    readonly box: Box,
    readonly frame: Frame,
  ) {}

  readonly px = (pH: number): number => {
    const { box, frame } = this;
    return box.x0 + ((pH - frame.pH[0]) / (frame.pH[1] - frame.pH[0])) * (box.x1 - box.x0);
  };
  readonly py = (Eh: number): number => {
    const { box, frame } = this;
    return box.y1 - ((Eh - frame.Eh[0]) / (frame.Eh[1] - frame.Eh[0])) * (box.y1 - box.y0);
  };
  readonly at = ([pH, Eh]: Point): Pixel => [this.px(pH), this.py(Eh)];
  toPoint([x, y]: Pixel): Point {
    const { box, frame } = this;
    return [
      frame.pH[0] + ((x - box.x0) / (box.x1 - box.x0)) * (frame.pH[1] - frame.pH[0]),
      frame.Eh[0] + ((box.y1 - y) / (box.y1 - box.y0)) * (frame.Eh[1] - frame.Eh[0]),
    ];
  }

  trace(points: readonly Point[], closed = false): void {
    const { doc } = this.pen;
    points.forEach((p, i) => (i === 0 ? doc.moveTo(...this.at(p)) : doc.lineTo(...this.at(p))));
    if (closed) doc.closePath();
  }

  outlines(all: readonly Outline[]): void {
    for (const { outer, holes } of all) for (const ring of [outer, ...holes]) this.trace(ring, true);
  }

  /** Draws inside outlines alone, their holes left out. */
  within(all: readonly Outline[], draw: () => void): void {
    if (all.length === 0) return;
    const { doc } = this.pen;
    doc.save();
    this.outlines(all);
    doc.clip("even-odd");
    draw();
    doc.restore();
  }

  /** Strokes what was traced; width and dash in px of the screen's map. */
  stroke(width: number, colour: Colour, dash = "solid"): void {
    const { doc } = this.pen;
    const [on, off] = dash.split(",").map(Number.parseFloat);
    doc
      .lineWidth(width * UNIT)
      .strokeColor(lightPalette[colour])
      .lineJoin("round");
    if (on !== undefined && off !== undefined) doc.dash(on * UNIT, { space: off * UNIT });
    else doc.undash();
    doc.stroke().undash();
  }
}
