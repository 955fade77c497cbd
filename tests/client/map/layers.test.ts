import { expect, test } from "vitest";
import type { HazardRegion } from "../../../shared/hazards/regions";
import type { PublishedRange } from "../../../shared/practice/ranges";
import { gasNames, practiceNames } from "../../../src/map/names/anchoredNames";
import { gasTraces } from "../../../src/map/traces/gases";
import { practiceTraces } from "../../../src/map/traces/practice";
import { robustTraces } from "../../../src/map/traces/robust";
import { themeColours } from "../../../src/lib/theme";
import { view } from "./fixture";

const region = {
  gas: "H2S",
  threshold: { bar: 1e-4, words: "100 ppm, immediately dangerous to life or health (IDLH)" },
  region: [
    {
      outer: [
        [0, 0],
        [4, 0],
        [4, 0.3],
        [0, 0.4],
      ],
      holes: [],
    },
  ],
  isoLines: [
    [
      [4, 0.3],
      [0, 0.4],
    ],
  ],
  atSetPoint: null,
  of: null,
  caution: "",
  limits: null,
} satisfies HazardRegion;

test("a gas is hatched and edged in the signal colour, and named on its edge", () => {
  const [fill, edge] = gasTraces([region], view);
  expect(fill?.fillpattern?.fgcolor).toBe(themeColours.light.signal);
  expect(edge?.line?.color).toBe(themeColours.light.signal);
  const [name] = gasNames([region], view);
  expect(name?.parts.map((p) => p.text).join("")).toBe("H2S, 100 ppm");
});

test("a gas whose edge is out of sight has no name", () => {
  expect(gasNames([{ ...region, isoLines: [] }], view).map((n) => n.places)).toEqual([[]]);
});

const range = { id: "R99", pH: [4.5, 5.4], Eh: null } as unknown as PublishedRange;

test("a published range is a box with its id; an axis it does not speak of spans the frame", () => {
  const [here, elsewhere] = practiceTraces([{ range, atTemperature: true }], view);
  expect(new Set(here?.x)).toEqual(new Set([4.5, 5.4]));
  expect(new Set(here?.y)).toEqual(new Set(view.frame.Eh.map(view.scale.toShown)));
  expect(elsewhere?.x).toEqual([]);
  expect(practiceNames([{ range, atTemperature: true }], view).map((t) => t.parts[0]?.text)).toEqual(["R99"]);
});

test("what holds over the ranges is an outline without a fill", () => {
  const [outline] = robustTraces(region.region, view);
  expect(outline?.fill).toBeUndefined();
  expect(outline?.line?.color).toBe(themeColours.light.verdigris);
});
