import type { Outline, Solution } from "../../../shared/solution";
import { ringCoordinates } from "../geometry/rings";
import { hatchesOf, patternOf, shuts } from "../metalStyle";
import { type PlotTrace, trace } from "../plotTypes";
import { drawnMetals, type MapView, windowName } from "../view";

/** Shut ground: one `toself` trace a metal, hatched with that metal's pattern, holes wound the other way.
 *  @param shut  where each metal is not as required, V vs SHE; metals that shut nothing may be absent */
export function shutGroundTraces(shut: ReadonlyMap<string, readonly Outline[]>, view: MapView): PlotTrace[] {
  if (view.plain) return [];
  const hatches = hatchesOf(view.metals);
  return drawnMetals(view)
    .filter(shuts)
    .flatMap((metal) => {
      const hatch = hatches.get(metal.element);
      if (!hatch) return [];
      return [
        trace({
          uid: `shut-${metal.element}`,
          name: `${metal.element} not as required`,
          mode: "lines",
          line: { color: "rgba(0,0,0,0)", width: 0 },
          fill: "toself",
          fillpattern: patternOf(metal, hatch, view),
          ...ringCoordinates(shut.get(metal.element) ?? [], view.scale.toShown),
        }),
      ];
    });
}

/** Open ground, lit; the window chosen first, the others in a thinner light. */
export function openGroundTraces(solution: Pick<Solution, "windows">, view: MapView): PlotTrace[] {
  return solution.windows.map((window, i) =>
    trace({
      uid: `open-${i}`,
      name: `Window ${windowName(i)}`,
      mode: "lines",
      line: { color: "rgba(0,0,0,0)", width: 0 },
      fill: "toself",
      fillcolor: view.colours.tint,
      opacity: i === view.window ? 1 : 0.6,
      ...ringCoordinates(window.polygons, view.scale.toShown),
    }),
  );
}

/** The outline of every window; dashed where a window is too narrow to be held. */
export function windowOutlineTraces(solution: Pick<Solution, "windows">, view: MapView): PlotTrace[] {
  return solution.windows.map((window, i) =>
    trace({
      uid: `outline-${i}`,
      name: `Outline of window ${windowName(i)}`,
      mode: "lines",
      line: {
        color: view.colours.verdigris,
        width: i === view.window ? 2.6 : 1.4,
        dash: window.controllable ? "solid" : "4px,3px",
      },
      ...ringCoordinates(window.polygons, view.scale.toShown),
    }),
  );
}
