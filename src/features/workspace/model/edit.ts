import type { FreeAcidBand, PlanInputs, PlanMetal, PlanTotal, PresetName } from "../../../../shared/schemas/plan";
import type { HazardGas } from "../../../../shared/hazards/gases";
import type { ExcludedHazard } from "../../../../shared/schemas/problem";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { cyanideRule, presetLigands } from "../../../lib/presetLigands";

/** A change of a plan's inputs, as a function of them. */
export type Edit = (inputs: PlanInputs) => PlanInputs;

export const setMetal =
  (index: number, change: Partial<PlanMetal>): Edit =>
  (p) => ({ ...p, metals: p.metals.map((m, i) => (i === index ? settled({ ...m, ...change }) : m)) });

/** A watched metal asks for nothing; one that is to ask again starts from what its role usually asks. */
function settled(metal: PlanMetal): PlanMetal {
  if (metal.role === "watched") return { ...metal, requirement: "free" };
  if (metal.requirement === "free") return { ...metal, requirement: metal.role === "target" ? "dissolved" : "solid" };
  return metal;
}

export const addMetal =
  (element: string): Edit =>
  (p) => ({
    ...p,
    metals: [
      ...p.metals,
      { element, role: "watched", requirement: "free", entry: "activity", value: 1e-3, gammaFrom: "one", gamma: null },
    ],
  });

export const removeMetal =
  (index: number): Edit =>
  (p) =>
    p.metals.length > 1 ? { ...p, metals: p.metals.filter((_, i) => i !== index) } : p;

export const moveMetal =
  (index: number, by: 1 | -1): Edit =>
  (p) => {
    const to = index + by;
    const [here, there] = [p.metals[index], p.metals[to]];
    if (!here || !there) return p;
    return { ...p, metals: p.metals.map((m, i) => (i === index ? there : i === to ? here : m)) };
  };

/** Another lixiviant: its own totals come in, the old liquor's go; species put back or left out stay with the plan. */
export const setPreset =
  (preset: PresetName, data: ChemicalData): Edit =>
  (p) => ({
    ...p,
    preset,
    ligands: presetLigands(data, preset),
    sulfateReduction: preset === "sulfate_sulfide",
    ...withCyanideRule(p, preset === "cyanide"),
  });

/** Cyanide comes in with its pH rule, unless the plan already says how HCN is kept out. */
const withCyanideRule = ({ excludedHazards = [] }: PlanInputs, cyanide: boolean): Partial<PlanInputs> =>
  cyanide && !excludedHazards.some((h) => h.gas === "HCN")
    ? { excludedHazards: [...excludedHazards, cyanideRule] }
    : {};

type List = "ligands" | "others";
export const setTotal =
  (list: List, component: string, activity: number): Edit =>
  (p) => ({ ...p, [list]: p[list].map((c) => (c.component === component ? { ...c, activity } : c)) });

/** How a total is typed and shown; what counts stays the same mol/L. */
export const setTotalUnit =
  (list: List, component: string, unit: "mol/L" | "g/L"): Edit =>
  (p) => ({
    ...p,
    [list]: p[list].map(({ unit: _old, ...c }) =>
      c.component !== component ? (_old ? { ...c, unit: _old } : c) : unit === "g/L" ? { ...c, unit } : c,
    ),
  });

/** A band of pH typed as pH. */
export const setPHBand =
  (pH: number): Edit =>
  ({ freeAcidBand: _old, ...p }) => ({ ...p, controlBand: { ...p.controlBand, pH } });

/** A band typed as free acid, with what it is in pH where it was converted. */
export const setAcidBand =
  (freeAcidBand: FreeAcidBand, counted: number): Edit =>
  (p) => ({ ...p, freeAcidBand, controlBand: { ...p.controlBand, pH: Number(counted.toFixed(4)) } });

export const addTotal =
  (list: List, total: PlanTotal): Edit =>
  (p) => ({ ...p, [list]: [...p[list], total], ...withCyanideRule(p, total.component === "CN") });

export const removeTotal =
  (list: List, component: string): Edit =>
  (p) => ({ ...p, [list]: p[list].filter((c) => c.component !== component) });

/** Keeps a gas out of windows, or says anew how; its place in the list stays. */
export const keepOut =
  (hazard: ExcludedHazard): Edit =>
  (p) => {
    const { excludedHazards: list = [] } = p;
    return {
      ...p,
      excludedHazards: list.some((h) => h.gas === hazard.gas)
        ? list.map((h) => (h.gas === hazard.gas ? hazard : h))
        : [...list, hazard],
    };
  };

/** No longer kept out; a plan that keeps nothing out carries no list. */
export const letIn =
  (gas: HazardGas): Edit =>
  (p) => {
    const { excludedHazards: list = [], ...rest } = p;
    const left = list.filter((h) => h.gas !== gas);
    return left.length > 0 ? { ...rest, excludedHazards: left } : rest;
  };

export const leaveOut =
  (species: string, reason: string): Edit =>
  (p) => ({
    ...p,
    leftOut: [...p.leftOut.filter((l) => l.species !== species), { species, reason }],
    putBack: p.putBack.filter((id) => id !== species),
  });

/** Back into the plan, whoever left it out: the plan itself, the basis or the defaults. */
export const putBack =
  (species: string): Edit =>
  (p) =>
    p.leftOut.some((l) => l.species === species)
      ? { ...p, leftOut: p.leftOut.filter((l) => l.species !== species) }
      : { ...p, putBack: [...p.putBack, species] };

export const noLongerPutBack =
  (species: string): Edit =>
  (p) => ({ ...p, putBack: p.putBack.filter((id) => id !== species) });

export const toggleIn =
  (list: "feedMinerals" | "dosed", id: string): Edit =>
  (p) => ({ ...p, [list]: p[list].includes(id) ? p[list].filter((x) => x !== id) : [...p[list], id] });
