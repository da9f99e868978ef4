import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Books } from '../../server/books/books.ts';
import { rebuildRollup } from '../../server/books/rollup.ts';
import { commit } from '../../server/books/write.ts';
import { rawHandle } from '../../server/platform/database.ts';
import { differences, kept, recount } from '../check/recount.ts';
import { testApi } from '../support/api.ts';

const REBUILDS = 3;
const day = fc.constantFrom('2026-01-05', '2026-01-20', '2026-02-01', '2026-03-15', '2026-04-30');
const place = fc.nat(REBUILDS - 1);
const cents = fc.integer({ min: -50_000, max: 200_000 });
const entry = fc.record({
  datedOn: fc.option(day),
  cents,
  foreseen: fc.option(fc.constantFrom('foreseen' as const, 'surprise' as const)),
  isExtra: fc.boolean(),
});

/** One write, its target named by a number that is taken modulo what is there. */
const step = fc.oneof(
  { weight: 4, arbitrary: fc.record({ do: fc.constant('add'), at: fc.option(place), category: fc.nat(2), entry }) },
  { weight: 1, arbitrary: fc.record({ do: fc.constant('free'), at: place, cents: fc.nat(90_000), entry }) },
  {
    weight: 1,
    arbitrary: fc.record({
      do: fc.constant('split'),
      weights: fc.array(fc.nat(5), { minLength: REBUILDS, maxLength: REBUILDS }),
      entry,
    }),
  },
  { weight: 2, arbitrary: fc.record({ do: fc.constant('move'), which: fc.nat(), at: fc.option(place), datedOn: day }) },
  { weight: 2, arbitrary: fc.record({ do: fc.constant('change'), which: fc.nat(), entry }) },
  { weight: 2, arbitrary: fc.record({ do: fc.constant('void'), which: fc.nat() }) },
  {
    weight: 2,
    arbitrary: fc.record({ do: fc.constant('sell'), at: place, on: fc.option(day), cents: fc.nat(900_000) }),
  },
  {
    weight: 1,
    arbitrary: fc.record({
      do: fc.constant('bought'),
      at: place,
      on: fc.option(day),
      cents: fc.option(fc.nat(500_000)),
    }),
  },
  {
    weight: 2,
    arbitrary: fc.record({
      do: fc.constant('hours'),
      at: place,
      seconds: fc.nat(90_000),
      isPaid: fc.boolean(),
      on: fc.option(day),
    }),
  },
  { weight: 1, arbitrary: fc.record({ do: fc.constant('void hours'), which: fc.nat() }) },
);
type Step = typeof step extends fc.Arbitrary<infer T> ? T : never;

type NewEntry = typeof entry extends fc.Arbitrary<infer T> ? T : never;

interface Row {
  readonly id: string;
  readonly version: number;
  readonly split_id: string | null;
  readonly free_value_cents: number | null;
}

interface Known {
  readonly rebuilds: readonly string[];
  readonly categories: readonly string[];
}

const at = <T>(list: readonly T[], n: number): T => list[n % list.length] as T;

/** Does one write through the stores; one that has nothing to act on does nothing. */
async function take(books: Books, known: Known, one: Step): Promise<void> {
  const { scope, entries, hours, rebuilds } = books;
  const place = 'at' in one && one.at != null ? at(known.rebuilds, one.at) : null;
  const live = async (table: string) => (await scope.table(table).whereNull('voided_at').orderBy('id')) as Row[];
  switch (one.do) {
    case 'add': {
      const datedOn = one.entry.datedOn ?? (place ? null : '2026-02-02');
      await entries.create({ ...one.entry, datedOn, rebuildId: place, categoryId: at(known.categories, one.category) });
      return;
    }
    case 'free':
      await entries.create({
        ...one.entry,
        cents: 0,
        freeValueCents: one.cents,
        rebuildId: place,
        categoryId: at(known.categories, 0),
      });
      return;
    case 'split': {
      const shares = one.weights.map((weight, i) => ({ rebuildId: at(known.rebuilds, i), weight }));
      await entries.createSplit({ ...one.entry, categoryId: at(known.categories, 1) }, shares);
      return;
    }
    case 'hours':
      await hours.create({ rebuildId: place ?? '', seconds: one.seconds, isPaid: one.isPaid, workedOn: one.on });
      return;
    case 'sell':
    case 'bought': {
      const { version } = await rebuilds.get(place ?? '');
      const sale = { soldOn: one.on, saleCents: one.on === null ? null : one.cents };
      await rebuilds.update(
        place ?? '',
        version,
        one.do === 'sell' ? sale : { boughtOn: one.on, purchaseCents: one.cents },
      );
      return;
    }
    case 'void hours': {
      const row = at(await live('hours'), one.which);
      if (row) await hours.void(row.id, row.version, 'not worked');
      return;
    }
    case 'void':
    case 'move':
    case 'change': {
      const row = at(await live('entries'), one.which);
      if (!row) return;
      if (one.do === 'void') await entries.void(row.id, row.version, 'not bought');
      else if (one.do === 'move') await entries.update(row.id, row.version, { rebuildId: place, datedOn: one.datedOn });
      else await entries.update(row.id, row.version, changeOf(one.entry, row));
    }
  }
}

/** A share and a free thing keep their cents; a day is never taken away, since overhead needs one. */
function changeOf({ datedOn, cents, ...rest }: NewEntry, row: Row) {
  const mayCost = row.split_id === null && row.free_value_cents === null;
  return { ...rest, ...(datedOn ? { datedOn } : {}), ...(mayCost ? { cents } : {}) };
}

async function shop() {
  const api = await testApi();
  const { shopId } = await api.owner();
  const { database } = api.services;
  const commission = {
    shopId,
    userId: null,
    requestId: 'test',
    once: null,
    action: 'test',
    subject: 'test',
    toJson: () => '{}',
  };
  const write = (change: (books: Books) => Promise<unknown>) =>
    commit(database, commission, async (books) => ({
      id: null,
      before: null,
      after: null,
      reply: await change(books),
    }));
  const raw = await rawHandle(database.writer);
  const categories = (raw.prepare('SELECT id FROM categories WHERE shop_id = ?').pluck().all(shopId) as string[]).slice(
    0,
    3,
  );
  const newRebuilds = async () => {
    const made: string[] = [];
    await write(async (books) => {
      for (let i = 0; i < REBUILDS; i += 1) {
        const { id } = await books.rebuilds.create({
          tag: crypto.randomUUID(),
          boughtOn: '2026-01-01',
          purchaseCents: 90_000,
        });
        made.push(id);
      }
    });
    return made;
  };
  return { write, raw, shopId, categories, newRebuilds, database };
}

describe('the kept sums', () => {
  it('equal a recount from the entries after any sequence of writes', async () => {
    const { write, raw, shopId, categories, newRebuilds } = await shop();
    await fc.assert(
      fc.asyncProperty(fc.array(step, { minLength: 1, maxLength: 25 }), async (steps) => {
        const known = { rebuilds: await newRebuilds(), categories };
        for (const one of steps) await write((books) => take(books, known, one));
        expect(differences(recount(raw, shopId), kept(raw, shopId))).toEqual([]);
      }),
      { numRuns: 40 },
    );
  }, 60_000);

  it('come out the same when all are made anew', async () => {
    const { write, raw, shopId, categories, newRebuilds } = await shop();
    const known = { rebuilds: await newRebuilds(), categories };
    for (const one of fc.sample(step, { numRuns: 60, seed: 7 })) await write((books) => take(books, known, one));
    const before = kept(raw, shopId);
    expect(before.size).toBeGreaterThan(10);
    rebuildRollup(raw, shopId);
    expect(differences(before, kept(raw, shopId))).toEqual([]);
  });

  it('are shown to be wrong when one of them is', async () => {
    const { write, raw, shopId, categories, newRebuilds } = await shop();
    const [rebuildId = ''] = await newRebuilds();
    await write((books) =>
      books.entries.create({ rebuildId, categoryId: at(categories, 0), cents: 500, datedOn: '2026-01-05' }),
    );
    raw.prepare('UPDATE rollup_months SET paid_cents = paid_cents + 1 WHERE shop_id = ?').run(shopId);
    expect(differences(recount(raw, shopId), kept(raw, shopId))).toEqual([
      `month/${rebuildId}/2026-01: counted [500], kept [501]`,
    ]);
  });

  it('are not touched by a write that fails: nothing of it stays', async () => {
    const { write, raw, shopId, categories, newRebuilds } = await shop();
    const [rebuildId = ''] = await newRebuilds();
    const before = kept(raw, shopId);
    const failing = write(async (books) => {
      await books.entries.create({ rebuildId, categoryId: at(categories, 0), cents: 500, datedOn: '2026-01-05' });
      throw new Error('power cut');
    });
    await expect(failing).rejects.toThrow('power cut');
    expect(kept(raw, shopId)).toEqual(before);
    expect(raw.prepare('SELECT count(*) FROM entries WHERE shop_id = ?').pluck().get(shopId)).toBe(0);
  });
});
