import type { CrosscutPart } from "../../../shared/setpoint/crosscut";
import type { Point } from "../../../shared/solution";
import { fromTop, mapPixels, type Sheet } from "../boxes";
import { metalColour, shuts } from "../metalStyle";
import { plainText, speciesText, textWidth } from "../speciesText";
import { isDrawn, type MapView } from "../view";
import { type Crosscut, differingStretches, type Direction, type LimitMark } from "./stripModel";
import { SvgText } from "./SvgText";
import { typeSize } from "../typeSize";

export interface StripsProps {
  direction: Direction;
  cuts: readonly Crosscut[];
  through: Point;
  /** the same through a pinned point, drawn beside it metal by metal */
  pinned: { cuts: readonly Crosscut[]; through: Point } | null;
  marks: readonly LimitMark[];
  sheet: Sheet;
  view: MapView;
  /** id of a metal's hatch pattern */
  patternOf: (element: string) => string;
}

/** size of the names by the thickness of a strip; null: too thin for a name */
const nameSize = (thickness: number): number | null =>
  thickness >= 17 ? typeSize(11) : thickness >= 13 ? 10 : thickness >= 10 ? 9 : null;

/** One strip a metal along pH or along Eh: what is as required tinted, the rest hatched as on the map, the way to the limits beyond
 *  their ends. With a pinned point each metal has two, and a bar between them where they differ. */
export function Strips({ direction, cuts: all, through, pinned, marks, sheet, view, patternOf }: StripsProps) {
  const outline = direction === "pH" ? sheet.alongPH : sheet.alongEh;
  const cuts = all.filter(({ metal }) => isDrawn(metal.element, view));
  if (!outline || cuts.length === 0) return null;
  const box = fromTop(sheet, outline);
  const { colours, visible } = view;
  const pixels = mapPixels(sheet, visible);
  const upright = direction === "Eh";
  const [lo, hi] = visible[direction];
  const at = (v: number) => (upright ? pixels.toPixel(0, v)[1] : pixels.toPixel(v, 0)[0]);
  const row = (upright ? box.x1 - box.x0 : box.y1 - box.y0) / cuts.length;
  const pad = Math.min(2, row * 0.09);
  const start = upright ? box.x0 : box.y0;
  const end = upright ? box.x1 : box.y1;

  const rect = (from: number, to: number, a: number, b: number) => {
    const [p, q] = [at(from), at(to)];
    return upright
      ? { x: a, y: Math.min(p, q), width: b - a, height: Math.abs(q - p) }
      : { x: Math.min(p, q), y: a, width: Math.abs(q - p), height: b - a };
  };
  const across = (value: number, a: number, b: number) =>
    upright ? { x1: a, x2: b, y1: at(value), y2: at(value) } : { x1: at(value), x2: at(value), y1: a, y2: b };
  const inSight = (value: number) => value >= lo && value <= hi;
  const spot = (along: number, crosswise: number) =>
    upright ? { x: crosswise, y: along } : { x: along, y: crosswise };

  const strip = (key: string, { metal }: Crosscut, parts: readonly CrosscutPart[], a: number, b: number) => {
    const aside = view.focus !== null && view.focus !== metal.element;
    const colour = aside ? colours.muted : metal.role === "target" ? metalColour(metal, view) : colours.ink;
    const size = nameSize(b - a);
    return (
      <g key={key}>
        {parts.map((part) => {
          const [from, to] = [Math.max(part.from, lo), Math.min(part.to, hi)];
          if (to <= from) return null;
          const place = rect(from, to, a, b);
          const open = part.fulfilled && shuts(metal);
          const shut = !part.fulfilled && shuts(metal);
          const name = speciesText(part.species);
          const room = upright ? place.height : place.width;
          return (
            <g key={`${part.species} ${part.from}`}>
              <rect {...place} fill={open ? colours.tint : colours.sheet} />
              {shut && <rect {...place} fill={`url(#${patternOf(metal.element)})`} />}
              <rect {...place} fill="none" stroke={colours.ink} strokeWidth={1} />
              {size !== null && room >= textWidth(name, size) + 6 && (
                <SvgText
                  lines={[{ parts: name, size }]}
                  {...spot((at(from) + at(to)) / 2, (a + b) / 2)}
                  colour={colour}
                  halo={open ? colours.tint : colours.sheet}
                  turned={upright}
                />
              )}
            </g>
          );
        })}
      </g>
    );
  };

  const partsOf = (cut: Crosscut) => (upright ? cut.alongEh : cut.alongPH);
  return (
    <g data-strips={direction}>
      {cuts.map((cut, i) => {
        const { metal } = cut;
        const [a, b] = [start + i * row + pad, start + (i + 1) * row - pad];
        const second = pinned?.cuts.find((c) => c.metal.element === metal.element);
        const middle = (a + b) / 2;
        const aside = view.focus !== null && view.focus !== metal.element;
        return (
          <g key={metal.element}>
            <SvgText
              lines={[
                { parts: plainText(metal.element), size: Math.min(typeSize(11), Math.max(10, row - 2)), bold: true },
              ]}
              {...(upright ? { x: middle, y: box.y0 - 9 } : { x: box.x0 - 7, y: middle })}
              anchor={upright ? "middle" : "end"}
              colour={aside ? colours.muted : metalColour(metal, view)}
            />
            {strip("first", cut, partsOf(cut), a, second ? middle - 1 : b)}
            {second && strip("second", second, partsOf(second), middle + 1, b)}
            {second &&
              differingStretches(partsOf(cut), partsOf(second)).map(([from, to]) => {
                const [f, t] = [Math.max(from, lo), Math.min(to, hi)];
                return t > f ? (
                  <rect
                    key={from}
                    data-differs={metal.element}
                    {...rect(f, t, middle - 1.75, middle + 1.75)}
                    fill={colours.ink}
                  />
                ) : null;
              })}
            {marks
              .filter((m) => m.metal === metal.element && inSight(m.at))
              .map((m) => (
                <line key={m.at} {...across(m.at, a - 1, b + 1)} stroke={colours.verdigris} strokeWidth={3} />
              ))}
          </g>
        );
      })}
      {marks
        .filter((m) => inSight(m.at))
        .map((m) => (
          <g key={m.at} data-limit={direction}>
            <line
              {...across(m.at, start, end + 3)}
              stroke={m.kind === "frame" ? colours.muted : colours.verdigris}
              strokeWidth={0.9}
              strokeDasharray="3 2"
            />
            <SvgText
              lines={[{ parts: plainText(m.kind === "frame" ? "frame" : m.text), size: typeSize(10) }]}
              {...spot(clear(m, marks, at, upright), end + 10)}
              colour={m.kind === "frame" ? colours.muted : colours.verdigris}
              turned={upright}
            />
          </g>
        ))}
      {inSight(through[upright ? 1 : 0]) && (
        <line
          {...across(through[upright ? 1 : 0], start - (upright ? 6 : 4), end + 3)}
          stroke={colours.verdigris}
          strokeWidth={1.8}
        />
      )}
      {pinned && inSight(pinned.through[upright ? 1 : 0]) && (
        <line
          {...across(pinned.through[upright ? 1 : 0], start - (upright ? 6 : 4), end + 3)}
          stroke={colours.ink}
          strokeWidth={1.4}
          strokeDasharray="4 3"
        />
      )}
    </g>
  );
}

/** Px of a mark's word, moved away from the other mark's where the window is narrow. */
function clear(mark: LimitMark, marks: readonly LimitMark[], at: (v: number) => number, upright: boolean): number {
  const here = at(mark.at);
  const other = marks.find((m) => m !== mark);
  if (!other) return here;
  const room = upright ? 54 : 10 + 3 * (mark.text.length + other.text.length);
  const gap = here - at(other.at);
  return Math.abs(gap) >= room ? here : here + (Math.sign(gap) * (room - Math.abs(gap))) / 2;
}
