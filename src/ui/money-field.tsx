import { type ChangeEvent, type ComponentProps, type ReactNode, useState } from 'react';
import { parseCents } from '#shared/money.ts';
import { FieldFrame, type FieldProps, useField } from './field.tsx';
import { useFormatter } from './formatter-context.tsx';

type Props = FieldProps & {
  className?: string | undefined;
  /** Stands below while typing too, after what was understood. */
  note?: ReactNode;
} & Omit<ComponentProps<'input'>, 'className' | 'type'>;

/**
 * Money as people type it; below it stands what was understood. Its value is the text typed: a form's schema turns it
 * into cents (`centsTextSchema` in lib/money-text.ts). `label`, `hint`, `note`, `error`, `hideLabel`, and the props of an
 * input.
 */
export function MoneyField({ label, hideLabel, hint, note, error, className, onChange, ...input }: Props) {
  const format = useFormatter();
  const [typed, setTyped] = useState(String(input.value ?? input.defaultValue ?? ''));
  const text = input.value === undefined ? typed : String(input.value);
  const cents = text.trim() === '' ? null : parseCents(text, format.decimal);
  const said = cents === null ? hint : `= ${format.money(cents, 'always')}`;
  const understood = note ? (
    <>
      {said} <span className="block">{note}</span>
    </>
  ) : (
    said
  );
  const { id, control } = useField({ hint: understood, error }, input.id);
  const onType = (event: ChangeEvent<HTMLInputElement>) => {
    setTyped(event.target.value);
    onChange?.(event);
  };
  return (
    <FieldFrame {...{ id, label, hideLabel, hint: understood, error, className }}>
      <input
        {...input}
        {...control}
        type="text"
        inputMode="decimal"
        autoComplete="off"
        onChange={onType}
        className="control control-number"
      />
    </FieldFrame>
  );
}
