/** The words of the trade, once: the same on screen, in code and in SQL. */

/** Who a member of a shop is. */
export const ROLES = ['owner', 'bookkeeper', 'mechanic', 'partner', 'accountant'] as const;
export type Role = (typeof ROLES)[number];

/** Ways a rebuild leaves the shop other than by sale; each closes it on its exit date. */
export const OTHER_EXITS = ['parted out', 'scrapped', 'own use', 'resold as it stood', 'swapped', 'stolen'] as const;
export type OtherExit = (typeof OTHER_EXITS)[number];
/** Every way out of the shop. */
export const EXITS = ['sold', ...OTHER_EXITS] as const;
export type ExitKind = (typeof EXITS)[number];

/** Where a rebuild stands, read from its dates. */
export const STAGES = ['bought', 'in the shop', 'ready', 'listed', 'sold', ...OTHER_EXITS] as const;
export type Stage = (typeof STAGES)[number];

/** The ten marking dates in their usual order, with the word shown for each. */
export const REBUILD_DATES = [
  ['boughtOn', 'Bought'],
  ['paidOn', 'Paid'],
  ['pickedUpOn', 'Picked up'],
  ['startedOn', 'Started'],
  ['roadworthyOn', 'Roadworthy'],
  ['inspectedOn', 'Inspected'],
  ['titleIssuedOn', 'Title issued'],
  ['listedOn', 'Listed'],
  ['soldOn', 'Sold'],
  ['settledOn', 'Settled'],
] as const;
export type RebuildDate = (typeof REBUILD_DATES)[number][0];

/**
 * Was a cost foreseen when the estimate was locked? `null` beside these means that nobody said. A chosen extra
 * (scope added by choice) is marked apart, since it is neither an overrun nor a surprise.
 */
export const FORESEEN = ['foreseen', 'surprise'] as const;
export type Foreseen = (typeof FORESEEN)[number];

/** Contingency levels as fractions: 4/5 = holds four times in five. Never by way of a percentage. */
export const LEVELS = ['1/2', '2/3', '4/5', '9/10'] as const;
export type LevelName = (typeof LEVELS)[number];

/**
 * Ways to say what a rebuild pays: kept by own hour, by anybody's hour, what a wage for own hours leaves of it, and kept
 * for each dollar of cost.
 */
export const PAY_VIEWS = ['per-hour', 'all-hours', 'after-wage', 'on-cost'] as const;
export type PayView = (typeof PAY_VIEWS)[number];

/** Damage, as a shop starts out with it. A shop edits its own list. */
export const DEFAULT_DAMAGES = [
  'front',
  'rear',
  'side',
  'roof',
  'hail',
  'flood',
  'fire',
  'theft/vandalism',
  'mechanical',
] as const;

/** Vehicle classes, as a shop starts out with them. A shop edits its own list. */
export const DEFAULT_CLASSES = ['small car', 'midsize car', 'large car', 'sports', 'SUV', 'pickup', 'van'] as const;

/**
 * Cost categories, as a shop starts out with them. The purchase is a field of the rebuild, never an entry,
 * so it is not among them. `isPaidLabor` marks wages for hours on a rebuild (definitions §18.2).
 */
export const DEFAULT_CATEGORIES = [
  { name: 'auction fees' },
  { name: 'transport' },
  { name: 'parts' },
  { name: 'outside labor (sublet)' },
  { name: 'paint & body materials' },
  { name: 'restraints (SRS)' },
  { name: 'small systems' },
  { name: 'title & registration' },
  { name: 'inspection' },
  { name: 'insurance' },
  { name: 'supplies' },
  { name: 'detail' },
  { name: 'selling costs' },
  { name: 'tax' },
  { name: 'paid labor', isPaidLabor: true },
  { name: 'other' },
] as const satisfies readonly { name: string; isPaidLabor?: boolean }[];

/** What a person did with their hours. Offered, not enforced. */
export const TASKS = [
  'Teardown',
  'Body',
  'Mechanical',
  'Electrical',
  'Paint prep',
  'Assembly',
  'Running about',
] as const;
