import { FREE_ACID_BELOW, type FreeAcidCurve } from "../../../../shared/activity/freeAcid";
import { electrodeSeries } from "../../../../shared/electrodes/series";
import type { Window } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { windowName } from "../../../map/view";
import { sideOf } from "../../../../shared/windows/limitWords";

/** A name for files: letters, digits and hyphens. */
export const fileStem = (name: string): string =>
  name
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, "-")
    .replace(/^-|-$/g, "") || "plan";

const header = [
  "window",
  "kind",
  "side",
  "metal",
  "inside",
  "outside",
  "reaction",
  "from_pH",
  "from_Eh_V_SHE",
  "to_pH",
  "to_Eh_V_SHE",
  "distance_bands",
  "distance_pH",
  "distance_Eh_V",
] as const;
/** Of a sulfate liquor: blank where pH is 1.5 or more, and where the sulfate would not balance so much acid. */
const acidHeader = ["set_point_free_acid_g_per_L", "from_free_acid_g_per_L", "to_free_acid_g_per_L"] as const;

/** Every limit of every window as a table; potentials in V vs SHE whatever the screen shows. */
export function limitsTable(
  windows: readonly Window[],
  freeAcid: FreeAcidCurve | null = null,
): { header: string[]; rows: (string | number | null)[][] } {
  const acidAt = (pH: number): number | null => {
    if (freeAcid === null || pH >= FREE_ACID_BELOW) return null;
    const { gPerL, withinSulfate } = freeAcid.at(pH);
    return withinSulfate ? gPerL : null;
  };
  return {
    header: [...header, ...(freeAcid === null ? [] : acidHeader)],
    rows: windows.flatMap((window, i) =>
      window.limits.map((l) => [
        windowName(i),
        l.kind,
        l.kind === "metal" ? sideOf(l) : (l.side ?? sideOf(l)),
        l.metal ?? null,
        l.inside ?? null,
        l.outside ?? null,
        l.reaction ?? null,
        l.from[0],
        l.from[1],
        l.to[0],
        l.to[1],
        l.distance,
        l.distancePH,
        l.distanceEh,
        ...(freeAcid === null ? [] : [acidAt(window.setPoint.pH), acidAt(l.from[0]), acidAt(l.to[0])]),
      ]),
    ),
  };
}

/** The electrode a reading is quoted for where the screen itself is on SHE: the common 3 M Ag/AgCl, else the first. */
export function usualProbe(data: ChemicalData) {
  const all = electrodeSeries(data.tables);
  return all.find((s) => s.id === "AGCL-3M") ?? all[0];
}
