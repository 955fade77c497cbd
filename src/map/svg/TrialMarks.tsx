import { lookOf, placedMarks, type Painting, symbolPath } from "../paintTrials";
import { markSize } from "../trialMarks";

/** Trials as shapes, for a picture that travels; on the screen they are painted, since there they move. */
export function TrialMarks(painting: Painting) {
  const { marks, scale, colours } = painting;
  const r = markSize(marks.length) / 2;
  return (
    <g data-trials="" stroke={colours.ink} strokeWidth={1}>
      {placedMarks(painting).map(({ mark, x, y, back }) => {
        const look = lookOf(mark, scale, colours);
        return (
          <g key={mark.id} transform={`translate(${x} ${y})`} opacity={back ? 0.18 : 1}>
            <path d={symbolPath(look.symbol, r)} fill={look.fill ?? "none"} />
            {look.cooled && <circle r={r * 0.28} fill={colours.ink} stroke="none" />}
          </g>
        );
      })}
    </g>
  );
}
