import { useState } from "react";
import { Link, useNavigate, useParams } from "react-router-dom";
import type { FeedRow } from "../../../shared/schemas/feed";
import { Button } from "../../components/Button";
import { ConflictDialog } from "../../components/ConflictDialog";
import { DraftStatus } from "../../components/DraftStatus";
import { EntryField } from "../../components/EntryField";
import { FormulaText } from "../../components/FormulaText";
import { HistoryDialog } from "../../components/HistoryDialog";
import { PageHead } from "../../components/PageHead";
import { ReasonDialog } from "../../components/ReasonDialog";
import { ErrorNote, Opening, Status } from "../../components/status";
import { Note, Remark, SectionHead } from "../../components/text";
import { TextArea, TextField } from "../../components/TextField";
import { useChemistry } from "../../lib/chemistry";
import { useDeleteFeed, useFeed, useRestoreFeed, useUpdateFeed } from "../../lib/feeds";
import { counted } from "../../lib/format";
import { useProjectOf } from "../../lib/project";
import { useMay } from "../../lib/session";
import { usePageTitle } from "../../lib/title";
import { useRecordDraft } from "../../lib/useRecordDraft";
import { useSaveKeys } from "../../lib/useSaveKeys";
import { feedProblems, feedValues, type FeedValues } from "./feedModel";
import { feedWords } from "./feedWords";
import { HeadAssays } from "./HeadAssays";
import { Mineralogy } from "./Mineralogy";

export default function FeedPage() {
  const { feedId = "" } = useParams();
  const feed = useFeed(feedId);
  usePageTitle(feed.data?.name ?? "Feed");
  if (feed.data) return <FeedEditor key={feedId} feed={feed.data} />;
  return <Opening what="feed" asked={[feed]} />;
}

/** Head assays, minerals and the rest of one feed. What is typed is kept in the browser until it is saved. */
function FeedEditor({ feed }: { feed: FeedRow }) {
  const navigate = useNavigate();
  useProjectOf(feed.projectId);
  const mayWrite = useMay("review");
  const update = useUpdateFeed();
  const remove = useDeleteFeed();
  const restore = useRestoreFeed();
  const { data } = useChemistry();
  const [dialog, setDialog] = useState<"history" | "delete" | null>(null);
  const draft = useRecordDraft<FeedValues, FeedRow>({
    shelf: `feed.${feed.id}`,
    row: feed,
    valuesOf: feedValues,
    versionOf: ({ version }) => version,
    check: feedProblems,
    send: (changed, version) => update.mutateAsync({ id: feed.id, version, ...changed }),
  });
  const { values, edit, problems } = draft;
  const set = <K extends keyof FeedValues>(key: K, value: FeedValues[K]) =>
    edit((now) => ({ ...now, [key]: value }), key);
  const wrong = (key: string) => problems.find(({ path }) => path === key || path.startsWith(`${key}.`))?.message;
  const deleted = feed.deletedAt !== null;
  const readOnly = !mayWrite || deleted;
  useSaveKeys({ save: () => void draft.save(), undo: draft.undo, redo: draft.redo }, !readOnly);
  const elsewhere = problems.filter(({ path }) => path !== "name");
  return (
    <>
      <PageHead
        up={
          <Link to="/feeds" className="text-sm text-muted">
            Feeds
          </Link>
        }
        title={values.name || "unnamed"}
        about={
          <>
            <DraftStatus draft={draft} />
            {feed.figuresDue > 0 && (
              <Status>figures of {counted(feed.figuresDue, "trial")} are being worked out anew …</Status>
            )}
          </>
        }
      >
        {!readOnly && (
          <>
            <Button disabled={!draft.canUndo} onClick={draft.undo} title="Ctrl+Z">
              Undo
            </Button>
            <Button onClick={() => setDialog("history")}>History</Button>
            <Button onClick={() => setDialog("delete")}>Delete</Button>
            <Button
              kind="primary"
              title="Ctrl+S"
              disabled={draft.changed.length === 0 || draft.status === "saving"}
              onClick={() => void draft.save()}
            >
              Save
            </Button>
          </>
        )}
        {readOnly && <Button onClick={() => setDialog("history")}>History</Button>}
        {deleted && mayWrite && (
          <Button kind="primary" disabled={restore.isPending} onClick={() => restore.mutate(feed)}>
            Restore
          </Button>
        )}
      </PageHead>
      <ConflictDialog
        conflicts={draft.conflicts}
        what={`feed ${feed.name}`}
        words={feedWords}
        onResolve={(choices) => {
          draft.resolve(choices);
          void draft.save();
        }}
      />
      <div className="grid gap-x-10 px-5 pt-3 pb-10 lg:grid-cols-[minmax(0,1fr)_340px]">
        <div className="min-w-0">
          {deleted && (
            <Remark className="mb-3">This feed was deleted. Its trials and accounts stand as they were.</Remark>
          )}
          {feed.invented && <Note className="mb-2">Invented data, for demonstration.</Note>}
          {draft.status === "refused" && draft.error !== null && (
            <ErrorNote className="mb-3" doing="Not saved" error={draft.error} />
          )}
          {elsewhere.length > 0 && draft.error === null && (
            <Remark className="mb-3 border-signal!">
              Not saved: {elsewhere.map(({ path, message }) => `${feedWords(path)}: ${message}`).join("; ")}.
            </Remark>
          )}
          <SectionHead aside="paste a block, Enter goes down, Ctrl+D repeats the cell above">Head assays</SectionHead>
          <div className="pt-2">
            <HeadAssays heads={values.heads} onChange={(heads) => set("heads", heads)} readOnly={readOnly} />
          </div>
          <SectionHead className="mt-6">Mineralogy</SectionHead>
          <div className="pt-2">
            <Mineralogy
              minerals={values.minerals}
              heads={values.heads}
              data={data}
              onChange={(minerals) => set("minerals", minerals)}
              readOnly={readOnly}
            />
          </div>
        </div>
        <div className="max-lg:mt-6">
          <SectionHead aside={counted(feed.trialCount, "trial")}>The feed</SectionHead>
          <div className="space-y-3 pt-3 pb-2">
            <TextField
              label="Name"
              value={values.name}
              readOnly={readOnly}
              maxLength={120}
              error={wrong("name")}
              onChange={(event) => set("name", event.target.value)}
            />
            <TextArea
              label="What it is"
              rows={4}
              readOnly={readOnly}
              maxLength={2000}
              value={values.description}
              onChange={(event) => set("description", event.target.value)}
            />
          </div>
          <SectionHead className="mt-4">As received</SectionHead>
          {(
            [
              ["carbonate", <FormulaText text="Gangue carbonate, as CaCO3" />, "share"],
              ["moisture", "Moisture, of the wet mass", "share"],
              ["p80", "P80", "size"],
              ["solidDensity", "Density of the solids", "density"],
            ] as const
          ).map(([key, label, quantity]) => (
            <EntryField
              key={key}
              label={feedWords(key)}
              labelText={label}
              quantity={quantity}
              value={values[key]}
              onChange={(entry) => set(key, entry)}
              error={wrong(key)}
              readOnly={readOnly}
            />
          ))}
          <Note className="pt-2">
            Numbers stay as typed; “&lt;0.01” is kept as a limit. An empty field is not measured, never zero.
          </Note>
        </div>
      </div>
      <HistoryDialog
        open={dialog === "history"}
        onOpenChange={(open) => !open && setDialog(null)}
        title={`History of feed ${feed.name}`}
        path={`/feeds/${encodeURIComponent(feed.id)}`}
        words={feedWords}
      />
      <ReasonDialog
        open={dialog === "delete"}
        onOpenChange={(open) => !open && setDialog(null)}
        title={`Delete feed ${feed.name}`}
        description={
          feed.trialCount > 0
            ? `${counted(feed.trialCount, "trial")} rest on it; it can only go when they have another feed.`
            : "It leaves the list and can be restored from “Deleted”."
        }
        action="Delete"
        danger
        busy={remove.isPending}
        error={remove.error}
        onConfirm={(reason) =>
          remove.mutate({ id: feed.id, version: feed.version, reason }, { onSuccess: () => void navigate("/feeds") })
        }
      />
    </>
  );
}
