import { missingTotals, withMissingTotals } from "../../../../shared/plan/missingTotals";
import { FIRST_TOTAL } from "../../../../shared/plan/totals";
import { ligandWord } from "../../../../shared/words/componentWord";
import { Button } from "../../../components/Button";
import { SpeciesName } from "../../../components/Formula";
import { FormulaText } from "../../../components/FormulaText";
import { Remark } from "../../../components/text";
import { useAsking } from "./context";

/** Why there is no answer, and the way on: a total that a named mineral needs is given in one step, and can be changed like any other. */
export default function NotSolved() {
  const { inputs, edit, data, failure, solution, readOnly } = useAsking();
  if (!failure) return null;
  const missing = failure.code === "LIGAND_MISSING" ? missingTotals(inputs, data) : [];
  const wordOf = (component: string) => ligandWord(data, component, inputs.sulfateReduction);
  const kept = solution
    ? "The map still shows the last answer; nothing you entered is lost."
    : "Nothing you entered is lost.";
  if (missing.length === 0)
    return (
      <Remark className="mb-3 border-signal!">
        <p role="alert">
          <b>This cannot be solved.</b> <FormulaText text={failure.message} />.{" "}
          <span className="text-muted">
            At <span className="font-mono">{failure.path || "the plan"}</span>. {kept}
          </span>
        </p>
      </Remark>
    );
  return (
    <Remark className="mb-3 border-signal!">
      <div role="alert">
        <b>A total is missing.</b>
        {missing.map(({ component, species }) => (
          <p key={component}>
            {species.map((id, i) => (
              <span key={id}>
                {i > 0 && (i === species.length - 1 ? " and " : ", ")}
                <SpeciesName id={id} /> ({data.species.get(id)?.name})
              </span>
            ))}{" "}
            {species.length === 1 ? "holds" : "hold"} {wordOf(component)}, and the liquor says nothing of how much there
            is
            {inputs.sulfateReduction || component !== "S(sulfide)"
              ? ""
              : ": sulfate does not count as such while it is not reduced"}
            .
          </p>
        ))}
      </div>
      {!readOnly && (
        <Button className="my-1.5" onClick={() => edit((p) => withMissingTotals(p, data))}>
          Give {missing.map(({ component }) => wordOf(component)).join(", ")} {FIRST_TOTAL} mol/L
        </Button>
      )}
      <p className="text-sm text-muted">
        {!readOnly && "A start, not a measurement: it then stands under Lixiviant, where you change it. "}
        {kept}
      </p>
    </Remark>
  );
}
