import type { Hatch } from "../metalStyle";

/** A metal's hatch as an SVG pattern, on the map and its strips. */
export function HatchPattern({
  id,
  hatch: { shape, size: s, solidity },
  colour,
  opacity = 1,
}: {
  id: string;
  hatch: Hatch;
  colour: string;
  opacity?: number;
}) {
  // Slanted lines repeat on a square of the diagonal.
  const side = shape === "/" || shape === "\\" || shape === "x" ? s * Math.SQRT2 : s;
  const crossed = s - s * Math.sqrt(1 - solidity);
  const width = shape === "x" || shape === "+" ? crossed : solidity * s;
  const up = `M${-side / 4} ${side / 4}l${side / 2} ${-side / 2}M0 ${side}L${side} 0M${(side * 3) / 4} ${(side * 5) / 4}l${side / 2} ${-side / 2}`;
  const down = `M${(side * 3) / 4} ${-side / 4}l${side / 2} ${side / 2}M0 0L${side} ${side}M${-side / 4} ${(side * 3) / 4}l${side / 2} ${side / 2}`;
  const level = `M0 ${side / 2}H${side}`;
  const upright = `M${side / 2} 0V${side}`;
  const strokes = { "/": up, "\\": down, x: up + down, "-": level, "|": upright, "+": level + upright, ".": "" }[shape];
  return (
    <pattern id={id} width={side} height={side} patternUnits="userSpaceOnUse">
      {shape === "." ? (
        <circle
          cx={side / 2}
          cy={side / 2}
          r={Math.sqrt((solidity * s * s) / Math.PI)}
          fill={colour}
          opacity={opacity}
        />
      ) : (
        <path d={strokes} stroke={colour} strokeWidth={width} opacity={opacity} fill="none" />
      )}
    </pattern>
  );
}
