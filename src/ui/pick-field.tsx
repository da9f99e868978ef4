import { Combobox } from '@base-ui/react/combobox';
import { type KeyboardEvent, type Ref, useRef } from 'react';
import { FieldFrame, type FieldProps, useField } from './field.tsx';
import { usePopupHome } from './popup-home.ts';

export type PickOption = { value: string; label: string; note?: string };

type Props = FieldProps & {
  className?: string | undefined;
  /** The chosen value, or null for nothing. */
  value: string | null;
  onChange: (value: string | null) => void;
  options: readonly PickOption[];
  placeholder?: string | undefined;
  disabled?: boolean | undefined;
  ref?: Ref<HTMLInputElement> | undefined;
};

/**
 * One of a long list, found by typing (a rebuild, a category); Enter or Tab takes it. `label`, `hint`, `error`, `hideLabel`, `value`,
 * `onChange(value | null)`, `options` (value, label, note), `placeholder`, `ref`.
 */
export function PickField({
  label,
  hideLabel,
  hint,
  error,
  className,
  value,
  onChange,
  options,
  placeholder,
  disabled,
  ref,
}: Props) {
  const { id, control } = useField({ hint, error });
  const home = usePopupHome();
  const chosen = options.find((option) => option.value === value) ?? null;
  const highlighted = useRef<PickOption | null>(null);
  // Tab goes on and takes what was being typed for, so that a line is entered without a key more.
  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    const typed = event.currentTarget.value.trim().toLowerCase();
    if (event.key !== 'Tab' || typed === '' || typed === chosen?.label.toLowerCase()) return;
    const matches = options.filter((option) => option.label.toLowerCase().includes(typed));
    const taken = matches.find((option) => option.value === highlighted.current?.value) ?? matches[0];
    if (taken) onChange(taken.value);
  };
  return (
    <FieldFrame {...{ id, label, hideLabel, hint, error, className }}>
      <Combobox.Root
        items={options}
        value={chosen}
        onValueChange={(option: PickOption | null) => onChange(option?.value ?? null)}
        onItemHighlighted={(option) => {
          highlighted.current = option ?? null;
        }}
        autoHighlight
        limit={30}
        disabled={disabled ?? false}
      >
        <Combobox.Input
          ref={ref}
          {...control}
          aria-label={label}
          onKeyDown={onKeyDown}
          placeholder={placeholder}
          className="control"
        />
        <Combobox.Portal container={home}>
          <Combobox.Positioner sideOffset={3} positionMethod="fixed" align="start" className="z-40">
            <Combobox.Popup className="popup">
              <Combobox.Empty>
                <div className="px-3 py-2 text-soft">Nothing matches</div>
              </Combobox.Empty>
              <Combobox.List>
                {(option: PickOption) => (
                  <Combobox.Item key={option.value} value={option} className="popup-item">
                    <span>{option.label}</span>
                    {option.note && <span className="popup-note">{option.note}</span>}
                  </Combobox.Item>
                )}
              </Combobox.List>
            </Combobox.Popup>
          </Combobox.Positioner>
        </Combobox.Portal>
      </Combobox.Root>
    </FieldFrame>
  );
}
