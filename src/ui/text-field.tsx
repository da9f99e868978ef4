import type { ComponentProps, SyntheticEvent } from 'react';
import { FieldFrame, type FieldProps, useField } from './field.tsx';

type Shared = FieldProps & { className?: string | undefined };

/**
 * One line of text. `label`, `hint`, `error`, `hideLabel`, and every prop of an input: spread a form's `register('name')`
 * into it.
 */
export function TextField({
  label,
  hideLabel,
  hint,
  error,
  className,
  ...input
}: Shared & Omit<ComponentProps<'input'>, 'className'>) {
  const { id, control } = useField({ hint, error }, input.id);
  return (
    <FieldFrame {...{ id, label, hideLabel, hint, error, className }}>
      <input type="text" {...input} {...control} className="control" />
    </FieldFrame>
  );
}

/** Several lines of text. As TextField, with the props of a textarea. */
export function TextAreaField({
  label,
  hideLabel,
  hint,
  error,
  className,
  ...area
}: Shared & Omit<ComponentProps<'textarea'>, 'className'>) {
  const { id, control } = useField({ hint, error }, area.id);
  return (
    <FieldFrame {...{ id, label, hideLabel, hint, error, className }}>
      <textarea rows={3} {...area} {...control} className="control" />
    </FieldFrame>
  );
}

/** What a form holds while a day field shows something that is no day: no contract takes it for one. */
const NO_DAY = 'no such day';

type InputEvent = SyntheticEvent<HTMLInputElement>;

/**
 * The browser reports a day that does not exist, or is half typed, as an empty field. A form that registered the field is
 * told that it is neither, or what was typed would be saved as no day at all.
 */
function tellingOfBadDays<E extends InputEvent>(handler: ((event: E) => void) | undefined) {
  if (!handler) return undefined;
  return (event: E) => {
    const { name, validity } = event.currentTarget;
    handler(validity.badInput ? ({ type: event.type, target: { name, value: NO_DAY } } as unknown as E) : event);
  };
}

/** A calendar day, the system's own picker; its value is `YYYY-MM-DD` or ''. As TextField. */
export function DayField(props: Shared & Omit<ComponentProps<'input'>, 'className' | 'type'>) {
  const { onChange, onBlur, value } = props;
  const told = value === undefined ? { onChange: tellingOfBadDays(onChange), onBlur: tellingOfBadDays(onBlur) } : {};
  return <TextField min="1950-01-01" max="2100-12-31" {...props} {...told} type="date" />;
}

export type Option = { value: string; label: string };

/** One of a short list. `options`: value and label; `none`: words for nothing chosen (its value is ''). As TextField. */
export function SelectField({
  label,
  hideLabel,
  hint,
  error,
  className,
  options,
  none,
  ...select
}: Shared & Omit<ComponentProps<'select'>, 'className'> & { options: readonly Option[]; none?: string }) {
  const { id, control } = useField({ hint, error }, select.id);
  return (
    <FieldFrame {...{ id, label, hideLabel, hint, error, className }}>
      <select {...select} {...control} className="control">
        {none !== undefined && <option value="">{none}</option>}
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </FieldFrame>
  );
}

/** A yes or no. `label`, `hint`, `error`, and the props of a checkbox. */
export function CheckField({
  label,
  hint,
  error,
  className,
  ...input
}: Shared & Omit<ComponentProps<'input'>, 'className' | 'type'>) {
  const { id, control } = useField({ hint, error }, input.id);
  return (
    <div className={`field ${className ?? ''}`}>
      <span className="flex items-start gap-2.5">
        <input {...input} {...control} type="checkbox" className="mt-0.5 size-6 flex-none accent-ink" />
        <label htmlFor={id}>{label}</label>
      </span>
      {hint && (
        <div id={`${id}-hint`} className="field-hint">
          {hint}
        </div>
      )}
      {error && (
        <div id={`${id}-error`} className="field-error">
          {error}
        </div>
      )}
    </div>
  );
}
