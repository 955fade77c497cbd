import { Link, useNavigate, useParams } from "react-router-dom";
import type { CampaignRow, CampaignStage } from "../../../shared/schemas/campaign";
import { Button } from "../../components/Button";
import { ConflictDialog } from "../../components/ConflictDialog";
import { DraftStatus } from "../../components/DraftStatus";
import { EntryGrid } from "../../components/EntryGrid";
import { PageHead } from "../../components/PageHead";
import type { GridColumn } from "../../components/entryGridModel";
import { Select } from "../../components/Select";
import { ErrorNote, Opening } from "../../components/status";
import { Note, Remark, SectionHead } from "../../components/text";
import { TextArea, TextField } from "../../components/TextField";
import { useCampaign, useUpdateCampaign } from "../../lib/campaigns";
import { usePlans, useRevisions } from "../../lib/plans";
import { useProjectOf } from "../../lib/project";
import { useMay } from "../../lib/session";
import { usePageTitle } from "../../lib/title";
import { useRecordDraft } from "../../lib/useRecordDraft";
import { useSaveKeys } from "../../lib/useSaveKeys";
import { campaignProblems, campaignValues, campaignWords, type CampaignValues } from "./campaignModel";

export default function CampaignEditPage() {
  const { campaignId = "" } = useParams();
  const campaign = useCampaign(campaignId);
  usePageTitle(campaign.data ? `Edit ${campaign.data.code}` : "Campaign");
  if (campaign.data) return <Edit key={campaignId} campaign={campaign.data} />;
  return <Opening what="campaign" asked={[campaign]} />;
}

const stageColumns = (usual: readonly string[]): GridColumn<CampaignStage>[] => [
  {
    id: "code",
    kind: "text",
    header: "code",
    label: "code",
    width: "6em",
    words: true,
    get: (s) => s.code,
    set: (s, code) => ({ ...s, code }),
    problem: (s) => (s.code.trim() === "" ? "the code is missing: trials name their stage by it" : null),
  },
  {
    id: "name",
    kind: "text",
    header: "name",
    label: "name",
    width: "18em",
    words: true,
    get: (s) => s.name,
    set: (s, name) => ({ ...s, name }),
    problem: (s) => (s.name.trim() === "" ? "the name is missing" : null),
  },
  {
    id: "target",
    kind: "text",
    header: "target",
    label: "target",
    under: "judged by",
    width: "7em",
    words: true,
    usual,
    get: (s) => s.target,
    set: (s, target) => ({ ...s, target }),
    problem: (s) => (s.target.trim() === "" ? "which metal is the stage judged by?" : null),
  },
  {
    id: "gangue",
    kind: "text",
    header: "gangue",
    label: "gangue",
    under: "should stay solid",
    width: "9em",
    words: true,
    usual,
    get: (s) => s.gangue ?? "",
    set: (s, gangue) => ({ ...s, gangue: gangue.trim() === "" ? null : gangue }),
  },
];

/** Question, plan and stages of a campaign. */
function Edit({ campaign }: { campaign: CampaignRow }) {
  const navigate = useNavigate();
  useProjectOf(campaign.projectId);
  const readOnly = !useMay("review") || campaign.deletedAt !== null;
  const update = useUpdateCampaign();
  const draft = useRecordDraft<CampaignValues, CampaignRow>({
    shelf: `campaign.${campaign.id}`,
    row: campaign,
    valuesOf: campaignValues,
    versionOf: ({ version }) => version,
    check: campaignProblems,
    send: (changed, version, reason) => update.mutateAsync({ id: campaign.id, version, reason, ...changed }),
  });
  const { values, edit, problems } = draft;
  const plans = usePlans(campaign.projectId).data ?? [];
  const revisions = useRevisions(values.planId).data ?? [];
  const plan = plans.find(({ id }) => id === values.planId);
  const set = (change: Partial<CampaignValues>, about: string) => edit((now) => ({ ...now, ...change }), about);
  const wrong = (path: string) => problems.find((p) => p.path === path)?.message;
  const metals = plan?.latest.inputs.metals.map(({ element }) => element) ?? [];
  useSaveKeys({ save: () => void draft.save(), undo: draft.undo, redo: draft.redo }, !readOnly);
  const done = async () => {
    if (await draft.save()) void navigate(`/campaigns/${campaign.id}`);
  };
  const planChanged = values.planId !== campaign.planId || values.planRevision !== campaign.planRevision;
  return (
    <>
      <PageHead
        up={
          <Link to={`/campaigns/${campaign.id}`} className="text-sm text-muted">
            {campaign.code}
          </Link>
        }
        title="Edit the campaign"
        about={<DraftStatus draft={draft} />}
      >
        {!readOnly && (
          <>
            <Button disabled={!draft.canUndo} onClick={draft.undo} title="Ctrl+Z">
              Undo
            </Button>
            <Button
              kind="primary"
              title="Ctrl+S"
              disabled={draft.changed.length === 0 || draft.status === "saving"}
              onClick={() => void done()}
            >
              Save
            </Button>
          </>
        )}
      </PageHead>
      <ConflictDialog
        conflicts={draft.conflicts}
        what={`campaign ${campaign.code}`}
        words={campaignWords}
        onResolve={(choices) => {
          draft.resolve(choices);
          void draft.save();
        }}
      />
      <div className="max-w-[820px] px-5 pt-3 pb-10">
        {readOnly && <Remark className="mb-3">Campaigns are written by a metallurgist.</Remark>}
        {draft.status === "refused" && draft.error !== null && (
          <ErrorNote className="mb-3" doing="Not saved" error={draft.error} />
        )}
        <div className="grid grid-cols-[9em_1fr] gap-4">
          <TextField
            label="Code"
            value={values.code}
            maxLength={24}
            readOnly={readOnly}
            error={wrong("code")}
            onChange={(event) => set({ code: event.target.value }, "code")}
          />
          <TextField
            label="Title"
            value={values.title}
            maxLength={160}
            readOnly={readOnly}
            error={wrong("title")}
            onChange={(event) => set({ title: event.target.value }, "title")}
          />
        </div>
        <TextArea
          className="mt-4"
          label="What it is to answer"
          value={values.question}
          maxLength={1000}
          readOnly={readOnly}
          onChange={(event) => set({ question: event.target.value }, "question")}
        />
        <div className="mt-4 grid gap-4 sm:grid-cols-2">
          <Select
            label="Plan"
            layout="stacked"
            value={values.planId}
            readOnly={readOnly}
            onChange={(planId) =>
              set({ planId, planRevision: plans.find(({ id }) => id === planId)?.latest.number ?? 1 }, "plan")
            }
            options={
              plan
                ? plans.map((p) => ({ value: p.id, label: p.name }))
                : [
                    { value: values.planId, label: campaign.planName },
                    ...plans.map((p) => ({ value: p.id, label: p.name })),
                  ]
            }
            error={wrong("planId") ?? null}
          />
          <Select
            label="Revision"
            layout="stacked"
            value={String(values.planRevision)}
            readOnly={readOnly}
            onChange={(number) => set({ planRevision: Number(number) }, "revision")}
            options={
              revisions.length > 0
                ? revisions.map((r) => ({
                    value: String(r.number),
                    label: `revision ${r.number}`,
                    note: r.note || r.author,
                  }))
                : [{ value: String(values.planRevision), label: `revision ${values.planRevision}` }]
            }
            error={wrong("planRevision") ?? null}
          />
        </div>
        {planChanged && campaign.trialCount > 0 && (
          <Note className="pt-2">
            Inside and outside of all {campaign.trialCount} trials will be judged against this revision from then on.
          </Note>
        )}
        <SectionHead className="mt-6" aside="a stage shares a marker on the map">
          Stages
        </SectionHead>
        <div className="pt-2">
          <EntryGrid
            caption="Stages"
            rowName="stage"
            rows={values.stages}
            columns={stageColumns(metals)}
            blank={() => ({ code: "", name: "", target: "", gangue: null })}
            onChange={(stages) => set({ stages }, "stages")}
            readOnly={readOnly}
            problems={problems.flatMap(({ path, message }) => {
              const [list, row, column = ""] = path.split(".");
              return list === "stages" && row !== undefined ? [{ row: Number(row), column, message }] : [];
            })}
          />
          {wrong("stages") !== undefined && (
            <p role="alert" className="text-sm text-signal">
              {wrong("stages")}
            </p>
          )}
        </div>
        <TextArea
          className="mt-4"
          label="Notes"
          rows={5}
          value={values.notes}
          maxLength={4000}
          readOnly={readOnly}
          onChange={(event) => set({ notes: event.target.value }, "notes")}
        />
      </div>
    </>
  );
}
