import { useSyncExternalStore } from "react";

/** A rectangle of the map in pH and V vs SHE. */
export interface Brushed {
  pH: readonly [number, number];
  Eh: readonly [number, number];
}

export class Value<T> {
  private readonly listeners = new Set<() => void>();
  constructor(private value: T) {}
  readonly get = (): T => this.value;
  readonly set = (next: T): void => {
    if (next === this.value) return;
    this.value = next;
    this.listeners.forEach((tell) => tell());
  };
  readonly subscribe = (tell: () => void): (() => void) => {
    this.listeners.add(tell);
    return () => void this.listeners.delete(tell);
  };
}

/** What map and table tell each other, outside React's state: only those who listen are drawn again. */
export class TrialStore {
  /** the trial under the pointer, on the map or in the table */
  readonly hovered = new Value<string | null>(null);
  readonly brush;
  /** true: the next drag on the map brushes, without a key held */
  readonly brushing = new Value(false);
  constructor(brush: Brushed | null = null) {
    this.brush = new Value(brush);
  }
}

export const useTold = <T>(value: { subscribe: (tell: () => void) => () => void; get: () => T }): T =>
  useSyncExternalStore(value.subscribe, value.get);

export const inBrush = ({ pH, Eh }: { pH: number; Eh: number }, brush: Brushed): boolean =>
  pH >= brush.pH[0] && pH <= brush.pH[1] && Eh >= brush.Eh[0] && Eh <= brush.Eh[1];
