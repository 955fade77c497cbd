import { adviceFor } from "../../shared/advice/openings";
import { robustWindow } from "../../shared/advice/robust";
import type { OnProgress } from "../../shared/advice/search";
import { tidied } from "../../shared/advice/tidy";
import { ok, valueOf } from "../../shared/outcome";
import type { Gammas } from "../../shared/plan/toProblem";
import type { Problem } from "../../shared/schemas/problem";
import type { ChemicalData } from "../../shared/species/chemicalData";
import { libraryFrom } from "../../shared/species/library";
import { sweep } from "../../shared/whatif/sweep";
import type { Answer, Answers, Question, Telling } from "./messages";

// The questions that take longer than a frame, away from the page. The functions are the solver's own.
let data: ChemicalData | null = null;

/** A step a tenth of a second is enough for a bar; more would only fill the page's queue. */
const APART = 100;

function teller(id: number): OnProgress {
  let last = 0;
  return (done, total) => {
    const now = performance.now();
    if (now - last < APART) return;
    last = now;
    self.postMessage({ id, done, total } satisfies Telling);
  };
}

function adviceOf(
  problem: Problem,
  gammas: Gammas | undefined,
  library: ChemicalData,
  tell: OnProgress,
): Answers["advice"] {
  const advice = adviceFor(problem, library, tell, gammas);
  if (!advice.ok) return advice;
  return ok({ ...advice.value, openings: advice.value.openings.map((o) => tidied(o, library, gammas)) });
}

type Asked = Exclude<Question, { kind: "tables" }>;

function valueFor(question: Asked, library: ChemicalData): Answers[keyof Answers] {
  const tell = teller(question.id);
  switch (question.kind) {
    case "advice":
      return adviceOf(question.problem, question.gammas, library, tell);
    case "robust":
      return robustWindow(question.problem, question.ranges, library, tell, question.gammas);
    case "sweep":
      return sweep(question.inputs, question.wish, library, (share) => tell(share, 1));
  }
}

function answer(question: Asked): Answer {
  if (data === null) return { id: question.id, failed: "the library has not arrived" };
  try {
    return { id: question.id, value: valueFor(question, data) };
  } catch (error) {
    return { id: question.id, failed: error instanceof Error ? error.message : String(error) };
  }
}

self.addEventListener("message", (event: MessageEvent<Question>) => {
  const question = event.data;
  if (question.kind === "tables") data = valueOf(libraryFrom(question.tables));
  else self.postMessage(answer(question));
});
