import type { Limit, LimitKind, Point, Window } from "../solution";
import { type Side, sideOf } from "../windows/limitWords";

/** One limit of a window in two answers. What shuts the ground is the same metal on the same side, or the same water line; the species
 *  beyond may be another, as where Fe^3+ gives way to FeOH^2+. */
export interface LimitMove {
  readonly kind: LimitKind;
  readonly side: Side;
  readonly metal?: string;
  /** stretches of it in the one answer and in the other; none where it does not shut there */
  readonly before: readonly Limit[];
  readonly after: readonly Limit[];
  /** pH after less pH before, read at one potential that both reach; null where none does, or where the limit runs level */
  readonly pH: { readonly by: number; readonly atEh: number } | null;
  /** V after less V before, read at one pH that both reach; null where none does, or where the limit stands upright */
  readonly Eh: { readonly by: number; readonly atPH: number } | null;
}

type Axis = 0 | 1;
const keyOf = (limit: Limit): string =>
  [limit.kind, limit.metal ?? limit.gas ?? "", sideOf(limit), limit.kind === "metal" ? "" : (limit.side ?? "")].join(
    "\n",
  );

function grouped(limits: readonly Limit[]): Map<string, Limit[]> {
  const out = new Map<string, Limit[]>();
  for (const l of limits) out.set(keyOf(l), [...(out.get(keyOf(l)) ?? []), l]);
  return out;
}

/** Ends of a stretch on one axis. */
const span = ({ from, to }: Limit, axis: Axis): [number, number] => [
  Math.min(from[axis], to[axis]),
  Math.max(from[axis], to[axis]),
];
const holds = (l: Limit, axis: Axis, level: number): boolean => {
  const [lo, hi] = span(l, axis);
  return level >= lo && level <= hi;
};
/** Where the line of a limit stands on one axis while the other coordinate has this level. */
function placeOn({ line: [k, x, y] }: Limit, axis: Axis, level: number): number {
  return axis === 0 ? -(k + y * level) / x : -(k + x * level) / y;
}

interface Read {
  readonly by: number;
  readonly at: number;
}

/** How far a limit moved along an axis: read at the level wanted where both reach it (the nearest two, should there be several), else in the middle of the longest
 *  stretch of levels that both reach. */
function moveAlong(before: readonly Limit[], after: readonly Limit[], axis: Axis, wanted: number): Read | null {
  const across: Axis = axis === 0 ? 1 : 0;
  const coefficient = axis === 0 ? 1 : 2;
  const turned = (l: Limit) => Math.abs(l.line[coefficient]) > 1e-9;
  let here: Read | null = null;
  let best: { a: Limit; b: Limit; at: number; length: number } | null = null;
  for (const a of before.filter(turned))
    for (const b of after.filter(turned)) {
      if (holds(a, across, wanted) && holds(b, across, wanted)) {
        const by = placeOn(b, axis, wanted) - placeOn(a, axis, wanted);
        if (here === null || Math.abs(by) < Math.abs(here.by)) here = { by, at: wanted };
      }
      const [p, q] = [span(a, across), span(b, across)];
      const [lo, hi] = [Math.max(p[0], q[0]), Math.min(p[1], q[1])];
      if (hi > lo && hi - lo > (best?.length ?? 0)) best = { a, b, at: (lo + hi) / 2, length: hi - lo };
    }
  return here ?? (best && { by: placeOn(best.b, axis, best.at) - placeOn(best.a, axis, best.at), at: best.at });
}

/** The limits of a window before and after, matched by what shuts there, and how far each moved.
 *  @param before, after  one window of each answer     @param near  where moves are read if both stretches reach it: pH, Eh (V vs SHE)
 *  @returns  limits of both in the order of the first, then those only the second has; by the lines themselves, so exact where read
 *  @source  crossings of the solver's own lines */
export function limitMoves(before: Window, after: Window, near: Point): LimitMove[] {
  const [was, is] = [grouped(before.limits), grouped(after.limits)];
  return [...new Set([...was.keys(), ...is.keys()])].map((key) => {
    const [a, b] = [was.get(key) ?? [], is.get(key) ?? []];
    const first = (a[0] ?? b[0])!;
    const pH = moveAlong(a, b, 0, near[1]);
    const Eh = moveAlong(a, b, 1, near[0]);
    return {
      kind: first.kind,
      side: sideOf(first),
      ...(first.metal === undefined ? {} : { metal: first.metal }),
      before: a,
      after: b,
      pH: pH && { by: pH.by, atEh: pH.at },
      Eh: Eh && { by: Eh.by, atPH: Eh.at },
    };
  });
}
