import { type Member, testApi } from './api.ts';
import { booksOf } from './books.ts';

/**
 * Six rebuilds with numbers that can be worked out by hand; tests run on 15 June 2026. In dollars:
 *
 * | tag | kind       | bought for   | out                          | parts          | plan | own h | kept   |
 * | S-1 | SUV hail   | 5,000 seen   | sold 17 Mar 2025, 10,000     | 2,000          | 2,000 | 50   | 3,000  |
 * | S-2 | SUV hail   | 4,000 unseen | sold 10 Jul 2025, 7,000      | 1,500 + 500 s. | 1,000 | 100  | 1,000  |
 * | S-3 | pickup fr. | 6,000 seen   | sold 12 Apr 2026, 9,500      | 900 + 100 late |   800 | 46   | 2,300  |
 * |     |            |              |   and 200 of transport       |                |       |      |        |
 * | S-4 | pickup fr. | 3,000 unseen | scrapped 1 May 2026, 1,000   | 500 s.         | 1,000 | 10   | −2,500 |
 * | S-5 | small car  | 2,000        | listed 1 Jun 2026            | 300 + 50 (+ 70 after today) |       |        |
 * | S-6 | (nothing)  | not known    | sold 20 May 2026, 5,000      |                |       |      |        |
 *
 * s. = surprise. Overhead: 400 on 1 Mar 2025, 600 on 15 Jan 2026, 99.99 after today. Wanted pay: 25 an hour.
 */
export async function smallShop(owner: Member) {
  const books = await booksOf(owner);
  await owner.patch('/api/shop', 1, { wantedCentsPerHour: 2500 });
  const suv = { classId: books.classId('SUV'), damageId: books.damageId('hail') };
  const pickup = { classId: books.classId('pickup'), damageId: books.damageId('front') };
  const days = (boughtOn: string, listedOn: string | null) => ({ boughtOn, listedOn });
  const s1 = await books.rebuild({
    tag: 'S-1',
    ...suv,
    isSeen: true,
    purchaseCents: 500_000,
    ...days('2025-01-10', '2025-02-15'),
    pickedUpOn: '2025-01-12',
    startedOn: '2025-01-20',
    roadworthyOn: '2025-02-10',
    soldOn: '2025-03-17',
    saleCents: 1_000_000,
  });
  const s2 = await books.rebuild({
    tag: 'S-2',
    ...suv,
    isSeen: false,
    purchaseCents: 400_000,
    ...days('2025-05-01', '2025-06-10'),
    soldOn: '2025-07-10',
    saleCents: 700_000,
  });
  const s3 = await books.rebuild({
    tag: 'S-3',
    ...pickup,
    isSeen: true,
    purchaseCents: 600_000,
    ...days('2026-01-05', '2026-02-01'),
    soldOn: '2026-04-12',
    saleCents: 950_000,
  });
  const s4 = await books.rebuild({
    tag: 'S-4',
    ...pickup,
    isSeen: false,
    purchaseCents: 300_000,
    ...days('2026-02-01', null),
    exitKind: 'scrapped',
    exitOn: '2026-05-01',
    exitCents: 100_000,
  });
  const s5 = await books.rebuild({
    tag: 'S-5',
    classId: books.classId('small car'),
    purchaseCents: 200_000,
    ...days('2026-03-01', '2026-06-01'),
  });
  const s6 = await books.rebuild({ tag: 'S-6', soldOn: '2026-05-20', saleCents: 500_000 });

  const lock = async (rebuildId: string, cents: number, hours: number) =>
    books.lock(await books.plan(rebuildId, { parts: cents }, { plannedSeconds: hours * 3600 }));
  await lock(s1.id, 200_000, 40);
  await lock(s2.id, 100_000, 100);
  await lock(s3.id, 80_000, 40);
  await lock(s4.id, 100_000, 20);

  const paid = (rebuildId: string | null, datedOn: string, cents: number, more: object = {}) =>
    books.entry({ rebuildId, datedOn, cents, foreseen: 'foreseen', ...more });
  await paid(s1.id, '2025-01-25', 200_000);
  await paid(s2.id, '2025-05-10', 150_000);
  await paid(s2.id, '2025-05-20', 50_000, { foreseen: 'surprise' });
  await paid(s3.id, '2026-01-20', 90_000);
  await paid(s3.id, '2026-01-06', 20_000, { categoryId: books.categoryId('transport') });
  await paid(s3.id, '2026-04-20', 10_000);
  await paid(s4.id, '2026-02-20', 50_000, { foreseen: 'surprise' });
  await paid(s5.id, '2026-04-01', 30_000);
  await paid(s5.id, '2026-06-10', 5_000);
  await paid(s5.id, '2026-06-20', 7_000);
  await paid(null, '2025-03-01', 40_000);
  await paid(null, '2026-01-15', 60_000);
  await paid(null, '2026-07-01', 9_999);

  const worked = (rebuildId: string, workedOn: string, hours: number) =>
    books.hours({ rebuildId, workedOn, seconds: hours * 3600, isPaid: false });
  await worked(s1.id, '2025-02-01', 50);
  await worked(s2.id, '2025-06-01', 100);
  await worked(s3.id, '2026-02-01', 46);
  await worked(s4.id, '2026-02-10', 10);
  return { books, ids: { s1: s1.id, s2: s2.id, s3: s3.id, s4: s4.id, s5: s5.id, s6: s6.id } };
}

/** A server with the small shop in it, and a way to ask for an answer. */
export async function openSmallShop() {
  const api = await testApi();
  const ada = await api.owner();
  const shop = await smallShop(ada);
  const ask = async <T>(question: string): Promise<T> => (await ada.get(`/api/answers/${question}`)).body as T;
  return { api, ada, ...shop, ask };
}

/** What an answer leaves out: reason and tags. */
export function outOf({ leftOut }: { leftOut: { reason: string; rebuilds: { tag: string }[] }[] }) {
  return Object.fromEntries(leftOut.map(({ reason, rebuilds }) => [reason, rebuilds.map(({ tag }) => tag)]));
}
