import { electrodeSeries } from "../../../shared/electrodes/series";
import { trialCreate } from "../../../shared/schemas/trial";
import type { OpenDatabase } from "../../../server/db/open";
import { campaigns, trialRecords, trials } from "../../../server/db/schema";
import { demoTrials } from "../../../server/demo/trials/trials";
import { campaignOf } from "../../../server/features/campaigns/rows";
import type { Chemistry } from "../../../server/features/chemistry/library";
import { feedOf } from "../../../server/features/feeds/rows";
import { workedOut, workingsOf } from "../../../server/features/trials/workedOut";

interface Filled {
  trialCount: number;
  campaignIds: string[];
  /** campaigns of one plan that hold 2,000 trials or more together */
  mapCampaigns: { ids: string[]; trials: number };
  planId: string;
}

/** The demo again and again, each time with another seed and in campaigns of its own: records, figures and lengths of text as
 *  a laboratory of years would have them. Written past the services, which put every single trial on record.
 *  @param wanted  how many trials in all, the demo's own among them */
export function fillTrials({ db }: OpenDatabase, chemistry: Chemistry, wanted: number): Filled {
  const workings = workingsOf(chemistry);
  const electrodes = electrodeSeries(chemistry.current);
  const templates = new Map(
    db
      .select()
      .from(campaigns)
      .all()
      .map((row) => [row.id, campaignOf(db, row.id)]),
  );
  const feedsSeen = new Map<string, ReturnType<typeof feedOf>>();
  const feed = (id: string) => {
    const found = feedsSeen.get(id) ?? feedOf(db, id);
    feedsSeen.set(id, found);
    return found;
  };
  const perCampaign = new Map([...templates.keys()].map((id) => [id, 0]));
  let trialCount = db.select({ id: trials.id }).from(trials).all().length;
  for (let seed = 1; trialCount < wanted; seed += 1) {
    db.transaction((tx) => {
      for (const [id, { projectName: _p, planName: _n, trialCount: _t, ...template }] of templates) {
        tx.insert(campaigns)
          .values({ ...template, id: `${id}-${seed}`, code: `${template.code}/${seed}` })
          .run();
        perCampaign.set(`${id}-${seed}`, 0);
      }
      for (const { id, ...input } of demoTrials(electrodes, seed)) {
        if (trialCount >= wanted) break;
        const template = templates.get(input.campaignId)!;
        const campaignId = `${input.campaignId}-${seed}`;
        const values = trialCreate.parse({ ...input, campaignId, replicateOf: null });
        const stage = template.stages.find(({ code }) => code === values.stage)!;
        const { planned, measured, charge, samples, products, ...light } = values;
        const at = new Date(Date.parse(light.startedAt ?? "2026-10-01T00:00:00Z") - seed * 86_400_000).toISOString();
        tx.insert(trials)
          .values({
            id: `${id}-${seed}`,
            ...light,
            projectId: template.projectId,
            codeKey: light.code.toLowerCase(),
            startedMs: light.startedAt === null ? null : Date.parse(at),
            invented: true,
            createdAt: at,
            updatedAt: at,
            ...workedOut(values, feed(values.feedId), stage, workings),
          })
          .run();
        tx.insert(trialRecords)
          .values({ trialId: `${id}-${seed}`, planned, measured, charge, samples, products })
          .run();
        perCampaign.set(campaignId, (perCampaign.get(campaignId) ?? 0) + 1);
        trialCount += 1;
      }
    });
  }
  const mapCampaigns: Filled["mapCampaigns"] = { ids: [], trials: 0 };
  const planId = "demo-neutral-leach";
  for (const [id, n] of perCampaign) {
    if (mapCampaigns.trials >= 2000 || mapCampaigns.ids.length >= 100 || !id.startsWith("demo-campaign-nl-") || n === 0)
      continue;
    mapCampaigns.ids.push(id);
    mapCampaigns.trials += n;
  }
  return { trialCount, campaignIds: [...perCampaign.keys()].filter((id) => id.includes("nl-1")), mapCampaigns, planId };
}
