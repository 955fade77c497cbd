import { useState } from "react";
import type { PlanMetal, PlanRow } from "../../../shared/schemas/plan";
import { tenorText } from "../../../shared/words/tenor";
import { Button, ButtonLink } from "../../components/Button";
import { DataChanged } from "../../components/DataChanged";
import { Term } from "../../components/Help";
import { MetalName } from "../../components/MetalLine";
import { Quantity } from "../../components/Quantity";
import { ErrorNote } from "../../components/status";
import { Note, Row, SectionHead } from "../../components/text";
import { celsius, fullTime, savedAt } from "../../lib/format";
import { useRevisions, useUpdatePlan } from "../../lib/plans";
import { amountWord, lixiviantName, requirementWord, solidsBasisWord } from "../../lib/planWords";
import { useMay } from "../../lib/session";
import { DuplicateDialog } from "./DuplicateDialog";
import { RenameDialog } from "./RenameDialog";
import { RevisionsDialog } from "./RevisionsDialog";

/** The plan in hand: what it asks, how it came to ask that, and what can be done with it. */
export function PlanDetail({
  plan,
  onCopied,
  onShelved,
}: {
  plan: PlanRow;
  onCopied: (copy: PlanRow) => void;
  /** archived or taken back: the plan as it stands now */
  onShelved: (plan: PlanRow) => void;
}) {
  const mayWrite = useMay("writePlans");
  const update = useUpdatePlan();
  const [dialog, setDialog] = useState<"rename" | "duplicate" | "revisions" | null>(null);
  const { inputs } = plan.latest;
  const close = (open: boolean) => !open && setDialog(null);
  return (
    <aside
      aria-label={`Plan ${plan.name}`}
      className="w-[300px] shrink-0 overflow-y-auto border-l border-rule px-5 pt-3 pb-6 lg:w-[372px]"
    >
      <h2 className="text-lg">{plan.name}</h2>
      {plan.invented && <Note>Invented data, for demonstration.</Note>}
      <DataChanged plan={plan} className="mt-2" />
      {plan.description !== "" && <p className="mt-1">{plan.description}</p>}
      <div className="mt-3 flex flex-wrap gap-2">
        <ButtonLink to={`/plans/${plan.id}`} kind="primary">
          Open
        </ButtonLink>
        {mayWrite && (
          <>
            <Button onClick={() => setDialog("duplicate")}>Duplicate</Button>
            <Button onClick={() => setDialog("rename")}>Rename</Button>
            <Button
              disabled={update.isPending}
              onClick={() =>
                update.mutate(
                  { id: plan.id, version: plan.version, archived: !plan.archived },
                  { onSuccess: onShelved },
                )
              }
            >
              {plan.archived ? "Take back" : "Archive"}
            </Button>
          </>
        )}
      </div>
      {update.error && <ErrorNote className="mt-2" doing="Not changed" error={update.error} />}

      <SectionHead className="mt-5">Metals</SectionHead>
      {inputs.metals.map((metal) => (
        <Row
          key={metal.element}
          label={
            <>
              <MetalName {...metal} />{" "}
              <span className="text-muted">
                {metal.role === "watched" ? "watched" : requirementWord[metal.requirement]}
              </span>
            </>
          }
        >
          <Amount metal={metal} />
        </Row>
      ))}

      <SectionHead className="mt-5">Conditions</SectionHead>
      <Row label="Lixiviant">
        <span className="font-sans">{lixiviantName[inputs.preset]}</span>
      </Row>
      <Row label="Liquor">{celsius(inputs.temperatureC)}</Row>
      <Row label={<Term word="solidsBasis">Solids</Term>}>
        <span className="font-sans">{solidsBasisWord[inputs.solidsBasis]}</span>
      </Row>

      <SectionHead
        className="mt-5"
        aside={
          <Button kind="quiet" className="h-auto!" onClick={() => setDialog("revisions")}>
            what changed
          </Button>
        }
      >
        Revisions
      </SectionHead>
      <LatestRevisions plan={plan} />

      <RenameDialog plan={plan} open={dialog === "rename"} onOpenChange={close} />
      <DuplicateDialog plan={plan} open={dialog === "duplicate"} onOpenChange={close} onCopied={onCopied} />
      <RevisionsDialog plan={plan} open={dialog === "revisions"} onOpenChange={close} />
    </aside>
  );
}

const amountTerm = { carry: "carry", "at most": "atMost", "leave at most": "leaveAtMost", at: "watched" } as const;

function Amount({ metal }: { metal: PlanMetal }) {
  return (
    <>
      <span className="font-sans text-sm text-muted">
        <Term word={amountTerm[amountWord(metal)]}>{amountWord(metal)}</Term>{" "}
      </span>
      {metal.entry === "gPerL" ? (
        <span className="font-mono whitespace-nowrap">{tenorText(metal.value)}</span>
      ) : (
        <Quantity value={metal.value} />
      )}
    </>
  );
}

function LatestRevisions({ plan }: { plan: PlanRow }) {
  const { data } = useRevisions(plan.id);
  const rows = data ?? [plan.latest];
  return (
    <ol>
      {rows.slice(0, 5).map((revision) => (
        <li key={revision.number} className="hairline py-1">
          <div className="flex items-baseline justify-between gap-3 text-sm">
            <span className="font-mono font-bold">{revision.number}</span>
            <span className="min-w-0 flex-1 truncate text-muted">{revision.author}</span>
            <time dateTime={revision.createdAt} title={fullTime(revision.createdAt)} className="text-muted">
              {savedAt(revision.createdAt)}
            </time>
          </div>
          <p className="text-sm">
            {revision.note === "" ? <span className="text-muted">no note</span> : revision.note}
          </p>
        </li>
      ))}
    </ol>
  );
}
