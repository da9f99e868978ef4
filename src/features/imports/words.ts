import type { Hint } from '#shared/contracts/import-beside.ts';
import type { Column, Line, Meaning } from '#shared/contracts/import-reading.ts';
import type { AsideReason, NotData, Outcome, Shape } from '#shared/contracts/import-words.ts';
import type { ImportState } from '#shared/contracts/imports.ts';
import { REBUILD_DATES } from '#shared/vocabulary.ts';

/** What a column may hold, in words, in the order in which it is offered. */
export const MEANING_WORDS: Readonly<Record<Meaning, string>> = {
  ignore: 'Nothing we need',
  derived: 'A sum of other columns',
  date: 'Date',
  vehicle: 'Vehicle, typed freely',
  'stock number': 'Stock number or tag',
  category: 'Kind of cost',
  what: 'What it was',
  vendor: 'Vendor',
  foreseen: 'Foreseen or not',
  amount: 'Amount',
  credit: 'Money back, or the sale',
  year: 'Model year',
  make: 'Make',
  model: 'Model',
  trim: 'Trim',
  vin: 'VIN',
  class: 'Class',
  damage: 'Damage',
  'second damage': 'Second damage',
  'title brand': 'Title brand',
  odometer: 'Odometer',
  seen: 'Seen before buying',
  'bought from': 'Where bought',
  notes: 'Notes',
  ...(Object.fromEntries(REBUILD_DATES.map(([field, word]) => [field, `${word} on`])) as Record<
    (typeof REBUILD_DATES)[number][0],
    string
  >),
  purchase: 'Purchase price',
  cost: 'Cost of one kind',
  estimate: 'Planned cost of one kind',
  hours: 'Hours',
  'estimated hours': 'Planned hours',
  sale: 'Sale price',
  asking: 'Asking price',
  'expected sale': 'Expected sale price',
  person: 'Person',
  task: 'Task',
};

export const ASIDE_WORDS: Readonly<Record<AsideReason, string>> = {
  'bad-date': 'No day that exists',
  'bad-amount': 'Not readable as an amount',
  'missing-amount': 'No amount',
  'ambiguous-amount': 'Only roughly an amount',
  'bad-hours': 'Not readable as hours',
  'missing-vehicle': 'Names no vehicle',
  'ambiguous-vehicle': 'May be more than one vehicle',
  duplicate: 'Stands there twice, or in the books already',
  'malformed-row': 'Quotation marks are broken',
  'cell-too-long': 'Too long a text',
  currency: 'Another currency',
  'not-a-data-row': 'Figures above the headings',
  'bad-value': 'Not a word of yours',
};

export const NOT_DATA_WORDS: Readonly<Record<NotData, string>> = {
  blank: 'blank',
  title: 'title',
  heading: 'heading',
  total: 'total',
  note: 'note',
  carried: 'brought over from another sheet',
  'already in': 'came in before',
  'left out': 'left out by you',
};

export const STATE_WORDS: Readonly<Record<ImportState, string>> = {
  reading: 'Being read',
  ready: 'Read; have a look and book it',
  committing: 'Being booked',
  committed: 'In the books',
  undone: 'Taken out again',
  refused: 'Cannot be read',
  discarded: 'Dropped',
};

/** Why a row ended as it did, in words. */
export function reasonWords(reason: string | null): string {
  if (reason === null) return '';
  return ASIDE_WORDS[reason as AsideReason] ?? NOT_DATA_WORDS[reason as NotData] ?? reason;
}

/** What a column is taken for, with the kind of cost that goes with it. */
export const meaningWords = ({ meaning, category }: Pick<Column, 'meaning' | 'category'>) =>
  `${MEANING_WORDS[meaning]}${category ? `: ${category}` : ''}`;

export const OUTCOME_WORDS: Readonly<Record<Outcome, string>> = {
  taken: 'Comes in',
  'put aside': 'Put aside',
  'not data': 'No data',
};

export const SHAPE_WORDS: Readonly<Record<Shape, string>> = {
  expenses: 'one cost per row',
  vehicles: 'one vehicle per row',
  hours: 'hours worked',
  'vehicle sheet': 'one sheet per vehicle',
};

export const HINT_WORDS: Readonly<Record<Hint['kind'], string>> = {
  comment: 'Comment',
  'hidden row': 'Hidden row',
  'hidden column': 'Hidden column',
  'formula without a value': 'Formula without a value',
  link: 'Link to another file',
};

/** What kind of figure was read; a cost is named by its category alone. */
export const LINE_WORDS: Readonly<Record<Line['kind'], string>> = {
  entry: '',
  purchase: 'Purchase',
  sale: 'Sale',
  asking: 'Asking price',
  'expected sale': 'Expected sale',
  estimate: 'Planned',
  hours: 'Hours',
  'estimated hours': 'Planned hours',
};
