import { zodResolver } from '@hookform/resolvers/zod';
import { type DefaultValues, type FieldValues, useForm } from 'react-hook-form';
import type { z } from 'zod';
import type { rebuildChangeSchema } from '#shared/contracts/rebuilds.ts';
import { applyProblem } from '../../lib/apply-problem.ts';
import { useUnsaved } from '../../lib/unsaved.ts';
import type { SaveRebuild } from './use-save-rebuild.tsx';

type Change = z.output<typeof rebuildChangeSchema>;

/**
 * One part's form: starts from `values`, follows them where nothing was typed, saves through `save`, and puts a refusal
 * at its fields.
 */
export function useSectionForm<Values extends FieldValues>(
  values: Values,
  schema: z.ZodType<Change, Values>,
  save: SaveRebuild,
) {
  const form = useForm<Values, unknown, Change>({
    defaultValues: values as DefaultValues<Values>,
    values,
    resetOptions: { keepDirtyValues: true },
    resolver: zodResolver(schema),
  });
  const onSubmit = form.handleSubmit(async (body) => {
    try {
      await save(body);
      form.reset(form.getValues());
    } catch (problem) {
      applyProblem(form, problem);
    }
  });
  const { isDirty, isSubmitting, errors } = form.formState;
  useUnsaved(isDirty);
  const frame = {
    onSubmit: () => onSubmit(),
    onReset: () => form.reset(values),
    isDirty,
    isBusy: isSubmitting,
    errors,
  };
  return { form, frame };
}
