import { valueOf } from "../../shared/outcome";
import type { Problem } from "../../shared/schemas/problem";
import { solve, type SolveOptions } from "../../shared/solve";
import type { Solution } from "../../shared/solution";
import { chemistry } from "./chemistry";

export const library = chemistry();

export const solved = (problem: Problem, options?: SolveOptions): Solution => valueOf(solve(problem, library, options));

/** A wide frame: all of water's band and well beyond. */
export const wideFrame: Problem["frame"] = { pH: [-1, 15], Eh: [-1.6, 2.0] };

export const band: Problem["controlBand"] = { pH: 0.15, Eh: 0.03 };
