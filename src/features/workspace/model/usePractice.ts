import { useEffect, useMemo, useState } from "react";
import type { rangesFor } from "../../../../shared/practice/ranges";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { ShownRange } from "../../../map/traces/practice";

const NONE: readonly ShownRange[] = [];

/** Published ranges that fit the plan; the table of them comes in when the layer is first switched on. */
export function usePractice(
  wanted: boolean,
  { preset, metals, temperatureC }: Pick<PlanInputs, "preset" | "metals" | "temperatureC">,
): readonly ShownRange[] {
  const [find, setFind] = useState<typeof rangesFor | null>(null);
  useEffect(() => {
    if (!wanted) return;
    let here = true;
    import("../../../../shared/practice/ranges").then(
      (table) => here && setFind(() => table.rangesFor),
      () => undefined, // switched off and on again, it is asked for anew
    );
    return () => {
      here = false;
    };
  }, [wanted]);
  // watched metals ask for nothing, so nobody's practice with them is of use here
  const elements = metals
    .filter((m) => m.requirement !== "free")
    .map((m) => m.element)
    .join();
  return useMemo(
    () => (wanted && find ? find({ preset, elements: elements.split(","), temperatureC }) : NONE),
    [wanted, find, preset, elements, temperatureC],
  );
}
