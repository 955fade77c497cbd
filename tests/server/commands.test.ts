import { execFileSync, spawn } from "node:child_process";
import { once } from "node:events";
import { mkdirSync, mkdtempSync, rmSync, statSync, writeFileSync } from "node:fs";
import { join, relative } from "node:path";
import { afterAll, beforeAll, expect, onTestFinished, test } from "vitest";
import { projectRoot } from "../../server/root";
import { valueOf } from "../../shared/outcome";
import { solve } from "../../shared/solve";
import { library, temporaryFolder } from "../support/testServer";

interface Ended {
  code: number | null;
  out: string;
  err: string;
}

const tsx = ["--import", join(projectRoot, "node_modules/tsx/dist/loader.mjs")];

function start(node: string[], args: string[], env: Record<string, string> = {}) {
  // The server runs in the process we started: its signals are ours to send.
  const child = spawn(process.execPath, [...node, ...args], {
    cwd: projectRoot,
    env: { PATH: process.env.PATH, ENV_FILE: "", ...env },
  });
  const ended: Ended = { code: null, out: "", err: "" };
  child.stdout.on("data", (text: Buffer) => (ended.out += text.toString()));
  child.stderr.on("data", (text: Buffer) => (ended.err += text.toString()));
  const end = once(child, "close").then(([code]): Ended => ({ ...ended, code: code as number | null }));
  onTestFinished(() => void child.kill("SIGKILL"));
  return { child, ended, end };
}

const startSolve = (args: string[]) => start([...tsx, join(projectRoot, "server/tools/solve.ts")], args);

const problem = {
  temperatureC: 25,
  metals: [{ element: "Zn", requirement: "dissolved", activity: 0.01 }],
  ligands: [],
  frame: { pH: [0, 9], Eh: [-1, 1] },
  controlBand: { pH: 0.2, Eh: 0.04 },
};

test("solve prints the solution of a file, or of stdin, and nothing else", async () => {
  const file = join(temporaryFolder(), "problem.json");
  writeFileSync(file, JSON.stringify(problem));
  const fromFile = startSolve([file]);
  const fromStdin = startSolve(["-"]);
  fromStdin.child.stdin.end(JSON.stringify(problem));
  const solution = valueOf(solve(problem, library));
  for (const { code, out, err } of await Promise.all([fromFile.end, fromStdin.end])) {
    expect({ code, err }).toEqual({ code: 0, err: "" });
    expect(JSON.parse(out)).toEqual(JSON.parse(JSON.stringify(solution)));
  }
});

test.each([
  ["a number out of bounds", JSON.stringify({ ...problem, temperatureC: 900 }), "temperatureC"],
  ["no JSON", '{ "temperatureC": 25, ', ""],
])("solve refuses %s with exit 2 and the error on stderr", async (_what, text, path) => {
  const { child, end } = startSolve(["-"]);
  child.stdin.end(text);
  const { code, out, err } = await end;
  expect({ code, out }).toEqual({ code: 2, out: "" });
  const { error } = JSON.parse(err) as { error: { code: string; path: string; message: string } };
  expect(error.path).toBe(path);
  expect(error.code).not.toBe("");
  expect(error.message).not.toBe("");
});

test("solve refuses a file that is not there and an empty command line in the same shape", async () => {
  for (const args of [["/nowhere/problem.json"], []]) {
    const { code, err } = await startSolve(args).end;
    expect(code).toBe(2);
    expect(JSON.parse(err)).toMatchObject({ error: { code: "INVALID_INPUT" } });
  }
});

/** The server as `npm start` runs it, bundled; the bundle finds the project's folder from where it lies. */
let bundle = "";
beforeAll(() => {
  mkdirSync(join(projectRoot, "test-results"), { recursive: true });
  bundle = join(mkdtempSync(join(projectRoot, "test-results/bundle-")), "server.mjs");
  execFileSync(process.execPath, [join(projectRoot, "server/tools/bundle.mjs"), bundle], { cwd: projectRoot });
});
afterAll(() => rmSync(join(bundle, ".."), { recursive: true, force: true }));
const startServer = (env: Record<string, string>) => start([bundle], [], env);

async function announced(server: ReturnType<typeof start>): Promise<string> {
  const deadline = Date.now() + 60_000;
  while (Date.now() < deadline) {
    const url = /listens on (\S+)\n(?:.*\n)*\n/.exec(server.ended.out)?.[1];
    if (url !== undefined) return url;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  throw new Error(`the server said no address: ${server.ended.out}${server.ended.err}`);
}

test("the server says address and demo accounts, stops on a signal, and a second start changes no data", async () => {
  const DATABASE_PATH = join(temporaryFolder(), "new/folder/site.db");
  const env = { DATABASE_PATH, PORT: "0", LOG_LEVEL: "silent" };
  const first = startServer(env);
  const url = await announced(first);
  expect(first.ended.out).toContain("metallurgist@tarnhollow.example");
  expect((await fetch(`${url}/api/health`)).status).toBe(200);
  const taken = await startServer({ ...env, PORT: new URL(url).port }).end;
  expect(taken.code).toBe(1);
  expect(taken.err).toMatch(/^Port \d+ on 127\.0\.0\.1 is taken: .*PORT\.\n$/);
  first.child.kill("SIGTERM");
  expect(await first.end).toMatchObject({ code: 0, err: "" });

  const { mtimeMs, size } = statSync(DATABASE_PATH);
  const second = startServer(env);
  await announced(second);
  second.child.kill("SIGINT");
  expect(await second.end).toMatchObject({ code: 0, err: "" });
  expect(statSync(DATABASE_PATH)).toMatchObject({ mtimeMs, size });
});

test("settings may stand in a file, and the environment wins over it", async () => {
  const folder = temporaryFolder();
  const file = join(folder, "site.env");
  writeFileSync(file, `DATABASE_PATH=${join(folder, "site.db")}\nPORT=many\nLOG_LEVEL=silent\nSEED_DEMO=0\n`);
  const server = startServer({ ENV_FILE: relative(projectRoot, file), PORT: "0" });
  await announced(server);
  expect(server.ended.out).not.toContain("Demo accounts");
  server.child.kill("SIGTERM");
  expect(await server.end).toMatchObject({ code: 0, err: "" });
});

test("wrong settings stop the start with one readable message", async () => {
  const { code, err } = await startServer({ PORT: "many", SEED_DEMO: "perhaps" }).end;
  expect(code).toBe(1);
  expect(err).toContain("PORT=many");
  expect(err).toContain("SEED_DEMO=perhaps");
  expect(err).not.toContain("at ");
});
