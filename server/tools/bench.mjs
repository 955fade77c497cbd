// npm run bench: every tests/bench/*.ts, one after the other so that none disturbs another; or those named.
import { spawnSync } from "node:child_process";
import { readdirSync } from "node:fs";
import { join } from "node:path";

const root = join(import.meta.dirname, "../..");
const named = process.argv.slice(2);
const benches = readdirSync(join(root, "tests/bench"))
  .filter((file) => file.endsWith(".ts") && (named.length === 0 || named.includes(file.replace(/\.ts$/, ""))))
  .sort();

for (const bench of benches) {
  const { status } = spawnSync("npx", ["tsx", join("tests/bench", bench)], { cwd: root, stdio: "inherit" });
  if (status !== 0) process.exitCode = 1;
}
