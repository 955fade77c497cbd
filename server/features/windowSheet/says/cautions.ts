import { presetCaution } from "../../../../shared/hazards/presetCautions";
import { fixed, withUnit } from "../../../../shared/words/numbers";
import type { Inline } from "../pen";
import type { SheetWork } from "../work";
import { formula, joined, prose, quantity } from "../words";
import { bold, emboldened } from "./style";

/** Below the first no instrument finds anything; above the second the digits mean no pressure any more. */
const [NOTHING, BEYOND] = [1e-12, 100];
function pressureSays(bar: number | null): Inline {
  if (bar === null || bar < NOTHING) return "next to none";
  return bar > BEYOND ? "far above 1 bar" : quantity(bar, "bar");
}

/** A caution and the exposure values beside it. */
export interface CautionSays {
  text: Inline;
  limits: Inline | null;
}

/** Cautions of the set point, gases that reach the window, and last the liquor's usual one. */
export function cautionsSay({ cautions, drawnGases, revision, window, hazards }: SheetWork): CautionSays[] {
  const agents = new Set(cautions.flatMap((c) => c.agents));
  const said: CautionSays[] = cautions.map((c) => ({
    text: [
      joined(c.agents.map((a) => emboldened(formula(a)))),
      bold(". "),
      prose(c.text),
      c.confirm ? [" ", bold(`${c.confirm}:`), " ……………………"] : "",
    ],
    limits: c.limits === null ? null : prose(c.limits),
  }));
  for (const g of drawnGases) {
    const bar = g.atSetPoint;
    const reached = bar !== null && bar >= g.threshold.bar;
    const here: Inline = pressureSays(bar);
    said.push({
      text: [
        emboldened(formula(g.gas)),
        bold(
          reached
            ? `: at the set point it reaches ${g.threshold.words}`
            : `: part of the window reaches ${g.threshold.words}`,
        ),
        "; at the set point ",
        here,
        " in equilibrium. ",
        agents.has(g.gas) ? "" : prose(g.caution),
      ],
      limits: agents.has(g.gas) || !g.limits ? null : prose(g.limits),
    });
  }
  const saturationBar = hazards?.saturationBar ?? null;
  if (saturationBar !== null)
    said.push({
      text: `The vessel is closed: water alone stands at ${withUnit(fixed(saturationBar, 2), "bar")} here.`,
      limits: null,
    });
  if (!window) said.push({ text: "No set point: cautions that depend on one are not shown.", limits: null });
  said.push({ text: prose(presetCaution[revision.inputs.preset]), limits: null });
  return said;
}
