import { Panel } from '../../ui/panel.tsx';
import { TextAreaField } from '../../ui/text-field.tsx';
import type { SheetFormApi } from './use-sheet.ts';

/** What else was seen. */
export function NotesFields({ form }: { form: SheetFormApi }) {
  return (
    <Panel title="Notes">
      <TextAreaField
        label="What you saw and were told"
        rows={4}
        {...form.register('notes')}
        error={form.formState.errors.notes?.message}
      />
    </Panel>
  );
}
