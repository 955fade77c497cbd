import { useState } from "react";
import type { CommentAnchor } from "../../../../shared/schemas/comment";
import { Button } from "../../../components/Button";
import { Select, type SelectOption } from "../../../components/Select";
import { ErrorNote } from "../../../components/status";
import { TextArea } from "../../../components/TextField";
import { useAddComment } from "../../../lib/comments";
import { useKept } from "./useKept";

const LONGEST = 4000;

/** What a comment can be about here: words, and the anchor they stand for. */
export interface Subject {
  id: string;
  label: string;
  anchor: CommentAnchor;
}

/** A new comment; what is typed stays in this browser until it is sent. */
export function NewComment({ planId, subjects }: { planId: string; subjects: readonly Subject[] }) {
  const add = useAddComment(planId);
  const [kept, keep] = useKept(planId);
  const [about, setAbout] = useState<string>("plan");
  const text = kept ?? "";
  // The window may have moved since: what is no longer there cannot be pointed at.
  const subject = subjects.find((s) => s.id === about) ?? subjects[0];
  const long = text.trim().length > LONGEST;
  const send = () => {
    if (text.trim() === "" || long || add.isPending || !subject) return;
    add.mutate({ text, ...subject.anchor }, { onSuccess: () => keep(null) });
  };
  return (
    <form
      className="mt-3 space-y-2"
      onSubmit={(event) => {
        event.preventDefault();
        send();
      }}
    >
      <TextArea
        label="New comment"
        value={text}
        onChange={(event) => keep(event.target.value)}
        onKeyDown={(event) => {
          if (event.key === "Enter" && (event.ctrlKey || event.metaKey)) send();
        }}
        error={long ? `${text.trim().length} characters; at most ${LONGEST}` : null}
        hint="Everyone in the project reads it. Ctrl Enter sends."
      />
      <Select
        label="About"
        layout="stacked"
        value={subject?.id ?? ""}
        onChange={setAbout}
        options={subjects.map(({ id, label }): SelectOption<string> => ({ value: id, label, text: label }))}
      />
      {add.error && <ErrorNote doing="Not sent; your words are still here" error={add.error} />}
      <Button type="submit" kind="primary" disabled={text.trim() === "" || long || add.isPending}>
        {add.isPending ? "Sending …" : "Send comment"}
      </Button>
    </form>
  );
}
