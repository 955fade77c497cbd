import type { GroundDifference } from "../../../../shared/compare/ground";
import type { LimitMove } from "../../../../shared/compare/limits";
import type { SetPoint } from "../../../../shared/solution";
import { marginWords, namingOf } from "../../../../shared/windows/limitWords";
import { SpeciesName } from "../../../components/Formula";
import { FormulaText } from "../../../components/FormulaText";
import { Note, Row, SectionHead } from "../../../components/text";
import { fixed } from "../../../lib/format";
import { planChanges } from "../../../lib/planChanges";
import type { PotentialScale } from "../../../lib/potential";
import { marginSides } from "../model/distances";
import type { Side, SolvedSide } from "./sides";
import { area, moveLines, verdict } from "./words";

const point = (at: SetPoint | undefined, scale: PotentialScale) =>
  at ? `pH ${fixed(at.pH, 2)}, ${scale.format(at.Eh)}` : "no window";
const margin = (at: SetPoint | undefined) => (at ? `${fixed(at.margin, 1)} ${marginWords(at)}` : "none");
const inUnits = (at: SetPoint | undefined, { inputs }: Side) => at && marginSides(at, inputs.controlBand);

/** What the difference says, in words and numbers. */
export function CompareWords({
  a,
  b,
  difference,
  moves,
  scale,
}: {
  a: { side: Side; solved: SolvedSide };
  b: { side: Side; solved: SolvedSide };
  difference: GroundDifference | null;
  moves: readonly LimitMove[];
  scale: PotentialScale;
}) {
  const [was, is] = [a.solved.window?.setPoint, b.solved.window?.setPoint];
  const naming = ({ side, solved }: typeof a) => namingOf(side.data, { fields: solved.solution?.fields ?? [] });
  const lines = moveLines(
    moves,
    { window: a.solved.window, naming: naming(a) },
    { window: b.solved.window, naming: naming(b) },
    scale,
  );
  const changes = planChanges(a.side.inputs, b.side.inputs);
  return (
    <>
      {difference && (
        <section aria-label="Open ground">
          <p className="text-lg" data-testid="verdict">
            {verdict(difference)}
          </p>
          <Row label="Kept">{area(difference.kept.area)}</Row>
          <Row label="Gained by B">{area(difference.gained.area)}</Row>
          <Row label="Lost">{area(difference.lost.area)}</Row>
          {difference.framesDiffer && difference.frame && (
            <Note className="py-1">
              The frames differ: compared is what they share, pH {fixed(difference.frame.pH[0], 1)} to{" "}
              {fixed(difference.frame.pH[1], 1)}, {scale.format(difference.frame.Eh[0])} to{" "}
              {scale.format(difference.frame.Eh[1])}.
            </Note>
          )}
        </section>
      )}
      <section aria-label="Settings that differ" className="mt-4">
        <SectionHead>Settings that differ</SectionHead>
        {changes.length === 0 ? (
          <Note className="py-1">
            None: both ask the same{a.side.data === b.side.data ? "" : ", with other chemistry data"}.
          </Note>
        ) : (
          <table className="w-full text-sm">
            <thead>
              <tr>
                {["what", "A", "B"].map((head) => (
                  <th key={head} scope="col" className="py-1 pr-3 text-left font-mono text-xs">
                    {head}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {changes.map(({ what, from, to }) => (
                <tr key={what} className="hairline">
                  <th scope="row" className="py-1 pr-3 text-left align-top font-bold">
                    <FormulaText text={what} />
                  </th>
                  <td className="py-1 pr-3 align-top text-muted">
                    <FormulaText text={from ?? "not there"} />
                  </td>
                  <td className="py-1 align-top">
                    <FormulaText text={to ?? "taken out"} />
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        )}
      </section>
      <section aria-label="Set points" className="mt-4">
        <SectionHead aside={`vs ${scale.short}`}>Set point</SectionHead>
        <Row label="A">{point(was, scale)}</Row>
        <Row label="B">{point(is, scale)}</Row>
        <Row label="Margin of A" below={inUnits(was, a.side)}>
          {margin(was)}
        </Row>
        <Row label="Margin of B" below={inUnits(is, b.side)}>
          {margin(is)}
        </Row>
      </section>
      <section aria-label="Limits that moved" className="mt-4">
        <SectionHead>Limits, from A to B</SectionHead>
        {lines.length === 0 && <Note className="py-1">One of the two has no window, so no limit to follow.</Note>}
        <ul>
          {lines.map((m) => (
            <li key={m.key} className="hairline py-1">
              <div className="flex items-baseline justify-between gap-3">
                <span>
                  <b>{m.side}</b> {m.what}
                </span>
                <span className="text-right font-mono text-sm">
                  {m.note ?? (
                    <>
                      {m.pH && <span className="block whitespace-nowrap">{m.pH}</span>}
                      {m.Eh && <span className="block whitespace-nowrap">{m.Eh}</span>}
                      {!m.pH && !m.Eh && "elsewhere: no line meets both"}
                    </>
                  )}
                </span>
              </div>
              {m.beyond && (
                <Note>
                  beyond it <SpeciesName id={m.beyond[1]} /> instead of <SpeciesName id={m.beyond[0]} />
                </Note>
              )}
            </li>
          ))}
        </ul>
      </section>
    </>
  );
}
