/** Greatest common divisor.
 *  @param a, b  whole numbers     @returns  not negative; 0 only where both are     @source  Euclid
 *  @example gcd(12, -18) // => 6 */
export function gcd(a: number, b: number): number {
  while (b !== 0) [a, b] = [b, a % b];
  return Math.abs(a);
}

/** The smallest factor that makes counts of a formula whole: 2 for Fe4.5Ni4.5S8.
 *  @param counts  decimal numbers, a thousandth at the finest     @returns  1, 2, 5, 10, 100 or 1000
 *  @throws RangeError where none will do     @source  arithmetic
 *  @example wholeFactor([4.5, 8]) // => 2 */
export function wholeFactor(counts: readonly number[]): number {
  const found = [1, 2, 5, 10, 100, 1000].find((d) => counts.every((n) => Math.abs(n * d - Math.round(n * d)) < 1e-9));
  if (found === undefined) throw new RangeError(`${counts.join(", ")}: finer than a thousandth`);
  return found;
}

function reduce(row: number[]): void {
  let divisor = 0;
  for (const n of row) divisor = gcd(divisor, n);
  if (divisor > 1) for (let i = 0; i < row.length; i += 1) row[i] = (row[i] ?? 0) / divisor;
}

/** Solves sum of x_i column_i = right over whole numbers, without rounding: Gauss-Jordan with rows kept free of common factors. Columns
 *  that an earlier one already makes up for get zero.
 *  @param rows  equations: coefficients of every unknown, the right-hand side last; overwritten
 *  @returns  each unknown as numerator and denominator, or the row (by its place in `rows`) that cannot be met
 *  @source  fraction-free elimination; exact while the numbers stay below 2^53, far beyond any formula */
export function solveWhole(rows: number[][]): { values: [number, number][] } | { unmet: number } {
  const width = (rows[0]?.length ?? 1) - 1;
  const order = rows.map((_, i) => i);
  const pivots: number[] = [];
  for (let column = 0; column < width; column += 1) {
    const at = pivots.length;
    let found = at;
    while (found < rows.length && rows[found]?.[column] === 0) found += 1;
    const pivot = rows[found];
    if (pivot === undefined) continue;
    [rows[at], rows[found]] = [pivot, rows[at] ?? pivot];
    [order[at], order[found]] = [order[found] ?? found, order[at] ?? at];
    const p = pivot[column] ?? 1;
    for (const row of rows) {
      const f = row[column] ?? 0;
      if (row === pivot || f === 0) continue;
      for (let i = 0; i <= width; i += 1) row[i] = (row[i] ?? 0) * p - (pivot[i] ?? 0) * f;
      reduce(row);
    }
    pivots.push(column);
  }
  for (let i = pivots.length; i < rows.length; i += 1) if (rows[i]?.[width] !== 0) return { unmet: order[i] ?? i };
  const values = Array.from({ length: width }, (): [number, number] => [0, 1]);
  pivots.forEach((column, i) => (values[column] = [rows[i]?.[width] ?? 0, rows[i]?.[column] ?? 1]));
  return { values };
}

/** Smallest whole numbers in the ratio of fractions, of the same signs.
 *  @param fractions  numerators and denominators     @returns  whole numbers without a common factor     @source  arithmetic
 *  @example smallestWhole([[1, 2], [-2, 3]])[1] // => -4 */
export function smallestWhole(fractions: readonly (readonly [number, number])[]): number[] {
  let common = 1;
  for (const [n, d] of fractions) {
    const own = Math.abs(d / gcd(n, d));
    common = (common / gcd(common, own)) * own;
  }
  const whole = fractions.map(([n, d]) => (n * common) / d);
  let divisor = 0;
  for (const n of whole) divisor = gcd(divisor, n);
  return whole.map((n) => n / divisor);
}
