import type { z } from 'zod';
import type { BidBasis, SheetPlace } from '#shared/contracts/bids-basis.ts';
import type { Bid, buySchema } from '#shared/contracts/bids.ts';
import { type EstimateFields, estimateFieldsSchema } from '#shared/contracts/estimates.ts';
import type { Day } from '#shared/day.ts';
import { bidFee, bidTax } from '#shared/measures/walk-away-bid.ts';
import { bidStore } from '../../books/bid-sheets.ts';
import type { Books } from '../../books/books.ts';
import { impossible } from '../../platform/problems.ts';

type Purchase = z.output<typeof buySchema>;

/** Under what the estimate's lines go, and the day on which it is made. */
export interface Buying {
  readonly version: number;
  readonly categories: BidBasis['categories'];
  readonly today: Day;
}

/**
 * The sheet becomes a rebuild with its facts, and its estimate is locked from the sheet: all of it in the write's one
 * transaction, or nothing.
 */
export async function buyBid(books: Books, bid: Bid, purchase: Purchase, buying: Buying): Promise<Bid> {
  if (bid.state !== 'open') throw impossible('', 'This sheet is closed. Open it again to buy from it.');
  const plan = estimateFields(bid, purchase, buying);
  const rebuild = await books.rebuilds.create(rebuildFields(bid, purchase));
  const estimate = await books.estimates.create(rebuild.id, plan, buying.today);
  await books.estimates.lock(estimate.id, estimate.version);
  return bidStore(books.scope).setOutcome(bid.id, buying.version, {
    state: 'bought',
    reason: null,
    bidMadeCents: bid.bidMadeCents,
    hammerCents: purchase.hammerCents,
    rebuildId: rebuild.id,
  });
}

function rebuildFields(bid: Bid, { tag, boughtOn, hammerCents }: Purchase) {
  const { year, make, model, vin, odometer, classId, damageId, secondDamageId, isSeen, notes } = bid;
  const car = { year, make, model, vin, odometer, classId, damageId, secondDamageId, isSeen, notes };
  return {
    ...car,
    tag,
    boughtOn,
    purchaseCents: hammerCents,
    titleBrandBought: bid.titleBrand,
    boughtFrom: bid.seller,
  };
}

/** What goes together on a sheet field by field may be too much for one estimate. */
function estimateFields(bid: Bid, { hammerCents }: Purchase, { categories }: Buying): EstimateFields {
  const { success, data } = estimateFieldsSchema.safeParse({
    lines: estimateLines(bid, hammerCents, categories),
    plannedSeconds: bid.ownSeconds + bid.paidSeconds,
    expectedSaleCents: bid.expectedSaleCents,
    expectedDays: bid.days,
    note: `From the pre-bid sheet of ${bid.madeOn}: ${bid.name}`,
  });
  if (!success) throw impossible('', 'The sheet plans for more than an estimate can hold.');
  return data;
}

/**
 * The plan of the sheet, and beside it what the sheet asked for in fields of its own, each at the first category of that
 * kind: it will be booked there, and would look like an overrun if nobody had planned it. Fee and tax are those of the
 * price paid.
 */
export function estimateLines(bid: Bid, hammerCents: number, categories: Buying['categories']): Bid['lines'] {
  const own: Record<SheetPlace, number> = {
    fee: bidFee(hammerCents, bid),
    tax: bidTax(hammerCents, bid.tax),
    transport: bid.transportCents,
    title: bid.titleCents,
    selling: bid.sellingCents,
    holding: bid.days * bid.holdingCentsPerDay,
    'paid labor': bid.paidLaborCents,
  };
  const planned = new Map(bid.lines.map(({ categoryId, cents }) => [categoryId, cents]));
  for (const [place, cents] of Object.entries(own)) {
    const category = categories.find((one) => one.place === place && !one.isRetired);
    if (category && cents > 0) planned.set(category.id, (planned.get(category.id) ?? 0) + cents);
  }
  return [...planned].map(([categoryId, cents]) => ({ categoryId, cents }));
}
