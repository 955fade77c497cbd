// The steps that `npm run check` and `npm test` share.
import { spawn } from "node:child_process";
import { join } from "node:path";

export const root = join(import.meta.dirname, "../..");

// Two TypeScripts are installed, and both own a command `tsc`: the fast one is called by its path.
const tsc = ["node", "node_modules/typescript-native/bin/tsc", "--noEmit"];
// With more room for what lives briefly the collector runs less often: a fifth of the linter's time was the collector's.
const eslint = ["node", "--max-semi-space-size=64", "node_modules/eslint/bin/eslint.js"];
export const lint = ["lint, one-way imports", ...eslint, "--max-warnings", "0", "."];
export const otherChecks = [
  ["types", ...tsc],
  ["purity of shared/: neither Node nor a browser", ...tsc, "-p", "shared"],
  ["format", "npx", "prettier", "--check", "--log-level", "warn", "."],
  ["dead code", "npx", "knip"],
];
export const build = ["build", "node", "server/tools/bootstrap.mjs", "build"];

/** Runs one step and prints what it said in one piece. @returns how many steps failed, 0 or 1 */
export function step([name, command, ...args]) {
  const began = Date.now();
  const child = spawn(command, args, { cwd: root, stdio: ["ignore", "pipe", "pipe"] });
  let said = "";
  for (const stream of [child.stdout, child.stderr]) stream.on("data", (text) => (said += text));
  return new Promise((resolve) => {
    child.once("close", (code) => {
      const seconds = ((Date.now() - began) / 1000).toFixed(1);
      console.log(`${said}${code === 0 ? "ok    " : "FAILED"} ${name} (${seconds} s)`);
      resolve(code === 0 ? 0 : 1);
    });
  });
}

/** @returns how many failed */
export async function oneByOne(steps) {
  let failed = 0;
  for (const each of steps) failed += await step(each);
  return failed;
}
