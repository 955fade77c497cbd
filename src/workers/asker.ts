import type { ChemicalTables } from "../../shared/schemas/chemistry";
import type { Answer, Answers, Question, Telling } from "./messages";

/** Steps of a search: done, and in all (at most, where it may end early). */
export interface Steps {
  readonly done: number;
  readonly total: number;
}
export type Tell = (share: number, steps: Steps) => void;

type Asked<Kind extends keyof Answers> = Omit<Extract<Question, { kind: Kind }>, "id">;

const start = (): Worker => new Worker(new URL("./advice.worker.ts", import.meta.url), { type: "module" });

/** Puts one question at a time to a worker. A question that is given up while it is worked on ends the worker, since a synchronous search
 *  cannot be interrupted from inside; the next question starts another. */
export class Asker {
  private worker: Worker | null = null;
  private serial = 0;
  private readonly tables: ChemicalTables;
  private readonly make: () => Worker;

  constructor(tables: ChemicalTables, make: () => Worker = start) {
    this.tables = tables;
    this.make = make;
  }

  /** @param tell  told the share that is done, 0 to 1, and the steps it is made of, where the worker says so
   *  @returns  the answer; rejects with what went wrong in the worker, or with the signal's reason */
  ask<Kind extends keyof Answers>(question: Asked<Kind>, signal: AbortSignal, tell?: Tell): Promise<Answers[Kind]> {
    const id = ++this.serial;
    const worker = this.ready();
    return new Promise((resolve, reject) => {
      const done = () => {
        worker.removeEventListener("message", onMessage);
        worker.removeEventListener("error", onError);
        signal.removeEventListener("abort", onAbort);
      };
      const onMessage = ({ data }: MessageEvent<Answer | Telling>) => {
        if (data.id !== id) return;
        if ("total" in data) return tell?.(data.done / data.total, { done: data.done, total: data.total });
        done();
        if ("failed" in data) reject(new Error(data.failed));
        else resolve(data.value as Answers[Kind]);
      };
      const onError = (event: ErrorEvent) => {
        done();
        this.end();
        reject(new Error(event.message || "the worker could not be started"));
      };
      const onAbort = () => {
        done();
        this.end();
        reject(new DOMException("given up", "AbortError"));
      };
      worker.addEventListener("message", onMessage);
      worker.addEventListener("error", onError);
      signal.addEventListener("abort", onAbort);
      worker.postMessage({ ...question, id });
    });
  }

  end(): void {
    this.worker?.terminate();
    this.worker = null;
  }

  private ready(): Worker {
    if (this.worker === null) {
      this.worker = this.make();
      this.worker.postMessage({ kind: "tables", tables: this.tables } satisfies Question);
    }
    return this.worker;
  }
}
