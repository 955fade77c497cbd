import { useMemo, useState } from "react";
import { Link, useSearchParams } from "react-router-dom";
import type { CampaignPairAnswer } from "../../../shared/schemas/campaignSummary";
import { Button, ButtonLink } from "../../components/Button";
import { Segmented } from "../../components/choice";
import { Select } from "../../components/Select";
import { ErrorNote, Loading } from "../../components/status";
import { Empty, Note, Remark, SectionHead } from "../../components/text";
import { useCampaignPair, useCampaigns } from "../../lib/campaigns";
import { downloadText } from "../../lib/csv";
import { counted } from "../../lib/format";
import { placedTrials } from "../../lib/judgedTrials";
import { useProject, useProjectOf } from "../../lib/project";
import { useSolvedRevision } from "../../lib/solvedRevision";
import { usePageTitle } from "../../lib/title";
import { useCampaignTrials } from "../../lib/trials";
import { differenceSentences, feedStrips, pairCsv, windowSentences, type Measure } from "./compareModel";
import { DotStrips } from "./DotStrips";
import { PairTable } from "./PairTable";

/** Two campaigns side by side: every trial as a dot, and in words what the data say and what to beware of. */
export default function ComparePage() {
  const [search, setSearch] = useSearchParams();
  const [a, b] = [search.get("a") ?? "", search.get("b") ?? ""];
  const { project } = useProject();
  const campaigns = useCampaigns(project?.id).data ?? [];
  const pair = useCampaignPair(a, b);
  const data = pair.data;
  useProjectOf(data?.left.campaign.projectId);
  usePageTitle(data ? `${data.left.campaign.code} against ${data.right.campaign.code}` : "Compare campaigns");
  const choose = (name: "a" | "b", label: string, value: string) => (
    <Select
      label={label}
      layout="bare"
      value={value}
      placeholder="choose a campaign"
      onChange={(id) =>
        setSearch(
          (before) => {
            before.set(name, id);
            return before;
          },
          { replace: true },
        )
      }
      options={campaigns.map(({ id, code, title }) => ({ value: id, label: code, text: code, note: title }))}
    />
  );
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-3 gap-y-2 border-b border-rule px-5 py-2">
        <Link to="/campaigns" className="no-print text-sm text-muted">
          Campaigns
        </Link>
        <h1 className="text-lg">
          {data ? `${data.left.campaign.code} against ${data.right.campaign.code}` : "Compare"}
        </h1>
        <Note>{data && `${data.left.campaign.title}; ${data.right.campaign.title}`}</Note>
        <span className="flex-1" />
        <span className="no-print flex items-center gap-2">
          {choose("a", "First campaign", a)}
          <Button
            kind="quiet"
            onClick={() => setSearch({ a: b, b: a }, { replace: true })}
            aria-label="Swap the campaigns"
          >
            swap
          </Button>
          {choose("b", "Second campaign", b)}
          <Button
            disabled={data === undefined}
            onClick={() =>
              data &&
              downloadText(`gangueway-${data.left.campaign.code}-${data.right.campaign.code}.csv`, pairCsv(data))
            }
          >
            Export CSV
          </Button>
          <Button onClick={() => window.print()}>Print</Button>
        </span>
      </div>
      {a === "" || b === "" ? (
        <div className="px-5">
          {campaigns.length < 2 ? (
            <Empty
              title={campaigns.length === 0 ? "No campaign yet" : "Only one campaign yet"}
              action={<ButtonLink to="/campaigns">To the campaigns</ButtonLink>}
            >
              Two of one project are read against each other; the next one makes a pair.
            </Empty>
          ) : (
            <Empty title="Which two campaigns?">Choose them above. The second is read against the first.</Empty>
          )}
        </div>
      ) : pair.error ? (
        <div className="measure p-5">
          <ErrorNote doing="They could not be compared" error={pair.error} retry={() => void pair.refetch()} />
        </div>
      ) : !data ? (
        <div className="px-5">
          <Loading label="Judging the trials of both" />
        </div>
      ) : (
        <Pair key={`${a} ${b}`} pair={data} />
      )}
    </>
  );
}

const measureWords: Readonly<Record<Measure, string>> = {
  recoveryPct: "target",
  gangueDissolvedPct: "gangue dissolved",
  selectivityPct: "selectivity",
};

function Pair({ pair }: { pair: CampaignPairAnswer }) {
  const { left, right } = pair;
  const both = pair.stages.filter((s) => s.left && s.right);
  const shownStages = both.length > 0 ? both : pair.stages;
  const [wanted, setStage] = useState<string>();
  const stage = shownStages.find(({ code }) => code === wanted) ?? shownStages[0];
  const [measure, setMeasure] = useState<Measure>("recoveryPct");
  const points = useCampaignTrials(left.plan.id, [left.campaign.id, right.campaign.id]);
  const leftSolved = useSolvedRevision(left.plan.id, left.plan.revision).solved;
  const rightSolved = useSolvedRevision(right.plan.id, right.plan.revision).solved;
  const trials = useMemo(
    () =>
      points.data && leftSolved && rightSolved
        ? placedTrials(points.data, (id) => (id === left.campaign.id ? leftSolved : rightSolved))
        : null,
    [points.data, leftSolved, rightSolved, left.campaign.id],
  );
  const of = stage?.left?.stage ?? stage?.right?.stage;
  const campaigns = useMemo(() => [left.campaign, right.campaign], [left, right]);
  const feeds = useMemo(
    () => (trials && of ? feedStrips(trials, campaigns, of.code, measure) : []),
    [trials, campaigns, of, measure],
  );
  if (!stage || !of)
    return (
      <div className="px-5">
        <Empty title="Nothing to compare" action={<ButtonLink to="/trials/plan">Plan a trial</ButtonLink>}>
          Neither campaign has a stage with trials.
        </Empty>
      </div>
    );
  const leach = trials?.find((t) => t.stage === of.code)?.compared.kind !== "cementation";
  const what =
    measure === "recoveryPct"
      ? `${of.target} ${leach ? "extraction" : "recovery"}`
      : measure === "gangueDissolvedPct"
        ? `${of.gangue ?? "gangue"} dissolved`
        : "selectivity";
  const rejected = (stage.left?.rejected ?? 0) + (stage.right?.rejected ?? 0);
  const sentences = differenceSentences({ what, left: left.campaign.code, right: right.campaign.code }, feeds);
  return (
    <div className="grid min-h-0 flex-1 lg:grid-cols-2">
      <div className="min-w-0 px-5 pt-3 pb-10 lg:overflow-y-auto">
        <SectionHead
          aside={`${counted((stage.left?.n ?? 0) + (stage.right?.n ?? 0), "trial")}${rejected > 0 ? `, ${rejected} rejected left out` : ""}`}
        >
          {what.charAt(0).toUpperCase() + what.slice(1)} by feed and campaign
        </SectionHead>
        <div className="no-print flex flex-wrap gap-3 py-2">
          {shownStages.length > 1 && (
            <Segmented
              label="Stage"
              value={stage.code}
              onChange={setStage}
              options={shownStages.map(({ code }) => ({ value: code, label: code }))}
            />
          )}
          <Segmented<Measure>
            label="What is compared"
            value={measure}
            onChange={setMeasure}
            options={(
              [
                "recoveryPct",
                ...(of.gangue === null ? [] : (["gangueDissolvedPct", "selectivityPct"] as const)),
              ] as const
            ).map((value) => ({ value, label: measureWords[value] }))}
          />
        </div>
        {points.error ? (
          <ErrorNote doing="The trials could not be read" error={points.error} retry={() => void points.refetch()} />
        ) : !trials ? (
          <Loading label="Placing the trials" />
        ) : (
          <>
            <DotStrips feeds={feeds} axisName={`${what}${measure === "selectivityPct" ? " / points" : " / %"}`} />
            <Note>
              Filled: inside the window of the campaign’s own plan revision. Open: outside. Dashed: other conditions, or
              not placed. Bar: mean and range. A dot opens its trial.
            </Note>
          </>
        )}
        <SectionHead className="mt-5">Per campaign</SectionHead>
        <PairTable pair={pair} />
      </div>
      <div className="border-rule px-5 pt-3 pb-10 max-lg:border-t lg:overflow-y-auto lg:border-l">
        <SectionHead>What the data say</SectionHead>
        {trials && (
          <>
            <p className="pt-2 text-lg">{sentences.verdict}</p>
            {sentences.byFeed.map((sentence) => (
              <p key={sentence} className="pt-1">
                {sentence}
              </p>
            ))}
          </>
        )}
        <SectionHead className="mt-5">Does the window predict?</SectionHead>
        {trials &&
          windowSentences(trials, of).map((sentence) => (
            <p key={sentence} className="pt-1">
              {sentence}
            </p>
          ))}
        <SectionHead className="mt-5">Before you rely on it</SectionHead>
        {pair.cautions.map((caution) => (
          <Remark key={caution} className="mt-2">
            {caution}
          </Remark>
        ))}
        <SectionHead className="mt-5">Method</SectionHead>
        <Note className="pt-1">
          Means over trials that have the figure, on the basis each trial is quoted by, rejected trials left out; feed
          by feed where a feed was run in both. Inside and outside by the measured pH and Eh vs SHE, against{" "}
          {left.plan.name} revision {left.plan.revision}
          {left.plan.id === right.plan.id && left.plan.revision === right.plan.revision
            ? ""
            : ` and ${right.plan.name} revision ${right.plan.revision}`}
          . A difference is that of the means before they are rounded. Two assays of one filtrate are no two trials.
        </Note>
      </div>
    </div>
  );
}
