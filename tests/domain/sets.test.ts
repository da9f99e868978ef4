import { describe, expect, it } from 'vitest';
import {
  completed,
  hasOddDates,
  isOverwritten,
  marketSet,
  planned,
  plannedAndTold,
  plannedOutcomes,
  priced,
} from '../../server/domain/sets.ts';
import { buildLine, buildOutcome, buildRebuild, sale } from '../support/facts.ts';

const ids = (set: readonly { id: string }[]): string[] => set.map(({ id }) => id);

describe('completed and priced', () => {
  it('take every exit, and for money only a known purchase', () => {
    const facts = [
      buildRebuild({ id: 'sold' }),
      buildRebuild({ id: 'held', exit: null }),
      buildRebuild({ id: 'scrapped', exit: { kind: 'scrapped', on: '2025-03-01', proceedsCents: 0 } }),
      buildRebuild({ id: 'unpriced', purchaseCents: null }),
    ];
    expect(ids(completed(facts))).toEqual(['sold', 'scrapped', 'unpriced']);
    expect(ids(priced(facts))).toEqual(['sold', 'scrapped']);
  });
});

describe('an estimate that was written over', () => {
  const three = new Map([
    ['parts', 100],
    ['paint', 200],
    ['tax', 300],
    ['other', 0],
  ]);
  const lines = [...three].map(([category, cents]) => buildLine({ category, cents }));

  it('is one of three or more categories that all cost their plan to the cent', () => {
    expect(isOverwritten(buildRebuild({ estimates: three }, lines))).toBe(true);
  });

  it('may have other costs outside the plan', () => {
    expect(isOverwritten(buildRebuild({ estimates: three }, [...lines, buildLine({ category: 'fees' })]))).toBe(true);
  });

  it('is none with a cent of difference, with two categories, or with nothing planned', () => {
    expect(
      isOverwritten(buildRebuild({ estimates: three }, [...lines, buildLine({ category: 'tax', cents: 1 })])),
    ).toBe(false);
    expect(isOverwritten(buildRebuild({ estimates: new Map([...three].slice(0, 2)) }, lines))).toBe(false);
    expect(isOverwritten(buildRebuild({ estimates: new Map() }, lines))).toBe(false);
  });

  it('looks at planning values: a chosen extra changes nothing, a free part counts at its market value', () => {
    const extra = buildLine({ category: 'tax', cents: 5000, isExtra: true });
    expect(isOverwritten(buildRebuild({ estimates: three }, [...lines, extra]))).toBe(true);
    const free = buildLine({ category: 'tax', cents: 0, freeCents: 300 });
    expect(isOverwritten(buildRebuild({ estimates: three }, [...lines.slice(0, 2), free]))).toBe(true);
  });
});

describe('the planning sets', () => {
  const facts = [
    buildOutcome('b', 300_000, 250_000, { exit: sale('2025-05-01', 1) }),
    buildOutcome('a', 300_000, 250_000, { exit: sale('2025-05-01', 1) }),
    buildOutcome('early', 300_000, 250_000, { exit: sale('2025-01-31', 1) }),
    buildOutcome('unplanned', 300_000, 0),
    buildOutcome('held', 300_000, 250_000, { exit: null }),
    buildRebuild({ id: 'untold' }, [buildLine({ isForeseen: null })]),
  ];

  it('leave out what has no plan or has not left', () => {
    expect(ids(planned(facts))).toEqual(['b', 'a', 'early', 'untold']);
    expect(ids(plannedAndTold(facts))).toEqual(['b', 'a', 'early']);
  });

  it('stand in the order in which they left, then by id', () => {
    expect(ids(plannedOutcomes(plannedAndTold(facts)))).toEqual(['early', 'a', 'b']);
  });
});

describe('the market set', () => {
  it('holds sold and unsold, each with the days it was watched', () => {
    const { members } = marketSet(
      [
        buildRebuild({ id: 'sold', listedOn: '2025-03-10', exit: sale('2025-03-15', 1) }),
        buildRebuild({ id: 'unsold', listedOn: '2025-03-10', exit: null }),
        buildRebuild({ id: 'swapped', exit: { kind: 'swapped', on: '2025-03-20', proceedsCents: 0 } }),
        buildRebuild({ id: 'today', listedOn: '2025-06-30', exit: null }),
        buildRebuild({ id: 'not yet', listedOn: '2025-07-01', exit: null }),
        buildRebuild({ id: 'never', listedOn: null, exit: null }),
      ],
      '2025-06-30',
    );
    expect(members.map(({ id, days, isSold, isOtherExit }) => [id, days, isSold, isOtherExit])).toEqual([
      ['sold', 5, true, false],
      ['unsold', 112, false, false],
      ['swapped', 10, false, true],
      ['today', 0, false, false],
    ]);
  });

  it('counts what it leaves out', () => {
    const set = marketSet(
      [
        buildRebuild({ readyOn: '2025-03-11', listedOn: '2025-03-10' }),
        buildRebuild({ listedOn: null }),
        buildRebuild({ listedOn: null, exit: { kind: 'scrapped', on: '2025-03-20', proceedsCents: 0 } }),
      ],
      '2025-06-30',
    );
    expect(set).toEqual({ members: [], oddDatesCount: 1, noListedCount: 1 });
  });

  it('takes equal days and unknown days as in order', () => {
    const day = '2025-03-10';
    expect(hasOddDates(buildRebuild({ boughtOn: day, readyOn: day, listedOn: day, exit: sale(day, 1) }))).toBe(false);
    expect(hasOddDates(buildRebuild({ readyOn: null, exit: null }))).toBe(false);
    expect(hasOddDates(buildRebuild({ readyOn: null, listedOn: '2024-12-31' }))).toBe(true);
  });
});
