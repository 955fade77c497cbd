import type { ReachAnswer } from "../../../../shared/reach/verdict";
import { MINUS } from "../../../../shared/words/numbers";
import type { Inline } from "../pen";
import type { SheetWork } from "../work";
import { prose } from "../words";
import { emboldened, millivolts } from "./style";

const whole = (E: number): string => `${Math.round(1000 * E)}`.replace("-", MINUS);

function verdictSays({ verdict, side, shortMV }: ReachAnswer): string {
  const off = millivolts((shortMV ?? 0) / 1000);
  switch (verdict) {
    case "reachable":
      return "reaches the set point";
    case "partly":
      return shortMV === 0 || side === null
        ? `serves the set point, may go ${side === "below" ? "below" : "above"} the window`
        : `enters the window, ${off} ${side} the set point`;
    case "not reachable":
      return `${off} ${side ?? "outside"} the window`;
    case "not on record":
      return "no practical range on record for this liquor";
  }
}

/** What each reagent chosen brings the slurry to on platinum, and what that is worth at the set point; its hazard stands with it. */
export function reachSays({ reach }: SheetWork): Inline[] {
  return reach.map((answer): Inline => {
    const { reagent, practical } = answer;
    const [lo, hi] = practical ?? [0, 0];
    const range = practical === null ? "" : ` ${whole(lo)} ${hi === null ? "mV and more" : `to ${millivolts(hi)}`}:`;
    return [emboldened(prose(reagent.name)), `${range} ${verdictSays(answer)}; `, prose(reagent.hazard), "."];
  });
}
