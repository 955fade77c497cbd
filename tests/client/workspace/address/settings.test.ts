import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { planInputs, type PlanInputs } from "../../../../shared/schemas/plan";
import { baseOf, decodeSettings, encodeSettings } from "../../../../src/features/workspace/address/settings";
import { unusualInputs } from "../../../support/planInputs";

const amount = fc.double({ min: 1e-12, max: 99, noNaN: true });
const metal = fc.record({
  role: fc.constantFrom("target" as const, "gangue" as const, "watched" as const),
  requirement: fc.constantFrom("dissolved" as const, "solid" as const, "free" as const),
  entry: fc.constantFrom("activity" as const, "gPerL" as const),
  value: amount,
  gammaFrom: fc.constantFrom("one" as const, "davies" as const, "typed" as const),
  gamma: fc.option(fc.double({ min: 0.01, max: 10, noNaN: true })),
});
const totals = (names: string[]) =>
  fc.subarray(names).chain((some) => fc.tuple(...some.map((component) => amount.map((activity) => ({ component, activity }))))); // prettier-ignore
const range = (min: number, max: number) =>
  fc
    .uniqueArray(fc.integer({ min: min * 10, max: max * 10 }), { minLength: 2, maxLength: 2 })
    .map(([a = 0, b = 1]): [number, number] => [Math.min(a, b) / 10, Math.max(a, b) / 10]);

/** Any inputs: words with every sign an address is afraid of among them. */
const inputs: fc.Arbitrary<PlanInputs> = fc
  .record({
    temperatureC: fc.double({ min: 0, max: 250, noNaN: true }),
    preset: fc.constantFrom("sulfate" as const, "ammonia" as const, "cyanide" as const),
    metals: fc
      .uniqueArray(fc.constantFrom("Zn", "Fe", "Cu", "Cd"), { minLength: 1 })
      .chain((some) => fc.tuple(...some.map((element) => metal.map((m) => ({ element, ...m }))))),
    ligands: totals(["S", "NH3", "Cl"]),
    others: totals(["K", "Ca"]),
    ionicStrength: fc.option(fc.double({ min: 0.01, max: 5, noNaN: true })),
    sulfateReduction: fc.boolean(),
    solidsBasis: fc.constantFrom("feed" as const, "fresh" as const, "aged" as const),
    feedMinerals: fc.array(fc.string({ maxLength: 12 }), { maxLength: 3 }),
    dosed: fc.subarray(["peroxide", "sulfite"]),
    leftOut: fc.array(fc.record({ species: fc.string({ maxLength: 12 }), reason: fc.string({ minLength: 1, maxLength: 20 }) }), { maxLength: 2 }), // prettier-ignore
    putBack: fc.array(fc.constantFrom("FeOOH(s,goethite)", "true", "null", "a;b:c%3B"), { maxLength: 2 }),
    frame: fc.record({ pH: range(-2, 15), Eh: range(-2, 3) }),
    water: fc.record({ bound: fc.constantFrom("both" as const, "none" as const) }),
    controlBand: fc.record({ pH: fc.double({ min: 0.01, max: 1, noNaN: true }), Eh: fc.double({ min: 0.001, max: 0.5, noNaN: true }) }), // prettier-ignore
    circuit: fc.option(fc.record({ sxOrganic: fc.boolean() }, { requiredKeys: [] }), { nil: undefined }),
    ranges: fc.option(
      fc.record({ temperatureC: range(0, 250), activities: fc.dictionary(fc.constantFrom("Zn", "Fe"), fc.constant<[number, number]>([1e-5, 1])) }, { requiredKeys: [] }), // prettier-ignore
      { nil: undefined },
    ),
    heldSetPoint: fc.option(fc.record({ pH: fc.double({ min: 0, max: 14, noNaN: true }), Eh: fc.double({ min: -1, max: 1, noNaN: true }) }), { nil: undefined }), // prettier-ignore
  })
  .map((x) => planInputs.safeParse(x))
  .filter((parsed) => parsed.success)
  .map((parsed) => parsed.data);

const plain = (x: unknown) => JSON.parse(JSON.stringify(x)) as unknown;

describe("settings in an address", () => {
  test("come back as they were from any revision, through the text of a link", () =>
    fc.assert(
      fc.property(inputs, inputs, fc.integer({ min: 1, max: 9999 }), (base, other, number) => {
        const sent = new URLSearchParams({ settings: encodeSettings({ number, inputs: base }, other) }).toString();
        const text = new URLSearchParams(sent).get("settings") ?? "";
        expect(baseOf(text)).toBe(number);
        expect(plain(decodeSettings(base, text))).toEqual({ inputs: plain(other) });
      }),
      { numRuns: 300 },
    ));

  test("only what differs is written, so that one can read it", () => {
    const base = { number: 3, inputs: unusualInputs };
    const [copper, zinc] = unusualInputs.metals as [PlanInputs["metals"][0], PlanInputs["metals"][0]];
    expect(encodeSettings(base, unusualInputs)).toBe("3~");
    expect(
      encodeSettings(base, {
        ...unusualInputs,
        temperatureC: 85,
        metals: [copper, { ...zinc, value: 1e-8 }],
        solidsBasis: "fresh",
      }),
    ).toBe("3~temperatureC:85;metals.Zn.value:1e-8;solidsBasis:fresh");
  });

  test.each([
    ["3~temperatureC:900", /temperatureC/],
    ["3~temperatureC", /is no setting/],
    ["3~metals.Au.value:1", /no metals Au value/],
    ["3~pressure:5", /no pressure/],
    ["3~frame:{", /cut short/],
    ["3~__proto__.x:1", /no __proto__/],
  ])("%s is refused in words", (text, said) => {
    const decoded = decodeSettings(unusualInputs, text);
    expect("wrong" in decoded ? decoded.wrong : "taken").toMatch(said);
  });

  test("a text without a revision names none", () => {
    expect(baseOf("temperatureC:85")).toBeNull();
    expect(baseOf("3temperatureC:85")).toBeNull();
  });
});
