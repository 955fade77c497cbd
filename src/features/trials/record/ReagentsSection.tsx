import { unitsOf } from "../../../../shared/entry/quantities";
import { refusalOf } from "../../../../shared/schemas/entry";
import { doseRoles, type CementingMetal, type Dose, type LigandTotal } from "../../../../shared/schemas/trialRecord";
import { Button } from "../../../components/Button";
import { EntryField } from "../../../components/EntryField";
import { EntryGrid } from "../../../components/EntryGrid";
import type { GridColumn } from "../../../components/entryGridModel";
import { SectionHead } from "../../../components/text";
import { TextField } from "../../../components/TextField";
import { unitText } from "../../../lib/units";
import { nextDose } from "../model/trialValues";
import { problemAt, rowProblems, useRecording } from "./context";
import { ligandColumns, nextLigand } from "./ligandColumns";
import { Section } from "./Section";

const unitChoices = (quantity: "amount" | "strength" | "time") =>
  unitsOf(quantity).map((unit) => ({ value: unit, label: unitText(unit) }));
const usualReagents = ["H2SO4", "HCl", "NH3", "NaOH", "CaO", "CaCO3", "NaCN", "NaClO3", "H2O2", "MnO2", "O2", "air"];

export const doseColumns: readonly GridColumn<Dose>[] = [
  {
    id: "role",
    kind: "choice",
    header: "as",
    label: "role",
    width: "7.5em",
    options: doseRoles.map((value) => ({ value, label: value })),
    get: (d) => d.role,
    set: (d, role) => ({ ...d, role: doseRoles.find((r) => r === role) ?? d.role }),
  },
  {
    id: "reagent",
    kind: "text",
    header: "reagent",
    label: "reagent",
    width: "6.5em",
    words: true,
    usual: usualReagents,
    get: (d) => d.reagent,
    set: (d, reagent) => ({ ...d, reagent }),
    problem: (d) => (d.reagent.trim() === "" ? "the reagent is missing" : null),
  },
  {
    id: "amount",
    kind: "text",
    header: "amount",
    label: "amount",
    width: "5em",
    get: (d) => d.amount.text,
    set: (d, text) => ({ ...d, amount: { ...d.amount, text } }),
    problem: (d) => refusalOf(d.amount, "amount"),
  },
  {
    id: "amountUnit",
    kind: "choice",
    header: "unit",
    label: "unit of the amount",
    width: "4.8em",
    options: unitChoices("amount"),
    get: (d) => d.amount.unit,
    set: (d, unit) => ({ ...d, amount: { ...d.amount, unit } }),
  },
  {
    id: "strength",
    kind: "text",
    header: "strength",
    label: "strength",
    width: "5em",
    get: (d) => d.strength.text,
    set: (d, text) => ({ ...d, strength: { ...d.strength, text } }),
    problem: (d) => refusalOf(d.strength, "strength"),
  },
  {
    id: "strengthUnit",
    kind: "choice",
    header: "unit",
    label: "unit of the strength",
    width: "6em",
    options: unitChoices("strength"),
    get: (d) => d.strength.unit,
    set: (d, unit) => ({ ...d, strength: { ...d.strength, unit } }),
  },
  {
    id: "density",
    kind: "text",
    header: "density",
    label: "density",
    under: "kg/L",
    width: "4.5em",
    get: (d) => d.density.text,
    set: (d, text) => ({ ...d, density: { ...d.density, text } }),
    problem: (d) => refusalOf(d.density, "density"),
  },
  {
    id: "at",
    kind: "text",
    header: "time",
    label: "time",
    width: "4.5em",
    get: (d) => d.at.text,
    set: (d, text) => ({ ...d, at: { ...d.at, text } }),
    problem: (d) => refusalOf(d.at, "time"),
  },
  {
    id: "atUnit",
    kind: "choice",
    header: "unit",
    label: "unit of the time",
    width: "4.6em",
    options: unitChoices("time"),
    get: (d) => d.at.unit,
    set: (d, unit) => ({ ...d, at: { ...d.at, unit } }),
  },
  {
    id: "reason",
    kind: "text",
    header: "why",
    label: "why",
    width: "8em",
    words: true,
    usual: ["initial", "pH control", "ORP control", "top-up"],
    get: (d) => d.reason,
    set: (d, reason) => ({ ...d, reason }),
  },
];

const blankMetal: CementingMetal = {
  metal: "Zn",
  dosed: { text: "", unit: "g" },
  active: { text: "", unit: "%" },
  unreacted: { text: "", unit: "g" },
};

/** What was added while the trial ran, the metal that cements, and the ligand totals that held. */
export function ReagentsSection() {
  const { values, edit, problems, readOnly, solved } = useRecording();
  const { doses, ligands, cementingMetal } = values.measured;
  const set = <K extends "doses" | "ligands" | "cementingMetal">(key: K, value: (typeof values.measured)[K]) =>
    edit((t) => ({ ...t, measured: { ...t.measured, [key]: value } }), `measured.${key}`);
  const metal = (change: Partial<CementingMetal>) =>
    set("cementingMetal", { ...(cementingMetal ?? blankMetal), ...change });
  return (
    <Section id="reagents" title="Reagents added" aside="by mass, or by volume with strength and density">
      <EntryGrid
        caption="Reagents added"
        rowName="dose"
        rows={doses}
        columns={doseColumns}
        blank={nextDose}
        onChange={(next) => set("doses", next)}
        readOnly={readOnly}
        problems={rowProblems(problems, "measured.doses", (rest) => rest.split(".")[0] ?? "")}
        emptyText="None added."
      />
      {(values.kind === "cementation" || cementingMetal !== null) && (
        <div className="mt-5">
          <SectionHead level={3}>Cementing metal</SectionHead>
          {cementingMetal === null ? (
            <div className="pt-2">
              {!readOnly && <Button onClick={() => set("cementingMetal", blankMetal)}>Record a cementing metal</Button>}
            </div>
          ) : (
            <div className="max-w-[420px]">
              <TextField
                className="py-2"
                label="Metal"
                value={cementingMetal.metal}
                readOnly={readOnly}
                maxLength={20}
                error={problemAt(problems, "measured.cementingMetal.metal")}
                onChange={(event) => metal({ metal: event.target.value })}
              />
              <EntryField
                label="Dosed"
                quantity="mass"
                value={cementingMetal.dosed}
                onChange={(dosed) => metal({ dosed })}
                readOnly={readOnly}
              />
              <EntryField
                label="Metal in it"
                quantity="share"
                value={cementingMetal.active}
                onChange={(active) => metal({ active })}
                hint="Empty: taken as all of it."
                readOnly={readOnly}
              />
              <EntryField
                label="Left over in the cement"
                quantity="mass"
                value={cementingMetal.unreacted}
                onChange={(unreacted) => metal({ unreacted })}
                readOnly={readOnly}
              />
              {values.kind === "leach" && !readOnly && (
                <Button kind="quiet" onClick={() => set("cementingMetal", null)}>
                  no cementing metal
                </Button>
              )}
            </div>
          )}
        </div>
      )}
      <div className="mt-5">
        <SectionHead level={3} aside="that held in the liquor">
          Ligand totals
        </SectionHead>
        <div className="pt-2">
          <EntryGrid
            caption="Ligand totals measured"
            rowName="ligand"
            rows={ligands}
            columns={ligandColumns(
              solved?.inputs.ligands.map((l) => l.component) ?? [],
              solved?.inputs.sulfateReduction ?? false,
            )}
            blank={nextLigand}
            onChange={(next: LigandTotal[]) => set("ligands", next)}
            readOnly={readOnly}
            problems={rowProblems(problems, "measured.ligands", (rest) => rest.split(".")[0] ?? "")}
            emptyText="None measured."
          />
        </div>
      </div>
    </Section>
  );
}
