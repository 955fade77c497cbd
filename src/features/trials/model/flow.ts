import type { TrialStatus } from "../../../../shared/schemas/trial";
import { offsetIso } from "../../../lib/localTime";
import type { TrialValues } from "./trialValues";

export interface Step {
  to: TrialStatus;
  label: string;
  /** a metallurgist's */
  review: boolean;
  /** it does not go without a reason */
  reason: boolean;
  primary: boolean;
}

const step = (to: TrialStatus, label: string, more: Partial<Step> = {}): Step => ({
  to,
  label,
  review: false,
  reason: false,
  primary: false,
  ...more,
});
const reject = step("rejected", "Reject", { review: true, reason: true });

/** What can become of a trial from here. Approving locks it; opening it again is a request of its own. */
export const stepsFrom: Readonly<Record<TrialStatus, readonly Step[]>> = {
  planned: [step("running", "Start", { primary: true })],
  running: [step("awaiting assay", "End the trial", { primary: true }), reject],
  "awaiting assay": [step("balanced", "Mark as balanced"), reject],
  balanced: [
    step("approved", "Approve", { review: true, primary: true }),
    reject,
    step("awaiting assay", "Back to assays"),
  ],
  approved: [],
  rejected: [step("awaiting assay", "Take back", { review: true, reason: true })],
};

/** The record after a step: times are written where none stands yet. */
export function stepped(trial: TrialValues, { to }: Pick<Step, "to">, reason: string, now: Date): TrialValues {
  return {
    ...trial,
    status: to,
    statusReason: reason,
    startedAt: to === "running" && trial.startedAt === null ? offsetIso(now) : trial.startedAt,
    endedAt:
      to === "awaiting assay" && trial.status === "running" && trial.endedAt === null ? offsetIso(now) : trial.endedAt,
  };
}

export const statusWords: Readonly<Record<TrialStatus, string>> = {
  planned: "planned",
  running: "running",
  "awaiting assay": "awaiting assays",
  balanced: "balanced",
  approved: "approved and locked",
  rejected: "rejected",
};
