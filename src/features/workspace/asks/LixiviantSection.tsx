import { presetCaution } from "../../../../shared/hazards/presetCautions";
import { presetNames } from "../../../../shared/schemas/plan";
import { componentKind, SULFIDE_SULFUR } from "../../../../shared/selection/components";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { Button } from "../../../components/Button";
import { Check } from "../../../components/choice";
import { ComponentName } from "../../../components/ComponentName";
import { FormulaText } from "../../../components/FormulaText";
import { Term } from "../../../components/Help";
import { Select } from "../../../components/Select";
import { LogSlider } from "../../../components/Slider";
import { Note, SectionHead } from "../../../components/text";
import { lixiviantName } from "../../../lib/planWords";
import { addTotal, removeTotal, setPreset, setTotal, toggleIn } from "../model/edit";
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
      <SectionHead aside={<Term word="activity">activities</Term>}>Lixiviant</SectionHead>
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
      {inputs.ligands.map(({ component, activity }) => (
        <Total key={component} list="ligands" component={component} activity={activity} />
      ))}
      <Refusal path="ligands" />
      {inputs.others.map(({ component, activity }) => (
        <Total key={component} list="others" component={component} activity={activity} />
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

const componentLabel = (data: ChemicalData, component: string, reduced: boolean) => {
  if (component === SULFIDE_SULFUR) return <>S sulfide</>;
  if (component === "S") return <>{reduced ? "S sulfur, all" : "S sulfate"}</>;
  return <ComponentName data={data} component={component} />;
};

function Total({ list, component, activity }: { list: "ligands" | "others"; component: string; activity: number }) {
  const { inputs, edit, settle, data, readOnly } = useAsking();
  return (
    <div className="group relative">
      <LogSlider
        label={`Total of ${component}`}
        labelText={
          <>
            {componentLabel(data, component, inputs.sulfateReduction)}
            {!readOnly && (
              <Button
                kind="quiet"
                className="ml-2 h-auto! text-xs! font-normal! text-muted"
                aria-label={`Remove ${component} from the liquor`}
                onClick={() => edit(removeTotal(list, component))}
              >
                remove
              </Button>
            )}
          </>
        }
        value={activity}
        min={1e-4}
        max={10}
        typedMax={100}
        readOnly={readOnly}
        onChange={(value) => edit(setTotal(list, component, value), `total ${component}`)}
        onCommit={settle}
        width={8}
      />
    </div>
  );
}

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
          addTotal(componentKind(data, component) === "partner" ? "others" : "ligands", { component, activity: 0.01 }),
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
