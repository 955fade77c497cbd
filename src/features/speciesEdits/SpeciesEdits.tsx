import { useState } from "react";
import type { SpeciesEditRow } from "../../../shared/schemas/speciesEdit";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { Button } from "../../components/Button";
import { ReasonDialog } from "../../components/ReasonDialog";
import { ErrorNote } from "../../components/status";
import { Note, Remark, SectionHead } from "../../components/text";
import { fullTime, savedAt } from "../../lib/format";
import { useMay } from "../../lib/session";
import { useEditedSpecies, useRevertSpeciesEdit, useSpeciesEdits } from "../../lib/speciesEdits";
import { differencesOf } from "./editModel";
import { EditSpeciesDialog } from "./EditSpeciesDialog";

/** How a species' row came to be other than shipped: what is in force, every edit, and the way back. */
export function SpeciesEdits({ data, id }: { data: ChemicalData; id: string }) {
  const mayEdit = useMay("editChemistry");
  const standing = useEditedSpecies().data?.get(id);
  const edits = useSpeciesEdits(id, standing !== undefined);
  const [editing, setEditing] = useState(false);
  const rows = edits.data ?? [];
  if (standing === undefined && !mayEdit) return null;
  return (
    <>
      <SectionHead
        className="mt-4"
        aside={
          mayEdit && (
            <Button kind="quiet" className="h-auto!" onClick={() => setEditing(true)}>
              {standing?.state === "overridden" || standing?.state === "added" ? "change again" : "override"}
            </Button>
          )
        }
      >
        Edits at this site
      </SectionHead>
      {standing === undefined && <Note className="py-1">None: the row is as shipped.</Note>}
      {standing && (
        <Remark className="mt-1.5">
          {standing.state === "overridden" && "Overridden here: these are not the shipped numbers."}
          {standing.state === "added" && "Added here: the shipped library does not have it."}
          {standing.state === "as shipped" && "As shipped again: every edit was taken back."}
          {standing.state === "taken back" && "Taken back: it is in the library no more."}
        </Remark>
      )}
      {edits.error && (
        <ErrorNote doing="The edits could not be read" error={edits.error} retry={() => void edits.refetch()} />
      )}
      <ol>
        {rows.map((edit, i) => (
          <Edit key={edit.id} edit={edit} before={rows[i + 1] ?? null} mayEdit={mayEdit} />
        ))}
      </ol>
      <EditSpeciesDialog
        open={editing}
        onOpenChange={setEditing}
        data={data}
        id={id}
        version={standing?.version ?? 0}
        onSaved={() => setEditing(false)}
      />
    </>
  );
}

function Edit({ edit, before, mayEdit }: { edit: SpeciesEditRow; before: SpeciesEditRow | null; mayEdit: boolean }) {
  const revert = useRevertSpeciesEdit();
  const [asking, setAsking] = useState(false);
  const changes = differencesOf(before?.row ?? edit.curated, edit);
  return (
    <li className="hairline py-2 text-sm">
      <p className="flex items-baseline justify-between gap-3">
        <span>
          <b>{edit.author}</b>
          {edit.inForce
            ? ", in force"
            : edit.revertedAt !== null
              ? ", taken back"
              : edit.unfit !== null
                ? ", left out"
                : ", under a newer one"}
        </span>
        <time className="text-muted" dateTime={edit.createdAt} title={fullTime(edit.createdAt)}>
          {savedAt(edit.createdAt)}
        </time>
      </p>
      {edit.citation !== "" && <p>{edit.citation}</p>}
      {edit.reason !== "" && <p className="text-muted">{edit.reason}</p>}
      <dl className="grid grid-cols-[auto_1fr] gap-x-3 pt-1">
        {changes.map(({ label, from, to }) => (
          <div key={label} className="contents">
            <dt className="text-muted">{label}</dt>
            <dd className="font-mono break-words">
              {from !== "" && <span className="text-muted line-through">{from}</span>} {to}
            </dd>
          </div>
        ))}
      </dl>
      {edit.unfit !== null && <Note>Left out: {edit.unfit}.</Note>}
      {edit.revertedAt !== null && (
        <Note>
          Taken back by {edit.revertedBy} {savedAt(edit.revertedAt)}
          {edit.revertReason !== "" && `: ${edit.revertReason}`}.
        </Note>
      )}
      {mayEdit && edit.revertedAt === null && (
        <Button kind="quiet" className="h-auto! pt-1" onClick={() => setAsking(true)}>
          take back
        </Button>
      )}
      <ReasonDialog
        open={asking}
        onOpenChange={setAsking}
        title={`Take back this edit of ${edit.speciesId}`}
        description={
          edit.kind === "added"
            ? "The species leaves the library unless an older edit of it stands. The edit stays on record."
            : "The row before it is in force again. The edit stays on record."
        }
        action="Take back"
        busy={revert.isPending}
        error={revert.error}
        onConfirm={(reason) =>
          revert.mutate({ id: edit.id, version: edit.version, reason }, { onSuccess: () => setAsking(false) })
        }
      />
    </li>
  );
}
