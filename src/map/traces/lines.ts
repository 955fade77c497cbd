import { HCN_PH } from "../../../shared/hazards/words";
import { type Reach, standsAt } from "../../../shared/reach/reach";
import type { Limit, Point, Solution } from "../../../shared/solution";
import { lineCoordinates, ringCoordinates } from "../geometry/rings";
import { type PlotTrace, trace } from "../plotTypes";
import type { MapView } from "../view";

/** The stability lines of water, oxygen's and hydrogen's at 1 bar, dashed across the frame. */
export function waterTraces(solution: Pick<Solution, "waterLines">, view: MapView): PlotTrace[] {
  return [
    trace({
      uid: "water",
      name: "Oxygen and hydrogen lines, 1 bar",
      mode: "lines",
      line: { color: view.colours.water, width: 1.3, dash: "8px,5px" },
      ...lineCoordinates(
        solution.waterLines.map(({ intercept, slope }) =>
          view.frame.pH.map((pH): Point => [pH, intercept + slope * pH]),
        ),
        view.scale.toShown,
      ),
    }),
  ];
}

/** Equilibrium lines of reagents against pH, every activity one: a thin reminder, not a promise. */
export function equilibriumTraces(reaches: readonly Reach[], view: MapView): PlotTrace[] {
  return reaches.flatMap((reach) =>
    reach.line === null
      ? []
      : [
          trace({
            uid: `equilibrium-${reach.reagent.id}`,
            name: `${reach.reagent.name}, equilibrium with every activity one`,
            mode: "lines",
            line: { color: view.colours.water, width: 0.9, dash: "2px,3px" },
            ...lineCoordinates([view.frame.pH.map((pH): Point => [pH, standsAt(reach, pH) ?? 0])], view.scale.toShown),
          }),
        ],
  );
}

/** Where cyanide leaves as HCN: everything below pH 10.5, sparsely hatched in the signal colour, its edge drawn through. */
export function hydrogenCyanideTraces(view: MapView): PlotTrace[] {
  const edge = Math.min(HCN_PH, view.frame.pH[1]);
  if (edge <= view.frame.pH[0]) return [];
  const [lo, hi] = view.frame.Eh;
  const x0 = view.frame.pH[0];
  const outer: Point[] = [
    [x0, lo],
    [edge, lo],
    [edge, hi],
    [x0, hi],
  ];
  return [
    trace({
      uid: "hazard-hcn",
      name: "HCN region",
      mode: "lines",
      line: { color: "rgba(0,0,0,0)", width: 0 },
      fill: "toself",
      fillpattern: {
        shape: "|",
        size: 16,
        solidity: 0.07,
        fgcolor: view.colours.signal,
        fgopacity: 0.55,
        bgcolor: "rgba(0,0,0,0)",
      },
      ...ringCoordinates([{ outer, holes: [] }], view.scale.toShown),
    }),
    trace({
      uid: "hazard-hcn-edge",
      name: "HCN below this pH",
      mode: "lines",
      line: { color: view.colours.signal, width: 1.6 },
      ...lineCoordinates(
        edge === HCN_PH
          ? [
              [
                [edge, lo],
                [edge, hi],
              ],
            ]
          : [],
        view.scale.toShown,
      ),
    }),
  ];
}

/** Limits by metals of another basis that this basis does not have: what moves when the solids are allowed to age. */
export function movedLimits(here: Pick<Solution, "windows">, other: Pick<Solution, "windows">): Limit[] {
  const own = here.windows.flatMap((w) => w.limits).filter((l) => l.kind === "metal");
  const same = (a: Limit, b: Limit): boolean =>
    a.metal === b.metal &&
    [b.from, b.to].every(([pH, Eh]) => {
      const [k, x, y] = a.line;
      // Distance where 0.1 V weighs as much as one pH unit.
      return Math.abs(k + x * pH + y * Eh) / Math.hypot(x, y / 10) < 0.02;
    });
  return other.windows
    .flatMap((w) => w.limits)
    .filter((l) => l.kind === "metal" && Math.hypot(l.to[0] - l.from[0], 10 * (l.to[1] - l.from[1])) > 0.05)
    .filter((l) => !own.some((o) => same(o, l)));
}

export function otherBasisTraces(moved: readonly Limit[], view: MapView): PlotTrace[] {
  return [
    trace({
      uid: "other-basis",
      name: "Window edge on the other solids basis",
      mode: "lines",
      line: { color: view.colours.verdigris, width: 1.1, dash: "1px,2px" },
      ...lineCoordinates(
        moved.map((l): Point[] => [l.from, l.to]),
        view.scale.toShown,
      ),
    }),
  ];
}
