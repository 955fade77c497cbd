import { render, screen } from "@testing-library/react";
import { expect, test } from "vitest";
import { demoPlans } from "../../../server/demo/plans";
import { toProblem } from "../../../shared/plan/toProblem";
import { potentialScale } from "../../../src/lib/potential";
import { CursorStore } from "../../../src/map/cursorStore";
import { fieldWishes } from "../../../src/map/names/fieldNames";
import { ReadOut } from "../../../src/map/ReadOut";
import { isBeyond, trustOf } from "../../../src/map/trust";
import { library, solved } from "../../support/solver";
import { view } from "./fixture";

const plan = demoPlans[0]!.revisions.at(-1)!.inputs;
const at = (temperatureC: number) => {
  const solution = solved(toProblem({ ...plan, temperatureC }, library), { shutGround: true });
  return { solution, trust: trustOf(solution, library) };
};

test("a field beyond its species' trusted temperatures is marked on the map and in the read-out, with model and range", () => {
  const hot = at(150);
  // an ion pair with an entropy is trusted to 100 C, hematite by its polynomial to 250 C
  expect(isBeyond(hot.trust, "ZnSO4(aq)")).toBe(true);
  expect(isBeyond(hot.trust, "Fe2O3(s,hematite)")).toBe(false);
  const names = (trust: typeof hot.trust) =>
    fieldWishes(hot.solution.fields, { ...view, metals: plan.metals, focus: null, trust }, (x, y) => [x, y]).map((w) =>
      w.lines[0]!.parts.map((p) => p.text).join(""),
    );
  expect(names(hot.trust)).toEqual(expect.arrayContaining(["ZnSO4(aq)†", "Fe2O3"]));

  const shown = (t: ReturnType<typeof at>) => {
    const { unmount } = render(
      <ReadOut
        store={new CursorStore()}
        solution={t.solution}
        metals={plan.metals}
        scale={potentialScale("V")}
        rest={{ at: [3, 0.6], words: "here" }}
        trust={t.trust}
      />,
    );
    const box = screen.getByTestId("read-out");
    const found = { text: box.textContent, titles: [...box.querySelectorAll("[title]")].map((e) => e.getAttribute("title")) }; // prettier-ignore
    unmount();
    return found;
  };
  expect(shown(hot).text).toContain("† extrapolated");
  expect(shown(hot).titles).toContainEqual(expect.stringMatching(/^ZnSO4 at 150 C: .*trusted from 0 to 100 C\.$/));
  expect(shown(at(60)).text).not.toContain("†");
  expect(shown(at(60)).titles).toContainEqual(expect.stringMatching(/trusted 0 to 100.°C$/));
});
