import { lazy, Suspense } from "react";
import { askedOf } from "../../../../shared/hazards/excluded";
import { hazardGases, type HazardGas } from "../../../../shared/hazards/gases";
import { carrierOf, type GasSources } from "../../../../shared/hazards/pressures";
import { keptWords } from "../../../../shared/hazards/words";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import { Formula } from "../../../components/Formula";
import { FormulaText } from "../../../components/FormulaText";
import { Term } from "../../../components/Help";
import { Select } from "../../../components/Select";
import { SectionHead } from "../../../components/text";
import { keepOut } from "../model/edit";
import { useAsking } from "./context";
import { Refusal } from "./Refusal";
import { usualRule } from "./usualRule";

const sourcesOf = ({ ligands, others, metals, sulfateReduction }: PlanInputs): GasSources => ({
  components: [...ligands, ...others].map((c) => c.component),
  metals: metals.map((m) => m.element),
  onePool: sulfateReduction,
});

// Few plans keep a gas out.
const KeptEntry = lazy(() => import("./KeptEntry"));

/** Gases whose ground windows keep out of, each with its limit. */
export function KeptOutSection() {
  const { inputs, edit, readOnly } = useAsking();
  const { excludedHazards: kept = [] } = inputs;
  if (readOnly && kept.length === 0) return null;
  const sources = sourcesOf(inputs);
  const others = hazardGases.filter((gas) => !kept.some((h) => h.gas === gas));
  const why = (gas: HazardGas): string | null => {
    const found = carrierOf(sources, gas);
    return "absent" in found ? found.absent : null;
  };
  return (
    <section aria-label="Kept out of windows" className="mt-5">
      <SectionHead aside={<Term word="excludedHazard">hazards</Term>}>Kept out of windows</SectionHead>
      {kept.map((hazard) => (
        <Suspense key={hazard.gas} fallback={null}>
          <KeptEntry hazard={hazard} absent={why(hazard.gas)} />
        </Suspense>
      ))}
      {!readOnly && others.length > 0 && (
        <Select
          label="Keep a gas out of the windows"
          labelText={<span className="text-muted">{kept.length === 0 ? "Nothing is kept out" : "Also keep out"}</span>}
          value=""
          onChange={(gas) => edit(keepOut(usualRule(gas)))}
          options={others.map((gas) => {
            const absent = why(gas);
            return {
              value: gas,
              label: <Formula formula={gas} />,
              text: gas,
              note: <FormulaText text={absent ?? keptWords(askedOf(usualRule(gas)))} />,
              disabled: absent !== null,
            };
          })}
        />
      )}
      <Refusal path="excludedHazards" />
    </section>
  );
}
