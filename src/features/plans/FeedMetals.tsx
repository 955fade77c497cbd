import { useMemo } from "react";
import { toProblem } from "../../../shared/plan/toProblem";
import type { PlanInputs } from "../../../shared/schemas/plan";
import { roles } from "../../../shared/schemas/problem";
import { solve } from "../../../shared/solve";
import { marginWords } from "../../../shared/windows/limitWords";
import { ligandWord } from "../../../shared/words/componentWord";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { tenorInput } from "../../../shared/words/tenor";
import { Check } from "../../components/choice";
import { SpeciesName } from "../../components/Formula";
import { FormulaText } from "../../components/FormulaText";
import { Term } from "../../components/Help";
import { NumberField } from "../../components/NumberField";
import { Select } from "../../components/Select";
import { Note, Remark, SectionHead } from "../../components/text";
import { presetLigands } from "../../lib/presetLigands";
import { counted, fixed, inputText, significant, withUnit } from "../../lib/format";
import type { LineEdit, ShownLine } from "./feedLines";

interface FeedMetalsProps {
  lines: readonly ShownLine[];
  edit: (element: string, change: LineEdit) => void;
  minerals: { known: readonly string[]; unknown: readonly string[] };
  without: ReadonlySet<string>;
  onMineral: (id: string, on: boolean) => void;
  /** the plan as it would be; null without a metal */
  inputs: PlanInputs | null;
  data: ChemicalData;
  solidsPct: number;
  /** of a sulfate liquor, mol/L; null in others */
  sulfate: { total: number; typed: boolean; onChange: (total: number) => void } | null;
}

const asks = { target: "carry", gangue: "at most", watched: "at" } as const;

/** The metals and minerals of a feed as lines of a plan, and the window they give. */
export function FeedMetals({
  lines,
  edit,
  minerals,
  without,
  onMineral,
  inputs,
  data,
  solidsPct,
  sulfate,
}: FeedMetalsProps) {
  return (
    <>
      <section aria-label="Metals of the plan">
        <SectionHead aside={<Term word="fromHead">head, extraction, tenor</Term>}>Metals</SectionHead>
        {lines.map((line) => (
          <MetalRow key={line.element} line={line} data={data} edit={(change) => edit(line.element, change)} />
        ))}
        <Note className="pt-1.5">
          Tenor = head × solids / (1 − solids) × extraction at {solidsPct} % w/w solids, a litre of liquor taken as a
          kilogram, gamma 1.
        </Note>
        {sulfate && (
          <NumberField
            label="Sulfate, total"
            value={sulfate.total}
            show={(x) => inputText(x, 2)}
            onCommit={sulfate.onChange}
            unit="mol/L"
            above={0}
            max={100}
            factor={1.05}
            {...(sulfate.typed
              ? {}
              : { hint: "what the metals dissolved bring with them, or the preset’s where that is more" })}
          />
        )}
      </section>
      {(minerals.known.length > 0 || minerals.unknown.length > 0) && (
        <section aria-label="Minerals of the plan">
          <SectionHead>Minerals</SectionHead>
          <div className="grid grid-cols-2 gap-x-4">
            {minerals.known.map((id) => (
              <Check key={id} label={id} checked={!without.has(id)} onChange={(on) => onMineral(id, on)}>
                <SpeciesName id={id} />
              </Check>
            ))}
          </div>
          {minerals.unknown.length > 0 && (
            <Note>Not in the chemistry library, so not drawn: {minerals.unknown.join(", ")}.</Note>
          )}
          {inputs !== null && <BroughtIn inputs={inputs} data={data} />}
        </section>
      )}
      {inputs === null ? (
        <Remark>
          <p role="alert">No metal is left: a plan asks about at least one.</p>
        </Remark>
      ) : (
        <Preview inputs={inputs} data={data} />
      )}
    </>
  );
}

/** Totals that the liquor has only because a mineral needs them. */
function BroughtIn({ inputs, data }: { inputs: PlanInputs; data: ChemicalData }) {
  const usual = new Set(presetLigands(data, inputs.preset).map((l) => l.component));
  const brought = [...inputs.ligands, ...inputs.others].filter((t) => !usual.has(t.component));
  if (brought.length === 0) return null;
  return (
    <Note>
      For these minerals the liquor starts with{" "}
      {brought
        .map((t) => `${t.activity} mol/L ${ligandWord(data, t.component, inputs.sulfateReduction)}`)
        .join(" and ")}
      : a start, not a measurement; change it in the plan.
    </Note>
  );
}

function MetalRow({
  line: { element, role, extraction, gPerL, drawn, head, typedTenor },
  data,
  edit,
}: {
  line: ShownLine;
  data: ChemicalData;
  edit: (change: LineEdit) => void;
}) {
  const mass = data.molarMass.get(element);
  return (
    <div className="hairline flex flex-wrap items-center gap-x-3 gap-y-1 py-1">
      <input
        type="checkbox"
        aria-label={`Draw ${element}`}
        className="h-3.5 w-3.5 accent-verdigris"
        checked={drawn}
        onChange={(event) => edit({ drawn: event.target.checked })}
      />
      <b className={role === "target" ? "w-7 text-copper" : "w-7"}>{element}</b>
      <span className="w-24 font-mono text-sm" title={head.remark ?? "head assay"}>
        {head.typed}
      </span>
      <span className="w-24">
        <Select
          label={`Role of ${element}`}
          layout="bare"
          value={role}
          onChange={(next) => edit({ role: next })}
          options={roles.map((value) => ({ value, label: value }))}
        />
      </span>
      <NumberField
        label={`Extraction of ${element}`}
        layout="bare"
        value={Number((extraction * 100).toPrecision(4))}
        onCommit={(pct) => edit({ extraction: pct / 100 })}
        unit="%"
        above={0}
        max={100}
        step={1}
        width={6}
        readOnly={typedTenor}
      />
      <span className="flex-1 text-right text-sm text-muted">{asks[role]}</span>
      <NumberField
        label={`Tenor of ${element}`}
        layout="bare"
        value={gPerL}
        show={(x) => tenorInput(Number(x.toPrecision(3)), 3)}
        onCommit={(next) => edit({ gPerL: next })}
        unit="g/L"
        above={0}
        max={1000}
        factor={1.05}
        width={8}
      />
      <span className="w-28 text-right text-sm text-muted">
        {mass === undefined ? "" : `activity ${significant(gPerL / mass)}`}
      </span>
      {head.remark !== null && <span className="basis-full pl-6 text-sm text-muted">{head.remark}</span>}
    </div>
  );
}

/** What the plan would show: the same solver as on the map. */
function Preview({ inputs, data }: { inputs: PlanInputs; data: ChemicalData }) {
  const outcome = useMemo(() => solve(toProblem(inputs, data), data), [inputs, data]);
  if (!outcome.ok)
    return (
      <Remark className="border-signal!">
        <p role="alert">
          <b>This cannot be solved yet.</b> <FormulaText text={outcome.error.message} />. Untick what is named, or
          change it.
        </p>
      </Remark>
    );
  const { windows } = outcome.value;
  const [best] = windows;
  return (
    <p role="status" aria-label="Window" className="border-l-4 border-verdigris bg-sheet px-3 py-1.5">
      {best ? (
        <>
          <b>{counted(windows.length, "window")}.</b> The best runs from pH {fixed(best.pH[0], 1)} to{" "}
          {fixed(best.pH[1], 1)} and {fixed(best.Eh[0], 2)} to {withUnit(fixed(best.Eh[1], 2), "V")} vs SHE; set point
          pH {fixed(best.setPoint.pH, 2)}, margin {fixed(best.setPoint.margin, 1)} {marginWords(best.setPoint)}.
        </>
      ) : (
        <>
          <b>No window yet.</b> The plan itself says which requirements clash and what smallest change would open one.
        </>
      )}
    </p>
  );
}
