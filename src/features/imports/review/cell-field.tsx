import type { KeyboardEvent } from 'react';
import { TextField } from '../../../ui/text-field.tsx';
import type { Settings } from '../use-settings.ts';

type Props = {
  at: { sheet: number; row: number; col: number };
  /** What stands in the file. */
  raw: string;
  label: string;
  hideLabel?: boolean;
  settings: Settings;
  onFocus?: () => void;
  /** Enter or Escape was pressed. */
  onDone?: () => void;
};

/** The text of one cell, to be put right. What the file says stays beside it; Escape brings it back. */
export function CellField({ at, raw, label, hideLabel, settings, onFocus, onDone }: Props) {
  const text = settings.textOf(at);
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key !== 'Enter' && event.key !== 'Escape') return;
    event.preventDefault();
    if (event.key === 'Escape') settings.setText(at, null, raw);
    onDone?.();
  };
  return (
    <TextField
      label={label}
      hideLabel={hideLabel}
      value={text ?? raw}
      maxLength={2000}
      autoComplete="off"
      hint={text === null ? undefined : `was: ${raw.trim() || 'nothing'}`}
      onFocus={onFocus}
      onChange={(event) => settings.setText(at, event.target.value, raw)}
      onKeyDown={onKeyDown}
    />
  );
}
