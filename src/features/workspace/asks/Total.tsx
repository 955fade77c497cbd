import { gramsPerMole, weighedAs } from "../../../../shared/plan/totals";
import type { PlanTotal } from "../../../../shared/schemas/plan";
import { SULFIDE_SULFUR } from "../../../../shared/selection/components";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { Button } from "../../../components/Button";
import { ComponentName } from "../../../components/ComponentName";
import { Formula } from "../../../components/Formula";
import { LogSlider } from "../../../components/Slider";
import { removeTotal, setTotal, setTotalUnit } from "../model/edit";
import { useAsking } from "./context";

export const componentLabel = (data: ChemicalData, component: string, reduced: boolean) => {
  if (component === SULFIDE_SULFUR) return <>S sulfide</>;
  if (component === "S") return <>{reduced ? "S sulfur, all" : "S sulfate"}</>;
  return <ComponentName data={data} component={component} />;
};

const least = 1e-4;
const most = 10;
const typedMost = 100;
const tidy = (x: number, figures: number) => Number(x.toPrecision(figures));

/** The total of one ligand or other component, in mol/L or as the grams of it that the trade weighs. */
export function Total({ list, component, activity, unit }: PlanTotal & { list: "ligands" | "others" }) {
  const { inputs, edit, settle, data, readOnly } = useAsking();
  const inGrams = unit === "g/L";
  const perMole = inGrams ? gramsPerMole(data, component, inputs.sulfateReduction) : 1;
  const formula = weighedAs(component, inputs.sulfateReduction);
  const quiet =
    "mr-3 h-auto! text-xs! font-normal! text-muted after:hidden pointer-coarse:min-h-11 pointer-coarse:pr-3 pointer-coarse:text-sm!";
  return (
    <LogSlider
      label={`Total of ${component}`}
      labelText={
        <>
          {componentLabel(data, component, inputs.sulfateReduction)}
          {inGrams && (
            <span className="ml-1 text-xs text-muted">
              as <Formula formula={formula} />
            </span>
          )}
          {!readOnly && (
            <span className="block leading-none">
              <Button
                kind="quiet"
                className={quiet}
                aria-label={`Give ${component} in ${inGrams ? "mol/L" : "g/L"}`}
                title={inGrams ? "Give it in mol/L" : `Give it in g/L, weighed as ${formula}`}
                onClick={() => edit(setTotalUnit(list, component, inGrams ? "mol/L" : "g/L"))}
              >
                in {inGrams ? "mol/L" : "g/L"}
              </Button>
              <Button
                kind="quiet"
                className={quiet}
                aria-label={`Remove ${component} from the liquor`}
                onClick={() => edit(removeTotal(list, component))}
              >
                remove
              </Button>
            </span>
          )}
        </>
      }
      // what was typed in grams comes back as typed: the division leaves its last digits behind
      value={inGrams ? tidy(activity * perMole, 6) : activity}
      unit={unit ?? "mol/L"}
      min={inGrams ? tidy(least * perMole, 2) : least}
      max={inGrams ? tidy(most * perMole, 2) : most}
      typedMax={typedMost * perMole}
      readOnly={readOnly}
      onChange={(value) => edit(setTotal(list, component, tidy(value / perMole, 12)), `total ${component}`)}
      onCommit={settle}
      width={7}
    />
  );
}
