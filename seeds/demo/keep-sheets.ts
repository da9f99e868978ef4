import { bidFigures } from '#shared/measures/bid-sheet.ts';
import { feeTableStore } from '../../server/books/bid-fees.ts';
import { type BidOutcome, bidStore } from '../../server/books/bid-sheets.ts';
import { shopScope } from '../../server/books/scope.ts';
import { commit } from '../../server/books/write.ts';
import { basisNow } from '../../server/features/bids/read-model.ts';
import type { Services } from '../../server/platform/http.ts';
import { boughtSheet } from './bought-sheet.ts';
import { LOOKED, lookedSheet } from './looked-at.ts';
import type { DemoShop } from './open-demo-shop.ts';
import { FEE_FLAT, FEE_STEPS } from './parameters.ts';

/** What a purchase costs the yard besides the bid. */
const FEES = {
  feeSteps: FEE_STEPS.map(([from, fee]): [number, number] => [from * 100, fee * 100]),
  feeFlatCents: FEE_FLAT * 100,
  bidStepCents: 5_000,
  tax: { p: 0, q: 1 },
  transportCents: 43_000,
  titleCents: 18_000,
  sellingCents: 11_000,
  holdingCentsPerDay: 500,
  wantedProfitCents: 50_000,
};

/** Were sheets kept, by the seed or by a visitor? */
export async function areSheetsKept({ database }: Services, { shopId }: DemoShop): Promise<boolean> {
  return (await database.reader('bid_sheets').where({ shop_id: shopId }).first('id')) !== undefined;
}

/**
 * Sets the fee table, and keeps four sheets: one bought, two left to others, one still open. Each comes to what it would
 * have on its day, but for what was booked since.
 */
export async function keepSheets(services: Services, shop: DemoShop): Promise<void> {
  await setFees(services, shop);
  const { database } = services;
  const feeTable = await feeTableStore(shopScope(database.reader, shop.shopId)).get();
  const bought = await boughtSheet(shopScope(database.reader, shop.shopId), FEES);
  const looked = LOOKED.map((one) => ({ ...one, fill: lookedSheet.bind(null, one, FEES) }));
  for (const { on, fill, outcome } of [bought, ...looked]) {
    const basis = await basisNow(database, { shopId: shop.shopId, today: on, feeTable });
    const fields = fill(basis);
    const sheet = { fields, figures: bidFigures(fields, basis), booksVersion: basis.booksVersion };
    await commit(database, commission(shop, 'keep sheet'), async ({ scope }) => {
      const bids = bidStore(scope);
      const bid = await bids.create(sheet, { madeOn: on, madeBy: shop.ownerId });
      const after = outcome.state ? await bids.setOutcome(bid.id, bid.version, { ...OPEN, ...outcome }) : bid;
      return { id: bid.id, before: null, after, reply: null };
    });
  }
}

const OPEN: BidOutcome = { state: 'open', reason: null, bidMadeCents: null, hammerCents: null, rebuildId: null };

async function setFees({ database }: Services, shop: DemoShop): Promise<void> {
  await commit(database, commission(shop, 'change fee table'), async ({ scope }) => {
    const fees = feeTableStore(scope);
    const before = await fees.get();
    return { id: shop.shopId, before, after: await fees.replace(before.version, FEES), reply: null };
  });
}

function commission({ shopId, ownerId: userId, requestId }: DemoShop, action: string) {
  return { shopId, userId, requestId, action, subject: 'bid', once: null, toJson: JSON.stringify };
}
