import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { hazardGases } from "../../../../shared/hazards/pressures";
import { decodeView, encodeView } from "../../../../src/features/workspace/address/codec";
import { bareView, type PlanView } from "../../../../src/features/workspace/address/view";
import { defaultLayers, layerNames } from "../../../../src/map/view";
import { unusualInputs as inputs } from "../../../support/planInputs";

const fixed = (digits: number, min: number, max: number) =>
  fc.integer({ min: min * 10 ** digits, max: max * 10 ** digits }).map((n) => n / 10 ** digits + 0);
const rising = (digits: number, min: number, max: number) =>
  fc
    .uniqueArray(fixed(digits, min, max), { minLength: 2, maxLength: 2 })
    .map(([a = 0, b = 0]): [number, number] => (a < b ? [a, b] : [b, a]));
const point = fc.tuple(fixed(4, -2, 14), fixed(5, -2, 2));
const word = fc.stringMatching(/^[A-Za-z0-9_-]{1,12}$/);
const figures = fc.double({ min: 1e-9, max: 99, noNaN: true }).map((x) => Number(x.toPrecision(6)));
const elements = inputs.metals.map((m) => m.element);

const layers = fc
  .record({
    base: fc.record(Object.fromEntries(layerNames.map((name) => [name, fc.boolean()]))),
    gases: fc.dictionary(fc.constantFrom(...hazardGases.map((g) => `gas ${g}`)), fc.boolean()),
  })
  .map(({ base, gases }) => ({ ...base, ...gases }));
const view: fc.Arbitrary<PlanView> = fc.record<PlanView>({
  visible: fc.option(fc.record({ pH: rising(4, -2, 16), Eh: rising(4, -2, 3) })),
  focus: fc.option(fc.constantFrom(...elements)),
  hidden: fc.subarray(elements),
  pair: fc.constantFrom(null, [elements[0]!, elements[1]!]),
  layers,
  plain: fc.boolean(),
  window: fc.integer({ min: 0, max: 25 }),
  pin: fc.option(point),
  reagents: fc.option(
    fc.uniqueArray(
      word.filter((w) => w !== "none"),
      { maxLength: 4 },
    ),
  ),
  scale: fc.record({
    potentialUnit: fc.constantFrom("V" as const, "mV" as const),
    potentialScale: fc.constantFrom("SHE", "AGCL-3M"),
    electrodeTemperatureC: fc.option(fixed(1, 0, 100)),
  }),
  side: fc.constantFrom("answers" as const, "trials" as const),
  trialsOf: fc.constantFrom("plan" as const, "project" as const),
  colouredBy: fc.constantFrom("recoveryPct" as const, "gangueDissolvedPct" as const, "selectivityPct" as const),
  without: fc.uniqueArray(word, { maxLength: 3 }),
  brush: fc.option(fc.record({ pH: rising(4, -2, 16), Eh: rising(4, -2, 3) })),
  comments: fc.boolean(),
  asText: fc.boolean(),
  film: fc.option(
    fc.oneof(
      fc.record({
        vary: fc.constant({ kind: "temperature" } as const),
        range: rising(1, 0, 250),
        frames: fc.integer({ min: 5, max: 9 }),
      }),
      fc.record({
        vary: fc.constantFrom({ kind: "amount", of: "Zn" } as const, { kind: "total", of: "NH3" } as const),
        range: fc.uniqueArray(figures, { minLength: 2, maxLength: 2 }).map(([a = 0, b = 0]): [number, number] => (a < b ? [a, b] : [b, a])), // prettier-ignore
        frames: fc.integer({ min: 5, max: 9 }),
      }),
    ),
  ),
});

const decode = (query: string) => decodeView(new URLSearchParams(query), inputs);
const queryOf = (v: PlanView) => new URLSearchParams(encodeView(v)).toString();

describe("a view in an address", () => {
  test("comes back as it went in, through the text of a link, with nothing ignored", () =>
    fc.assert(
      fc.property(view, (v) => {
        const { view: back, ignored } = decode(queryOf(v));
        expect(ignored).toEqual([]);
        // a gas that stands as the layer table has it by default is told by its key alone
        expect({ ...back, layers: {} }).toEqual({ ...v, layers: {} });
        for (const [name, on] of Object.entries(v.layers ?? {}))
          expect([name, back.layers?.[name]]).toEqual([name, on]);
        expect(queryOf(back)).toBe(queryOf(v));
      }),
    ));

  test("what stands as for a new member is left away", () => {
    expect(queryOf({ ...bareView, layers: { ...defaultLayers }, plain: false })).toBe("view=1");
    expect(queryOf({ ...bareView, visible: { pH: [2, 6.25], Eh: [0.1, 0.8] }, focus: "Zn", pin: [3.2, 0.45] })).toBe(
      "view=1&pH=2..6.25&Eh=0.1..0.8&focus=Zn&pin=3.2%2C0.45",
    );
  });

  test("an address that states no view leaves layers, plain and scale to the member; one that does states all of them", () => {
    expect(decode("").view).toEqual(bareView);
    expect(decode("revision=3").view).toEqual(bareView);
    const { view: v } = decode("focus=Zn&off=names");
    expect([v.plain, v.scale?.potentialScale, v.layers?.labels, v.layers?.water]).toEqual([false, "SHE", false, true]);
  });

  test.each([
    ["pH=6..2&Eh=0..1", "pH=6..2 (does not rise within -10 to 30)"],
    ["pH=2..6", "pH=2..6 (pH and Eh go together)"],
    ["focus=Au", "focus=Au (the plan has no Au)"],
    ["hide=Cu,Au,Xx", "hide=Cu,Au,Xx (the plan has no Au, Xx)"],
    ["pin=three,0.4", "pin=three,0.4 (is not a number)"],
    ["pin=3", /^pin=3 \(/],
    ["pair=Cu", /^pair=Cu \(/],
    ["pair=Cu,Au", "pair=Cu,Au (the plan has no Au)"],
    ["brush=2..4", /^brush=2..4 \(/],
    ["brush=2..4,0.5..0.1", "brush=2..4,0.5..0.1 (does not rise within -10 to 10)"],
    ["on=fireworks", "on=fireworks (names no layer)"],
    ["window=AB", "window=AB (is no window’s letter)"],
    ["scale=furlong,SHE,25", /^scale=furlong,SHE,25 \(/],
    ["vary=total-Cl&over=1..2", "vary=total-Cl (the plan has no such setting)"],
    ["vary=temperature&over=20..900", "over=20..900 (a range that rises within 0 to 250 is needed)"],
    ["vary=temperature&over=20..90&frames=40", "frames=40 (is not 5 to 9)"],
    ["view=2", /^view=2 \(/],
  ])("%s: named, and the rest of the address holds", (query, said) => {
    const { view: v, ignored } = decode(`${query}&plain=1&without=c1`);
    expect(ignored.filter((line) => (typeof said === "string" ? line === said : said.test(line))).length).toBe(1);
    expect([v.plain, v.without]).toEqual([true, ["c1"]]);
    expect(v.film === null || query.includes("frames")).toBe(true);
  });

  test("whatever stands in an address, reading it does not throw", () =>
    fc.assert(
      fc.property(
        fc.array(
          fc.tuple(
            fc.constantFrom(
              "pH",
              "Eh",
              "pin",
              "on",
              "vary",
              "over",
              "scale",
              "reach",
              "hide",
              "pair",
              "brush",
              "window",
            ),
            fc.string(),
          ),
        ),
        (pairs) => {
          // prettier-ignore
          decodeView(new URLSearchParams(pairs), inputs);
        },
      ),
    ));
});
