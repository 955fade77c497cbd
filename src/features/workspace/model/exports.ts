import { FREE_ACID_BELOW, type FreeAcidCurve } from "../../../../shared/activity/freeAcid";
import type { Outline, Point, Solution, Window } from "../../../../shared/solution";
import { windowName } from "../../../map/view";
import { hazardWords, sideOf } from "../../../../shared/windows/limitWords";

/** A name for files: letters, digits and hyphens. */
export const fileStem = (name: string): string =>
  name
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, "-")
    .replace(/^-|-$/g, "") || "plan";

/** A table for a file; every header that needs one ends in its unit. */
export interface Table {
  header: string[];
  rows: (string | number | null)[][];
}

/** A file travels without its plan: every line says whose numbers it holds, so that tables may be put together. */
export const withOrigin = ({ header, rows }: Table, origin: Readonly<Record<string, string | number>>): Table => ({
  header: [...header, ...Object.keys(origin)],
  rows: rows.map((row) => [...row, ...Object.values(origin)]),
});

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
  "kept_out",
] as const;
/** Of a sulfate liquor: blank where pH is 1.5 or more, and where the sulfate would not balance so much acid. */
const acidHeader = ["set_point_free_acid_g_per_L", "from_free_acid_g_per_L", "to_free_acid_g_per_L"] as const;

/** Every limit of every window as a table; potentials in V vs SHE whatever the screen shows. */
export function limitsTable(windows: readonly Window[], freeAcid: FreeAcidCurve | null = null): Table {
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
        l.kind === "hazard" ? hazardWords(l) : null,
        ...(freeAcid === null ? [] : [acidAt(window.setPoint.pH), acidAt(l.from[0]), acidAt(l.to[0])]),
      ]),
    ),
  };
}

/** Every window on a line: its extent, its set point and what that is worth. */
export const windowsTable = ({ windows, temperatureC }: Pick<Solution, "windows" | "temperatureC">): Table => ({
  header: [
    ...["window", "temperature_C", "area_pH_V", "pH_low", "pH_high", "Eh_low_V_SHE", "Eh_high_V_SHE"],
    ...["set_point_pH", "set_point_Eh_V_SHE", "margin_bands", "mixed_potential", "controllable", "cut_by_frame"],
  ],
  rows: windows.map(({ area, pH, Eh, setPoint: at, controllable }, i) => [
    ...[windowName(i), temperatureC, area, ...pH, ...Eh, at.pH, at.Eh, at.margin],
    ...[at.mixedPotential, controllable, at.cutByFrame].map((yes) => (yes ? "yes" : "no")),
  ]),
});

/** Every corner of everything drawn: windows and shut ground as outlines, fields as convex pieces; corners counter-clockwise, holes
 *  clockwise. */
export function polygonsTable({ windows, shut = [], fields }: Pick<Solution, "windows" | "shut" | "fields">): Table {
  const rows: Table["rows"] = [];
  const add = (
    what: string,
    metal: string | null,
    of: string | null,
    polygon: number,
    ring: string,
    points: readonly Point[],
  ) => points.forEach(([pH, Eh], i) => rows.push([what, metal, of, polygon, ring, i + 1, pH, Eh]));
  const outlines = (what: string, metal: string | null, of: string | null, all: readonly Outline[]) =>
    all.forEach(({ outer, holes }, i) => {
      add(what, metal, of, i + 1, "outer", outer);
      holes.forEach((hole, k) => add(what, metal, of, i + 1, `hole ${k + 1}`, hole));
    });
  windows.forEach((w, i) => outlines("window", null, windowName(i), w.polygons));
  shut.forEach((s) => outlines("shut ground", s.metal, null, s.polygons));
  const pieces = new Map<string, number>();
  for (const { metal, species, state, polygon } of fields) {
    const n = (pieces.get(`${metal} ${species}`) ?? 0) + 1;
    pieces.set(`${metal} ${species}`, n);
    add(`field, ${state}`, metal, species, n, "outer", polygon);
  }
  return { header: ["what", "metal", "of", "polygon", "ring", "corner", "pH", "Eh_V_SHE"], rows };
}
