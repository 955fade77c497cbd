import { useId } from "react";
import { windowFigure } from "./windowFigure";

const { frame, window, shut, setPoint, controlBand } = windowFigure;
const room = { left: 46, right: 10, top: 6, bottom: 36 };
const ticks = { pH: [1, 2, 3, 4, 5, 6, 7, 8], Eh: [0, 0.4, 0.8, 1.2] };

/** Width of a letter, px. */
const GLYPH = 7.2;

type At = readonly [pH: number, Eh: number];

/** A window as the map of a plan draws it: hatched ground is shut, open ground is lit. The hatches are its own, since those of the
 *  map would bring its code to the first page. Sizes in px. */
export function WindowSketch({ width, height, className }: { width: number; height: number; className?: string }) {
  const id = useId();
  const [x0, x1] = [room.left, width - room.right];
  const [y0, y1] = [room.top, height - room.bottom];
  const x = (pH: number) => x0 + ((pH - frame.pH[0]) / (frame.pH[1] - frame.pH[0])) * (x1 - x0);
  const y = (Eh: number) => y1 - ((Eh - frame.Eh[0]) / (frame.Eh[1] - frame.Eh[0])) * (y1 - y0);
  const points = (outline: readonly At[]) => outline.map(([pH, Eh]) => `${x(pH)},${y(Eh)}`).join(" ");
  const word = (text: string, [pH, Eh]: At, colour: string) => (
    <>
      <rect
        x={x(pH) - GLYPH * (text.length / 2 + 1)}
        y={y(Eh) - 9}
        width={GLYPH * (text.length + 2)}
        height={18}
        className="fill-sheet"
      />
      <text x={x(pH)} y={y(Eh) + 4} textAnchor="middle" className={colour}>
        {text}
      </text>
    </>
  );
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      width={width}
      className={`h-auto max-w-full font-mono text-xs ${className ?? ""}`}
      role="img"
      aria-label="Window of a neutral zinc leach over pH and potential, between the ground where iron dissolves and the ground where zinc precipitates"
    >
      <defs>
        <pattern id={`${id}-Zn`} width={8} height={8} patternUnits="userSpaceOnUse">
          <path d="M0 4H8" className="stroke-copper" strokeWidth={1.4} />
        </pattern>
        <pattern id={`${id}-Fe`} width={12} height={12} patternUnits="userSpaceOnUse">
          <path d="M-3 3L3 -3M0 12L12 0M9 15L15 9" className="stroke-ink" opacity={0.5} />
        </pattern>
      </defs>
      <rect x={x0} y={y0} width={x1 - x0} height={y1 - y0} className="fill-sheet" />
      <polygon points={points(window)} className="fill-tint" />
      <polygon points={points(shut.Fe)} fill={`url(#${id}-Fe)`} className="stroke-ink" />
      <polygon points={points(shut.Zn)} fill={`url(#${id}-Zn)`} className="stroke-copper" />
      <polygon points={points(window)} fill="none" className="stroke-verdigris" strokeWidth={2.5} />
      <rect x={x0} y={y0} width={x1 - x0} height={y1 - y0} fill="none" className="stroke-ink" />
      <rect
        x={x(setPoint[0] - controlBand[0])}
        y={y(setPoint[1] + controlBand[1])}
        width={x(controlBand[0]) - x(-controlBand[0])}
        height={y(-controlBand[1]) - y(controlBand[1])}
        className="fill-sheet stroke-verdigris"
        strokeWidth={1.5}
      />
      <circle cx={x(setPoint[0])} cy={y(setPoint[1])} r={2.5} className="fill-verdigris" />
      {word("iron dissolves", [2.5, 0.5], "fill-ink")}
      {word("zinc drops out", [7.07, 0.7], "fill-copper")}
      <text x={x(5.1)} y={y(0.52)} textAnchor="middle" className="fill-verdigris font-bold">
        window
      </text>
      <g className="fill-muted stroke-none">
        {ticks.pH.map((pH) => (
          <text key={pH} x={x(pH)} y={y1 + 15} textAnchor="middle">
            {pH}
          </text>
        ))}
        {ticks.Eh.map((Eh) => (
          <text key={Eh} x={x0 - 7} y={y(Eh) + 4} textAnchor="end">
            {Eh.toFixed(1)}
          </text>
        ))}
        <text x={x1} y={y1 + 31} textAnchor="end">
          pH at 60 °C
        </text>
        <text x={x0 - 36} y={y1 + 31}>
          Eh / V vs SHE
        </text>
      </g>
    </svg>
  );
}
