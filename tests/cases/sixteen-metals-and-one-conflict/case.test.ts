import { expect, test } from "vitest";
import { minimalConflicts } from "../../../shared/windows/conflicts";

// Every set of sixteen requirements without the one conflicting pair was tried, 49,152 of them; a plan of that size hung.
test("one conflict among sixteen metals is found with few trials", () => {
  const pair = (1 << 3) | (1 << 11);
  let trials = 0;
  const found = minimalConflicts(16, (set) => {
    trials++;
    return (set & pair) !== pair;
  });
  expect(found).toEqual([pair]);
  expect(trials).toBeLessThan(100);
});
