import { SMALL } from "../speciesText";
import type { TextLine } from "../texts";
import { MONO } from "../view";

/** Shift of what stands below and above the line, in sizes of the text. */
const SHIFT = { plain: 0, sub: 0.22, sup: -0.36 } as const;
const PITCH = 1.28;

export interface SvgTextProps {
  lines: readonly TextLine[];
  x: number;
  y: number;
  colour: string;
  /** colour of the ground, which lifts the words off hatching and lines */
  halo?: string;
  /** reads upwards */
  turned?: boolean;
  anchor?: "start" | "middle" | "end";
  label?: string;
}

interface Tspan {
  text: string;
  /** height of the line's foot where a line begins, from the middle of all */
  place: number | null;
  /** from where the part before ended */
  dy: number;
  size: number;
  bold: boolean;
}

function tspans(lines: readonly TextLine[]): Tspan[] {
  let foot = -lines.reduce((sum, { size }) => sum + size * PITCH, 0) / 2;
  return lines.flatMap(({ parts, size, bold = false }) => {
    foot += size * PITCH;
    const place = foot - size * (PITCH - 1) - size * 0.16;
    let shifted = 0;
    return parts.map(({ text, kind }, k): Tspan => {
      const dy = SHIFT[kind] * size - shifted;
      shifted += dy;
      return { text, place: k === 0 ? place : null, dy, size: kind === "plain" ? size : size * SMALL, bold };
    });
  });
}

/** Words round a point, typeset: its middle on the way down, `anchor` on the way across. */
export function SvgText({ lines, x, y, colour, halo, turned, anchor = "middle", label }: SvgTextProps) {
  const placed = tspans(lines);
  // Moved as a whole: its letters need not be laid out again.
  return (
    <text
      textAnchor={anchor}
      fill={colour}
      fontFamily={MONO}
      data-name={label}
      transform={`translate(${x} ${y})${turned ? " rotate(-90)" : ""}`}
      {...(halo ? { stroke: halo, strokeWidth: 3.5, strokeLinejoin: "round", paintOrder: "stroke" } : {})}
    >
      {placed.map(({ text, place, dy, size, bold }, i) => (
        <tspan
          key={i}
          {...(place === null ? {} : { x: 0, y: place })}
          {...(dy === 0 ? {} : { dy })}
          fontSize={size}
          {...(bold ? { fontWeight: 700 } : {})}
        >
          {text}
        </tspan>
      ))}
    </text>
  );
}
