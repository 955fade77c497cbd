import type { GroundDifference, GroundPart } from "../../../../shared/compare/ground";
import type { SetPoint, Window } from "../../../../shared/solution";
import { ringCoordinates } from "../../../map/geometry/rings";
import { type PlotTrace, trace } from "../../../map/plotTypes";
import type { MapView } from "../../../map/view";

type How = Pick<MapView, "colours" | "scale">;
const none = { color: "rgba(0,0,0,0)", width: 0 };

const area = (uid: string, name: string, part: GroundPart, how: How, fill: Partial<PlotTrace>): PlotTrace =>
  trace({
    uid,
    name,
    mode: "lines",
    line: none,
    fill: "toself",
    ...fill,
    ...ringCoordinates(part.outlines, how.scale.toShown),
  });

const outline = (uid: string, name: string, windows: readonly Window[], how: How, line: PlotTrace["line"]): PlotTrace =>
  trace({
    uid,
    name,
    mode: "lines",
    ...(line ? { line } : {}),
    ...ringCoordinates(
      windows.flatMap((w) => w.polygons),
      how.scale.toShown,
    ),
  });

const point = (uid: string, name: string, at: SetPoint, how: How, filled: boolean): PlotTrace =>
  trace({
    uid,
    name,
    mode: "lines+markers",
    line: none,
    marker: {
      color: filled ? how.colours.verdigris : how.colours.sheet,
      size: [9],
      symbol: "circle",
      opacity: 1,
      line: { width: 1.8, color: filled ? how.colours.verdigris : how.colours.ink },
    },
    x: [at.pH],
    y: [how.scale.toShown(at.Eh)],
  });

/** Kept ground lit, gained hatched in the window's colour, lost in ink the other way; both borders and both set points. */
export function differenceTraces(
  difference: GroundDifference,
  before: { windows: readonly Window[]; setPoint: SetPoint | null },
  after: { windows: readonly Window[]; setPoint: SetPoint | null },
  how: How,
): PlotTrace[] {
  const { colours } = how;
  const hatch = (shape: "/" | "\\", fgcolor: string) => ({
    fillpattern: { shape, size: 8, solidity: 0.22, fgcolor, fgopacity: 0.9, bgcolor: "rgba(0,0,0,0)" },
  });
  return [
    area("kept", "Ground kept", difference.kept, how, { fillcolor: colours.tint }),
    area("gained", "Ground gained", difference.gained, how, hatch("/", colours.verdigris)),
    area("lost", "Ground lost", difference.lost, how, hatch("\\", colours.ink)),
    outline("outline-before", "Windows of A", before.windows, how, { color: colours.ink, width: 1.4, dash: "5px,3px" }),
    outline("outline-after", "Windows of B", after.windows, how, { color: colours.verdigris, width: 2.2 }),
    ...(before.setPoint ? [point("point-before", "Set point of A", before.setPoint, how, false)] : []),
    ...(after.setPoint ? [point("point-after", "Set point of B", after.setPoint, how, true)] : []),
  ].filter((t) => t.x.length > 0);
}
