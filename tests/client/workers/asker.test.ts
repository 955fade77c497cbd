import { expect, test } from "vitest";
import type { ChemicalTables } from "../../../shared/schemas/chemistry";
import type { Problem } from "../../../shared/schemas/problem";
import { Asker } from "../../../src/workers/asker";
import type { Question } from "../../../src/workers/messages";

/** Stands in for the browser's worker: keeps what it was told, answers when asked to. */
class StandIn extends EventTarget {
  readonly told: Question[] = [];
  ended = false;
  postMessage(question: Question) {
    this.told.push(question);
  }
  terminate() {
    this.ended = true;
  }
  answer(data: object) {
    this.dispatchEvent(new MessageEvent("message", { data }));
  }
}

const tables = {} as ChemicalTables;
const problem = {} as Problem;
function stage() {
  const made: StandIn[] = [];
  const asker = new Asker(tables, () => {
    const worker = new StandIn();
    made.push(worker);
    return worker as unknown as Worker;
  });
  return { made, asker };
}
const idOf = (question: Question | undefined) => (question && "id" in question ? question.id : -1);

test("the tables go first and once; each answer finds its question", async () => {
  const { made, asker } = stage();
  const first = asker.ask<"advice">({ kind: "advice", problem }, new AbortController().signal);
  const second = asker.ask<"advice">({ kind: "advice", problem }, new AbortController().signal);
  const [worker] = made;
  expect(made).toHaveLength(1);
  expect(worker?.told.map((q) => q.kind)).toEqual(["tables", "advice", "advice"]);
  worker?.answer({ id: idOf(worker.told[2]), value: "second" });
  worker?.answer({ id: idOf(worker.told[1]), value: "first" });
  await expect(first).resolves.toBe("first");
  await expect(second).resolves.toBe("second");
});

test("a question given up ends the worker, and the next starts another with its tables", async () => {
  const { made, asker } = stage();
  const giveUp = new AbortController();
  const lost = asker.ask<"advice">({ kind: "advice", problem }, giveUp.signal);
  giveUp.abort();
  await expect(lost).rejects.toThrow("given up");
  expect(made[0]?.ended).toBe(true);
  void asker.ask<"advice">({ kind: "advice", problem }, new AbortController().signal);
  expect(made[1]?.told.map((q) => q.kind)).toEqual(["tables", "advice"]);
});

test("what went wrong inside comes out in words", async () => {
  const { made, asker } = stage();
  const asked = asker.ask<"advice">({ kind: "advice", problem }, new AbortController().signal);
  made[0]?.answer({ id: idOf(made[0].told[1]), failed: "no such table" });
  await expect(asked).rejects.toThrow("no such table");
});

test("the share that is done is told on the way, of its own question only", async () => {
  const { made, asker } = stage();
  const told: unknown[] = [];
  const asked = asker.ask<"advice">({ kind: "advice", problem }, new AbortController().signal, (x, steps) =>
    told.push([x, steps]),
  );
  const id = idOf(made[0]?.told[1]);
  made[0]?.answer({ id, done: 1, total: 4 });
  made[0]?.answer({ id: id + 1, done: 9, total: 10 });
  made[0]?.answer({ id, done: 2, total: 4 });
  made[0]?.answer({ id, value: "done" });
  await expect(asked).resolves.toBe("done");
  expect(told).toEqual([
    [0.25, { done: 1, total: 4 }],
    [0.5, { done: 2, total: 4 }],
  ]);
});
