import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { measure, numberIn } from "../../../shared/entry/measure";
import { quantities, unitsOf, type QuantityName } from "../../../shared/entry/quantities";
import { readEntry } from "../../../shared/entry/readEntry";

describe("what is typed", () => {
  test.each([
    ["3.95", 3.95],
    ["1,52", 1.52],
    [" 0.5 ", 0.5],
    ["−12", -12],
    ["–12", -12],
    ["5e-2", 0.05],
    ["8×10^-2", 0.08],
    ["10^-5", 1e-5],
    [".5", 0.5],
    ["1 250", 1250],
    ["+3", 3],
  ])("%s is a value", (text, value) => {
    expect(readEntry(text)).toEqual({ kind: "value", value: expect.closeTo(value, 12) as number });
  });
  test.each(["", "   ", "-", "–", "n.a.", "N/A", "LNR", "ns"])("%o was not measured, and is not zero", (text) => {
    expect(readEntry(text)).toEqual({ kind: "blank" });
  });
  test("limits keep their side", () => {
    expect(readEntry("<0,01")).toEqual({ kind: "less", limit: 0.01 });
    expect(readEntry("< 0.01")).toEqual({ kind: "less", limit: 0.01 });
    expect(readEntry(">5")).toEqual({ kind: "more", limit: 5 });
  });
  test.each(["1.000,5", "1,000.5", "about 5", "<0", "<-1", "5 g", "1e999", "--", "<", "n.d."])(
    "%s is refused with a reason",
    (text) => {
      const found = readEntry(text);
      expect(found.kind).toBe("bad");
      expect(found.kind === "bad" && found.why).toMatch(/./);
    },
  );
  test("every number JavaScript prints plainly is read back, with a point or a comma", () => {
    fc.assert(
      fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), fc.integer({ min: 0, max: 9 }), (x, digits) => {
        const text = x.toFixed(digits);
        const value = Number(text);
        expect(readEntry(text)).toEqual({ kind: "value", value });
        expect(readEntry(text.replace(".", ","))).toEqual({ kind: "value", value });
        expect(readEntry(text.replace("-", "\u2212"))).toEqual({ kind: "value", value });
      }),
    );
  });
  test("whatever is typed, something is answered and nothing is thrown", () => {
    fc.assert(
      fc.property(fc.string(), (text) => ["blank", "value", "less", "more", "bad"].includes(readEntry(text).kind)),
    );
  });
});

describe("in base units", () => {
  const value = (text: string, unit: string, quantity: QuantityName, context = {}) => {
    const found = measure({ text, unit }, quantity, context);
    return found.kind === "value" ? found.value : found;
  };
  test.each([
    ["1.52", "%", "solidAssay", 0.0152],
    ["2.35", "g/t", "solidAssay", 2.35e-6],
    ["1", "oz/st", "solidAssay", 34.285717e-6], // troy ounce and short ton of NIST SP 811
    ["558", "mg/L", "solutionAssay", 0.558],
    ["1.000", "kg", "mass", 1000],
    ["10", "mL", "volume", 0.01],
    ["90", "min", "time", 1.5],
    ["450", "mV", "potential", 0.45],
    ["1.4", "mm", "size", 1400],
  ] as const)("%s %s", (text, unit, quantity, base) => {
    const found = value(text, unit, quantity) as { lo: number; hi: number };
    expect(found.lo / base).toBeCloseTo(1, 6);
    expect(found.hi).toBe(found.lo);
  });
  test("a limit becomes an interval", () => {
    expect(value("<10", "mg/L", "solutionAssay")).toEqual({ lo: 0, hi: 0.01 });
    expect(value(">5", "g/L", "solutionAssay")).toEqual({ lo: 5, hi: Infinity });
    expect(value(">60", "%", "solidAssay")).toEqual({ lo: 0.6, hi: 1 });
  });
  test("units that need more than a factor say so, and go by it", () => {
    expect(value("3950", "ppm", "solutionAssay")).toEqual({
      kind: "bad",
      why: "ppm by mass needs the density of the liquor",
    });
    expect((value("3950", "ppm", "solutionAssay", { density: 1.2 }) as { lo: number }).lo).toBeCloseTo(4.74, 10);
    expect((value("0.1", "mol/L", "solutionAssay", { molarMass: 63.546 }) as { lo: number }).lo).toBeCloseTo(
      6.3546,
      10,
    );
  });
  test("every quantity offers its units, and each is known", () => {
    for (const quantity of Object.keys(quantities) as QuantityName[]) {
      expect(unitsOf(quantity).length).toBeGreaterThan(0);
      for (const unit of unitsOf(quantity)) {
        const found = measure({ text: "0.5", unit }, quantity, { density: 1, molarMass: 1 });
        if (found.kind === "bad") expect(found.why).toMatch(/cannot be turned into/);
      }
    }
  });
  test("a number that may not be censored is none when it is", () => {
    expect(numberIn({ text: "<5", unit: "mg/L" }, "solutionAssay")).toBeNull();
    expect(numberIn({ text: "", unit: "g" }, "mass")).toBeNull();
  });
});
