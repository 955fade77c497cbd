import { expect, test } from "vitest";
import { checkedWords } from "../../../shared/advice/checkedWords";
import type { Robust } from "../../../shared/advice/robust";

const checked: Robust["checked"] = { temperatures: [50, 60, 70], rules: [], settled: true, activities: [] };
const setPoint = { pH: 5, Eh: 0.4, margin: 2, mixedPotential: false, cutByFrame: false };
const window: Robust["windows"][number] = { outer: [], holes: [], area: 1, setPoint, couples: [] };
const plain = (robust: Robust) => checkedWords(robust, (e) => e).replace(/[\u2009\u00a0]/g, " ");

test("where something holds, what more temperatures would change is said", () => {
  expect(plain({ windows: [window], checked })).toBe(
    "Solved at 3 temperatures from 50.0 °C to 70.0 °C; more between them moved no edge by 0.001 pH or 1 mV.",
  );
  expect(plain({ windows: [window], checked: { ...checked, settled: false } })).toContain("still moved");
});

test("where nothing holds no temperature is claimed that was not tried", () => {
  expect(plain({ windows: [], checked })).toBe(
    "Solved at 3 temperatures from 50.0 °C to 70.0 °C; nothing holds at all of these, so no more were tried.",
  );
});
