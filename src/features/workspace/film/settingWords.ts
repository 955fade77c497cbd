import type { PlanInputs } from "../../../../shared/schemas/plan";
import { isLogarithmic, settingOf, type Varied } from "../../../../shared/whatif/vary";
import { amountWord } from "../../../../shared/words/planWords";
import { tenorText, typedFigures } from "../../../../shared/words/tenor";
import { celsius, inputText, significant, withUnit } from "../../../lib/format";

/** "temperature", "Fe, at most", "S, total activity": what is varied. */
export function settingName(inputs: PlanInputs, varied: Varied): string {
  switch (varied.kind) {
    case "temperature":
      return "temperature";
    case "amount": {
      const metal = inputs.metals.find((m) => m.element === varied.of);
      return metal ? `${varied.of}, ${amountWord(metal)}` : varied.of;
    }
    case "total":
      return `${varied.of}, total activity`;
  }
}

/** Unit a setting is typed in; "" for an activity. */
export function settingUnit(inputs: PlanInputs, varied: Varied): string {
  if (varied.kind === "temperature") return "°C";
  const metal = varied.kind === "amount" ? inputs.metals.find((m) => m.element === varied.of) : undefined;
  return metal?.entry === "gPerL" ? "g/L" : "";
}

/** A setting as prose writes it: "71.3 °C", "2.0e−4". */
export function settingText(inputs: PlanInputs, varied: Varied, at: number, figures = 3): string {
  if (varied.kind === "temperature") return celsius(at, figures > 3 ? 2 : 1);
  const unit = settingUnit(inputs, varied);
  return unit === "g/L" ? tenorText(at, figures) : withUnit(significant(at, figures), unit);
}

/** How a setting taken from a picture is written into the plan: as coarse as a hand would type it. */
export const tidySetting = (varied: Varied, at: number): number =>
  isLogarithmic(varied) ? Number(at.toPrecision(3)) : Number(at.toFixed(1));

/** "temperature" or "amount-Fe", for a list. */
export const settingKey = (varied: Varied): string =>
  varied.kind === "temperature" ? "temperature" : `${varied.kind}-${varied.of}`;

/** The setting as it stands, for a list: "60 °C". */
export function standing(inputs: PlanInputs, varied: Varied): string {
  const at = settingOf(inputs, varied);
  const unit = settingUnit(inputs, varied);
  if (at === null) return "";
  return unit === "g/L" ? tenorText(at, typedFigures(at)) : withUnit(inputText(at), unit);
}
