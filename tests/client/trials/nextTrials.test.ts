import { describe, expect, test } from "vitest";
import { electrodeSeries } from "../../../shared/electrodes/series";
import type { Feed } from "../../../shared/schemas/feed";
import { planInputs, type PlanInputs } from "../../../shared/schemas/plan";
import type { TrialInput } from "../../../shared/schemas/trial";
import { plannedPoint } from "../../../shared/trials/plannedPoint";
import { namingOf } from "../../../shared/windows/limitWords";
import {
  cautionsBeyond,
  moveTo,
  proposalsOf,
  reachSpan,
  reasonOf,
  setAside,
  sitesOf,
} from "../../../src/features/trials/nextTrials/nextModel";
import { orpAgainst, prefilled, trialsToPlan } from "../../../src/features/trials/nextTrials/planThese";
import { plannedFromPlan } from "../../../src/features/trials/model/fromPlan";
import { emptyTrial } from "../../../src/features/trials/plan/newTrial";
import type { NextAsked } from "../../../src/map/proposalStore";
import { loop } from "../../support/border";
import { library } from "../../support/solver";
import { feedOf, trialOf, typed } from "../../support/trials";
import { windowOf } from "../../support/windowOf";

const unit = { pH: 1, Eh: 1 };
const box = windowOf(loop([[0, 0], [20, 0], [20, 10], [0, 10]]), unit, { kinds: ["frame", "water", "metal", "metal"] }); // prettier-ignore
const asked = (part: Partial<NextAsked> = {}): NextAsked => ({ count: 3, kept: null, aside: [], withinReach: true, ...part }); // prettier-ignore
const places = (list: readonly { pH: number; Eh: number }[]) => list.map(({ pH, Eh }) => [pH, Eh]);
const naming = namingOf(library, { fields: [] });

describe("what counts as tried", () => {
  const trial = (part: object) => ({ code: "T", status: "balanced", figures: { pH: 5, Eh: 0.5 }, comparability: { comparable: true }, compared: {}, ...part }); // prettier-ignore
  const sites = (...parts: object[]) => sitesOf(parts.map(trial) as never, { temperatureC: 60 });
  const unread = { figures: { pH: null, Eh: null }, status: "planned" };

  test("comparable trials where they were measured, planned ones where they are to stand", () =>
    expect(sites({}, { ...unread, code: "P", compared: { plannedAt: { pH: 4, Eh: 0.4, temperatureC: 62 } } })).toEqual([
      { pH: 5, Eh: 0.5, name: "T", kind: "tried" },
      { pH: 4, Eh: 0.4, name: "P", kind: "planned" },
    ]));

  test("not rejected ones, not those under other conditions, not those planned for another temperature or nowhere", () =>
    expect(
      sites(
        { status: "rejected" },
        { comparability: { comparable: false } },
        { ...unread, compared: { plannedAt: { pH: 4, Eh: 0.4, temperatureC: 90 } } },
        { ...unread, compared: { plannedAt: null } },
        unread,
      ),
    ).toEqual([]));
});

describe("the points in hand", () => {
  const own = (a: NextAsked) => proposalsOf(a, box, unit, []).points;

  test("one set aside does not come back, and the others stay", () => {
    const all = own(asked());
    const fewer = setAside(asked(), all, 2);
    expect(fewer.count).toBe(2);
    expect(places(own(fewer))).toEqual([places(all)[0], places(all)[2]]);
  });

  test("one moved: from then on all stay, and more come in away from them", () => {
    const all = own(asked());
    const next = moveTo(asked(), all, 2, [3, 3]);
    expect(places(own(next))).toEqual([places(all)[0], [3, 3], places(all)[2]]);
    const more = own({ ...next, count: 5 });
    expect(places(more.slice(0, 3))).toEqual(places(own(next)));
    expect(more.map((p) => p.n)).toEqual([1, 2, 3, 4, 5]);
    expect(more.map((p) => p.moved)).toEqual([false, true, false, false, false]);
    for (const p of more.slice(3)) expect(p.gap).toBeGreaterThan(1);
  });

  test("the reason says gap, neighbour and limit; moved out of the window it says so", () => {
    const words = (p: Parameters<typeof reasonOf>[0], tried = 1) =>
      reasonOf(p, { along: "both", naming, window: "A", tried });
    const [first, second] = proposalsOf(asked(), box, unit, [{ pH: 1, Eh: 1, name: "T-014", kind: "tried" }]).points;
    expect(words(first!)).toBe(
      "Largest gap: 19.7 control bands from the nearest trial, T-014; 1.0 inside the water line.",
    );
    expect(words(second!)).toMatch(/^Next largest gap: /);
    expect(words(own(asked())[0]!, 0)).toBe(
      "The set point, since nothing comparable was tried yet; 5.0 control bands inside the M2 limit.",
    );
    const out = own(moveTo(asked(), own(asked()), 1, [10, 12]))[0]!;
    expect(words(out)).toMatch(/^Moved by hand: .* control bands from proposal \d; outside window A\.$/);
  });

  test("within reach unless told otherwise", () => {
    const span = reachSpan([{ practical: [3, 5] }, { practical: null }, { practical: [4, 6] }]);
    expect(span).toEqual([3, 6]);
    expect(reachSpan([{ practical: [3, null] }])).toEqual([3, Infinity]);
    expect(reachSpan([{ practical: null }])).toBeNull();
    const Ehs = (withinReach: boolean) => proposalsOf(asked({ withinReach }), box, unit, [], span).points.map((p) => p.Eh); // prettier-ignore
    expect(Ehs(true).every((E) => E >= 3 && E <= 6)).toBe(true);
    expect(Ehs(false).some((E) => E < 3)).toBe(true);
  });
});

const inputs: PlanInputs = planInputs.parse({
  temperatureC: 25,
  preset: "cyanide",
  metals: [{ element: "Au", role: "target", requirement: "dissolved", entry: "activity", value: 1e-5, gammaFrom: "one", gamma: null }], // prettier-ignore
  ligands: [{ component: "CN", activity: 0.01 }],
  others: [],
  ionicStrength: null,
  sulfateReduction: false,
  solidsBasis: "fresh",
  feedMinerals: [],
  dosed: [],
  leftOut: [],
  putBack: [],
  frame: { pH: [9, 13], Eh: [-0.8, 0.6] },
  water: { bound: "both" },
  controlBand: { pH: 0.15, Eh: 0.03 },
});

test("cyanide: a proposal below pH 10.5 carries the caution that the set point above it does not, and asks for a procedure below 10", () => {
  const at = (pH: number) => cautionsBeyond(inputs, { pH, Eh: 0 } as never, { pH: 10.8, Eh: 0 });
  expect(at(9.4)).toMatchObject([{ code: "HCN", confirm: expect.any(String) as string }]);
  expect(at(10.2)).toMatchObject([{ code: "HCN", confirm: null }]);
  expect(at(11)).toEqual([]);
});

describe("turned into planned trials", () => {
  const stage = { code: "L", name: "leach", target: "Au", gangue: null };
  const electrodes = electrodeSeries(library.tables);
  const plan = { inputs, data: library, solution: null, failure: null };
  const empty = emptyTrial({ feedId: "f", code: "x", kind: "leach", stage: "L" });
  const last = {
    code: "CN-07",
    planned: trialOf({ planned: { solids: typed("40 % w/w"), duration: typed("24 h"), temperature: typed("30 C") } })
      .planned,
  };

  test("temperature, tenor and ligands come from the plan, the rest from the last trial, and it says which", () => {
    const { conditions, from } = prefilled(empty, plan, stage, last);
    expect(conditions.temperature.text).toBe("25");
    expect(conditions.solids).toEqual(typed("40 % w/w"));
    expect(conditions.ligands).toEqual([{ component: "CN", value: { text: "1.0e-2", unit: "mol/L" } }]);
    expect(from).toEqual({ temperature: "the plan", tenor: "the plan", ligands: "the plan", solids: "CN-07", duration: "CN-07" }); // prettier-ignore
    expect(prefilled(empty, plan, stage, null).conditions.solids.text).toBe("");
  });

  test("an activity without its gamma is no tenor: what the charge could carry is written, else nothing", () => {
    const strong = { ...plan, inputs: { ...inputs, metals: [{ ...inputs.metals[0]!, element: "Zn", value: 0.08 }] } };
    const zinc = { ...stage, target: "Zn" };
    const tenor = (charge: TrialInput["charge"], feed: Feed | null) =>
      plannedFromPlan({ ...empty, ...trialOf({ charge }) }, strong, 0, zinc, feed).tenor;
    expect(tenor({}, feedOf({ Zn: "57.2 %" })).text).toBe("");
    expect(prefilled(empty, strong, zinc, null).from).not.toHaveProperty("tenor");
    const charge = { dryMass: typed("150 g"), liquorVolume: typed("1 L") };
    expect(tenor(charge, feedOf({ Zn: "57.2 %" }))).toEqual(typed("85.8 g/L"));
    expect(tenor(charge, null).text).toBe("");
  });

  test.each([
    ["SHE", ""],
    ["AGCL-3M", "25"],
    ["AGCL-3M", ""],
  ])("the potential against %s, read back, is the proposed one", (electrode, tC) => {
    const orp = orpAgainst(0.4217, electrode, tC, 40, electrodes)!;
    const back = plannedPoint(trialOf({ planned: { temperature: typed("40 C"), pH: typed("10.5 pH"), orp } }), electrodes); // prettier-ignore
    expect(Math.abs(back!.Eh - 0.4217)).toBeLessThanOrEqual(0.0005 + 1e-9); // whole millivolts
  });

  test("codes go on from the campaign's last one; each keeps its own pH, potential and reason", () => {
    const orp = orpAgainst(0.4, "SHE", "", 25, electrodes)!;
    const made = trialsToPlan({
      campaign: { code: "CN" },
      stage,
      feedId: "f",
      codes: ["CN-07", "CN-03"],
      before: [],
      inputs,
      conditions: prefilled(empty, plan, stage, last).conditions,
      proposals: [
        { pH: 10.512, reason: "Largest gap.", orp },
        { pH: 11, reason: "Next.", orp },
      ],
    });
    expect(made.map((t) => [t.code, t.kind, t.status, t.planned.pH.text, t.notes])).toEqual([
      ["CN-08", "leach", "planned", "10.51", "Proposed. Largest gap."],
      ["CN-09", "leach", "planned", "11.00", "Proposed. Next."],
    ]);
  });
});
