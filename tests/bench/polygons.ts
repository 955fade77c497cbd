import { analyse } from "../../shared/analysis";
import { areaOf } from "../../shared/geometry/convex";
import { valueOf } from "../../shared/outcome";
import type { Problem } from "../../shared/schemas/problem";
import { solve } from "../../shared/solve";
import { chemistry } from "../support/chemistry";
import { median, table, timed } from "./rivals/measure";
import { areaOfMulti, byPolygons } from "./rivals/polygons";
import { eightMixed, fourDemanding, fourInSulfate } from "./rivals/problems";

const library = chemistry();

/** Side by side, interleaved; first both must agree on every field and window to 1e-9 of area. */
function compare(name: string, problem: Problem): string[] {
  const analysis = valueOf(analyse(problem, library));
  const theirs = byPolygons(analysis);
  let apart = 0;
  const seen = new Map<string, number>();
  for (const m of analysis.metals)
    for (const c of m.cells)
      for (const f of c.pieces) {
        const key = `${m.metal.element} ${m.formations[f.plane]!.species.id}`;
        seen.set(key, (seen.get(key) ?? 0) + areaOf(f.piece));
      }
  for (const key of new Set([...seen.keys(), ...theirs.fields.keys()]))
    apart = Math.max(apart, Math.abs((seen.get(key) ?? 0) - (theirs.fields.get(key) ?? 0)));
  const windowArea = analysis.pieces.reduce((s, p) => s + areaOf(p.piece), 0);
  apart = Math.max(apart, Math.abs(windowArea - areaOfMulti(theirs.windows)));

  const exact: number[] = [];
  const general: number[] = [];
  for (let i = 0; i < 50; i++) valueOf(solve(problem, library));
  for (let i = 0; i < 9; i++) {
    exact.push(timed(() => valueOf(solve({ ...problem, temperatureC: problem.temperatureC + i * 1e-5 }, library))));
    general.push(timed(() => byPolygons(analysis)));
  }
  const ratio = median(general) / median(exact);
  return [name, median(exact).toFixed(2), median(general).toFixed(1), `${ratio.toFixed(0)}x`, apart.toExponential(1)];
}

table(
  [
    "problem",
    "exact solve ms",
    "general polygon package ms (fields and windows only)",
    "ratio",
    "largest difference of area, pH V",
  ],
  [
    compare("4 metals, sulfate, 2 asked", fourInSulfate),
    compare("4 metals, sulfate, 4 asked", fourDemanding),
    compare("8 metals, sulfate + chloride", eightMixed),
  ],
);
