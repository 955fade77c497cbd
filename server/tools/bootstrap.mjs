// Brings a clone into a state in which it runs: node_modules, and as asked for the build and a Chromium.
//   node server/tools/bootstrap.mjs [build] [chromium]
// Uses Node's own modules only, and prints on stderr only (the command line solver's stdout is JSON).
import { spawn } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from "node:fs";
import { createRequire } from "node:module";
import { availableParallelism } from "node:os";
import { delimiter, join } from "node:path";
import { findHeadless } from "./chromium.mjs";

const root = join(import.meta.dirname, "../..");
const require = createRequire(join(root, "package.json"));
const say = (text) => process.stderr.write(`${text}\n`);

/** @returns {Promise<boolean>} whether it went well */
const run = (command, args, env = process.env) =>
  new Promise((resolve) => {
    const child = spawn(command, args, { cwd: root, stdio: ["ignore", 2, 2], env });
    child.once("error", (error) => {
      say(`${command}: ${error.message}`);
      resolve(false);
    });
    child.once("close", (status) => resolve(status === 0));
  });

const readJson = (path) => JSON.parse(readFileSync(join(root, path), "utf8"));

/** Is every package that the lock file wants there, in its version? npm keeps its own list of what it installed. */
function packagesMatch() {
  if (!existsSync(join(root, "node_modules/.package-lock.json"))) return false;
  const wanted = readJson("package-lock.json").packages;
  const there = readJson("node_modules/.package-lock.json").packages;
  return Object.entries(wanted).every(
    ([path, { version, optional }]) => path === "" || optional || there[path]?.version === version,
  );
}

/** The native module loads, that is: it is compiled, and for this Node. */
function databaseLoads() {
  try {
    const Sqlite = require("better-sqlite3");
    new Sqlite(":memory:").close();
    return true;
  } catch {
    return false;
  }
}

const onPath = (command) =>
  (process.env.PATH ?? "").split(delimiter).some((folder) => folder !== "" && existsSync(join(folder, command)));

function explainFailedInstall() {
  const missing = ["python3", "make", "g++"].filter((command) => !onPath(command));
  say("\nInstalling the packages failed; what npm says stands above.");
  if (missing.length === 0) return;
  say(`The SQLite driver (better-sqlite3) is compiled on install, and ${missing.join(", ")} cannot be found here.`);
  say("On Debian or Ubuntu: apt-get install python3 make g++. Then run the same command again.");
}

/** @returns {Promise<boolean>} whether every package is there */
async function install() {
  if (packagesMatch() && databaseLoads()) return true;
  say("Installing packages; the SQLite driver is compiled meanwhile, which takes a minute or two.");
  // node-gyp compiles as many files at a time as JOBS says.
  const env = { JOBS: String(availableParallelism()), ...process.env, NODE_ENV: "development" };
  if ((await run("npm", ["ci", "--include=dev", "--loglevel=error"], env)) && packagesMatch() && databaseLoads())
    return true;
  explainFailedInstall();
  return false;
}

const sources = [
  ...["src", "server", "shared", "public"],
  ...["index.html", "vite.config.ts", "tsconfig.json", "package.json", "package-lock.json"],
];

function filesUnder(path) {
  if (!existsSync(path)) return [];
  if (!statSync(path).isDirectory()) return [path];
  return readdirSync(path)
    .sort()
    .flatMap((name) => filesUnder(join(path, name)));
}

function hashOfSources() {
  const hash = createHash("sha256");
  for (const file of sources.flatMap((source) => filesUnder(join(root, source)))) {
    hash.update(file.slice(root.length)).update("\0").update(readFileSync(file));
  }
  return hash.digest("hex");
}

async function build() {
  const stamp = join(root, "dist/.built-from");
  const now = hashOfSources();
  if (existsSync(stamp) && readFileSync(stamp, "utf8") === now) return;
  say("Building ...");
  if (!(await run("npm", ["run", "--silent", "build"]))) process.exit(1);
  mkdirSync(join(root, "dist"), { recursive: true });
  writeFileSync(stamp, now);
}

async function installChromium() {
  if (findHeadless()) return;
  if (process.getuid?.() !== 0 || !onPath("apt-get")) {
    say(
      "No Chromium here: the browser tests will fail. Install one (Debian: apt-get install chromium-headless-shell) or set CHROMIUM_PATH.",
    );
    return;
  }
  say("Installing Debian's Chromium for the browser tests ...");
  const wait = ["-o", "DPkg::Lock::Timeout=300"];
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  await run("apt-get", [...wait, "-qq", "update"], env);
  const got = (name) => run("apt-get", [...wait, "-qq", "install", "-y", "--no-install-recommends", name], env);
  // An older Debian has no such package.
  if (!(await got("chromium-headless-shell")) && !(await got("chromium")))
    say("Chromium could not be installed: the browser tests will fail.");
}

const wanted = process.argv.slice(2);
// One mostly fetches while the other compiles.
const [installed] = await Promise.all([install(), wanted.includes("chromium") && installChromium()]);
if (!installed) process.exit(1);
if (wanted.includes("build")) await build();
