import { expect, test } from "vitest";
import { DEFERENCE } from "../../shared/hazards/exposure";
import type { PlanInputs } from "../../shared/schemas/plan";
import type { PdfText } from "../support/pdf";
import { metal, sheetInputs, sheetPlan } from "../support/sheetFixture";
import { collisions, drawn, outlineDrawn, solved } from "../support/sheets";

test("window, shut ground and boundaries are the solver's polygons, as vectors", async () => {
  const sheet = await drawn(sheetInputs);
  const { windows, shut = [] } = solved(sheetInputs);
  const outlines = [...windows.flatMap((w) => w.polygons), ...shut.flatMap((s) => s.polygons)];
  expect(outlines.length).toBeGreaterThan(2);
  for (const { outer } of outlines) expect(outlineDrawn(sheet, outer), JSON.stringify(outer)).toBe(true);
  expect(sheet.clips).toBe(shut.filter((s) => s.polygons.length > 0 && s.metal !== "Cu").length);
});

test("subscripts stand lower and charges higher, both smaller", async () => {
  const { texts } = await drawn(sheetInputs);
  const at = texts.findIndex((t, i) => t.text === "SO" && texts[i + 1]?.text === "4" && texts[i + 2]?.text === "2−");
  const [base, sub, sup] = texts.slice(at, at + 3) as [PdfText, PdfText, PdfText];
  expect(sub.size).toBeLessThan(0.8 * base.size);
  expect(sup.size).toBeLessThan(0.8 * base.size);
  expect(sub.y - base.y).toBeGreaterThan(0.1 * base.size);
  expect(base.y - sup.y).toBeGreaterThan(0.25 * base.size);
});

const crowd: PlanInputs = {
  ...sheetInputs,
  metals: [
    metal("Zn", "target", "dissolved", 0.08),
    metal("Fe", "gangue", "solid", 1e-5),
    ...["Cu", "Cd", "Pb", "Co", "Ni", "Mn", "As", "Sb", "Ag", "Au", "Al", "Mg", "Ca", "Cr"].map((e, i) =>
      metal(e, "watched", "free", 1e-4 / (i + 1), { entry: "gPerL", gammaFrom: "typed", gamma: 0.123 }),
    ),
  ],
  temperatureC: 180,
  leftOut: Array.from({ length: 30 }, (_, i) => ({
    species: "CuO(s)",
    reason: `reason ${i} of many in this long list`,
  })),
  circuit: { reagents: ["zinc-dust", "oxygen", "chlorine"] },
  ranges: { temperatureC: [150, 200], activities: { Zn: [0.01, 0.1], Fe: [1e-6, 1e-4] } },
};

test("ten and more metals, long names and long lists stay on one page: nothing overlaps, what is left out is counted", async () => {
  const long = {
    ...sheetPlan,
    name: "A plan whose name is as long as a name may be, ".repeat(3).slice(0, 120),
    invented: true,
  };
  for (const inputs of [crowd, { ...crowd, metals: crowd.metals.slice(0, 10) }, sheetInputs]) {
    const sheet = await drawn(inputs, long, "Why this was done is told at length here. ".repeat(12).slice(0, 500));
    expect(sheet.pages).toBe(1);
    expect(collisions(sheet)).toEqual([]);
    expect(sheet.words).toContain("INVENTED DEMO DATA");
    expect(sheet.words).toContain(DEFERENCE);
    for (const { element } of inputs.metals)
      expect(sheet.words).toMatch(new RegExp(`\\b${element} ([a-z]+, )*(target, |gangue, )?(dissolved|solid|watched)`));
    if (inputs !== sheetInputs) expect(sheet.words).toMatch(/… and \d+ more \w+ in the plan/);
  }
});
