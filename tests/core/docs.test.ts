import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { problemSchema } from "../../shared/schemas/problem";
import { solve } from "../../shared/solve";
import { differences } from "../support/excerpt";
import { library } from "../support/solver";

/** docs/solver.md: its problems are solved, its answers and errors compared to the digits printed, its keys held against the code. */
const page = readFileSync("docs/solver.md", "utf8");
const blocks = [...page.matchAll(/^```json (problem|answer|error) ([\w-]+)\n([\s\S]*?)^```$/gm)].map(
  ([, kind = "", name = "", text = ""]) => ({ kind, name, json: JSON.parse(text) as unknown }),
);
const problems = new Map(blocks.filter((b) => b.kind === "problem").map((b) => [b.name, b.json]));

describe("the examples of docs/solver.md", () => {
  test.each(blocks.filter((b) => b.kind === "answer").map((b) => [b.name, b.json] as const))("%s", (name, excerpt) => {
    const outcome = solve(problems.get(name), library);
    if (!outcome.ok) expect.fail(`${outcome.error.path}: ${outcome.error.message}`);
    expect(differences(outcome.value, excerpt)).toEqual([]);
  });

  test.each(blocks.filter((b) => b.kind === "error").map((b) => [b.name, b.json] as const))("%s", (name, error) => {
    expect(solve(problems.get(name), library)).toEqual({ ok: false, error });
  });

  test("every problem has its answer or error", () =>
    expect([...problems.keys()].sort()).toEqual(
      blocks
        .filter((b) => b.kind !== "problem")
        .map((b) => b.name)
        .sort(),
    ));

  test("an excerpt that is wrong is seen", () => {
    expect(differences({ a: [1.234, 2] }, { a: [1.23, 2] })).toEqual([]);
    expect(differences({ a: [1.234, 2] }, { a: [1.24, 2] })).toEqual([".a.0: 1.234, printed 1.24"]);
    expect(differences({ a: [{ b: 1 }, { b: 2 }] }, { a: [{ b: 2 }] })).toEqual([]);
    expect(differences({ a: [{ b: 1 }, { b: 2 }] }, { a: [{ b: 2 }, { b: 1 }] }).length).toBe(1);
    expect(differences({ a: [] }, { a: null }).length).toBe(1);
    expect(differences({ a: [{ b: 1 }] }, { a: [] }).length).toBe(1);
  });
});

/** Every key an object has, at any depth. */
function keysOf(value: unknown, into = new Set<string>()): Set<string> {
  if (Array.isArray(value)) for (const v of value) keysOf(v, into);
  else if (typeof value === "object" && value !== null)
    for (const [key, v] of Object.entries(value)) {
      into.add(key);
      keysOf(v, into);
    }
  return into;
}

describe("the keys documented are those of the code", () => {
  const [problemPart = "", solutionPart = ""] = [/## The problem\n([\s\S]*?)\n## /.exec(page)?.[1], /## The solution\n([\s\S]*?)\n### /.exec(page)?.[1]]; // prettier-ignore
  const named = (part: string): Set<string> =>
    new Set(
      [...part.matchAll(/^\| (`[^|]+`) \|/gm)].flatMap(([, cell = ""]) =>
        [...cell.matchAll(/`(\w+)`/g)].map((m) => m[1]!),
      ),
    );

  test("of a problem", () => {
    const shape = problemSchema.shape;
    const keys = [
      ...Object.keys(shape),
      ...Object.keys(shape.metals.element.shape),
      ...Object.keys(shape.water.unwrap().shape).filter((k) => k === "bound"),
      ...Object.keys(shape.excludedHazards.unwrap().element.shape),
    ];
    expect([...named(problemPart)].sort()).toEqual([...new Set(keys)].sort());
    for (const key of ["oxygenV", "hydrogenV", "component"]) expect(page).toContain(key);
  });

  test("of a solution", () => {
    const seen = new Set<string>();
    for (const problem of problems.values()) {
      const outcome = solve(problem, library, { shutGround: true });
      if (outcome.ok) keysOf(outcome.value, seen);
    }
    for (const key of seen) expect(page, `docs/solver.md says nothing of ${key}`).toContain(key);
    for (const key of named(solutionPart)) expect([...seen], `${key} is in docs/solver.md alone`).toContain(key);
  });
});

test("what comments say of docs/method.md is there: sections, no steps; decision records are headed alike", () => {
  const sections = new Set(
    [...readFileSync("docs/method.md", "utf8").matchAll(/^## (\d+)\. /gm)].map((m) => Number(m[1])),
  );
  const code = ["shared", "server", "src"].flatMap((folder) =>
    readdirSync(folder, { recursive: true, encoding: "utf8" })
      .filter((name) => /\.tsx?$/.test(name))
      .map((name) => readFileSync(`${folder}/${name}`, "utf8")),
  );
  const named = code.flatMap((text) => [...text.matchAll(/docs\/method\.md, (\w+) ((?:\d+|,| |and|to)+)/g)]);
  expect(named.length).toBeGreaterThan(30);
  for (const [all, word, numbers = ""] of named) {
    expect(["section", "sections"], all).toContain(word);
    for (const n of numbers.match(/\d+/g) ?? []) expect(sections.has(Number(n)), all).toBe(true);
  }
  for (const name of readdirSync("docs/decisions"))
    expect(readFileSync(`docs/decisions/${name}`, "utf8").split("\n")[0]).toMatch(
      new RegExp(`^# ${name.slice(0, 4)} [A-Z]`),
    );
});
