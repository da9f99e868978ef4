import { type KeyboardEvent, type ReactNode, useRef, useState } from 'react';
import { usePlainForm } from '../../lib/use-plain-form.ts';
import { Button } from '../../ui/button.tsx';
import { TextField } from '../../ui/text-field.tsx';

type Props = {
  name: string;
  note?: ReactNode;
  /** Its buttons beside Rename. */
  acts?: ReactNode;
  /** Absent: the name is only read. */
  onRename?: ((name: string) => Promise<void>) | undefined;
};

/** One word of a list: its name, which is changed in place, and its buttons. */
export function WordRow({ name, note, acts, onRename }: Props) {
  const [isRenaming, setRenaming] = useState(false);
  const rename = useRef<HTMLButtonElement>(null);
  const close = () => {
    setRenaming(false);
    // The button stands again only after this render.
    setTimeout(() => rename.current?.focus());
  };
  return (
    <li className="flex min-h-11 flex-wrap items-center gap-x-3 gap-y-1 border-b border-hair py-1">
      {isRenaming && onRename ? (
        <RenameForm name={name} onSave={onRename} onClose={close} />
      ) : (
        <>
          <span className="min-w-[7rem] flex-1">
            <span className="inline-block break-words first-letter:uppercase">{name}</span>
            {note && <span className="block text-label text-soft">{note}</span>}
          </span>
          <span className="-mr-2 flex flex-wrap items-center">
            {onRename && (
              <Button
                ref={rename}
                kind="plain"
                size="small"
                aria-label={`Rename ${name}`}
                onClick={() => setRenaming(true)}
              >
                Rename
              </Button>
            )}
            {acts}
          </span>
        </>
      )}
    </li>
  );
}

type FormProps = { name: string; onSave: (name: string) => Promise<void>; onClose: () => void };

function RenameForm({ name, onSave, onClose }: FormProps) {
  const { onSubmit, isBusy, errors, message } = usePlainForm({
    names: ['name'],
    check: (values) => (values.name.trim() === '' ? { name: 'Fill this in.' } : {}),
    save: async (values) => {
      if (values.name.trim() !== name) await onSave(values.name.trim());
      onClose();
    },
  });
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'Escape') onClose();
  };
  return (
    <form onSubmit={onSubmit} noValidate className="flex w-full flex-wrap items-start gap-2 py-1">
      <TextField
        label={`New name of ${name}`}
        hideLabel
        name="name"
        defaultValue={name}
        maxLength={80}
        autoComplete="off"
        ref={(field) => field?.focus()}
        onFocus={(event) => event.target.select()}
        onKeyDown={onKeyDown}
        error={errors.name ?? message}
        className="min-w-[9rem] flex-1"
      />
      <Button kind="main" type="submit" busy={isBusy}>
        Save
      </Button>
      <Button onClick={onClose}>Cancel</Button>
    </form>
  );
}
