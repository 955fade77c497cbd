import { type PlotTrace, trace } from "../plotTypes";
import type { ProposedMark } from "../proposalStore";
import type { MapView } from "../view";

/** Proposed conditions for a picture that travels: numbered plates. On the screen they lie over the figure (ProposalsLayer.tsx). */
export function proposalTraces(
  marks: readonly ProposedMark[],
  { scale, colours }: Pick<MapView, "scale" | "colours">,
): PlotTrace[] {
  if (marks.length === 0) return [];
  const at = { x: marks.map((m) => m.pH), y: marks.map((m) => scale.toShown(m.Eh)) };
  return [
    trace({
      uid: "proposed",
      name: "Proposed trials",
      mode: "markers",
      ...at,
      marker: {
        color: colours.sheet,
        size: marks.map(() => 16),
        symbol: "square",
        opacity: 1,
        line: { width: 2, color: colours.verdigris },
      },
    }),
    trace({
      uid: "proposed-numbers",
      name: "Numbers of proposed trials",
      mode: "text",
      ...at,
      text: marks.map((m) => String(m.n)),
      textposition: "middle center",
      textfont: { color: marks.map(() => colours.verdigris), size: marks.map(() => 11) },
    }),
  ];
}
