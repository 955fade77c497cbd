import { describe, expect, test } from "vitest";
import type { Limit } from "../../../shared/solution";
import { limitSentences, sideOf } from "../../../shared/windows/limitWords";
import { window as fixture } from "../map/fixture";

const naming = {
  metalName: (e: string) => ({ Zn: "zinc", Fe: "iron", Cu: "copper" })[e] ?? e,
  stateOf: (_: string, species: string) =>
    species.endsWith("(aq)")
      ? ("dissolved" as const)
      : species === "Cu(s)"
        ? ("metal" as const)
        : ("compound" as const),
};
const limit = (parts: Partial<Limit>): Limit => ({
  kind: "metal",
  line: [0, 1, 0],
  from: [4, 0.3],
  to: [4, 0.8],
  distance: 6,
  distancePH: null,
  distanceEh: null,
  ...parts,
});
const words = (...limits: Limit[]) =>
  limitSentences({ ...fixture, limits }, naming).map(
    (s) => `${s.side}: ${s.what}, ${s.distance?.toFixed(2) ?? "-"} ${s.axis}`,
  );
const electron = (coefficient: number) => [{ species: "e^-", formula: "e^-", coefficient }];

describe("the side of a limit", () => {
  test("is where its outward normal points; a slanted line is held by potential, a steep one by pH", () => {
    expect(sideOf({ line: [-4, 1, 0] })).toBe("low pH");
    expect(sideOf({ line: [6, -1, 0] })).toBe("high pH");
    expect(sideOf({ line: [1, 0, -1] })).toBe("high Eh");
    expect(sideOf({ line: [-1, 0.21, 1] })).toBe("low Eh");
    expect(sideOf({ line: [-1, 1.2, 1] })).toBe("low pH");
  });
});

describe("what happens there, in words", () => {
  test("iron dissolves at low pH and is reduced at low Eh; zinc precipitates at high pH", () => {
    expect(
      words(
        limit({ metal: "Fe", inside: "Fe(OH)3(s,ferrihydrite)", outside: "Fe(SO4)2^-(aq)", distancePH: -1.03 }),
        limit({ metal: "Zn", inside: "ZnSO4(aq)", outside: "ZnO(s)", line: [6, -1, 0], distancePH: 1.06 }),
        limit({
          metal: "Fe",
          inside: "Fe(OH)3(s,ferrihydrite)",
          outside: "FeSO4(aq)",
          line: [-1, 0.19, 1],
          distanceEh: -0.29,
          reactionTerms: electron(-1),
        }),
      ),
    ).toEqual([
      "low pH: iron dissolves, 1.03 pH",
      "high pH: zinc precipitates, 1.06 pH",
      "low Eh: iron is reduced and dissolves, 0.29 Eh",
    ]);
  });
  test("a cemented metal goes back into solution when it is oxidised", () =>
    expect(
      words(
        limit({
          metal: "Cu",
          inside: "Cu(s)",
          outside: "CuSO4(aq)",
          line: [0.3, 0, -1],
          distanceEh: 0.2,
          reactionTerms: electron(2),
        }),
      ),
    ).toEqual(["high Eh: copper is oxidised and dissolves, 0.20 Eh"]));
  test("a dissolved metal goes to metal", () =>
    expect(
      words(
        limit({
          metal: "Cu",
          inside: "CuSO4(aq)",
          outside: "Cu(s)",
          line: [-0.2, 0, 1],
          distanceEh: -0.1,
          reactionTerms: electron(-2),
        }),
      ),
    ).toEqual(["low Eh: copper goes to metal, 0.10 Eh"]));
  test("manganese is oxidised and precipitates; a compound may be oxidised to another", () =>
    expect(
      words(
        limit({ metal: "Mn", inside: "Mn^2+(aq)", outside: "MnO2(s)", line: [1, 0, -1], reactionTerms: electron(2) }),
        limit({
          metal: "Cu",
          inside: "Cu2O(s)",
          outside: "CuO(s)",
          line: [1, 0, -1],
          distance: 7,
          reactionTerms: electron(2),
        }),
      ),
    ).toEqual(["high Eh: Mn is oxidised and precipitates, - Eh", "high Eh: copper is oxidised to a compound, - Eh"]));
  test("water and frame say what they are, and the frame comes last", () =>
    expect(
      words(
        limit({ kind: "frame", side: "low pH", distance: 1 }),
        limit({ kind: "water", side: "oxygen", line: [1, -0.06, -1], distance: 4, distanceEh: 0.15 }),
      ),
    ).toEqual(["high Eh: water gives oxygen, 0.15 Eh", "low pH: the frame ends here, not the window, - pH"]));
  test("stretches of one side and verb make one sentence with the nearest reaction first", () => {
    const near = limit({
      metal: "Fe",
      inside: "FeOOH(s)",
      outside: "Fe^3+(aq)",
      distance: 3,
      reaction: "a",
      distancePH: -1,
    });
    const far = limit({ metal: "Fe", inside: "FeOOH(s)", outside: "FeSO4^+(aq)", distance: 8, reaction: "b" });
    const [sentence, ...rest] = limitSentences({ ...fixture, limits: [far, near] }, naming);
    expect(rest).toEqual([]);
    expect(sentence!.limit).toBe(near);
    expect(sentence!.others).toEqual([far]);
  });
});
