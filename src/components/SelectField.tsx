import { Controller, type Control, type FieldPath, type FieldPathValue, type FieldValues } from "react-hook-form";
import { Select, type SelectProps } from "./Select";

/** A choice that belongs to a form, stacked under its label. */
export function SelectField<Values extends FieldValues, Sent, Name extends FieldPath<Values>>({
  control,
  name,
  ...select
}: Omit<SelectProps<FieldPathValue<Values, Name>>, "value" | "onChange" | "layout"> & {
  control: Control<Values, unknown, Sent>;
  name: Name;
}) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field }) => <Select {...select} layout="stacked" value={field.value} onChange={field.onChange} />}
    />
  );
}
