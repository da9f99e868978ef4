import { describe, expect, it } from 'vitest';
import type { CheckKind, ChecksAnswer, Finding } from '#shared/contracts/checks.ts';
import { openSmallShop } from '../support/small-shop.ts';

// The faults of the small shop can be read off the table in support/small-shop.ts.

type Shop = Awaited<ReturnType<typeof openSmallShop>>;
const checksOf = async ({ ada }: Shop): Promise<ChecksAnswer> => (await ada.get('/api/checks')).body;
const finding = async (shop: Shop, kind: CheckKind): Promise<Finding | undefined> =>
  (await checksOf(shop)).findings.find((one) => one.kind === kind);
const tagsOf = (found: Finding | undefined) => found?.items.map(({ rebuild }) => rebuild?.tag);
const settle = ({ ada }: Shop, kind: CheckKind, key: string, isSettled = true) =>
  ada.request('put', '/api/checks/settled').send({ kind, key, isSettled });

describe('the data check', () => {
  it('names the rebuilds that an answer leaves out, and of how many', async () => {
    const shop = await openSmallShop();
    const { rebuildCount, finishedCount } = await checksOf(shop);
    expect({ rebuildCount, finishedCount }).toEqual({ rebuildCount: 6, finishedCount: 4 + 1 });
    expect(await finding(shop, 'no purchase price')).toMatchObject({
      grade: 'left out',
      answers: ['year', 'what-pays'],
      count: 1,
      among: 6,
      cents: null,
    });
    expect(tagsOf(await finding(shop, 'no estimate'))).toEqual(['S-6']);
    expect(tagsOf(await finding(shop, 'no own hours'))).toEqual(['S-6']);
    expect(tagsOf(await finding(shop, 'no listing day'))).toEqual(['S-6']);
    expect(await finding(shop, 'estimate written over')).toBeUndefined();
  });

  it('finds one bill booked twice, with the money that would be too much', async () => {
    const shop = await openSmallShop();
    const bill = { rebuildId: shop.ids.s1, datedOn: '2025-02-03', cents: 12_345, vendor: 'Larkfield', what: 'hood' };
    await shop.books.entry(bill);
    await shop.books.entry({ ...bill, what: 'hood hinges' });
    expect(await finding(shop, 'receipt twice')).toBeUndefined();
    const third = await shop.books.entry(bill);
    const found = await finding(shop, 'receipt twice');
    expect(found).toMatchObject({ grade: 'wrong', count: 1, cents: 12_345 });
    expect(found?.items[0]).toMatchObject({ rebuild: { tag: 'S-1' }, on: '2025-02-03', text: 'Larkfield hood' });
    expect(found?.items[0]?.entryIds).toHaveLength(2);
    await shop.books.voidEntry(third);
    expect(await finding(shop, 'receipt twice')).toBeUndefined();
  });

  it('finds a refund that was booked as a cost: it weighs twice', async () => {
    const shop = await openSmallShop();
    await shop.books.entry({ rebuildId: shop.ids.s2, cents: 4_000, what: 'Refund for wrong lamp' });
    await shop.books.entry({ rebuildId: shop.ids.s2, cents: -2_500, what: 'refund, core' });
    expect(await finding(shop, 'refund as cost')).toMatchObject({ count: 1, cents: 8_000 });
  });

  it('finds days that cannot be: before the purchase, to come, out of order, longer than a day of work', async () => {
    const shop = await openSmallShop();
    await shop.books.entry({ rebuildId: shop.ids.s3, cents: 100, datedOn: '2026-01-04' });
    await shop.books.hours({ rebuildId: shop.ids.s3, workedOn: '2026-02-02', seconds: 14 * 3600, isPaid: false });
    await shop.books.rebuild({ tag: 'S-7', boughtOn: '2026-03-01', listedOn: '2026-02-01' });
    expect(tagsOf(await finding(shop, 'entry before purchase'))).toEqual(['S-3']);
    expect(await finding(shop, 'day to come')).toMatchObject({ count: 2, cents: 7_000 + 9_999 });
    expect(tagsOf(await finding(shop, 'dates out of order'))).toEqual(['S-7']);
    // The small shop's hours are whole rebuilds on one day each; the fourth, of 10 hours, may be a day's work.
    expect((await finding(shop, 'long day'))?.items.map(({ text }) => text)).toContain('14 hours');
    expect((await finding(shop, 'long day'))?.items.map(({ text }) => text)).not.toContain('10 hours');
  });

  it('finds vehicle numbers that do not check, offers the likely one, and a number that stands twice', async () => {
    const shop = await openSmallShop();
    // 1HGCM82633A004352 is a number whose check digit fits (49 CFR 565.15): sum 311, 311 mod 11 = 3.
    await shop.books.rebuild({ tag: 'V-1', vin: '1HGCM82633A004352' });
    await shop.books.rebuild({ tag: 'V-2', vin: '1HGCM82633A0O4352' });
    await shop.books.rebuild({ tag: 'V-3', vin: '1hgcm82633a004352' });
    const number = await finding(shop, 'vehicle number');
    expect(tagsOf(number)).toEqual(['V-2']);
    expect(number?.items[0]?.text).toBe('1HGCM82633A0O4352, perhaps 1HGCM82633A004352');
    const twice = await finding(shop, 'vehicle twice');
    expect(tagsOf(twice)).toEqual(['V-3']);
    expect(twice?.items[0]?.text).toBe('1HGCM82633A004352, as on V-1');
  });

  it('says when most of the cost lies in categories that were never planned', async () => {
    const shop = await openSmallShop();
    expect(await finding(shop, 'thin estimate')).toBeUndefined();
    // S-3: 1,000 of planned parts; 200 of transport and 801 more were not.
    await shop.books.entry({
      rebuildId: shop.ids.s3,
      cents: 80_100,
      foreseen: 'foreseen',
      categoryId: shop.books.categoryId('transport'),
    });
    expect(tagsOf(await finding(shop, 'thin estimate'))).toEqual(['S-3']);
  });

  it('puts what may be wrong before what is left out, and that before what is unsure', async () => {
    const shop = await openSmallShop();
    await shop.books.entry({ rebuildId: shop.ids.s2, cents: 4_000, what: 'refund' });
    const grades = (await checksOf(shop)).findings.map(({ grade }) => grade);
    const order = ['wrong', 'left out', 'unsure'];
    expect(grades).toEqual([...grades].sort((a, b) => order.indexOf(a) - order.indexOf(b)));
    expect(new Set(grades).size).toBe(3);
  });
});

describe('saying that something is right', () => {
  it('takes it off the open ones, keeps it in sight, and can be taken back', async () => {
    const shop = await openSmallShop();
    const key = shop.ids.s6;
    expect((await settle(shop, 'no estimate', key)).status).toBe(200);
    expect((await settle(shop, 'no estimate', key)).status).toBe(200);
    const found = await finding(shop, 'no estimate');
    expect(found).toMatchObject({ count: 0, settledCount: 1 });
    expect(found?.items[0]).toMatchObject({ key, isSettled: true });
    await settle(shop, 'no estimate', key, false);
    expect(await finding(shop, 'no estimate')).toMatchObject({ count: 1, settledCount: 0 });
  });

  it('asks again about a doubled bill when it stands there a third time', async () => {
    const shop = await openSmallShop();
    const bill = { rebuildId: shop.ids.s1, datedOn: '2025-02-03', cents: 500, what: 'clips' };
    await shop.books.entry(bill);
    await shop.books.entry(bill);
    const [item] = (await finding(shop, 'receipt twice'))?.items ?? [];
    await settle(shop, 'receipt twice', item?.key ?? '');
    expect(await finding(shop, 'receipt twice')).toMatchObject({ count: 0, cents: null });
    await shop.books.entry(bill);
    expect(await finding(shop, 'receipt twice')).toMatchObject({ count: 1, cents: 1_000 });
  });

  it('refuses what does not stand there, and those who may not', async () => {
    const shop = await openSmallShop();
    expect((await settle(shop, 'no estimate', shop.ids.s1)).status).toBe(422);
    const stranger = await shop.api.owner('Bo Reed');
    expect((await stranger.get('/api/checks')).body.findings).toEqual([]);
    const reply = await stranger
      .request('put', '/api/checks/settled')
      .send({ kind: 'no estimate', key: shop.ids.s6, isSettled: true });
    expect(reply.status).toBe(422);
  });
});
