import type { ThemeColours } from "../lib/theme";
import { markSize, resultColour, type ColourScale, type MarkSymbol, type TrialMark } from "./trialMarks";

type Corners = readonly (readonly [number, number])[];

const around = (n: number, turn: number): Corners =>
  Array.from({ length: n }, (_, i) => {
    const angle = turn + (2 * Math.PI * i) / n;
    return [Math.cos(angle), Math.sin(angle)] as const;
  });

/** Corners on the unit circle; of about the same area as the disc. */
const corners: Readonly<Record<Exclude<MarkSymbol, "circle">, Corners>> = {
  square: around(4, Math.PI / 4).map(([x, y]) => [1.2 * x, 1.2 * y]),
  diamond: around(4, 0).map(([x, y]) => [1.25 * x, 1.25 * y]),
  "triangle-up": around(3, -Math.PI / 2).map(([x, y]) => [1.35 * x, 1.35 * y]),
  "triangle-down": around(3, Math.PI / 2).map(([x, y]) => [1.35 * x, 1.35 * y]),
  hexagon: around(6, 0).map(([x, y]) => [1.1 * x, 1.1 * y]),
};

/** The part of a canvas that painting needs. */
export type Brush = Pick<
  CanvasRenderingContext2D,
  | "beginPath"
  | "arc"
  | "moveTo"
  | "lineTo"
  | "closePath"
  | "fill"
  | "stroke"
  | "save"
  | "restore"
  | "rect"
  | "clip"
  | "clearRect"
> & { fillStyle: unknown; strokeStyle: unknown; lineWidth: number; globalAlpha: number };

function outline(brush: Brush, symbol: MarkSymbol, x: number, y: number, r: number): void {
  brush.beginPath();
  if (symbol === "circle") brush.arc(x, y, r, 0, 2 * Math.PI);
  else {
    corners[symbol].forEach(([u, v], i) =>
      i === 0 ? brush.moveTo(x + r * u, y + r * v) : brush.lineTo(x + r * u, y + r * v),
    );
    brush.closePath();
  }
}

/** The same outline as an SVG path round the origin, radius 5: for a legend. */
export function symbolPath(symbol: MarkSymbol): string {
  if (symbol === "circle") return "M-5,0a5,5 0 1,0 10,0a5,5 0 1,0 -10,0Z";
  return `M${corners[symbol].map(([u, v]) => `${(5 * u).toFixed(2)},${(5 * v).toFixed(2)}`).join("L")}Z`;
}

export interface Painting {
  marks: readonly TrialMark[];
  scale: ColourScale;
  colours: ThemeColours;
  toPixel: (pH: number, Eh: number) => [number, number];
  /** the map, px */
  box: { x0: number; y0: number; x1: number; y1: number };
  /** chosen by a brush: the others step back; null without one */
  brushed: ReadonlySet<string> | null;
}

/** Paints the marks onto a cleared canvas, clipped to the map; what lies outside is not touched.
 *  @returns  how many were painted */
export function paintTrials(brush: Brush, size: { width: number; height: number }, p: Painting): number {
  const { box, marks, colours } = p;
  const r = markSize(marks.length) / 2;
  brush.clearRect(0, 0, size.width, size.height);
  brush.save();
  brush.beginPath();
  brush.rect(box.x0, box.y0, box.x1 - box.x0, box.y1 - box.y0);
  brush.clip();
  brush.lineWidth = 1;
  brush.strokeStyle = colours.ink;
  let painted = 0;
  for (const open of [true, false])
    for (const mark of marks) {
      if (mark.open !== open) continue;
      const [x, y] = p.toPixel(mark.pH, mark.Eh);
      if (x < box.x0 - r || x > box.x1 + r || y < box.y0 - r || y > box.y1 + r) continue;
      painted += 1;
      brush.globalAlpha = p.brushed === null || p.brushed.has(mark.id) ? 1 : 0.18;
      outline(brush, mark.symbol, x, y, r);
      if (!open) {
        brush.fillStyle = resultColour(mark.value, p.scale, colours);
        brush.fill();
      }
      brush.stroke();
      if (mark.cooled) {
        brush.beginPath();
        brush.arc(x, y, 1.3, 0, 2 * Math.PI);
        brush.fillStyle = colours.ink;
        brush.fill();
      }
    }
  brush.restore();
  return painted;
}
