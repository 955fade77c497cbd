import { expect, test } from "vitest";
import { axisTicks } from "../../../src/map/svg/axisTicks";

const words = (lo: number, hi: number) => axisTicks([lo, hi]).map((t) => t.text);

test("numbers of an axis are round, and have the decimals that tell them apart", () => {
  expect(words(1, 8)).toEqual(["1", "2", "3", "4", "5", "6", "7", "8"]);
  expect(words(-0.2, 1.2)).toEqual(["−0.2", "0.0", "0.2", "0.4", "0.6", "0.8", "1.0", "1.2"]);
  expect(words(-200, 1200)).toEqual(["−200", "0", "200", "400", "600", "800", "1000", "1200"]);
  expect(words(4.93, 5.02)).toEqual(["4.93", "4.94", "4.95", "4.96", "4.97", "4.98", "4.99", "5.00", "5.01", "5.02"]);
});
test("none lies outside what is in sight, and no two are the same", () => {
  for (const [lo, hi] of [
    [0, 14],
    [3.1, 3.135],
    [-1.37, 0.221],
    [-951, 1403],
  ] as const) {
    // prettier-ignore
    const ticks = axisTicks([lo, hi]);
    expect(ticks.length).toBeGreaterThan(3);
    expect(new Set(ticks.map((t) => t.text)).size).toBe(ticks.length);
    for (const { value } of ticks) expect(value >= lo - 1e-9 && value <= hi + 1e-9).toBe(true);
  }
});
