import { describe, expect, test } from 'vitest';
import { createFormatter } from '#shared/formatter.ts';
import { plain } from '../../../../src/features/answers/sentences/parts.ts';
import { sayYear } from '../../../../src/features/answers/sentences/year.ts';
import { perHour, yearReply } from '../replies.ts';

const format = createFormatter({ currency: 'USD', locale: 'en-US' });
const say = (...changes: Parameters<typeof yearReply>) => plain(sayYear(yearReply(...changes), format).answer);
const cautions = (...changes: Parameters<typeof yearReply>) => sayYear(yearReply(...changes), format).cautions;

describe('the answer', () => {
  test('says what was kept and what that is by the hour, and marks both', () => {
    const { answer } = sayYear(yearReply(), format);
    expect(plain(answer)).toBe('Nine sold rebuilds have kept $18,420 so far: $21.59 for each of your 853 hours.');
    expect(answer.filter((part) => typeof part !== 'string')).toEqual([{ mark: '$18,420' }, { mark: '$21.59' }]);
  });

  test('the rate is of the rebuilds; overhead is the year’s, and the sentence keeps them apart', () => {
    expect(say({ overheadCents: 90_000, keptCents: 1_752_000 })).toBe(
      'Nine sold rebuilds have kept $17,520 so far, after overhead. Before overhead it comes to $21.59 for each of your 853 hours.',
    );
  });

  test('a past year does not say so far', () => {
    expect(say({ isRunning: false, year: 2024 })).toBe(
      'Nine sold rebuilds kept $18,420: $21.59 for each of your 853 hours.',
    );
  });

  test('a loss is called one', () => {
    expect(say({ keptCents: -231_000, perHour: perHour(9, -231_000, 745) })).toBe(
      'Nine sold rebuilds have lost $2,310 so far: −$3.10 for each of your 745 hours.',
    );
  });

  test('one rebuild has, two have', () => {
    expect(say({ exitCount: 1, soldCount: 1, n: 1, perHour: perHour(1, 1_842_000, 100) })).toMatch(
      /^One sold rebuild has kept/,
    );
  });

  test('other ways out are not called sold', () => {
    expect(say({ soldCount: 7 })).toMatch(/^Nine rebuilds that left have kept/);
  });

  test('without hours it says nothing by the hour', () => {
    expect(say({ perHour: perHour(0, 0, 0, 9) })).toBe(
      'Nine sold rebuilds have kept $18,420 so far; hours are not known, so by the hour nothing can be said.',
    );
  });

  test('where some hours are missing it counts only those known', () => {
    expect(say({ perHour: perHour(7, 1_400_000, 700, 2) })).toBe(
      'Nine sold rebuilds have kept $18,420 so far: $20 for each of the 700 hours that are known.',
    );
    expect(cautions({ perHour: perHour(7, 1_400_000, 700, 2) })).toContain('Hours are not known for two rebuilds.');
  });

  test('nothing sold: no figure, or the overhead alone', () => {
    const none = { exitCount: 0, soldCount: 0, n: 0, keptCents: 0, perHour: perHour(0, 0, 0) };
    expect(say(none)).toBe('Nothing has been sold in 2026 so far, so nothing was kept or lost.');
    expect(say({ ...none, overheadCents: 120_000, keptCents: -120_000 })).toBe(
      'Nothing has been sold in 2026 so far; overhead has cost $1,200.',
    );
  });

  test('sold, but no purchase price is known', () => {
    expect(say({ n: 0, exitCount: 2, soldCount: 2, keptCents: 0 })).toBe(
      'Two sold rebuilds left in 2026, but no purchase price is known: what was kept cannot be said.',
    );
  });

  test('even is neither kept nor lost', () => {
    expect(say({ keptCents: 0 })).toBe('Nine sold rebuilds have come out even so far.');
  });
});

describe('what a careful friend adds', () => {
  const before = {
    year: 2025,
    from: '2025-01-01',
    to: '2025-12-31',
    through: '2025-11-30',
    exitCount: 8,
    keptCents: 1_531_000,
    wholeKeptCents: 1_700_000,
    aheadCents: 311_000,
  };

  test('the year before, to the same day', () => {
    expect(cautions({ before })[0]).toBe('$3,110 ahead of the same day of 2025.');
    expect(cautions({ before: { ...before, aheadCents: -5_000 } })[0]).toBe('$50 behind the same day of 2025.');
  });

  test('money in unsold ones is said, and not counted', () => {
    expect(cautions({ tiedUp: { on: '2026-11-30', rebuildCount: 3, cents: 1_427_500 } })).toContain(
      "Three rebuilds are unfinished or unsold and hold $14,275 of the shop's money; not counted until sold.",
    );
    expect(cautions({ tiedUp: { on: '2026-11-30', rebuildCount: 1, cents: 100_000 } })).toContain(
      "One rebuild is unfinished or unsold and holds $1,000 of the shop's money; not counted until sold.",
    );
  });

  test('losses, late bills, unknown purchases and too few', () => {
    const said = cautions({ n: 3, exitCount: 4, lossCount: 1, late: { count: 1, cents: 28_200, rebuilds: [] } });
    expect(said).toEqual([
      'One is left out: the purchase price is not known.',
      'One of the three lost money.',
      'One bill came after the sale ($282) and is counted here.',
      'Before overhead it is $6,140 a rebuild.',
      'Three rebuilds are too few yet to judge a year by.',
    ]);
  });

  test('what the wanted wage would leave', () => {
    const views = perHour(9, 1_842_000, 853);
    const paid = { ...views.afterWage, wantedCentsPerHour: 2_500, leftCents: -290_500, leftPerRebuildCents: -32_278 };
    expect(cautions({ perHour: { ...views, afterWage: paid } })).toContain(
      'Paid at the wanted $25 an hour, your own hours would leave the shop $2,905 short.',
    );
  });
});
