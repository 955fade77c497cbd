import fc from "fast-check";
import { describe, expect, test } from "vitest";
import * as edits from "../../../src/features/workspace/model/edit";
import type { Edit } from "../../../src/features/workspace/model/edit";
import { sameInputs } from "../../../src/features/workspace/model/history";
import { mergePlans, whyNoPlan } from "../../../src/lib/planMerge/mergePlans";
import { planInputs, type PlanInputs } from "../../../shared/schemas/plan";
import { runs } from "../../support/fuzz";
import { unusualInputs } from "../../support/planInputs";
import { metal, sheetInputs } from "../../support/sheetFixture";

const set =
  (change: Partial<PlanInputs>): Edit =>
  (p) => ({ ...p, ...change });
const products =
  (component: string, id: string): Edit =>
  (p) => ({
    ...p,
    overall: {
      ...p.overall,
      Hem: { ...p.overall?.Hem, products: { ...p.overall?.Hem?.products, [component]: id } },
    },
  });

/** For every kind of setting, two changes of it that contradict each other. */
const kinds: Record<keyof PlanInputs, readonly (readonly [what: string, one: Edit, other: Edit])[]> = {
  temperatureC: [["Temperature", set({ temperatureC: 80 }), set({ temperatureC: 80.04 })]],
  preset: [["Lixiviant", set({ preset: "chloride" }), set({ preset: "water" })]],
  metals: [
    ["Fe", edits.setMetal(1, { value: 1e-5 }), edits.setMetal(1, { requirement: "compound" })],
    ["Cu", edits.removeMetal(2), edits.setMetal(2, { role: "target" })],
    ["Cd", edits.addMetal("Cd"), (p) => ({ ...p, metals: [...p.metals, metal("Cd", "target", "metal", 1e-6)] })],
    ["Order of metals", edits.moveMetal(0, 1), edits.moveMetal(1, 1)],
  ],
  ligands: [
    ["S, total", edits.setTotal("ligands", "S", 0.9), edits.setTotalUnit("ligands", "S", "g/L")],
    ["S, total", edits.removeTotal("ligands", "S"), edits.setTotal("ligands", "S", 0.6)],
  ],
  others: [["K, total", edits.removeTotal("others", "K"), edits.setTotal("others", "K", 0.3)]],
  ionicStrength: [["Ionic strength", set({ ionicStrength: 0.2 }), set({ ionicStrength: 0.4 })]],
  sulfateReduction: [],
  solidsBasis: [["Solids basis", set({ solidsBasis: "aged" }), set({ solidsBasis: "feed" })]],
  feedMinerals: [],
  dosed: [],
  leftOut: [
    ["CuO(s)", edits.leaveOut("CuO(s)", "slow"), edits.putBack("CuO(s)")],
    ["PbSO4(s)", edits.leaveOut("PbSO4(s)", "slow"), edits.leaveOut("PbSO4(s)", "never seen")],
  ],
  putBack: [["PbO2(s)", edits.putBack("PbO2(s)"), edits.leaveOut("PbO2(s)", "never seen")]],
  frame: [
    ["Frame, pH", set({ frame: { pH: [0, 9], Eh: [-0.2, 1.2] } }), set({ frame: { pH: [1, 9], Eh: [-0.2, 1.2] } })],
    ["Frame, Eh", set({ frame: { pH: [1, 8], Eh: [-1, 1.2] } }), set({ frame: { pH: [1, 8], Eh: [-0.2, 1] } })],
  ],
  water: [["Bounded by", set({ water: { bound: "upper" } }), set({ water: { bound: "both", oxygenV: 0.3 } })]],
  controlBand: [
    ["Control band of pH", edits.setPHBand(0.3), edits.setPHBand(0.4)],
    ["Control band of Eh", set({ controlBand: { pH: 0.17, Eh: 0.05 } }), set({ controlBand: { pH: 0.17, Eh: 0.01 } })],
  ],
  freeAcidBand: [["Control band of pH", edits.setAcidBand({ gPerL: 5, atPH: 0.9 }, 0.08), edits.setPHBand(0.4)]],
  overall: [
    ["Overall reaction of Hem, product of Fe", products("Fe", "Goe"), products("Fe", "Jar")],
    [
      "Overall reaction of Hem, electrons",
      set({ overall: { Hem: { redox: "open" } } }),
      set({ overall: { Hem: { redox: "oxygen" } } }),
    ],
  ],
  excludedHazards: [
    ["Kept out of windows: H2S", edits.keepOut({ gas: "H2S" }), edits.keepOut({ gas: "H2S", bar: 1e-3 })],
  ],
  circuit: [["Around the leach", set({ circuit: { sxOrganic: true } }), set({ circuit: { oxygenKPa: 500 } })]],
  ranges: [
    [
      "Hold over temperature, °C",
      set({ ranges: { temperatureC: [50, 60] } }),
      set({ ranges: { temperatureC: [50, 70] } }),
    ],
    [
      "Hold over activity of Zn",
      set({ ranges: { activities: { Zn: [0.1, 1] } } }),
      set({ ranges: { activities: { Zn: [0.1, 2] } } }),
    ],
  ],
  heldSetPoint: [["Set point", set({ heldSetPoint: { pH: 4, Eh: 0.5 } }), set({ heldSetPoint: { pH: 5, Eh: 0.5 } })]],
};
const contradictions = Object.values(kinds).flat();
/** Entries of a list contradict nothing: on it or not. */
const lone: readonly (readonly [string, Edit])[] = [
  ["Sulfate reduction", set({ sulfateReduction: true })],
  ["Feed minerals: PbSO4(s)", edits.toggleIn("feedMinerals", "PbSO4(s)")],
  ["Feed minerals: ZnO(s)", edits.toggleIn("feedMinerals", "ZnO(s)")],
  ["Dosed: sulfite", edits.toggleIn("dosed", "sulfite")],
  ["Dosed: peroxide", edits.toggleIn("dosed", "peroxide")],
];
const every: readonly (readonly [string, Edit])[] = [
  ...contradictions.flatMap(([what, one, other]) => [[what, one] as const, [what, other] as const]),
  ...lone,
];

test("every field of the inputs has its kind here", () => {
  expect(Object.keys(kinds).sort()).toEqual(Object.keys(planInputs.shape).sort());
  const touched = every.flatMap(([, edit]) => {
    const after = edit(sheetInputs);
    return Object.keys(planInputs.shape).filter((k) => {
      const key = k as keyof PlanInputs;
      return JSON.stringify(after[key]) !== JSON.stringify(sheetInputs[key]);
    });
  });
  expect([...new Set(touched)].sort()).toEqual(Object.keys(planInputs.shape).sort());
});

describe.each(every)("%s, changed by one", (what, edit) => {
  const changed = edit(sheetInputs);
  test.each(["yours", "theirs"] as const)("%s: taken by itself, with nothing to decide", (whose) => {
    const merged = mergePlans(
      sheetInputs,
      whose === "yours" ? changed : sheetInputs,
      whose === "theirs" ? changed : sheetInputs,
    );
    expect(merged.conflicts).toEqual([]);
    expect(merged.taken.map((t) => [t.what, t.whose])).toContainEqual([what, whose]);
    expect(merged.settle({})).toEqual(changed);
  });
  test("by both alike: nothing to decide", () => {
    const merged = mergePlans(sheetInputs, changed, structuredClone(changed));
    expect(merged.conflicts).toEqual([]);
    expect(merged.taken.every((t) => t.whose === "both" || t.what === "Order of metals")).toBe(true);
    expect(merged.settle({})).toEqual(changed);
  });
});

test.each(contradictions)("%s, changed by both to different things, is decided either way", (what, one, other) => {
  const [mine, theirs] = [one(sheetInputs), other(sheetInputs)];
  const merged = mergePlans(sheetInputs, mine, theirs);
  expect(merged.conflicts.map((c) => c.what)).toEqual([what]);
  const [conflict] = merged.conflicts;
  if (!conflict) throw new Error("no conflict");
  expect(conflict.yours).not.toBe(conflict.theirs);
  expect(merged.settle({})).toEqual(mine);
  expect(sameInputs(merged.settle({ [conflict.path]: "yours" }), mine)).toBe(true);
  expect(sameInputs(merged.settle({ [conflict.path]: "theirs" }), theirs)).toBe(true);
  // Seen from the other side it is the same conflict, turned round.
  const turned = mergePlans(sheetInputs, theirs, mine).conflicts[0];
  expect(turned).toEqual({ ...conflict, yours: conflict.theirs, theirs: conflict.yours });
});

test("changes of different settings come together whoever made them", () => {
  for (const [one, first] of every)
    for (const [other, second] of every) {
      if (one === other || one === "Cd" || other === "Cd" || one === "Order of metals" || other === "Order of metals")
        continue;
      const merged = mergePlans(sheetInputs, first(sheetInputs), second(sheetInputs));
      expect(merged.conflicts, `${one} and ${other}`).toEqual([]);
      const whole = merged.settle({});
      for (const [what, edit] of [[one, first], [other, second]] as const) {
        const again = mergePlans(sheetInputs, edit(sheetInputs), whole);
        expect(again.conflicts, `${what} in ${one} and ${other}`).toEqual([]);
        expect(sameInputs(again.settle({}), whole), `${what} in ${one} and ${other}`).toBe(true);
      }
    }
}); // prettier-ignore

test("two plans with nothing in common: against an unchanged copy the changed one stands whole", () => {
  const ends: PlanInputs[] = [sheetInputs, unusualInputs];
  for (const base of ends)
    for (const other of ends) {
      expect(mergePlans(base, other, base).settle({})).toEqual(other);
      expect(mergePlans(base, base, other).settle({})).toEqual(other);
    }
});

const some = fc.array(fc.constantFrom(...every.map(([, edit]) => edit)), { maxLength: 8 });
const once = (list: readonly string[]) => new Set(list).size === list.length;
/** The edits that still can be made: the screen adds nothing twice. */
const after = (list: readonly Edit[], from: PlanInputs) =>
  list.reduce((p, edit) => {
    const next = edit(p);
    return once(next.metals.map((m) => m.element)) && once(next.putBack) ? next : p;
  }, from);

test("properties over any runs of edits", () =>
  fc.assert(
    fc.property(some, some, some, (before, one, other) => {
      const base = after(before, sheetInputs);
      const [mine, theirs] = [after(one, base), after(other, base)];
      expect(sameInputs(mergePlans(base, mine, base).settle({}), mine)).toBe(true);
      expect(sameInputs(mergePlans(base, base, theirs).settle({}), theirs)).toBe(true);
      const [there, back] = [mergePlans(base, mine, theirs), mergePlans(base, theirs, mine)];
      const swapped = back.conflicts.map((c) => ({ ...c, yours: c.theirs, theirs: c.yours }));
      const byPath = (a: { path: string }, b: { path: string }) => (a.path < b.path ? -1 : 1);
      expect([...swapped].sort(byPath)).toEqual([...there.conflicts].sort(byPath));
      for (const whose of ["yours", "theirs"] as const) {
        const result = there.settle(Object.fromEntries(there.conflicts.map((c) => [c.path, whose])));
        expect(whyNoPlan(result)).toBeNull();
        // Whose was taken throughout finds no contradiction in what came out.
        expect(mergePlans(base, whose === "yours" ? mine : theirs, result).conflicts).toEqual([]);
      }
    }),
    runs(100),
  ));

test("lines taken out by each that would leave no metal are decided", () => {
  const [zinc, iron] = sheetInputs.metals;
  if (!zinc || !iron) throw new Error("no metals");
  const base = { ...sheetInputs, metals: [zinc, iron] };
  const merged = mergePlans(base, { ...base, metals: [zinc] }, { ...base, metals: [iron] });
  expect(merged.conflicts.map((c) => c.what).sort()).toEqual(["Fe", "Zn"]);
  expect(merged.settle({}).metals).toEqual([zinc]);
  expect(whyNoPlan(merged.settle({ "Metals/Zn": "theirs" }))).toBe("No metal would be left: keep at least one.");
  expect(whyNoPlan(merged.settle({ "Metals/Zn": "theirs", "Metals/Fe": "theirs" }))).toBeNull();
});

test("more metals than a plan holds are decided too", () => {
  const named = (letter: string) =>
    Array.from({ length: 9 }, (_, i) => metal(`${letter}${i}`, "watched", "free", 1e-3));
  const base = { ...sheetInputs, metals: [metal("Zn", "target", "dissolved", 1)] };
  const merged = mergePlans(
    base,
    { ...base, metals: [...base.metals, ...named("A")] },
    { ...base, metals: [...base.metals, ...named("B")] },
  );
  expect(merged.conflicts).toHaveLength(18);
  const both = Object.fromEntries(named("B").map((m) => [`Metals/${m.element}`, "theirs" as const]));
  expect(whyNoPlan(merged.settle(both))).toBe("19 metals together; a plan holds at most 16.");
});
