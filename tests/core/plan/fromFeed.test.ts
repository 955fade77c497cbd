import { describe, expect, test } from "vitest";
import {
  headsOfFeed,
  likelyTarget,
  mineralsOfFeed,
  suggestedLines,
  tenorFromHead,
} from "../../../shared/plan/fromFeed";
import { feedOf, typed } from "../../support/trials";
import { library } from "../../support/solver";

const calcine = feedOf({
  Zn: "56.2 %",
  Fe: "8.1 %",
  Cu: "0.42 %",
  Cd: "0.21 %",
  Pb: "1.3 %",
  Co: "25 g/t",
  SiO2: "3 %",
});
const { heads } = headsOfFeed(calcine, library);

describe("heads of a feed", () => {
  test("metals of the library, largest first, in g/g; the rest is named with its reason", () => {
    const found = headsOfFeed(calcine, library);
    expect(found.heads.map((h) => h.element)).toEqual(["Zn", "Fe", "Pb", "Cu", "Cd", "Co"]);
    expect(found.heads[0]?.head).toBeCloseTo(0.562, 12);
    expect(found.heads.at(-1)?.head).toBeCloseTo(25e-6, 12);
    expect(found.skipped).toEqual([{ element: "SiO2", why: "not a metal of the chemistry library" }]);
  });

  const twice = (marked: boolean) => ({
    heads: [
      { element: "Cu", value: typed("1.0 %"), method: "", laboratory: "", head: false },
      { element: "Cu", value: typed("1.2 %"), method: "", laboratory: "", head: marked },
    ],
  });
  test("of several the marked one; with none marked their mean, and it says so", () => {
    expect(headsOfFeed(twice(true), library).heads[0]).toMatchObject({ head: 0.012, remark: null });
    const mean = headsOfFeed(twice(false), library).heads[0];
    expect(mean?.head).toBeCloseTo(0.011, 12);
    expect(mean?.remark).toBe("mean of 2 assays, none marked as the head");
  });

  test("below detection counts at its limit; blank does not count", () => {
    const [less] = headsOfFeed(feedOf({ Cd: "<0.01 %" }), library).heads;
    expect(less).toMatchObject({ element: "Cd", remark: "taken at its limit" });
    expect(less?.head).toBeCloseTo(1e-4, 12);
    const blank = {
      heads: [{ element: "Cu", value: { text: "", unit: "%" }, method: "", laboratory: "", head: true }],
    };
    expect(headsOfFeed(blank, library)).toEqual({ heads: [], skipped: [{ element: "Cu", why: "its assay is blank or cannot be read" }] }); // prettier-ignore
  });
});

test("tenor by mass balance: 56.2 % Zn at 20 % solids is 250 g solids to a litre, 126.45 g/L at 90 %", () =>
  expect(tenorFromHead(0.562, 0.2, 0.9)).toBeCloseTo(126.45, 9));

test("the target is the largest head that is not usually gangue; gold in cyanide", () => {
  expect(likelyTarget(heads, "sulfate")).toBe("Zn");
  const ore = headsOfFeed(feedOf({ Fe: "12 %", Cu: "0.3 %", Au: "2.1 g/t", Ag: "14 g/t" }), library).heads;
  expect(likelyTarget(ore, "sulfate")).toBe("Cu");
  expect(likelyTarget(ore, "cyanide")).toBe("Au");
  expect(likelyTarget(headsOfFeed(feedOf({ Fe: "12 %" }), library).heads, "sulfate")).toBe("Fe");
  expect(likelyTarget([], "sulfate")).toBeNull();
});

test("target, iron as gangue, the rest watched; of those the three largest are drawn", () =>
  expect(suggestedLines(heads, "Zn").map((l) => [l.element, l.role, l.extraction, l.drawn])).toEqual([
    ["Zn", "target", 0.9, true],
    ["Fe", "gangue", 0.001, true],
    ["Pb", "watched", 0.5, true],
    ["Cu", "watched", 0.5, true],
    ["Cd", "watched", 0.5, true],
    ["Co", "watched", 0.5, false],
  ]));

test("minerals the library knows as solids, each once; other names apart", () => {
  const minerals = ["ZnO(s)", "ZnO(s)", "Zn^2+(aq)", "glass"].map((mineral) => ({ mineral, element: "Zn", share: typed("50 %") })); // prettier-ignore
  expect(mineralsOfFeed({ minerals }, library)).toEqual({ known: ["ZnO(s)"], unknown: ["Zn^2+(aq)", "glass"] });
});
