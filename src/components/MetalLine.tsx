import { Fragment } from "react";
import type { PlanMetal } from "../../shared/schemas/plan";
import { requirementWord } from "../lib/planWords";

/** A metal as the plans write it: the target in copper, nothing else. */
export const MetalName = ({ element, role }: Pick<PlanMetal, "element" | "role">) => (
  <b className={role === "target" ? "text-copper" : undefined}>{element}</b>
);

/** "Zn dissolved, Fe solid, Cu and Cd watched": the question of a plan in one line. */
export function MetalLine({ metals }: { metals: readonly PlanMetal[] }) {
  const asked = metals.filter((m) => m.role !== "watched");
  const watched = metals.filter((m) => m.role === "watched");
  return (
    <span>
      {asked.map((metal, i) => (
        <Fragment key={metal.element}>
          {i > 0 && ", "}
          <MetalName {...metal} /> {requirementWord[metal.requirement]}
        </Fragment>
      ))}
      {watched.length > 0 && (
        <span className="text-muted">
          {asked.length > 0 && ", "}
          {watched.map((metal) => metal.element).join(", ")} watched
        </span>
      )}
    </span>
  );
}
