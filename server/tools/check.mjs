// Everything that can be said about the code without running it. Each step that fails counts as one failure.
import { spawnSync } from "node:child_process";
import { join } from "node:path";

const root = join(import.meta.dirname, "../..");

// Two TypeScripts are installed, and both own a command `tsc`: the fast one is called by its path.
const tsc = ["node", "node_modules/typescript-native/bin/tsc", "--noEmit"];
const steps = [
  ["types", ...tsc],
  ["purity of shared/: neither Node nor a browser", ...tsc, "-p", "shared"],
  ["lint, one-way imports", "npx", "eslint", "--max-warnings", "0", "."],
  ["format", "npx", "prettier", "--check", "--log-level", "warn", "."],
  ["dead code", "npx", "knip"],
];

const failed = steps.filter(([name, command, ...args]) => {
  const began = Date.now();
  const { status } = spawnSync(command, args, { cwd: root, stdio: "inherit" });
  console.log(`${status === 0 ? "ok    " : "FAILED"} ${name} (${((Date.now() - began) / 1000).toFixed(1)} s)`);
  return status !== 0;
});
process.exit(failed.length);
