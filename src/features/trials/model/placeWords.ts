import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Limit } from "../../../../shared/solution";
import type { Judgement } from "../../../../shared/trials/judge";
import { fixed } from "../../../lib/format";
import { requirementWord } from "../../../lib/planWords";

/** What a limit is, said of its far side: "where Fe is no longer solid". */
export function limitName(limit: Limit, { metals }: Pick<PlanInputs, "metals">): string {
  switch (limit.kind) {
    case "water":
      return limit.side === "hydrogen" ? "the hydrogen line" : "the oxygen line";
    case "frame":
      return "the edge of the frame";
    case "hazard":
      return limit.gas === undefined
        ? "the edge of a hazard"
        : `where ${limit.pHAtLeast === undefined ? `${limit.gas} reaches its limit` : `pH falls below ${limit.pHAtLeast} (${limit.gas})`}`;
    case "metal": {
      const metal = metals.find(({ element }) => element === limit.metal);
      return metal ? `where ${metal.element} is no longer ${requirementWord[metal.requirement]}` : "a limit";
    }
  }
}

export interface PlaceSentence {
  text: string;
  tone: "good" | "bad" | "quiet";
}

/** Where a measured point stands, in a sentence with a distance: "Inside window A, 1.9 control bands from where Fe is no longer solid."
 *  @param laidOutside  the trial was planned outside on purpose: being there is no fault of it */
export function placeWords(
  judgement: Judgement,
  inputs: Pick<PlanInputs, "metals">,
  laidOutside = false,
): PlaceSentence {
  const { verdict, window, unsure, nearest } = judgement;
  if (verdict === "off the map") return { text: "Beyond the frame the plan was solved in: not judged.", tone: "quiet" };
  if (nearest === null) return { text: "The plan has no window: outside everywhere.", tone: "bad" };
  const bands = `${fixed(nearest.distance, 1)} control bands`;
  const limit = limitName(nearest.limit, inputs);
  const name = `window ${String.fromCharCode(65 + ((window ?? nearest.window) % 26))}`;
  if (unsure)
    return {
      text: `At a limit of ${name}, ${limit}: the uncertainty of the electrode reaches across.`,
      tone: "quiet",
    };
  return verdict === "inside"
    ? { text: `Inside ${name}, ${bands} from ${limit}.`, tone: "good" }
    : {
        text: `Outside${laidOutside ? " as it was laid out" : ""}, ${bands} beyond ${limit} (${name}).`,
        tone: laidOutside ? "quiet" : "bad",
      };
}
