import { expect, test } from "vitest";
import {
  fixed,
  inputText,
  inputTextExact,
  outOfBounds,
  parseNumber,
  savedAt,
  scientificParts,
  signed,
  significant,
  withUnit,
} from "../../src/lib/format";

test("a minus is a true minus, and zero has none", () => {
  expect(fixed(-0.204, 2)).toBe("\u22120.20");
  expect(fixed(-0.001, 2)).toBe("0.00");
  expect(signed(0.16, 2)).toBe("+0.16");
  expect(signed(-0.16, 2)).toBe("\u22120.16");
  expect(signed(0, 2)).toBe("0.00");
});

test("inputs show what can be typed again", () => {
  expect(inputText(0.08)).toBe("8.0e-2");
  expect(inputText(1e-5)).toBe("1.0e-5");
  expect(inputText(0.5)).toBe("0.50");
  expect(inputText(60)).toBe("60");
  expect(inputText(0)).toBe("0");
  expect(inputText(12500)).toBe("1.3e4");
  expect(inputTextExact(12.345)).toBe("12.345");
  expect(inputTextExact(1.2345e-4)).toBe("1.2345e-4");
  expect(inputTextExact(25)).toBe("25");
  expect(inputTextExact(-0.2)).toBe("-0.20");
});

test("what an input shows is read back as the same number", () => {
  for (const x of [0.08, 1e-5, 0.5, 60, 12.345, 0.1 + 0.2, 99.95, 9.999e-4, 150, 0.099999, 1234.5, -0.2, 0]) {
    const parsed = parseNumber(inputTextExact(x));
    expect(parsed).toEqual({ ok: true, value: Number(x.toPrecision(6)) });
  }
});

test("prose gets mantissa and exponent", () => {
  expect(scientificParts(0.08)).toEqual({ sign: "", mantissa: "0.080", exponent: null });
  expect(scientificParts(1e-6)).toEqual({ sign: "", mantissa: "1.0", exponent: "\u22126" });
  expect(scientificParts(-25000, 3)).toEqual({ sign: "\u2212", mantissa: "2.50", exponent: "4" });
  expect(significant(1e-5)).toBe("1.0e\u22125");
});

test.each([
  ["0.05", 0.05],
  ["0,05", 0.05],
  ["1e-5", 1e-5],
  ["1E\u22125", 1e-5],
  ["\u22120.2", -0.2],
  [" 12.5 ", 12.5],
  [".5", 0.5],
  ["8×10^-2", 0.08],
  ["10^-5", 1e-5],
  ["+3", 3],
])("reads %s", (text, value) => {
  expect(parseNumber(text)).toEqual({ ok: true, value });
});

test.each(["", "abc", "1,000.5", "1.2.3", "1e", "--3", "5 g"])("refuses %j and says why", (text) => {
  const parsed = parseNumber(text);
  expect(parsed.ok).toBe(false);
  if (!parsed.ok && text !== "") expect(parsed.message).toContain(text);
});

test("a number out of bounds is told with its bound", () => {
  expect(outOfBounds(180, { min: 0, max: 150 }, "°C")).toBe("180\u2009°C is too high: the most is 150\u2009°C");
  expect(outOfBounds(-5, { min: 0 })).toBe("\u22125 is too low: the least is 0");
  expect(outOfBounds(0, { above: 0 })).toBe("0 is too low: it must be above 0");
  expect(outOfBounds(75, { min: 0, max: 150 })).toBeNull();
});

test("a unit follows a thin space", () => {
  expect(withUnit("60", "°C")).toBe("60\u2009°C");
  expect(withUnit("60")).toBe("60");
});

test("today is a clock time, yesterday says so, before that a date", () => {
  const now = new Date(2026, 8, 21, 18, 0);
  expect(savedAt(new Date(2026, 8, 21, 9, 42).toISOString(), now)).toBe("09:42");
  expect(savedAt(new Date(2026, 8, 20, 23, 59).toISOString(), now)).toBe("yesterday 23:59");
  expect(savedAt(new Date(2026, 7, 2, 9, 42).toISOString(), now)).toBe("2 Aug 2026");
});
