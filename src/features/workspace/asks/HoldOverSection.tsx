import { lazy, Suspense } from "react";
import { TEMPERATURE_RANGE_C } from "../../../../shared/schemas/problem";
import { Button } from "../../../components/Button";
import { Term } from "../../../components/Help";
import { Note, SectionHead } from "../../../components/text";
import { setActivityRange, setTemperatureRange } from "../model/adviceEdit";
import { useAsking } from "./context";
import type { RangeEntryProps } from "./RangeEntry";
import { Refusal } from "./Refusal";

// Most plans hold over nothing.
const RangeEntry = lazy(() => import("./RangeEntry"));

/** A range that is either not asked for, or has two ends. */
function RangeRow({
  range,
  start,
  ...entry
}: Omit<RangeEntryProps, "range"> & {
  range: RangeEntryProps["range"] | undefined;
  /** what it starts from when somebody asks for it */
  start: [number, number];
}) {
  const { readOnly } = useAsking();
  const { label, onChange } = entry;
  if (range !== undefined)
    return (
      <Suspense fallback={null}>
        <RangeEntry {...entry} range={range} />
      </Suspense>
    );
  if (readOnly) return null;
  return (
    <div className="hairline flex items-baseline justify-between gap-2 py-1 pointer-coarse:py-3">
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
