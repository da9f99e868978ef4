import { describe, expect, it } from 'vitest';
import { type BidBasis, bidBasisSchema } from '#shared/contracts/bids-basis.ts';
import { bidFigures } from '#shared/measures/bid-sheet.ts';
import { sellingFor, startFor, surprisesFor } from '#shared/measures/like-cars.ts';
import { similarRebuilds } from '#shared/measures/similar.ts';
import { fillShop } from '../bench/fill.ts';
import { inventLines, inventRebuilds } from '../bench/invent.ts';
import { testApi } from '../support/api.ts';
import { buildSheet } from '../support/bid-sheet.ts';
import { openSmallShop } from '../support/small-shop.ts';

/** A basis as a browser reads it. */
async function openBasis() {
  const small = await openSmallShop();
  const read = async (): Promise<BidBasis> => bidBasisSchema.parse((await small.ada.get('/api/bids/basis')).body);
  return { ...small, read, basis: await read() };
}

// Source of the figures: worked out by hand from the table in support/small-shop.ts.
describe('the basis of the small shop', () => {
  it('holds the words, the wanted pay and how plans came out', async () => {
    const { basis, books } = await openBasis();
    const parts = books.categoryId('parts');
    expect(basis).toMatchObject({ asOf: '2026-06-15', wantedCentsPerHour: 2_500, ruleInForce: null, pastTotal: 4 });
    expect(basis.categories.find(({ id }) => id === books.categoryId('transport'))?.place).toBe('transport');
    // Planned 2,000, 1,000, 800 and 1,000 of parts; came to 2,000, 2,000, 1,000 and 500.
    expect(basis.bias).toEqual([{ categoryId: parts, n: 4, planCents: 480_000, actualCents: 550_000 }]);
    expect(basis.starts).toEqual([
      {
        classId: null,
        damageId: null,
        n: 4,
        lines: [{ categoryId: parts, n: 4, planCents: 100_000, actualCents: 150_000 }],
        hours: expect.objectContaining({ n: expect.any(Number) }),
      },
    ]);
    expect(basis.ladder).toEqual([
      {
        rung: 'all',
        classId: null,
        damageId: null,
        isSeen: null,
        percent: { n: 4, taken: [[40_000, 80_000], [100_000, 100_000], [100_000, 100_000], null] },
        twoPart: { n: 4, creepPercent: 0, flatCents: [40_000, 100_000, 100_000, null] },
      },
    ]);
  });

  it('says what surprised, over those that tell of it', async () => {
    const { basis, books } = await openBasis();
    // S-1 to S-4 and S-6: two of five had one, 500 each.
    const parts = { categoryId: books.categoryId('parts'), x: 2, medianCents: 50_000, whats: [] };
    expect(basis.surprises).toEqual([{ damageId: null, isSeen: null, n: 5, x: 2, categories: [parts] }]);
    expect(surprisesFor(basis.surprises, { classId: null, damageId: books.damageId('hail'), isSeen: true })?.n).toBe(5);
  });

  it('counts the unsold as waiting, from listed and from bought', async () => {
    const { basis, books } = await openBasis();
    const [all] = basis.selling;
    // Listed: S-1 30 days, S-2 30, S-3 70, S-5 still waiting after 14. Bought: 66, 70, 97, S-4 scrapped after 89, S-5 waits.
    expect(all?.toSell).toMatchObject({ n: 4, soldCount: 3, unsoldCount: 1, otherExitCount: 0, median: 30 });
    expect(all?.held).toMatchObject({ n: 5, soldCount: 3, unsoldCount: 1, otherExitCount: 1, median: 97 });
    expect(sellingFor(basis.selling, books.classId('SUV'))?.classId).toBeNull();
  });

  it('lists the past, the last to leave first', async () => {
    const { basis, ids, books } = await openBasis();
    expect(basis.past.map(({ tag }) => tag)).toEqual(['S-4', 'S-3', 'S-2', 'S-1']);
    expect(basis.past.at(-1)).toMatchObject({
      id: ids.s1,
      classId: books.classId('SUV'),
      isSeen: true,
      estimateCents: 200_000,
      actualCents: 200_000,
      plannedSeconds: 144_000,
      daysHeld: 66,
      keptCents: 300_000,
      proceedsCents: 1_000_000,
      expectedSaleCents: null,
    });
    const car = { classId: books.classId('SUV'), damageId: books.damageId('hail'), isSeen: false, planCents: 100_000 };
    expect(similarRebuilds(basis.past, car).map(({ rebuild }) => rebuild.tag)).toEqual(['S-2', 'S-1', 'S-4']);
  });

  it('follows the books, and carries the rule in force', async () => {
    const { ada, basis, read, books } = await openBasis();
    await ada.post('/api/rules', { year: 2026, level: '1/2', kind: 'two-part' });
    await books.rebuild({ tag: 'later', soldOn: '2026-07-01', saleCents: 1 });
    const after = await read();
    expect(after.booksVersion).toBe(basis.booksVersion + 2);
    expect(after.ruleInForce).toMatchObject({ year: 2026, kind: 'two-part', flatCents: 40_000, rebuildCount: 4 });
    expect(after.pastTotal).toBe(4);
    const sheet = buildSheet({
      lines: [{ categoryId: books.categoryId('parts'), cents: 100_000 }],
      rule: { kind: 'in force' },
    });
    const { body } = await ada.post('/api/bids', sheet);
    expect(body.bid.figures).toEqual(bidFigures(sheet, after));
    expect(body.bid.figures.repairBudgetCents).toBe(140_000);
  });
});

describe('the basis of a large shop', () => {
  it('stays small enough to be kept on a phone, and carries a rule for every kind of car', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const rebuilds = inventRebuilds(2_000);
    await fillShop(api.services.database, ada.shopId, rebuilds, inventLines(rebuilds, 20));
    await api.services.database
      .writer('entries')
      .where({ foreseen: 'surprise' })
      .update({ what: api.services.database.writer.raw("'found at the teardown: thing number ' || (rowid % 50)") });
    const { body, text } = await ada.get('/api/bids/basis');
    const basis = bidBasisSchema.parse(body);
    expect(text.length).toBeLessThan(150_000);
    expect(basis.past).toHaveLength(100);
    expect(basis.pastTotal).toBe(rebuilds.filter(({ soldOn }) => soldOn !== null).length);
    const [finest] = basis.ladder;
    expect(finest?.rung).toBe('class+damage+seen');
    const car = {
      classId: finest?.classId ?? null,
      damageId: finest?.damageId ?? null,
      isSeen: finest?.isSeen ?? null,
    };
    expect(startFor(basis.starts, car)).toMatchObject({ damageId: car.damageId });
    expect(surprisesFor(basis.surprises, car)).toMatchObject({ damageId: car.damageId, isSeen: car.isSeen });
    expect(sellingFor(basis.selling, car.classId)?.classId).toBe(car.classId);
    const sheet = buildSheet({
      ...car,
      rule: { kind: 'percent', level: '4/5' },
      lines: [{ categoryId: 'x', cents: 1 }],
    });
    expect(bidFigures(sheet, basis).rule).toMatchObject({ rung: 'class+damage+seen', n: finest?.percent.n });
  });
});
