/** What one row of the file holds; a vehicle sheet is about one vehicle, or several one below the other. */
export const SHAPES = ['expenses', 'vehicles', 'hours', 'vehicle sheet'] as const;
export type Shape = (typeof SHAPES)[number];

/** How a row of the file ended; every row ends as exactly one of these. */
export const OUTCOMES = ['taken', 'put aside', 'not data'] as const;
export type Outcome = (typeof OUTCOMES)[number];

/** Why a row or a cell was put aside. */
export const ASIDE_REASONS = [
  'bad-date',
  'bad-amount',
  'missing-amount',
  'ambiguous-amount',
  'bad-hours',
  'missing-vehicle',
  'ambiguous-vehicle',
  'duplicate',
  'malformed-row',
  'cell-too-long',
  'currency',
  'not-a-data-row',
  'bad-value',
] as const;
export type AsideReason = (typeof ASIDE_REASONS)[number];

/** Why a whole file is refused. */
export const REFUSALS = [
  'empty',
  'not-text',
  'unclosed-quote',
  'cell-too-long',
  'too-wide',
  'currency',
  'shape',
  'locked',
  'damaged',
  'too-large',
] as const;
export type RefusalKind = (typeof REFUSALS)[number];

/** What a file may leave open. */
export const CHOICE_KINDS = [
  'date-order',
  'columns',
  'vehicle',
  'category',
  'duplicate',
  'amount-column',
  'sheets',
  'overlap',
  'own-labor',
  'sale',
  'changed-row',
] as const;
export type ChoiceKind = (typeof CHOICE_KINDS)[number];

/** What may be worth knowing about a place in a file. */
export const HINTS = ['comment', 'hidden row', 'hidden column', 'formula without a value', 'link'] as const;

/**
 * Kinds of row that hold nothing for the books. `carried`: a balance brought over from another sheet; `already in`: it
 * came with an earlier import; `left out`: a person said so.
 */
export const NOT_DATA = ['blank', 'title', 'heading', 'total', 'note', 'carried', 'already in', 'left out'] as const;
export type NotData = (typeof NOT_DATA)[number];
