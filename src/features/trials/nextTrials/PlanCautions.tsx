import type { Caution as CautionData } from "../../../../shared/hazards/rules";
import { Caution } from "../../../components/Caution";
import { FormulaText } from "../../../components/FormulaText";
import { TextField } from "../../../components/TextField";

/** For the notes of a trial: under which procedure it runs where a caution asks for one. */
export const underWhich = (cautions: readonly CautionData[], named: Readonly<Record<string, string>>): string[] =>
  cautions.flatMap(({ code, confirm }) =>
    confirm === null ? [] : [`Runs under procedure ${named[code] ?? ""} (${code}).`],
  );

/** Cautions of the conditions to be planned. Nothing is blocked and nothing passes silently: where one asks for a procedure, it is
 *  named and goes into the notes of the trial. */
export function PlanCautions({
  cautions,
  of,
  named,
  onName,
  pressed,
}: {
  cautions: readonly CautionData[];
  /** numbers of the proposals it stands for */
  of: (caution: CautionData) => readonly number[];
  named: Readonly<Record<string, string>>;
  onName: (code: string, procedure: string) => void;
  pressed: boolean;
}) {
  return (
    <section aria-label="Cautions" className="space-y-2">
      {cautions.map((c, i) => (
        <Caution key={`${c.code} ${c.text}`} defer={i === cautions.length - 1} limits={c.limits !== null}>
          <p>
            <b>
              <FormulaText text={c.agents.join(", ")} />, {of(c).length === 1 ? "trial" : "trials"} {of(c).join(", ")}.
            </b>{" "}
            <FormulaText text={c.text} />
          </p>
          {c.limits !== null && (
            <p className="mt-0.5 text-xs text-muted">
              <FormulaText text={c.limits} />
            </p>
          )}
          {c.confirm !== null && (
            <TextField
              className="mt-1"
              label="Name or number of the procedure they run under"
              value={named[c.code] ?? ""}
              maxLength={200}
              onChange={(event) => onName(c.code, event.target.value)}
              error={
                pressed && (named[c.code] ?? "").trim() === "" ? "Not planned until the procedure is named." : null
              }
            />
          )}
        </Caution>
      ))}
    </section>
  );
}
