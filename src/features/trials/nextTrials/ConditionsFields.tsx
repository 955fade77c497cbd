import type { QuantityName } from "../../../../shared/entry/quantities";
import { EntryField } from "../../../components/EntryField";
import { FormulaText } from "../../../components/FormulaText";
import { Note, SectionHead } from "../../../components/text";
import { isBlank } from "../model/trialValues";
import { sharedConditions, type Conditions, type Prefilled, type SharedCondition } from "./planThese";

const fields: Readonly<Record<SharedCondition, { label: (target: string) => string; quantity: QuantityName }>> = {
  temperature: { label: () => "Temperature", quantity: "temperature" },
  tenor: { label: (target) => `Tenor of ${target}, final liquor`, quantity: "solutionAssay" },
  freeAcid: { label: () => "Free acid, as H2SO4", quantity: "solutionAssay" },
  solids: { label: () => "Solids in the pulp", quantity: "solids" },
  p80: { label: () => "P80", quantity: "size" },
  duration: { label: () => "Duration", quantity: "time" },
};

/** What the trials have in common, each with where it comes from. */
export function ConditionsFields({
  conditions,
  from,
  edited,
  target,
  onChange,
}: {
  conditions: Conditions;
  from: Prefilled["from"];
  edited: Partial<Conditions>;
  target: string;
  onChange: (change: Partial<Conditions>) => void;
}) {
  const { ligands, cementingMetal } = conditions;
  return (
    <section aria-label="Conditions of all of them">
      <SectionHead aside="filled in beforehand where it says so">Conditions of all of them</SectionHead>
      <div className="grid gap-x-8 sm:grid-cols-2">
        {sharedConditions.map((key) => {
          const { label, quantity } = fields[key];
          const source = edited[key] ? "changed here" : from[key] && `from ${from[key]}`;
          return (
            <EntryField
              key={key}
              label={label(target)}
              labelText={key === "freeAcid" ? <FormulaText text={label(target)} /> : label(target)}
              quantity={quantity}
              value={conditions[key]}
              onChange={(entry) => onChange({ [key]: entry })}
              width={7}
              hint={source ?? (isBlank(conditions[key]) ? "left to the bench" : undefined)}
            />
          );
        })}
      </div>
      {(ligands.length > 0 || cementingMetal !== null) && (
        <Note className="pt-1.5">
          {ligands.length > 0 && (
            <>
              Ligand totals from {from.ligands ?? "the plan"}:{" "}
              {ligands.map(({ component, value }) => `${component} ${value.text} ${value.unit}`).join(", ")}.{" "}
            </>
          )}
          {cementingMetal !== null &&
            `${cementingMetal.metal} ${cementingMetal.dosed.text} ${cementingMetal.dosed.unit} from ${from.cementingMetal ?? "the last trial"}.`}
        </Note>
      )}
    </section>
  );
}
