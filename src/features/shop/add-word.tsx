import { useRef } from 'react';
import { usePlainForm } from '../../lib/use-plain-form.ts';
import { Button } from '../../ui/button.tsx';
import { CheckField, TextField } from '../../ui/text-field.tsx';

type Props = {
  label: string;
  maxLength?: number;
  /** A yes or no asked beside the name. */
  flag?: string;
  onAdd: (name: string, flag: boolean) => Promise<void>;
};

/** A new word at the end of a list; after it is added the field stands empty for the next. */
export function AddWord({ label, maxLength = 60, flag, onAdd }: Props) {
  const field = useRef<HTMLInputElement>(null);
  const { onSubmit, isBusy, errors, message } = usePlainForm({
    names: ['name', 'flag'],
    check: ({ name }) => (name.trim() === '' ? { name: 'Fill this in.' } : {}),
    save: async (typed) => {
      await onAdd(typed.name.trim(), typed.flag === 'on');
      if (field.current) field.current.value = '';
    },
  });
  return (
    <form onSubmit={onSubmit} noValidate className="mt-4 flex flex-wrap items-start gap-x-3 gap-y-2">
      <TextField
        ref={field}
        label={label}
        name="name"
        maxLength={maxLength}
        autoComplete="off"
        error={errors.name ?? message}
        className="min-w-[9rem] flex-1"
      />
      {flag && <CheckField label={flag} name="flag" className="mt-[1.4rem] min-h-10 content-center" />}
      <Button type="submit" busy={isBusy} className="mt-[1.4rem]">
        Add
      </Button>
    </form>
  );
}
