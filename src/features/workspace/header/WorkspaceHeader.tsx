import { lazy, Suspense } from "react";
import type { PlanRow } from "../../../../shared/schemas/plan";
import { Button, ButtonLink } from "../../../components/Button";
import { Menu, MenuItem, MenuLabel, MenuSeparator } from "../../../components/Menu";
import { fullTime, savedAt } from "../../../lib/format";
import type { DraftInHand } from "../model/useDraft";
import { SaidLine } from "./SaidLine";

const NewerRevision = lazy(async () => ({ default: (await import("./NewerRevision")).NewerRevision }));

export type ExportKind =
  "problem" | "solution" | "plan" | "png" | "svg" | "csv" | "windows" | "polygons" | "reactions" | "sheet";

export interface Said {
  text: string;
  bad: boolean;
}

export interface HeaderProps {
  plan: PlanRow;
  draft: DraftInHand;
  mayWrite: boolean;
  /** a word on the command that runs, is done or failed */
  said: Said | null;
  onUnsay: () => void;
  onExport: (kind: ExportKind) => void;
  onCopyLink: () => void;
  /** shows the comments, or the answers again */
  onComments: () => void;
  onOpen: (dialog: "save" | "difference" | "revisions" | "rename" | "duplicate" | "archive" | "keys") => void;
}

/** The plan's name, what is saved of it and what is not, and the commands that concern the whole. */
export function WorkspaceHeader({
  plan,
  draft,
  mayWrite,
  said,
  onUnsay,
  onExport,
  onCopyLink,
  onComments,
  onOpen,
}: HeaderProps) {
  const { latest } = plan;
  const header = (
    <div className="relative flex min-h-11 shrink-0 flex-wrap items-center gap-x-3 gap-y-1 border-b border-rule px-5 py-1.5 lg:flex-nowrap">
      <h1 className="truncate text-lg">{plan.name}</h1>
      <p
        className="min-w-64 flex-1 truncate text-sm text-muted"
        title={`${fullTime(latest.createdAt)} by ${latest.author}. ${latest.note}`}
      >
        <Saved plan={plan} draft={draft} mayWrite={mayWrite} />
      </p>
      <span className="no-print flex shrink-0 gap-2">
        <Button disabled={!draft.canUndo} onClick={draft.undo} title={draft.canUndo ? "Ctrl Z" : "Nothing to undo"}>
          Undo
        </Button>
        <Button
          disabled={!draft.canRedo}
          onClick={draft.redo}
          title={draft.canRedo ? "Ctrl Shift Z" : "Nothing to do again"}
        >
          Redo
        </Button>
        <Button onClick={() => onOpen("revisions")} title="r">
          Revisions
        </Button>
        <ButtonLink to={compareAddress(plan, draft.changed)} title="Two states of the plan side by side">
          Compare
        </ButtonLink>
        <CommentsButton count={plan.commentCount} onClick={onComments} />
        {mayWrite && (
          <Button
            kind="primary"
            disabled={!draft.changed}
            onClick={() => onOpen("save")}
            title={draft.changed ? "Ctrl S" : `These are the settings of revision ${draft.basedOn}`}
          >
            Save revision
          </Button>
        )}
        <Menu trigger={<Button aria-label="More commands">More</Button>}>
          {mayWrite && (
            <>
              <MenuItem onSelect={() => onOpen("rename")}>Name and description</MenuItem>
              <MenuItem onSelect={() => onOpen("duplicate")}>Duplicate</MenuItem>
              <MenuItem onSelect={() => onOpen("archive")}>
                {plan.archived ? "Take back from the archive" : "Archive"}
              </MenuItem>
              <MenuSeparator />
            </>
          )}
          <MenuItem onSelect={onCopyLink} note="l">
            Copy link to what is seen
          </MenuItem>
          <MenuSeparator />
          <MenuLabel>Export</MenuLabel>
          <MenuItem onSelect={() => onExport("sheet")} note={draft.changed ? "PDF, as saved" : "PDF"}>
            Window sheet, revision {draft.basedOn}
          </MenuItem>
          <MenuItem onSelect={() => onExport("png")} note="PNG">
            Picture of the map
          </MenuItem>
          <MenuItem onSelect={() => onExport("svg")} note="SVG">
            Drawing of the map
          </MenuItem>
          <MenuItem onSelect={() => onExport("csv")} note="CSV">
            Limits of the windows
          </MenuItem>
          <MenuItem onSelect={() => onExport("windows")} note="CSV">
            Windows and their set points
          </MenuItem>
          <MenuItem onSelect={() => onExport("polygons")} note="CSV">
            Polygons of the map
          </MenuItem>
          <MenuItem onSelect={() => onExport("reactions")} note="CSV">
            Overall reactions and reagents
          </MenuItem>
          <MenuItem onSelect={() => onExport("plan")} note="JSON">
            Plan with cautions and reactions
          </MenuItem>
          <MenuItem onSelect={() => onExport("problem")} note="JSON">
            Problem, for the solver
          </MenuItem>
          <MenuItem onSelect={() => onExport("solution")} note="JSON">
            Solution
          </MenuItem>
          <MenuSeparator />
          <MenuItem onSelect={() => window.print()}>Print</MenuItem>
          <MenuItem onSelect={() => onOpen("keys")} note="?">
            Keys
          </MenuItem>
        </Menu>
      </span>
      <SaidLine said={said} onClose={onUnsay} />
    </div>
  );
  if (draft.basedOn >= latest.number) return header;
  return (
    <>
      {header}
      <Suspense fallback={null}>
        <NewerRevision
          latest={latest}
          basedOn={draft.basedOn}
          changed={draft.changed}
          onDifference={() => onOpen("difference")}
        />
      </Suspense>
    </>
  );
}

/** Unsaved changes against what is saved, else the last two revisions. */
const compareAddress = ({ id, latest }: PlanRow, changed: boolean): string =>
  `/plans/${id}/compare?` +
  (changed || latest.number === 1 ? `a=${latest.number}&b=draft` : `a=${latest.number - 1}&b=${latest.number}`);

export const CommentsButton = ({ count, onClick }: { count: number; onClick: () => void }) => (
  <Button onClick={onClick} title="c">
    {count === 0 ? "Comments" : `Comments, ${count}`}
  </Button>
);

/** What is saved, and what of the plan in hand is not. */
function Saved({ plan, draft, mayWrite }: Pick<HeaderProps, "plan" | "draft" | "mayWrite">) {
  const { latest } = plan;
  const tail = (
    <>
      {plan.invented && ", invented data"}
      {plan.archived && <b>, archived</b>}
    </>
  );
  if (!draft.changed && draft.basedOn < latest.number)
    return (
      <>
        revision {draft.basedOn}
        {tail}
      </>
    );
  if (!draft.changed)
    return (
      <>
        revision {latest.number}, saved {savedAt(latest.createdAt)} by {latest.author}
        {tail}
        {latest.note !== "" && ` · ${latest.note}`}
      </>
    );
  const back = (
    <button
      type="button"
      className="no-print underline decoration-rule underline-offset-4 hover:decoration-ink"
      onClick={() => draft.take(latest)}
    >
      go back to revision {latest.number}
    </button>
  );
  return (
    <span role="status">
      {/* What one may press comes before what a narrow screen cuts off. */}
      <b className="text-ink">{mayWrite ? "Unsaved changes" : "Tried here only"}</b> · {back}
      {mayWrite ? `, from revision ${draft.basedOn}` : "; your role looks and tries, a metallurgist saves"}
      {!draft.kept && ", and this browser keeps nothing when the page closes"}
      {tail}
    </span>
  );
}
