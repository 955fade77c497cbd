import { presetCaution } from "../../../../shared/hazards/presetCautions";
import { FIRST_TOTAL } from "../../../../shared/plan/totals";
import { presetNames } from "../../../../shared/schemas/plan";
import { componentKind, SULFIDE_SULFUR } from "../../../../shared/selection/components";
import { Check } from "../../../components/choice";
import { FormulaText } from "../../../components/FormulaText";
import { Term } from "../../../components/Help";
import { Select } from "../../../components/Select";
import { Note, SectionHead } from "../../../components/text";
import { lixiviantName } from "../../../lib/planWords";
import { addTotal, setPreset, toggleIn } from "../model/edit";
import { componentLabel, Total } from "./Total";
import { useAsking } from "./context";
import { Fold } from "./Fold";
import { Refusal } from "./Refusal";

/** What dissolves: the liquor's ligands and their totals. */
export function LixiviantSection() {
  const { inputs, edit, data, readOnly } = useAsking();
  const note = data.tables.presets.find((r) => r.preset === inputs.preset)?.note ?? "";
  const sulfur = inputs.ligands.some((l) => l.component === "S");
  return (
    <section aria-label="Lixiviant" className="mt-5">
      <SectionHead aside={<Term word="total">totals</Term>}>Lixiviant</SectionHead>
      <Select
        label="Lixiviant"
        labelText="Liquor"
        readOnly={readOnly}
        value={inputs.preset}
        onChange={(preset) => edit(setPreset(preset, data))}
        options={presetNames.map((preset) => ({
          value: preset,
          label: lixiviantName[preset],
          note: <FormulaText text={presetCaution[preset]} />,
        }))}
      />
      {inputs.ligands.map((total) => (
        <Total key={total.component} list="ligands" {...total} />
      ))}
      <Refusal path="ligands" />
      {inputs.others.map((total) => (
        <Total key={total.component} list="others" {...total} />
      ))}
      <Refusal path="others" />
      {!readOnly && <AddComponent />}
      {sulfur && (
        <Check
          checked={inputs.sulfateReduction}
          disabled={readOnly}
          onChange={(sulfateReduction) => edit((p) => ({ ...p, sulfateReduction, ...onePool(p, sulfateReduction) }))}
        >
          <Term word="sulfateReduction">Sulfate reduction</Term>{" "}
          <span className="text-muted">{inputs.sulfateReduction ? "on" : "off (slow)"}</span>
        </Check>
      )}
      {note !== "" && (
        <Fold title="About this liquor" className="text-muted">
          <FormulaText text={note} />
        </Fold>
      )}
      <Dosed />
    </section>
  );
}

/** With the couple on, sulfur is one pool: a sulfide total of its own goes. */
const onePool = (p: { ligands: { component: string; activity: number }[] }, on: boolean) =>
  on ? { ligands: p.ligands.filter((l) => l.component !== SULFIDE_SULFUR) } : {};

function AddComponent() {
  const { inputs, edit, data } = useAsking();
  const used = new Set([...inputs.ligands, ...inputs.others].map((c) => c.component));
  const metals = new Set(inputs.metals.map((m) => m.element));
  const known = [...data.components.keys()].filter((c) => !used.has(c) && !metals.has(c));
  const ligands = known.filter((c) => componentKind(data, c) === "ligand");
  if (!used.has(SULFIDE_SULFUR) && !inputs.sulfateReduction) ligands.push(SULFIDE_SULFUR);
  const partners = known.filter((c) => componentKind(data, c) === "partner");
  const option = (kind: string) => (c: string) => ({
    value: c,
    label: componentLabel(data, c, false),
    text: c,
    note: kind,
  });
  return (
    <Select
      label="Add a ligand or another component"
      labelText={<span className="text-muted">Add to the liquor</span>}
      value=""
      onChange={(component) =>
        edit(
          addTotal(componentKind(data, component) === "partner" ? "others" : "ligands", {
            component,
            activity: FIRST_TOTAL,
          }),
        )
      }
      options={[...ligands.map(option("ligand")), ...partners.map(option("other component"))]}
    />
  );
}

/** Reagents whose metastable species count only while they are dosed, as the defaults name them. */
function Dosed() {
  const { inputs, edit, data, readOnly } = useAsking();
  const names = [...new Set(data.tables.defaults.flatMap(({ when }) => /unless_dosed:(\w+)/.exec(when)?.[1] ?? []))];
  return (
    <Fold
      title={
        <span className="text-muted">
          {inputs.dosed.length === 0 ? "No metastable reagent is dosed" : `Dosed: ${inputs.dosed.join(", ")}`}
        </span>
      }
    >
      <Note>Their species last long enough to count only while they are fed.</Note>
      {names.map((name) => (
        <Check
          key={name}
          checked={inputs.dosed.includes(name)}
          disabled={readOnly}
          onChange={() => edit(toggleIn("dosed", name))}
        >
          {name}
        </Check>
      ))}
    </Fold>
  );
}
