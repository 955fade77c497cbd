import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import type { z } from "zod";
import { planUpdate } from "../../../shared/schemas/plan";
import { FormDialog } from "../../components/FormDialog";
import { ErrorNote } from "../../components/status";
import { TextArea, TextField } from "../../components/TextField";
import { useUpdatePlan } from "../../lib/plans";
import type { PlanDialogProps } from "./RenameDialog";

const schema = planUpdate.pick({ name: true, description: true });

/** Name and description of a plan; its inputs are changed in the workspace. */
export default function Rename({ plan, open, onOpenChange }: PlanDialogProps) {
  const update = useUpdatePlan();
  const form = useForm<z.infer<typeof schema>>({
    resolver: zodResolver(schema),
    values: { name: plan.name, description: plan.description },
    resetOptions: { keepDirtyValues: true },
  });
  const submit = form.handleSubmit((values) =>
    update.mutate({ id: plan.id, version: plan.version, ...values }, { onSuccess: () => onOpenChange(false) }),
  );
  return (
    <FormDialog
      open={open}
      onOpenChange={onOpenChange}
      title="Name and description"
      action="Save"
      disabled={update.isPending}
      onSubmit={(event) => void submit(event)}
    >
      <TextField
        label="Name"
        error={form.formState.errors.name && "A name of 1 to 120 characters"}
        {...form.register("name")}
      />
      <TextArea
        label="Description"
        hint="What the step does and why, for those who find this plan later."
        error={form.formState.errors.description && "At most 2000 characters"}
        {...form.register("description")}
      />
      {update.error && <ErrorNote doing="Not saved" error={update.error} />}
    </FormDialog>
  );
}
