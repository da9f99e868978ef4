import { describe, expect, it } from 'vitest';
import { bidFigures } from '#shared/measures/bid-sheet.ts';
import { buildPast, buildSheet, NO_PAST } from '../../support/bid-sheet.ts';

const lines = [{ categoryId: 'parts', cents: 210_000 }];
const CAR = { classId: 'SUV', damageId: 'front', isSeen: false };

describe('what a sheet comes to', () => {
  // Source: trade.md §7.9, worked out there: 4,668 for bid and fee; 4,000 needs 4,729, 3,950 needs 4,609.
  it('is the worked example', () => {
    expect(bidFigures(buildSheet({ lines }), NO_PAST)).toMatchObject({
      planCents: 210_000,
      repairBudgetCents: 266_700,
      saleCents: 1_160_000,
      holdingCents: 41_500,
      ownPayCents: 150_000,
      roomCents: 466_800,
      bidCents: 395_000,
      feeCents: 65_900,
      leftCents: 5_900,
      rule: { kind: 'flat', percent: 27, n: null, isMissing: false },
    });
  });

  it('counts on the careful sale, where one is typed', () => {
    const found = bidFigures(buildSheet({ lines, countedSaleCents: 1_060_000 }), NO_PAST);
    expect(found).toMatchObject({ saleCents: 1_060_000, roomCents: 366_800, saleShare: 106 / 116 });
  });

  it('has no budget and no bid where the rule has too few past rebuilds, or none is adopted', () => {
    for (const rule of [
      { kind: 'percent', level: '4/5' },
      { kind: 'two-part', level: '4/5' },
    ] as const) {
      const found = bidFigures(buildSheet({ lines, rule }), NO_PAST);
      expect(found).toMatchObject({ repairBudgetCents: null, roomCents: null, bidCents: null, leftCents: null });
      expect(found.rule).toMatchObject({ ...rule, rung: null, n: 0, k: 1, isMissing: true });
    }
    const found = bidFigures(buildSheet({ lines, rule: { kind: 'in force' } }), NO_PAST);
    expect(found).toMatchObject({ bidCents: null, rule: { kind: 'in force', isMissing: true } });
  });

  it('uses the adopted rule, whose two parts make the worked example’s cushion', () => {
    const ruleInForce = {
      id: 'rule',
      year: 2026,
      revision: 2,
      kind: 'two-part',
      level: '4/5',
      percent: 27,
      flatCents: 93_000,
      rebuildCount: 31,
      adoptedOn: '2026-01-02',
    } as const;
    const sheet = buildSheet({ lines, rule: { kind: 'in force' }, wantedProfitCents: 0 });
    expect(bidFigures(sheet, { ...NO_PAST, ruleInForce })).toMatchObject({
      repairBudgetCents: 359_700,
      bidCents: 395_000,
      rule: { kind: 'in force', year: 2026, rung: 'all', n: 31, percent: 27, flatCents: 93_000 },
    });
  });

  it('takes a rule of the car’s rung, and names it', () => {
    const [all] = NO_PAST.ladder;
    if (!all) throw new Error('no rung');
    const like = { ...all, rung: 'damage+seen' as const, damageId: 'front', isSeen: false };
    const ladder = [
      {
        ...like,
        percent: { n: 9, taken: [null, null, [30_000, 100_000] as [number, number], null] },
        twoPart: { n: 9, creepPercent: 10, flatCents: [null, null, 50_000, null] },
      },
      all,
    ];
    const with45 = (kind: 'percent' | 'two-part') =>
      bidFigures(buildSheet({ ...CAR, lines, rule: { kind, level: '4/5' } }), { ...NO_PAST, ladder });
    expect(with45('percent')).toMatchObject({
      repairBudgetCents: 273_000,
      rule: { rung: 'damage+seen', n: 9, k: 8, overrunCents: 30_000, estimateCents: 100_000 },
    });
    expect(with45('two-part')).toMatchObject({
      repairBudgetCents: 281_000,
      rule: { rung: 'damage+seen', n: 9, k: 8, percent: 10, flatCents: 50_000 },
    });
  });
});

describe('the chances of a sheet', () => {
  // By hand: budget 27 % over plan; the sale is counted on as expected, so a share of 100 % reaches it.
  const past = [
    ...[0, 10, 20, 27].map((percent, i) => buildPast(`a${i}`, percent, 100)),
    ...[0, 10, 28].map((percent, i) => buildPast(`b${i}`, percent, 99)),
    ...[40, 90].map((percent, i) => buildPast(`c${i}`, percent, 120)),
  ];
  const figures = (sheet: Parameters<typeof buildSheet>[0], some = past) =>
    bidFigures(buildSheet({ ...CAR, lines, ...sheet }), { ...NO_PAST, past: some });

  it('put each past rebuild on it, repair and sale together', () => {
    const { joint, jointReason, saleChance } = figures({});
    expect(jointReason).toBeNull();
    expect(saleChance).toMatchObject({ n: 9, x: 6 });
    expect(joint).toMatchObject({
      rung: 'class+damage+seen',
      repair: { n: 9, x: 6 },
      sale: { n: 9, x: 6 },
      both: { n: 9, x: 4 },
      // The bid leaves 59.00: only the one of 28 % (21.00 over the budget) that sold 116.00 short fails.
      wanted: { n: 9, x: 8 },
      seed: 1,
      resampleCount: 2_000,
    });
  });

  it('say why there is none', () => {
    expect(figures({}, past.slice(1))).toMatchObject({ joint: null, jointReason: 'too few past pairs' });
    expect(figures({ lines: [] })).toMatchObject({ joint: null, jointReason: 'no plan' });
    expect(figures({ rule: { kind: 'percent', level: '4/5' } })).toMatchObject({ jointReason: 'no bid' });
    expect(figures({ expectedSaleCents: 0 })).toMatchObject({
      jointReason: 'no expected sale',
      saleChance: { n: 0, rate: null },
      saleShare: null,
    });
  });

  it('leave out those of whom no sale was expected, and still say how often sales came up to it', () => {
    const some = [...past.slice(1), buildPast('no sale expected', 0, 100, { expectedSaleCents: null })];
    const { joint, saleChance } = figures({}, some);
    expect(joint).toBeNull();
    expect(saleChance).toMatchObject({ n: 8, x: 5 });
  });
});
