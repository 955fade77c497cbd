import { expect, test } from "vitest";
import { expectInvariants } from "../../support/invariants";
import { solved } from "../../support/solver";
import { invented } from "../../support/synthetic";

// Two species of equal energy everywhere, one dissolved and one solid: which of them ruled hung on the order of the list.
test("of equal species the one whose id comes first rules, whatever the order they are given in", () => {
  const ion = { name: "twin", phase: "aq", k: -5000, p: 1, q: 1 } as const;
  const solid = { name: "twin", phase: "s", k: -5000, p: 1 } as const;
  const other = { name: "other", phase: "aq", k: 0, p: 0, q: 0 } as const;
  const orders = [[ion, solid, other], [other, solid, ion], [solid, other, ion]]; // prettier-ignore
  const answers = orders.map((species) => {
    const problem = invented({ Cu: { requirement: "dissolved", species } });
    const solution = solved(problem);
    expectInvariants(problem, solution);
    return { fields: new Set(solution.fields.map((f) => f.species)), windows: solution.windows };
  });
  expect(answers[0]!.fields).toContain("CuH(aq,twin)");
  expect(answers[0]!.fields).not.toContain("CuH(s,twin)");
  expect(answers[1]).toEqual(answers[0]);
  expect(answers[2]).toEqual(answers[0]);
});
