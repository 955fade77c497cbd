import { useState } from "react";
import type { QuantityName } from "../../../../shared/entry/quantities";
import { tenorOfLine } from "../../../../shared/trials/comparable";
import type { Planned } from "../../../../shared/schemas/trialRecord";
import { Button } from "../../../components/Button";
import { EntryField } from "../../../components/EntryField";
import { EntryGrid } from "../../../components/EntryGrid";
import { FormulaText } from "../../../components/FormulaText";
import { Select } from "../../../components/Select";
import { Note } from "../../../components/text";
import { electrodeOptions } from "../model/electrodes";
import { plannedFromPlan, windowChoices } from "../model/fromPlan";
import { doseColumns } from "./ReagentsSection";
import { nextDose } from "../model/trialValues";
import { problemAt, rowProblems, useRecording } from "./context";
import { ligandColumns, nextLigand } from "./ligandColumns";
import { Section } from "./Section";

type Field = "temperature" | "pH" | "freeAcid" | "tenor" | "duration" | "solids" | "p80";

/** What the trial is laid out on: by hand, or from the set point of the plan. */
export function PlannedSection() {
  const { values, edit, problems, readOnly, stage, feed, data, solved, campaign, electrodes } = useRecording();
  const { planned } = values;
  const [choice, setChoice] = useState("0");
  const put = (change: Partial<Planned>, about: string) =>
    edit((t) => ({ ...t, planned: { ...t.planned, ...change } }), `planned.${about}`);
  const lines: readonly { key: Field; label: string; quantity: QuantityName; hint?: string }[] = [
    { key: "temperature", label: "Temperature", quantity: "temperature" },
    { key: "pH", label: "pH", quantity: "pH" },
    { key: "freeAcid", label: "Free acid, as H2SO4", quantity: "solutionAssay" },
    {
      key: "tenor",
      label: `Tenor of ${stage?.target ?? "the target"}, final liquor`,
      quantity: "solutionAssay",
    },
    { key: "solids", label: "Solids in the pulp", quantity: "solids" },
    { key: "p80", label: "P80", quantity: "size" },
    { key: "duration", label: "Duration", quantity: "time" },
  ];
  const line = solved?.inputs.metals.find(({ element }) => element === stage?.target);
  const noTenor = values.kind === "leach" && line !== undefined && tenorOfLine(line, solved!.inputs, data) === null;
  const windows = solved?.solution ? windowChoices(solved.solution) : [];
  return (
    <Section id="planned" title="Planned conditions" aside={`plan revision ${campaign.planRevision}`}>
      {!readOnly && solved && (
        <div className="mb-2 flex flex-wrap items-center gap-3">
          {windows.length === 0 ? (
            <Note>
              {solved.failure
                ? `Revision ${campaign.planRevision} of ${campaign.planName} cannot be solved: ${solved.failure.message}.`
                : `Revision ${campaign.planRevision} of ${campaign.planName} has no window, so there is no set point to take.`}
            </Note>
          ) : (
            <>
              {windows.length > 1 && (
                <Select label="Window" layout="bare" value={choice} onChange={setChoice} options={windows} />
              )}
              <Button
                onClick={() =>
                  edit(
                    (t) => ({ ...t, planned: plannedFromPlan(t, solved, Number(choice), stage, feed) }),
                    "planned.take",
                  )
                }
              >
                Take the set point of {campaign.planName}
              </Button>
              <Note>
                {windows.find(({ value }) => value === choice)?.words}
                {noTenor && "; the tenor from the charge, since the plan gives an activity without its gamma"}
              </Note>
            </>
          )}
        </div>
      )}
      <div className="grid gap-x-10 md:grid-cols-2 lg:grid-rows-[auto_1fr]">
        <div className="lg:row-span-2">
          {lines.slice(0, 4).map(({ key, label, quantity }) => (
            <EntryField
              key={key}
              label={label}
              labelText={key === "freeAcid" ? <FormulaText text={label} /> : label}
              quantity={quantity}
              value={planned[key]}
              onChange={(entry) => put({ [key]: entry }, key)}
              error={problemAt(problems, `planned.${key}`)}
              readOnly={readOnly}
              emptyText="not planned"
            />
          ))}
          <EntryField
            label="ORP"
            quantity="potential"
            value={planned.orp.value}
            onChange={(value) => put({ orp: { ...planned.orp, value } }, "orp")}
            error={problemAt(problems, "planned.orp.value")}
            readOnly={readOnly}
            emptyText="not planned"
          />
          <Select
            label="against"
            labelText={<span className="pl-4 text-muted">against</span>}
            value={planned.orp.electrode ?? ""}
            placeholder="choose the electrode"
            onChange={(electrode) => put({ orp: { ...planned.orp, electrode } }, "orp")}
            options={electrodeOptions(electrodes)}
            error={problemAt(problems, "planned.orp.electrode") ?? null}
            readOnly={readOnly}
          />
        </div>
        <div>
          {lines.slice(4).map(({ key, label, quantity }) => (
            <EntryField
              key={key}
              label={label}
              quantity={quantity}
              value={planned[key]}
              onChange={(entry) => put({ [key]: entry }, key)}
              error={problemAt(problems, `planned.${key}`)}
              readOnly={readOnly}
              emptyText="not planned"
            />
          ))}
        </div>
        {/* half of a tablet is too narrow for it */}
        <div className="pt-3 md:col-span-2 lg:col-span-1">
          <EntryGrid
            caption="Ligand totals planned"
            rowName="ligand"
            rows={planned.ligands}
            columns={ligandColumns(
              solved?.inputs.ligands.map((l) => l.component) ?? [],
              solved?.inputs.sulfateReduction ?? false,
            )}
            blank={nextLigand}
            onChange={(ligands) => put({ ligands }, "ligands")}
            readOnly={readOnly}
            problems={rowProblems(problems, "planned.ligands", (rest) => rest.split(".")[0] ?? "")}
            emptyText="No ligand planned."
          />
        </div>
      </div>
      {(planned.doses.length > 0 || !readOnly) && (
        <details className="mt-3" open={planned.doses.length > 0}>
          <summary className="text-sm">Reagents to add</summary>
          <div className="pt-1">
            <EntryGrid
              caption="Reagents planned"
              rowName="dose"
              rows={planned.doses}
              columns={doseColumns}
              blank={nextDose}
              onChange={(doses) => put({ doses }, "doses")}
              readOnly={readOnly}
              problems={rowProblems(problems, "planned.doses", (rest) => rest.split(".")[0] ?? "")}
            />
          </div>
        </details>
      )}
    </Section>
  );
}
