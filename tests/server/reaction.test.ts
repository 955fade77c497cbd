import { spawn } from "node:child_process";
import { once } from "node:events";
import { join } from "node:path";
import { describe, expect, onTestFinished, test } from "vitest";
import { projectRoot } from "../../server/root";
import { valueOf } from "../../shared/outcome";
import { reactionDesk } from "../../shared/reactions/desk";
import { library, testServer } from "../support/testServer";

const question = { species: { "Cu^2+(aq)": -1, "e^-": -2, "Cu(s)": 1 }, temperatureC: 25 };
const plain = (value: unknown): unknown => JSON.parse(JSON.stringify(value));

describe("POST /api/reaction", () => {
  test("answers the desk's numbers to every role that is signed in", async () => {
    const { as } = await testServer();
    const { status, body } = await (await as("technician")).post("/api/reaction").send(question);
    expect(status).toBe(200);
    expect(body).toEqual(plain(valueOf(reactionDesk(library, question))));
    expect(Object.keys(body as object).slice(0, 3)).toEqual(["dG_kJ", "logK", "E0_V"]);
  });
  test.each([
    [{ reaction: "Cu^2+ = Cu", temperatureC: 25 }, "UNBALANCED", "reaction"],
    [{ reaction: "FeOOH + 3 H^+ = Fe^3+ + 2 H2O", temperatureC: 25 }, "AMBIGUOUS_SPECIES", "reaction"],
    [{ ...question, temperatureC: 900 }, "OUT_OF_RANGE", "temperatureC"],
  ])("refuses %j with 400 and the desk's own words", async (body, code, path) => {
    const { as } = await testServer();
    const answer = await (await as("metallurgist")).post("/api/reaction").send(body);
    expect(answer.status).toBe(400);
    expect(answer.body).toMatchObject({ error: { code, path } });
  });
});

async function run(...args: string[]) {
  const loader = join(projectRoot, "node_modules/tsx/dist/loader.mjs");
  const script = join(projectRoot, "server/tools/reaction.ts");
  const child = spawn(process.execPath, ["--import", loader, script, ...args], { cwd: projectRoot });
  onTestFinished(() => void child.kill("SIGKILL"));
  const said = { out: "", err: "" };
  child.stdout.on("data", (text: Buffer) => (said.out += text.toString()));
  child.stderr.on("data", (text: Buffer) => (said.err += text.toString()));
  if (args[0] === "-") child.stdin.end(JSON.stringify(question));
  const [code] = (await once(child, "close")) as [number];
  return { code, ...said };
}

describe("the reaction command", () => {
  test("prints the numbers of its argument, or of stdin, and nothing else", async () => {
    for (const { code, out, err } of await Promise.all([run(JSON.stringify(question)), run("-")])) {
      expect({ code, err }).toEqual({ code: 0, err: "" });
      expect(JSON.parse(out)).toEqual(plain(valueOf(reactionDesk(library, question))));
      expect(out).toMatch(/^\{"dG_kJ":-65\.4\d*,"logK":11\.4\d+,"E0_V":0\.339/);
    }
  });
  test("refuses with exit 2 and the error on stderr", async () => {
    const bad = [JSON.stringify({ ...question, species: { "Cu^2+(aq)": -1, "Cu(s)": 1 } }), "{ not json"];
    const [unbalanced, broken, nothing] = await Promise.all([run(bad[0]!), run(bad[1]!), run()]);
    for (const { code, out } of [unbalanced, broken, nothing]) expect({ code, out }).toEqual({ code: 2, out: "" });
    expect(JSON.parse(unbalanced.err)).toEqual({
      error: { code: "UNBALANCED", path: "species", message: "the right-hand side is off in charge by -2" },
    });
    for (const { err } of [broken, nothing])
      expect(JSON.parse(err)).toMatchObject({ error: { code: "INVALID_INPUT" } });
  });
});
