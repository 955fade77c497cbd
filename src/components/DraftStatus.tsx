import type { DraftState } from "../lib/recordDraft";
import { clockTime } from "../lib/format";
import { Status } from "./status";

type Shown = Pick<DraftState<object>, "status" | "kept" | "savedAt" | "joined"> & { changed: readonly string[] };

/** Where what was typed is: on the server, in this browser only, or on its way. */
export function DraftStatus({ draft }: { draft: Shown }) {
  const { status, changed, kept, savedAt, joined } = draft;
  const here = kept ? "kept in this browser" : "this browser keeps nothing: save before you leave";
  switch (status) {
    case "saved":
      return (
        <Status>
          {savedAt === null ? "" : `saved ${clockTime(savedAt)}`}
          {savedAt !== null && joined && ", with what others saved meanwhile"}
        </Status>
      );
    case "saving":
      return <Status>saving …</Status>;
    case "waiting":
      return <Status tone="bad">No connection. Kept on this device; sent when the server answers.</Status>;
    case "conflict":
      return <Status tone="bad">Somebody changed the same fields: to be decided.</Status>;
    case "refused":
      return <Status tone="bad">Not saved; {here}.</Status>;
    case "unsaved":
      return (
        <Status tone={kept ? "quiet" : "bad"}>
          {changed.length > 0 ? `not saved yet, ${here}` : ""}
          {joined && ", beside what others saved meanwhile"}
        </Status>
      );
  }
}
