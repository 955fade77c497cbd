import { checkedWords, coupleOverWords } from "../../../../shared/advice/checkedWords";
import { marginWords } from "../../../../shared/windows/limitWords";
import { fixed } from "../../../../shared/words/numbers";
import type { Inline } from "../pen";
import type { SheetWork } from "../work";
import { prose } from "../words";
import { bold, volts } from "./style";

/** What holds over the plan's ranges, and what was checked for it; null where the plan has none. */
export function robustSays({ robust, naming }: SheetWork): Inline[] | null {
  if (robust === null) return null;
  if ("failed" in robust) return [[bold("Not solved: "), robust.failed, "."]];
  const [best] = [...robust.windows].sort((a, b) => b.setPoint.margin - a.setPoint.margin);
  const found: Inline = best
    ? [
        "Deepest point ",
        bold(`pH ${fixed(best.setPoint.pH, 2)}, ${volts(best.setPoint.Eh)}`),
        ` vs SHE, margin ${fixed(best.setPoint.margin, 1)} ${marginWords(best.setPoint)}`,
        best.setPoint.mixedPotential
          ? "; not at every temperature does a couple set Eh, so the margin counts pH alone"
          : "",
        best.setPoint.cutByFrame ? "; cut by the frame: it may hold further out" : "",
        robust.windows.length > 1 ? `; ${robust.windows.length} pieces hold, this is the deepest.` : ".",
      ]
    : [bold("No point holds over all of it.")];
  const coupled = coupleOverWords(best?.couples ?? []);
  return [coupled === null ? found : [found, " ", prose(coupled)], checkedWords(robust, naming.metalName)];
}
