import { useState } from "react";
import type { ReactionValues, TermGrade } from "../../../shared/reactions/atTemperature";
import type { DeskAnswer } from "../../../shared/reactions/desk";
import { Button } from "../../components/Button";
import { Segmented } from "../../components/choice";
import { SpeciesName } from "../../components/Formula";
import { FormulaText } from "../../components/FormulaText";
import { Term } from "../../components/Help";
import { PlainTable } from "../../components/PlainTable";
import { Note, Remark, SectionHead } from "../../components/text";
import { downloadText, toCsv } from "../../lib/csv";
import { celsius, fixed } from "../../lib/format";
import { Reaction } from "../workspace/answers/Reaction";
import { Curve } from "./Curve";
import { type CurveName, curveNames, curveValue, curveWords } from "./curveFigure";

/** The series as a file: one row a temperature, with the reaction in every row. */
export const seriesTable = (reaction: string, rows: readonly ReactionValues[]) => ({
  header: ["reaction", "temperature_C", "dG_kJ", "dH_kJ", "dS_J_per_K", "log10_K", "E0_V_SHE"],
  rows: rows.map((r) => [reaction, r.temperatureC, r.dG_kJ, r.dH_kJ, r.dS_J, r.logK, r.E0_V]),
});

export function DeskResult({ answer, fine }: { answer: DeskAnswer; fine: readonly ReactionValues[] }) {
  const [wanted, setCurve] = useState<CurveName>("logK");
  const hasElectrons = answer.E0_V !== null;
  const shown = curveNames.filter((name) => name !== "E0" || hasElectrons);
  const curve = shown.includes(wanted) ? wanted : "logK";
  const series = answer.series ?? [];
  const save = () => {
    const { header, rows } = seriesTable(answer.reaction, series);
    downloadText("reaction.csv", toCsv(header, rows));
  };
  return (
    <section aria-label="Answer" className="min-w-0">
      <p className="border-b border-ink pb-2 text-lg leading-relaxed" data-testid="reaction">
        <Reaction terms={answer.terms} />
      </p>
      {answer.assumed.length > 0 && <Note className="pt-1">{answer.assumed.join("; ")}.</Note>}
      <dl className="flex flex-wrap gap-x-8 gap-y-1 py-3 font-mono" data-testid="values">
        <Value name={`ΔG at ${celsius(answer.temperatureC, 1)}`} text={`${fixed(answer.dG_kJ, 2)} kJ`} />
        <Value name="ΔH" text={`${fixed(answer.dH_kJ, 2)} kJ`} />
        <Value name="log K" text={fixed(answer.logK, 2)} />
        {answer.E0_V !== null && <Value name="E°, V vs SHE" text={fixed(answer.E0_V, 4)} />}
        {answer.grade && <Value name="worst grade" text={answer.grade} />}
      </dl>
      {answer.warnings.map((warning) => (
        <Remark key={warning} className="mb-2">
          <FormulaText text={warning} />
        </Remark>
      ))}
      <div className="mt-2 flex items-baseline justify-between gap-3">
        <Segmented
          label="Quantity of the curve"
          value={curve}
          onChange={setCurve}
          options={shown.map((name) => ({ value: name, label: curveWords[name].label }))}
        />
        <Button onClick={save}>Save as CSV</Button>
      </div>
      <div className="mt-2 grid gap-x-8 gap-y-4 xl:grid-cols-2">
        <Curve rows={fine} name={curve} />
        <PlainTable<ReactionValues>
          caption="The reaction against temperature"
          rows={series}
          rowKey={(row) => String(row.temperatureC)}
          columns={[
            { header: "T", unit: "°C", number: true, cell: (row) => fixed(row.temperatureC, 1) },
            ...shown.map((name) => ({
              header: curveWords[name].label,
              unit: curveWords[name].unit,
              number: true,
              cell: (row: ReactionValues) => {
                const value = curveValue(row, name);
                return value === null ? "" : fixed(value, curveWords[name].digits);
              },
            })),
          ]}
        />
      </div>
      <SectionHead className="mt-6" aside={<Term word="grade">grades</Term>}>
        What the numbers rest on
      </SectionHead>
      <PlainTable<TermGrade>
        caption="Species of the reaction"
        rows={answer.grades}
        rowKey={(row) => row.species}
        columns={[
          { header: "species", cell: (row) => <SpeciesName id={row.species} withPhase /> },
          { header: "grade", cell: (row) => row.grade },
          { header: "temperature model", cell: (row) => row.model },
          {
            header: "trusted",
            cell: (row) => (
              <span className="whitespace-nowrap">{`${row.trusted[0]} to ${celsius(row.trusted[1])}`}</span>
            ),
          },
          { header: "source", cell: (row) => row.source },
        ]}
      />
      <Note className="pt-2">
        Products less reactants, for the amounts as written; potentials against the standard hydrogen electrode at the
        same temperature, for the electrons taken up. How far, never how fast.
      </Note>
    </section>
  );
}

const Value = ({ name, text }: { name: string; text: string }) => (
  <div>
    <dt className="text-xs text-muted">{name}</dt>
    <dd className="text-lg font-bold whitespace-nowrap">{text}</dd>
  </div>
);
