import { describe, expect, test } from "vitest";
import { expectInvariants } from "../../support/invariants";
import { signedArea } from "../../support/shapes";
import { solved } from "../../support/solver";
import { ELECTRON, invented, inventedLigand, PROTON, type Wanted } from "../../support/synthetic";
import type { Problem } from "../../../shared/schemas/problem";
import type { Solution } from "../../../shared/solution";

/** Pictures no chemistry would draw, from invented species: the frame is pH 0 to 14, -1 to 1 V. */
function checked(problem: Problem): Solution {
  const solution = solved(problem, { shutGround: true });
  expectInvariants(problem, solution);
  return solution;
}

const aq = (name: string, k: number, p: number, q: number): Wanted => ({ name, phase: "aq", k, p, q });
const solid = (name: string, k: number, p: number): Wanted => ({ name, phase: "s", k, p });
const speciesOf = (s: Solution): string[] => [...new Set(s.fields.map((f) => f.species))].sort();

/** Dissolved all round a solid: the solid holds |pH - 7| and |E| F / P below `half`. */
const island = (half: number, at = 7): Wanted[] => [
  aq("west", -at * PROTON, 1, 0),
  aq("east", at * PROTON, -1, 0),
  aq("south", 0, 0, 1),
  aq("north", 0, 0, -1),
  solid("island", -half * PROTON, 0),
];

describe("a window with a hole", () => {
  const half = 2;
  const solution = checked(invented({ Cu: { requirement: "dissolved", species: island(half) } }));
  const width = (2 * half * PROTON) / ELECTRON;

  test("is one window, outline and hole in one polygon", () => {
    expect(solution.windows.length).toBe(1);
    const [polygon] = solution.windows[0]!.polygons;
    expect(polygon!.holes.length).toBe(1);
    expect(signedArea(polygon!.holes[0]!)).toBeCloseTo(-2 * half * width, 6);
    expect(solution.windows[0]!.area).toBeCloseTo(28 - 2 * half * width, 6);
  });

  test("names what shuts each side of the hole", () => {
    const inner = solution.windows[0]!.limits.filter((l) => l.kind === "metal");
    expect(inner.map((l) => l.outside)).toEqual(Array(4).fill("Cu(s,island)"));
    expect(inner.map((l) => l.inside).sort()).toEqual(
      ["CuH^+(aq,west)", "CuOH^-(aq,east)", "Cu^-(aq,south)", "Cu^+(aq,north)"].sort(),
    );
  });

  test("shuts the hole alone", () => {
    expect(solution.shut).toEqual([{ metal: "Cu", polygons: [{ outer: expect.any(Array) as unknown, holes: [] }] }]);
    expect(signedArea(solution.shut![0]!.polygons[0]!.outer)).toBeCloseTo(2 * half * width, 6);
  });

  test("the other way round the shut ground has the hole and the island is the window", () => {
    const turned = checked(invented({ Cu: { requirement: "solid", species: island(half) } }));
    expect(turned.windows[0]!.polygons[0]!.outer.length).toBe(4);
    expect(turned.windows[0]!.area).toBeCloseTo(2 * half * width, 6);
    const [shut] = turned.shut![0]!.polygons;
    expect(signedArea(shut!.outer)).toBeCloseTo(28, 9);
    expect(shut!.holes.map(signedArea)[0]).toBeCloseTo(-2 * half * width, 6);
  });
});

test("islands of two metals make two holes, and meet in one where they overlap", () => {
  const apart = checked(
    invented({
      Cu: { requirement: "dissolved", species: island(1.5, 4) },
      Zn: { requirement: "dissolved", species: island(1.5, 10) },
    }),
  );
  expect(apart.windows.map((w) => w.polygons[0]!.holes.length)).toEqual([2]);
  const together = checked(
    invented({
      Cu: { requirement: "dissolved", species: island(2, 6) },
      Zn: { requirement: "dissolved", species: island(2, 8) },
    }),
  );
  expect(together.windows.map((w) => w.polygons[0]!.holes.length)).toEqual([1]);
});

test("islands that meet in a corner leave one hole of two parts or two, never a window between them", () => {
  const step = 2 * 2; // centres two half-widths apart both ways
  const second = island(2, 7 + step).map((s) => (s.name === "south" ? { ...s, k: -4 * PROTON } : s.name === "north" ? { ...s, k: 4 * PROTON } : s)); // prettier-ignore
  const solution = checked(invented({ Cu: { requirement: "dissolved", species: island(2) }, Zn: { requirement: "dissolved", species: second } })); // prettier-ignore
  expect(solution.windows.length).toBe(1);
  const holes = solution.windows[0]!.polygons[0]!.holes;
  expect(holes.reduce((sum, h) => sum - signedArea(h), 0)).toBeCloseTo((2 * 16 * PROTON) / ELECTRON, 6);
});

describe("edges that coincide", () => {
  test("three and more edges in one point", () => {
    const fan = [0, 1, 2, 3, 4, 5, 6].map((n) => aq(`n${n}`, -n * 7 * PROTON, n, n * (n % 2)));
    const solution = checked(invented({ Cu: { requirement: "dissolved", species: fan } }));
    expect(solution.windows.length).toBe(1);
    expect(solution.windows[0]!.area).toBeCloseTo(28, 9);
  });

  test("a species that only touches the others' corner has no field", () => {
    const corner = [aq("a", -7 * PROTON, 1, 0), aq("b", 7 * PROTON, -1, 0), aq("c", 0, 0, 1), solid("touching", 0, 0)];
    const solution = checked(invented({ Cu: { requirement: "dissolved", species: corner } }));
    expect(speciesOf(solution)).not.toContain("Cu(s,touching)");
    expect(solution.windows.length).toBe(1);
  });

  test("parallel edges, evenly spaced, to the grid's last step", () => {
    const steps = [0, 1, 2, 3].map((n) => solid(`s${n}`, (n * (n - 1)) / 2048, 0));
    const ladder = [aq("up", 0, 1, 0), ...steps, aq("down", 14 * PROTON, -1, 0)];
    expect(speciesOf(checked(invented({ Cu: { requirement: "solid", species: ladder } })))).toContain("Cu(s,s0)");
    const fans = [0, 3, 5, 6].map((k, n) => aq(`f${n}`, -k * PROTON, n, 0)); // edges at pH 1, 2, 3
    const solution = checked(invented({ Cu: { requirement: "dissolved", species: fans } }));
    expect(solution.fields.length).toBe(4);
  });

  test("a limit exactly on the frame's side, and a field that meets the frame in a corner only", () => {
    const onSide = checked(
      invented(
        { Cu: { requirement: "dissolved", species: [aq("ion", 0, 0, 0), aq("other", 0, 0, 1), solid("s", 5e4, 0)] } },
        { frame: { pH: [0, 14], Eh: [0, 1] } },
      ),
    );
    expect(speciesOf(onSide)).toEqual(["Cu(aq,ion)"]);
    const corner = checked(
      invented(
        { Cu: { requirement: "dissolved", species: [aq("ion", 0, 0, 0), solid("s", 0, 1)] } },
        { frame: { pH: [0, 14], Eh: [0, 1] } },
      ),
    );
    expect(speciesOf(corner)).toEqual(["Cu(aq,ion)"]);
    expect(corner.windows[0]!.limits.every((l) => l.kind === "frame")).toBe(true);
  });

  test("two metals with the same limit: the first in the list is named", () => {
    const species = [aq("ion", 0, 0, 1), solid("salt", -40000, 1)];
    for (const order of [
      ["Cu", "Zn"],
      ["Zn", "Cu"],
    ]) {
      const solution = checked(
        invented(Object.fromEntries(order.map((m) => [m, { requirement: "dissolved" as const, species }]))),
      );
      expect(solution.windows[0]!.limits.filter((l) => l.kind === "metal").map((l) => l.metal)).toEqual([order[0]]);
    }
    const against = checked(
      invented({ Cu: { requirement: "dissolved", species }, Zn: { requirement: "solid", species } }),
    );
    expect(against.windows).toEqual([]);
    expect(against.conflicts.map((c) => c.map((m) => m.metal))).toEqual([["Cu", "Zn"]]);
  });

  test("a limit exactly on a water line goes to the water", () => {
    const species = [aq("ion", 0, 0, 0), solid("hydride", 0, 1)]; // the edge is E = -P / F pH, the hydrogen line
    const solution = checked(invented({ Cu: { requirement: "dissolved", species } }, { water: { bound: "both" } }));
    const lower = solution.windows[0]!.limits.filter((l) => l.kind !== "frame");
    expect(lower.map((l) => l.kind)).toEqual(["water", "water"]);
  });
});

test("a side of the frame along which several species follow each other is one limit, wherever the walk begins", () => {
  const names = ["b", "c", "a", "d"]; // the walk begins in the piece of the id that comes first, in the middle of the side
  const stack = names.map((name, n) => aq(name, -[0, 3, 5, 6][n]! * 4000, 0, 2 - n));
  const solution = checked(
    invented({ Cu: { requirement: "dissolved", species: [...stack, solid("corner", -1e5, 2)] } }),
  );
  expect(new Set(solution.fields.map((f) => f.species)).size).toBeGreaterThanOrEqual(4);
  const sides = solution.windows
    .flatMap((w) => w.limits)
    .filter((l) => l.kind === "frame")
    .map((l) => l.side);
  expect(sides.length).toBe(new Set(sides).size);
});

test("several windows, in the order of their margins", () => {
  // dissolved where pH < 2, 4 to 7 and > 12
  const strips = [
    aq("one", 0, 3, 3),
    solid("first", 2 * PROTON - 0, 2),
    aq("two", 6 * PROTON, 1, 1),
    solid("second", 13 * PROTON, 0),
    aq("three", 25 * PROTON, -1, -1),
  ];
  const solution = checked(invented({ Cu: { requirement: "dissolved", species: strips } }, { frame: { pH: [0, 14], Eh: [-0.001, 0.001] } })); // prettier-ignore
  const reach = solution.windows.map((w) => w.pH.map((v) => Math.round(v)));
  expect(reach[0]).toEqual([4, 7]);
  expect(reach.slice(1).sort((a, b) => a[0]! - b[0]!)).toEqual([[0, 2], [12, 14]]); // prettier-ignore
  expect(solution.setPoint).toBe(solution.windows[0]!.setPoint);
});

test("ligand cells' edges cut fields of every metal without leaving a trace in windows", () => {
  const ligand = inventedLigand("Cl", [
    { name: "base", phase: "aq", k: 0, p: 0, q: 1 },
    { name: "acid", phase: "aq", k: -30000, p: 1, q: 1 },
    { name: "gone", phase: "aq", k: 20000, p: 0, q: 0 },
  ]);
  const species: Wanted[] = [
    aq("ion", 0, 0, -1),
    { name: "complex", phase: "aq", k: -3000, p: 0, q: 0, ligands: { Cl: 1 } },
    { name: "pair", phase: "aq", k: -9000, p: 0, q: 1, ligands: { Cl: 2 } },
    solid("metal", 0, 0),
  ];
  const problem = invented({ Cu: { requirement: "dissolved", species }, Zn: { requirement: "free", species } }, ligand);
  const solution = checked(problem);
  const kinds = new Set(solution.windows.flatMap((w) => w.limits.map((l) => l.kind)));
  expect([...kinds].sort()).toEqual(["frame", "metal"]);
  const dissolved = solution.windows.reduce((sum, w) => sum + w.area, 0);
  const shut = solution.shut![0]!.polygons.reduce((sum, { outer, holes }) => sum + [outer, ...holes].reduce((s, l) => s + signedArea(l), 0), 0); // prettier-ignore
  expect(dissolved + shut).toBeCloseTo(28, 9);
  expect(solution.shut![1]!.polygons).toEqual([]);
});
