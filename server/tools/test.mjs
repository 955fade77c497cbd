// npm test: check, unit and server tests, build, browser tests. The last line sums the runners' own reports.
import { spawnSync } from "node:child_process";
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";

const root = join(import.meta.dirname, "../..");
const reports = join(root, "test-results");
let passed = 0;
let failed = 0;

const run = (command, ...args) => spawnSync(command, args, { cwd: root, stdio: "inherit" }).status;

/** A file that broke before its first test has no failed test, but a failed file: that counts as one. */
function failuresOf(report) {
  const broken = report.testResults.filter(
    ({ status, assertionResults }) => status === "failed" && !assertionResults.some((test) => test.status === "failed"),
  );
  for (const { name, message } of broken) console.log(`No test of ${name.slice(root.length + 1)} ran: ${message}`);
  return report.numFailedTests + broken.length;
}

function vitest(name, ...projects) {
  const file = join(reports, `${name}.json`);
  const chosen = projects.flatMap((project) => ["--project", project]);
  const status = run(
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

rmSync(reports, { recursive: true, force: true });
mkdirSync(reports);

failed += run("node", "server/tools/check.mjs") ?? 1;
vitest("unit", "core", "server", "client");
if (run("node", "server/tools/bootstrap.mjs", "build") === 0) vitest("browser", "e2e");
else failed += 1;

const summary = `${passed} passed, ${failed} failed`;
writeFileSync(join(reports, "summary.txt"), `${summary}\n`);
console.log(`\n${summary}`);
process.exitCode = failed === 0 && passed > 0 ? 0 : 1;
