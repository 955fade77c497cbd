import type { PlanInputs } from "../../../shared/schemas/plan";

/** The key by which the order of a kind is decided; no entry is called so. */
export const ORDERED = "in order";

export type Entry<Value> = readonly [key: string, value: Value];

/** One kind of setting of a plan, taken apart into what can be decided by itself and put together again. */
export interface Kind<Value> {
  readonly name: string;
  /** what the inputs hold of it, by key, in their order; "" where there is only one */
  of(inputs: PlanInputs): readonly Entry<Value>[];
  /** the inputs with these in place of their own */
  put(inputs: PlanInputs, entries: readonly Entry<Value>[]): PlanInputs;
  what(key: string): string;
  text(value: Value): string;
  /** what the order of its entries is called, where the order is the user's own */
  readonly order?: string;
  /** whether so many are a plan */
  fits?(entries: readonly Entry<Value>[]): boolean;
  /** stands for an entry that is not there; without it: taken out */
  readonly absent?: string;
}
