export const timed = (work: () => void): number => {
  const from = performance.now();
  work();
  return performance.now() - from;
};

/** Time on the wall and of the processor (every thread of the process, its garbage collector's too), ms: the second hardly feels what else
 *  the machine does. */
export function clocked(work: () => void): { wall: number; processor: number } {
  const before = process.cpuUsage();
  const wall = timed(work);
  const { user, system } = process.cpuUsage(before);
  return { wall, processor: (user + system) / 1000 };
}

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
