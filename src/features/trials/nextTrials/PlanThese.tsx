import { useMemo, useState } from "react";
import type { Caution } from "../../../../shared/hazards/rules";
import type { CampaignRow } from "../../../../shared/schemas/campaign";
import { Button, ButtonLink } from "../../../components/Button";
import { Dialog } from "../../../components/Dialog";
import { Select } from "../../../components/Select";
import { ErrorNote, Loading } from "../../../components/status";
import { Note, Remark, SectionHead } from "../../../components/text";
import { TextField } from "../../../components/TextField";
import { useCampaigns } from "../../../lib/campaigns";
import { useFeeds } from "../../../lib/feeds";
import { usePreferences } from "../../../lib/preferences";
import { useMay } from "../../../lib/session";
import { stageFromPlan } from "../../../lib/stageFromPlan";
import { useAllTrials, useTrial } from "../../../lib/trials";
import { windowName } from "../../../map/view";
import { electrodeName, electrodeOptions, electrodesOf } from "../model/electrodes";
import { emptyTrial, kindOf } from "../plan/newTrial";
import { ConditionsFields } from "./ConditionsFields";
import type { NextListProps } from "./NextList";
import type { Proposal } from "./nextModel";
import type { MadeTrials } from "./Planned";
import { PlanCautions, underWhich } from "./PlanCautions";
import { orpAgainst, prefilled, trialsToPlan, type Conditions } from "./planThese";
import { usePlanning } from "./usePlanning";

export interface PlanTheseProps extends NextListProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  onMade: (made: MadeTrials) => void;
  proposals: readonly (Proposal & { reason: string; cautions: readonly Caution[] })[];
  window: number;
}

const NEW = "new";

/** Campaign, stage, feed and the conditions they share: then every proposal becomes a planned trial. */
export default function PlanThese(props: PlanTheseProps) {
  const { open, onOpenChange, plan } = props;
  const campaigns = useCampaigns(plan.projectId);
  const feeds = useFeeds(plan.projectId);
  // A campaign is a metallurgist's to lay out; into one that stands, whoever records at the bench may plan.
  const mayLayOut = useMay("review");
  const error = campaigns.error ?? feeds.error;
  const own = campaigns.data?.filter((c) => c.planId === plan.id) ?? [];
  const nowhere = campaigns.data !== undefined && own.length === 0 && !mayLayOut;
  if (!error && campaigns.data && !nowhere && feeds.data && feeds.data.length > 0)
    return <Form {...props} campaigns={own} mayLayOut={mayLayOut} feeds={feeds.data} />;
  return (
    <Dialog open={open} onOpenChange={onOpenChange} title="Plan these trials">
      {error ? (
        <ErrorNote doing="The campaigns could not be read" error={error} retry={() => window.location.reload()} />
      ) : nowhere ? (
        <p>
          No campaign stands on this plan yet. A metallurgist lays one out; then these can be planned in it from here.
        </p>
      ) : feeds.data?.length === 0 ? (
        <>
          <p>A trial needs a feed: its account starts from the head assay. This project has none yet.</p>
          <div className="pt-3">
            <ButtonLink to="/feeds">To the feeds</ButtonLink>
          </div>
        </>
      ) : (
        <Loading label="Reading campaigns and feeds" />
      )}
    </Dialog>
  );
}

function Form(
  props: PlanTheseProps & {
    campaigns: readonly CampaignRow[];
    mayLayOut: boolean;
    feeds: readonly { id: string; name: string }[];
  },
) {
  const { open, onOpenChange, onMade, plan, revision, unsaved, inputs, solution, data, proposals, campaigns, feeds } =
    props;
  const [{ potentialScale, electrodeTemperatureC }] = usePreferences();
  const [campaignId, setCampaignId] = useState(campaigns[0]?.id ?? NEW);
  const [fresh, setFresh] = useState({ code: "", title: `Gaps of window ${windowName(props.window)}` });
  const [wantedStage, setStage] = useState<string | null>(null);
  const [wantedFeed, setFeed] = useState<string | null>(null);
  const [wantedProbe, setProbe] = useState<string | null>(null);
  const [edits, setEdits] = useState<Partial<Conditions>>({});
  const [named, setNamed] = useState<Readonly<Record<string, string>>>(props.procedures);
  const [pressed, setPressed] = useState(false);
  const planning = usePlanning(onMade);

  const campaign = campaigns.find(({ id }) => id === campaignId) ?? null;
  const before = useAllTrials({ campaignId, sort: "code", order: "desc", deleted: "all" }, campaign !== null);
  const stages = campaign?.stages ?? [stageFromPlan(inputs)];
  const target = inputs.metals.find(({ role }) => role === "target")?.element;
  const stage =
    stages.find(({ code }) => code === wantedStage) ?? stages.find((s) => s.target === target) ?? stages[0]!;
  const live = (before.data ?? []).filter(({ deletedAt }) => deletedAt === null);
  const lastRow = live.find((t) => t.stage === stage.code) ?? live[0] ?? null;
  const last = useTrial(lastRow?.id);
  const feedId = wantedFeed ?? lastRow?.feedId ?? feeds[0]!.id;
  const electrodes = useMemo(() => electrodesOf(data), [data]);
  const usual = last.data?.planned.orp.electrode ?? null;
  const probe = wantedProbe ?? (potentialScale === "SHE" ? (usual ?? "SHE") : potentialScale);
  const probeC =
    electrodeTemperatureC !== null
      ? String(electrodeTemperatureC)
      : probe === usual
        ? (last.data?.planned.orp.electrodeTemperature.text ?? "")
        : "";

  const empty = emptyTrial({ feedId, code: "-", kind: kindOf(stage, live, inputs), stage: stage.code });
  const { conditions, from } = prefilled(empty, { inputs, data, solution, failure: null }, stage, last.data ?? null);
  const shared = { ...conditions, ...edits };
  const orps = proposals.map(({ Eh }) => orpAgainst(Eh, probe, probeC, inputs.temperatureC, electrodes));
  const unknownProbe = orps.includes(null);
  const reading = campaign !== null && (!before.data || (lastRow !== null && !last.data && !last.error));
  const cautions = [...new Map(proposals.flatMap((p) => p.cautions.map((c) => [`${c.code} ${c.text}`, c]))).values()];
  const unnamed = cautions.some((c) => c.confirm !== null && (named[c.code] ?? "").trim() === "");
  const incomplete = campaign === null && (fresh.code.trim() === "" || fresh.title.trim() === "");

  function submit() {
    setPressed(true);
    if (incomplete || unknownProbe || unnamed || reading) return;
    const values = trialsToPlan({
      campaign: campaign ?? fresh,
      stage,
      feedId,
      codes: (before.data ?? []).map(({ code }) => code),
      before: live,
      inputs,
      conditions: shared,
      // those that stand already are not planned twice
      proposals: proposals.flatMap(({ pH, reason, cautions: own }, i) =>
        orps[i] && i >= planning.done
          ? [{ pH, reason: [reason, ...underWhich(own, named)].join(" "), orp: orps[i] }]
          : [],
      ),
    });
    const { projectId, id: planId } = plan;
    planning.start(campaign ?? { projectId, planId, planRevision: revision, stages: [stage], ...fresh }, values);
  }

  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title={proposals.length === 1 ? "Plan this trial" : `Plan these ${proposals.length} trials`}
      width={680}
      footer={
        <>
          {planning.progress && <Note className="self-center">{planning.progress}</Note>}
          <Button onClick={() => onOpenChange(false)}>Cancel</Button>
          <Button kind="primary" disabled={planning.busy || reading} onClick={submit}>
            {planning.busy ? "Planning …" : planning.done > 0 ? "Plan the rest" : "Plan them"}
          </Button>
        </>
      }
    >
      <div className="space-y-4">
        {unsaved && (
          <Remark>
            The map shows changes that are not saved. A campaign is laid out on a revision: save one first if they are
            to stand with it.
          </Remark>
        )}
        <div className="grid grid-cols-2 gap-4">
          <Select
            label="Campaign"
            layout="stacked"
            value={campaignId}
            onChange={(id) => {
              setCampaignId(id);
              setStage(null);
            }}
            options={[
              ...campaigns.map(({ id, code, title }) => ({ value: id, label: `${code}, ${title}`, text: code })),
              ...(props.mayLayOut ? [{ value: NEW, label: "a new campaign" }] : []),
            ]}
            hint={
              campaign && campaign.planRevision !== revision
                ? `laid out on revision ${campaign.planRevision}; the plan stands at ${revision}`
                : undefined
            }
          />
          <Select
            label="Stage"
            layout="stacked"
            value={stage.code}
            onChange={setStage}
            options={stages.map(({ code, name }) => ({ value: code, label: `${code}, ${name}` }))}
          />
          {campaign === null && (
            <>
              <TextField
                label="Code"
                maxLength={24}
                value={fresh.code}
                placeholder="NL-4"
                error={pressed && fresh.code.trim() === "" ? "A short code" : null}
                onChange={(event) => setFresh({ ...fresh, code: event.target.value })}
              />
              <TextField
                label="Title"
                maxLength={160}
                value={fresh.title}
                error={pressed && fresh.title.trim() === "" ? "A title" : null}
                onChange={(event) => setFresh({ ...fresh, title: event.target.value })}
              />
            </>
          )}
          <Select
            label="Feed"
            layout="stacked"
            value={feedId}
            onChange={setFeed}
            options={feeds.map(({ id, name }) => ({ value: id, label: name }))}
          />
          <Select
            label="ORP against"
            layout="stacked"
            value={probe}
            onChange={setProbe}
            options={electrodeOptions(electrodes)}
            error={
              unknownProbe
                ? `The potential of ${electrodeName(electrodes, probe)} is not known at that temperature; choose another`
                : null
            }
            hint={
              wantedProbe !== null
                ? undefined
                : potentialScale === "SHE" && usual !== null
                  ? `as in ${lastRow?.code ?? "the last trial"}`
                  : "your potential scale"
            }
          />
        </div>
        {reading ? (
          <Loading label="Reading the campaign’s last trial" />
        ) : (
          <ConditionsFields
            conditions={shared}
            from={from}
            edited={edits}
            target={stage.target}
            onChange={(change) => setEdits((old) => ({ ...old, ...change }))}
          />
        )}
        <section aria-label="Trials to plan">
          <SectionHead aside={`ORP in mV vs ${electrodeName(electrodes, probe)}`}>Trials</SectionHead>
          <ol>
            {proposals.map(({ n, pH, reason }, i) => (
              <li key={n} className="hairline flex gap-3 py-1">
                <span className="w-5 shrink-0 font-mono font-bold text-verdigris">{n}</span>
                <span className="w-44 shrink-0 font-mono whitespace-nowrap">
                  pH {pH.toFixed(2)}, {orps[i] ? `${orps[i].value.text} mV` : "no potential"}
                </span>
                <span className="min-w-0 text-sm text-muted">{reason}</span>
              </li>
            ))}
          </ol>
        </section>
        {cautions.length > 0 && (
          <PlanCautions
            cautions={cautions}
            of={(c) => proposals.filter((p) => p.cautions.some((own) => own.text === c.text)).map((p) => p.n)}
            named={named}
            onName={(code, procedure) => setNamed((old) => ({ ...old, [code]: procedure }))}
            pressed={pressed}
          />
        )}
        {planning.error !== null && (
          <ErrorNote
            doing={
              planning.done > 0 ? `${planning.done} of ${proposals.length} planned, then it stopped` : "Not planned"
            }
            error={planning.error}
          />
        )}
      </div>
    </Dialog>
  );
}
