import { presetCaution } from "../../../shared/hazards/presetCautions";
import { presetNames } from "../../../shared/schemas/plan";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { Caution } from "../../components/Caution";
import { ComponentName } from "../../components/ComponentName";
import { SpeciesName } from "../../components/Formula";
import { FormulaText } from "../../components/FormulaText";
import { Quantity } from "../../components/Quantity";
import { Note, Row, SectionHead } from "../../components/text";
import { presetLigands } from "../../lib/presetLigands";
import { lixiviantName } from "../../lib/planWords";

/** What each lixiviant brings into a plan: ligand totals to start from, species it leaves out, and its caution. */
export function PresetsTab({ data }: { data: ChemicalData }) {
  return (
    <div className="grid max-w-[1180px] gap-x-10 gap-y-8 pb-10 md:grid-cols-2">
      {presetNames.map((preset) => {
        const rows = data.tables.presets.filter((row) => row.preset === preset);
        const left = rows.flatMap((row) => row.exclude_ids.split(";").filter(Boolean));
        const notes = rows.map((row) => row.note).filter(Boolean);
        const ligands = presetLigands(data, preset);
        return (
          <section key={preset}>
            <SectionHead>{lixiviantName[preset]}</SectionHead>
            {ligands.map(({ component, activity }) => (
              <Row key={component} label={<ComponentName data={data} component={component} />}>
                <Quantity value={activity} />
              </Row>
            ))}
            {ligands.length === 0 && <Row label="No ligand" />}
            {notes.map((note) => (
              <p key={note} className="py-1 text-sm">
                <FormulaText text={note} />
              </p>
            ))}
            {left.length > 0 && (
              <details className="py-1 text-sm">
                <summary>Leaves out {left.length} species</summary>
                <p className="pt-1 text-muted">
                  {left.map((id, i) => (
                    <span key={id}>
                      {i > 0 && ", "}
                      <SpeciesName id={id} withPhase />
                    </span>
                  ))}
                </p>
              </details>
            )}
            <div className="pt-1">
              <Caution defer={false}>{presetCaution[preset]}</Caution>
            </div>
          </section>
        );
      })}
      <Note className="md:col-span-2">
        Totals are activities, not tenors, and only where a plan starts: every one can be changed there. The cautions
        are reminders of common practice; local codes, the site’s procedures and licensed practice decide.
      </Note>
    </div>
  );
}
