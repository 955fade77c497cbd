/** npm run bench -- lists
 *  Fills a database of its own with 20,000 trials and prints how long the server takes for list pages, the map, summaries and
 *  files: over HTTP on loopback, signed in, answers read to the end. Beside the time on the wall stands what the processor
 *  worked, server and client together: on a machine with other work that is the number to trust. `LIST_TRIALS=2000` for less. */
import { trialSorts } from "../../shared/schemas/trial";
import { fillTrials } from "./fill/trials";
import { median, table } from "./rivals/measure";
import { startBenchServer, type BenchServer } from "./server/benchServer";

const wanted = Number(process.env.LIST_TRIALS ?? 20_000);
const rounds = 15;

type Filled = ReturnType<typeof fillTrials>;

async function main(): Promise<void> {
  let filled: Filled | undefined;
  const server = await startBenchServer(({ open, chemistry }) => {
    const began = performance.now();
    filled = fillTrials(open, chemistry, wanted);
    console.log(
      `${filled.trialCount} trials in ${filled.campaignIds.length} campaigns, filled in ${((performance.now() - began) / 1000).toFixed(0)} s\n`,
    );
  });
  try {
    await measure(server, filled!);
  } finally {
    server.end();
  }
}

async function measure({ baseURL, cookieOf }: BenchServer, filled: Filled): Promise<void> {
  const { trialCount, campaignIds, mapCampaigns, planId } = filled;
  const cookie = await cookieOf("demo-manager");

  const get = async (path: string): Promise<{ wall: number; cpu: number }> => {
    const [from, worked] = [performance.now(), process.cpuUsage()];
    const answer = await fetch(`${baseURL}${path}`, { headers: { cookie, "accept-encoding": "gzip" } });
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
}

main().catch((error: unknown) => {
  console.error(error);
  process.exitCode = 1;
});
