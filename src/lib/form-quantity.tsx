import { type Control, type FieldPath, type FieldValues, useController } from "react-hook-form";
import { QuantityField, type QuantityFieldProps } from "../ui/quantity-field.tsx";

export interface FormQuantityProps<In extends FieldValues, Out>
  extends Omit<QuantityFieldProps, "value" | "onValueChange" | "error" | "name" | "onBlur" | "ref"> {
  control: Control<In, unknown, Out>;
  name: FieldPath<In>;
}

/** A quantity as a field of a form; the form holds the text as typed, its schema turns it into a number. */
export function FormQuantity<In extends FieldValues, Out>({ control, name, ...rest }: FormQuantityProps<In, Out>) {
  const { field, fieldState } = useController({ control, name });
  return (
    <QuantityField
      {...rest}
      name={name}
      ref={field.ref}
      onBlur={field.onBlur}
      value={field.value ?? ""}
      onValueChange={field.onChange}
      error={fieldState.error?.message}
    />
  );
}
