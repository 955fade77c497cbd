import type { Opening } from "../../../../shared/advice/openings";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import { solidsBases } from "../../../../shared/schemas/problem";
import type { Edit } from "./edit";

/** An opening as a change of the plan: one number or the basis, nothing else. A plan that has lost what it speaks of stays as it is. */
export const applyOpening =
  ({ change, of, to }: Opening): Edit =>
  (p) => {
    if (to === null) return p;
    switch (change) {
      case "activity":
        return typeof to === "number"
          ? { ...p, metals: p.metals.map((m) => (m.element === of ? { ...m, value: to } : m)) }
          : p;
      case "ligand":
        return typeof to === "number"
          ? { ...p, ligands: p.ligands.map((l) => (l.component === of ? { ...l, activity: to } : l)) }
          : p;
      case "temperature":
        return typeof to === "number" ? { ...p, temperatureC: to } : p;
      // a limit set for people's safety is changed by hand, never taken from a search
      case "hazardPressure":
      case "hazardPH":
        return p;
      case "solidsBasis": {
        const basis = solidsBases.find((b) => b === to);
        return basis ? { ...p, solidsBasis: basis } : p;
      }
    }
  };

/** Ranges set or taken away; a plan without any carries none. */
export const setTemperatureRange =
  (range: [number, number] | null): Edit =>
  (p) =>
    withRanges(p, {
      ...(p.ranges?.activities ? { activities: p.ranges.activities } : {}),
      ...(range ? { temperatureC: range } : {}),
    });

export const setActivityRange =
  (element: string, range: [number, number] | null): Edit =>
  (p) => {
    const { [element]: _old, ...rest } = p.ranges?.activities ?? {};
    const activities = range ? { ...rest, [element]: range } : rest;
    return withRanges(p, {
      ...(p.ranges?.temperatureC ? { temperatureC: p.ranges.temperatureC } : {}),
      ...(Object.keys(activities).length > 0 ? { activities } : {}),
    });
  };

function withRanges(p: PlanInputs, ranges: NonNullable<PlanInputs["ranges"]>): PlanInputs {
  const { ranges: _old, ...rest } = p;
  return Object.keys(ranges).length > 0 ? { ...rest, ranges } : rest;
}

/** A set point placed by hand, within the frame; null: back to the deepest point. */
export const holdSetPoint =
  (at: readonly [pH: number, Eh: number] | null): Edit =>
  (p) => {
    const { heldSetPoint: old, ...rest } = p;
    if (at === null) return old === undefined ? p : rest;
    const inside = (x: number, [lo, hi]: readonly [number, number]) => Math.min(hi, Math.max(lo, x));
    const pH = Number(inside(at[0], p.frame.pH).toFixed(3));
    const Eh = Number(inside(at[1], p.frame.Eh).toFixed(4));
    return old?.pH === pH && old.Eh === Eh ? p : { ...p, heldSetPoint: { pH, Eh } };
  };
