import { unitText } from "../lib/units";

const isEntry = (value: object): value is { text: string; unit: string } =>
  Object.keys(value).length === 2 && "text" in value && "unit" in value;

/** A field of a record as one reads it: a typed number with its unit, "empty" for what was not filled in. */
export function valueText(value: unknown): string {
  if (value === undefined || value === null || value === "") return "empty";
  if (typeof value === "boolean") return value ? "yes" : "no";
  if (typeof value === "string" || typeof value === "number") return String(value);
  if (Array.isArray(value)) return value.length === 0 ? "none" : value.map(valueText).join(", ");
  if (typeof value !== "object") return "";
  if (isEntry(value)) return value.text.trim() === "" ? "empty" : `${value.text} ${unitText(value.unit)}`.trim();
  const parts = Object.values(value)
    .map(valueText)
    .filter((part) => part !== "empty" && part !== "none" && part !== "no");
  return parts.length === 0 ? "empty" : parts.join(", ");
}
