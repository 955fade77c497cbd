/** A monotone cubic through nodes, with its integral in closed form. */
export interface MonotoneCubic {
  at(x: number): number;
  /** integral from the first node to x */
  integral(x: number): number;
}

/** Slopes at the nodes: means of the neighbouring secants, zero at a turn, cut back where a piece would overshoot. */
function slopes(x: readonly number[], y: readonly number[]): number[] {
  const n = x.length;
  const secant = (k: number) => ((y[k + 1] ?? 0) - (y[k] ?? 0)) / ((x[k + 1] ?? 0) - (x[k] ?? 0));
  const m = x.map((_, k) => {
    if (k === 0) return secant(0);
    if (k === n - 1) return secant(n - 2);
    const before = secant(k - 1);
    const after = secant(k);
    return before * after <= 0 ? 0 : (before + after) / 2;
  });
  for (let k = 0; k < n - 1; k += 1) {
    const d = secant(k);
    if (d === 0) {
      m[k] = m[k + 1] = 0;
      continue;
    }
    const alpha = (m[k] ?? 0) / d;
    const beta = (m[k + 1] ?? 0) / d;
    const size = Math.hypot(alpha, beta);
    if (size > 3) {
      m[k] = (3 / size) * alpha * d;
      m[k + 1] = (3 / size) * beta * d;
    }
  }
  return m;
}

/** Joins nodes by cubics that rise where the nodes rise and fall where they fall; the derivative is continuous. Outside the nodes the end
 *  piece goes on as a straight line.
 *  @param x  node positions, rising, at least two     @param y  node values     @returns  value and integral at any x
 *  @source  F. N. Fritsch and R. E. Carlson, SIAM J. Numer. Anal. 17, 238-246 (1980)
 *  @example monotoneCubic([0, 1, 2], [0, 1, 4]).at(1) // => 1
 *  @example monotoneCubic([0, 2, 4], [0, 2, 4]).integral(4) // => 8 */
export function monotoneCubic(x: readonly number[], y: readonly number[]): MonotoneCubic {
  const m = slopes(x, y);
  const last = x.length - 1;
  const piece = (k: number) => {
    const h = (x[k + 1] ?? 0) - (x[k] ?? 0);
    return { x0: x[k] ?? 0, h, y0: y[k] ?? 0, y1: y[k + 1] ?? 0, d0: h * (m[k] ?? 0), d1: h * (m[k + 1] ?? 0) };
  };
  const pieces = Array.from({ length: last }, (_, k) => piece(k));
  const part = ({ h, y0, y1, d0, d1 }: (typeof pieces)[number], t: number) =>
    h * t * (y0 + t * (d0 / 2 + t * (y1 - y0 - (2 * d0 + d1) / 3 + (t * (2 * (y0 - y1) + d0 + d1)) / 4)));
  const before: number[] = [0];
  for (const [k, p] of pieces.entries()) before.push((before[k] ?? 0) + part(p, 1));
  const start = { x: x[0] ?? 0, y: y[0] ?? 0, m: m[0] ?? 0 };
  const end = { x: x[last] ?? 0, y: y[last] ?? 0, m: m[last] ?? 0, area: before[last] ?? 0 };

  const indexOf = (at: number) => {
    let k = 0;
    while (k < last - 1 && at >= (x[k + 1] ?? Infinity)) k += 1;
    return k;
  };
  return {
    at(value) {
      if (value < start.x) return start.y + start.m * (value - start.x);
      if (value > end.x) return end.y + end.m * (value - end.x);
      const p = pieces[indexOf(value)];
      if (p === undefined) return start.y;
      const t = (value - p.x0) / p.h;
      return p.y0 + t * (p.d0 + t * (3 * (p.y1 - p.y0) - 2 * p.d0 - p.d1 + t * (2 * (p.y0 - p.y1) + p.d0 + p.d1)));
    },
    integral(value) {
      const over = value - (value < start.x ? start.x : end.x);
      if (value < start.x) return over * (start.y + (start.m * over) / 2);
      if (value > end.x) return end.area + over * (end.y + (end.m * over) / 2);
      const k = indexOf(value);
      const p = pieces[k];
      return p === undefined ? 0 : (before[k] ?? 0) + part(p, (value - p.x0) / p.h);
    },
  };
}
