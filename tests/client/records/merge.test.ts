import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { merge, putAt, same } from "../../../src/lib/merge";
import { runs } from "../../support/fuzz";

const entry = (text: string, unit = "g") => ({ text, unit });

describe("two changed copies of one record", () => {
  test("what only one of them changed is taken", () => {
    const base = { a: 1, b: 2, c: { d: 3, e: 4 } };
    const { merged, conflicts } = merge(base, { ...base, a: 10 }, { ...base, c: { d: 3, e: 40 } });
    expect(merged).toEqual({ a: 10, b: 2, c: { d: 3, e: 40 } });
    expect(conflicts).toEqual([]);
  });

  test("what both changed differently is a conflict, and stands as yours", () => {
    const { merged, conflicts } = merge({ wet: entry("120") }, { wet: entry("121") }, { wet: entry("119") });
    expect(merged).toEqual({ wet: entry("121") });
    expect(conflicts).toEqual([{ path: "wet", base: entry("120"), yours: entry("121"), theirs: entry("119") }]);
  });

  test("text and unit of a typed number are one thing", () => {
    const { conflicts } = merge({ v: entry("1", "L") }, { v: entry("1000", "L") }, { v: entry("1", "mL") });
    expect(conflicts.map(({ path }) => path)).toEqual(["v"]);
  });

  test("rows added at the end by both are all kept, theirs first, one of two equal ones", () => {
    const base = [{ at: "0" }];
    const { merged, conflicts } = merge(base, [...base, { at: "1" }, { at: "2" }], [...base, { at: "1" }, { at: "3" }]);
    expect(merged).toEqual([{ at: "0" }, { at: "1" }, { at: "3" }, { at: "2" }]);
    expect(conflicts).toEqual([]);
  });

  test("a row taken out by one and changed by the other is a conflict of the whole list", () => {
    const { conflicts } = merge([{ at: "0" }, { at: "1" }], [{ at: "0" }], [{ at: "0" }, { at: "9" }]);
    expect(conflicts.map(({ path }) => path)).toEqual([""]);
  });

  test("a conflict deep in a list names its place", () => {
    const row = (pH: string) => ({ readings: [{ pH: entry(pH, "pH") }] });
    expect(merge(row("1"), row("2"), row("3")).conflicts[0]?.path).toBe("readings.0.pH");
  });

  test("taking theirs puts it at its path", () => {
    expect(putAt({ a: [{ b: 1 }, { b: 2 }] }, "a.1.b", 9)).toEqual({ a: [{ b: 1 }, { b: 9 }] });
  });

  const record = fc.record({
    a: fc.nat(3),
    list: fc.array(fc.nat(3), { maxLength: 3 }),
    deep: fc.record({ x: fc.nat(3) }),
  });
  test("against an unchanged copy, the changed one is taken whole, without a conflict", () =>
    fc.assert(
      fc.property(record, record, (base, changed) => {
        for (const [yours, theirs] of [[changed, base], [base, changed]] as const) {
          const { merged, conflicts } = merge(base, yours, theirs);
          expect(conflicts).toEqual([]);
          expect(same(merged, changed)).toBe(true);
        }
      }),
      runs(300),
    )); // prettier-ignore
});
