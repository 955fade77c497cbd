import type { Robust } from "../../../../shared/advice/robust";
import { marginWords } from "../../../../shared/windows/limitWords";
import { Term } from "../../../components/Help";
import { MethodLink } from "../../../components/SourceLink";
import { Note, Row, SectionHead } from "../../../components/text";
import { celsius, fixed, significant } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";
import type { Awaited } from "../model/useAsked";
import { Stopped, Working } from "./Working";

/** The window that holds over all the ranges, its set point, and what was checked for it. */
export function RobustBlock({
  robust,
  scale,
  metalName,
}: {
  robust: Awaited<Robust>;
  scale: PotentialScale;
  metalName: (element: string) => string;
}) {
  if (robust.state === "none") return null;
  return (
    <section aria-label="Over the ranges" className="mt-4">
      <SectionHead
        aside={
          <>
            <Term word="robustWindow">inner outline</Term> · <MethodLink to="overRanges" />
          </>
        }
      >
        Over the ranges
      </SectionHead>
      {robust.state === "waiting" && (
        <Working
          awaited={robust}
          doing="Solving over the ranges"
          words={({ done, total }) => `${done} temperatures solved, at most ${total}`}
        />
      )}
      {robust.state === "stopped" && <Stopped again={robust.again}>The ranges were not solved to the end.</Stopped>}
      {robust.state === "failed" && (
        <p role="alert" className="py-1 text-sm text-signal">
          Not solved: {robust.message}.
        </p>
      )}
      {robust.state === "there" && <Found robust={robust.value} scale={scale} metalName={metalName} />}
    </section>
  );
}

function Found({
  robust: { windows, checked },
  scale,
  metalName,
}: {
  robust: Robust;
  scale: PotentialScale;
  metalName: (element: string) => string;
}) {
  const best = [...windows].sort((a, b) => b.setPoint.margin - a.setPoint.margin)[0];
  return (
    <>
      {best ? (
        <>
          <Row label="Deepest point">
            pH {fixed(best.setPoint.pH, 2)}, {scale.format(best.setPoint.Eh)}
          </Row>
          <Row label="Margin there">
            <b>
              {fixed(best.setPoint.margin, 1)} {marginWords(best.setPoint)}
            </b>
          </Row>
          {best.setPoint.mixedPotential && (
            <Note>Not at every temperature of the range does a couple set Eh, so the margin counts pH alone.</Note>
          )}
          {best.setPoint.cutByFrame && <Note>Cut by the frame: it may hold further out.</Note>}
          {windows.length > 1 && <Note>{windows.length} pieces hold; this is the deepest.</Note>}
        </>
      ) : (
        <p className="py-1">
          <b>No point holds over all of it.</b> Narrow a range, or widen what is asked.
        </p>
      )}
      <Note className="py-1">{checkedWords(checked, metalName)}</Note>
    </>
  );
}

/** What was looked at, so that nobody takes it for more. */
export function checkedWords(
  { temperatures, rules, settled, activities }: Robust["checked"],
  metalName: (element: string) => string,
): string {
  const [first, last] = [temperatures[0] ?? 0, temperatures.at(-1) ?? 0];
  const heat =
    temperatures.length === 1
      ? `Solved at ${celsius(first, 1)}.`
      : `Solved at ${temperatures.length} temperatures from ${celsius(first, 1)} to ${celsius(last, 1)}; ${
          settled
            ? "more between them moved no edge by 0.001 pH or 1 mV."
            : "its edges still moved when that was the most to be tried: take it with care."
        }${rules.length === 0 ? "" : ` The solids that count change at ${rules.map((t) => celsius(t)).join(" and ")}: solved on both sides.`}`;
  const each = activities.map(({ metal, at, why }) => `${metalName(metal)} at ${significant(at)} (${why})`);
  return each.length === 0
    ? heat
    : `${heat} Of each activity range the worse end alone is solved, since the ground shrinks all the way to it: ${each.join("; ")}.`;
}
