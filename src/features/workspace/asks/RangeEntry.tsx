import { Button } from "../../../components/Button";
import { NumberField } from "../../../components/NumberField";
import { inputTextExact } from "../../../lib/format";
import { useAsking } from "./context";

export interface RangeEntryProps {
  label: string;
  range: readonly [number, number];
  /** null: no longer over a range */
  onChange: (range: [number, number] | null) => void;
  unit?: string;
  min?: number;
  max?: number;
  above?: number;
  step?: number;
  factor?: number;
}

/** Both ends of a range over which a window is to hold. */
export default function RangeEntry({ label, range, onChange, ...field }: RangeEntryProps) {
  const { readOnly } = useAsking();
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
