import { describe, expect, it } from 'vitest';
import { ruleDays, ruleRecord } from '../../server/domain/rule-record.ts';
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

  it('names each rebuild that it judged, and those that it could not', () => {
    const facts = [
      buildOutcome('short', 112_000, 100_000, bought('2025-02-01')),
      buildOutcome('no-plan', 90_000, 0, bought('2025-02-02')),
      buildOutcome('open', 0, 100_000, { ...bought('2025-02-03'), exit: null }),
    ];
    const { trials, openIds, noEstimateIds } = ruleRecord(facts, RULE, YEAR);
    expect(trials).toEqual([
      {
        id: 'short',
        boughtOn: '2025-02-01',
        exitOn: '2025-04-01',
        estimateCents: 100_000,
        overrunCents: 12_000,
        reserveCents: 10_000,
        isCovered: false,
        shortCents: 2_000,
        unusedCents: 0,
      },
    ]);
    expect({ openIds, noEstimateIds }).toEqual({ openIds: ['open'], noEstimateIds: ['no-plan'] });
  });
});

describe('the days of a revision', () => {
  const revision = (number: number, adoptedOn: string) => ({ year: 2025, revision: number, adoptedOn });
  const all = [revision(1, '2024-12-20'), revision(2, '2025-06-10'), revision(3, '2025-06-10')];

  it('end when a later one takes its place, so that no rebuild is judged twice', () => {
    const spans = all.map((rule) => ruleDays(rule, all, YEAR));
    expect(spans.map(({ to }) => to)).toEqual(['2025-06-10', '2025-06-10', '2025-12-31']);
    const facts = ['2025-06-09', '2025-06-10', '2025-06-11'].map((day) =>
      buildOutcome(day, 100_000, 100_000, bought(day)),
    );
    const judged = all.map((rule, i) => {
      const days = spans[i] ?? YEAR;
      return ruleRecord(facts, { ...RULE, adoptedOn: rule.adoptedOn }, days).trials.map(({ id }) => id);
    });
    // The second was replaced on its own day: it judged nothing.
    expect(judged).toEqual([['2025-06-09', '2025-06-10'], [], ['2025-06-11']]);
  });

  it('are the whole year where none follows, or only after its end', () => {
    expect(ruleDays(revision(1, '2024-12-20'), [revision(1, '2024-12-20')], YEAR)).toEqual(YEAR);
    expect(ruleDays(revision(1, '2024-12-20'), [revision(2, '2026-02-01')], YEAR)).toEqual(YEAR);
  });
});
