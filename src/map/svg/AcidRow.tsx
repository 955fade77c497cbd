import { FREE_ACID_BELOW, type FreeAcidCurve } from "../../../shared/activity/freeAcid";
import { typeset } from "../../../shared/species/typeset";
import { fromTop, mapPixels, type Sheet } from "../boxes";
import { plainText, textWidth } from "../speciesText";
import type { MapView } from "../view";
import { acidTicks } from "./acidTicks";
import { SvgText } from "./SvgText";
import { typeSize } from "../typeSize";

/** px below the map: the line of the second row, the foot of its ticks, the middle of its numbers */
const LINE = 24;
const TICK = 29;
const NUMBERS = 37;
const SIZE = typeSize(11);
const title = [...plainText("free acid, g/L "), ...typeset("H2SO4")];

/** The second row under the pH axis: free acid where pH is below 1.5, as far as the sulfate of the liquor balances it. */
export function AcidRow({ curve, sheet, view }: { curve: FreeAcidCurve; sheet: Sheet; view: MapView }) {
  const box = fromTop(sheet, sheet.map);
  const { toPixel } = mapPixels(sheet, view.visible);
  const [p0, p1] = view.visible.pH;
  const x = (pH: number) => toPixel(pH, 0)[0];
  const ticks = acidTicks(curve, [p0, p1], (box.x1 - box.x0) / (p1 - p0));
  const [first] = ticks;
  if (!first) return null;
  const { muted } = view.colours;
  const width = textWidth(title, SIZE);
  // Beside the row where there is room, else over its own right end, whose numbers give way.
  const end = x(Math.min(p1, FREE_ACID_BELOW));
  const titleAt = Math.min(end + 12, box.x1 - width);
  const shown = ticks.filter((t) => x(t.pH) < titleAt - 8);
  const y = box.y1;
  const level = `M${Math.min(x(first.pH), titleAt)} ${y + LINE}H${Math.min(end, titleAt - 8)}`;
  return (
    <g data-acid="">
      <path
        d={level + shown.map((t) => `M${x(t.pH)} ${y + LINE}V${y + TICK}`).join("")}
        stroke={muted}
        strokeWidth={1}
        fill="none"
      />
      {shown.map((t) => (
        <SvgText
          key={t.gPerL}
          lines={[{ parts: plainText(String(t.gPerL)), size: SIZE }]}
          x={x(t.pH)}
          y={y + NUMBERS}
          colour={muted}
        />
      ))}
      <SvgText
        label="axis free acid"
        lines={[{ parts: title, size: SIZE }]}
        x={titleAt}
        y={y + NUMBERS}
        anchor="start"
        colour={muted}
      />
    </g>
  );
}
