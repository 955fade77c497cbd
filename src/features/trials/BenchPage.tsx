import { Link } from "react-router-dom";
import type { TrialStatus } from "../../../shared/schemas/trial";
import type { TrialListRow } from "../../../shared/schemas/trialRows";
import { ButtonLink } from "../../components/Button";
import { NoProject } from "../../components/NoProject";
import { PageHead } from "../../components/PageHead";
import { ErrorNote, Loading } from "../../components/status";
import { Note, SectionHead } from "../../components/text";
import { classes } from "../../lib/classes";
import { shelved } from "../../lib/draftShelf";
import { fixed, fullTime, savedAt, withUnit } from "../../lib/format";
import { useProject } from "../../lib/project";
import { useMay } from "../../lib/session";
import { usePageTitle } from "../../lib/title";
import { useAllTrials, useTrial } from "../../lib/trials";
import { elapsed, minutesSince, overdue } from "./bench/elapsed";
import { useNow } from "./bench/useNow";

const groups: readonly {
  status: TrialStatus;
  title: string;
  empty: string;
  /** to those who cannot do what `empty` names */
  toLookers?: string;
}[] = [
  { status: "running", title: "Running", empty: "Nothing runs. A planned trial starts with a tap." },
  {
    status: "planned",
    title: "Planned",
    empty: "Nothing is laid out. Plan a trial, above, or take over the next trials a plan proposes.",
    toLookers: "Nothing is laid out. Technicians and metallurgists plan trials.",
  },
  {
    status: "awaiting assay",
    title: "Waiting for assays",
    empty: "Nothing waits. A trial comes here when it is stopped and its samples are at the laboratory.",
  },
];

/** The trials a technician has in hand: running, planned, waiting; one tap opens one. */
export default function BenchPage() {
  usePageTitle("Bench");
  const mayRecord = useMay("writeBench");
  const { project, projects } = useProject();
  const kept = new Set(shelved("trial.").map((name) => name.slice("trial.".length)));
  return (
    <>
      <PageHead
        title="Bench"
        about={
          <Note>
            {kept.size > 0 &&
              `${kept.size} ${kept.size === 1 ? "record" : "records"} kept on this device, not saved yet`}
          </Note>
        }
      >
        {mayRecord && (
          <ButtonLink to="/trials/plan" className="h-14! px-5! text-lg!">
            Plan a trial
          </ButtonLink>
        )}
      </PageHead>
      <div className="px-5 pt-3 pb-12">
        {project || !projects ? (
          project &&
          groups.map(({ toLookers, ...group }) => (
            <Group
              key={group.status}
              {...group}
              empty={mayRecord ? group.empty : (toLookers ?? group.empty)}
              projectId={project.id}
              kept={kept}
            />
          ))
        ) : (
          <NoProject />
        )}
      </div>
    </>
  );
}

interface GroupProps {
  status: TrialStatus;
  title: string;
  empty: string;
  projectId: string;
  kept: ReadonlySet<string>;
}

function Group({ status, title, empty, projectId, kept }: GroupProps) {
  const trials = useAllTrials({ projectId, status, sort: status === "planned" ? "code" : "startedAt", order: "asc" });
  return (
    <section aria-label={title} className="pb-6">
      <SectionHead aside={trials.data && String(trials.data.length)}>{title}</SectionHead>
      {trials.error ? (
        <ErrorNote
          className="mt-2"
          doing="They could not be read"
          error={trials.error}
          retry={() => void trials.refetch()}
        />
      ) : !trials.data ? (
        <Loading label="Reading the trials" />
      ) : trials.data.length === 0 ? (
        <p className="py-3 text-base text-muted">{empty}</p>
      ) : (
        <ul>
          {trials.data.map((trial) => (
            <Tile key={trial.id} trial={trial} kept={kept.has(trial.id)} />
          ))}
        </ul>
      )}
    </section>
  );
}

function Tile({ trial, kept }: { trial: TrialListRow; kept: boolean }) {
  const minutes = minutesSince(trial.startedAt, useNow(30_000));
  // The list carries no records; what runs is opened next anyway.
  const record = useTrial(trial.status === "running" ? trial.id : undefined).data;
  const late = record ? overdue(record.planned.duration, minutes) : null;
  const { pH, Eh, temperatureC } = trial.figures;
  return (
    <li className="hairline">
      <Link
        to={`/bench/${trial.id}`}
        className="grid min-h-[72px] grid-cols-[9em_minmax(0,1fr)_auto] items-center gap-4 py-2 no-underline hover:bg-tint/50"
      >
        <span className="font-mono text-[21px] font-bold">{trial.code}</span>
        <span className="min-w-0 text-lg">
          <span className="block truncate">
            {trial.stage}, {trial.feedName}
          </span>
          <span className="block truncate text-base text-muted">
            {trial.operator || "no operator"}
            {pH !== null && Eh !== null && `; last pH ${fixed(pH, 2)}, ${withUnit(fixed(Eh, 2), "V")} vs SHE`}
            {temperatureC !== null && `, ${withUnit(fixed(temperatureC, 0), "°C")}`}
          </span>
        </span>
        <span className="text-right text-lg">
          {trial.status === "running" ? (
            <>
              <span className={classes("font-mono font-bold", late === null ? "text-verdigris" : "text-signal")}>
                {minutes === null ? "running" : elapsed(minutes)}
              </span>
              {late !== null && <span className="block text-base font-bold text-signal">{late}</span>}
            </>
          ) : trial.startedAt === null ? (
            <span className="text-muted">not started</span>
          ) : (
            <time className="text-muted" title={fullTime(trial.startedAt)}>
              {savedAt(trial.startedAt)}
            </time>
          )}
          {kept && <span className="block text-base text-signal">kept on this device</span>}
        </span>
      </Link>
    </li>
  );
}
