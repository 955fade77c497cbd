// Everything that can be said about the code without running it. Each step that fails counts as one failure.
import { spawn } from "node:child_process";
import { join } from "node:path";

const root = join(import.meta.dirname, "../..");

// Two TypeScripts are installed, and both own a command `tsc`: the fast one is called by its path.
const tsc = ["node", "node_modules/typescript-native/bin/tsc", "--noEmit"];
const lint = ["lint, one-way imports", "npx", "eslint", "--max-warnings", "0", "."];
const others = [
  ["types", ...tsc],
  ["purity of shared/: neither Node nor a browser", ...tsc, "-p", "shared"],
  ["format", "npx", "prettier", "--check", "--log-level", "warn", "."],
  ["dead code", "npx", "knip"],
];

/** Runs one step and prints what it said in one piece. @returns how many steps failed, 0 or 1 */
function step([name, command, ...args]) {
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

async function oneByOne(steps) {
  let failed = 0;
  for (const each of steps) failed += await step(each);
  return failed;
}

// The linter takes as long as the others together, and one core.
const [linting, rest] = await Promise.all([step(lint), oneByOne(others)]);
process.exitCode = linting + rest;
