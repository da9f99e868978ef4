import { describe, expect, test } from 'vitest';
import { createFormatter } from '#shared/formatter.ts';
import { LEVELS } from '#shared/vocabulary.ts';
import { leastFor, sayContingency } from '../../../../src/features/answers/sentences/contingency.ts';
import { plain } from '../../../../src/features/answers/sentences/parts.ts';
import { contingencyReply, score } from '../replies.ts';

const format = createFormatter({ currency: 'USD', locale: 'en-US' });
const say = (...changes: Parameters<typeof contingencyReply>) => sayContingency(contingencyReply(...changes), format);
const nothing = { guarantee: null, band: null, uplift: null, percent: null, taken: null, without: null };
const tooFew = { k: 6, isAttainable: false, ...nothing };

describe('the answer', () => {
  test('says what to add and how rules set this way did, never how this rule did', () => {
    expect(plain(say().answer)).toBe(
      'Add 24% to the repair estimate: rules set this way would have covered 29 of 35 rebuilds.',
    );
  });

  test('too few for the level: how many it needs and how many there are', () => {
    expect(plain(say({ level: '9/10', percent: { ...tooFew, n: 5 } }).answer)).toBe(
      'Too few yet for 9 in 10: it needs nine finished rebuilds with an estimate, and there are five rebuilds so far.',
    );
  });

  test('none with an estimate', () => {
    expect(plain(say({ percent: { ...tooFew, n: 0 } }).answer)).toBe(
      'No finished rebuild has a locked estimate yet, so no cushion can be worked out.',
    );
  });

  test('no rebuild came after enough others: nothing is claimed', () => {
    const backTest = { skippedCount: 5, tooFewCount: 0, scores: [score('percent', 0, 0)] };
    expect(plain(say({ backTest }).answer)).toBe(
      'Add 24% to the repair estimate; there are too few rebuilds yet to try out rules set this way.',
    );
  });

  test('estimates that ran high need no cushion, and are not cut', () => {
    const percent = { ...contingencyReply().percent, uplift: -0.04, percent: 0 };
    const { answer, cautions } = say({ percent });
    expect(plain(answer)).toMatch(/^No cushion is needed on top of the repair estimate: rules set this way/);
    expect(cautions).toContain('Estimates ran high; the plan itself is never cut.');
  });
});

describe('the caution', () => {
  test('how many, the chance, and by how much it was short', () => {
    expect(say().cautions.slice(0, 2)).toEqual([
      "With 41 finished rebuilds, a rule set this way covers the next one at least 4 times in 5, so long as next year's cars are like these.",
      'The six not covered ran short by $3,840 in all.',
    ]);
  });

  test('one that was short is one', () => {
    const backTest = { skippedCount: 5, tooFewCount: 0, scores: [score('percent', 34, 35, 64_000)] };
    expect(say({ backTest }).cautions).toContain('The one not covered ran short by $640.');
  });

  test('half is once in two', () => {
    expect(say({ level: '1/2' }).cautions[0]).toContain('at least once in 2');
  });
});

// Definitions §10: 50 % needs n ≥ 1, 80 % n ≥ 4, 90 % n ≥ 9; 2/3 needs 2, since ceil(3·2/3) = 2.
test('a level needs as many rebuilds as its fraction says', () => {
  expect(LEVELS.map(leastFor)).toEqual([1, 2, 4, 9]);
});
