import { presetCaution } from "../../../../shared/hazards/presetCautions";
import type { HazardRegion } from "../../../../shared/hazards/regions";
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

function gasSays(g: HazardRegion, { reachingGases, drawnGases }: SheetWork, told: boolean): CautionSays {
  const bar = g.atSetPoint;
  const { words } = g.threshold;
  const where =
    bar !== null && bar >= g.threshold.bar
      ? `: at the set point it reaches ${words}`
      : reachingGases.includes(g)
        ? `: part of the window reaches ${words}`
        : `: outside the window the ground drawn reaches ${words}`;
  return {
    text: [
      emboldened(formula(g.gas)),
      bold(where),
      drawnGases.includes(g) ? "" : " (region not drawn)",
      "; at the set point ",
      pressureSays(bar),
      " in equilibrium. ",
      told ? "" : prose(g.caution),
    ],
    limits: told || !g.limits ? null : prose(g.limits),
  };
}

/** Cautions of the set point, gases that reach the window or are drawn, and last the liquor's usual one. */
export function cautionsSay(work: SheetWork): CautionSays[] {
  const { cautions, drawnGases, reachingGases, revision, window, hazards } = work;
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
  const others = drawnGases.filter((g) => !reachingGases.includes(g));
  for (const g of [...reachingGases, ...others]) said.push(gasSays(g, work, agents.has(g.gas)));
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
