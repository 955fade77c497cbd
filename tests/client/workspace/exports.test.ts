import { expect, test } from "vitest";
import { polygonsTable, windowsTable, withOrigin } from "../../../src/features/workspace/model/exports";
import { toProblem } from "../../../shared/plan/toProblem";
import { valueOf } from "../../../shared/outcome";
import { solve } from "../../../shared/solve";
import type { Point } from "../../../shared/solution";
import { chemistry } from "../../support/chemistry";
import { sheetInputs } from "../../support/sheetFixture";

const data = chemistry();
const solution = valueOf(solve(toProblem(sheetInputs, data), data, { shutGround: true }));

test("a file of windows holds extents, set point and margin of each, with units in its headers", () => {
  const { header, rows } = windowsTable(solution);
  expect(rows).toHaveLength(solution.windows.length);
  const [window] = solution.windows;
  const row = Object.fromEntries(header.map((h, i) => [h, rows[0]?.[i]]));
  expect(row).toEqual({
    window: "A",
    temperature_C: 57.5,
    area_pH_V: window?.area,
    pH_low: window?.pH[0],
    pH_high: window?.pH[1],
    Eh_low_V_SHE: window?.Eh[0],
    Eh_high_V_SHE: window?.Eh[1],
    set_point_pH: window?.setPoint.pH,
    set_point_Eh_V_SHE: window?.setPoint.Eh,
    margin_bands: window?.setPoint.margin,
    mixed_potential: window?.setPoint.mixedPotential ? "yes" : "no",
    controllable: "yes",
    cut_by_frame: "no",
  });
});

test("every line of a file says whose numbers it holds", () => {
  const { header, rows } = withOrigin(windowsTable(solution), { plan: "Neutral leach", state: "revision 3" });
  expect(header.slice(-2)).toEqual(["plan", "state"]);
  for (const row of rows)
    expect([row.length, ...row.slice(-2)]).toEqual([header.length, "Neutral leach", "revision 3"]);
});

test("a file of polygons gives back every corner the solver drew", () => {
  const { header, rows } = polygonsTable(solution);
  expect(header).toEqual(["what", "metal", "of", "polygon", "ring", "corner", "pH", "Eh_V_SHE"]);
  const ringsOf = (what: string) => {
    const rings = new Map<string, Point[]>();
    for (const row of rows.filter(([w]) => w === what || (what === "field" && String(w).startsWith("field, "))))
      rings.set(row.slice(0, 5).join("|"), [
        ...(rings.get(row.slice(0, 5).join("|")) ?? []),
        [row[6], row[7]] as unknown as Point,
      ]);
    return [...rings.values()];
  };
  const rings = (all: readonly { outer: Point[]; holes: Point[][] }[]) => all.flatMap((o) => [o.outer, ...o.holes]);
  expect(ringsOf("window")).toEqual(rings(solution.windows.flatMap((w) => w.polygons)));
  expect(ringsOf("shut ground")).toEqual(rings((solution.shut ?? []).flatMap((s) => s.polygons)));
  expect(ringsOf("field")).toEqual(solution.fields.map((f) => f.polygon));
  expect(ringsOf("field").length).toBeGreaterThan(8);
});
