import { TEMPERATURE_RANGE_C } from "../../../../shared/schemas/problem";
import { Button } from "../../../components/Button";
import { Term } from "../../../components/Help";
import { NumberField } from "../../../components/NumberField";
import { Note, SectionHead } from "../../../components/text";
import { inputTextExact } from "../../../lib/format";
import { setActivityRange, setTemperatureRange } from "../model/adviceEdit";
import { useAsking } from "./context";
import { Refusal } from "./Refusal";

type Range = readonly [number, number];

/** A range that is either not asked for, or has two ends. */
function RangeRow({
  label,
  range,
  start,
  onChange,
  ...field
}: {
  label: string;
  range: Range | undefined;
  /** what it starts from when somebody asks for it */
  start: [number, number];
  onChange: (range: [number, number] | null) => void;
  unit?: string;
  min?: number;
  max?: number;
  above?: number;
  step?: number;
  factor?: number;
}) {
  const { readOnly } = useAsking();
  if (range === undefined) {
    if (readOnly) return null;
    return (
      <div className="hairline flex items-baseline justify-between gap-2 py-1">
        <span>{label}</span>
        <Button
          kind="quiet"
          className="h-auto!"
          aria-label={`Hold over a range of ${label}`}
          onClick={() => onChange(start)}
        >
          as it is
        </Button>
      </div>
    );
  }
  const [lo, hi] = range;
  const { min, max, unit, ...steps } = field;
  const shared = { ...steps, layout: "bare" as const, width: 7, readOnly, show: inputTextExact };
  return (
    <div className="hairline py-1">
      <div className="flex items-baseline justify-between gap-2">
        <span>{label}</span>
        {!readOnly && (
          <Button
            kind="quiet"
            className="h-auto!"
            aria-label={`Let go of the range of ${label}`}
            onClick={() => onChange(null)}
          >
            let go
          </Button>
        )}
      </div>
      <span className="flex flex-wrap items-baseline justify-end gap-x-1.5">
        <NumberField
          {...shared}
          label={`${label}, held from`}
          value={lo}
          {...(min === undefined ? {} : { min })}
          max={hi}
          onCommit={(next) => onChange([next, hi])}
        />
        <span className="text-muted">to</span>
        <NumberField
          {...shared}
          label={`${label}, held to`}
          value={hi}
          min={lo}
          {...(max === undefined ? {} : { max })}
          {...(unit === undefined ? {} : { unit })}
          onCommit={(next) => onChange([lo, next])}
        />
      </span>
    </div>
  );
}

/** The ranges over which a window is to hold: nobody's temperature and tenors stand still. */
export function HoldOverSection() {
  const { inputs, edit, solution, readOnly } = useAsking();
  const { ranges, temperatureC } = inputs;
  if (readOnly && ranges === undefined) return null;
  const { min, max } = TEMPERATURE_RANGE_C;
  const solved = new Map(solution?.metals.map((m) => [m.metal, m.activity]));
  return (
    <section aria-label="Hold over" className="mt-5">
      <SectionHead aside={<Term word="robustWindow">ranges</Term>}>Hold over</SectionHead>
      <RangeRow
        label="Temperature"
        range={ranges?.temperatureC}
        start={[Math.max(min, temperatureC - 5), Math.min(max, temperatureC + 5)]}
        onChange={(range) => edit(setTemperatureRange(range))}
        unit="°C"
        min={min}
        max={max}
        step={1}
      />
      {inputs.metals
        .filter((m) => m.requirement !== "free")
        .map((m) => {
          const activity = solved.get(m.element) ?? m.value;
          const round = (x: number) => Number(x.toPrecision(2));
          return (
            <RangeRow
              key={m.element}
              label={`Activity of ${m.element}`}
              range={ranges?.activities?.[m.element]}
              start={[round(activity / 3), round(activity * 3)]}
              onChange={(range) => edit(setActivityRange(m.element, range))}
              above={0}
              factor={1.1}
            />
          );
        })}
      {inputs.metals.some((m) => m.entry === "gPerL" && ranges?.activities?.[m.element]) && (
        <Note>A tenor in g/L counts here by its activity: mol/L times gamma.</Note>
      )}
      <Refusal path="ranges" />
    </section>
  );
}
