import { solve } from "../solve";
import type { ChemicalData } from "../species/chemicalData";
import { atTemperature, type Gammas } from "../plan/toProblem";
import type { Opening } from "./openings";

/** A number with three figures, or a temperature with one decimal, rounded away from where it came from. */
function away(to: number, from: number, change: Opening["change"]): number {
  const round = to < from ? Math.floor : Math.ceil;
  const step = change === "temperature" ? 0.1 : 10 ** (Math.floor(Math.log10(to)) - 2);
  return Number((round(to / step) * step).toPrecision(6));
}

/** The opening with a number a person would type: a little further than the root, where a window is still open there; else as it was.
 *  @param opening  of `adviceFor`     @param data  library     @param gammas  as `adviceFor`     @returns  the opening, its problem holding the tidy number
 *  @source  the solver: the rounded number is solved before it is offered */
export function tidied(opening: Opening, data: ChemicalData, gammas?: Gammas): Opening {
  const { problem, change, of, from, to } = opening;
  // a hazard's threshold is told, not offered
  if (change === "hazardPressure" || change === "hazardPH") return opening;
  if (problem === undefined || typeof to !== "number" || typeof from !== "number") return opening;
  const rounded = away(to, from, change);
  const next =
    change === "temperature"
      ? atTemperature(problem, gammas, data)(rounded)
      : change === "ligand"
        ? {
            ...problem,
            ligands: problem.ligands.map((l) => (l.component === of ? { ...l, activity: rounded } : l)),
          }
        : {
            ...problem,
            metals: problem.metals.map((m) =>
              m.element !== of ? m : m.activity === undefined ? { ...m, gPerL: rounded } : { ...m, activity: rounded },
            ),
          };
  const solved = solve(next, data);
  return solved.ok && solved.value.windows.length > 0 ? { ...opening, to: rounded, problem: next } : opening;
}
