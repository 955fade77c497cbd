import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import type { z } from "zod";
import { projectCreate } from "../../../shared/schemas/api";
import { FormDialog } from "../../components/FormDialog";
import { ErrorNote } from "../../components/status";
import { TextField } from "../../components/TextField";
import { useCreateProject } from "../../lib/plans";
import { selectProject, useProject } from "../../lib/project";
import type { CreateProjectDialogProps } from "./CreateProjectDialog";

/** A circuit of a site, to hold plans. */
export default function CreateProject({ open, onOpenChange }: CreateProjectDialogProps) {
  const create = useCreateProject();
  const { project } = useProject();
  const form = useForm<z.infer<typeof projectCreate>>({
    resolver: zodResolver(projectCreate),
    values: { siteName: project?.invented ? "" : (project?.siteName ?? ""), name: "" },
    resetOptions: { keepDirtyValues: true },
  });
  const { errors } = form.formState;
  const submit = form.handleSubmit((values) =>
    create.mutate(values, {
      onSuccess: (made) => {
        selectProject(made.id);
        onOpenChange(false);
        form.reset();
      },
    }),
  );
  return (
    <FormDialog
      open={open}
      onOpenChange={onOpenChange}
      title="New project"
      description="A project is one circuit of a site; its plans stay together and stand under its name."
      action="Create project"
      disabled={create.isPending}
      onSubmit={(event) => void submit(event)}
    >
      <TextField
        label="Site"
        placeholder="where the plant stands"
        error={errors.siteName && "The site’s name, 1 to 120 characters"}
        {...form.register("siteName")}
      />
      <TextField
        label="Project"
        placeholder="such as calcine circuit, heap 3, gold plant"
        error={errors.name && "The project’s name, 1 to 120 characters"}
        {...form.register("name")}
      />
      {create.error && <ErrorNote doing="Not created" error={create.error} />}
    </FormDialog>
  );
}
