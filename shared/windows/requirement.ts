import type { Requirement } from "../schemas/problem";
import type { State } from "../solution";

/** Whether a metal in this state is as required; "solid" is metal or compound, "free" anything.
 *  @param requirement  of the plan     @param state  of the ruling species */
export function fulfils(requirement: Requirement, state: State): boolean {
  switch (requirement) {
    case "free":
      return true;
    case "solid":
      return state !== "dissolved";
    default:
      return state === requirement;
  }
}
