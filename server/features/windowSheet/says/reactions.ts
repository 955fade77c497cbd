import { reagentById } from "../../../../shared/reach/reagents";
import type { Demand } from "../../../../shared/reactions/demand";
import { celsius, fixed } from "../../../../shared/words/numbers";
import type { Inline } from "../pen";
import type { SheetWork } from "../work";
import { formula, joined, quantity, reaction, speciesName } from "../words";
import { bold, emboldened } from "./style";

const amountSays = (d: Demand, metal: string | null): Inline => [
  formula(d.formula),
  d.direction === "made" ? " made" : "",
  " ",
  quantity(d.molPerMol, "", 3),
  ", ",
  d.kgPerKgMetal === null ? "" : [quantity(d.kgPerKgMetal, `kg/kg ${metal ?? ""}`, 3), ", "],
  quantity(d.kgPerTonne, "kg/t", 3),
];

/** One overall reaction: balanced, what was chosen by hand, reagents per mole, per kg of metal and per tonne of the start. */
export interface ReactionSays {
  reaction: Inline;
  demand: Inline;
}

export function reactionsSay({ reactions, solution }: SheetWork): ReactionSays[] {
  return reactions.map(({ from, outcome, chosen, redox }) => {
    const byHand = Object.values(chosen).map(speciesName);
    const note: Inline = byHand.length > 0 ? [bold(" chosen: "), joined(byHand)] : "";
    if (!outcome.ok)
      return {
        reaction: [emboldened(speciesName(from)), note],
        demand: `Cannot be written: ${outcome.error.message}.`,
      };
    const { terms, demand, metal, energetics, assumed } = outcome.value;
    const agent = redox === null || redox === "open" ? "" : (reagentById.get(redox)?.name ?? redox);
    return {
      reaction: [reaction(terms), note],
      demand: [
        agent === "" ? "" : [formula(agent), ": "],
        joined(
          [
            ...demand.map((d) => amountSays(d, metal)),
            `log K ${fixed(energetics.logK, 1)} at ${celsius(solution.temperatureC)}, worst grade ${energetics.grade ?? "unknown"}`,
            ...assumed.map((a): Inline => [formula(a.component), " taken at ", quantity(a.activity, "", 1)]),
          ],
          "; ",
        ),
      ],
    };
  });
}
