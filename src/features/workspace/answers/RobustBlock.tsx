import { checkedWords, coupleOverWords } from "../../../../shared/advice/checkedWords";
import type { Robust } from "../../../../shared/advice/robust";
import type { Problem } from "../../../../shared/schemas/problem";
import { marginWords } from "../../../../shared/windows/limitWords";
import { FormulaText } from "../../../components/FormulaText";
import { Term } from "../../../components/Help";
import { MethodLink } from "../../../components/SourceLink";
import { Note, Row, SectionHead } from "../../../components/text";
import { fixed } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";
import { marginInUnits } from "../model/distances";
import type { Awaited } from "../model/useAsked";
import { Stopped, Working } from "./Working";

/** The window that holds over all the ranges, its set point, and what was checked for it. */
export function RobustBlock({
  robust,
  band,
  scale,
  metalName,
}: {
  robust: Awaited<Robust>;
  band: Problem["controlBand"];
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
      {robust.state === "there" && <Found robust={robust.value} {...{ band, scale, metalName }} />}
    </section>
  );
}

function Found({
  robust,
  band,
  scale,
  metalName,
}: {
  robust: Robust;
  band: Problem["controlBand"];
  scale: PotentialScale;
  metalName: (element: string) => string;
}) {
  const { windows } = robust;
  const best = [...windows].sort((a, b) => b.setPoint.margin - a.setPoint.margin)[0];
  const coupled = coupleOverWords(best?.couples ?? []);
  return (
    <>
      {best ? (
        <>
          <Row label="Deepest point">
            pH {fixed(best.setPoint.pH, 2)}, {scale.format(best.setPoint.Eh)}
          </Row>
          <Row label="Margin there" below={`${marginInUnits(best.setPoint, band)} to either side`}>
            <b>
              {fixed(best.setPoint.margin, 1)} {marginWords(best.setPoint)}
            </b>
          </Row>
          {best.setPoint.mixedPotential && (
            <Note>Not at every temperature of the range does a couple set Eh, so the margin counts pH alone.</Note>
          )}
          {coupled !== null && (
            <Note>
              <FormulaText text={coupled} />
            </Note>
          )}
          {best.setPoint.cutByFrame && <Note>Cut by the frame: it may hold further out.</Note>}
          {windows.length > 1 && <Note>{windows.length} pieces hold; this is the deepest.</Note>}
        </>
      ) : (
        <p className="py-1">
          <b>No point holds over all of it.</b> Narrow a range, or widen what is asked.
        </p>
      )}
      <Note className="py-1">{checkedWords(robust, metalName)}</Note>
    </>
  );
}
