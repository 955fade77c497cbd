import { useDeferredValue, useMemo } from "react";
import { Link } from "react-router-dom";
import { reagentById } from "../../../../shared/reach/reagents";
import type { Demand } from "../../../../shared/reactions/demand";
import { planReaction, startsOf, staysAsItIs, staysWords } from "../../../../shared/reactions/ofPlan";
import { type RedoxReagent, redoxReagents } from "../../../../shared/reactions/redoxReagents";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Problem } from "../../../../shared/schemas/problem";
import type { SetPoint, Solution } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { Formula, SpeciesName } from "../../../components/Formula";
import { FormulaText } from "../../../components/FormulaText";
import { PlainTable } from "../../../components/PlainTable";
import { Quantity } from "../../../components/Quantity";
import { Select, type SelectOption } from "../../../components/Select";
import { Note } from "../../../components/text";
import { celsius, fixed, significant } from "../../../lib/format";
import { Fold } from "../asks/Fold";
import type { Edit } from "../model/edit";
import { chooseProduct, chooseRedox } from "../model/overallEdit";
import { Products } from "./Products";
import { Reaction } from "./Reaction";

interface OverallProps {
  problem: Problem;
  inputs: PlanInputs;
  solution: Solution;
  setPoint: SetPoint;
  data: ChemicalData;
  onInputs?: ((edit: Edit) => void) | undefined;
}

export default function OverallList(props: OverallProps) {
  const starts = startsOf(props.inputs, props.solution, props.data);
  if (starts.length === 0) return <Note className="py-1">Name a feed mineral to see what it takes.</Note>;
  return (
    <>
      <ul>
        {starts.map((from) => (
          <Overall key={from} from={from} {...props} />
        ))}
      </ul>
      <Note className="py-1">
        What rules at the set point is the product unless another is chosen, as where a hydroxide or a jarosite comes
        out before the stable oxide, or sulfur lasts where sulfate would be stable. log K says how far, never how fast;
        feed, gangue and losses take more than the reaction does. <Link to="/reactions">Any other reaction</Link>
      </Note>
    </>
  );
}

const nameOf = (r: RedoxReagent): string => reagentById.get(r.id)?.name ?? r.used;

function Overall({ from, problem, inputs, setPoint, data, onInputs }: OverallProps & { from: string }) {
  const pH = useDeferredValue(setPoint.pH);
  const Eh = useDeferredValue(setPoint.Eh);
  const { overall, preset, metals } = inputs;
  const { electrons, redox, chosen, rules, outcome } = useMemo(
    () => planReaction(problem, data, { overall, preset, metals }, { pH, Eh }, from),
    [problem, data, overall, preset, metals, pH, Eh, from],
  );
  const byHand = Object.keys(chosen).length > 0;
  const options: SelectOption<string>[] = [
    { value: "open", label: "none: electrons stay" },
    ...redoxReagents
      .filter((r) => (electrons > 0 ? r.role === "oxidant" : r.role !== "oxidant"))
      .map((r) => ({ value: r.id, label: <Formula formula={nameOf(r)} />, text: nameOf(r), note: r.role })),
  ];
  const products = (
    <Products
      {...{ from, data, redox, rules, chosen }}
      sulfateReduction={problem.sulfateReduction ?? problem.temperatureC >= 150}
      onChoose={onInputs && ((component, product) => onInputs(chooseProduct(from, component, product)))}
    />
  );
  if (!byHand && staysAsItIs(outcome))
    return (
      <li className="hairline py-1.5">
        <b>
          <SpeciesName id={from} withPhase />
        </b>{" "}
        {staysWords(from, data)}.{onInputs && <Fold title="choose what it becomes">{products}</Fold>}
      </li>
    );
  return (
    <li className="hairline py-1.5">
      <div className="font-bold">
        <SpeciesName id={from} withPhase />
      </div>
      {redox !== null && (
        <Select
          label={`What ${electrons > 0 ? "takes" : "gives"} the electrons of ${from}`}
          labelText={electrons > 0 ? "oxidant" : "reductant"}
          readOnly={onInputs === undefined}
          value={redox}
          onChange={(next) => onInputs?.(chooseRedox(from, next))}
          options={options}
        />
      )}
      {products}
      {outcome.ok ? (
        <>
          <p className="py-1 leading-relaxed">
            <Reaction terms={outcome.value.terms} />
          </p>
          {outcome.value.demand.length > 0 && <DemandTable demand={outcome.value.demand} metal={outcome.value.metal} />}
          <p className="pt-1 text-sm text-muted">
            log K {fixed(outcome.value.energetics.logK, 1)} at {celsius(problem.temperatureC)}
            {outcome.value.energetics.grade && <>, worst grade {outcome.value.energetics.grade}</>}
            {outcome.value.assumed.map((a) => (
              <span key={a.component}>
                ; <Formula formula={a.component} /> taken at {significant(a.activity, 1)}
              </span>
            ))}
            .
          </p>
          {outcome.value.energetics.warnings.map((warning) => (
            <p key={warning} className="text-sm">
              <FormulaText text={warning} />
            </p>
          ))}
        </>
      ) : (
        <p className={byHand ? "border-l-4 border-ink pl-3 text-sm" : "text-sm text-muted"} role="status">
          {byHand && <b>This cannot be written. </b>}
          <FormulaText text={outcome.error.message} />.
        </p>
      )}
    </li>
  );
}

function DemandTable({ demand, metal }: { demand: readonly Demand[]; metal: string | null }) {
  const short = (x: number) => <Quantity value={x} figures={3} />;
  return (
    <PlainTable<Demand>
      caption="Reagents of the reaction"
      className="text-xs"
      rows={demand}
      rowKey={(row) => `${row.role} ${row.formula} ${row.direction}`}
      columns={[
        {
          header: "reagent",
          cell: (row) => (
            <>
              <Formula formula={row.formula} />
              {row.direction === "made" && <span className="text-muted"> made</span>}
            </>
          ),
        },
        { header: "mol/mol", number: true, cell: (row) => short(row.molPerMol) },
        {
          header: metal ? `kg/kg ${metal}` : "kg/kg",
          number: true,
          cell: (row) => (row.kgPerKgMetal === null ? "" : short(row.kgPerKgMetal)),
        },
        { header: "kg/t", number: true, cell: (row) => short(row.kgPerTonne) },
      ]}
    />
  );
}
