import { useMemo } from "react";
import { energiesAt } from "../../../../shared/gibbs/energies";
import type { Solution } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { kelvin } from "../../../../shared/units";
import { FormulaText } from "../../../components/FormulaText";
import { Term } from "../../../components/Help";
import { MethodLink, SpeciesLink } from "../../../components/SourceLink";
import { SectionHead } from "../../../components/text";
import { celsius } from "../../../lib/format";
import { Fold } from "../asks/Fold";

/** Every species that rules a field of the map: how its energy reaches this temperature, where that is trusted, and how it is graded. */
export function FieldsBlock({ solution, data }: { solution: Solution; data: ChemicalData }) {
  const { fields, temperatureC } = solution;
  const ruling = useMemo(() => [...new Set(fields.map((f) => f.species))].sort(), [fields]);
  const rows = useMemo(() => {
    const energies = energiesAt(data, kelvin(temperatureC));
    return ruling
      .map((id) => ({ id, ...energies.of(id), grade: data.species.get(id)?.row.grade ?? "C" }))
      .sort((a, b) => Number(a.warning === null) - Number(b.warning === null));
  }, [ruling, data, temperatureC]);
  const doubtful = rows.filter((r) => r.warning !== null).length;
  return (
    <section aria-label="Fields drawn" className="mt-4">
      <SectionHead
        aside={
          <>
            <Term word="trustedRange">trusted range</Term> · <MethodLink to="trustedRange" />
          </>
        }
      >
        Fields drawn
      </SectionHead>
      <Fold
        className="pt-1"
        title={
          doubtful === 0
            ? `${rows.length} species, all within their trusted temperatures`
            : `${rows.length} species, ${doubtful} beyond their trusted temperatures`
        }
      >
        <ul>
          {rows.map((row) => (
            <li key={row.id} className="hairline py-1">
              <div className="flex items-baseline justify-between gap-3">
                <SpeciesLink id={row.id} withPhase />
                <MethodLink to="grades">grade {row.grade}</MethodLink>
              </div>
              <div className="text-muted">
                {row.model}, {row.trusted[0]} to {celsius(row.trusted[1])}
              </div>
              {row.warning !== null && (
                <div>
                  <FormulaText text={row.warning} />
                </div>
              )}
            </li>
          ))}
        </ul>
      </Fold>
    </section>
  );
}
