import { celsius } from "../../../../shared/words/numbers";
import { warningWord } from "../../../../shared/words/planWords";
import type { Inline } from "../pen";
import type { SheetWork } from "../work";
import { joined, prose, speciesName } from "../words";
import { bold, emboldened } from "./style";

const gradeMeans: Readonly<Record<string, string>> = {
  A: "seen in a published table",
  B: "handbook value, consistent within 1 kJ",
  C: "unchecked, or derived from a stability constant",
};

/** Species that rule a field, gathered by grade; those on a limit of the window stand first and bold.
 *  @param brief  only those on a limit are named, the others counted */
export function gradesSay({ species }: SheetWork, brief = false): Inline[] {
  return [...new Set(species.map((s) => s.grade))].sort().map((grade): Inline => {
    const of = species.filter((s) => s.grade === grade);
    const shown = brief ? of.filter((s) => s.limits) : of;
    const names = shown.map(({ id, limits }): Inline => (limits ? emboldened(speciesName(id)) : speciesName(id)));
    const more = of.length - shown.length;
    if (more > 0) names.push(`${more} ${names.length > 0 ? "more " : ""}that limit nothing`);
    return [bold(grade), ` ${gradeMeans[grade] ?? ""}: `, joined(names)];
  });
}

/** Species beyond their trusted temperature stand together: at 200 C they are many. */
export function warningsSay({ solution: { warnings, temperatureC } }: SheetWork): Inline[] {
  const hot = warnings.flatMap((w) => (w.code === "TEMPERATURE_TRUST" && w.species ? [w.species] : []));
  const gathered = hot.length > 3;
  const others = warnings.filter((w) => !(gathered && w.code === "TEMPERATURE_TRUST"));
  const said = others.map((w): Inline => [
    w.species ? emboldened(speciesName(w.species)) : bold(w.metal ?? "The plan"),
    `, ${warningWord[w.code]}: `,
    prose(w.text),
  ]);
  if (gathered)
    said.push([
      bold(`${hot.length} species`),
      `, beyond their trusted temperatures at ${celsius(temperatureC, 1)}: `,
      joined(hot.map(speciesName)),
    ]);
  return said;
}
