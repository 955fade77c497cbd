import { campaignUpdate, type CampaignCreate, type CampaignRow } from "../../../shared/schemas/campaign";
import type { Problem } from "../../lib/recordDraft";

export type CampaignValues = Omit<CampaignCreate, "projectId">;

export const campaignValues = ({
  code,
  title,
  question,
  planId,
  planRevision,
  notes,
  stages,
}: CampaignRow): CampaignValues => ({ code, title, question, planId, planRevision, notes, stages });

export function campaignProblems(changed: Partial<CampaignValues>): Problem[] {
  const parsed = campaignUpdate.safeParse(changed);
  if (parsed.success) return [];
  return parsed.error.issues.map(({ code, path, message }) => ({
    path: path.join("."),
    message: typeof path[1] === "number" && code === "too_small" ? `${String(path[2])} is missing` : message,
  }));
}

const fields: Readonly<Record<string, string>> = {
  code: "code",
  title: "title",
  question: "question",
  planId: "plan",
  planRevision: "plan revision",
  notes: "notes",
  stages: "stages",
  name: "name",
  target: "target",
  gangue: "gangue",
  deletedAt: "deleted",
};

/** "stages.1.target" → "stage 2, target" */
export function campaignWords(path: string): string {
  const [first = "", index, field] = path.split(".");
  if (first !== "stages" || index === undefined) return fields[first] ?? first;
  return field === undefined ? `stage ${Number(index) + 1}` : `stage ${Number(index) + 1}, ${fields[field] ?? field}`;
}
