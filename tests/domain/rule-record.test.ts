import { describe, expect, it } from 'vitest';
import { ruleRecord } from '../../server/domain/rule-record.ts';
import { buildOutcome } from '../support/facts.ts';

// Source: worked out by hand. 10 % on a plan of 1,000.00 allows a cost of 1,100.00.
const RULE = { percent: 10, flatCents: null, adoptedOn: '2025-01-03' };
const YEAR = { from: '2025-01-01', to: '2025-12-31' };
const bought = (boughtOn: string) => ({ boughtOn });

describe('the record of an adopted rule', () => {
  it('covers a cost up to plan and reserve, to the cent', () => {
    const facts = [
      buildOutcome('a', 110_000, 100_000, bought('2025-02-01')),
      buildOutcome('b', 110_001, 100_000, bought('2025-02-02')),
      buildOutcome('c', 90_000, 100_000, bought('2025-02-03')),
    ];
    expect(ruleRecord(facts, RULE, YEAR)).toMatchObject({ n: 3, x: 2, shortCents: 1, unusedCents: 10_000 });
  });

  it('is judged only on what was bought after it was adopted, inside its year', () => {
    const days = ['2025-01-03', '2025-01-04', '2025-12-31', '2026-01-01'];
    const facts = days.map((day) => buildOutcome(day, 100_000, 100_000, bought(day)));
    expect(ruleRecord(facts, RULE, YEAR).n).toBe(2);
  });

  it('counts those under way apart, and says nothing while none is finished', () => {
    const open = buildOutcome('a', 0, 100_000, { ...bought('2025-02-01'), exit: null });
    expect(ruleRecord([open], RULE, YEAR)).toMatchObject({ n: 0, x: 0, rate: null, openCount: 1 });
  });

  it('adds the flat part of a two-part rule', () => {
    const facts = [buildOutcome('a', 115_000, 100_000, bought('2025-02-01'))];
    expect(ruleRecord(facts, { ...RULE, flatCents: 5_000 }, YEAR)).toMatchObject({
      x: 1,
      shortCents: 0,
      unusedCents: 0,
    });
  });
});
