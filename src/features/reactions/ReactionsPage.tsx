import { useMemo, useState } from "react";
import { useSearchParams } from "react-router-dom";
import { reactionDesk } from "../../../shared/reactions/desk";
import { TEMPERATURE_RANGE_C } from "../../../shared/schemas/problem";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { Button } from "../../components/Button";
import { FormulaText } from "../../components/FormulaText";
import { NumberField } from "../../components/NumberField";
import { ErrorNote, Loading } from "../../components/status";
import { TextField } from "../../components/TextField";
import { Note } from "../../components/text";
import { useChemistry } from "../../lib/chemistry";
import { usePageTitle } from "../../lib/title";
import { DeskResult } from "./DeskResult";

const examples = [
  "Cu^2+ + 2 e^- = Cu",
  "4 Au + 8 CN^- + O2(g) + 2 H2O = 4 Au(CN)2^- + 4 OH^-",
  "Cu^2+ + Zn = Cu + Zn^2+",
  "FeOOH(s,goethite) + 3 H^+ = Fe^3+ + 2 H2O",
] as const;

const { min, max } = TEMPERATURE_RANGE_C;

export default function ReactionsPage() {
  usePageTitle("Reactions");
  const { data, error, refetch } = useChemistry();
  if (error) {
    return (
      <div className="px-5 py-5">
        <ErrorNote doing="The chemistry could not be read" error={error} retry={() => void refetch()} />
      </div>
    );
  }
  return data ? (
    <Desk data={data} />
  ) : (
    <div className="px-5">
      <Loading label="Reading the chemistry" />
    </div>
  );
}

/** A reaction as somebody types it, and its numbers against temperature. The question stands in the address, so that it can be passed on. */
function Desk({ data }: { data: ChemicalData }) {
  const [params, setParams] = useSearchParams();
  const asked = params.get("reaction") ?? examples[0];
  const t = Number(params.get("t") ?? 25);
  const temperatureC = Number.isFinite(t) ? Math.min(max, Math.max(min, t)) : 25;
  const [text, setText] = useState(asked);
  const [series, setSeries] = useState({ fromC: 0, toC: 150, stepC: 25 });
  const outcome = useMemo(
    () => reactionDesk(data, { reaction: asked, temperatureC, series }),
    [data, asked, temperatureC, series],
  );
  // The curve runs finer than the table, which is read by eye.
  const fine = useMemo(() => {
    const stepC = Math.max(0.5, (series.toC - series.fromC) / 120);
    const found = reactionDesk(data, { reaction: asked, temperatureC, series: { ...series, stepC } });
    return found.ok ? (found.value.series ?? []) : [];
  }, [data, asked, temperatureC, series]);
  const ask = (reaction: string, T = temperatureC) => {
    setText(reaction);
    setParams({ reaction, t: String(T) }, { replace: true });
  };
  return (
    <div className="grid gap-x-8 gap-y-5 px-5 py-4 md:grid-cols-[290px_minmax(0,1fr)]">
      <section aria-label="The reaction">
        <h1 className="mb-3 text-lg">Reactions</h1>
        <form
          onSubmit={(event) => {
            event.preventDefault();
            if (text.trim() !== "") ask(text.trim());
          }}
        >
          <TextField
            label="Reaction"
            value={text}
            maxLength={1000}
            spellCheck={false}
            autoComplete="off"
            onChange={(event) => setText(event.target.value)}
            error={outcome.ok || text.trim() !== asked ? null : "Not worked out; the reason stands with the answer."}
            hint="Ions as Cu^2+, electrons as e^-; a phase where a formula has several: CuO(s), O2(g). Mineral names do too."
          />
          <div className="mt-2">
            <Button type="submit" kind="primary" disabled={text.trim() === ""}>
              Work it out
            </Button>
          </div>
        </form>
        <div className="mt-4">
          <NumberField
            label="Temperature"
            unit="°C"
            value={temperatureC}
            min={min}
            max={max}
            step={5}
            width={6}
            onCommit={(T) => ask(asked, T)}
          />
          <NumberField
            label="Table from"
            unit="°C"
            value={series.fromC}
            min={min}
            max={series.toC}
            step={5}
            width={6}
            onCommit={(fromC) => setSeries({ ...series, fromC })}
          />
          <NumberField
            label="Table to"
            unit="°C"
            value={series.toC}
            min={series.fromC}
            max={max}
            step={5}
            width={6}
            onCommit={(toC) => setSeries({ ...series, toC })}
          />
          <NumberField
            label="Step"
            unit="K"
            value={series.stepC}
            min={0.5}
            max={max}
            step={5}
            width={6}
            onCommit={(stepC) => setSeries({ ...series, stepC })}
          />
        </div>
        <Note className="mt-4">For example</Note>
        <ul className="text-sm">
          {examples.map((example) => (
            <li key={example} className="hairline py-1">
              <button type="button" className="text-left hover:text-verdigris" onClick={() => ask(example)}>
                <FormulaText text={example} />
              </button>
            </li>
          ))}
        </ul>
      </section>
      {outcome.ok ? (
        <DeskResult answer={outcome.value} fine={fine} />
      ) : (
        <section aria-label="Answer">
          <p role="alert" className="measure border-l-4 border-signal bg-sheet px-3 py-2">
            <b>No answer:</b> <FormulaText text={outcome.error.message} />.
          </p>
        </section>
      )}
    </div>
  );
}
