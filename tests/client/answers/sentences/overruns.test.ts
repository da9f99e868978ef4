import { expect, test } from 'vitest';
import { createFormatter } from '#shared/formatter.ts';
import { sayOverruns } from '../../../../src/features/answers/sentences/overruns.ts';
import { plain } from '../../../../src/features/answers/sentences/parts.ts';
import { category, overrunsReply } from '../replies.ts';

const format = createFormatter({ currency: 'USD', locale: 'en-US' });
const say = (...reply: Parameters<typeof overrunsReply>) => plain(sayOverruns(overrunsReply(...reply), format).answer);

test('names the category with most money over and the one furthest over', () => {
  const categories = [
    category('parts', 20, 0.2),
    category('small systems', 20, 0.4, 20_000),
    category('paint', 20, 0.1),
  ];
  expect(say(20, 0.34, categories)).toBe(
    'All together the work comes in 34% over the locked estimates. The most money goes over on parts, $4,000; the furthest over is small systems, by 40%.',
  );
});

test('one category may be both', () => {
  expect(say(20, 0.34, [category('parts', 20, 0.5), category('paint', 20, 0.1)])).toBe(
    'All together the work comes in 34% over the locked estimates. The most goes over on parts: $10,000, or 50% more than planned.',
  );
});

test('a category with too few is never named', () => {
  expect(say(20, 0.1, [category('restraints', 4, 2), category('paint', 20, 0.1)])).not.toContain('restraints');
});

test('under the estimates is under, and no category is blamed', () => {
  expect(say(9, -0.03, [category('paint', 9, -0.03)])).toBe(
    'All together the work comes in 3% under the locked estimates.',
  );
});

test('as estimated has no sign', () => {
  expect(say(9, 0.001)).toBe('All together the work comes to what was estimated.');
});

test('too few, and none', () => {
  expect(say(2, 0.5, [category('parts', 2, 0.5)])).toBe(
    'Too few yet to say where: two finished rebuilds with an estimate came in 50% over the locked estimates so far.',
  );
  expect(say(0, 0)).toBe('No finished rebuild has a locked estimate yet, so nothing can be said to run over.');
});

test('seen is set against unseen only where both have enough', () => {
  const rate = { n: 10, x: 3, rate: 0.3, lower: 0.1, upper: 0.6 };
  const group = (seen: boolean, n: number, over: number) => ({ seen, ...category('all', n, over), surprises: rate });
  const cautions = (n: number) =>
    sayOverruns({ ...overrunsReply(20, 0.3), seen: [group(true, 10, 0.19), group(false, n, 0.43)] }, format).cautions;
  expect(cautions(10)).toContain('Cars seen before buying ran +19%, unseen ones +43%.');
  expect(cautions(4).join(' ')).not.toContain('unseen');
});

test('hours, surprises and what nobody planned for stand in the caution', () => {
  const reply = {
    ...overrunsReply(20, 0.3, [{ ...category('tow', 9, 0), unbudgetedCount: 2, unbudgetedCents: 30_000 }]),
    hours: { ...overrunsReply(20, 0.49).total, plannedSeconds: 1, actualSeconds: 2, dots: [], bins: [], years: [] },
    surprises: { ...overrunsReply(20, 0).surprises, n: 18, x: 9, rate: 0.5, lower: 0.3, upper: 0.7 },
  };
  expect(sayOverruns(reply, format).cautions).toEqual(
    expect.arrayContaining([
      'Hours run 49% over plan.',
      'Nine of 18 had at least one surprise.',
      '$300 went where nothing had been planned.',
    ]),
  );
});
