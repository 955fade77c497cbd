import { describe, expect, test } from "vitest";
import { feedProblems, headsOf, markHead, placedShares } from "../../../src/features/feeds/feedModel";
import { feedWords } from "../../../src/features/feeds/feedWords";

const head = (element: string, text: string, marked = false, unit = "%") => ({ element, value: { text, unit }, method: "", laboratory: "", head: marked }); // prettier-ignore
const mineral = (name: string, element: string, share: string) => ({ mineral: name, element, share: { text: share, unit: "%" } }); // prettier-ignore

describe("head assays", () => {
  test("the only one counts; of several the one that is marked", () => {
    const [zn, fe] = headsOf([head("Zn", "57.2"), head("Fe", "8.8"), head("Fe", "9.1", true)]);
    expect(zn).toMatchObject({ element: "Zn", count: 1, remark: null, open: false });
    expect(fe?.head?.value.text).toBe("9.1");
    expect(fe?.remark).toBe("2 assays, 8.800 to 9.100 %");
  });
  test("of several with none marked no account can be closed, and it says so", () => {
    expect(headsOf([head("Au", "1.2", false, "g/t"), head("Au", "1.4", false, "g/t")])[0]).toMatchObject({
      head: null,
      open: true,
      remark: "2 assays and none is marked as the head: accounts stay open",
    });
  });
  test("marking one takes the mark off the others of that element only", () => {
    const marked = markHead([head("Zn", "1", true), head("Zn", "2"), head("Fe", "3", true)], 1, true);
    expect(marked.map((h) => h.head)).toEqual([false, true, true]);
  });
  test("two heads of one element are refused where they stand", () => {
    const [problem] = feedProblems({ heads: [head("Zn", "1", true), head("Zn", "2", true)] });
    expect(problem).toMatchObject({ path: "heads.1.head" });
    expect(feedWords(problem!.path)).toBe("head assay 2, the head");
  });
});

test("shares of a metal are added up, decimal comma and all; over 100 % stands out", () => {
  expect(placedShares([mineral("ZnO(s)", "Zn", "85,5"), mineral("ZnFe2O4(s)", "Zn", "14.5"), mineral("x", "Fe", "")])).toEqual([{ element: "Zn", sum: 100, over: false }]); // prettier-ignore
  expect(placedShares([mineral("a", "Cu", "80"), mineral("b", "Cu", "30")])[0]).toMatchObject({ sum: 110, over: true });
});
