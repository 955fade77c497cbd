// npm run bench: every tests/bench/*.ts, one after the other so that none disturbs another; or those named.
import { spawnSync } from "node:child_process";
import { readdirSync } from "node:fs";
import { join } from "node:path";
import { build } from "esbuild";

const root = join(import.meta.dirname, "../..");
// Those that measure the core alone run as the server is shipped: tsx wraps every inner function to keep its name, which costs time the product
// does not spend.
const core = new Set(["polygons", "scaling", "solve"]);
const named = process.argv.slice(2);
const benches = readdirSync(join(root, "tests/bench"))
  .filter((file) => file.endsWith(".ts"))
  .map((file) => file.replace(/\.ts$/, ""))
  .filter((name) => named.length === 0 || named.includes(name))
  .sort();

async function commandOf(name) {
  const source = join("tests/bench", `${name}.ts`);
  if (!core.has(name)) return ["npx", "tsx", source];
  const outfile = join(root, "dist/bench", `${name}.mjs`);
  await build({
    entryPoints: [join(root, source)],
    outfile,
    bundle: true,
    platform: "node",
    format: "esm",
    target: "node20",
    packages: "external",
    logLevel: "warning",
  });
  return ["node", outfile];
}

for (const name of benches) {
  const [command, ...args] = await commandOf(name);
  const { status } = spawnSync(command, args, { cwd: root, stdio: "inherit" });
  if (status !== 0) process.exitCode = 1;
}
