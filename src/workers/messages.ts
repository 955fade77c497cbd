import type { Advice } from "../../shared/advice/openings";
import type { Ranges, Robust } from "../../shared/advice/robust";
import type { Outcome } from "../../shared/outcome";
import type { ChemicalTables } from "../../shared/schemas/chemistry";
import type { Problem } from "../../shared/schemas/problem";

/** What the page asks of the worker. The tables come once, before the first question. */
export type Question =
  | { kind: "tables"; tables: ChemicalTables }
  | { kind: "advice"; id: number; problem: Problem }
  | { kind: "robust"; id: number; problem: Problem; ranges: Ranges };

export interface Answers {
  advice: Outcome<Advice>;
  robust: Outcome<Robust>;
}

export type Answer = { id: number; value: Answers[keyof Answers] } | { id: number; failed: string };
