import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { cases, later } from "./practiceCases";

/** Worked examples of the trade, each with its source in the file; R rows are operating ranges, S rows exposure limits. */
interface Check {
  id: string;
  topic: string;
  expected: Record<string, number | boolean | { value?: number; max?: number; unit: string }>;
  tolerance: { rel?: number; abs?: number; rule?: string };
  source: string;
  from_memory: boolean;
}
const checks = JSON.parse(readFileSync(new URL("./practice-checks.json", import.meta.url), "utf8")) as Check[];
const formulas = checks.filter(({ id }) => id.startsWith("F"));

test("every formula of the file is either answered here or named as later work", () => {
  expect([...Object.keys(cases), ...Object.keys(later)].sort()).toEqual(formulas.map(({ id }) => id).sort());
});

const answered = formulas.filter(({ id }) => id in cases);
describe.each(answered.map((check) => [`${check.id} ${check.topic}`, check] as const))("%s", (_, check) => {
  const memory = check.from_memory ? ", from memory" : "";
  const found = cases[check.id]!();
  test("answers every value and no other", () =>
    expect(Object.keys(found).sort()).toEqual(Object.keys(check.expected).sort()));
  test.each(Object.entries(check.expected))(`%s — ${check.source}${memory}`, (name, expected) => {
    const got = found[name];
    if (typeof expected !== "object") {
      expect(got).toBe(expected);
      return;
    }
    const want = expected.value!;
    const { rel = check.tolerance.rule ? 1e-3 : 0, abs = 0 } = check.tolerance;
    expect(Math.abs((got as number) - want)).toBeLessThanOrEqual(Math.max(abs, rel * Math.abs(want)));
  });
});
