import type { ThemeColours } from "../lib/theme";
import { markSize, resultColour, type ColourScale, type MarkSymbol, type TrialMark } from "./trialMarks";

type Corners = readonly (readonly [number, number])[];

const around = (n: number, turn: number, radius: number): Corners =>
  Array.from({ length: n }, (_, i) => {
    const angle = turn + (2 * Math.PI * i) / n;
    return [radius * Math.cos(angle), radius * Math.sin(angle)] as const;
  });

/** Corners round the origin; each of about the same area as the unit disc. */
const corners: Readonly<Record<Exclude<MarkSymbol, "circle">, Corners>> = {
  square: around(4, Math.PI / 4, 1.2),
  diamond: around(4, 0, 1.25),
  "triangle-up": around(3, -Math.PI / 2, 1.35),
  "triangle-down": around(3, Math.PI / 2, 1.35),
  hexagon: around(6, 0, 1.1),
};

/** The same outline as an SVG path round the origin: for a picture, and at radius 5 for a legend. */
export function symbolPath(symbol: MarkSymbol, r = 5): string {
  if (symbol === "circle") return `M${-r},0a${r},${r} 0 1,0 ${2 * r},0a${r},${r} 0 1,0 ${-2 * r},0Z`;
  return `M${corners[symbol].map(([u, v]) => `${(r * u).toFixed(2)},${(r * v).toFixed(2)}`).join("L")}Z`;
}

/** How one mark looks; two marks of one look are stamped with one stamp. */
export interface Look {
  symbol: MarkSymbol;
  /** "#rrggbb"; null for an open mark */
  fill: string | null;
  cooled: boolean;
}

/** Colours are told apart in so many steps, so that a few dozen stamps do for thousands of marks. */
const STEPS = 40;

export function lookOf(mark: TrialMark, scale: ColourScale, colours: ThemeColours): Look {
  const { lo, hi } = scale;
  const step =
    mark.value === null ? null : lo + (Math.round(((mark.value - lo) / (hi - lo)) * STEPS) / STEPS) * (hi - lo);
  return { symbol: mark.symbol, fill: mark.open ? null : resultColour(step, scale, colours), cooled: mark.cooled };
}

/** Draws one look round (x, y). @param r  radius of its disc, in the units of the context */
export function drawLook(
  context: CanvasRenderingContext2D,
  { symbol, fill, cooled }: Look,
  x: number,
  y: number,
  r: number,
  ink: string,
): void {
  context.beginPath();
  if (symbol === "circle") context.arc(x, y, r, 0, 2 * Math.PI);
  else {
    corners[symbol].forEach(([u, v], i) =>
      i === 0 ? context.moveTo(x + r * u, y + r * v) : context.lineTo(x + r * u, y + r * v),
    );
    context.closePath();
  }
  if (fill !== null) {
    context.fillStyle = fill;
    context.fill();
  }
  context.strokeStyle = ink;
  context.stroke();
  if (!cooled) return;
  context.beginPath();
  context.arc(x, y, r * 0.28, 0, 2 * Math.PI);
  context.fillStyle = ink;
  context.fill();
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

export interface PlacedMark {
  mark: TrialMark;
  x: number;
  y: number;
  /** not chosen by the brush: steps back */
  back: boolean;
}

/** A mark under another one this close, px, cannot be seen. */
const COVERED = 2;

/** Which marks are drawn and where, lowest first: open ones lie under filled ones, those not chosen under those chosen. What is out of
 *  sight, or covered by a mark above it, is left out: thousands of trials lie on a few hundred places.
 *  @returns  px in the sheet, y downwards */
export function placedMarks({ marks, toPixel, box, brushed }: Painting): PlacedMark[] {
  const r = markSize(marks.length);
  const found: PlacedMark[] = [];
  const taken = new Set<number>();
  const columns = Math.ceil((box.x1 - box.x0 + 4 * r) / COVERED);
  for (const back of brushed === null ? [false] : [false, true])
    for (const open of [false, true])
      for (let i = marks.length - 1; i >= 0; i -= 1) {
        const mark = marks[i];
        if (mark === undefined || mark.open !== open || (brushed !== null && brushed.has(mark.id) === back)) continue;
        const [x, y] = toPixel(mark.pH, mark.Eh);
        if (x < box.x0 - r || x > box.x1 + r || y < box.y0 - r || y > box.y1 + r) continue;
        const cell = Math.round((x - box.x0 + r) / COVERED) + columns * Math.round((y - box.y0 + r) / COVERED);
        if (taken.has(cell)) continue;
        taken.add(cell);
        found.push({ mark, x, y, back });
      }
  return found.reverse();
}

/** Stamps marks onto a canvas: each look is drawn once and copied, which is some ten times faster than drawing it again. */
export class TrialPainter {
  private stamps = new Map<string, HTMLCanvasElement>();
  private made = "";

  private stamp(look: Look, r: number, ratio: number, ink: string): HTMLCanvasElement {
    const setting = `${r} ${ratio} ${ink}`;
    if (setting !== this.made) {
      this.made = setting;
      this.stamps = new Map();
    }
    const key = `${look.symbol} ${look.fill} ${look.cooled}`;
    let found = this.stamps.get(key);
    if (!found) {
      const side = Math.ceil((2 * r * 1.4 + 3) * ratio);
      found = Object.assign(document.createElement("canvas"), { width: side, height: side });
      const context = found.getContext("2d");
      if (context) {
        context.lineWidth = ratio;
        drawLook(context, look, side / 2, side / 2, r * ratio, ink);
      }
      this.stamps.set(key, found);
    }
    return found;
  }

  /** @param ratio  device pixels a CSS pixel; the context has no transform of its own */
  paint(context: CanvasRenderingContext2D, size: { width: number; height: number }, ratio: number, p: Painting): void {
    const { box, colours, scale } = p;
    const r = markSize(p.marks.length) / 2;
    context.clearRect(0, 0, size.width * ratio, size.height * ratio);
    context.save();
    context.beginPath();
    context.rect(box.x0 * ratio, box.y0 * ratio, (box.x1 - box.x0) * ratio, (box.y1 - box.y0) * ratio);
    context.clip();
    for (const { mark, x, y, back } of placedMarks(p)) {
      const stamp = this.stamp(lookOf(mark, scale, colours), r, ratio, colours.ink);
      context.globalAlpha = back ? 0.18 : 1;
      context.drawImage(stamp, Math.round(x * ratio - stamp.width / 2), Math.round(y * ratio - stamp.height / 2));
    }
    context.restore();
  }
}
