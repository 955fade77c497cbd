import type { Problem } from "../../../../shared/schemas/problem";
import type { Solution } from "../../../../shared/solution";
import { marginWords } from "../../../../shared/windows/limitWords";
import { Term } from "../../../components/Help";
import { MethodLink } from "../../../components/SourceLink";
import { SectionHead } from "../../../components/text";
import { classes } from "../../../lib/classes";
import { fixed } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";
import { windowName } from "../../../map/view";
import { marginInUnits } from "../model/distances";

/** Where several windows are open: which one the answers speak of. */
export function WindowsBlock({
  solution,
  chosen,
  onChoose,
  scale,
  band,
}: {
  solution: Solution;
  chosen: number;
  onChoose: (index: number) => void;
  scale: PotentialScale;
  band: Problem["controlBand"];
}) {
  return (
    <section aria-label="Windows" className="mb-4">
      <SectionHead
        aside={
          <>
            <Term word="window">deepest first</Term> · <MethodLink to="windows" />
          </>
        }
      >
        {solution.windows.length} windows are open
      </SectionHead>
      <ul>
        {solution.windows.map((window, i) => (
          <li key={i} className="hairline">
            <button
              type="button"
              aria-pressed={i === chosen}
              onClick={() => onChoose(i)}
              className={classes(
                "flex w-full items-baseline justify-between gap-3 px-1 py-1 text-left hover:bg-tint/60",
                i === chosen && "bg-tint font-bold",
              )}
            >
              <span>
                <b>{windowName(i)}</b>{" "}
                <span className="font-mono font-normal">
                  pH {fixed(window.pH[0], 2)} to {fixed(window.pH[1], 2)}
                </span>
                <span className="block text-sm font-normal text-muted">
                  margin {fixed(window.setPoint.margin, 1)} {marginWords(window.setPoint)} (
                  {marginInUnits(window.setPoint, band)}
                  {window.setPoint.margin < 0 && " outside"})
                  {!window.controllable && ", narrower than the control bands"}
                </span>
              </span>
              <span className="font-mono font-normal whitespace-nowrap">
                {fixed(scale.toShown(window.Eh[0]), scale.digits)} to {scale.format(window.Eh[1])}
              </span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}
