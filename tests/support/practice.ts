import { readFileSync } from "node:fs";

interface Quantity {
  value: number;
  unit: string;
}
export interface PracticeCheck {
  id: string;
  topic: string;
  inputs: Record<string, unknown>;
  expected: Record<string, Quantity | number | boolean>;
  tolerance: { rel?: number; abs?: number; rule?: string };
}

const checks = JSON.parse(readFileSync("tests/golden/practice-checks.json", "utf8")) as PracticeCheck[];

/** One check of tests/golden/practice-checks.json. */
export function practiceCheck(id: string) {
  const check = checks.find((c) => c.id === id);
  if (check === undefined) throw new Error(`no practice check ${id}`);
  const number = (from: Record<string, unknown>, key: string): number => {
    const value = from[key];
    const plain = typeof value === "object" && value !== null && "value" in value ? value.value : value;
    if (typeof plain !== "number") throw new Error(`${id}: no number ${key}`);
    return plain;
  };
  return {
    input: (key: string) => number(check.inputs, key),
    list: (key: string) => check.inputs[key] as number[],
    keys: () => Object.keys(check.expected),
    expected: (key: string) => number(check.expected, key),
    /** allowed difference from an expected value */
    within: (key: string) => check.tolerance.abs ?? (check.tolerance.rel ?? 0) * Math.abs(number(check.expected, key)),
  };
}
