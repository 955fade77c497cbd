import { useId } from "react";
import type { Hatch } from "./metalStyle";

/** The hatch of a metal as it stands on the map, for a legend; empty where the metal shuts nothing. */
export function Swatch({ hatch, colour, className }: { hatch: Hatch | null; colour: string; className?: string }) {
  const id = useId();
  const size = hatch ? Math.min(hatch.size, 8) : 8;
  return (
    <svg width={24} height={14} aria-hidden className={className}>
      {hatch && (
        <defs>
          <pattern id={id} width={size} height={size} patternUnits="userSpaceOnUse">
            <path d={strokes(hatch.shape, size)} stroke={colour} strokeWidth={1} fill="none" />
          </pattern>
        </defs>
      )}
      <rect x={0.5} y={0.5} width={23} height={13} fill={hatch ? `url(#${id})` : "none"} stroke={colour} />
    </svg>
  );
}

function strokes(shape: Hatch["shape"], s: number): string {
  const up = `M0 ${s}L${s} 0M${-s / 2} ${s / 2}L${s / 2} ${-s / 2}M${s / 2} ${1.5 * s}L${1.5 * s} ${s / 2}`;
  const down = `M0 0L${s} ${s}M${-s / 2} ${s / 2}L${s / 2} ${1.5 * s}M${s / 2} ${-s / 2}L${1.5 * s} ${s / 2}`;
  const level = `M0 ${s / 2}H${s}`;
  const upright = `M${s / 2} 0V${s}`;
  switch (shape) {
    case "/":
      return up;
    case "\\":
      return down;
    case "x":
      return up + down;
    case "-":
      return level;
    case "|":
      return upright;
    case "+":
      return level + upright;
    case ".":
      return `M${s / 2 - 0.6} ${s / 2}h1.2`;
  }
}
