import { DEFERENCE } from "../../../../shared/hazards/exposure";
import { cautionsFor, hazardContext } from "../../../../shared/hazards/rules";
import { planReactions, type PlanReaction } from "../../../../shared/reactions/ofPlan";
import type { Exported } from "./exportPlan";
import type { Table } from "./exports";

const header = [
  ...["from", "products", "chosen_by_hand", "redox_reagent", "reaction", "electrons_per_mol"],
  ...["temperature_C", "set_point_pH", "set_point_Eh_V_SHE", "log10_K", "dG_kJ", "worst_grade", "activities_assumed"],
  ...["role", "direction", "reagent", "mol_per_mol", "metal", "kg_per_kg_metal", "kg_per_t", "not_written_because"],
];

const pairs = (of: Iterable<readonly [string, string | number]>): string =>
  [...of].map(([what, value]) => `${what}=${value}`).join("; ");

/** Every overall reaction of a plan with its choices, a line a reagent; tonnes are of the pure mineral, metal or ion. A reaction that
 *  cannot be written stands there with the reason. */
export function overallTable(
  reactions: readonly PlanReaction[],
  at: { readonly pH: number; readonly Eh: number },
  temperatureC: number,
): Table {
  const rows = reactions.flatMap(({ from, chosen, redox, outcome }): Table["rows"] => {
    const byHand = pairs(Object.entries(chosen));
    const where = [temperatureC, at.pH, at.Eh];
    if (!outcome.ok) {
      const none = (n: number) => Array.from({ length: n }, () => null);
      return [[from, null, byHand, redox, ...none(2), ...where, ...none(11), outcome.error.message]];
    }
    const { products, text, electrons, energetics, assumed, demand, metal } = outcome.value;
    const about = [
      ...[from, pairs(products), byHand, redox, text, electrons, ...where, energetics.logK, energetics.dG_kJ],
      ...[energetics.grade, pairs(assumed.map((a) => [a.component, a.activity] as const))],
    ];
    const lines = demand.length > 0 ? demand : [null];
    return lines.map((d) => [
      ...about,
      ...(d === null
        ? [null, null, null, null, metal, null, null]
        : [d.role, d.direction, d.formula, d.molPerMol, metal, d.kgPerKgMetal, d.kgPerTonne]),
      null,
    ]);
  });
  return { header, rows };
}

/** The same for a file of the whole plan. */
const overallRecords = (reactions: readonly PlanReaction[]) =>
  reactions.map(({ from, chosen, redox, outcome }) => ({
    from,
    chosenByHand: chosen,
    redox,
    ...(outcome.ok
      ? {
          reaction: outcome.value.text,
          products: Object.fromEntries(outcome.value.products),
          terms: outcome.value.terms,
          demand: outcome.value.demand,
          made: outcome.value.made,
          assumed: outcome.value.assumed,
          energetics: outcome.value.energetics,
        }
      : { error: outcome.error }),
  }));

/** Overall reactions at the set point of the window in hand, as the plan's choices have them; none without a window. */
function reactionsOf({ inputs, problem, solution, model, data }: Exported) {
  const at = solution.windows[model.view.window]?.setPoint;
  return { at, reactions: at ? planReactions(problem, data, inputs, solution, at) : [] };
}

/** The table of the reactions on the table; null where no window gives a set point. */
export function reactionsTable(e: Exported): Table | null {
  const { at, reactions } = reactionsOf(e);
  return at ? overallTable(reactions, at, e.inputs.temperatureC) : null;
}

/** All that the plan asks and chooses, with the cautions it calls for and its overall reactions. */
export function planFile(e: Exported) {
  const { at, reactions } = reactionsOf(e);
  return {
    plan: { id: e.plan.id, name: e.plan.name, invented: e.plan.invented },
    state: e.state,
    dataVersion: e.data.version,
    inputs: e.inputs,
    setPoint: at ?? null,
    cautions: cautionsFor(hazardContext(e.inputs, at ?? null)),
    deference: DEFERENCE,
    overallReactions: overallRecords(reactions),
  };
}

/** What the sheet of a saved revision is to show as the screen does: the member's electrode, the window in hand, the gases drawn,
 *  the reagents whose reach is looked at. */
export function sheetQuery({ scale, state, model }: Pick<Exported, "scale" | "state" | "model">): string {
  const { reference } = scale;
  const { layers, window } = model.view;
  const query = new URLSearchParams();
  if (reference) {
    query.set("electrode", reference.id);
    query.set("electrodeC", String(reference.temperatureC));
  }
  // A draft may have other windows, and other gases that reach them: the saved state then speaks for itself.
  if (!state.startsWith("draft")) {
    query.set("window", String(window));
    query.set("gases", layers.hazard ? (model.asked.gases ?? []).map((g) => g.gas).join(",") : "");
  }
  // Which reagents are looked at is the member's choice on a draft, too.
  query.set("reach", model.reaches.map((r) => r.reagent.id).join(","));
  return `?${query}`;
}
