import type { Bid, BidFields } from '#shared/contracts/bids.ts';
import type { Member } from './api.ts';
import { buildSheet } from './bid-sheet.ts';
import { openSmallShop } from './small-shop.ts';

/** The small shop, a sheet for a car of its own words, and a way to keep one. */
export async function openBidShop() {
  const small = await openSmallShop();
  const { ada, books } = small;
  const sheet = (fields: Partial<BidFields> = {}) =>
    buildSheet({
      classId: books.classId('SUV'),
      damageId: books.damageId('front'),
      lines: [{ categoryId: books.categoryId('parts'), cents: 210_000 }],
      ...fields,
    });
  const keep = async (fields: Partial<BidFields> = {}): Promise<Bid> =>
    (await ada.post('/api/bids', sheet(fields))).body.bid;
  return { ...small, sheet, keep };
}

/** A post that edits: with the version it was made on. */
export function edit(
  member: Member,
  url: string,
  version: number,
  body: object,
  key = `key-${url}-${version}`.slice(-60),
) {
  return member.request('post', url).set('If-Match', `"${version}"`).set('Idempotency-Key', key).send(body);
}
