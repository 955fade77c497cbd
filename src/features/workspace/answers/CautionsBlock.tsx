import { useState } from "react";
import { presetCaution } from "../../../../shared/hazards/presetCautions";
import type { Caution as CautionData } from "../../../../shared/hazards/rules";
import type { PresetName } from "../../../../shared/schemas/plan";
import { Caution } from "../../../components/Caution";
import { Check } from "../../../components/choice";
import { Formula } from "../../../components/Formula";
import { FormulaText } from "../../../components/FormulaText";
import { Fragment } from "react";
import { MethodLink } from "../../../components/SourceLink";
import { TextField } from "../../../components/TextField";

/** Cautions that this set point calls for, with the liquor's usual one; the deference wording stands with the last. */
export function CautionsBlock({
  cautions,
  preset,
  procedures,
  onProcedure,
}: {
  cautions: readonly CautionData[];
  preset: PresetName;
  procedures: Readonly<Record<string, string>>;
  onProcedure: (code: string, procedure: string) => void;
}) {
  const quoted = cautions.some((c) => c.limits !== null);
  return (
    <section aria-label="Cautions" className="mt-4 space-y-2" data-testid="cautions">
      {cautions.map((c) => (
        <Caution key={c.code} defer={false}>
          <p>
            <b>
              {c.agents.map((agent, i) => (
                <Fragment key={agent}>
                  {i > 0 && ", "}
                  <Formula formula={agent} />
                </Fragment>
              ))}
              .
            </b>{" "}
            <FormulaText text={c.text} />
          </p>
          {c.limits !== null && (
            <p className="mt-0.5 text-xs text-muted">
              <FormulaText text={c.limits} />
            </p>
          )}
          {c.confirm !== null && (
            <Procedure code={c.code} words={c.confirm} named={procedures[c.code] ?? ""} onName={onProcedure} />
          )}
        </Caution>
      ))}
      <Caution limits={quoted}>{presetCaution[preset]}</Caution>
      <p className="text-xs text-muted">
        When a caution is called for, and by what: <MethodLink to="hazards">the rules</MethodLink>.
      </p>
    </section>
  );
}

/** Nothing is blocked and nothing passes silently: the plan says under which procedure it runs there. */
function Procedure({
  code,
  words,
  named,
  onName,
}: {
  code: string;
  words: string;
  named: string;
  onName: (code: string, procedure: string) => void;
}) {
  const [ticked, setTicked] = useState(named !== "");
  // What is typed stands here: the plan's answer comes back late (`later`), and would take letters away again.
  const [text, setText] = useState(named);
  const name = (next: string) => {
    setText(next);
    onName(code, next);
  };
  return (
    <div className="mt-1">
      <Check
        checked={ticked}
        onChange={(on) => {
          setTicked(on);
          if (!on) name("");
        }}
      >
        {words}
      </Check>
      {ticked && (
        <TextField
          label="Name or number of the procedure"
          value={text}
          maxLength={200}
          onChange={(event) => name(event.target.value)}
          error={text.trim() === "" ? "Not confirmed until the procedure is named." : null}
        />
      )}
    </div>
  );
}
