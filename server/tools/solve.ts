/** npm run --silent solve -- problem.json | -
 *  The solver on the command line: a problem in, a solution out, both JSON (docs/solver.md).
 *  Bad input: exit 2 and { "error": { code, path, message } } on stderr. */
import { readFileSync } from "node:fs";
import { fail, ok, valueOf, type Outcome } from "../../shared/outcome";
import { solve } from "../../shared/solve";
import { libraryFrom } from "../../shared/species/library";
import { readTables } from "../chemistry/readTables";

const sentence = (error: unknown) => (error instanceof Error ? error.message : String(error));

function read(name: string | undefined): Outcome<string> {
  if (name === undefined) return fail("INVALID_INPUT", "", "Name a file with a problem, or - to read it from stdin.");
  try {
    return ok(readFileSync(name === "-" ? 0 : name, "utf8"));
  } catch (error) {
    return fail("INVALID_INPUT", "", `${name} cannot be read: ${sentence(error)}`);
  }
}

function parse(text: string): Outcome<unknown> {
  try {
    return ok(JSON.parse(text));
  } catch (error) {
    return fail("INVALID_INPUT", "", `The problem is not JSON: ${sentence(error)}`);
  }
}

function answer(name: string | undefined) {
  const text = read(name);
  if (!text.ok) return text;
  const problem = parse(text.value);
  if (!problem.ok) return problem;
  return solve(problem.value, valueOf(libraryFrom(readTables().tables)));
}

const outcome = answer(process.argv[2]);
if (outcome.ok) {
  process.stdout.write(`${JSON.stringify(outcome.value)}\n`);
} else {
  process.stderr.write(`${JSON.stringify({ error: outcome.error })}\n`);
  process.exitCode = 2;
}
