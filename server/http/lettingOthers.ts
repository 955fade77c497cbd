import { setImmediate as afterOthers } from "node:timers/promises";
import type { InTurns } from "../../shared/turns";

/** Drives work so that whatever else is due, a request above all, is done between two turns of it. */
export async function lettingOthers<T>(work: InTurns<T>): Promise<T> {
  for (;;) {
    const turn = work.next();
    if (turn.done) return turn.value;
    await afterOthers();
  }
}
