import { useState } from "react";
import type { CampaignRow } from "../../../shared/schemas/campaign";
import { Button, ButtonLink } from "../../components/Button";
import { Dialog } from "../../components/Dialog";
import { Select } from "../../components/Select";
import { ErrorNote, Loading } from "../../components/status";
import { Note } from "../../components/text";
import { TextArea, TextField } from "../../components/TextField";
import { useCreateCampaign } from "../../lib/campaigns";
import { usePlans } from "../../lib/plans";
import { stageFromPlan } from "../../lib/stageFromPlan";

interface CreateCampaignDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  projectId: string;
  onCreated: (campaign: CampaignRow) => void;
}

/** Code, title, question and the plan it is laid out on; stages follow from the plan and are changed afterwards. */
export function CreateCampaignDialog(props: CreateCampaignDialogProps) {
  return props.open ? <Create {...props} /> : null;
}

function Create({ open, onOpenChange, projectId, onCreated }: CreateCampaignDialogProps) {
  const plans = usePlans(projectId);
  const create = useCreateCampaign();
  const [code, setCode] = useState("");
  const [title, setTitle] = useState("");
  const [question, setQuestion] = useState("");
  const [planId, setPlanId] = useState("");
  const [pressed, setPressed] = useState(false);
  const plan = plans.data?.find(({ id }) => id === planId);
  const complete = code.trim() !== "" && title.trim() !== "" && plan !== undefined;
  const stage = plan && stageFromPlan(plan.latest.inputs);
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title="New campaign"
      width={620}
      footer={
        <>
          <Button onClick={() => onOpenChange(false)}>Cancel</Button>
          <Button
            type="submit"
            form="new-campaign"
            kind="primary"
            disabled={create.isPending || plans.data?.length === 0}
          >
            Create and open
          </Button>
        </>
      }
    >
      {plans.error ? (
        <ErrorNote doing="The plans could not be read" error={plans.error} retry={() => void plans.refetch()} />
      ) : !plans.data ? (
        <Loading label="Reading the plans" />
      ) : plans.data.length === 0 ? (
        <>
          <p>A campaign is laid out on a plan, and this project has none yet.</p>
          <div className="pt-3">
            <ButtonLink to="/plans">To the plans</ButtonLink>
          </div>
        </>
      ) : (
        <form
          id="new-campaign"
          noValidate
          className="space-y-4"
          onSubmit={(event) => {
            event.preventDefault();
            setPressed(true);
            if (!complete || !plan || !stage) return;
            create.mutate(
              { projectId, code, title, question, planId, planRevision: plan.latest.number, stages: [stage] },
              { onSuccess: onCreated },
            );
          }}
        >
          <div className="grid grid-cols-[9em_1fr] gap-4">
            <TextField
              label="Code"
              placeholder="NL-4"
              autoFocus
              maxLength={24}
              value={code}
              error={pressed && code.trim() === "" ? "A short code" : null}
              onChange={(event) => setCode(event.target.value)}
            />
            <TextField
              label="Title"
              placeholder="oxygen against air, composite B"
              maxLength={160}
              value={title}
              error={pressed && title.trim() === "" ? "A title" : null}
              onChange={(event) => setTitle(event.target.value)}
            />
          </div>
          <TextArea
            label="What it is to answer"
            maxLength={1000}
            value={question}
            onChange={(event) => setQuestion(event.target.value)}
          />
          <Select
            label="Plan"
            layout="stacked"
            value={planId}
            onChange={setPlanId}
            options={plans.data.map((p) => ({ value: p.id, label: p.name, note: `revision ${p.latest.number}` }))}
            error={pressed && !plan ? "Which plan is it laid out on?" : null}
          />
          {plan && stage && (
            <Note>
              Laid out on revision {plan.latest.number}. First stage: {stage.code}, {stage.name}, target {stage.target}
              {stage.gangue !== null && `, ${stage.gangue} to stay in the solids`}. Stages can be changed afterwards.
            </Note>
          )}
          {create.error && <ErrorNote doing="Not created" error={create.error} />}
        </form>
      )}
    </Dialog>
  );
}
