import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { z } from "../../../shared/schemas/z";
import { planCreate } from "../../../shared/schemas/plan";
import { FormDialog } from "../../components/FormDialog";
import { SelectField } from "../../components/SelectField";
import { ErrorNote } from "../../components/status";
import { TextField } from "../../components/TextField";
import { ApiFailure } from "../../lib/failure";
import { useDuplicatePlan } from "../../lib/plans";
import { selectProject, useProject } from "../../lib/project";
import type { DuplicateDialogProps } from "./DuplicateDialog";

const schema = planCreate.pick({ name: true, projectId: true }).extend({ revisions: z.enum(["latest", "all"]) });

/** The server names the field it refuses: a name that is taken belongs under the name. */
const aboutName = (error: unknown): string | null =>
  error instanceof ApiFailure && error.path === "name" ? error.message : null;

/** A copy under a name of its own, in this or another project: the latest inputs, or every revision. */
export default function Duplicate({ plan, open, onOpenChange, onCopied }: DuplicateDialogProps) {
  const duplicate = useDuplicatePlan();
  const { projects = [] } = useProject();
  const form = useForm<z.infer<typeof schema>>({
    resolver: zodResolver(schema),
    values: { name: `${plan.name}, copy`.slice(0, 120), projectId: plan.projectId, revisions: "latest" },
    resetOptions: { keepDirtyValues: true },
  });
  const submit = form.handleSubmit((values) =>
    duplicate.mutate(
      { id: plan.id, ...values },
      {
        onSuccess: (copy) => {
          selectProject(copy.projectId);
          onCopied(copy);
          onOpenChange(false);
          form.reset();
        },
      },
    ),
  );
  return (
    <FormDialog
      open={open}
      onOpenChange={onOpenChange}
      title={`Duplicate ${plan.name}`}
      description="A plan of its own from then on; it says where it comes from."
      action="Duplicate"
      disabled={duplicate.isPending}
      onSubmit={(event) => void submit(event)}
    >
      <TextField
        label="Name of the copy"
        error={form.formState.errors.name ? "A name of 1 to 120 characters" : aboutName(duplicate.error)}
        {...form.register("name")}
      />
      {projects.length > 1 && (
        <SelectField
          control={form.control}
          name="projectId"
          label="Project"
          options={projects.map((p) => ({ value: p.id, label: `${p.siteName} / ${p.name}` }))}
        />
      )}
      {plan.revisionCount > 1 && (
        <SelectField
          control={form.control}
          name="revisions"
          label="Takes along"
          options={[
            { value: "latest", label: `the inputs of revision ${plan.latest.number}, as its revision 1` },
            { value: "all", label: `all ${plan.revisionCount} revisions, with their authors and notes` },
          ]}
        />
      )}
      {duplicate.error && !aboutName(duplicate.error) && <ErrorNote doing="Not duplicated" error={duplicate.error} />}
    </FormDialog>
  );
}
