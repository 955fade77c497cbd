import { useSyncExternalStore } from "react";
import type { Point } from "../../shared/solution";

/** Where the pointer stands, outside React's state: only the read-out listens, so that moving it redraws nothing else. */
export class CursorStore {
  private at: Point | null = null;
  private readonly listeners = new Set<() => void>();
  readonly get = (): Point | null => this.at;
  readonly set = (at: Point | null): void => {
    if (at === this.at) return;
    this.at = at;
    this.listeners.forEach((tell) => tell());
  };
  readonly subscribe = (tell: () => void): (() => void) => {
    this.listeners.add(tell);
    return () => this.listeners.delete(tell);
  };
}

export const useCursor = (store: CursorStore): Point | null => useSyncExternalStore(store.subscribe, store.get);
