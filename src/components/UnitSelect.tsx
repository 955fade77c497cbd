import { unitText } from "../lib/units";
import { Select } from "./Select";

/** The unit of a typed number: a word where there is one, a list where there are several. */
export function UnitSelect({
  label,
  units,
  value,
  onChange,
  readOnly = false,
}: {
  /** of what: "unit of the wet mass" */
  label: string;
  units: readonly string[];
  value: string;
  onChange: (unit: string) => void;
  readOnly?: boolean;
}) {
  if (readOnly || units.length < 2) return <span className="font-mono text-base text-muted">{unitText(value)}</span>;
  return (
    <Select
      label={label}
      layout="bare"
      value={value}
      onChange={onChange}
      options={units.map((unit) => ({ value: unit, label: unitText(unit), text: unit }))}
    />
  );
}
