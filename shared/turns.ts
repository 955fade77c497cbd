/** Work in turns: a generator that lets go after each part of it, so that whoever drives it can do something else between two. What it
 *  gives does not depend on who drives it. */
export type InTurns<T> = Generator<undefined, T, undefined>;

/** Drives work to its end without a pause.
 *  @param work  in turns     @returns  what it gives     @source  a loop */
export function atOnce<T>(work: InTurns<T>): T {
  for (;;) {
    const turn = work.next();
    if (turn.done) return turn.value;
  }
}
