import { useState } from "react";
import { Link } from "react-router-dom";
import type { CommentRow } from "../../../../shared/schemas/comment";
import type { Point } from "../../../../shared/solution";
import { Button } from "../../../components/Button";
import { HistoryDialog } from "../../../components/HistoryDialog";
import { ErrorNote } from "../../../components/status";
import { Note } from "../../../components/text";
import { TextArea } from "../../../components/TextField";
import { useRemoveComment, useRewordComment } from "../../../lib/comments";
import { staleAnswer } from "../../../lib/failure";
import { fixed, fullTime, savedAt } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";
import { useKept } from "./useKept";

export interface CommentItemProps {
  comment: CommentRow;
  own: boolean;
  scale: PotentialScale;
  /** shows a point on the map */
  onShow: (point: Point) => void;
  onRemoved: (row: CommentRow) => void;
}

/** One comment: who, when, what it is about, and the words as they were typed. */
export function CommentItem({ comment, own, scale, onShow, onRemoved }: CommentItemProps) {
  const { id, author, createdAt, updatedAt, version, text } = comment;
  const [draft, keep] = useKept(id);
  const [history, setHistory] = useState(false);
  const remove = useRemoveComment(comment.planId);
  const editing = own && draft !== null;
  return (
    <li className="hairline py-2">
      <article aria-label={`Comment of ${author}, ${fullTime(createdAt)}`}>
        <p className="flex flex-wrap items-baseline justify-between gap-x-3 text-sm">
          <b>{author}</b>
          <time dateTime={createdAt} title={fullTime(createdAt)} className="text-muted">
            {savedAt(createdAt)}
          </time>
        </p>
        <About comment={comment} scale={scale} onShow={onShow} />
        {editing ? (
          <Reword comment={comment} draft={draft} keep={keep} />
        ) : (
          <p className="mt-1 break-words whitespace-pre-wrap">{text}</p>
        )}
        {!editing && (
          <div className="no-print flex flex-wrap gap-x-3 text-sm">
            {own && (
              <>
                <Button kind="quiet" onClick={() => keep(text)}>
                  Reword
                </Button>
                <Button
                  kind="quiet"
                  disabled={remove.isPending}
                  onClick={() => remove.mutate(comment, { onSuccess: onRemoved })}
                >
                  Remove
                </Button>
              </>
            )}
            {version > 1 && (
              <Button
                kind="quiet"
                className="font-normal!"
                title={fullTime(updatedAt)}
                onClick={() => setHistory(true)}
              >
                reworded {savedAt(updatedAt)}
              </Button>
            )}
          </div>
        )}
        {remove.error && <ErrorNote doing="Not removed" error={remove.error} />}
      </article>
      <HistoryDialog
        open={history}
        onOpenChange={setHistory}
        title={`How the comment of ${author} was worded`}
        path={`/comments/${id}`}
        words={(path) => (path === "text" ? "words" : path === "deletedAt" ? "removed" : path)}
      />
    </li>
  );
}

function About({ comment, scale, onShow }: Pick<CommentItemProps, "comment" | "scale" | "onShow">) {
  const { planId, revision, point, limit } = comment;
  if (revision === null && point === null && limit === null) return null;
  return (
    <p className="text-sm text-muted">
      {revision !== null && (
        <Link to={`/plans/${planId}?revision=${revision}`} className="underline underline-offset-4">
          revision {revision}
        </Link>
      )}
      {point && (
        <button
          type="button"
          className="underline decoration-rule underline-offset-4 hover:decoration-ink"
          title="Show it on the map"
          onClick={() => onShow([point.pH, point.Eh])}
        >
          {revision !== null && ", "}
          pH {fixed(point.pH, 2)}, {scale.format(point.Eh)} vs {scale.short}
        </button>
      )}
      {limit !== null && <span>{limit}</span>}
    </p>
  );
}

function Reword({ comment, draft, keep }: { comment: CommentRow; draft: string; keep: (text: string | null) => void }) {
  const reword = useRewordComment(comment.planId);
  const theirs = staleAnswer<CommentRow>(reword.error)?.current;
  const save = (version: number) =>
    reword.mutate({ id: comment.id, version, text: draft }, { onSuccess: () => keep(null) });
  return (
    <form
      className="mt-1 space-y-2"
      onSubmit={(event) => {
        event.preventDefault();
        save(theirs?.version ?? comment.version);
      }}
    >
      <TextArea label="Your words" value={draft} onChange={(event) => keep(event.target.value)} />
      {theirs ? (
        <div role="alert" className="border-l-4 border-signal bg-sheet px-3 py-2 text-sm">
          <p>
            <b>Reworded meanwhile, elsewhere.</b> It now reads:
          </p>
          <p className="mt-1 whitespace-pre-wrap">{theirs.deletedAt === null ? theirs.text : "(removed)"}</p>
          <p className="mt-1 text-muted">Save puts yours in its place; Leave keeps what stands there.</p>
        </div>
      ) : (
        reword.error && <ErrorNote doing="Not saved; your words are still here" error={reword.error} />
      )}
      <div className="flex gap-2">
        <Button type="submit" disabled={draft.trim() === "" || reword.isPending}>
          Save
        </Button>
        <Button kind="quiet" onClick={() => keep(null)}>
          Leave
        </Button>
      </div>
      {draft.trim() === "" && <Note>A comment needs words; to take it back, leave and remove it.</Note>}
    </form>
  );
}
