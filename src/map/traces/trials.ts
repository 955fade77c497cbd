import { type PlotTrace, trace } from "../plotTypes";
import { markSize, resultColour, type ColourScale, type TrialMark } from "../trialMarks";
import type { MapView } from "../view";

/** Trials at their measured pH and Eh, for a picture that travels: filled in the colour of their result, open where conditions are
 *  others, a dot in the middle for the pH of a cooled sample. On the screen they are painted (paintTrials.ts): there they move. */
export function trialTraces(
  marks: readonly TrialMark[],
  scale: ColourScale,
  view: Pick<MapView, "scale" | "colours">,
): PlotTrace[] {
  const { colours } = view;
  const size = markSize(marks.length);
  const part = (open: boolean): PlotTrace => {
    const shown = marks.filter((m) => m.open === open);
    const symbol = (m: TrialMark) => `${m.symbol}${open ? "-open" : ""}${m.cooled ? "-dot" : ""}`;
    return trace({
      uid: open ? "trials-apart" : "trials",
      name: open ? "Trials under other conditions" : "Trials",
      mode: "markers",
      x: shown.map((m) => m.pH),
      y: shown.map((m) => view.scale.toShown(m.Eh)),
      marker: {
        color: open ? colours.ink : shown.map((m) => resultColour(m.value, scale, colours)),
        size: shown.map(() => size),
        symbol: shown.map(symbol),
        opacity: 1,
        line: { width: 1, color: colours.ink },
      },
    });
  };
  return [part(true), part(false)];
}
