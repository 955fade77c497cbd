import { memo } from "react";
import type { Frame } from "../../../shared/schemas/problem";
import { fromTop, type Sheet } from "../boxes";
import { plainText } from "../speciesText";
import type { ShownScale } from "../view";
import { axisTicks } from "./axisTicks";
import { SvgText } from "./SvgText";

/** px */
const TICK = 5;
const SIZE = 12;

interface AxesProps {
  sheet: Sheet;
  /** in sight, V vs SHE */
  visible: Frame;
  scale: ShownScale;
  colour: string;
}

/** The frame of the map with its ticks and numbers, potentials on the shown scale. */
export function Axes({ sheet, visible: { pH, Eh }, scale, colour }: AxesProps) {
  return (
    <Border sheet={sheet} p0={pH[0]} p1={pH[1]} e0={scale.toShown(Eh[0])} e1={scale.toShown(Eh[1])} colour={colour} />
  );
}

/** Drawn again only where a number changed. */
const Border = memo(function Border(props: {
  sheet: Sheet;
  p0: number;
  p1: number;
  e0: number;
  e1: number;
  colour: string;
}) {
  const { sheet, p0, p1, e0, e1, colour } = props;
  const { x0, y0, x1, y1 } = fromTop(sheet, sheet.map);
  const along = axisTicks([p0, p1]).map((t) => ({ ...t, at: x0 + ((t.value - p0) / (p1 - p0)) * (x1 - x0) }));
  const up = axisTicks([e0, e1]).map((t) => ({ ...t, at: y1 - ((t.value - e0) / (e1 - e0)) * (y1 - y0) }));
  const marks = [...along.map(({ at }) => `M${at} ${y1}v${TICK}`), ...up.map(({ at }) => `M${x0} ${at}h${-TICK}`)];
  const words = (text: string) => [{ parts: plainText(text), size: SIZE }];
  return (
    <g data-axes="">
      <path d={`M${x0} ${y0}H${x1}V${y1}H${x0}Z${marks.join("")}`} stroke={colour} strokeWidth={1.2} fill="none" />
      {along.map(({ value, text, at }) => (
        <SvgText key={`pH ${value}`} lines={words(text)} x={at} y={y1 + 16} colour={colour} />
      ))}
      {up.map(({ value, text, at }) => (
        <SvgText key={`Eh ${value}`} lines={words(text)} x={x0 - 8} y={at} anchor="end" colour={colour} />
      ))}
    </g>
  );
});
