import { z } from 'zod';
import { type EntryRow, newEntrySchema } from '#shared/contracts/ledger.ts';
import { into, optionalDay, optionalPick, optionalText } from '../../lib/form-text.ts';
import { centsTextSchema, centsToText, optionalCentsTextSchema } from '../../lib/money-text.ts';
import type { EntryChange } from './mutations.ts';

/** How a cost stands to the plan, as one choice. '' = not said. */
export const KIND_OPTIONS = [
  { value: 'foreseen', label: 'Foreseen' },
  { value: 'surprise', label: 'Surprise' },
  { value: 'chosen extra', label: 'Chosen extra' },
] as const;
export const KIND_NOT_SAID = 'Not said';

/** What an entry form holds: text as typed, '' for nothing. */
export interface EntryForm {
  datedOn: string;
  rebuildId: string;
  categoryId: string;
  cents: string;
  vendor: string;
  what: string;
  kind: string;
  freeValueCents: string;
  receipt: string;
}

export const EMPTY_ENTRY: EntryForm = {
  datedOn: '',
  rebuildId: '',
  categoryId: '',
  cents: '',
  vendor: '',
  what: '',
  kind: 'foreseen',
  freeValueCents: '',
  receipt: '',
};

/** Typed text to what the contract takes; names are the contract's, so that a refusal finds its field. */
export function entryFormSchema(decimal: '.' | ',') {
  return z
    .object({
      datedOn: optionalDay,
      rebuildId: optionalPick,
      categoryId: z.string().min(1, { error: 'Choose a category.' }),
      cents: centsTextSchema(decimal),
      vendor: optionalText,
      what: optionalText,
      kind: z.string(),
      freeValueCents: optionalCentsTextSchema(decimal),
      receipt: optionalText,
    })
    .transform(({ kind, ...fields }) => ({ ...fields, ...standing(kind) }))
    .transform(into(newEntrySchema));
}

/** A chosen extra is foreseen by nature: whoever adds it knows of it. */
function standing(kind: string): { foreseen: 'foreseen' | 'surprise' | null; isExtra: boolean } {
  if (kind === 'chosen extra') return { foreseen: 'foreseen', isExtra: true };
  return { foreseen: kind === 'foreseen' || kind === 'surprise' ? kind : null, isExtra: false };
}

/** The kind of an entry as the form and the table name it; '' = not said. */
export function kindOf(entry: Pick<EntryRow, 'foreseen' | 'isExtra'>): string {
  return entry.isExtra ? 'chosen extra' : (entry.foreseen ?? '');
}

export function formOf(entry: EntryRow, decimal: '.' | ','): EntryForm {
  return {
    datedOn: entry.datedOn ?? '',
    rebuildId: entry.rebuildId ?? '',
    categoryId: entry.categoryId,
    cents: centsToText(entry.cents, decimal),
    vendor: entry.vendor ?? '',
    what: entry.what ?? '',
    kind: kindOf(entry),
    freeValueCents: centsToText(entry.freeValueCents, decimal),
    receipt: entry.receipt ?? '',
  };
}

/** Only what is different from the entry as it was opened: a field left alone is left to others. */
export function changeOf(entry: EntryRow, body: z.output<typeof newEntrySchema>): EntryChange {
  const kind = kindOf({ foreseen: body.foreseen ?? null, isExtra: body.isExtra ?? false });
  const { foreseen, isExtra, ...rest } = body;
  const fields = Object.entries(rest).filter(([name, value]) => value !== entry[name as keyof EntryRow]);
  return { ...Object.fromEntries(fields), ...(kind === kindOf(entry) ? {} : { foreseen, isExtra }) };
}
