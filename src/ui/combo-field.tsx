import { Autocomplete } from '@base-ui/react/autocomplete';
import type { Ref } from 'react';
import { FieldFrame, type FieldProps, useField } from './field.tsx';
import { usePopupHome } from './popup-home.ts';

type Props = FieldProps & {
  className?: string | undefined;
  value: string;
  onChange: (text: string) => void;
  onBlur?: (() => void) | undefined;
  /** Offered, not enforced: anything may be typed. */
  suggestions: readonly string[];
  name?: string | undefined;
  placeholder?: string | undefined;
  disabled?: boolean | undefined;
  ref?: Ref<HTMLInputElement> | undefined;
};

/**
 * Free typing with suggestions (vendor, task, make). `label`, `hint`, `error`, `hideLabel`, `value`, `onChange(text)`,
 * `suggestions`, `name`, `placeholder`, `ref`. In a form: a Controller, spreading its `field`.
 */
export function ComboField({
  label,
  hideLabel,
  hint,
  error,
  className,
  value,
  onChange,
  suggestions,
  disabled,
  ...input
}: Props) {
  const { id, control } = useField({ hint, error });
  const home = usePopupHome();
  return (
    <FieldFrame {...{ id, label, hideLabel, hint, error, className }}>
      <Autocomplete.Root
        items={suggestions}
        value={value}
        onValueChange={onChange}
        limit={12}
        disabled={disabled ?? false}
      >
        <Autocomplete.Input {...input} {...control} aria-label={label} className="control" />
        <Autocomplete.Portal container={home}>
          <Autocomplete.Positioner sideOffset={3} positionMethod="fixed" align="start" className="z-40">
            <Autocomplete.Popup className="popup data-empty:hidden">
              <Autocomplete.List>
                {(suggestion: string) => (
                  <Autocomplete.Item key={suggestion} value={suggestion} className="popup-item">
                    {suggestion}
                  </Autocomplete.Item>
                )}
              </Autocomplete.List>
            </Autocomplete.Popup>
          </Autocomplete.Positioner>
        </Autocomplete.Portal>
      </Autocomplete.Root>
    </FieldFrame>
  );
}
