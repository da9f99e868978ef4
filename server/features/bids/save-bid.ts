import type { z } from 'zod';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import {
  type Bid,
  type BidFields,
  bidFieldsSchema,
  type outcomeSchema,
  type shownSchema,
} from '#shared/contracts/bids.ts';
import { bidFiguresSchema } from '#shared/contracts/bids-parts.ts';
import { bidFigures } from '#shared/measures/bid-sheet.ts';
import { type BidStore, bidStore, type WorkedSheet } from '../../books/bid-sheets.ts';
import type { Books } from '../../books/books.ts';
import { type Reference, refuseStrangers } from '../../books/references.ts';
import { impossible } from '../../platform/problems.ts';
import { type Patch, patched } from '../../platform/rows.ts';

type Shown = z.output<typeof shownSchema> | undefined;

export interface Kept {
  readonly bid: Bid;
  /** Did the browser show what came out here? null = it did not say. */
  readonly agrees: boolean | null;
}

/** What is sent with a sheet, and what it is worked out from and by whom. */
export interface Saving {
  readonly basis: BidBasis;
  readonly shown: Shown;
}

/** Keeps a sheet with the figures that come out here; what the browser showed is only compared. */
export async function createBid(
  books: Books,
  fields: BidFields,
  { basis, shown, userId }: Saving & { readonly userId: string },
): Promise<Kept> {
  await refuseUnknownWords(books, fields);
  const sheet = workedOut(fields, basis);
  const bid = await bidStore(books.scope).create(sheet, { madeOn: basis.asOf, madeBy: userId });
  return { bid, agrees: agreement(sheet, shown) };
}

export async function changeBid(
  books: Books,
  before: Bid,
  change: Patch<BidFields>,
  { basis, shown, version }: Saving & { readonly version: number },
): Promise<Kept> {
  if (before.state !== 'open') throw impossible('', 'This sheet is closed. Open it again to change it.');
  await refuseUnknownWords(books, change);
  const sheet = workedOut(patched<BidFields>(before, change), basis);
  const bid = await bidStore(books.scope).update(before.id, version, sheet);
  return { bid, agrees: agreement(sheet, shown) };
}

/** Not bought, with its reason; or open again. A bought sheet stays bought. */
export function setOutcome(
  bids: BidStore,
  before: Bid,
  version: number,
  outcome: z.output<typeof outcomeSchema>,
): Promise<Bid> {
  if (before.state === 'bought')
    throw impossible('/state', 'It was bought: what becomes of it stands with its rebuild.');
  const reason = outcome.state === 'open' ? null : outcome.reason;
  return bids.setOutcome(before.id, version, { ...outcome, reason, rebuildId: null });
}

function workedOut(sheet: BidFields, basis: BidBasis): WorkedSheet {
  // A kept sheet carries its state and figures too.
  const fields = bidFieldsSchema.strip().parse(sheet);
  // Beyond what a number holds exactly, nothing is worked out.
  const { success, data: figures } = bidFiguresSchema.safeParse(bidFigures(fields, basis));
  if (!success) throw impossible('', 'These amounts are too large to work out a bid.');
  return { fields, figures, booksVersion: basis.booksVersion };
}

function agreement({ figures }: WorkedSheet, shown: Shown): boolean | null {
  if (shown === undefined) return null;
  const { repairBudgetCents, roomCents, bidCents } = shown;
  return (
    figures.repairBudgetCents === repairBudgetCents && figures.roomCents === roomCents && figures.bidCents === bidCents
  );
}

async function refuseUnknownWords({ scope }: Books, fields: Patch<BidFields>): Promise<void> {
  const named: Reference[] = [
    { pointer: '/classId', table: 'vehicle_classes', id: fields.classId },
    { pointer: '/damageId', table: 'damage_types', id: fields.damageId },
    { pointer: '/secondDamageId', table: 'damage_types', id: fields.secondDamageId },
  ];
  const lines = (fields.lines ?? []).map(
    ({ categoryId: id }, i): Reference => ({ pointer: `/lines/${i}/categoryId`, table: 'categories', id }),
  );
  await refuseStrangers(scope, [...named, ...lines]);
}
