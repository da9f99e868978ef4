import { zodResolver } from '@hookform/resolvers/zod';
import { useRef } from 'react';
import { useForm } from 'react-hook-form';
import { useUnsaved } from '../../lib/unsaved.ts';
import { Button } from '../../ui/button.tsx';
import { FormMoney, FormPick } from '../../ui/form-fields.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import type { PickOption } from '../../ui/pick-field.tsx';
import { DayField, SelectField, TextField } from '../../ui/text-field.tsx';
import { EMPTY_ENTRY, type EntryForm, entryFormSchema, KIND_NOT_SAID, KIND_OPTIONS } from './entry-form.ts';

type Props = {
  /** What the row starts with: the day, and the rebuild on whose page it stands. */
  start: Partial<EntryForm>;
  /** null = the row is for one rebuild, which is not asked for. */
  rebuilds: readonly PickOption[] | null;
  categories: readonly PickOption[];
  vendors: readonly string[];
  onSend: (typed: EntryForm) => void;
};

/**
 * One line for the ledger by the keyboard alone: Tab through, Enter saves. Day, rebuild and category stay for the next
 * line, and the cursor goes back to the amount.
 */
export function EntryRowForm({ start, rebuilds, categories, vendors, onSend }: Props) {
  const { decimal } = useFormatter();
  const typed = useRef<EntryForm>({ ...EMPTY_ENTRY, ...start });
  const form = useForm({ defaultValues: typed.current, resolver: zodResolver(entryFormSchema(decimal)) });
  const { register, control, formState } = form;
  const { errors, dirtyFields } = formState;
  useUnsaved(Boolean(dirtyFields.cents || dirtyFields.what));

  // The resolver's output is what the server will make of it; what is sent on is the text, so that it can come back.
  const onSubmit = form.handleSubmit(() => {
    const values = form.getValues();
    onSend(values);
    const { datedOn, rebuildId, categoryId } = values;
    // Before the reset, which forgets where the fields are.
    form.setFocus('cents');
    form.reset({ ...EMPTY_ENTRY, datedOn, rebuildId, categoryId });
  });

  return (
    <form
      onSubmit={(event) => void onSubmit(event)}
      noValidate
      aria-label="Add an entry"
      className="entry-row"
      data-fields={rebuilds ? 8 : 7}
    >
      <DayField label="Day" {...register('datedOn')} error={errors.datedOn?.message} />
      {rebuilds && (
        <FormPick control={control} name="rebuildId" label="Rebuild" options={rebuilds} placeholder="Overhead" />
      )}
      <FormPick control={control} name="categoryId" label="Category" options={categories} />
      <FormMoney control={control} name="cents" label="Amount" />
      <TextField label="What" {...register('what')} error={errors.what?.message} maxLength={500} />
      <TextField label="Vendor" {...register('vendor')} error={errors.vendor?.message} list="vendors" maxLength={200} />
      <datalist id="vendors">
        {vendors.map((vendor) => (
          <option key={vendor} value={vendor} />
        ))}
      </datalist>
      <SelectField label="Kind" {...register('kind')} options={KIND_OPTIONS} none={KIND_NOT_SAID} />
      <Button kind="main" type="submit" className="entry-add">
        Add
      </Button>
    </form>
  );
}
