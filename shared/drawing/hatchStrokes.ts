import type { Hatch } from "./hatches";
import type { Box, Pixel, Segment } from "./labels";

/** The strokes of a hatch over a box, to be clipped to what is hatched. */
export interface Strokes {
  readonly lines: readonly Segment[];
  /** middles of dots */
  readonly dots: readonly Pixel[];
  /** of a line, and twice the radius of a dot */
  readonly width: number;
}

/** Multiples of a step in a range, so that two neighbouring areas hatch in one rhythm. */
function multiples(from: number, to: number, step: number): number[] {
  const first = Math.ceil(from / step);
  return Array.from({ length: Math.max(0, Math.floor(to / step) - first + 1) }, (_, i) => (first + i) * step);
}

const rising = ({ x0, y0, x1, y1 }: Box, step: number): Segment[] =>
  multiples(x0 + y0, x1 + y1, step).map((c) => [
    [c - y1, y1],
    [c - y0, y0],
  ]);
const falling = ({ x0, y0, x1, y1 }: Box, step: number): Segment[] =>
  multiples(x0 - y1, x1 - y0, step).map((c) => [
    [c + y0, y0],
    [c + y1, y1],
  ]);
const upright = ({ x0, y0, x1, y1 }: Box, step: number): Segment[] =>
  multiples(x0, x1, step).map((x) => [
    [x, y0],
    [x, y1],
  ]);
const level = ({ x0, y0, x1, y1 }: Box, step: number): Segment[] =>
  multiples(y0, y1, step).map((y) => [
    [x0, y],
    [x1, y],
  ]);

/** The strokes of a metal's hatch as vectors, in the density in which the screen draws it: `solidity` is the inked share of a tile.
 *  @param hatch  of `hatchesOf`     @param box  to be covered, y downwards     @param unit  one px of the hatch, in the unit of the box
 *  @returns  segments that cover the box or stand over its sides, or dots inside it
 *  @source  share of a square tile that its strokes cover
 *  @example hatchStrokes({ shape: "|", size: 10, solidity: 0.1 }, { x0: 1, y0: 0, x1: 41, y1: 5 }, 1).lines.length // => 4 */
export function hatchStrokes({ shape, size, solidity }: Hatch, box: Box, unit: number): Strokes {
  const step = size * unit;
  const strokes = (lines: Segment[], width: number): Strokes => ({ lines, dots: [], width });
  const crossed = step * (1 - Math.sqrt(1 - solidity));
  switch (shape) {
    case "/":
      return strokes(rising(box, step), (solidity * step) / Math.SQRT2);
    case "\\":
      return strokes(falling(box, step), (solidity * step) / Math.SQRT2);
    case "x":
      return strokes([...rising(box, step), ...falling(box, step)], crossed / Math.SQRT2);
    case "|":
      return strokes(upright(box, step), solidity * step);
    case "-":
      return strokes(level(box, step), solidity * step);
    case "+":
      return strokes([...upright(box, step), ...level(box, step)], crossed);
    case ".": {
      const dots = multiples(box.x0, box.x1, step).flatMap((x) =>
        multiples(box.y0, box.y1, step).map((y): Pixel => [x, y]),
      );
      return { lines: [], dots, width: 2 * step * Math.sqrt(solidity / Math.PI) };
    }
  }
}
