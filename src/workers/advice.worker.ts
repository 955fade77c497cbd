import { adviceFor } from "../../shared/advice/openings";
import { robustWindow } from "../../shared/advice/robust";
import { tidied } from "../../shared/advice/tidy";
import { ok, valueOf } from "../../shared/outcome";
import type { Problem } from "../../shared/schemas/problem";
import type { ChemicalData } from "../../shared/species/chemicalData";
import { libraryFrom } from "../../shared/species/library";
import type { Answer, Answers, Question } from "./messages";

// The questions that take longer than a frame, away from the page. The functions are the solver's own.
let data: ChemicalData | null = null;

function adviceOf(problem: Problem, library: ChemicalData): Answers["advice"] {
  const advice = adviceFor(problem, library);
  if (!advice.ok) return advice;
  return ok({ ...advice.value, openings: advice.value.openings.map((o) => tidied(o, library)) });
}

function answer(question: Exclude<Question, { kind: "tables" }>): Answer {
  if (data === null) return { id: question.id, failed: "the library has not arrived" };
  try {
    const value =
      question.kind === "advice"
        ? adviceOf(question.problem, data)
        : robustWindow(question.problem, question.ranges, data);
    return { id: question.id, value };
  } catch (error) {
    return { id: question.id, failed: error instanceof Error ? error.message : String(error) };
  }
}

self.addEventListener("message", (event: MessageEvent<Question>) => {
  const question = event.data;
  if (question.kind === "tables") data = valueOf(libraryFrom(question.tables));
  else self.postMessage(answer(question));
});
