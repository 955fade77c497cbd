import type { SolutionWarning } from "../../../../shared/solution";
import type { Source } from "../../../lib/sources";
import { FormulaText } from "../../../components/FormulaText";
import { MethodLink, SpeciesLink } from "../../../components/SourceLink";
import { Term } from "../../../components/Help";
import { SectionHead } from "../../../components/text";
import { warningWord } from "../../../lib/planWords";

/** Where the method says why. */
const grounds: Readonly<Record<SolutionWarning["code"], Source>> = {
  TEMPERATURE_TRUST: "trustedRange",
  LIGAND_DRAWN_DOWN: "drawnDown",
  METASTABLE: "solidsBasis",
  KINETICS: "slow",
  SATURATION_PRESSURE: "saturation",
};

/** What to know before trusting the picture. */
export function WarningsBlock({ warnings }: { warnings: readonly SolutionWarning[] }) {
  if (warnings.length === 0) return null;
  return (
    <section aria-label="Before you trust this" className="mt-4">
      <SectionHead>
        <Term word="warnings">Before you trust this</Term>
      </SectionHead>
      <ul>
        {warnings.map((w, i) => (
          <li key={i} className="hairline py-1 text-sm">
            <b>{w.species ? <SpeciesLink id={w.species} withPhase /> : (w.metal ?? "The plan")}</b>,{" "}
            {warningWord[w.code]}:{" "}
            <span className="text-muted">
              <FormulaText text={w.text} /> (<MethodLink to={grounds[w.code]} />)
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
