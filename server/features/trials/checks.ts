import { and, eq, isNull, ne } from "drizzle-orm";
import type { CampaignRow, CampaignStage } from "../../../shared/schemas/campaign";
import type { FeedRow } from "../../../shared/schemas/feed";
import type { MemberRole } from "../../../shared/schemas/member";
import type { TrialCreate, TrialStatus } from "../../../shared/schemas/trial";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import { campaignOf } from "../campaigns/rows";
import { feedOf } from "../feeds/rows";
import { trialOf } from "./rows";
import { trials } from "./schema";
import type { Workings } from "./workedOut";

const invalid = (path: string, message: string) => new Refusal("INVALID_INPUT", path, message);

/** What a trial hangs on. */
export interface Placed {
  campaign: CampaignRow;
  feed: FeedRow;
  stage: CampaignStage;
}

/** The campaign, feed and stage a trial names, all of one project.
 *  @throws Refusal NOT_FOUND, INVALID_INPUT, CONFLICT */
export function placeOf(
  db: Db,
  { campaignId, feedId, stage: code }: Pick<TrialCreate, "campaignId" | "feedId" | "stage">,
): Placed {
  const campaign = campaignOf(db, campaignId, "campaignId");
  const feed = feedOf(db, feedId, "feedId");
  if (feed.projectId !== campaign.projectId)
    throw invalid("feedId", `Feed ${feed.name} is of the project ${feed.projectName}, not of the campaign's.`);
  const stage = campaign.stages.find((one) => one.code === code);
  if (stage) return { campaign, feed, stage };
  const known = campaign.stages.map((one) => one.code).join(", ");
  throw invalid("stage", `Campaign ${campaign.code} has no stage ${code}; it has ${known}.`);
}

/** @throws Refusal CONFLICT when campaign or feed was deleted */
export function requireLive({ campaign, feed }: Placed): void {
  if (campaign.deletedAt !== null)
    throw new Refusal("CONFLICT", "campaignId", `Campaign ${campaign.code} was deleted; restore it first.`);
  if (feed.deletedAt !== null)
    throw new Refusal("CONFLICT", "feedId", `Feed ${feed.name} was deleted; restore it first.`);
}

/** @throws Refusal CONFLICT when another trial of the campaign has the code */
export function requireFreeCode(
  db: Db,
  { campaignId, code }: Pick<TrialCreate, "campaignId" | "code">,
  id: string,
): void {
  const taken = and(
    eq(trials.campaignId, campaignId),
    eq(trials.code, code),
    isNull(trials.deletedAt),
    ne(trials.id, id),
  );
  if (db.select({ id: trials.id }).from(trials).where(taken).get())
    throw new Refusal("CONFLICT", "code", `The campaign has a trial ${code} already.`);
}

/** @throws Refusal NOT_FOUND, INVALID_INPUT */
export function requireReplicate(db: Db, replicateOf: string | null, id: string, { campaign }: Placed): void {
  if (replicateOf === null) return;
  if (replicateOf === id) throw invalid("replicateOf", "A trial cannot repeat itself.");
  const other = trialOf(db, replicateOf, "replicateOf");
  if (campaignOf(db, other.campaignId).projectId !== campaign.projectId)
    throw invalid("replicateOf", `Trial ${other.code} is of another project.`);
}

/** Every potential must have been read against an electrode of the tables.
 *  @throws Refusal INVALID_INPUT */
export function requireElectrodes(
  { planned, measured }: Pick<TrialCreate, "planned" | "measured">,
  { electrodes }: Workings,
): void {
  const known = new Set(["SHE", ...electrodes.map(({ id }) => id)]);
  const named = [
    ["planned.orp.electrode", planned.orp.electrode] as const,
    ...measured.readings.map(({ orp }, i) => [`measured.readings.${i}.orp.electrode`, orp.electrode] as const),
  ];
  for (const [path, electrode] of named) {
    if (electrode === null || known.has(electrode)) continue;
    throw invalid(path, `There is no reference electrode ${electrode}; known are ${[...known].join(", ")}.`);
  }
}

/** @throws Refusal INVALID_INPUT when it ends before it starts */
export function requireOrder({ startedAt, endedAt }: Pick<TrialCreate, "startedAt" | "endedAt">): void {
  if (startedAt === null || endedAt === null || Date.parse(startedAt) <= Date.parse(endedAt)) return;
  throw invalid("endedAt", `The end ${endedAt} stands before the start ${startedAt}.`);
}

const reviewers: readonly MemberRole[] = ["metallurgist", "admin"];
const reviewed = (status: TrialStatus | null) => status === "approved" || status === "rejected";

/** Approving, rejecting and taking a rejection back are a metallurgist's.
 *  @param from  null for a new trial     @throws Refusal FORBIDDEN */
export function requireReviewer(from: TrialStatus | null, to: TrialStatus, role: MemberRole): void {
  if (from === to || reviewers.includes(role) || !(reviewed(from) || reviewed(to))) return;
  throw new Refusal(
    "FORBIDDEN",
    "status",
    `Approving and rejecting need the role ${reviewers.join(" or ")}; you are signed in as ${role}.`,
  );
}

/** @throws Refusal LOCKED for an approved trial */
export function requireOpen({ code, status }: { code: string; status: TrialStatus }): void {
  if (status === "approved")
    throw new Refusal(
      "LOCKED",
      "status",
      `Trial ${code} is approved and locked; a metallurgist can reopen it with a reason.`,
    );
}
