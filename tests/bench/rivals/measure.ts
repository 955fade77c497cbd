export const timed = (work: () => void): number => {
  const from = performance.now();
  work();
  return performance.now() - from;
};

export const median = (list: readonly number[]): number => [...list].sort((a, b) => a - b)[list.length >> 1]!;

/** A markdown table on stdout. */
export function table(head: readonly string[], rows: readonly (readonly string[])[]): void {
  const line = (cells: readonly string[]): string => `| ${cells.join(" | ")} |`;
  console.log([line(head), line(head.map(() => "---")), ...rows.map(line)].join("\n"));
  console.log("");
}

/** mulberry32: the same numbers every run. */
export function seeded(seed: number): () => number {
  let a = seed >>> 0;
  return () => {
    a = (a + 0x6d2b79f5) >>> 0;
    let t = Math.imul(a ^ (a >>> 15), 1 | a);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}
