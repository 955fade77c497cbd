/** npm run bench -- lists
 *  Fills a database of its own with 20,000 trials and prints how long the server takes for list pages, the map, summaries and
 *  files: over HTTP on loopback, signed in, answers read to the end. Beside the time on the wall stands what the processor
 *  worked, server and client together: on a machine with other work that is the number to trust. `LIST_TRIALS=2000` for less. */
import { mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import pino from "pino";
import { createApp } from "../../server/app";
import { readTables } from "../../server/chemistry/readTables";
import { readConfig } from "../../server/config";
import { migrateDatabase } from "../../server/db/migrate";
import { openDatabase } from "../../server/db/open";
import { seedDemo } from "../../server/demo/seed";
import { createSessions } from "../../server/features/auth/sessions";
import { createChemistry } from "../../server/features/chemistry/library";
import { keepVersion } from "../../server/features/chemistry/service";
import { createMailer } from "../../server/features/mailbox/mailer";
import { trialSorts } from "../../shared/schemas/trial";
import { solve } from "../../shared/solve";
import { fillTrials } from "./fill/trials";
import { median, table } from "./rivals/measure";

const wanted = Number(process.env.LIST_TRIALS ?? 20_000);
const rounds = 15;
const folder = mkdtempSync(join(tmpdir(), "gangueway-bench-"));

const open = openDatabase(join(folder, "bench.db"));
migrateDatabase(open);
open.raw.pragma("synchronous = OFF"); // filling is not what is measured
const { db } = open;
const { tables } = readTables();
const clock = () => new Date();
keepVersion(db, tables, clock());
const chemistry = createChemistry(db, tables, clock());

async function main(): Promise<void> {
  await seedDemo(db, chemistry);
  const began = performance.now();
  const { trialCount, campaignIds, mapCampaigns, planId } = fillTrials(open, chemistry, wanted);
  console.log(
    `${trialCount} trials in ${campaignIds.length} campaigns, filled in ${((performance.now() - began) / 1000).toFixed(0)} s\n`,
  );

  const config = readConfig({ LOG_LEVEL: "silent" });
  const sessions = createSessions(db, { https: false, days: 1 });
  const mailer = createMailer(db, { smtpUrl: null, from: config.mailFrom, clock });
  const log = pino({ level: "silent" });
  const server = createServer(createApp({ db, config, clock, log, sessions, mailer, chemistry, solve }, folder));
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const { port } = server.address() as AddressInfo;
  const cookie = (await sessions.start("demo-manager")).split(";")[0] ?? "";

  const get = async (path: string): Promise<{ wall: number; cpu: number }> => {
    const [from, worked] = [performance.now(), process.cpuUsage()];
    const answer = await fetch(`http://127.0.0.1:${port}${path}`, { headers: { cookie, "accept-encoding": "gzip" } });
    const { byteLength } = await answer.arrayBuffer();
    if (!answer.ok || byteLength === 0) throw new Error(`${path}: ${answer.status}`);
    const { user, system } = process.cpuUsage(worked);
    return { wall: performance.now() - from, cpu: (user + system) / 1000 };
  };
  const measured = async (name: string, path: string): Promise<readonly string[]> => {
    await get(path);
    const walls: number[] = [];
    const cpus: number[] = [];
    for (let i = 0; i < rounds; i += 1) {
      const { wall, cpu } = await get(path);
      walls.push(wall);
      cpus.push(cpu);
    }
    const p95 = [...walls].sort((a, b) => a - b)[Math.floor(0.95 * (rounds - 1))]!;
    return [name, ...[Math.min(...walls), median(walls), p95, median(cpus)].map((ms) => ms.toFixed(1))];
  };

  const list = (query: string) => `/api/trials?limit=50&${query}`;
  const asked: [name: string, path: string][] = [
    ["an answer without work: /api/health", "/api/health"],
    ["list, first page", list("")],
    ["list, last page", list(`offset=${trialCount - 60}`)],
    ["list of 200 rows", "/api/trials?limit=200"],
    ...trialSorts.flatMap((sort): [string, string][] => [
      [`list by ${sort}, rising`, list(`sort=${sort}&order=asc`)],
      [`list by ${sort}, falling, in the middle`, list(`sort=${sort}&order=desc&offset=${trialCount >> 1}`)],
    ]),
    ["list of a campaign, by recovery", list(`campaignId=${campaignIds[0]}&sort=recoveryPct`)],
    ["list of a project, by pH", list("projectId=demo-calcine&sort=pH")],
    ["list of a stage and a status", list("stage=NL&status=approved&sort=recoveryPct")],
    ["list, words found often", list("search=technician")],
    ["list, words found nowhere", list("search=nothing%20like%20it")],
    ["campaigns, by trials", "/api/campaigns?limit=50&sort=trialCount"],
    [`map, ${mapCampaigns.trials} trials`, `/api/plans/${planId}/trials?campaignIds=${mapCampaigns.ids.join(",")}`],
    ["summary of a campaign", `/api/campaigns/${campaignIds[0]}/summary`],
    ["two campaigns side by side", `/api/campaigns/pair?a=${campaignIds[0]}&b=${campaignIds[1]}`],
    ["file of a campaign", `/api/trials.csv?campaignId=${campaignIds[0]}`],
  ];
  const rows: (readonly string[])[] = [];
  for (const [name, path] of asked) rows.push(await measured(name, path));
  console.log(`Milliseconds, ${rounds} times each:\n`);
  table(["asked", "least", "median", "p95", "processor, median"], rows);
  const { wall, cpu } = await get("/api/trials.csv");
  console.log(
    `A file of all ${trialCount} trials: ${(wall / 1000).toFixed(1)} s, processor ${(cpu / 1000).toFixed(1)} s\n`,
  );
  server.closeAllConnections();
  server.close();
}

main()
  .catch((error: unknown) => {
    console.error(error);
    process.exitCode = 1;
  })
  .finally(() => {
    open.raw.close();
    rmSync(folder, { recursive: true, force: true });
  });
