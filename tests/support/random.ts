/** Numbers that look random and are the same in every run. */
export interface Random {
  /** in [low, high) */
  between(low: number, high: number): number;
  /** whole, low to high inclusive */
  whole(low: number, high: number): number;
  pick<T>(list: readonly T[]): T;
  /** a power of ten with its exponent in [low, high) */
  decade(low: number, high: number): number;
  chance(p: number): boolean;
  shuffled<T>(list: readonly T[]): T[];
}

/** @param seed  whole number     @source  mulberry32, public domain */
export function seeded(seed: number): Random {
  let state = seed >>> 0;
  const next = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
  const between = (low: number, high: number): number => low + (high - low) * next();
  const whole = (low: number, high: number): number => low + Math.floor(next() * (high - low + 1));
  return {
    between,
    whole,
    pick: (list) => list[whole(0, list.length - 1)]!,
    decade: (low, high) => 10 ** between(low, high),
    chance: (p) => next() < p,
    shuffled: <T>(list: readonly T[]): T[] => {
      const out = [...list];
      for (let i = out.length - 1; i > 0; i--) {
        const j = whole(0, i);
        [out[i], out[j]] = [out[j]!, out[i]!];
      }
      return out;
    },
  };
}
