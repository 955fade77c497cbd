import { describe, expect, test } from "vitest";
import { chemistry } from "../support/chemistry";

/** The examples of the core's doc comments, run: `@example call // => number`. The digits printed are the tolerance. A call may use every
 *  export of shared/ (its own file first) and `chemistry()`, the library of shared/data. */
const sources = import.meta.glob<string>("../../shared/**/*.ts", { query: "?raw", import: "default", eager: true });
const modules = import.meta.glob<Record<string, unknown>>("../../shared/**/*.ts", { eager: true });

const everything = Object.assign({ chemistry }, ...Object.values(modules)) as Record<string, unknown>;
const line = /@example +(.+?) *\/\/ => (-?\d+(?:\.(\d+))?(?:e(-?\d+))?)(?: *\*\/| *$)/;

function evaluate(call: string, path: string): unknown {
  const scope = { ...everything, ...modules[path] };
  // eslint-disable-next-line @typescript-eslint/no-implied-eval -- the text comes from the repository's own doc comments
  const run = new Function(...Object.keys(scope), `return (${call});`) as (...values: unknown[]) => unknown;
  return run(...Object.values(scope));
}

for (const [path, source] of Object.entries(sources)) {
  const examples = source.split("\n").filter((text) => text.includes("@example "));
  if (examples.length === 0) continue;
  describe(path.replace("../../", ""), () => {
    test.each(examples.map((text) => [text.trim().replace(/^[/* ]+|[ */]+$/g, ""), text]))("%s", (_, text) => {
      const [, call, want, decimals = "", exponent = "0"] = line.exec(text) ?? [];
      if (call === undefined || want === undefined) throw new Error("an example reads: @example call // => number");
      const value = evaluate(call, path);
      if (typeof value !== "number") throw new Error(`${call} gives ${String(value)}, no number`);
      expect(Math.abs(value - Number(want)), `${call} is ${value}`).toBeLessThanOrEqual(
        0.5000001 * 10 ** (Number(exponent) - decimals.length),
      );
    });
  });
}

test("there are examples to run", () =>
  expect(
    Object.values(sources)
      .join("")
      .match(/@example /g)?.length,
  ).toBeGreaterThan(50));
