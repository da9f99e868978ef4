import type { BidBasis, LadderRow } from '../contracts/bids-basis.ts';
import type { BidFigures, FeeTableFields, SheetRule, UsedRule } from '../contracts/bids-parts.ts';
import { ceilProduct } from '../exact.ts';
import { LEVELS, type LevelName } from '../vocabulary.ts';
import { jointChance, type PastPair, saleChance } from './joint-chance.ts';
import { type CarTraits, pastOnRung, pickRung } from './ladder-rungs.ts';
import { levelOf } from './level.ts';
import { type RepairRule, repairBudget } from './repair-budget.ts';
import { walkAwayBid } from './walk-away-bid.ts';

/** What is typed on a sheet, as far as its figures go. Cents, whole days and seconds. */
export interface BidInputs extends FeeTableFields, CarTraits {
  readonly expectedSaleCents: number;
  readonly countedSaleCents: number | null;
  readonly lines: readonly { readonly cents: number }[];
  readonly rule: SheetRule;
  readonly days: number;
  readonly ownSeconds: number;
  readonly paidLaborCents: number;
  readonly wantedCentsPerHour: number;
}

type Past = Pick<BidBasis, 'ruleInForce' | 'ladder' | 'past'>;

/** What is drawn by chance is drawn from this seed, so that server, browser and reader get the same. */
const SEED = 1;

/**
 * Everything that a sheet comes to (definitions §11c, §18.5): repair budget by its rule, room, walk-away bid, and how
 * past rebuilds would have fared on it. The same function runs in the browser without signal and on the server when a
 * sheet is kept. Too few past rebuilds for the rule: no budget and no bid.
 */
export function bidFigures(sheet: BidInputs, basis: Past): BidFigures {
  const planCents = sheet.lines.reduce((total, { cents }) => total + cents, 0);
  const { used, rule } = ruleOfSheet(sheet, basis);
  const repairBudgetCents = rule && repairBudget(planCents, rule);
  const saleCents = sheet.countedSaleCents ?? sheet.expectedSaleCents;
  const bid = walkAwayBid({
    ...sheet,
    saleCents,
    repairBudgetCents,
    transportCents: sheet.transportCents + sheet.titleCents,
  });
  return {
    planCents,
    rule: used,
    repairBudgetCents,
    saleCents,
    holdingCents: sheet.days * sheet.holdingCentsPerDay,
    ownPayCents: ceilProduct(sheet.ownSeconds, sheet.wantedCentsPerHour, 3600),
    ...bid,
    ...chances(sheet, basis, { planCents, repairBudgetCents, saleCents, leftCents: bid.leftCents }),
  };
}

interface Outcome {
  readonly planCents: number;
  readonly repairBudgetCents: number | null;
  readonly saleCents: number;
  readonly leftCents: number | null;
}

function chances(sheet: BidInputs, { past }: Past, outcome: Outcome) {
  const { expectedSaleCents } = sheet;
  const { planCents, repairBudgetCents, saleCents, leftCents } = outcome;
  const withSale = past.filter((one) => one.expectedSaleCents !== null);
  const { rung, members } = pastOnRung(withSale, sheet);
  const pairs = (rung === null ? withSale : members).map(pairOf);
  const sale = {
    saleChance: saleChance(expectedSaleCents > 0 ? pairs : [], { expectedSaleCents, saleCents }),
    saleShare: expectedSaleCents > 0 ? saleCents / expectedSaleCents : null,
  };
  const none = (jointReason: BidFigures['jointReason']) => ({ ...sale, joint: null, jointReason });
  if (rung === null) return none('too few past pairs');
  if (expectedSaleCents === 0) return none('no expected sale');
  if (planCents === 0) return none('no plan');
  if (repairBudgetCents === null || leftCents === null) return none('no bid');
  const put = { planCents, repairBudgetCents, expectedSaleCents, saleCents, leftCents };
  return { ...sale, joint: { rung, ...jointChance(pairs, put, SEED) }, jointReason: null };
}

function pairOf(past: BidBasis['past'][number]): PastPair {
  const { actualCents, estimateCents, proceedsCents, expectedSaleCents } = past;
  return {
    overrunCents: actualCents - estimateCents,
    estimateCents,
    proceedsCents,
    expectedSaleCents: expectedSaleCents ?? 0,
  };
}

interface SheetRuleFound {
  readonly used: UsedRule;
  /** null = there is none. */
  readonly rule: RepairRule | null;
}

const NOTHING = {
  level: null,
  year: null,
  rung: null,
  n: null,
  k: null,
  percent: null,
  flatCents: null,
  overrunCents: null,
  estimateCents: null,
  isMissing: false,
} as const;

function ruleOfSheet({ rule, ...car }: BidInputs, basis: Past): SheetRuleFound {
  switch (rule.kind) {
    case 'none':
      return { used: { ...NOTHING, kind: rule.kind }, rule };
    case 'flat':
      return { used: { ...NOTHING, ...rule }, rule };
    case 'in force':
      return adoptedRule(basis.ruleInForce);
    case 'percent':
      return percentOfRung(basis.ladder, car, rule.level);
    case 'two-part':
      return twoPartOfRung(basis.ladder, car, rule.level);
  }
}

/** An adopted rule was set on all finished rebuilds together. */
function adoptedRule(adopted: BidBasis['ruleInForce']): SheetRuleFound {
  if (adopted === null) return { used: { ...NOTHING, kind: 'in force', isMissing: true }, rule: null };
  const { level, year, percent, flatCents, rebuildCount: n } = adopted;
  const used = { ...NOTHING, kind: 'in force' as const, level, year, rung: 'all' as const, n };
  return {
    used: { ...used, percent, flatCents },
    rule: { kind: 'two-part', creepPercent: percent, flatCents: flatCents ?? 0 },
  };
}

function percentOfRung(ladder: readonly LadderRow[], car: CarTraits, level: LevelName): SheetRuleFound {
  const { row, n, k } = pickRung(ladder, car, { level: levelOf(level), countOf: ({ percent }) => percent.n });
  const taken = row?.percent.taken[LEVELS.indexOf(level)] ?? null;
  const base = { ...NOTHING, kind: 'percent' as const, level, rung: row?.rung ?? null, n, k };
  if (taken === null) return { used: { ...base, isMissing: true }, rule: null };
  const [overrunCents, estimateCents] = taken;
  return {
    used: { ...base, overrunCents, estimateCents },
    rule: { kind: 'percent', taken: { overrunCents, estimateCents } },
  };
}

function twoPartOfRung(ladder: readonly LadderRow[], car: CarTraits, level: LevelName): SheetRuleFound {
  const { row, n, k } = pickRung(ladder, car, { level: levelOf(level), countOf: ({ twoPart }) => twoPart.n });
  const percent = row?.twoPart.creepPercent ?? null;
  const flatCents = row?.twoPart.flatCents[LEVELS.indexOf(level)] ?? null;
  const base = { ...NOTHING, kind: 'two-part' as const, level, rung: row?.rung ?? null, n, k };
  if (percent === null || flatCents === null) return { used: { ...base, isMissing: true }, rule: null };
  return { used: { ...base, percent, flatCents }, rule: { kind: 'two-part', creepPercent: percent, flatCents } };
}
