import { expect, test } from 'vitest';
import { createFormatter } from '#shared/formatter.ts';
import { plain } from '../../../../src/features/answers/sentences/parts.ts';
import { sayTimeToSell } from '../../../../src/features/answers/sentences/time-to-sell.ts';
import { timeToSellReply } from '../replies.ts';

const format = createFormatter({ currency: 'USD', locale: 'en-US' });
const say = (...overall: Parameters<typeof timeToSellReply>) => sayTimeToSell(timeToSellReply(...overall), format);
const never = { days: null, lower: null, upper: null };

test('says the middle and what is still there later', () => {
  expect(plain(say().answer)).toBe('Half are sold within 28 days of being listed; 21% are still there after 60.');
});

test('when all are gone by then it says no more', () => {
  expect(plain(say({ at60: { unsold: 0, lower: null, upper: null } }).answer)).toBe(
    'Half are sold within 28 days of being listed.',
  );
});

test('unsold ones are counted, and the caution says so', () => {
  expect(say().cautions).toContain(
    'Based on twelve listed rebuilds: 10 sold, 2 unsold, counted as still waiting and not left out.',
  );
  expect(say().cautions).toContain('The middle lies, 95% sure, between 20 and 41 days.');
});

test('an upper end that was not reached is open', () => {
  expect(say({ median: { days: 28, lower: 20, upper: null } }).cautions).toContain(
    'The middle lies, 95% sure, at 20 days or later.',
  );
});

test('unsold only: no middle is made up', () => {
  const unsold = { soldCount: 0, unsoldCount: 3, n: 3, median: never, longestDays: 40 };
  expect(plain(say(unsold).answer)).toBe(
    'None of the three listed rebuilds has sold so far; the longest has waited 40 days.',
  );
  expect(plain(say({ ...unsold, n: 1, unsoldCount: 1 }).answer)).toBe(
    'The one listed has not sold so far, after 40 days.',
  );
});

test('fewer than five sales: given and marked as too few', () => {
  expect(plain(say({ n: 4, soldCount: 3, isThin: true }).answer)).toBe(
    'Too few yet to go by: with three sales so far, half were gone within 28 days of being listed.',
  );
});

test('when more than half have not sold it says so', () => {
  expect(plain(say({ median: never }).answer)).toBe(
    'More than half have not sold within 88 days of being listed, counting the unsold.',
  );
});

test('nothing listed', () => {
  expect(plain(say({ n: 0, soldCount: 0, unsoldCount: 0, median: never }).answer)).toBe(
    'Nothing has been listed for sale yet.',
  );
});

test('two classes differ only where chance is unlikely', () => {
  const test = {
    classA: 'compact car',
    classB: 'small SUV',
    nA: 12,
    nB: 16,
    observedA: 11,
    expectedA: 14.7,
    observedB: 16,
    expectedB: 12.3,
    variance: 5.7,
    chiSquare: 2.3,
    p: 0.126,
  };
  const cautions = (p: number) =>
    sayTimeToSell({ ...timeToSellReply(), comparison: { ...test, p } }, format).cautions.at(-1);
  expect(cautions(0.126)).toBe(
    'That compact car and small SUV sell at different speeds could be luck (log-rank test, p = 0.126).',
  );
  expect(cautions(0.01)).toBe(
    'Compact car and small SUV do not sell at the same speed: that is hardly luck (log-rank test, p = 0.01).',
  );
});
