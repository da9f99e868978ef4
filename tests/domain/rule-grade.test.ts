import { describe, expect, it } from 'vitest';
import { seeded } from '#shared/measures/seeded.ts';
import { contingency } from '../../server/domain/contingency.ts';
import { ruleGrade } from '../../server/domain/rule-grade.ts';
import { inventPast } from '../support/invented-past.ts';

const RULE = { n: 30, k: 25 };

describe('the grade of an adopted rule', () => {
  // By the distribution of exceedances (Gumbel & von Schelling 1950), as in covered-chances.test.ts.
  it('says how many were to be held, and that nine of twelve may be luck', () => {
    const grade = ruleGrade({ ...RULE, m: 12, held: 9 });
    expect(grade.expectedCount).toBeCloseTo(9.677, 3);
    expect(grade.verdict).toBe('luck');
    expect(grade.chanceOfFew + grade.chanceOfMany).toBeGreaterThan(1);
  });

  it('calls it no luck where chance would do it one time in forty or less', () => {
    expect(ruleGrade({ ...RULE, m: 12, held: 3 })).toMatchObject({ verdict: 'held less often' });
    expect(ruleGrade({ n: 100, k: 51, m: 40, held: 38 })).toMatchObject({ verdict: 'held more often' });
  });

  it('says too few yet while not even none held would say anything', () => {
    // Chance of one above the 25th of 30 is 6/31, of two 6·7/(31·32) = 4.2 %, of three 6·7·8/(31·32·33) = 1.0 %.
    expect(ruleGrade({ ...RULE, m: 0, held: 0 })).toMatchObject({ expectedCount: 0, verdict: null });
    expect(ruleGrade({ ...RULE, m: 2, held: 0 }).chanceOfFew).toBeCloseTo(42 / 992, 12);
    expect(ruleGrade({ ...RULE, m: 2, held: 0 }).verdict).toBeNull();
    expect(ruleGrade({ ...RULE, m: 3, held: 0 })).toMatchObject({ verdict: 'held less often' });
  });

  it('blames a rule without cause in no more than 1 shop of 20, over 2,000 invented ones', () => {
    const chance = seeded(20_261_205);
    const verdicts = Array.from({ length: 2_000 }, () => {
      const all = inventPast({ count: 42, chance });
      const { n, k, taken } = contingency(all.slice(0, 30), { p: 4, q: 5 });
      const allowed = taken ? taken.overrunCents / taken.estimateCents : Number.NaN;
      const held = all.slice(30).filter((one) => one.overrunCents / one.estimateCents <= allowed).length;
      return ruleGrade({ n, k, m: 12, held }).verdict;
    });
    const blamed = verdicts.filter((verdict) => verdict !== 'luck').length / verdicts.length;
    expect(blamed).toBeGreaterThan(0);
    expect(blamed).toBeLessThan(0.05);
  });
});
