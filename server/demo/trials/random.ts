/** Seeded numbers: the demo is the same on every machine and in every run. */
export interface Random {
  /** 0 to 1 */
  uniform(): number;
  between(lo: number, hi: number): number;
  /** mean 0, standard deviation 1 */
  normal(): number;
  /** value with a relative scatter of one standard deviation */
  scattered(value: number, relative: number): number;
}

/** @param seed  any integer     @source  mulberry32, public domain; Box and Muller 1958 for the normal */
export function seeded(seed: number): Random {
  let state = seed >>> 0;
  const uniform = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
  const normal = (): number => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform());
  return {
    uniform,
    normal,
    between: (lo, hi) => lo + (hi - lo) * uniform(),
    scattered: (value, relative) => value * (1 + relative * normal()),
  };
}
