// npm test: check, unit and server tests, build, browser tests. The last line sums the runners' own reports.
import { spawn } from "node:child_process";
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { build, lint, oneByOne, otherChecks, root, step } from "./steps.mjs";

const reports = join(root, "test-results");
// Two lanes count into these: nothing is awaited within a sum.
let passed = 0;
let failed = 0;

/** @returns its exit status */
const run = (command, ...args) =>
  new Promise((resolve) => {
    const child = spawn(command, args, { cwd: root, stdio: "inherit" });
    child.once("error", () => resolve(null)).once("close", resolve);
  });

/** A file that broke before its first test has no failed test, but a failed file: that counts as one. */
function failuresOf(report) {
  const broken = report.testResults.filter(
    ({ status, assertionResults }) => status === "failed" && !assertionResults.some((test) => test.status === "failed"),
  );
  for (const { name, message } of broken) console.log(`No test of ${name.slice(root.length + 1)} ran: ${message}`);
  return report.numFailedTests + broken.length;
}

async function vitest(name, ...projects) {
  const file = join(reports, `${name}.json`);
  const chosen = projects.flatMap((project) => ["--project", project]);
  const status = await run(
    "npx",
    "vitest",
    "run",
    ...chosen,
    "--reporter=default",
    "--reporter=json",
    `--outputFile.json=${file}`,
  );
  if (!existsSync(file)) {
    failed += 1;
    return;
  }
  const report = JSON.parse(readFileSync(file, "utf8"));
  const failures = failuresOf(report);
  passed += report.numPassedTests;
  // An error outside any test, or a run that found no test at all, shows in the status alone.
  failed += failures === 0 && status !== 0 ? 1 : failures;
}

/** @returns whether there is an application for the browser */
async function lintAndBuild() {
  const unclean = await step(lint);
  const unbuilt = await step(build);
  failed += unclean + unbuilt;
  return unbuilt === 0;
}

async function checkAndTest() {
  const unclean = await oneByOne(otherChecks);
  failed += unclean;
  await vitest("unit", "core", "server", "client");
}

rmSync(reports, { recursive: true, force: true });
mkdirSync(reports);

// Both take about as long, and one core each. The browser tests take two.
const [built] = await Promise.all([lintAndBuild(), checkAndTest()]);
if (built) await vitest("browser", "e2e");

const summary = `${passed} passed, ${failed} failed`;
writeFileSync(join(reports, "summary.txt"), `${summary}\n`);
console.log(`\n${summary}`);
process.exitCode = failed === 0 && passed > 0 ? 0 : 1;
