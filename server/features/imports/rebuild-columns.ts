import type { RebuildFound } from '#shared/contracts/import-reading.ts';
import { type Draft, newDraft } from './read/draft.ts';

type Words = ReadonlyMap<string, string>;

const TEXTS = {
  make: 'make',
  model: 'model',
  trim: 'trim',
  vin: 'vin',
  year: 'year',
  odometer: 'odometer',
  titleBrand: 'title_brand_bought',
  boughtFrom: 'bought_from',
  notes: 'notes',
  purchaseCents: 'purchase_cents',
  askingCents: 'asking_cents',
  saleCents: 'sale_cents',
} as const satisfies Partial<Record<keyof RebuildFound, string>>;

/** What a file says of a rebuild, as columns of its table. What it does not say is left out. */
export function rebuildColumns(found: RebuildFound, classes: Words, damages: Words): Map<string, string | number> {
  const columns = new Map<string, string | number>();
  for (const [field, column] of Object.entries(TEXTS) as [keyof typeof TEXTS, string][]) {
    const value = found[field];
    if (value !== null) columns.set(column, value);
  }
  if (found.isSeen !== null) columns.set('is_seen', found.isSeen ? 1 : 0);
  const word = (column: string, name: string | null, ids: Words) => {
    const id = name === null ? undefined : ids.get(name.toLowerCase());
    if (id !== undefined) columns.set(column, id);
  };
  word('class_id', found.className, classes);
  word('damage_id', found.damageName, damages);
  word('second_damage_id', found.secondDamageName, damages);
  for (const [field, day] of Object.entries(found.dates)) {
    columns.set(
      field.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`),
      day,
    );
  }
  return columns;
}

/** The columns of the facts that shall take the place of what the books hold. */
export function overwrittenColumns({ found, overwrites }: Draft, classes: Words, damages: Words): Set<string> {
  if (overwrites.size === 0) return new Set();
  const chosen = <T extends object>(facts: T) => Object.entries(facts).filter(([field]) => overwrites.has(field));
  const only = { ...newDraft('', null, 0).found, ...Object.fromEntries(chosen(found)) };
  return new Set(rebuildColumns({ ...only, dates: Object.fromEntries(chosen(found.dates)) }, classes, damages).keys());
}
