import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { toProblem } from "../../shared/plan/toProblem";
import { RANGE_MARGIN } from "../../shared/practice/box";
import { publishedRanges } from "../../shared/practice/ranges";
import { planInputs, type PlanInputs } from "../../shared/schemas/plan";
import type { Solution, Window } from "../../shared/solution";
import { containsBox, overlapsBox } from "../support/read";
import { band, library, solved } from "../support/solver";

/** Published operating ranges against the windows of plans a metallurgist would write for them: what must dissolve and what must stay
 *  solid, at activities of 0.05 to 0.2 of the tenor in sulfate (0.05 above 100 C), as each file says. */
type Verdict = "contains" | "overlaps" | "neither";
interface RangeFile {
  id: string;
  step: string;
  published: { pH: Span | null; Eh: Span | null; temperatureC: Span | null; source: string };
  /** what is held against the window; `derived` says how, where the source gives an acid strength instead of a pH */
  box: { pH: Span | null; Eh: Span | null; derived?: string };
  /** the ends of the published range of T, solved each; the verdict is the worst of them */
  temperaturesC: number[];
  activities: string;
  plan: {
    preset: PlanInputs["preset"];
    metals: { element: string; role: "target" | "gangue" | "watched"; requirement: PlanInputs["metals"][number]["requirement"]; activity: number }[];
    leftOut?: string[];
  } & Partial<Pick<PlanInputs, "ligands" | "others" | "feedMinerals" | "putBack" | "water">>;
  expected: Verdict;
  /** reactions that shut the window at every T: inside, outside */
  boundedBy: [string, string][];
  /** what sets the range where the window does not, and choices that need a word */
  why?: string;
} // prettier-ignore
type Span = [number, number];

const folder = new URL("./ranges/", import.meta.url);
const files = readdirSync(folder)
  .sort()
  .map((name) => [name, JSON.parse(readFileSync(new URL(name, folder), "utf8")) as RangeFile] as const);

function inputsOf({ plan }: RangeFile, temperatureC: number): PlanInputs {
  const { metals, leftOut = [], ...given } = plan;
  const winsMetal = metals.some((m) => m.requirement === "metal");
  return planInputs.parse({
    ...{ temperatureC, ligands: [], others: [], ionicStrength: null, sulfateReduction: false, solidsBasis: "fresh" },
    ...{ feedMinerals: [], dosed: [], putBack: [], water: { bound: winsMetal ? "upper" : "both" } },
    ...{ frame: { pH: [-1, 14], Eh: [-1.6, 1.8] }, controlBand: band },
    ...given,
    leftOut: leftOut.map((species) => ({ species, reason: "stated in the file" })),
    metals: metals.map(({ activity, ...m }) => ({ ...m, entry: "activity", value: activity, gammaFrom: "one", gamma: null })),
  });
} // prettier-ignore

const solutions = new Map<string, Solution>();
function solutionOf(file: RangeFile, T: number): Solution {
  const key = `${file.id} ${T}`;
  const known = solutions.get(key) ?? solved(toProblem(inputsOf(file, T), library));
  solutions.set(key, known);
  return known;
}

/** A range whose edges the window may miss by the margin; a narrow one is asked for at its middle. */
function within([lo, hi]: Span, margin: number): Span {
  const give = Math.min(margin, (hi - lo) / 2 - 1e-6);
  return lo === hi ? [lo - 1e-6, hi + 1e-6] : [lo + give, hi - give];
}
const covers = ([a, b]: readonly [number, number], [lo, hi]: Span) => a <= lo && b >= hi;
const meets = ([a, b]: readonly [number, number], [lo, hi]: Span) => a < hi && b > lo;

/** Contains: all of the range is open ground, but for the margin. Overlaps: some of it is. A range without an Eh (or a pH) is held against
 *  the window's extent along the axis it has. */
function verdict({ box: { pH, Eh } }: RangeFile, solution: Solution): Verdict {
  if (pH !== null && Eh !== null) {
    if (containsBox(solution, within(pH, RANGE_MARGIN.pH), within(Eh, RANGE_MARGIN.Eh))) return "contains";
    return overlapsBox(solution, pH, Eh) ? "overlaps" : "neither";
  }
  const [range, margin, extent] =
    pH !== null ? [pH, RANGE_MARGIN.pH, (w: Window) => w.pH] : [Eh!, RANGE_MARGIN.Eh, (w: Window) => w.Eh];
  if (solution.windows.some((w) => covers(extent(w), within(range, margin)))) return "contains";
  return solution.windows.some((w) => meets(extent(w), range)) ? "overlaps" : "neither";
}
const rank: Verdict[] = ["neither", "overlaps", "contains"];
const worst = (file: RangeFile): Verdict =>
  file.temperaturesC
    .map((T) => verdict(file, solutionOf(file, T)))
    .reduce((a, b) => (rank.indexOf(b) < rank.indexOf(a) ? b : a));

describe.each(files)("%s", (name, file) => {
  const range = publishedRanges.find((r) => r.id === file.id)!;
  test("it is the range as published", () => {
    expect(name.startsWith(`${file.id}-`)).toBe(true);
    expect(file.published).toEqual({ pH: range.pH, Eh: range.Eh, temperatureC: range.temperatureC, source: range.source });
    if (file.box.derived === undefined) expect(file.box).toEqual({ pH: range.pH, Eh: range.Eh });
    else for (const axis of ["pH", "Eh"] as const) if (range[axis]) expect(file.box[axis]).toEqual(range[axis]);
  }); // prettier-ignore
  test("it is solved over the published temperatures", () => {
    if (range.temperatureC === null) return expect(file.temperaturesC.every((T) => T >= 20 && T <= 25)).toBe(true);
    const [lo, hi] = range.temperatureC;
    for (const T of file.temperaturesC) {
      expect(T).toBeGreaterThanOrEqual(lo - RANGE_MARGIN.temperatureC);
      expect(T).toBeLessThanOrEqual(hi + RANGE_MARGIN.temperatureC);
    }
    expect(file.temperaturesC[0]).toBeLessThanOrEqual(lo);
    expect(file.temperaturesC.at(-1)).toBeGreaterThanOrEqual(Math.min(hi, 250));
  });
  test(`window ${file.expected}`, () => expect(worst(file)).toBe(file.expected));
  test("what shuts the window is what should", () => {
    expect(file.boundedBy.length > 0 || file.expected === "neither").toBe(true);
    for (const T of file.temperaturesC) {
      const limits = solutionOf(file, T).windows.flatMap((w) => w.limits.map((l) => `${l.inside} | ${l.outside}`));
      for (const [inside, outside] of file.boundedBy) expect(limits, `${T} C`).toContain(`${inside} | ${outside}`);
    }
  });
  test("a miss is explained, activities are argued", () => {
    expect(file.activities).not.toBe("");
    if (file.expected !== "contains" || range.notEquilibrium !== undefined) expect(file.why ?? "").not.toBe("");
    if (file.expected === "neither") expect(range.notEquilibrium).toBeDefined();
  });
});

test("at least 20 published ranges are files, and of these at least 16 contain or overlap; the rest are explained", () => {
  const counts = { contains: 0, overlaps: 0, neither: 0 };
  for (const [, file] of files) counts[worst(file)] += 1;
  expect(new Set(files.map(([, f]) => f.id)).size).toBe(files.length);
  expect(files.length).toBeGreaterThanOrEqual(20);
  expect(counts.contains + counts.overlaps).toBeGreaterThanOrEqual(16);
  expect(counts).toEqual({ contains: 25, overlaps: 3, neither: 3 });
  const page = readFileSync(new URL("../../docs/data.md", import.meta.url), "utf8");
  expect(page).toContain(
    `${files.length} files, ${counts.contains} contain, ${counts.overlaps} overlap, ${counts.neither} neither.`,
  );
  for (const [, file] of files.filter(([, f]) => f.expected !== "contains"))
    expect(page, "explained on the data page").toMatch(
      new RegExp(`^\\| ${file.id} .*\\| ${file.expected} \\| .{30,}`, "m"),
    );
  expect(files.filter(([, f]) => f.temperaturesC.some((T) => T > 150)).length).toBeGreaterThanOrEqual(1);
});
