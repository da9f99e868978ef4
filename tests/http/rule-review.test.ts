import { describe, expect, it } from 'vitest';
import type { RuleReview } from '#shared/contracts/answers-rule-review.ts';
import { openSmallShop, outOf } from '../support/small-shop.ts';

// Source of the figures: worked out by hand from the table in support/small-shop.ts. Overruns: −50, 0, 50 and 100 %.

/** The small shop with a rule of 50 % (1 in 2) for 2026, as if it had been adopted on that day. */
async function shopWithRule(adoptedOn: string) {
  const shop = await openSmallShop();
  const { body: rule } = await shop.ada.post('/api/rules', { year: 2026, level: '1/2', kind: 'percent' });
  const { database } = shop.api.services;
  await database.writer('contingency_rules').where({ id: rule.id }).update({ adopted_on: adoptedOn });
  return { ...shop, rule };
}

describe('the yearly review', () => {
  it('judges the rule only on what was bought after it was adopted, and counts what is not finished', async () => {
    const { ask } = await shopWithRule('2026-01-02');
    const review = await ask<RuleReview>('rule-review');
    // S-3: 1,200 against 800 and 400. S-4: 500 against 1,000 and 500, so 500 stays over. S-5 is not sold.
    expect(review.reviewed).toMatchObject({
      year: 2026,
      percent: 50,
      from: '2026-01-01',
      to: '2026-12-31',
      isInForce: true,
      nextYear: 2027,
      next: null,
      share: 0.5,
    });
    expect(review.reviewed?.record).toMatchObject({
      n: 2,
      x: 2,
      openCount: 1,
      shortCents: 0,
      unusedCents: 50_000,
      reserveCents: 90_000,
    });
    expect(review.reviewed?.trials.map(({ tag, isCovered }) => [tag, isCovered])).toEqual([
      ['S-3', true],
      ['S-4', true],
    ]);
    expect(outOf(review)).toEqual({ 'not sold yet': ['S-5'] });
    // Two of them, each to be held with 3/5; none held would come up in 2·3/(5·6) = 1 of 5: too few to say anything.
    expect(review.reviewed?.grade).toMatchObject({ expectedCount: 1.2, chanceOfMany: 0.4, verdict: null });
  });

  it('never judges a rule on what it was set on', async () => {
    const { ask } = await shopWithRule('2026-02-01');
    // S-4 was bought on the day of adopting: it is not after it.
    const review = await ask<RuleReview>('rule-review');
    expect(review.reviewed?.record).toMatchObject({ n: 0, x: 0, rate: null, openCount: 1 });
    expect(review.reviewed?.grade).toMatchObject({ expectedCount: 0, verdict: null });
  });

  it('says what the books ask for now, its own kind first', async () => {
    const { ask } = await shopWithRule('2026-01-02');
    const review = await ask<RuleReview>('rule-review');
    expect(review.reviewed?.askedNow).toEqual([
      { kind: 'percent', level: '1/2', n: 4, figures: { percent: 50, flatCents: null } },
      { kind: 'two-part', level: '1/2', n: 4, figures: { percent: 0, flatCents: 40_000 } },
    ]);
  });

  it('keeps the same rule for the next year, and says that it was looked at', async () => {
    const { ada, ask, rule } = await shopWithRule('2026-01-02');
    const again = { year: 2027, level: '1/2', kind: 'percent', percent: 50, reviewedRuleId: rule.id };
    const kept = await ada.post('/api/rules', again);
    expect(kept.body.review).toEqual({
      ruleId: rule.id,
      year: 2026,
      revision: 1,
      decision: 'kept',
      x: 2,
      n: 2,
      openCount: 1,
      shortCents: 0,
      unusedCents: 50_000,
    });
    const changed = await ada.post('/api/rules', { ...again, percent: 60 });
    expect(changed.body.review.decision).toBe('changed');
    const review = await ask<RuleReview>('rule-review');
    expect(review.reviewed?.next).toMatchObject({ year: 2027, revision: 2, percent: 60 });
    expect(review.history.map(({ year, revision, isInForce }) => [year, revision, isInForce])).toEqual([
      [2026, 1, true],
      [2027, 1, false],
      [2027, 2, true],
    ]);
  });

  it('keeps a rule below what the books ask without another reason, and changes to one only with it', async () => {
    const { ada, api, ask, rule } = await shopWithRule('2026-01-02');
    await api.services.database.writer('contingency_rules').where({ id: rule.id }).update({ percent: 20 });
    expect((await ask<RuleReview>('rule-review')).reviewed?.record).toMatchObject({ n: 2, x: 1, shortCents: 24_000 });
    const again = { year: 2027, level: '1/2', kind: 'percent', percent: 20, reviewedRuleId: rule.id };
    expect((await ada.post('/api/rules', { ...again, percent: 21 })).status).toBe(422);
    expect((await ada.post('/api/rules', again)).body).toMatchObject({ percent: 20, review: { decision: 'kept' } });
  });

  it('judges each revision only until the next took its place', async () => {
    const { ada, api, ask, rule } = await shopWithRule('2026-01-02');
    const { body: second } = await ada.post('/api/rules', { year: 2026, level: '4/5', kind: 'percent' });
    const table = api.services.database.writer('contingency_rules');
    await table.where({ id: second.id }).update({ adopted_on: '2026-01-20' });
    const review = await ask<RuleReview>('rule-review');
    expect(review.reviewed?.id).toBe(second.id);
    expect(review.history.map(({ id, record, to }) => [id, record.n, to])).toEqual([
      [rule.id, 1, '2026-01-20'],
      [second.id, 1, '2026-12-31'],
    ]);
  });

  it('finds a year that is asked for, and nothing where no rule was', async () => {
    const { ask } = await shopWithRule('2026-01-02');
    expect((await ask<RuleReview>('rule-review?year=2026')).reviewed?.year).toBe(2026);
    expect((await ask<RuleReview>('rule-review?year=2025')).reviewed).toBeNull();
    const { ask: other } = await openSmallShop();
    expect(await other<RuleReview>('rule-review')).toMatchObject({ reviewed: null, history: [], thisYear: 2026 });
  });
});
