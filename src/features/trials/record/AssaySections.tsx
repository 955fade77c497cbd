import { liquorsOf, solidsOf } from "../model/liquors";
import { AssayMatrix } from "./AssayMatrix";
import { useRecording } from "./context";
import { Section } from "./Section";

const usualInLiquor = [
  "Zn",
  "Cu",
  "Fe",
  "Fe(II)",
  "Fe(III)",
  "Cd",
  "Co",
  "Ni",
  "Mn",
  "Pb",
  "Ag",
  "Au",
  "As",
  "H2SO4",
  "NaCN",
  "NH3",
  "Cl",
];
const usualInSolids = ["Zn", "Cu", "Fe", "Cd", "Co", "Ni", "Mn", "Pb", "Ag", "Au", "As", "S"];

/** Target, gangue and every metal with a head assay: what an account will ask for. */
function useExpected(): string[] {
  const { stage, feed, values } = useRecording();
  const heads = values.kind === "leach" ? (feed?.heads.map(({ element }) => element) ?? []) : [];
  return [
    ...new Set([stage?.target, stage?.gangue, ...heads].filter((x) => typeof x === "string" && x !== "")),
  ] as string[];
}

export function SolutionsSection() {
  const expected = useExpected();
  const { values } = useRecording();
  return (
    <Section id="solutions" title="Solution assays" aside="as the laboratory answered, “<” and all">
      <AssayMatrix
        caption="Solution assays"
        quantity="solutionAssay"
        usualUnit="g/L"
        expected={values.kind === "leach" ? [...expected, "H2SO4"] : expected}
        usual={usualInLiquor}
        linesOf={liquorsOf}
      />
    </Section>
  );
}

export function SolidsSection() {
  const expected = useExpected();
  const { values } = useRecording();
  return (
    <Section id="solids" title={values.kind === "leach" ? "Residue assays" : "Cement assays"}>
      <AssayMatrix
        caption="Assays of the solids"
        quantity="solidAssay"
        usualUnit="%"
        expected={expected}
        usual={usualInSolids}
        linesOf={solidsOf}
      />
    </Section>
  );
}
