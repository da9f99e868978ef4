import type { ReactNode } from 'react';
import { type Control, Controller, type FieldPath, type FieldValues } from 'react-hook-form';
import { MoneyField } from './money-field.tsx';
import { PickField, type PickOption } from './pick-field.tsx';

type InForm<V extends FieldValues> = {
  // A form's schema turns what was typed into something else; these only hold what was typed.
  control: Control<V, unknown, unknown>;
  name: FieldPath<V>;
  label: string;
  hideLabel?: boolean;
  hint?: string;
  className?: string;
};

/** A MoneyField of a form, emptied when the form is reset. `control`, `name`, and the props of MoneyField. */
export function FormMoney<V extends FieldValues>({
  control,
  name,
  ...props
}: InForm<V> & { placeholder?: string; note?: ReactNode }) {
  return (
    <Controller
      control={control as Control<V>}
      name={name}
      render={({ field, fieldState }) => <MoneyField {...props} {...field} error={fieldState.error?.message} />}
    />
  );
}

/** A PickField of a form; nothing chosen is ''. `control`, `name`, `options`, and the props of PickField. */
export function FormPick<V extends FieldValues>({
  control,
  name,
  ...props
}: InForm<V> & { options: readonly PickOption[]; placeholder?: string }) {
  return (
    <Controller
      control={control as Control<V>}
      name={name}
      render={({ field, fieldState }) => (
        <PickField
          {...props}
          ref={field.ref}
          value={field.value || null}
          onChange={(value) => field.onChange(value ?? '')}
          error={fieldState.error?.message}
        />
      )}
    />
  );
}
