import { describe, expect, it } from 'vitest';
import { readShopFacts, type ShopFacts } from '../../server/books/shop-facts.ts';
import { rawHandle } from '../../server/platform/database.ts';
import { openSmallShop } from '../support/small-shop.ts';

/** Facts whole, categories and estimates opened, without the order of their rebuilds, which means nothing. */
const inOrder = (facts: ShopFacts) => ({
  ...facts,
  rebuilds: facts.rebuilds
    .toSorted((a, b) => (a.id < b.id ? -1 : 1))
    .map((rebuild) => ({ ...rebuild, categories: rebuild.categories, estimates: rebuild.estimates })),
});

describe('the facts of a shop', () => {
  it('are the same patched after each write as read anew', async () => {
    const { api, ada, books, ids } = await openSmallShop();
    const raw = await rawHandle(api.services.database.reader);
    let earlier = readShopFacts(raw, ada.shopId);
    const check = () => {
      const patched = readShopFacts(raw, ada.shopId, earlier);
      expect(inOrder(patched)).toEqual(inOrder(readShopFacts(raw, ada.shopId)));
      expect(patched.booksVersion).toBeGreaterThan(earlier.booksVersion);
      earlier = patched;
    };
    const entry = await books.entry({ rebuildId: ids.s3, cents: 12_345, foreseen: null });
    check();
    await books.voidEntry(entry);
    check();
    const added = await books.rebuild({ tag: 'S-7', purchaseCents: 1 });
    check();
    await books.lock(await books.plan(added.id, { parts: 5_000 }));
    check();
    await books.hours({ rebuildId: added.id, seconds: 3_600, isPaid: true });
    await ada.patch(`/api/rebuilds/${added.id}`, added.version, { soldOn: '2026-06-01', saleCents: 9_000 });
    check();
    const parts = books.lists.categories.find(({ name }) => name === 'parts');
    await ada.patch(`/api/shop/lists/categories/${parts?.id}`, parts?.version ?? 0, { name: 'pieces' });
    check();
    expect(earlier.rebuilds.some(({ categories }) => categories.has('parts'))).toBe(false);
    await books.entry({ rebuildId: null, cents: 777, categoryId: books.categoryId('other') });
    check();
  });

  it('reads again only what a write touched', async () => {
    const { api, ada, books, ids } = await openSmallShop();
    const raw = await rawHandle(api.services.database.reader);
    const before = readShopFacts(raw, ada.shopId);
    await books.entry({ rebuildId: ids.s3, cents: 1_000 });
    const after = readShopFacts(raw, ada.shopId, before);
    const changed = after.rebuilds.filter((one) => !before.rebuilds.includes(one));
    expect(changed.map(({ tag }) => tag)).toEqual(['S-3']);
  });
});
