/** A boundary as the Atlas prints it, taken apart: `E(A/B) = a + b pH + c log[X]`, `log[X] = a + b pH over S`,
 *  `log([X]/[Y]) = a + b pH`. */
export interface AtlasLine {
  kind: "pair" | "water";
  pair: readonly [string, string];
  intercept: number;
  slope: number;
  /** coefficients of log activities; for a log line the species whose activity stands on the left */
  logs: { formula: string; coefficient: number }[];
}

const minerals: Record<string, string> = { gibbsite: "Al(OH)3", "epsilon-Zn(OH)2": "Zn(OH)2", "inactive Cd(OH)2": "Cd(OH)2", "AsO2-": "AsO2^-" }; // prettier-ignore
const nameOf = (text: string): string => minerals[text.trim()] ?? text.trim();

/** @param statement  of a row of checks.csv     @throws Error on a form not known */
export function readLine(statement: string): AtlasLine {
  const text = statement.split(";")[0]!;
  const at = text.indexOf(" = ");
  const [left, right] = [text.slice(0, at), text.slice(at + 3)];
  const ratio = /log\(\[([^\]]+)\]\/\[([^\]]+)\]\)/;
  if (left === "E") {
    const [, a, b, c] = /^(-?[\d.]+) - ([\d.]+) pH - ([\d.]+) log pH2$/.exec(right)!;
    return {
      kind: "water",
      pair: ["H2", "H^+"],
      intercept: +a!,
      slope: -Number(b),
      logs: [{ formula: "H2", coefficient: -Number(c) }],
    };
  }
  const couple = /^E\((.+)\/(.+)\)$/.exec(left);
  if (couple) {
    const pair = [nameOf(couple[1]!), nameOf(couple[2]!)] as const;
    const log = / ([+-]) ([\d.]+) (log.*)$/.exec(right);
    const plain = log ? right.slice(0, log.index) : right;
    const [, a, sign, b] = /^(-?[\d.]+)(?: ([+-]) ([\d.]+) pH)?$/.exec(plain)!;
    const c = log ? Number(`${log[1]}${log[2]}`) : 0;
    const both = log && (ratio.test(log[3]!) || log[3] === "log ratio");
    const one = log && /^log\[(.+)\]$/.exec(log[3]!);
    const logs = both
      ? [{ formula: pair[0], coefficient: c }, { formula: pair[1], coefficient: -c }] // prettier-ignore
      : one
        ? [{ formula: one[1]!, coefficient: c }]
        : [];
    if (log && logs.length === 0) throw new Error(statement);
    return { kind: "pair", pair, intercept: +a!, slope: b ? Number(`${sign}${b}`) : 0, logs };
  }
  const [, a, sign, b, over] = /^(-?[\d.]+) ([+-]) (\d*) ?pH(?: over (.+))?$/.exec(right)!;
  const slope = Number(`${sign}${b === "" ? 1 : b}`);
  const two = ratio.exec(left);
  const pair = two ? ([two[1]!, two[2]!] as const) : ([/^log\[(.+)\]$/.exec(left)![1]!, nameOf(over!)] as const);
  const logs = pair.slice(0, two ? 2 : 1).map((formula) => ({ formula, coefficient: 1 }));
  return { kind: "pair", pair, intercept: +a!, slope, logs };
}
