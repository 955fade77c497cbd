import { useEffect, useMemo, useState } from "react";
import { useNavigate } from "react-router-dom";
import { trialCreate } from "../../../../shared/schemas/trial";
import type { CampaignRow } from "../../../../shared/schemas/campaign";
import type { FeedRow } from "../../../../shared/schemas/feed";
import type { TrialListRow } from "../../../../shared/schemas/trialRows";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { Button } from "../../../components/Button";
import { Select } from "../../../components/Select";
import { ErrorNote, Status } from "../../../components/status";
import { Note, Remark } from "../../../components/text";
import { TextArea, TextField } from "../../../components/TextField";
import { clearShelf, keepOnShelf, readShelf } from "../../../lib/draftShelf";
import { ApiFailure } from "../../../lib/failure";
import type { Problem } from "../../../lib/recordDraft";
import { useSession } from "../../../lib/session";
import type { SolvedRevision } from "../../../lib/solvedRevision";
import { useCreateTrial } from "../../../lib/trials";
import { electrodesOf } from "../model/electrodes";
import { trialWords } from "../model/trialWords";
import type { TrialValues } from "../model/trialValues";
import { problemAt, RecordingContext, type Recording } from "../record/context";
import { PlannedSection } from "../record/PlannedSection";
import { Section } from "../record/Section";
import { emptyTrial, kindOf, likeIt, nextCode } from "./newTrial";

interface PlanTrialProps {
  campaign: CampaignRow;
  feeds: readonly FeedRow[];
  /** trials of the campaign, deleted ones too: their codes are not given again */
  before: readonly TrialListRow[];
  codes: readonly string[];
  data: ChemicalData;
  solved: SolvedRevision | undefined;
}

/** Stage, feed, code, and the conditions: by hand or from the set point of the plan. */
export function PlanTrial({ campaign, feeds, before, codes, data, solved }: PlanTrialProps) {
  const navigate = useNavigate();
  const { user } = useSession();
  const create = useCreateTrial();
  const shelf = `new-trial.${campaign.id}`;
  const [values, setValues] = useState<TrialValues>(() => {
    const kept = readShelf<TrialValues>(shelf);
    if (kept) return kept.values;
    const stage = campaign.stages[0]!;
    const feedId = before[0]?.feedId ?? feeds[0]!.id;
    return {
      ...emptyTrial({
        feedId,
        code: nextCode(campaign, codes),
        kind: kindOf(stage, before, undefined),
        stage: stage.code,
      }),
      operator: user.role === "technician" ? user.name : "",
    };
  });
  const [problems, setProblems] = useState<readonly Problem[]>([]);
  const [made, setMade] = useState<string | null>(null);
  useEffect(() => {
    keepOnShelf(shelf, { version: 0, base: values, values, conflicts: [] });
  }, [shelf, values]);

  const stage = campaign.stages.find(({ code }) => code === values.stage) ?? null;
  const feed = feeds.find(({ id }) => id === values.feedId) ?? null;
  const recording = useMemo(
    (): Recording => ({
      values,
      edit: (change) => setValues(change),
      problems,
      readOnly: false,
      campaign,
      stage,
      feed,
      data,
      electrodes: electrodesOf(data),
      solved,
    }),
    [values, problems, campaign, stage, feed, data, solved],
  );
  const set = (part: Partial<TrialValues>) => setValues((old) => ({ ...old, ...part }));

  function submit(another: boolean) {
    const parsed = trialCreate.safeParse({ ...values, campaignId: campaign.id });
    if (!parsed.success) {
      setProblems(parsed.error.issues.map(({ path, message }) => ({ path: path.join("."), message })));
      return;
    }
    setProblems([]);
    create.mutate(
      { ...values, campaignId: campaign.id },
      {
        onSuccess: (trial) => {
          if (another) {
            setMade(trial.code);
            setValues(likeIt(values, nextCode(campaign, [...codes, trial.code])));
          } else {
            clearShelf(shelf);
            void navigate(user.role === "technician" ? `/bench/${trial.id}` : `/trials/${trial.id}`);
          }
        },
        onError: (error) => {
          if (error instanceof ApiFailure && error.path !== "")
            setProblems([{ path: error.path, message: error.message }]);
        },
      },
    );
  }

  const replicates = before.filter(({ deletedAt }) => deletedAt === null);
  return (
    <RecordingContext value={recording}>
      <div className="max-w-[960px] px-5 pt-3 pb-12">
        {create.error && <ErrorNote className="mb-3" doing="Not planned" error={create.error} />}
        {problems.length > 0 && !create.error && (
          <Remark className="mb-3 border-signal!">
            Not planned yet: {problems.map(({ path, message }) => `${trialWords(path)}: ${message}`).join("; ")}.
          </Remark>
        )}
        <Section id="trial" title="Trial">
          <div className="grid gap-x-6 gap-y-3 sm:grid-cols-3">
            <TextField
              label="Code"
              value={values.code}
              maxLength={24}
              error={problemAt(problems, "code")}
              onChange={(event) => set({ code: event.target.value })}
            />
            <Select
              label="Stage"
              layout="stacked"
              value={values.stage}
              onChange={(code) => {
                const next = campaign.stages.find((s) => s.code === code);
                if (next) set({ stage: code, kind: kindOf(next, before, solved?.inputs) });
              }}
              options={campaign.stages.map(({ code, name }) => ({ value: code, label: `${code}, ${name}` }))}
            />
            <Select
              label="Kind"
              layout="stacked"
              value={values.kind}
              onChange={(kind) => set({ kind })}
              options={[
                { value: "leach", label: "leach" },
                { value: "cementation", label: "cementation" },
              ]}
            />
            <Select
              label="Feed"
              layout="stacked"
              value={values.feedId}
              onChange={(feedId) => set({ feedId })}
              options={feeds.map(({ id, name }) => ({ value: id, label: name }))}
              error={problemAt(problems, "feedId") ?? null}
            />
            <TextField
              label="Operator"
              value={values.operator}
              maxLength={120}
              onChange={(event) => set({ operator: event.target.value })}
            />
            <Select
              label="Repeats"
              layout="stacked"
              value={values.replicateOf ?? "none"}
              onChange={(other) => set({ replicateOf: other === "none" ? null : other })}
              options={[
                { value: "none", label: "no other trial" },
                ...replicates.map(({ id, code }) => ({ value: id, label: code })),
              ]}
            />
          </div>
          <TextArea
            className="mt-3"
            label="What the bench must know"
            rows={2}
            maxLength={4000}
            value={values.notes}
            onChange={(event) => set({ notes: event.target.value })}
          />
        </Section>
        <PlannedSection />
        <div className="flex flex-wrap items-center gap-3">
          <Button kind="primary" disabled={create.isPending} onClick={() => submit(false)}>
            {create.isPending ? "Planning …" : "Plan it"}
          </Button>
          <Button disabled={create.isPending} onClick={() => submit(true)}>
            Plan it, and the next like it
          </Button>
          {made !== null && <Status tone="good">{made} planned</Status>}
          <Note>Half complete is enough: the rest is written at the bench.</Note>
        </div>
      </div>
    </RecordingContext>
  );
}
