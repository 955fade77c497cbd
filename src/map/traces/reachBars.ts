import { type Reach, standsAt } from "../../../shared/reach/reach";
import { formulaHtml } from "../../../shared/species/typeset";
import { type Coordinate, type PlotTrace, trace } from "../plotTypes";
import type { MapView } from "../view";

const beside = { xaxis: "x3", yaxis: "y" } as const;
const inside = (Eh: number, [lo, hi]: readonly [number, number]) => Math.min(hi, Math.max(lo, Eh));

/** Bars beside the Eh axis: the practical range solid, a thin line on to the couple's equilibrium at the set point's pH. */
export function reachTraces(reaches: readonly Reach[], pH: number, view: MapView): PlotTrace[] {
  const { toShown } = view.scale;
  const range = view.frame.Eh;
  const solid: { x: Coordinate[]; y: Coordinate[] } = { x: [], y: [] };
  const thin: { x: Coordinate[]; y: Coordinate[] } = { x: [], y: [] };
  const push = (into: typeof solid, points: [number, number][]) => {
    for (const [x, Eh] of points) {
      into.x.push(x);
      into.y.push(toShown(Eh));
    }
    into.x.push(null);
    into.y.push(null);
  };
  const barb = 0.02 * (range[1] - range[0]);
  reaches.forEach((reach, i) => {
    const x = i + 0.5;
    const equilibrium = standsAt(reach, pH);
    const bar = reach.practical && ([reach.practical[0], reach.practical[1] ?? range[1]] as const);
    if (bar)
      push(
        solid,
        bar.map((v): [number, number] => [x, inside(v, range)]),
      );
    if (equilibrium === null) return;
    const end = inside(equilibrium, range);
    const off = Math.sign(equilibrium - end);
    const start = bar ? inside(Math.min(bar[1], Math.max(bar[0], equilibrium)), range) : end - 2 * off * barb;
    if (start !== end)
      push(thin, [
        [x, start],
        [x, end],
      ]);
    // On the map the equilibrium is a cap across the line; beyond it an arrow says which way.
    push(thin, [
      [x - 0.4, end - off * barb],
      [x, end],
      [x + 0.4, end - off * barb],
    ]);
  });
  return [
    trace({
      uid: "reach-thin",
      name: "Equilibrium of the couple, every activity one",
      mode: "lines",
      ...beside,
      ...thin,
      line: { color: view.colours.water, width: 1.2 },
    }),
    trace({
      uid: "reach-solid",
      name: "Practical range",
      mode: "lines",
      ...beside,
      ...solid,
      line: { color: view.colours.water, width: 6 },
    }),
  ];
}

/** Names at the foot of the columns, as the ticks of their axis. */
export const reachHeads = (reaches: readonly Reach[]): { tickvals: number[]; ticktext: string[] } => ({
  tickvals: reaches.map((_, i) => i + 0.5),
  ticktext: reaches.map(({ reagent }) => formulaHtml(reagent.name)),
});
