import { z } from "../../../../shared/schemas/z";
import { planInputs, type PlanInputs } from "../../../../shared/schemas/plan";

/** What a browser keeps of a plan until it is saved, so that a closed page or a lost network loses nothing. */
export interface Draft {
  /** the revision the draft started from */
  basedOn: number;
  inputs: PlanInputs;
  /** procedures named for cautions that ask for one, by caution code */
  procedures: Record<string, string>;
}

const draft = z.object({
  basedOn: z.number().int(),
  inputs: planInputs,
  procedures: z.record(z.string(), z.string()).default({}),
});

const key = (planId: string) => `gangueway.draft.${planId}`;

/** The draft of a plan, or null; one that no longer has the shape of a plan is dropped. */
export function readDraft(planId: string): Draft | null {
  try {
    const text = localStorage.getItem(key(planId));
    if (text === null) return null;
    const parsed = draft.safeParse(JSON.parse(text));
    return parsed.success ? parsed.data : null;
  } catch {
    return null; // storage closed to us, or cut off half way
  }
}

/** @returns false where the browser keeps nothing, so that the screen can say so */
export function keepDraft(planId: string, value: Draft): boolean {
  try {
    localStorage.setItem(key(planId), JSON.stringify(value));
    return true;
  } catch {
    return false;
  }
}

export function dropDraft(planId: string): void {
  try {
    localStorage.removeItem(key(planId));
  } catch {
    // nothing was kept
  }
}
