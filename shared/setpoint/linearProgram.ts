/** a u + b v + c m <= d */
export type Constraint = readonly [a: number, b: number, c: number, d: number];

const TINY = 1e-13;

/** Largest value of q . t with p t <= r for all pairs, t in [lo, hi]; null when empty. */
function solve1(
  bounds: readonly (readonly [p: number, r: number])[],
  q: number,
  lo: number,
  hi: number,
): number | null {
  for (const [p, r] of bounds) {
    if (p > TINY) hi = Math.min(hi, r / p);
    else if (p < -TINY) lo = Math.max(lo, r / p);
    else if (r < -1e-9) return null;
  }
  if (lo > hi) return lo - hi < 1e-9 * (1 + Math.abs(lo)) ? (lo + hi) / 2 : null;
  return q >= 0 ? hi : lo;
}

type Pair = readonly [a: number, b: number, d: number];

/** Largest c . (x, y) under a x + b y <= d inside a box; Seidel's incremental method. */
function solve2(rows: readonly Pair[], c: readonly [number, number], box: number): [number, number] | null {
  let x = c[0] >= 0 ? box : -box;
  let y = c[1] >= 0 ? box : -box;
  for (let i = 0; i < rows.length; i++) {
    const [a, b, d] = rows[i]!;
    const size = Math.hypot(a, b);
    if (size < TINY) {
      if (d < -1e-9) return null;
      continue;
    }
    if (a * x + b * y <= d + 1e-12 * (Math.abs(d) + size)) continue;
    // the optimum lies on this row: walk along it
    const px = (a * d) / (size * size);
    const py = (b * d) / (size * size);
    const tx = -b / size;
    const ty = a / size;
    const bounds: [number, number][] = [
      [tx, box - px],
      [-tx, box + px],
      [ty, box - py],
      [-ty, box + py],
    ];
    for (let j = 0; j < i; j++) {
      const [e, f, g] = rows[j]!;
      bounds.push([e * tx + f * ty, g - e * px - f * py]);
    }
    const t = solve1(bounds, c[0] * tx + c[1] * ty, -4 * box, 4 * box);
    if (t === null) return null;
    x = px + t * tx;
    y = py + t * ty;
  }
  return [x, y];
}

/** Largest m under a u + b v + c m <= d, |u|, |v|, |m| <= box. Small and deterministic: rows are taken in the order given.
 *  @param rows  constraints     @param box  bound on every variable     @returns  [u, v, m], or null when nothing is feasible
 *  @source  Seidel 1991, small-dimensional linear programming
 *  @example largest([[-1, 0, 1, 0], [1, 0, 1, 2], [0, -1, 1, 0], [0, 1, 1, 2]], 100)?.[2] ?? 0 // => 1.000 */
export function largest(rows: readonly Constraint[], box: number): [number, number, number] | null {
  let at: [number, number, number] = [box, box, box];
  for (let i = 0; i < rows.length; i++) {
    const row = rows[i]!;
    const [a, b, c, d] = row;
    const size = Math.max(Math.abs(a), Math.abs(b), Math.abs(c));
    if (size < TINY) {
      if (d < -1e-9) return null;
      continue;
    }
    if (a * at[0] + b * at[1] + c * at[2] <= d + 1e-12 * (Math.abs(d) + size)) continue;
    const next = onRow(rows, i, box);
    if (!next) return null;
    at = next;
  }
  return at;
}

/** The optimum on the plane of row i under the rows before it: eliminate the variable with the largest coefficient. */
function onRow(rows: readonly Constraint[], i: number, box: number): [number, number, number] | null {
  const row = rows[i]!;
  let out = 0;
  for (let k = 1; k < 3; k++) if (Math.abs(row[k]!) > Math.abs(row[out]!)) out = k;
  const pivot = row[out]!;
  const [p, q] = out === 0 ? [1, 2] : out === 1 ? [0, 2] : [0, 1];
  const reduced: Pair[] = [];
  for (let j = 0; j < i; j++) {
    const r = rows[j]!;
    const f = r[out]! / pivot;
    reduced.push([r[p]! - f * row[p]!, r[q]! - f * row[q]!, r[3] - f * row[3]]);
  }
  // the eliminated variable stays in the box too
  for (const s of [1, -1]) reduced.push([(-s * row[p]!) / pivot, (-s * row[q]!) / pivot, box - (s * row[3]) / pivot]);
  const objective: [number, number] =
    out === 2 ? [-row[p]! / pivot, -row[q]! / pivot] : [p === 2 ? 1 : 0, q === 2 ? 1 : 0];
  const found = solve2(reduced, objective, box);
  if (!found) return null;
  const at: [number, number, number] = [0, 0, 0];
  at[p] = found[0];
  at[q] = found[1];
  at[out] = (row[3] - row[p]! * found[0] - row[q]! * found[1]) / pivot;
  return at;
}
