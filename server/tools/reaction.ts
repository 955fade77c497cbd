/** npm run --silent reaction -- '{"species":{"Cu^2+(aq)":-1,"e^-":-2,"Cu(s)":1},"temperatureC":25}'
 *  The reaction desk on the command line: the question as one argument, or - to read it from stdin; dG, log K, E0 and more as JSON.
 *  Bad input: exit 2 and { "error": { code, path, message } } on stderr. */
import { readFileSync } from "node:fs";
import { fail, ok, valueOf, type Outcome } from "../../shared/outcome";
import { reactionDesk } from "../../shared/reactions/desk";
import { libraryFrom } from "../../shared/species/library";
import { readTables } from "../chemistry/readTables";

function read(argument: string | undefined): Outcome<unknown> {
  if (argument === undefined)
    return fail("INVALID_INPUT", "", 'Give a reaction as JSON: {"reaction":"Cu^2+ + 2 e^- = Cu","temperatureC":25}');
  try {
    return ok(JSON.parse(argument === "-" ? readFileSync(0, "utf8") : argument));
  } catch (error) {
    const sentence = error instanceof Error ? error.message : String(error);
    return fail("INVALID_INPUT", "", `The reaction is not JSON: ${sentence}`);
  }
}

function answer(argument: string | undefined) {
  const question = read(argument);
  return question.ok ? reactionDesk(valueOf(libraryFrom(readTables().tables)), question.value) : question;
}

const outcome = answer(process.argv[2]);
if (outcome.ok) {
  process.stdout.write(`${JSON.stringify(outcome.value)}\n`);
} else {
  process.stderr.write(`${JSON.stringify({ error: outcome.error })}\n`);
  process.exitCode = 2;
}
