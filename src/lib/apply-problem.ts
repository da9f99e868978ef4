import type { FieldValues, Path, UseFormReturn } from 'react-hook-form';
import { ApiProblem } from './api-problem.ts';

/**
 * Puts a refused save into its form: each error at the field that its pointer names (`/dates/soldOn` → `dates.soldOn`),
 * what no field answers for at the form's root. Anything but an ApiProblem flies on to the error boundary.
 */
export function applyProblem<T extends FieldValues>(
  form: Pick<UseFormReturn<T>, 'getValues' | 'setError'>,
  problem: unknown,
): void {
  if (!(problem instanceof ApiProblem)) throw problem;
  const values = form.getValues();
  let homeless = problem.errors.length === 0 ? [problem.message] : [];
  for (const { pointer, detail } of problem.errors) {
    const name = fieldName(pointer);
    if (has(values, name)) form.setError(name as Path<T>, { type: 'server', message: detail });
    else homeless = [...homeless, detail];
  }
  if (homeless.length > 0) form.setError('root.server', { type: 'server', message: homeless.join(' ') });
}

/** A JSON pointer (RFC 6901) as the dotted name that forms use. */
export function fieldName(pointer: string): string {
  return pointer
    .split('/')
    .slice(1)
    .map((part) => part.replaceAll('~1', '/').replaceAll('~0', '~'))
    .join('.');
}

function has(values: unknown, name: string): boolean {
  let here: unknown = values;
  for (const part of name.split('.')) {
    if (typeof here !== 'object' || here === null || !(part in here)) return false;
    here = (here as Record<string, unknown>)[part];
  }
  return true;
}
