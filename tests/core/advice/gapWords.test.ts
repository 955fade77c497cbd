import { expect, test } from "vitest";
import { gapSentence } from "../../../shared/advice/gapWords";
import type { Demand } from "../../../shared/solution";

const gold: Demand = { metal: "Au", requirement: "dissolved" };
const zinc: Demand = { metal: "Zn", requirement: "metal" };
const cyanide: Demand = { gas: "HCN", pHAtLeast: 10.5 };
const hydrogen: Demand = { gas: "H2", bar: 0.04 };
const name = (element: string) => ({ Au: "gold", Zn: "zinc" })[element] ?? element;
const both = [["0.62 pH", "at one Eh"], ["0.21 V", "at one pH"]] as const; // prettier-ignore

test("a gap is said as one would at the plant: what the others' ground lacks, and how far it is", () => {
  expect(gapSentence([gold, zinc, cyanide], "HCN", both, name)).toBe("The others hold only on ground kept out for HCN: the nearest ground clear of HCN lies 0.62 pH away at one Eh, and 0.21 V away at one pH."); // prettier-ignore
  expect(gapSentence([gold, zinc, cyanide], "Zn", both.slice(1), name)).toBe("Where the others hold, zinc is not metal: the nearest ground where it is lies 0.21 V away at one pH."); // prettier-ignore
  expect(gapSentence([gold, cyanide], "Au", both.slice(0, 1), name)).toBe("From where gold is dissolved, the nearest ground clear of HCN lies 0.62 pH away at one Eh."); // prettier-ignore
  expect(gapSentence([gold, zinc], "Au", both, name)).toBe("Their grounds lie 0.62 pH apart at one Eh, and 0.21 V apart at one pH."); // prettier-ignore
  expect(gapSentence([cyanide, hydrogen], "H2", both.slice(0, 1), name)).toBe("Their grounds lie 0.62 pH apart at one Eh."); // prettier-ignore
});
