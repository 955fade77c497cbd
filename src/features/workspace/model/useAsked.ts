import { useCallback, useEffect, useMemo, useState } from "react";
import type { Advice } from "../../../../shared/advice/openings";
import type { Ranges, Robust } from "../../../../shared/advice/robust";
import type { Outcome } from "../../../../shared/outcome";
import { rangesOf } from "../../../../shared/plan/rangesOf";
import type { HoldRanges } from "../../../../shared/schemas/plan";
import type { Gammas } from "../../../../shared/plan/toProblem";
import type { Problem } from "../../../../shared/schemas/problem";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { Asker, type Steps, type Tell } from "../../../workers/asker";

/** An answer from the worker: not asked for, on its way (how far, and the way to stop it), stopped by hand (and the way to ask again), there,
 *  or failed. */
export type Awaited<Value> =
  | { state: "none" }
  /** `share`: what is done of it, 0 to 1, and the steps it is made of, where the worker says so */
  | { state: "waiting"; share?: number; steps?: Steps; stop?: () => void }
  | { state: "stopped"; again: () => void }
  | { state: "there"; value: Value }
  | { state: "failed"; message: string };

/** Long enough that a hand on a slider asks once. */
const PAUSE = 350;

/** Asks once the inputs rest; what is on its way when they move on is given up. `key` says what the question depends on. */
export function useAsked<Value>(
  data: ChemicalData,
  key: string | null,
  ask: (asker: Asker, key: string, signal: AbortSignal, tell: Tell) => Promise<Outcome<Value>>,
): Awaited<Value> {
  const asker = useMemo(() => new Asker(data.tables), [data]);
  const [answer, setAnswer] = useState<{ key: string; of: Asker; result: Awaited<Value> } | null>(null);
  const [stopped, setStopped] = useState<string | null>(null);
  useEffect(() => () => asker.end(), [asker]);
  useEffect(() => {
    if (key === null || key === stopped) return;
    const giveUp = new AbortController();
    const timer = setTimeout(() => {
      const tell: Tell = (share, steps) => setAnswer({ key, of: asker, result: { state: "waiting", share, steps } });
      ask(asker, key, giveUp.signal, tell).then(
        (outcome) =>
          setAnswer({
            key,
            of: asker,
            result: outcome.ok
              ? { state: "there", value: outcome.value }
              : { state: "failed", message: outcome.error.message },
          }),
        (error: unknown) => {
          if (giveUp.signal.aborted) return;
          const message = error instanceof Error ? error.message : String(error);
          setAnswer({ key, of: asker, result: { state: "failed", message } });
        },
      );
    }, PAUSE);
    return () => {
      clearTimeout(timer);
      giveUp.abort();
    };
  }, [asker, key, ask, stopped]);
  const stop = useCallback(() => setStopped(key), [key]);
  const again = useCallback(() => setStopped(null), []);
  return useMemo(() => {
    if (key === null) return { state: "none" };
    const known = answer !== null && answer.key === key && answer.of === asker ? answer.result : null;
    if (known !== null && known.state !== "waiting") return known;
    if (stopped === key) return { state: "stopped", again };
    return { ...(known ?? { state: "waiting" }), stop };
  }, [key, answer, asker, stopped, again, stop]);
}

const askAdvice = (asker: Asker, key: string, signal: AbortSignal, tell: Tell) => {
  const { problem, gammas } = JSON.parse(key) as { problem: Problem; gammas: Gammas };
  return asker.ask<"advice">({ kind: "advice", problem, gammas }, signal, tell);
};

/** What would open a window; asked for only while there is none. */
export function useAdvice(problem: Problem, plan: Gammas, data: ChemicalData, wanted: boolean): Awaited<Advice> {
  const { metals, ionicStrength } = plan;
  const key = useMemo(
    () => (wanted ? JSON.stringify({ problem, gammas: { metals, ionicStrength } }) : null),
    [problem, metals, ionicStrength, wanted],
  );
  return useAsked(data, key, askAdvice);
}

const askRobust = (asker: Asker, key: string, signal: AbortSignal, tell: Tell) => {
  const { problem, ranges, gammas } = JSON.parse(key) as { problem: Problem; ranges: Ranges; gammas: Gammas };
  return asker.ask<"robust">({ kind: "robust", problem, ranges, gammas }, signal, tell);
};

/** The window that holds over the plan's ranges; asked for only where it has some. */
export function useRobust(
  problem: Problem,
  plan: Gammas & { ranges?: HoldRanges | undefined },
  data: ChemicalData,
): Awaited<Robust> {
  const { ranges, metals, ionicStrength } = plan;
  const key = useMemo(() => {
    const over = rangesOf(
      ranges,
      problem.metals.filter((m) => m.requirement !== "free").map((m) => m.element),
    );
    return over && JSON.stringify({ problem, ranges: over, gammas: { metals, ionicStrength } });
  }, [problem, ranges, metals, ionicStrength]);
  return useAsked(data, key, askRobust);
}
