import { zodResolver } from "@hookform/resolvers/zod";
import { Controller, useForm, useWatch } from "react-hook-form";
import { z } from "../../../shared/schemas/z";
import { presetCaution } from "../../../shared/hazards/presetCautions";
import { planCreate, planInputs, presetNames } from "../../../shared/schemas/plan";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { Caution } from "../../components/Caution";
import { Segmented } from "../../components/choice";
import { NumberField } from "../../components/NumberField";
import { SelectField } from "../../components/SelectField";
import { ErrorNote } from "../../components/status";
import { Note } from "../../components/text";
import { TextField } from "../../components/TextField";
import { metalOptions } from "../../lib/metals";
import { newPlanInputs, steps, type Step } from "../../lib/newPlan";
import { lixiviantName } from "../../lib/planWords";
import type { CreatePlanDialogProps } from "./CreatePlanDialog";
import { useCreateAndOpen } from "./useCreateAndOpen";

const schema = planCreate.pick({ projectId: true, name: true }).extend({
  step: z.enum(steps),
  preset: z.enum(presetNames),
  target: z.string().min(1),
  other: z.string(),
  temperatureC: planInputs.shape.temperatureC,
});
type Values = z.infer<typeof schema>;

const stepLabel: Record<Step, string> = { leach: "Leach", cementation: "Cementation", precipitation: "Precipitation" };
const stepNote: Record<Step, string> = {
  leach: "The target dissolves; gangue stays solid.",
  cementation: "The target drops out as metal on the dust or scrap of a less noble one, which dissolves.",
  precipitation: "The target leaves the liquor as a compound; what is carried on stays dissolved.",
};
const targetLabel: Record<Step, string> = {
  leach: "Metal to dissolve",
  cementation: "Metal to cement",
  precipitation: "Metal to precipitate",
};
const otherLabel: Record<Step, string> = {
  leach: "Metal to leave solid",
  cementation: "Cementing metal",
  precipitation: "Metal to keep dissolved",
};

/** The few things a plan cannot do without, where no feed says them; everything else is set on the map. */
export function FromMetal({ data, projects, projectId, onOpenChange }: CreatePlanDialogProps & { data: ChemicalData }) {
  const create = useCreateAndOpen(() => onOpenChange(false));
  const form = useForm<Values>({
    resolver: zodResolver(schema),
    defaultValues: { projectId, name: "", step: "leach", preset: "sulfate", target: "", other: "Fe", temperatureC: 25 },
  });
  const { errors } = form.formState;
  const [step, preset, target] = useWatch({ control: form.control, name: ["step", "preset", "target"] });
  const metals = metalOptions(data);
  const submit = form.handleSubmit(({ projectId: project, name, other, ...rest }) =>
    create.start({
      projectId: project,
      name,
      inputs: newPlanInputs({ ...rest, other: other === "none" ? null : other }, data),
    }),
  );
  return (
    <form id="new-plan" onSubmit={(event) => void submit(event)} noValidate className="space-y-4">
      <TextField
        label="Name"
        placeholder="such as neutral leach, second tank"
        autoFocus
        error={errors.name && "A name of 1 to 120 characters"}
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
      <Controller
        control={form.control}
        name="step"
        render={({ field }) => (
          <div>
            <span className="mb-1 block text-sm">Step</span>
            <Segmented
              label="Step"
              value={field.value}
              onChange={(next) => {
                field.onChange(next);
                form.setValue(
                  "other",
                  next === "precipitation" ? "none" : next === "cementation" && target !== "Zn" ? "Zn" : "Fe",
                );
              }}
              options={steps.map((value) => ({ value, label: stepLabel[value] }))}
            />
            <Note className="pt-1">{stepNote[step]}</Note>
          </div>
        )}
      />
      <div className="grid grid-cols-2 gap-4">
        <SelectField
          control={form.control}
          name="target"
          label={targetLabel[step]}
          options={metals}
          error={errors.target && "Which metal is this plan about?"}
        />
        <SelectField
          control={form.control}
          name="other"
          label={otherLabel[step]}
          options={[{ value: "none", label: "none yet" }, ...metals.filter((m) => m.value !== target)]}
        />
        <SelectField
          control={form.control}
          name="preset"
          label="Lixiviant"
          options={presetNames.map((value) => ({ value, label: lixiviantName[value] }))}
        />
        <Controller
          control={form.control}
          name="temperatureC"
          render={({ field }) => (
            <NumberField
              label="Temperature of the liquor"
              layout="stacked"
              value={field.value}
              onCommit={field.onChange}
              unit="°C"
              min={0}
              max={150}
              step={5}
            />
          )}
        />
      </div>
      <Caution defer={false}>{presetCaution[preset]}</Caution>
      {create.error && <ErrorNote doing="Not created" error={create.error} />}
    </form>
  );
}
