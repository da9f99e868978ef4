import { z } from 'zod';
import { newSplitSchema } from '#shared/contracts/ledger.ts';
import { into, optionalDay, optionalText } from '../../lib/form-text.ts';
import { centsTextSchema } from '../../lib/money-text.ts';

/** A share as typed; a rebuild of '' is overhead. */
export interface ShareForm {
  rebuildId: string;
  weight: string;
}

/** Typed text to a split bill. Names are the contract's. */
export function splitFormSchema(decimal: '.' | ',') {
  return z
    .object({
      datedOn: optionalDay,
      categoryId: z.string().min(1, { error: 'Choose a category.' }),
      cents: centsTextSchema(decimal),
      vendor: optionalText,
      what: optionalText,
      isSurprise: z.boolean(),
      shares: z.array(
        z.object({
          rebuildId: z.string().transform((id) => id || null),
          weight: z
            .string()
            .regex(/^\d{1,6}$/, { error: 'A whole number.' })
            .transform(Number),
        }),
      ),
    })
    .transform(({ isSurprise, ...bill }) => ({
      ...bill,
      foreseen: isSurprise ? ('surprise' as const) : ('foreseen' as const),
    }))
    .transform(into(newSplitSchema));
}

/** What the form holds: text as typed. */
export type SplitForm = z.input<ReturnType<typeof splitFormSchema>>;
