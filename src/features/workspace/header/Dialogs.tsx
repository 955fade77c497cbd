import { useState } from "react";
import { useNavigate } from "react-router-dom";
import { whenOpened } from "../../../components/whenOpened";
import { DuplicateDialog } from "../../plans/DuplicateDialog";
import { type PlanDialogProps, RenameDialog } from "../../plans/RenameDialog";
import { RevisionsDialog } from "../../plans/RevisionsDialog";
import type { Table } from "../model/useTable";
import type { DifferenceDialogProps } from "./DifferenceDialog";
import type { SaveDialogProps } from "./SaveDialog";

const ArchiveDialog = whenOpened<PlanDialogProps>(() => import("./ArchiveDialog"));
const DifferenceDialog = whenOpened<DifferenceDialogProps>(() => import("./DifferenceDialog"));
const KeysDialog = whenOpened<{ open: boolean; onOpenChange: (open: boolean) => void }>(() => import("./KeysDialog"));
const SaveDialog = whenOpened<SaveDialogProps>(() => import("./SaveDialog"));

export type DialogName = "save" | "difference" | "revisions" | "rename" | "duplicate" | "archive" | "keys";

/** Every dialog of the workspace; one is open at a time. */
export function Dialogs({
  open,
  onOpen,
  table,
  unconfirmed,
}: {
  open: DialogName | null;
  onOpen: (dialog: DialogName | null) => void;
  table: Table;
  unconfirmed: readonly string[];
}) {
  const { plan, draft, frozen, restore } = table;
  const navigate = useNavigate();
  const [note, setNote] = useState("");
  const show = (name: DialogName) => ({
    open: open === name,
    onOpenChange: (next: boolean) => onOpen(next ? name : null),
  });
  const overtaken = draft.basedOn < plan.latest.number;
  // Who was overtaken sees the difference before anything is saved, and then goes on to save.
  const difference = open === "difference" || (open === "save" && overtaken);
  return (
    <>
      <DifferenceDialog
        open={difference}
        onOpenChange={() => onOpen(null)}
        {...{ plan, draft }}
        saving={open === "save"}
      />
      <SaveDialog
        {...show("save")}
        open={open === "save" && !overtaken}
        {...{ plan, draft, unconfirmed, note }}
        onNote={setNote}
      />
      <RevisionsDialog
        {...show("revisions")}
        plan={plan}
        onTake={(revision) => (frozen ? restore(revision) : draft.take(revision))}
        onLook={(revision) => {
          onOpen(null);
          void navigate(`/plans/${plan.id}?revision=${revision.number}`);
        }}
        onCompare={({ number }) => void navigate(`/plans/${plan.id}/compare?a=${number}&b=draft`)}
      />
      <RenameDialog {...show("rename")} plan={plan} />
      <DuplicateDialog {...show("duplicate")} plan={plan} onCopied={(copy) => void navigate(`/plans/${copy.id}`)} />
      <KeysDialog {...show("keys")} />
      <ArchiveDialog {...show("archive")} plan={plan} />
    </>
  );
}
