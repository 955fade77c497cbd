import { reagents, type ReagentKind } from "../../../../shared/reach/reagents";
import { Check } from "../../../components/choice";
import { Formula } from "../../../components/Formula";
import { NumberField } from "../../../components/NumberField";
import { Note } from "../../../components/text";
import { inputTextExact } from "../../../lib/format";
import { setCircuit, toggleReagent } from "../model/circuitEdit";
import { useAsking } from "./context";
import { Refusal } from "./Refusal";

const groups: readonly [ReagentKind, string][] = [
  ["oxidant", "Oxidants in use"],
  ["reductant", "Reductants in use"],
  ["cementing metal", "Cementing metals in use"],
];

/** The answers to what the cautions ask about; each is an edit of the plan. */
export default function AroundFields() {
  const { inputs, edit, readOnly } = useAsking();
  const { sxOrganic = false, oxygenKPa, reagents: inUse = [] } = inputs.circuit ?? {};
  return (
    <>
      <Note>The window does not see these; the cautions do.</Note>
      <Check
        checked={sxOrganic}
        disabled={readOnly}
        onChange={(on) => edit(setCircuit({ sxOrganic: on ? true : undefined }))}
        hint="this liquor meets it, or comes back from it"
      >
        Solvent extraction organic
      </Check>
      <NumberField
        label="Oxygen partial pressure"
        unit="kPa"
        value={oxygenKPa ?? null}
        min={0}
        max={10_000}
        step={10}
        width={7}
        show={inputTextExact}
        readOnly={readOnly}
        onCommit={(kPa) => edit(setCircuit({ oxygenKPa: kPa }))}
        onClear={() => edit(setCircuit({ oxygenKPa: undefined }))}
        hint="in the vessel, absolute; empty: open to air"
      />
      {groups.map(([kind, title]) => (
        <fieldset key={kind}>
          <legend className="pt-1 font-mono text-xs font-bold">{title}</legend>
          {reagents
            .filter((r) => r.kind === kind)
            .map(({ id, name }) => (
              <Check
                key={id}
                label={`${name} is in use as ${kind}`}
                checked={inUse.includes(id)}
                disabled={readOnly}
                onChange={() => edit(toggleReagent(id))}
              >
                <Formula formula={name} />
              </Check>
            ))}
        </fieldset>
      ))}
      <Refusal path="circuit" />
    </>
  );
}
