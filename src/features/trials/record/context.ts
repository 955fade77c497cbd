import { createContext, useContext } from "react";
import type { ElectrodeSeries } from "../../../../shared/electrodes/series";
import type { CampaignRow, CampaignStage } from "../../../../shared/schemas/campaign";
import type { FeedRow } from "../../../../shared/schemas/feed";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import type { Problem } from "../../../lib/recordDraft";
import type { SolvedRevision } from "../../../lib/solvedRevision";
import type { TrialValues } from "../model/trialValues";

/** What every section of a trial's record needs. */
export interface Recording {
  values: TrialValues;
  /** changes the record; `about` joins the keystrokes of one field to one step of undo */
  edit: (change: (values: TrialValues) => TrialValues, about?: string) => void;
  problems: readonly Problem[];
  readOnly: boolean;
  campaign: CampaignRow;
  stage: CampaignStage | null;
  feed: FeedRow | null;
  data: ChemicalData;
  electrodes: readonly ElectrodeSeries[];
  /** the plan's revision that the trial is judged against; undefined while it is read */
  solved: SolvedRevision | undefined;
}

export const RecordingContext = createContext<Recording | null>(null);

/** @throws Error outside a trial */
export function useRecording(): Recording {
  const recording = useContext(RecordingContext);
  if (!recording) throw new Error("useRecording belongs inside a trial");
  return recording;
}

/** Refusals of one list of rows, as a grid shows them. */
export const rowProblems = (problems: readonly Problem[], list: string, columnOf: (rest: string) => string) =>
  problems.flatMap(({ path, message }) => {
    const [, row, rest = ""] = new RegExp(`^${list.replaceAll(".", "\\.")}\\.(\\d+)\\.?(.*)$`).exec(path) ?? [];
    return row === undefined ? [] : [{ row: Number(row), column: columnOf(rest), message }];
  });

export const problemAt = (problems: readonly Problem[], path: string): string | undefined =>
  problems.find((p) => p.path === path || p.path.startsWith(`${path}.`))?.message;
