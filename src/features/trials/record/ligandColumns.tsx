import { weighedAs } from "../../../../shared/plan/totals";
import { refusalOf } from "../../../../shared/schemas/entry";
import type { LigandTotal } from "../../../../shared/schemas/trialRecord";
import { Formula } from "../../../components/Formula";
import type { GridColumn } from "../../../components/entryGridModel";

export const nextLigand = (rows: readonly LigandTotal[]): LigandTotal => ({
  component: "",
  value: { text: "", unit: rows.at(-1)?.value.unit ?? "mol/L" },
});

/** Total of a ligand as the plan names it, and what its grams are grams of. @param expected  ligands of the plan
 *  @param sulfateReduction  of the plan: its S is all sulfur, weighed as S */
export const ligandColumns = (expected: readonly string[], sulfateReduction: boolean): GridColumn<LigandTotal>[] => [
  {
    id: "component",
    kind: "text",
    header: "ligand",
    label: "ligand",
    under: "as the plan names it",
    width: "9em",
    words: true,
    usual: expected,
    get: (l) => l.component,
    set: (l, component) => ({ ...l, component }),
    problem: (l) => (l.component.trim() === "" ? "the ligand is missing" : null),
  },
  {
    id: "value",
    kind: "text",
    header: "total",
    label: "total",
    width: "6em",
    get: (l) => l.value.text,
    set: (l, text) => ({ ...l, value: { ...l.value, text } }),
    problem: (l) => refusalOf(l.value, "solutionAssay"),
  },
  {
    id: "unit",
    kind: "choice",
    header: "unit",
    label: "unit",
    width: "5.5em",
    options: ["mol/L", "g/L", "mg/L"].map((unit) => ({ value: unit, label: unit })),
    get: (l) => l.value.unit,
    set: (l, unit) => ({ ...l, value: { ...l.value, unit } }),
  },
  {
    id: "weighed",
    kind: "shown",
    header: "weighed as",
    label: "weighed as",
    width: "6em",
    show: ({ component, value: { unit } }) =>
      component.trim() === "" || unit === "mol/L" ? null : (
        <Formula formula={weighedAs(component.trim(), sulfateReduction)} />
      ),
  },
];
