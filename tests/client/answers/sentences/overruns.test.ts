import { expect, test } from 'vitest';
import { createFormatter } from '#shared/formatter.ts';
import { lookOrDamage, oldSheetOverruns, sayOverruns } from '../../../../src/features/answers/sentences/overruns.ts';
import { plain } from '../../../../src/features/answers/sentences/parts.ts';
import { category, idOf, overrunsReply } from '../replies.ts';

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
  const group = (seen: boolean, n: number, over: number) => ({
    seen,
    ...category('all', n, over),
    surprises: rate,
    perHour: { n: 0, pooledCents: null },
  });
  const gap = { difference: 0.24, lower: 0.09, upper: 0.39, isThin: false };
  const cautions = (n: number) =>
    sayOverruns(
      {
        ...overrunsReply(20, 0.3),
        seen: [group(true, 10, 0.19), group(false, n, 0.43)],
        seenDifference: { overrun: gap, surprised: null, perHour: null },
      },
      format,
    ).cautions;
  expect(cautions(10)).toContain(
    'Cars seen before buying ran +19%, unseen ones +43%: +24 points (+9 points to +39 points): hardly luck.',
  );
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

test('the split says which of the two goes with the overrun', () => {
  const rates = { n: 10, x: 3, rate: 0.3, lower: 0.1, upper: 0.6 };
  const looked = (pooled: number | null) => ({ n: 9, pooled, isThin: false, surprises: rates });
  const luck = { difference: 0.04, lower: -0.3, upper: 0.4, isThin: false };
  const front = {
    damageId: idOf('front'),
    name: 'front',
    own: { seen: looked(0.19), unseen: looked(0.43) },
    others: { seen: looked(0.24), unseen: looked(0.47) },
    look: luck,
    lookOthers: luck,
    damageSeen: luck,
    damageUnseen: luck,
  };
  expect(lookOrDamage(front, format)).toBe(
    'Front damage ran +19% when seen before buying and +43% unseen; all other +24% and +47%. ' +
      'In both the unseen bid runs further over; that front damage differs from the rest could be luck.',
  );
  const sure = { difference: 0.3, lower: 0.1, upper: 0.5, isThin: false };
  expect(lookOrDamage({ ...front, damageSeen: sure }, format)).not.toContain('luck');
  expect(lookOrDamage({ ...front, own: { seen: looked(null), unseen: looked(0.4) } }, format)).toContain(
    'Too few to tell the look from the damage.',
  );
});

test('sold ones alone are quoted only where something else had left', () => {
  expect(oldSheetOverruns(overrunsReply(9, 0.2), format)).toBeNull();
  expect(oldSheetOverruns({ ...overrunsReply(9, 0.2), soldOnly: { n: 7, pooled: 0.25 } }, format)).toBe(
    'An old sheet, with sold ones only, would have said +25% over 7 rebuilds.',
  );
});
