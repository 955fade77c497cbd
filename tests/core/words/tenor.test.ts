import { expect, test } from "vitest";
import { tenorInput, tenorParts, tenorText } from "../../../shared/words/tenor";

const plain = (text: string) => text.replaceAll("\u2009", " ");

test.each([
  [130, "130 g/L"],
  [12.5, "12.5 g/L"],
  [0.1, "0.100 g/L"],
  [0.09999, "0.100 g/L"],
  [0.0267, "26.7 mg/L"],
  [0.001, "1.00 mg/L"],
  [1e-4, "0.100 mg/L"],
  [5.58e-5, "55.8 µg/L"],
  [2e-8, "0.0200 µg/L"],
  [3e-12, "3.00e−6 µg/L"],
  [0, "0 g/L"],
])("%d g/L is written %s", (gPerL, text) => expect(plain(tenorText(gPerL))).toBe(text));

test("the number and unit written mean the tenor, at every size", () => {
  const perG: Record<string, number> = { "g/L": 1, "mg/L": 1e3, "µg/L": 1e6 };
  for (let decade = -9; decade < 3; decade += 0.13) {
    const gPerL = 10 ** decade;
    const { text, unit } = tenorParts(gPerL, 4);
    expect(Number(text) / perG[unit]! / gPerL).toBeCloseTo(1, 3);
    expect(text).not.toContain("e");
    expect(Number(tenorInput(gPerL, 4)) / gPerL).toBeCloseTo(1, 3);
  }
});

test("in a field of g/L all that was typed stays, without a power of ten down to 0.1 mg/L", () => {
  expect([0.0267, 0.00012345, 130, 0.5, 2e-5].map((x) => tenorInput(x))).toEqual(["0.0267", "0.00012345", "130", "0.50", "2.0e-5"]); // prettier-ignore
});
