import { useEffect, useRef, useState } from "react";
import type { CommentAnchor, CommentRow } from "../../../../shared/schemas/comment";
import type { PlanRow } from "../../../../shared/schemas/plan";
import type { Point, Solution } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { limitSentences, namingOf, windowName } from "../../../../shared/windows/limitWords";
import { Button } from "../../../components/Button";
import { ErrorNote, Loading } from "../../../components/status";
import { Note, SectionHead } from "../../../components/text";
import { useBringBackComment, useComments } from "../../../lib/comments";
import { counted, fixed } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";
import { useSession } from "../../../lib/session";
import { CommentItem } from "./CommentItem";
import { NewComment, type Subject } from "./NewComment";

export interface CommentsPanelProps {
  plan: PlanRow;
  /** the saved state that is looked at; null while the plan is worked on */
  revision: number | null;
  solution: Solution | null;
  data: ChemicalData;
  /** index of the window in hand */
  chosen: number;
  /** the point of the map in hand */
  through: Point | null;
  scale: PotentialScale;
  onShow: (point: Point) => void;
  onClose: () => void;
}

const nothing: CommentAnchor = { revision: null, point: null, limit: null };

/** The plan, its revision, the point in hand, and each limit of the window in hand. */
function subjectsOf({ plan, revision, solution, data, chosen, through, scale }: CommentsPanelProps): Subject[] {
  const number = revision ?? plan.latest.number;
  const window = solution?.windows[chosen];
  const limits = solution && window ? limitSentences(window, namingOf(data, solution)) : [];
  const point = through && { pH: through[0], Eh: through[1] };
  const whole: Subject[] = [
    { id: "plan", label: "the plan", anchor: nothing },
    { id: "revision", label: `revision ${number}`, anchor: { ...nothing, revision: number } },
  ];
  return [
    ...(revision === null ? whole : whole.reverse()),
    ...(point
      ? [
          {
            id: "point",
            label: `pH ${fixed(point.pH, 2)}, ${scale.format(point.Eh)} on the map`,
            anchor: { ...nothing, point },
          },
        ]
      : []),
    ...limits.map(({ side, what }): Subject => {
      const words = `window ${windowName(chosen)}, ${side}: ${what}`;
      return { id: words, label: words, anchor: { ...nothing, limit: words.slice(0, 200) } };
    }),
  ];
}

/** What was said of the plan, and room to say more; it stands in place of the answers, so that the map stays in sight. */
export default function CommentsPanel(props: CommentsPanelProps) {
  const { plan, scale, onShow, onClose } = props;
  const { user } = useSession();
  const comments = useComments(plan.id);
  const bringBack = useBringBackComment(plan.id);
  const [removed, setRemoved] = useState<CommentRow | null>(null);
  const head = useRef<HTMLDivElement>(null);
  useEffect(() => head.current?.focus(), []);
  const rows = comments.data;
  return (
    <section aria-label="Comments">
      <div ref={head} tabIndex={-1} className="outline-none">
        <SectionHead
          aside={
            <Button kind="quiet" className="h-auto!" onClick={onClose}>
              back to the answers
            </Button>
          }
        >
          Comments
        </SectionHead>
      </div>
      {comments.error ? (
        <ErrorNote
          className="mt-2"
          doing="The comments could not be read"
          error={comments.error}
          retry={() => void comments.refetch()}
        />
      ) : !rows ? (
        <Loading label="Reading the comments" />
      ) : rows.length === 0 ? (
        <Note className="py-2">
          Nothing was said of this plan yet. Write what the next shift should know: it can point at a revision, a point
          of the map or a limit of the window.
        </Note>
      ) : (
        <ol aria-label={counted(rows.length, "comment")}>
          {rows.map((comment) => (
            <CommentItem
              key={comment.id}
              comment={comment}
              own={comment.authorId === user.id}
              scale={scale}
              onShow={onShow}
              onRemoved={setRemoved}
            />
          ))}
        </ol>
      )}
      {removed && (
        <p role="status" className="py-1 text-sm">
          The comment is removed.{" "}
          <Button
            kind="quiet"
            className="h-auto!"
            disabled={bringBack.isPending}
            onClick={() => bringBack.mutate(removed, { onSuccess: () => setRemoved(null) })}
          >
            Bring it back
          </Button>
        </p>
      )}
      {bringBack.error && <ErrorNote doing="Not brought back" error={bringBack.error} />}
      <NewComment planId={plan.id} subjects={subjectsOf(props)} />
    </section>
  );
}
