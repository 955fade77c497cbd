import { useId } from "react";
import type { Hatch } from "./metalStyle";

/** The hatch of a metal as it stands on the map, for a legend; empty where the metal shuts nothing. */
export function Swatch({
  hatch,
  colour,
  fill = "none",
  small = false,
  title,
  className,
}: {
  hatch: Hatch | null;
  colour: string;
  /** ground without a hatch */
  fill?: string;
  small?: boolean;
  title?: string;
  className?: string;
}) {
  const id = useId();
  const size = hatch ? Math.min(Math.round(hatch.size * (small ? 0.55 : 0.75)), small ? 8 : 14) : 8;
  const [width, height] = small ? [14, 10] : [24, 14];
  return (
    <svg width={width} height={height} className={className} {...(title ? { role: "img" } : { "aria-hidden": true })}>
      {title && <title>{title}</title>}
      {hatch && (
        <defs>
          <pattern id={id} width={size} height={size} patternUnits="userSpaceOnUse">
            <path d={strokes(hatch.shape, size)} stroke={colour} strokeWidth={1} fill="none" />
          </pattern>
        </defs>
      )}
      <rect x={0.5} y={0.5} width={width - 1} height={height - 1} fill={hatch ? `url(#${id})` : fill} stroke={colour} />
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
