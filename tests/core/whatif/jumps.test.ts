import { describe, expect, test } from "vitest";
import { demoPlans } from "../../../server/demo/plans";
import { toProblem } from "../../../shared/plan/toProblem";
import { valueOf } from "../../../shared/outcome";
import type { PlanInputs } from "../../../shared/schemas/plan";
import { jumpReasons, jumpWords } from "../../../shared/whatif/jumpWords";
import { sweep, type Sweep, type SweepWish } from "../../../shared/whatif/sweep";
import { withSetting } from "../../../shared/whatif/vary";
import { library, solved } from "../../support/solver";

const planOf = (id: string): PlanInputs => demoPlans.find((p) => p.id === id)!.revisions.at(-1)!.inputs;
const heat = (range: readonly [number, number], frames = 5): SweepWish => ({ varied: { kind: "temperature" }, range, frames, between: 1 }); // prettier-ignore
const swept = (inputs: PlanInputs, wish: SweepWish): Sweep => valueOf(sweep(inputs, wish, library));
const jumpsOf = (s: Sweep) => s.turns.filter((t) => t.kind === "jumps");
const name = (element: string) => ({ Fe: "iron", Cu: "copper" })[element] ?? element;
const plain = (text: string) => text.replace(/[\u2009\u00a0]/g, " ");

describe("where margin and ground jump", () => {
  const neutral = planOf("demo-neutral-leach");

  test("goethite sets in at 70 C (solids-basis.csv): found there to 0.01 K however the samples stand, drawn as a step, and said with both sides", () => {
    for (const frames of [3, 8]) {
      const s = swept(neutral, heat([41, 93], frames));
      const [jump, ...more] = jumpsOf(s);
      expect(more).toEqual([]);
      expect(jump!.between[0]).toBeLessThan(70);
      expect(jump!.between[1]).toBeGreaterThanOrEqual(70);
      expect(jump!.between[1] - jump!.between[0]).toBeLessThanOrEqual(0.01);
      expect(jump!.jump!.comes.map((c) => [c.species, c.metal])).toEqual([["FeOOH(s,goethite)", "Fe"]]);
      const [below, beyond] = jump!.between.map((t) => solved(toProblem(withSetting(neutral, { kind: "temperature" }, t), library)));
      expect(jump!.jump!.margin).toEqual([below!.setPoint!.margin, beyond!.setPoint!.margin]);
      const ats = s.samples.map((x) => x.at);
      expect(ats).toEqual([...ats].sort((a, b) => a - b));
      expect(ats).toEqual(expect.arrayContaining([...jump!.between]));
      expect(plain(jumpWords(jump!.jump!))).toMatch(/^the margin jumps from 6\.\d to \d+\.\d bands, open ground from 0\.\d\d to 1\.\d\d pH·V$/);
      expect(jumpReasons(jump!.jump!, name)).toEqual(["FeOOH(s,goethite) counts for iron from here on (below, fresh solids: takes days cold; the goethite process runs hot)"]);
    }
  });

  test("a window that opens at one stroke is drawn with both sides as well, each once", () => {
    const s = swept({ ...neutral, frame: { ...neutral.frame, pH: [1, 3.8] } }, heat([41, 93]));
    const opens = s.turns.find((t) => t.kind === "opens")!;
    expect(opens).toMatchObject({ abrupt: true, windows: [0, 1] });
    const ats = s.samples.map((x) => x.at);
    expect(ats).toEqual([...new Set(ats)].sort((a, b) => a - b));
    expect(ats).toEqual(expect.arrayContaining([...opens.between]));
  });

  test("with goethite left out, or counting all the way, nothing jumps", () => {
    const without = { ...neutral, leftOut: [...neutral.leftOut, { species: "FeOOH(s,goethite)", reason: "not in this tank" }] };
    expect(jumpsOf(swept(without, heat([41, 93])))).toEqual([]);
    expect(jumpsOf(swept({ ...neutral, putBack: ["FeOOH(s,goethite)"] }, heat([41, 93])))).toEqual([]);
  });

  test("a couple that ceases to set Eh, and a salt that comes out, are told as such", () => {
    const heap = planOf("demo-oxide-heap");
    const [couple] = jumpsOf(swept(heap, heat([60, 90])));
    expect(couple!.jump).toMatchObject({ couple: "ceases", comes: [], goes: [] });
    expect(jumpReasons(couple!.jump!, name).join()).toContain("the margin counts pH alone");
    const copper = swept(heap, { varied: { kind: "amount", of: "Cu" }, range: [0.01, 1], frames: 5, between: 3 });
    const salt = jumpsOf(copper).find((t) => t.jump!.takes.length > 0)!;
    expect(jumpReasons(salt.jump!, name)[0]).toMatch(/^CuSO4\(H2O\)5\(s\) takes its ground at one stroke/);
    expect(salt.jump!.takes).toEqual(["CuSO4(H2O)5(s)"]);
  });
}); // prettier-ignore
