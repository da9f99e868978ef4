import { describe, expect, test } from 'vitest';
import { createFormatter } from '#shared/formatter.ts';
import { LEVELS } from '#shared/vocabulary.ts';
import {
  bandWords,
  leastFor,
  sayContingency,
  sayDrift,
} from '../../../../src/features/answers/sentences/contingency.ts';
import { plain } from '../../../../src/features/answers/sentences/parts.ts';
import { contingencyReply, drift, score } from '../contingency-replies.ts';

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
      'Too few yet for 9 in 10: it needs nine finished rebuilds with an estimate. There are five so far; four more will do.',
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
      "With 41 finished rebuilds, a rule set this way covers the next one at least 4 times in 5, so long as next year's cars are like these. With that many to go by, the true share could be 7 to 9 in 10.",
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

describe('percentage and sum', () => {
  const two = (...changes: Parameters<typeof contingencyReply>) =>
    sayContingency(contingencyReply(...changes), format, 'two-part');

  test('says both parts and how such rules did', () => {
    expect(plain(two().answer)).toBe(
      'Add 12% for known work costing more and $450 for surprises: rules set this way would have covered 28 of 33 rebuilds.',
    );
    expect(two().cautions[0]).toContain('roughly 4 times in 5');
  });

  test('needs entries that say whether they were foreseen', () => {
    const nothing = { creepPercent: null, flatCents: null, adoptFlatCents: null, band: null, without: null };
    const twoPart = { ...contingencyReply().twoPart, ...nothing, n: 0, isAttainable: false };
    expect(plain(two({ twoPart }).answer)).toBe(
      'Too few yet for 4 in 5: it needs four finished rebuilds whose entries all say whether they were foreseen. There are none so far; four more will do.',
    );
  });
});

test('a band in tenths never promises ten in ten', () => {
  // trade: n 9 at 4/5 is 63 to 94 %, "8 in 10, could be 6 to 9".
  expect(bandWords({ lower: 0.63, upper: 0.94 })).toBe('6 to 9 in 10');
  expect(bandWords({ lower: 0.77, upper: 0.988 })).toBe('8 to nearly 10 in 10');
  expect(bandWords({ lower: 0.798, upper: 0.803 })).toBe('about 8 in 10');
});

describe('the last two years', () => {
  const said = (changes: Parameters<typeof drift>[0]) => sayDrift(drift(changes), format);

  test('agree, or there are too few to say anything', () => {
    expect(said({})).toBe(
      'Of 14 rebuilds in the last 24 months eleven stayed within the 23% that the years before ask for; about 12 were to be expected: no sign that the past is a poor guide.',
    );
    expect(said({ verdict: null })).toBeNull();
    expect(say({ drift: drift({ verdict: null }) }).cautions.join()).not.toContain('24 months');
  });

  test('disagree: which the proposal used, and what the last ones alone ask for', () => {
    const changes = { verdict: 'costs more', withinCount: 5 } as const;
    expect(said(changes)).toContain('Work costs more now. The proposal uses all years (24%); the last 24 months alone');
    expect(said(changes)).toContain('alone ask for 26%.');
    expect(say({ drift: drift(changes) }).cautions.join(' ')).toContain('Work costs more now.');
  });
});

// Definitions §10: 50 % needs n ≥ 1, 80 % n ≥ 4, 90 % n ≥ 9; 2/3 needs 2, since ceil(3·2/3) = 2.
test('a level needs as many rebuilds as its fraction says', () => {
  expect(LEVELS.map(leastFor)).toEqual([1, 2, 4, 9]);
});
