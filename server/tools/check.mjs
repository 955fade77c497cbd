// Everything that can be said about the code without running it. Each step that fails counts as one failure.
import { lint, oneByOne, otherChecks, step } from "./steps.mjs";

// The linter takes as long as the others together, and one core.
const [linting, rest] = await Promise.all([step(lint), oneByOne(otherChecks)]);
process.exitCode = linting + rest;
