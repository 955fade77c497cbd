import { significant } from "../words/numbers";
import type { MetalFields } from "../fields/fields";
import type { Prepared } from "../selection/prepare";
import type { Basis } from "../planes/grid";
import type { Field, SolutionWarning } from "../solution";
import { kineticsWarnings } from "./kinetics";
import { metastableWarnings } from "./metastable";
import type { Relevant } from "./relevant";

/** A ligand's total is not drawn down by the metals; beyond this share of it the plan says so (docs/method.md, section 3). */
const DRAWN_DOWN_SHARE = 1 / 3;

/** What the user must know before trusting the picture: fields and ligand cells that rest on a G outside its trusted range, ligands that
 *  the metals would use up, solids that time replaces, steps that are slow, saturation pressure.
 *  @param prepared, metals, fields, basis, relevant  of one solution     @returns  sentences with a code
 *  @source  docs/method.md, sections 1 and 3 */
export function warningsOf(
  prepared: Prepared,
  metals: readonly MetalFields[],
  fields: readonly Field[],
  basis: Basis,
  relevant: Relevant,
): SolutionWarning[] {
  const warnings: SolutionWarning[] = [];
  const ruling = new Set(fields.map((f) => f.species));
  for (const id of new Set([...ruling, ...relevant.holders])) {
    const { warning } = basis.energies.of(id);
    if (warning !== null) warnings.push({ code: "TEMPERATURE_TRUST", species: id, text: warning });
  }
  for (const { component, activity } of prepared.components) {
    for (const m of metals) {
      let need = 0;
      for (const { species, ligands, plane } of m.formations) {
        if (species.phase !== "aq" || ligands.length === 0) continue;
        const count = ligands.find(([c]) => c === component)?.[1];
        if (count !== undefined && ruling.has(species.id))
          need = Math.max(need, (count / plane.atoms) * m.metal.activity);
      }
      if (need > activity * DRAWN_DOWN_SHARE)
        warnings.push({
          code: "LIGAND_DRAWN_DOWN",
          metal: m.metal.element,
          text: `${m.metal.element} at activity ${significant(m.metal.activity)} would bind ${significant(need)} mol/L of ${component}, more than a third of its total of ${significant(activity)} mol/L: the total is not drawn down here`,
        });
    }
  }
  const stateOf = (metal: string, id: string) => fields.find((f) => f.species === id && f.metal === metal)?.state;
  warnings.push(...metastableWarnings(prepared, basis, relevant), ...kineticsWarnings(prepared, relevant, stateOf));
  if (prepared.problem.temperatureC > 100)
    warnings.push({
      code: "SATURATION_PRESSURE",
      text: "above 100 C the liquor is under its saturation pressure; gas pressures are absolute",
    });
  return warnings;
}
