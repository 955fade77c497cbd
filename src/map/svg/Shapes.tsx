import { memo, useId } from "react";
import type { Frame } from "../../../shared/schemas/problem";
import { mapPixels, type Sheet } from "../boxes";
import type { Coordinate, PlotTrace } from "../plotTypes";
import type { MapView } from "../view";
import { HatchPattern } from "./HatchPattern";
import { SheetSvg } from "./SheetSvg";

export interface ShapesProps {
  traces: readonly PlotTrace[];
  sheet: Sheet;
  /** in sight, V vs SHE */
  visible: Frame;
  view: Pick<MapView, "scale" | "colours">;
}

/** The map itself: ground, hatching, lines and marks, each trace in its order. Drawn as shapes of its own, since a chart would
 *  lay out its whole figure anew at each step of a drag. The same for the screen and for pictures. */
export const Shapes = memo(function Shapes({ traces, sheet, visible, view: { scale, colours } }: ShapesProps) {
  const id = useId().replace(/[^\w-]/g, "");
  const { box, toPixel } = mapPixels(sheet, {
    pH: visible.pH,
    Eh: [scale.toShown(visible.Eh[0]), scale.toShown(visible.Eh[1])],
  });
  return (
    <SheetSvg
      {...{ sheet, box }}
      clip={`${id}-clip`}
      testId="map-shapes"
      defs={traces.map(
        ({ uid, fillpattern: p }) =>
          p && <HatchPattern key={uid} id={`${id}-${uid}`} hatch={p} colour={p.fgcolor} opacity={p.fgopacity} />,
      )}
    >
      <rect
        x={box.x0}
        y={box.y0}
        width={box.x1 - box.x0}
        height={box.y1 - box.y0}
        fill={colours.sheet}
        data-ground=""
      />
      <g clipPath={`url(#${id}-clip)`} strokeMiterlimit={2}>
        {traces.map((trace) => (
          <Shape key={trace.uid} trace={trace} pattern={`${id}-${trace.uid}`} toPixel={toPixel} />
        ))}
      </g>
    </SheetSvg>
  );
});

type ToPixel = (x: number, y: number) => readonly [number, number];

function Shape({ trace, pattern, toPixel }: { trace: PlotTrace; pattern: string; toPixel: ToPixel }) {
  const { uid, name, x, y, line, fill, fillcolor, fillpattern, marker, mode, opacity = 1 } = trace;
  const area = fill === "toself";
  const stroked = mode !== "markers" && line !== undefined && line.width > 0;
  const dash = line?.dash === undefined || line.dash === "solid" ? undefined : line.dash.replaceAll("px", "");
  return (
    <g opacity={opacity} data-trace={uid} data-title={name}>
      {(area || stroked) && (
        <path
          d={pathOf(x, y, toPixel)}
          fill={area ? (fillpattern ? `url(#${pattern})` : fillcolor) : "none"}
          {...(stroked ? { stroke: line.color, strokeWidth: line.width, strokeDasharray: dash } : {})}
        />
      )}
      {marker &&
        mode !== "lines" &&
        x.map((v, i) => {
          const [w, size] = [y[i] ?? null, marker.size[i] ?? 0];
          if (v === null || w === null || size === 0) return null;
          const [cx, cy] = toPixel(v, w);
          return (
            <circle
              key={i}
              cx={px(cx)}
              cy={px(cy)}
              r={size / 2}
              opacity={marker.opacity}
              fill={typeof marker.color === "string" ? marker.color : marker.color[i]}
              stroke={marker.line.color}
              strokeWidth={marker.line.width}
            />
          );
        })}
    </g>
  );
}

const px = (v: number): number => Math.round(100 * v) / 100;

/** A gap in the coordinates begins a new part. */
function pathOf(x: readonly Coordinate[], y: readonly Coordinate[], toPixel: ToPixel): string {
  let d = "";
  let joined = false;
  for (let i = 0; i < x.length; i++) {
    const [v, w] = [x[i] ?? null, y[i] ?? null];
    if (v === null || w === null) {
      joined = false;
      continue;
    }
    const [a, b] = toPixel(v, w);
    d += `${joined ? "L" : "M"}${px(a)} ${px(b)}`;
    joined = true;
  }
  return d;
}
