import type { Circuit } from "../schemas/circuit";
import type { PlanInputs } from "../schemas/plan";
import { SULFIDE_SULFUR } from "../selection/components";

/** What the rules look at: the plan's inputs, what stands around the vessel, and where the set point stands. */
export interface HazardContext {
  temperatureC: number;
  /** components that have a total: ligands and others */
  components: readonly string[];
  metals: readonly { element: string; requirement: string }[];
  feedMinerals: readonly string[];
  dosed: readonly string[];
  /** sulfide sulfur is in the plan: its couple is on, or it has a total of its own */
  sulfideSulfur: boolean;
  circuit: Circuit;
  /** null while no window is open: a rule about the set point's pH then waits, one about acid does not */
  setPoint: { pH: number; Eh: number } | null;
}

export type CautionCode = "HCN" | "ARSINE" | "HYDROGEN" | "H2S" | "CHLORINE" | "NH3" | "ORGANIC" | "OXYGEN";

export interface Caution {
  code: CautionCode;
  /** as it would be typed; the screen typesets it */
  agents: string[];
  text: string;
  /** US exposure values with the month they were recorded in; null for agents without one */
  limits: string | null;
  /** asks the user to name the procedure it runs under before it counts as read */
  confirm: string | null;
}

/** The part of a plan that the rules look at.
 *  @param inputs  of the plan     @param setPoint  of the window chosen, or null     @param circuit  what stands around the vessel, the
 *    plan's own unless given
 *  @returns  the context of `cautionsFor` */
export function hazardContext(
  inputs: Pick<
    PlanInputs,
    | "temperatureC"
    | "ligands"
    | "others"
    | "metals"
    | "feedMinerals"
    | "dosed"
    | "sulfateReduction"
    | "preset"
    | "circuit"
  >,
  setPoint: { pH: number; Eh: number } | null,
  circuit: Circuit = inputs.circuit ?? {},
): HazardContext {
  const components = [...inputs.ligands, ...inputs.others].map((c) => c.component);
  return {
    temperatureC: inputs.temperatureC,
    components,
    metals: inputs.metals.map(({ element, requirement }) => ({ element, requirement })),
    feedMinerals: inputs.feedMinerals,
    dosed: inputs.dosed,
    sulfideSulfur:
      components.includes(SULFIDE_SULFUR) ||
      (components.includes("S") && (inputs.sulfateReduction || inputs.preset === "sulfate_sulfide")),
    circuit,
    setPoint: setPoint && { pH: setPoint.pH, Eh: setPoint.Eh },
  };
}
