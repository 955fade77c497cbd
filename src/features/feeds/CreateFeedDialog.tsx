import { useState } from "react";
import type { FeedRow } from "../../../shared/schemas/feed";
import { FormDialog } from "../../components/FormDialog";
import { ErrorNote } from "../../components/status";
import { TextArea, TextField } from "../../components/TextField";
import { useCreateFeed } from "../../lib/feeds";

interface CreateFeedDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  projectId: string;
  onCreated: (feed: FeedRow) => void;
}

/** A name is enough to start; assays follow on the feed's own page. */
export function CreateFeedDialog(props: CreateFeedDialogProps) {
  return props.open ? <Create {...props} /> : null;
}

function Create({ open, onOpenChange, projectId, onCreated }: CreateFeedDialogProps) {
  const create = useCreateFeed();
  const [name, setName] = useState("");
  const [description, setDescription] = useState("");
  const [pressed, setPressed] = useState(false);
  const missing = name.trim() === "";
  return (
    <FormDialog
      open={open}
      onOpenChange={onOpenChange}
      title="New feed"
      action="Create and open"
      disabled={create.isPending}
      onSubmit={(event) => {
        event.preventDefault();
        setPressed(true);
        if (!missing) create.mutate({ projectId, name, description }, { onSuccess: onCreated });
      }}
    >
      <TextField
        label="Name"
        placeholder="such as composite A, west pit"
        autoFocus
        maxLength={120}
        value={name}
        error={pressed && missing ? "A name of 1 to 120 characters" : null}
        onChange={(event) => setName(event.target.value)}
      />
      <TextArea
        label="What it is"
        hint="Where it was taken, what it is a composite of, how it was kept: sulfides oxidise in storage."
        maxLength={2000}
        value={description}
        onChange={(event) => setDescription(event.target.value)}
      />
      {create.error && <ErrorNote doing="Not created" error={create.error} />}
    </FormDialog>
  );
}
