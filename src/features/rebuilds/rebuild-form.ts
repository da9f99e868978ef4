import { z } from 'zod';
import { type Rebuild, rebuildChangeSchema } from '#shared/contracts/rebuilds.ts';
import { REBUILD_DATES } from '#shared/vocabulary.ts';
import { into, optionalCount, optionalDay, optionalPick, optionalText } from '../../lib/form-text.ts';
import { centsToText, optionalCentsTextSchema } from '../../lib/money-text.ts';
import type { RebuildChange } from './mutations.ts';

export const SEEN_OPTIONS = [
  { value: 'yes', label: 'Yes, in person' },
  { value: 'no', label: 'No, from pictures' },
];

/** Seen before buying: yes, no, or nobody said. */
export const seenText = z.string().transform((seen) => (seen === '' ? null : seen === 'yes'));

/** Labels of a rebuild's fields, where two versions are shown beside each other. */
export const FIELD_NAMES: Partial<Record<keyof Rebuild, string>> = {
  tag: 'Tag',
  year: 'Year',
  make: 'Make',
  model: 'Model',
  trim: 'Trim',
  vin: 'VIN',
  classId: 'Class',
  damageId: 'Damage',
  secondDamageId: 'Second damage',
  isSeen: 'Seen before buying',
  titleBrandBought: 'Title brand when bought',
  titleBrandSold: 'Title brand when sold',
  odometer: 'Odometer',
  boughtFrom: 'Bought from',
  purchaseCents: 'Purchase',
  askingCents: 'Asking price',
  saleCents: 'Sale price',
  buyerChannel: 'Sold through',
  exitKind: 'Left otherwise',
  exitOn: 'Left on',
  exitCents: 'Brought',
  notes: 'Notes',
  lessons: 'Lessons',
  ...Object.fromEntries(REBUILD_DATES),
};

/** The rebuild's fields as text, as every form on its page starts out. */
export function formOf(rebuild: Rebuild, decimal: '.' | ',') {
  const money = (cents: number | null) => centsToText(cents, decimal);
  const text = (value: string | number | null) => (value === null ? '' : String(value));
  return {
    facts: {
      tag: rebuild.tag,
      year: text(rebuild.year),
      make: text(rebuild.make),
      model: text(rebuild.model),
      trim: text(rebuild.trim),
      vin: text(rebuild.vin),
      classId: text(rebuild.classId),
      damageId: text(rebuild.damageId),
      secondDamageId: text(rebuild.secondDamageId),
      isSeen: rebuild.isSeen === null ? '' : rebuild.isSeen ? 'yes' : 'no',
      titleBrandBought: text(rebuild.titleBrandBought),
      titleBrandSold: text(rebuild.titleBrandSold),
      odometer: text(rebuild.odometer),
      boughtFrom: text(rebuild.boughtFrom),
      purchaseCents: money(rebuild.purchaseCents),
    },
    dates: Object.fromEntries(REBUILD_DATES.map(([field]) => [field, rebuild[field] ?? ''])) as Record<
      (typeof REBUILD_DATES)[number][0],
      string
    >,
    leaving: {
      askingCents: money(rebuild.askingCents),
      soldOn: text(rebuild.soldOn),
      saleCents: money(rebuild.saleCents),
      buyerChannel: text(rebuild.buyerChannel),
      exitKind: text(rebuild.exitKind),
      exitOn: text(rebuild.exitOn),
      exitCents: money(rebuild.exitCents),
    },
    words: { notes: text(rebuild.notes), lessons: text(rebuild.lessons) },
  };
}

export const factsSchema = (decimal: '.' | ',') =>
  z
    .object({
      tag: z.string(),
      year: optionalCount,
      make: optionalText,
      model: optionalText,
      trim: optionalText,
      vin: optionalText,
      classId: optionalPick,
      damageId: optionalPick,
      secondDamageId: optionalPick,
      isSeen: seenText,
      titleBrandBought: optionalText,
      titleBrandSold: optionalText,
      odometer: optionalCount,
      boughtFrom: optionalText,
      purchaseCents: optionalCentsTextSchema(decimal),
    })
    .transform(into(rebuildChangeSchema));

export const datesSchema = z.record(z.string(), optionalDay).transform(into(rebuildChangeSchema));

export const leavingSchema = (decimal: '.' | ',') =>
  z
    .object({
      askingCents: optionalCentsTextSchema(decimal),
      soldOn: optionalDay,
      saleCents: optionalCentsTextSchema(decimal),
      buyerChannel: optionalText,
      exitKind: optionalPick,
      exitOn: optionalDay,
      exitCents: optionalCentsTextSchema(decimal),
    })
    .transform(into(rebuildChangeSchema));

export const wordsSchema = z
  .object({ notes: optionalText, lessons: optionalText })
  .transform(into(rebuildChangeSchema));

/** Only what is different from the rebuild as it stands. */
export function changeOf(rebuild: Rebuild, body: z.output<typeof rebuildChangeSchema>): RebuildChange {
  return Object.fromEntries(Object.entries(body).filter(([name, value]) => value !== rebuild[name as keyof Rebuild]));
}
