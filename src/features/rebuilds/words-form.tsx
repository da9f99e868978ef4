import type { RebuildDetail } from '#shared/contracts/rebuilds.ts';
import { TextAreaField } from '../../ui/text-field.tsx';
import { formOf, wordsSchema } from './rebuild-form.ts';
import { SectionForm } from './section-form.tsx';
import type { SaveRebuild } from './use-save-rebuild.tsx';
import { useSectionForm } from './use-section-form.ts';

type Props = { detail: RebuildDetail; canWrite: boolean; save: SaveRebuild };

/** Notes while it goes on, lessons for the next one. */
export function WordsForm({ detail, canWrite, save }: Props) {
  const { form, frame } = useSectionForm(formOf(detail.rebuild, '.').words, wordsSchema, save);
  const { errors } = form.formState;
  return (
    <SectionForm {...frame} canWrite={canWrite}>
      <div className="grid gap-4 lg:grid-cols-2">
        <TextAreaField label="Notes" rows={5} {...form.register('notes')} error={errors.notes?.message} />
        <TextAreaField
          label="Lessons for the next one"
          rows={5}
          {...form.register('lessons')}
          error={errors.lessons?.message}
        />
      </div>
    </SectionForm>
  );
}
