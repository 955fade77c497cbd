import { useState } from "react";
import { extrapolationRow, grades, ionClasses, phases, type SpeciesRow } from "../../../shared/schemas/chemistry";
import type { SpeciesEditRow } from "../../../shared/schemas/speciesEdit";
import { Button } from "../../components/Button";
import { Dialog } from "../../components/Dialog";
import { Formula } from "../../components/Formula";
import { NumberField } from "../../components/NumberField";
import { Select } from "../../components/Select";
import { ErrorNote } from "../../components/status";
import { Note, Remark, SectionHead } from "../../components/text";
import { TextArea, TextField } from "../../components/TextField";
import { ApiFailure, staleAnswer } from "../../lib/failure";
import { useAddSpeciesEdit } from "../../lib/speciesEdits";
import { blankSpecies, fieldOf, fromFormula, inFormWords, numbers } from "./editModel";
import type { EditSpeciesDialogProps } from "./EditSpeciesDialog";

const gradeNotes: Readonly<Record<SpeciesRow["grade"], string>> = {
  A: "seen in a published table",
  B: "a handbook value whose G, H and S agree",
  C: "unchecked, or derived from a stability constant",
};
const classWords = { cation: "cation", anion: "anion", oxyanion: "oxyanion", acid_oxyanion: "acid oxyanion" } as const;
const holds = extrapolationRow.shape.hold.options;
const holdWords: Readonly<Record<(typeof holds)[number], string>> = {
  logK: "log K of a reaction is held",
  dG: "dG of a reaction is held",
  none: "held as it is, and flagged",
};

/** A species of the site's own, or other numbers for one of the library; the shipped row stays beside it. */
export default function EditSpecies({ data, id, version, open, onOpenChange, onSaved }: EditSpeciesDialogProps) {
  const before = id === null ? null : (data.species.get(id)?.row ?? null);
  const rule = id === null ? undefined : data.tables.extrapolation.find((r) => r.id === id);
  const add = useAddSpeciesEdit();
  const [row, setRow] = useState<SpeciesRow>(before ? { ...before, source: "", note: "" } : blankSpecies);
  const [solid, setSolid] = useState("");
  const [citation, setCitation] = useState("");
  const [reason, setReason] = useState("");
  const [hold, setHold] = useState<(typeof holds)[number] | "from entropy">(rule?.hold ?? "from entropy");
  const [reaction, setReaction] = useState(rule?.reaction ?? "");
  const [logK, setLogK] = useState<number | null>(rule?.logK_25 ?? null);
  const [pressed, setPressed] = useState(false);
  const set = (part: Partial<SpeciesRow>) => setRow((old) => ({ ...old, ...part }));

  const refused = add.error instanceof ApiFailure ? add.error : null;
  const stale = staleAnswer(add.error);
  const at = (field: string) =>
    refused !== null && fieldOf(refused.path) === field ? inFormWords(refused.message) : null;
  const placed = refused !== null && [...numbers.map((n) => n.key), "citation", "composition", "formula", "id", "ion_class"].includes(fieldOf(refused.path)); // prettier-ignore
  const missing = {
    formula: row.formula.trim() === "" ? "The formula is missing" : null,
    dGf_kJ: Number.isNaN(row.dGf_kJ) ? "G of formation is what the solver stands on" : null,
    source: row.source.trim() === "" && citation.trim() === "" ? "Name the source: author, year, table or page" : null,
  };
  const complete = Object.values(missing).every((why) => why === null);

  function submit() {
    setPressed(true);
    if (!complete) return;
    const extrapolation =
      hold === "from entropy" ? null : { hold, reaction, logK_25: logK, note: citation.slice(0, 200) };
    add.mutate(
      { row, citation, extrapolation, reason, version },
      { onSuccess: (edit: SpeciesEditRow) => onSaved(edit) },
    );
  }

  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title={before ? "Override a species" : "Add a species"}
      width={760}
      description={
        before
          ? "Other numbers for this site, with their source. The shipped row stays on record beside them, and the edit can be taken back."
          : "A species of the site’s own. It counts in every plan that has its metal and ligands."
      }
      footer={
        <>
          <Button onClick={() => onOpenChange(false)}>Cancel</Button>
          <Button kind="primary" disabled={add.isPending} onClick={submit}>
            {add.isPending ? "Checking …" : before ? "Override" : "Add"}
          </Button>
        </>
      }
    >
      {before ? (
        <p className="pb-3 text-lg">
          <Formula formula={before.formula} className="font-bold" /> {before.name}
        </p>
      ) : (
        <div className="grid gap-x-5 gap-y-3 pb-3 sm:grid-cols-3">
          <TextField
            label="Formula"
            placeholder="Cu(NH3)4^2+"
            autoFocus
            value={row.formula}
            error={at("formula") ?? at("id") ?? (pressed ? missing.formula : null)}
            hint={row.formula === "" ? undefined : <Formula formula={row.formula} />}
            onChange={(event) => setRow((old) => fromFormula(old, event.target.value, solid))}
          />
          <Select
            label="Phase"
            layout="stacked"
            value={row.phase}
            onChange={(phase) => setRow((old) => fromFormula({ ...old, phase }, old.formula, solid))}
            options={phases.map((value) => ({
              value,
              label: { aq: "dissolved", s: "solid", l: "liquid", g: "gas" }[value],
            }))}
          />
          {row.phase === "s" && (
            <TextField
              label="Which solid, where there are several"
              placeholder="goethite"
              value={solid}
              onChange={(event) => {
                setSolid(event.target.value);
                setRow((old) => fromFormula(old, old.formula, event.target.value));
              }}
            />
          )}
          <TextField
            label="Name"
            value={row.name}
            maxLength={200}
            onChange={(event) => set({ name: event.target.value })}
          />
          <TextField
            className="sm:col-span-2"
            label="Made of"
            hint="Ligand groups as such: Cu:1 NH3:4. Elements otherwise."
            value={row.composition}
            error={at("composition")}
            onChange={(event) => set({ composition: event.target.value })}
          />
        </div>
      )}
      <SectionHead aside="25 °C, 1 bar">Numbers</SectionHead>
      <div className="grid gap-x-8 sm:grid-cols-2">
        {numbers.map(({ key, label, unit }) => (
          <NumberField
            key={key}
            label={label}
            unit={unit}
            width={12}
            show={(x) => String(x)}
            value={row[key] === null || Number.isNaN(row[key]) ? null : row[key]}
            onCommit={(value) => set({ [key]: value })}
            onClear={() => set({ [key]: key === "dGf_kJ" ? Number.NaN : null })}
            error={at(key) ?? (pressed && key === "dGf_kJ" ? missing.dGf_kJ : null)}
            hint={before && before[key] !== row[key] ? `was ${before[key] ?? "not known"}` : undefined}
          />
        ))}
        <Select
          label="Grade"
          value={row.grade}
          onChange={(grade) => set({ grade })}
          options={grades.map((value) => ({ value, label: value, note: gradeNotes[value] }))}
        />
        {row.phase === "aq" && row.charge !== 0 && (
          <Select
            label="Class of ion"
            value={row.ion_class ?? "none"}
            onChange={(value) => set({ ion_class: value === "none" ? null : value })}
            options={[
              { value: "none", label: "none: no entropy" } as const,
              ...ionClasses.map((value) => ({ value, label: classWords[value] })),
            ]}
            error={at("ion_class")}
          />
        )}
      </div>
      {row.S_J === null && (
        <>
          <SectionHead className="mt-4">Without an entropy, at other temperatures</SectionHead>
          <Select
            label="What is held"
            value={hold}
            onChange={setHold}
            options={[
              { value: "from entropy" as const, label: "nothing said: held and flagged" },
              ...holds.map((value) => ({ value, label: holdWords[value] })),
            ]}
          />
          {(hold === "logK" || hold === "dG") && (
            <div className="grid gap-x-8 pt-2 sm:grid-cols-[1fr_auto]">
              <TextField
                label="Reaction"
                placeholder="Cu^2+ + 4 NH3 = Cu(NH3)4^2+"
                value={reaction}
                error={at("extrapolation.reaction")}
                onChange={(event) => setReaction(event.target.value)}
              />
              {hold === "logK" && (
                <NumberField
                  label="log K at 25 °C"
                  layout="stacked"
                  value={logK}
                  onCommit={setLogK}
                  onClear={() => setLogK(null)}
                />
              )}
            </div>
          )}
        </>
      )}
      <SectionHead className="mt-4">Source</SectionHead>
      <div className="space-y-3 pt-2">
        <TextArea
          label="Author, year, table or page"
          rows={2}
          maxLength={500}
          value={citation}
          error={at("citation") ?? (pressed ? missing.source : null)}
          onChange={(event) => setCitation(event.target.value)}
        />
        <div className="grid gap-5 sm:grid-cols-[14em_1fr]">
          <TextField
            label="Or a code of the library’s sources"
            value={row.source}
            maxLength={200}
            onChange={(event) => set({ source: event.target.value })}
          />
          <TextField
            label="Note"
            value={row.note}
            maxLength={1000}
            onChange={(event) => set({ note: event.target.value })}
          />
        </div>
        <TextField
          label="Why, for the record"
          value={reason}
          maxLength={500}
          onChange={(event) => setReason(event.target.value)}
        />
      </div>
      {stale ? (
        <Remark className="mt-3 border-signal!">
          {refused?.message} What stands there now is shown behind this sheet; nothing you typed is lost. Close and
          look, or press again to put your numbers on top.
        </Remark>
      ) : (
        add.error && !placed && <ErrorNote className="mt-3" doing="Not taken" error={add.error} />
      )}
      <Note className="mt-3">
        The whole library is checked before it is taken: formula, charge and composition must agree, and G, H and S
        within 1 kJ/mol. Saved revisions keep the numbers they used.
      </Note>
    </Dialog>
  );
}
