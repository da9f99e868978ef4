/** Only what a person changed, in words, where two versions of a thing differ. */
export type FieldWords = { readonly name: string; readonly theirs: string; readonly mine: string };

/**
 * Fields of a change beside what stands there now. `words` writes a field's value; `names` gives the label, and leaves
 * out fields that no one sees.
 */
export function fieldsInWords<T extends object>(
  change: Partial<T>,
  theirs: T,
  names: Partial<Record<keyof T, string>>,
  words: (field: keyof T, value: unknown) => string,
): FieldWords[] {
  return (Object.keys(change) as (keyof T)[]).flatMap((field) => {
    const name = names[field];
    return name ? [{ name, theirs: words(field, theirs[field]), mine: words(field, change[field]) }] : [];
  });
}
