import type { RuleForCar } from '#shared/contracts/answers-rule-for-car.ts';
import type { GradedRule, RuleReview } from '#shared/contracts/answers-rule-review.ts';
import { type Rung } from '#shared/measures/ladder-rungs.ts';
import { head, idOf, rebuild } from './replies.ts';

/** Replies about rules, whole and plausible; a test says only what it is about. */

const tried = (rung: Rung, n: number, k: number) => ({ rung, n, k, carries: n >= 9 && k <= n });

/** The rule for a car: one percentage from twelve close ones once seen or not is said, from all 41 else. */
export function forCarReply(asked: URLSearchParams): RuleForCar {
  const isClose = asked.has('seen');
  const close = [tried('class+damage+seen', 12, 11), tried('damage+seen', 20, 17), tried('seen', 30, 25)];
  const closeTold = [tried('class+damage+seen', 8, 8), tried('damage+seen', 18, 16), tried('seen', 28, 24)];
  const band = { lower: 0.66, upper: 0.92 };
  return {
    asOf: '2026-11-30',
    level: '4/5',
    percent: {
      ...(isClose ? { rung: 'class+damage+seen', n: 12, k: 11 } : { rung: 'all', n: 41, k: 34 }),
      guarantee: 0.8,
      band,
      uplift: 0.301,
      percent: 31,
      tried: [...close, tried('all', 41, 34)],
    },
    twoPart: {
      ...(isClose ? { rung: 'damage+seen', n: 18, k: 16 } : { rung: 'all', n: 38, k: 32 }),
      guarantee: 0.8,
      band,
      creepPercent: 14,
      flatCents: 61_200,
      adoptFlatCents: 61_200,
      tried: [...closeTold, tried('all', 38, 32)],
    },
  };
}

export const gradedRule = (changes: Partial<GradedRule> = {}): GradedRule => ({
  id: idOf('rule'),
  year: 2026,
  revision: 1,
  kind: 'percent',
  level: '4/5',
  percent: 18,
  flatCents: null,
  rebuildCount: 30,
  dataUntil: '2025-12-20',
  evidence: {
    n: 30,
    k: 25,
    guarantee: 25 / 31,
    uplift: 0.174,
    flatCents: null,
    askedPercent: 18,
    askedFlatCents: null,
    covered: 20,
    scored: 24,
    booksVersion: 7,
  },
  note: null,
  review: null,
  adoptedOn: '2026-01-03',
  adoptedAt: '2026-01-03T10:00:00.000Z',
  adoptedByName: 'Dana Whitlock',
  from: '2026-01-01',
  to: '2026-12-31',
  isInForce: true,
  record: {
    n: 12,
    x: 9,
    rate: 0.75,
    lower: 0.47,
    upper: 0.91,
    shortCents: 120_000,
    unusedCents: 340_000,
    reserveCents: 800_000,
    openCount: 2,
  },
  grade: { expectedCount: 9.7, chanceOfFew: 0.43, chanceOfMany: 0.78, verdict: 'luck' },
  ...changes,
});

type Reviewed = NonNullable<RuleReview['reviewed']>;

export function reviewReply(changes: Partial<Reviewed> = {}, history: GradedRule[] = []): RuleReview {
  const rule = gradedRule();
  const reviewed: Reviewed = {
    ...rule,
    trials: [
      {
        ...rebuild('B-101'),
        boughtOn: '2026-02-01',
        exitOn: '2026-05-01',
        year: 2026,
        estimateCents: 300_000,
        overrunCents: 90_000,
        reserveCents: 54_000,
        isCovered: false,
        shortCents: 36_000,
        unusedCents: 0,
      },
    ],
    nextYear: 2027,
    next: null,
    askedNow: [
      { kind: 'percent', level: '4/5', n: 42, figures: { percent: 24, flatCents: null } },
      { kind: 'two-part', level: '4/5', n: 40, figures: { percent: 12, flatCents: 45_000 } },
    ],
    share: 0.8,
    ...changes,
  };
  return { ...head(), thisYear: 2026, reviewed, history: [...history, reviewed] };
}

export const noReview = (): RuleReview => ({ ...head(), thisYear: 2026, reviewed: null, history: [] });
