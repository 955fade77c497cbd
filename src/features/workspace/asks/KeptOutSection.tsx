import { askedOf } from "../../../../shared/hazards/excluded";
import { hazardGases, type HazardGas } from "../../../../shared/hazards/gases";
import { carrierOf, type GasSources } from "../../../../shared/hazards/pressures";
import { usualThreshold } from "../../../../shared/hazards/thresholds";
import { HCN_PH, keptWords, PPM } from "../../../../shared/hazards/words";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { ExcludedHazard } from "../../../../shared/schemas/problem";
import { Button } from "../../../components/Button";
import { Segmented } from "../../../components/choice";
import { Formula } from "../../../components/Formula";
import { FormulaText } from "../../../components/FormulaText";
import { Term } from "../../../components/Help";
import { NumberField } from "../../../components/NumberField";
import { Select } from "../../../components/Select";
import { Note, SectionHead } from "../../../components/text";
import { inputTextExact } from "../../../lib/format";
import { keepOut, letIn } from "../model/edit";
import { useAsking } from "./context";
import { Refusal } from "./Refusal";

const sourcesOf = ({ ligands, others, metals, sulfateReduction }: PlanInputs): GasSources => ({
  components: [...ligands, ...others].map((c) => c.component),
  metals: metals.map((m) => m.element),
  onePool: sulfateReduction,
});

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
        <Kept key={hazard.gas} hazard={hazard} absent={why(hazard.gas)} />
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

/** How a gas is kept out unless somebody says otherwise: cyanide by its pH, the rest by what is immediately dangerous. */
const usualRule = (gas: HazardGas): ExcludedHazard =>
  gas === "HCN" ? { gas, pHAtLeast: HCN_PH } : { gas, bar: usualThreshold[gas].bar };

const tidy = (x: number): number => Number(x.toPrecision(6));

function Kept({ hazard, absent }: { hazard: ExcludedHazard; absent: string | null }) {
  const { edit, readOnly } = useAsking();
  const { gas } = hazard;
  const { bar, pHAtLeast } = askedOf(hazard);
  const usual = usualThreshold[gas];
  return (
    <div className="pt-1">
      <div className="flex items-baseline justify-between gap-2">
        <span>
          <Formula formula={gas} className="font-bold" />
          {!readOnly && (
            <Button
              kind="quiet"
              className="ml-2 h-auto! text-xs! font-normal! text-muted"
              aria-label={`No longer keep ${gas} out`}
              onClick={() => edit(letIn(gas))}
            >
              remove
            </Button>
          )}
        </span>
        {gas === "HCN" && !readOnly && (
          <Segmented
            label="HCN is kept out by"
            value={bar === undefined ? "pH" : "pressure"}
            onChange={(by) => edit(keepOut(by === "pH" ? usualRule(gas) : { gas, bar: usual.bar }))}
            options={[
              { value: "pH", label: "by pH" },
              { value: "pressure", label: "by pressure" },
            ]}
          />
        )}
      </div>
      {bar === undefined ? (
        <NumberField
          label={`Lowest pH against ${gas}`}
          labelText="pH at or above"
          value={pHAtLeast}
          min={7}
          max={14}
          step={0.1}
          width={6}
          show={inputTextExact}
          readOnly={readOnly}
          onCommit={(pH) => edit(keepOut({ gas, pHAtLeast: pH }))}
        />
      ) : (
        <NumberField
          label={`Highest pressure of ${gas}`}
          labelText="below"
          unit="ppm"
          value={tidy(bar / PPM)}
          above={0}
          max={1e9}
          factor={1.1}
          width={8}
          show={inputTextExact}
          readOnly={readOnly}
          onCommit={(ppm) => edit(keepOut({ gas, bar: ppm * PPM }))}
          hint={`over the liquor, at 1 atm; ${usual.words}`}
        />
      )}
      {absent !== null && <Note>Cuts nothing: {absent}.</Note>}
    </div>
  );
}
