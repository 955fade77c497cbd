import { eq, inArray, sql } from "drizzle-orm";
import type { z } from "zod";
import type { trialsCsvQuery } from "../../../shared/schemas/trialRows";
import { measuredPoint } from "../../../shared/trials/measuredPoint";
import { titratedAcid, trialAcid, type AcidPlan } from "../../../shared/trials/trialAcid";
import type { Db } from "../../db/open";
import { byteOrderMark, csvLine, type Cell } from "../../http/csv";
import { campaigns } from "../campaigns/schema";
import { feeds } from "../feeds/schema";
import { revisionOf } from "../plans/rows";
import { projects } from "../projects/schema";
import { trialColumns, type ExportedTrial, type Stream } from "./csvColumns";
import { assayHeader, assayLines, readingHeader, readingLines } from "./csvLines";
import { trialIds } from "./list";
import { trialsOf } from "./rows";
import { trials } from "./schema";
import type { Workings } from "./workedOut";

const paths: Record<Stream, readonly [column: "charge" | "products", path: string]> = {
  "starting liquor": ["charge", "$.liquorAssays"],
  "final liquor": ["products", "$.finalAssays"],
  wash: ["products", "$.washAssays"],
  "residue or cement": ["products", "$.residueAssays"],
};

/** What was assayed in any trial of the file. Asked of the database, so that the header can go out before the first trial is read. */
function analytesOf(db: Db, ids: readonly string[]): Record<Stream, string[]> {
  const wanted = JSON.stringify(ids);
  const inStream = ([column, path]: (typeof paths)[Stream]): string[] => {
    const records = sql.raw(`trial_records r, json_each(r.${column}, '${path}') a`);
    const found = db.all<{ analyte: string }>(
      sql`select distinct json_extract(a.value, '$.analyte') analyte from ${records}
          where r.trial_id in (select value from json_each(${wanted})) order by analyte`,
    );
    return found.map(({ analyte }) => analyte);
  };
  return Object.fromEntries(Object.entries(paths).map(([stream, where]) => [stream, inStream(where)])) as Record<
    Stream,
    string[]
  >;
}

/** Everything a line needs that stands in other rows. */
function exported(db: Db, ids: readonly string[], { electrodes, masses, data }: Workings): ExportedTrial[] {
  const rows = trialsOf(db, ids);
  const of = new Map(
    db
      .select({
        id: campaigns.id,
        stages: campaigns.stages,
        planId: campaigns.planId,
        planRevision: campaigns.planRevision,
        projectName: projects.name,
      })
      .from(campaigns)
      .innerJoin(projects, eq(projects.id, campaigns.projectId))
      .where(inArray(campaigns.id, [...new Set(rows.map(({ campaignId }) => campaignId))]))
      .all()
      .map((campaign) => [campaign.id, campaign]),
  );
  const feedsById = new Map(
    db
      .select({ id: feeds.id, heads: feeds.heads, moisture: feeds.moisture })
      .from(feeds)
      .where(inArray(feeds.id, [...new Set(rows.map(({ feedId }) => feedId))]))
      .all()
      .map((feed) => [feed.id, feed]),
  );
  const repeated = rows.flatMap(({ replicateOf }) => replicateOf ?? []);
  const codes = new Map(
    db
      .select({ id: trials.id, code: trials.code })
      .from(trials)
      .where(inArray(trials.id, repeated))
      .all()
      .map(({ id, code }) => [id, code]),
  );
  // Grams of sulfur are weighed as the campaign's plan weighs them; its sulfate stands in for none that is not on the trial's own record.
  const onePool = new Map(
    [...of].map(([id, { planId, planRevision }]) => [id, revisionOf(db, planId, planRevision).inputs.sulfateReduction]),
  );
  const planOf = (campaignId: string): AcidPlan => ({
    sulfate: null,
    sulfateReduction: onePool.get(campaignId) ?? false,
  });
  return rows
    .map((trial) => ({ trial, point: measuredPoint(trial, electrodes).point }))
    .map(({ trial, point }) => ({
      ...trial,
      projectName: of.get(trial.campaignId)?.projectName ?? "",
      stageOf: of.get(trial.campaignId)?.stages.find(({ code }) => code === trial.stage) ?? null,
      feedOf: feedsById.get(trial.feedId) ?? null,
      replicateOfCode: trial.replicateOf === null ? null : (codes.get(trial.replicateOf) ?? null),
      conversion: point?.conversion ?? null,
      acid:
        point &&
        trialAcid(
          trial,
          { pH: point.pH, temperatureC: point.pHTemperatureC },
          titratedAcid(trial, masses),
          planOf(trial.campaignId),
          data,
        ),
    }));
}

/** How many trials are read at a time: the database is not held while a slow reader takes the file. */
const chunk = 100;

/** A file of trials, line by line, in the order of the query. */
export function* trialsCsv(
  db: Db,
  workings: Workings,
  { lines, ...filter }: z.output<typeof trialsCsvQuery>,
): Generator<string> {
  const ids = trialIds(db, filter);
  const columns = trialColumns(lines === "trials" ? analytesOf(db, ids) : noAnalytes);
  const [header, linesOf] = {
    trials: [
      columns.map((column) => column.header),
      (trial: ExportedTrial): Cell[][] => [columns.map((column) => column.cell(trial))],
    ],
    readings: [readingHeader, readingLines],
    assays: [assayHeader, assayLines],
  }[lines] as [string[], (trial: ExportedTrial) => Cell[][]];
  yield byteOrderMark + csvLine(header);
  for (let start = 0; start < ids.length; start += chunk) {
    const read = exported(db, ids.slice(start, start + chunk), workings);
    yield read.flatMap(linesOf).map(csvLine).join("");
  }
}

const noAnalytes: Record<Stream, string[]> = {
  "starting liquor": [],
  "final liquor": [],
  wash: [],
  "residue or cement": [],
};
