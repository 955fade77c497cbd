/** A measured mass with its standard deviation, both in g. */
export interface Weighed {
  readonly value: number;
  readonly s: number;
}

export interface ClosedAccount {
  /** %, out over in, as measured */
  readonly closure: number;
  readonly feed: number;
  readonly solution: number;
  readonly residue: number;
}

/** Feed, solution and residue moved by weighted least squares until feed = solution + residue. The raw values stay beside
 *  the adjusted ones, never under them. d = F - S - T, k = d / (sF^2 + sS^2 + sT^2), F' = F - k sF^2, S' = S + k sS^2.
 *  @param feed, solution, residue  g with their s; not all s zero     @returns  g adjusted, and the closure before
 *  @source  Lagrange multiplier of one linear constraint (practice-checks.json, F09; the AMIRA P754 code asks for stated precision)
 *  @example closeAccount({ value: 10, s: 1 }, { value: 6, s: 1 }, { value: 1, s: 1 }).feed // => 9 */
export function closeAccount(feed: Weighed, solution: Weighed, residue: Weighed): ClosedAccount {
  const gap = feed.value - solution.value - residue.value;
  const spread = feed.s ** 2 + solution.s ** 2 + residue.s ** 2;
  const k = spread === 0 ? 0 : gap / spread;
  return {
    closure: (100 * (solution.value + residue.value)) / feed.value,
    feed: feed.value - k * feed.s ** 2,
    solution: solution.value + k * solution.s ** 2,
    residue: residue.value + k * residue.s ** 2,
  };
}
