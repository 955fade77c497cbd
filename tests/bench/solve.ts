import { ligandCells, frameTag } from "../../shared/fields/ligandCells";
import { fieldsOf } from "../../shared/fields/fields";
import { rectangle } from "../../shared/geometry/convex";
import { energiesAt } from "../../shared/gibbs/energies";
import { valueOf } from "../../shared/outcome";
import { formationOf, perAtom } from "../../shared/planes/formation";
import { basisAt } from "../../shared/planes/grid";
import type { Problem } from "../../shared/schemas/problem";
import { prepare } from "../../shared/selection/prepare";
import { solve } from "../../shared/solve";
import { kelvin } from "../../shared/units";
import { chemistry } from "../support/chemistry";
import { clocked, median, table } from "./rivals/measure";
import { combinationsOf, makeGrid, type Grid } from "./rivals/grid";
import { eightMixed, fourDemanding, fourInSulfate } from "./rivals/problems";

const library = chemistry();
const SIZE = 400;

function gridOf(problem: Problem): Grid {
  const prepared = valueOf(prepare(problem, library));
  const basis = basisAt(energiesAt(prepared.data, kelvin(problem.temperatureC)));
  const frame = rectangle(problem.frame.pH, problem.frame.Eh, [frameTag(0), frameTag(1), frameTag(2), frameTag(3)]);
  const cells = ligandCells(prepared.components, frame, basis);
  const metals = prepared.metals.map((m) => fieldsOf(m, cells, basis, prepared.sulfateReduction));
  const ligandPlanes = prepared.components.map(({ component, activity, species }) => ({
    component,
    planes: species.map((s) => perAtom(formationOf(s, component, activity, [], basis))),
  }));
  return makeGrid({
    ligands: ligandPlanes.map((l) => l.planes),
    combinations: combinationsOf(ligandPlanes, metals),
    frame: problem.frame,
    size: SIZE,
  });
}

/** Side by side in one process, rounds interleaved so that a busy machine slows both. The temperature moves a little each
 *  round: nothing can be remembered from the round before. */
function compare(name: string, problem: Problem): string[] {
  const grid = gridOf(problem);
  const rounds = 31;
  const perRound = 8;
  const exact: number[] = [];
  const gridded: number[] = [];
  const processor = { exact: [] as number[], gridded: [] as number[] };
  let step = 0;
  const solveOnce = () => valueOf(solve({ ...problem, temperatureC: problem.temperatureC + ++step * 1e-5 }, library));
  for (let i = 0; i < 2000; i++) solveOnce(); // both compiled to the end before the clock starts
  for (let i = 0; i < 3; i++) grid.run();
  for (let i = 0; i < rounds; i++) {
    const solved = clocked(() => {
      for (let k = 0; k < perRound; k++) solveOnce();
    });
    exact.push(solved.wall / perRound);
    processor.exact.push(solved.processor / perRound);
    const run = clocked(() => grid.run());
    gridded.push(run.wall);
    processor.gridded.push(run.processor);
  }
  const rate = grid.evaluations() / median(gridded) / 1000;
  return [
    name,
    median(exact).toFixed(3),
    Math.min(...exact).toFixed(3),
    median(gridded).toFixed(1),
    Math.min(...gridded).toFixed(1),
    `${rate.toFixed(0)} M/s`,
    `${(median(gridded) / median(exact)).toFixed(0)}x`,
    `${(Math.min(...gridded) / Math.min(...exact)).toFixed(0)}x`,
    `${(median(processor.gridded) / median(processor.exact)).toFixed(0)}x`,
  ];
}

table(
  [
    "problem",
    "exact ms, median",
    "min",
    "400x400 grid ms, median",
    "min",
    "grid speed",
    "ratio of medians",
    "ratio of minima",
    "ratio of processor time, medians",
  ],
  [
    compare("4 metals, sulfate, 2 asked", fourInSulfate),
    compare("4 metals, sulfate, 4 asked", fourDemanding),
    compare("8 metals, sulfate + chloride", eightMixed),
  ],
);
