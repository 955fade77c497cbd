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

/** Every limit of every window as a table; potentials in V vs SHE whatever the screen shows. */
export function limitsTable(windows: readonly Window[]): { header: string[]; rows: (string | number | null)[][] } {
  return {
    header: [...header],
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
      ]),
    ),
  };
}

/** The electrode a reading is quoted for where the screen itself is on SHE: the common 3 M Ag/AgCl, else the first. */
export function usualProbe(data: ChemicalData) {
  const all = electrodeSeries(data.tables);
  return all.find((s) => s.id === "AGCL-3M") ?? all[0];
}
