import { expect, test } from "vitest";
import { coupleOverWords } from "../../../shared/advice/checkedWords";
import { robustWindow } from "../../../shared/advice/robust";
import { analyse } from "../../../shared/analysis";
import { valueOf } from "../../../shared/outcome";
import type { Problem } from "../../../shared/schemas/problem";
import { coupleAt } from "../../../shared/setpoint/couple";
import { band, library } from "../../support/solver";

const ferric: Problem = {
  temperatureC: 25,
  metals: [{ element: "Fe", requirement: "dissolved", activity: 0.3 }, { element: "Cu", requirement: "free", activity: 0.05 }], // prettier-ignore
  ligands: [{ component: "S", activity: 1 }],
  solidsBasis: "fresh",
  frame: { pH: [-0.5, 2], Eh: [0.5, 1.1] },
  controlBand: band,
  sulfateReduction: false,
};

test("over a range each temperature keeps the couple that holds there, as one solution at that temperature has it", () => {
  const { windows, checked } = valueOf(robustWindow(ferric, { temperatureC: [25, 95] }, library));
  const [{ couples, setPoint }] = windows as [(typeof windows)[0]];
  expect(couples.length).toBe(2);
  expect(setPoint).toMatchObject({ mixedPotential: false, couple: ["FeSO4(aq)", "FeSO4^+(aq)"] });
  for (const temperatureC of checked.temperatures) {
    const { prepared, cells, metals, basis } = valueOf(analyse({ ...ferric, temperatureC }, library));
    const there = coupleAt(prepared.data, cells, metals, basis, [setPoint.pH, setPoint.Eh]);
    expect(couples.filter((c) => temperatureC >= c.from && temperatureC <= c.to).map((c) => c.couple)).toEqual([there]);
  }
  expect(couples[0]!.to).toBeLessThan(couples[1]!.from);
  const hot = valueOf(robustWindow({ ...ferric, temperatureC: 95 }, { temperatureC: [25, 95] }, library)).windows[0]!;
  expect(hot.setPoint.couple).toEqual(["Fe^2+(aq)", "FeSO4^+(aq)"]);
});

test("they are told, and none where Eh is a mixed potential at one temperature", () => {
  const couple = ["Fe^2+(aq)", "Fe^3+(aq)"] as const;
  expect(coupleOverWords([{ couple, from: 25, to: 60 }])).toBe("Eh is set by Fe^3+(aq) over Fe^2+(aq) at every temperature solved.");
  const two = [{ couple, from: 25, to: 60 }, { couple: ["Cu^+(aq)", "Cu^2+(aq)"] as const, from: 65, to: 65 }];
  expect(coupleOverWords(two)?.replaceAll("\u2009", " ")).toBe("Eh is set by Fe^3+(aq) over Fe^2+(aq) from 25.0 °C to 60.0 °C, by Cu^2+(aq) over Cu^+(aq) at 65.0 °C, of the temperatures solved.");
  const poor = { ...ferric, metals: [{ element: "Fe", requirement: "dissolved", activity: 1e-4 } as const] };
  const [window] = valueOf(robustWindow(poor, { temperatureC: [25, 95] }, library)).windows;
  expect(window).toMatchObject({ couples: [], setPoint: { mixedPotential: true } });
  expect(coupleOverWords([])).toBeNull();
}); // prettier-ignore
