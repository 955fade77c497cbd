import { askedOf } from "../../../../shared/hazards/excluded";
import { keptWords } from "../../../../shared/hazards/words";
import { gramsPerMole, weighedAs } from "../../../../shared/plan/totals";
import { reagentById } from "../../../../shared/reach/reagents";
import type { PlanMetal, PlanTotal } from "../../../../shared/schemas/plan";
import { ligandWord } from "../../../../shared/words/componentWord";
import { celsius, fixed, withUnit } from "../../../../shared/words/numbers";
import {
  amountWord,
  lixiviantName,
  requirementWord,
  solidsBasisWord,
  waterBoundWord,
} from "../../../../shared/words/planWords";
import type { Inline } from "../pen";
import type { SheetWork } from "../work";
import { formula, joined, prose, quantity, speciesName, tenor } from "../words";
import { bold, inSans, volts } from "./style";

const gammaWord = { one: " taken as 1", davies: " by Davies", typed: " typed" } as const;

/** A metal of the plan: what it must be and what its number means.
 *  @param brief  leaves the name and the words to the number away, so that it stands on one line */
export function metalSays(metal: PlanMetal, { solution, naming }: SheetWork, brief = false): Inline {
  const solved = solution.metals.find((m) => m.metal === metal.element);
  const asks = metal.requirement === "free" ? "watched" : requirementWord[metal.requirement];
  const [activity, gamma] = [solved?.activity ?? metal.value, fixed(solved?.gamma ?? 1, 2)];
  if (brief) {
    const typed: Inline = metal.entry === "activity" ? "" : [tenor(metal.value, 2), ` γ\u00a0${gamma}: `];
    const word = metal.role === "watched" ? "" : `, ${amountWord(metal)}`;
    return [bold(metal.element), " ", bold(asks), `${word} `, inSans([typed, quantity(activity)])];
  }
  const typed: Inline =
    metal.entry === "activity" ? "" : [tenor(metal.value), `, γ\u00a0${gamma}${gammaWord[metal.gammaFrom]}: `];
  const name = ` ${naming.metalName(metal.element)}, ${metal.role === "watched" ? "" : `${metal.role}, `}`;
  return [bold(metal.element), name, bold(asks), `; ${amountWord(metal)} `, typed, quantity(activity), " activity"];
}

/** The band of pH as it was typed: in pH, or as free acid. */
export function bandSays({ controlBand: { pH, Eh }, freeAcidBand: acid }: SheetWork["revision"]["inputs"]): string {
  const typed = acid ? ` (free acid ±${withUnit(fixed(acid.gPerL, 1), "g/L")} at pH ${fixed(acid.atPH, 2)})` : "";
  return `pH ±${fixed(pH, 2)}${typed}, Eh ±${volts(Eh, 3)}`;
}

/** What the plan asks beside its metals: label and value. */
export function inputsSay({ revision: { inputs }, data }: SheetWork): [string, Inline][] {
  const total = ({ component, activity, unit }: PlanTotal): Inline => [
    formula(component),
    ` ${ligandWord(data, component, inputs.sulfateReduction)} `,
    quantity(activity, "mol/L", 3),
    unit === "g/L"
      ? [
          " (",
          tenor(activity * gramsPerMole(data, component, inputs.sulfateReduction)),
          " as ",
          formula(weighedAs(component, inputs.sulfateReduction)),
          ")",
        ]
      : "",
  ];
  const said: [string, Inline][] = [["Liquor", [celsius(inputs.temperatureC, 1), `, ${lixiviantName[inputs.preset]}`]]];
  if (inputs.ligands.length > 0)
    said.push(["Ligand totals", [joined(inputs.ligands.map(total)), ", taken as activity"]]);
  if (inputs.others.length > 0) said.push(["Other totals", [joined(inputs.others.map(total)), ", taken as activity"]]);
  if (inputs.ionicStrength !== null) said.push(["Ionic strength", quantity(inputs.ionicStrength, "mol/kg")]);
  said.push(["Solids", solidsBasisWord[inputs.solidsBasis]]);
  if (inputs.sulfateReduction) said.push(["Sulfate reduction", "on"]);
  if (inputs.feedMinerals.length > 0) said.push(["Feed minerals", joined(inputs.feedMinerals.map(speciesName))]);
  if (inputs.dosed.length > 0) said.push(["Dosed", inputs.dosed.join(", ")]);
  const { water } = inputs;
  said.push([
    "Bounded by",
    waterBoundWord[water.bound] +
      (water.oxygenV ? `, oxygen +${volts(water.oxygenV)}` : "") +
      (water.hydrogenV ? `, hydrogen ${fixed(-water.hydrogenV, 2)} V` : ""),
  ]);
  if (inputs.excludedHazards?.length)
    said.push(["Kept out of windows", joined(inputs.excludedHazards.map((h) => prose(keptWords(askedOf(h)))))]);
  said.push(["Control bands", bandSays(inputs)]);
  const { temperatureC: T, activities = {} } = inputs.ranges ?? {};
  const over: Inline[] = [
    ...(T ? [`${fixed(T[0], 1)} to ${celsius(T[1], 1)}`] : []),
    ...Object.entries(activities).map(([e, [lo, hi]]): Inline => [`${e} `, quantity(lo), " to ", quantity(hi)]),
  ];
  if (over.length > 0) said.push(["To hold over", joined(over)]);
  const { reagents = [], sxOrganic = false, oxygenKPa } = inputs.circuit ?? {};
  const around: Inline[] = [
    ...(reagents.length > 0
      ? [[joined(reagents.map((id) => formula(reagentById.get(id)?.name ?? id))), " in use"]]
      : []),
    ...(sxOrganic ? ["extraction organic met"] : []),
    ...(oxygenKPa === undefined ? [] : [["oxygen at ", quantity(oxygenKPa, "kPa")]]),
  ];
  if (around.length > 0) said.push(["Around the leach", joined(around, "; ")]);
  if (inputs.leftOut.length > 0)
    said.push(["Left out", joined(inputs.leftOut.map((l): Inline => [speciesName(l.species), `\u00a0(${l.reason})`]))]);
  if (inputs.putBack.length > 0) said.push(["Put back", joined(inputs.putBack.map(speciesName))]);
  return said;
}
