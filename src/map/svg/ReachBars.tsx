import { type Reach, standsAt } from "../../../shared/reach/reach";
import { typeset } from "../../../shared/species/typeset";
import { fromTop, mapPixels, type Sheet } from "../boxes";
import { plainText, textWidth } from "../speciesText";
import type { MapView } from "../view";
import { SvgText } from "./SvgText";
import { typeSize } from "../typeSize";

export interface ReachBar {
  /** practical range inside what is in sight, V vs SHE; null where there is none on record or in sight */
  solid: [number, number] | null;
  /** on to the equilibrium of the couple, every activity one */
  thin: [number, number] | null;
  /** equilibrium, or the end of the frame before it; `beyond` says which way it lies then */
  cap: { at: number; beyond: -1 | 0 | 1 } | null;
}

/** One reagent's bar in a range of Eh.
 *  @param pH  where the equilibrium is read     @param range  V vs SHE, in sight */
export function reachBar(reach: Reach, pH: number, [lo, hi]: readonly [number, number]): ReachBar {
  const inside = (Eh: number) => Math.min(hi, Math.max(lo, Eh));
  const full = reach.practical && ([reach.practical[0], reach.practical[1] ?? hi] as const);
  const bar: [number, number] | null = full && [inside(full[0]), inside(full[1])];
  const equilibrium = standsAt(reach, pH);
  if (equilibrium === null) return { solid: bar, thin: null, cap: null };
  const end = inside(equilibrium);
  const beyond = Math.sign(equilibrium - end) as -1 | 0 | 1;
  const start = full ? inside(Math.min(full[1], Math.max(full[0], equilibrium))) : end - 2 * beyond * 0.02 * (hi - lo);
  return { solid: bar, thin: start === end ? null : [start, end], cap: { at: end, beyond } };
}

/** Bars beside the Eh axis: the practical range solid, a thin line on to the couple's equilibrium at the set point's pH. */
export function ReachBars({
  reaches,
  pH,
  sheet,
  view,
}: {
  reaches: readonly Reach[];
  pH: number;
  sheet: Sheet;
  view: MapView;
}) {
  if (!sheet.reach || reaches.length === 0) return null;
  const box = fromTop(sheet, sheet.reach);
  const { colours, visible } = view;
  const { toPixel } = mapPixels(sheet, visible);
  const y = (Eh: number) => toPixel(0, Eh)[1];
  const column = (box.x1 - box.x0) / reaches.length;
  return (
    <g data-reach="" stroke={colours.water} fill="none">
      <SvgText
        lines={[{ parts: plainText("reach"), size: typeSize(11) }]}
        x={(box.x0 + box.x1) / 2}
        y={box.y0 - 9}
        colour={colours.muted}
        halo={colours.paper}
      />
      {reaches.map((reach, i) => {
        const x = box.x0 + (i + 0.5) * column;
        const { solid, thin, cap } = reachBar(reach, pH, visible.Eh);
        const barb = cap ? 6 * cap.beyond : 0;
        const name = typeset(reach.reagent.name);
        return (
          <g key={reach.reagent.id} data-reagent={reach.reagent.id}>
            {thin && <path d={`M${x} ${y(thin[0])}V${y(thin[1])}`} strokeWidth={1.2} />}
            {cap && (
              <path
                d={`M${x - 0.4 * column} ${y(cap.at) + barb}L${x} ${y(cap.at)}L${x + 0.4 * column} ${y(cap.at) + barb}`}
                strokeWidth={1.2}
              />
            )}
            {solid && <path d={`M${x} ${y(solid[0])}V${y(solid[1])}`} strokeWidth={6} />}
            <SvgText
              lines={[{ parts: name, size: typeSize(11) }]}
              x={x}
              y={box.y1 + 8 + textWidth(name, typeSize(11)) / 2}
              colour={colours.ink}
              halo={colours.paper}
              turned
            />
          </g>
        );
      })}
    </g>
  );
}
