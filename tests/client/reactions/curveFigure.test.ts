import { expect, test } from "vitest";
import { reactionSeries } from "../../../shared/reactions/desk";
import { valueOf } from "../../../shared/outcome";
import { curveFigure } from "../../../src/features/reactions/curveFigure";
import { seriesTable } from "../../../src/features/reactions/DeskResult";
import { themeColours } from "../../../src/lib/theme";
import { library } from "../../support/solver";

const rows = valueOf(
  reactionSeries(library, { "Cu^2+(aq)": -1, "e^-": -2, "Cu(s)": 1 }, { fromC: 0, toC: 100, stepC: 25 }),
);

test("the curve holds every temperature, within its axes", () => {
  const { data, layout } = curveFigure(rows, "E0", themeColours.light, { width: 400, height: 260 });
  expect(data[0]?.x).toEqual([0, 25, 50, 75, 100]);
  const [lo, hi] = layout.yaxis.range;
  for (const y of data[0]?.y ?? []) {
    expect(y).toBeGreaterThan(lo);
    expect(y).toBeLessThan(hi);
  }
});

test("a quantity the reaction does not have draws nothing", () => {
  const none = rows.map((r) => ({ ...r, E0_V: null }));
  expect(curveFigure(none, "E0", themeColours.dark, { width: 400, height: 260 }).data[0]?.x).toEqual([]);
});

test("the file has one row a temperature and the potential in its column", () => {
  const { header, rows: table } = seriesTable("Cu^2+ + 2 e^- = Cu", rows);
  expect(table).toHaveLength(5);
  expect(table[1]?.[header.indexOf("E0_V_SHE")]).toBeCloseTo(0.34, 2);
});
