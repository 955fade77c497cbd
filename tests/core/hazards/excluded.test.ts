import { describe, expect, test } from "vitest";
import { hazardGases } from "../../../shared/hazards/gases";
import { usualThreshold } from "../../../shared/hazards/thresholds";
import { beyondWords, keptWords } from "../../../shared/hazards/words";
import { requirements, type ExcludedHazard, type Problem } from "../../../shared/schemas/problem";
import { solve } from "../../../shared/solve";
import type { Demand } from "../../../shared/solution";
import { hazardLimitComplaints, isClear, lnPressure } from "../../support/hazardOracle";
import { expectInvariants } from "../../support/invariants";
import { isAsRequired, oracleFor } from "../../support/oracle";
import { randomProblem } from "../../support/problems";
import { seeded, type Random } from "../../support/random";
import { insideWindows } from "../../support/read";
import { band, library, solved } from "../../support/solver";

const gold: Problem = {
  temperatureC: 25,
  metals: [{ element: "Au", requirement: "dissolved", activity: 1e-5 }],
  ligands: [{ component: "CN", activity: 0.01 }],
  frame: { pH: [8, 13], Eh: [-0.8, 0.6] },
  controlBand: band,
};
const keep = (problem: Problem, ...excludedHazards: ExcludedHazard[]): Problem => ({ ...problem, excludedHazards });

describe("a cyanide leach kept clear of HCN", () => {
  test("by the site's rule: the window begins at pH 10.5, and the limit says so", () => {
    const problem = keep(gold, { gas: "HCN", pHAtLeast: 10.5 });
    const solution = solved(problem);
    expect(solved(gold).windows[0]!.pH[0]).toBe(8);
    const [window] = solution.windows;
    expect(window!.pH[0]).toBe(10.5);
    const limit = window!.limits.find((l) => l.kind === "hazard")!;
    expect(limit).toMatchObject({
      gas: "HCN",
      pHAtLeast: 10.5,
      inside: "CN^-(aq)",
      outside: "HCN(g)",
      reaction: "CN^- + H^+ = HCN",
      distancePH: 10.5 - window!.setPoint.pH,
    });
    expect(limit.line.map((c) => c + 0)).toEqual([-10.5, 1, 0]);
    expect(limit).not.toHaveProperty("bar");
    expectInvariants(problem, solution);
  });

  test("by pressure: the limit stands where HCN reaches 50 ppm over this liquor", () => {
    const problem = keep(gold, { gas: "HCN" });
    const solution = solved(problem);
    const limit = solution.windows[0]!.limits.find((l) => l.kind === "hazard")!;
    expect(limit).toMatchObject({ gas: "HCN", bar: usualThreshold.HCN.bar });
    expect(limit.from[0]).toBeCloseTo(10.65, 1); // as the region of hazards/regions.ts
    expectInvariants(problem, solution);
  });

  test("no cyanide, nothing to keep out; none kept out is the problem as it was", () => {
    const water: Problem = { ...gold, ligands: [] };
    expect(solved(keep(water, { gas: "HCN", pHAtLeast: 10.5 }))).toEqual(solved(water));
    expect(solved(keep(gold))).toEqual(solved(gold));
  });

  test("a rule that leaves no ground is the conflict, alone or with a metal", () => {
    const acid = keep({ ...gold, frame: { pH: [8, 10], Eh: [-0.8, 0.6] } }, { gas: "HCN", pHAtLeast: 10.5 });
    expect(solved(acid).conflicts).toEqual([[{ gas: "HCN", pHAtLeast: 10.5 }]]);
    const copper = keep(
      { ...gold, metals: [{ element: "Zn", requirement: "compound", activity: 1e-6 }], frame: { pH: [7, 13], Eh: [-0.4, 0.6] }, water: { bound: "none" } },
      { gas: "HCN", pHAtLeast: 13 },
    ); // prettier-ignore
    expect(solved(copper).windows).toEqual([]);
    expectInvariants(copper, solved(copper));
  });
});

test("a hazard's line that is the water line leaves the water line its name", () => {
  const problem = keep({ ...gold, ligands: [{ component: "CN", activity: 0.01 }], water: { bound: "both" } }, { gas: "H2", bar: 1 });
  const kinds = solved(problem).windows.flatMap((w) => w.limits.map((l) => l.kind));
  expect(kinds).toContain("water");
  expect(kinds).not.toContain("hazard");
  const free = solved({ ...problem, water: { bound: "upper" } });
  expect(free.windows[0]!.limits.find((l) => l.kind === "hazard")).toMatchObject({ gas: "H2", bar: 1, reaction: "2 H^+ + 2 e^- = H2" });
}); // prettier-ignore

/** A random question with the means to give gases off, and some of them kept out. */
function hazardous(random: Random): Problem {
  const any = randomProblem(random);
  const totals = new Set([...any.ligands, ...(any.others ?? [])].map((c) => c.component));
  const elements = new Set(any.metals.map((m) => m.element));
  const more = [
    ...(totals.has("CN") || random.chance(0.6) ? [] : [{ component: "CN", activity: random.decade(-3, -1) }]),
    ...(totals.has("NH3") || random.chance(0.7) ? [] : [{ component: "NH3", activity: random.decade(-2, 0.5) }]),
    ...(totals.has("Cl") || random.chance(0.6) ? [] : [{ component: "Cl", activity: random.decade(-2, 0.5) }]),
    ...(totals.has("S") || totals.has("S(sulfide)") || any.sulfateReduction || random.chance(0.6)
      ? []
      : [{ component: "S", activity: random.decade(-2, 0) }]),
  ];
  const hydrides = (["As", "Sb"] as const)
    .filter((e) => !elements.has(e) && random.chance(0.4))
    .map((element) => ({ element, requirement: random.pick(requirements), activity: random.decade(-6, -1) }));
  const easy = random.chance(0.6); // hazards alone shut ground
  const metals = [...any.metals, ...hydrides].map((m) => (easy ? { ...m, requirement: "free" as const } : m));
  const problem: Problem = { ...any, metals, ligands: [...any.ligands, ...more], ...(easy ? { water: { bound: "none" } } : {}) };
  const oracle = oracleFor(problem, library);
  const kept = random.shuffled(hazardGases).slice(0, random.whole(1, 4));
  return {
    ...problem,
    excludedHazards: kept.map((gas): ExcludedHazard => {
      if (gas === "HCN" && random.chance(0.5)) return { gas, pHAtLeast: random.between(8, 12) };
      // a threshold that is met somewhere in the frame
      const ln = lnPressure(oracle, gas, random.between(...any.frame.pH), random.between(...any.frame.Eh));
      const bar = ln === null ? 1e-5 : Math.exp(ln);
      return random.chance(0.2) || !(bar > 1e-30 && bar < 1e4) ? { gas } : { gas, bar };
    }),
  };
} // prettier-ignore

test("a point lies in a window exactly when every requirement holds there and no hazard stands, by hand; every solution keeps the invariants", () => {
  const random = seeded(50_260_412);
  const complaints: string[] = [];
  const seen = { open: 0, cut: 0, limits: new Set<string>() };
  for (let i = 0; i < 240; i++) {
    const problem = hazardous(random);
    const outcome = solve(problem, library);
    if (!outcome.ok) throw new Error(`problem ${i}: ${outcome.error.path} ${outcome.error.message}`);
    const solution = outcome.value;
    const without = solved({ ...problem, excludedHazards: [] });
    const oracle = oracleFor(problem, library);
    const corners = solution.windows.flatMap((w) => w.polygons.flatMap((p) => [p.outer, ...p.holes].flat()));
    for (let k = 0; k < 100; k++) {
      let [pH, Eh] = [random.between(...problem.frame.pH), random.between(...problem.frame.Eh)];
      if (corners.length > 0 && random.chance(0.4)) {
        const [x, y] = random.pick(corners);
        const reach = random.decade(-3, -1);
        [pH, Eh] = [x + reach * random.between(-1, 1), y + 0.06 * reach * random.between(-1, 1)];
      }
      const open = insideWindows(without, pH, Eh); // proved against the oracle by windows/bruteForce.test.ts
      const clear = isClear(oracle, pH, Eh);
      if (clear === null) continue;
      const nearAll = problem.metals.some(({ element, requirement }) => {
        const [best, ...rest] = oracle.standings(element, pH, Eh);
        const rival = rest.find((s) => isAsRequired(requirement, s.state) !== isAsRequired(requirement, best!.state));
        return rival !== undefined && rival.energy - best!.energy < 0.1;
      });
      if (nearAll) continue;
      if (open) seen[clear ? "open" : "cut"] += 1;
      if (insideWindows(solution, pH, Eh) !== (open && clear))
        complaints.push(`problem ${i}: pH ${pH}, ${Eh} V: open ${open}, clear ${clear}`);
    }
    for (const l of solution.windows.flatMap((w) => w.limits)) {
      if (l.kind !== "hazard") continue;
      seen.limits.add(l.gas!);
      complaints.push(...hazardLimitComplaints(oracle, l).map((c) => `problem ${i}: ${c}`));
    }
    expectInvariants(problem, solution);
  }
  expect(complaints).toEqual([]);
  expect(seen.open).toBeGreaterThan(500);
  expect(seen.cut).toBeGreaterThan(100);
  expect([...seen.limits].sort()).toEqual([...hazardGases].sort());
}, 120_000);

test("conflicts with hazards are the minimal sets: every set is shut, none of its parts is, and none is missing", () => {
  const random = seeded(77);
  const named = { hazards: 0, mixed: 0 };
  for (let i = 0; i < 70; i++) {
    const problem = hazardous(random);
    const { windows, conflicts } = solved(problem);
    if (windows.length > 0) continue;
    const demands = [
      ...problem.metals.filter((m) => m.requirement !== "free").map((m) => m.element),
      ...problem.excludedHazards!.map((h) => h.gas),
    ];
    const bound = problem.water ?? { bound: problem.metals.some((m) => m.requirement === "metal") ? ("upper" as const) : ("both" as const) }; // prettier-ignore
    const shut = (set: ReadonlySet<string>): boolean =>
      solved({
        ...problem,
        water: bound,
        metals: problem.metals.map((m) => (set.has(m.element) ? m : { ...m, requirement: "free" })),
        excludedHazards: problem.excludedHazards!.filter((h) => set.has(h.gas)),
      }).windows.length === 0;
    const masks = Array.from({ length: 1 << demands.length }, (_, m) => m);
    const setOf = (mask: number) => new Set(demands.filter((_, k) => mask & (1 << k)));
    const shutMask = masks.map((m) => shut(setOf(m)));
    if (shutMask[0]) continue; // no ground at all
    const minimal = masks.filter(
      (m) => shutMask[m] && demands.every((_, k) => !(m & (1 << k)) || !shutMask[m & ~(1 << k)]),
    );
    const nameOf = (d: Demand) => d.metal ?? d.gas;
    const key = (names: Iterable<string>) => [...names].sort().join(" ");
    expect(conflicts.map((c) => key(c.map(nameOf))).sort()).toEqual(minimal.map((m) => key(setOf(m))).sort());
    const gases = conflicts.map((c) => c.filter((d) => d.gas !== undefined).length);
    named.hazards += gases.filter((n) => n > 0).length;
    named.mixed += conflicts.filter((c, k) => gases[k]! > 0 && c.length > gases[k]!).length;
  }
  expect(named.hazards).toBeGreaterThan(5);
  expect(named.mixed).toBeGreaterThan(2);
}, 120_000);

test("keeping more out never gives ground back", () => {
  const random = seeded(9);
  for (let i = 0; i < 60; i++) {
    const problem = hazardous(random);
    const area = (p: Problem) => solved(p).windows.reduce((s, w) => s + w.area, 0);
    const tighter = problem.excludedHazards!.map((h) =>
      h.pHAtLeast === undefined ? { gas: h.gas, bar: (h.bar ?? usualThreshold[h.gas].bar) / 10 } : { ...h, pHAtLeast: h.pHAtLeast + 0.5 },
    ); // prettier-ignore
    const areas = [
      area({ ...problem, excludedHazards: [] }),
      area(problem),
      area({ ...problem, excludedHazards: tighter }),
    ];
    expect(areas[1]).toBeLessThanOrEqual(areas[0]! * (1 + 1e-9));
    expect(areas[2]).toBeLessThanOrEqual(areas[1]! * (1 + 1e-9));
  }
});

test.each([
  [[{ gas: "HCN" }, { gas: "HCN", pHAtLeast: 10 }], "INVALID_INPUT", "excludedHazards.1.gas"],
  [[{ gas: "HCN", bar: 1e-5, pHAtLeast: 10 }], "INVALID_INPUT", "excludedHazards.0.pHAtLeast"],
  [[{ gas: "H2S", pHAtLeast: 10 }], "INVALID_INPUT", "excludedHazards.0.pHAtLeast"],
  [[{ gas: "HCN", pHAtLeast: 15 }], "OUT_OF_RANGE", "excludedHazards.0.pHAtLeast"],
  [[{ gas: "HCN", bar: 0 }], "OUT_OF_RANGE", "excludedHazards.0.bar"],
  [[{ gas: "PH3" }], "INVALID_INPUT", "excludedHazards.0.gas"],
])("%j is refused", (excludedHazards, code, path) => {
  expect(solve({ ...gold, excludedHazards }, library)).toMatchObject({ ok: false, error: { code, path } });
});

test("in words", () => {
  expect(keptWords({ gas: "HCN", bar: usualThreshold.HCN.bar })).toBe("HCN below 50 ppm over the liquor");
  expect(beyondWords({ gas: "HCN", pHAtLeast: 10.5 })).toBe("HCN: pH falls below 10.5");
});
