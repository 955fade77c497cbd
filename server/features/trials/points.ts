import { sql } from "drizzle-orm";
import type { MapTrial } from "../../../shared/schemas/trialRows";
import type { Db } from "../../db/open";
import { feeds } from "../feeds/schema";
import { trials } from "./schema";

/** A `MapTrial` a line, written by the database: its JSON keeps every number to the last digit, and a line of text is far quicker
 *  read than two dozen columns. Figures are those of `numbersOf` with the flags. */
const lines = (campaignIds: readonly string[]) => sql`
  select json_object(
    'id', ${trials.id}, 'code', ${trials.code}, 'campaignId', ${trials.campaignId}, 'stage', ${trials.stage},
    'status', ${trials.status}, 'feedId', ${trials.feedId}, 'feedName', ${feeds.name}, 'startedAt', ${trials.startedAt},
    'electrode', ${trials.electrode}, 'compared', json(${trials.compared}), 'figures', json_object(
      'recoveryPct', ${trials.recoveryPct},
      'recoveryRangePct', iif(${trials.recoveryLow} is null or ${trials.recoveryHigh} is null,
        json('null'), json_array(${trials.recoveryLow}, ${trials.recoveryHigh})),
      'recoveryBasis', ${trials.recoveryBasis}, 'gangueDissolvedPct', ${trials.gangueDissolvedPct},
      'selectivityPct', ${trials.selectivityPct}, 'accountabilityPct', ${trials.accountabilityPct},
      'acidPerTonne', ${trials.acidPerTonne}, 'reagentPerKg', ${trials.reagentPerKg}, 'pH', ${trials.pH},
      'pHCooled', json(iif(${trials.pHCooled}, 'true', 'false')), 'Eh', ${trials.Eh},
      'EhUncertainty', ${trials.EhUncertainty}, 'temperatureC', ${trials.temperatureC}, 'flags', json(${trials.flags})))
  from ${trials} join ${feeds} on ${feeds.id} = ${trials.feedId}
  where ${trials.campaignId} in (select value from json_each(${JSON.stringify(campaignIds)})) and ${trials.deletedAt} is null
  order by ${trials.codeKey}, ${trials.id}`;

/** The trials of some campaigns as points, without their records.
 *  @returns  `MapTrial[]` as JSON text */
export const pointsJson = (db: Db, campaignIds: readonly string[]): string =>
  `[${db.values<[line: string]>(lines(campaignIds)).join(",")}]`;

export const pointsOf = (db: Db, campaignIds: readonly string[]): MapTrial[] =>
  JSON.parse(pointsJson(db, campaignIds)) as MapTrial[];
