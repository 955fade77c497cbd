import { saturationPressure } from "../../../../shared/gibbs/water";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import { TEMPERATURE_RANGE_C } from "../../../../shared/schemas/problem";
import { kelvin } from "../../../../shared/units";
import { Term } from "../../../components/Help";
import { NumberField } from "../../../components/NumberField";
import { Select } from "../../../components/Select";
import { Slider } from "../../../components/Slider";
import { Note, SectionHead } from "../../../components/text";
import { withUnit } from "../../../lib/format";
import { waterBoundWord } from "../../../lib/planWords";
import { useAsking } from "./context";
import { PHBand } from "./PHBand";
import { Refusal } from "./Refusal";

export function TemperatureSection() {
  const { inputs, edit, settle, readOnly } = useAsking();
  return (
    <section aria-label="Temperature" className="mt-5">
      <SectionHead aside={<Term word="liquorTemperature">what follows it</Term>}>Temperature</SectionHead>
      <Slider
        label="Temperature of the liquor"
        labelText="Liquor"
        unit="°C"
        min={0}
        max={TEMPERATURE_RANGE_C.max}
        step={1}
        marks={[25, 60, 100, 150, 200]}
        value={inputs.temperatureC}
        show={(t) => String(t)}
        readOnly={readOnly}
        onChange={(temperatureC) => edit((p) => ({ ...p, temperatureC }), "temperature")}
        onCommit={settle}
        width={6}
      />
      {inputs.temperatureC > 100 && (
        <Note className="py-1">
          Saturation pressure of water{" "}
          <span className="font-mono whitespace-nowrap">
            {withUnit((saturationPressure(kelvin(inputs.temperatureC)) / 1e5).toFixed(2), "bar")}
          </span>
          , absolute: the vessel is closed, and every gas pressure is absolute too.
        </Note>
      )}
      <Refusal path="temperatureC" />
    </section>
  );
}

/** A lower and an upper end; each keeps a little off the other. */
function Ends({
  label,
  value,
  onCommit,
  digits,
  least,
  bounds,
  unit,
  step,
}: {
  label: string;
  value: readonly [number, number];
  onCommit: (value: [number, number]) => void;
  digits: number;
  least: number;
  bounds: readonly [number, number];
  unit?: string;
  step: number;
}) {
  const { readOnly } = useAsking();
  const shared = {
    layout: "bare" as const,
    width: 6,
    step,
    readOnly,
    show: (x: number) => x.toFixed(digits),
  };
  return (
    <div className="hairline flex items-baseline justify-between gap-2 py-1">
      <span>{label}</span>
      <span className="flex items-baseline gap-1.5">
        <NumberField
          {...shared}
          label={`${label}, from`}
          value={value[0]}
          min={bounds[0]}
          max={value[1] - least}
          onCommit={(lo) => onCommit([lo, value[1]])}
        />
        <span className="text-muted">to</span>
        <NumberField
          {...shared}
          label={`${label}, to`}
          value={value[1]}
          min={value[0] + least}
          max={bounds[1]}
          onCommit={(hi) => onCommit([value[0], hi])}
          {...(unit === undefined ? {} : { unit })}
        />
      </span>
    </div>
  );
}

export function FrameSection() {
  const { inputs, edit, scale } = useAsking();
  const { pH, Eh } = inputs.frame;
  const shown = (E: number) => scale.toShown(E);
  return (
    <section aria-label="Frame" className="mt-5">
      <SectionHead aside={`Eh vs ${scale.short}`}>
        <Term word="frame">Frame</Term>
      </SectionHead>
      <Ends
        label="pH"
        value={pH}
        digits={1}
        step={0.5}
        least={0.5}
        bounds={[-2, 16]}
        onCommit={(next) => edit((p) => ({ ...p, frame: { ...p.frame, pH: next } }))}
      />
      <Ends
        label="Eh"
        value={[shown(Eh[0]), shown(Eh[1])]}
        digits={scale.digits}
        step={scale.differenceToShown(0.1)}
        least={scale.differenceToShown(0.05)}
        bounds={[shown(-3), shown(3)]}
        unit={scale.unit}
        onCommit={([lo, hi]) =>
          edit((p) => ({ ...p, frame: { ...p.frame, Eh: [tidy(scale.fromShown(lo)), tidy(scale.fromShown(hi))] } }))
        }
      />
      <Refusal path="frame" />
    </section>
  );
}

const tidy = (volts: number) => Number(volts.toFixed(6));

type Water = PlanInputs["water"];

export function WaterSection() {
  const { inputs, edit, scale, readOnly } = useAsking();
  const { water } = inputs;
  const set = (change: Partial<Water>) => edit((p) => ({ ...p, water: { ...p.water, ...change } }));
  const overpotential = (which: "oxygenV" | "hydrogenV", label: string, sentence: string) => (
    <NumberField
      label={label}
      unit={scale.unit}
      value={scale.differenceToShown(water[which] ?? 0)}
      min={0}
      max={scale.differenceToShown(2)}
      step={scale.differenceToShown(0.05)}
      width={6}
      show={(x) => x.toFixed(scale.digits)}
      readOnly={readOnly}
      hint={sentence}
      onCommit={(x) => set({ [which]: tidy(scale.differenceFromShown(x)) })}
    />
  );
  return (
    <section aria-label="Water band" className="mt-5">
      <SectionHead aside={<Term word="waterBand">always drawn</Term>}>Water band</SectionHead>
      <Select
        label="Which water lines bound windows"
        labelText="Bounded by"
        readOnly={readOnly}
        value={water.bound}
        onChange={(bound) => set({ bound })}
        options={(["both", "upper", "lower", "none"] as const).map((bound) => ({
          value: bound,
          label: waterBoundWord[bound],
        }))}
      />
      {(water.bound === "both" || water.bound === "upper") &&
        overpotential("oxygenV", "Oxygen overpotential", "Raises the upper line: oxygen comes slowly.")}
      {(water.bound === "both" || water.bound === "lower") &&
        overpotential("hydrogenV", "Hydrogen overpotential", "Lowers the lower line, as on zinc or lead.")}
      {water.bound === "none" && <Note>Hydrogen is then a loss and a hazard, not a limit.</Note>}
      <Refusal path="water" />
    </section>
  );
}

export function BandsSection() {
  const { inputs, edit, scale, readOnly } = useAsking();
  const { controlBand: band } = inputs;
  return (
    <section aria-label="Control bands" className="mt-5">
      <SectionHead aside={<Term word="controlBand">of the loop</Term>}>Control bands</SectionHead>
      <PHBand />
      <NumberField
        label="Control band of Eh"
        labelText="Eh ±"
        unit={scale.unit}
        value={scale.differenceToShown(band.Eh)}
        above={0}
        max={scale.differenceToShown(1)}
        step={scale.differenceToShown(0.005)}
        width={6}
        show={(x) => x.toFixed(scale.digits === 0 ? 0 : 3)}
        readOnly={readOnly}
        onCommit={(x) =>
          edit((p) => ({ ...p, controlBand: { ...p.controlBand, Eh: tidy(scale.differenceFromShown(x)) } }))
        }
      />
      <Refusal path="controlBand" />
    </section>
  );
}
