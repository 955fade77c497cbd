import type { Advice } from "../../shared/advice/openings";
import type { Ranges, Robust } from "../../shared/advice/robust";
import type { Gammas } from "../../shared/plan/toProblem";
import type { Outcome } from "../../shared/outcome";
import type { ChemicalTables } from "../../shared/schemas/chemistry";
import type { PlanInputs } from "../../shared/schemas/plan";
import type { Problem } from "../../shared/schemas/problem";
import type { Sweep, SweepWish } from "../../shared/whatif/sweep";

/** What the page asks of the worker. The tables come once, before the first question. */
export type Question =
  | { kind: "tables"; tables: ChemicalTables }
  | { kind: "advice"; id: number; problem: Problem; gammas?: Gammas }
  | { kind: "robust"; id: number; problem: Problem; ranges: Ranges; gammas?: Gammas }
  | { kind: "sweep"; id: number; inputs: PlanInputs; wish: SweepWish };

export interface Answers {
  advice: Outcome<Advice>;
  robust: Outcome<Robust>;
  sweep: Outcome<Sweep>;
}

/** While it works, the worker may say how far it is: steps done of steps in all. */
export type Telling = { id: number; done: number; total: number };
export type Answer = { id: number; value: Answers[keyof Answers] } | { id: number; failed: string };
