import type { ComparedGroup, GroupComparison } from '../../server/domain/group-comparison.ts';
import { byCodePoint } from '../../server/domain/text-order.ts';
import type { PayFit } from '../../server/domain/what-pays.ts';
import type { Entry } from './answers-document.ts';

export function groupsEntry(comparison: GroupComparison): Entry {
  return entry(comparison, comparison.groups.map(groupEntry));
}

export function paidGroupsEntry(comparison: PayFit): Entry {
  const nameOf = (one: PayFit['groups'][number]) => [one.class, one.damage].filter((name) => name !== null).join('|');
  const groups = comparison.groups
    .toSorted((a, b) => byCodePoint(nameOf(a), nameOf(b)))
    .map((one) => ({ ...groupEntry(one), group: nameOf(one), plain: one.plain, few_data: one.isThin }));
  return entry(comparison, groups);
}

function entry({ n, pooled, withinVariance }: Omit<GroupComparison, 'groups'>, groups: readonly Entry[]): Entry {
  return {
    N: n,
    G: groups.length,
    pooled: pooled && {
      sp2: withinVariance,
      Q: pooled.q,
      tau2: pooled.betweenVariance,
      mu: pooled.mean,
      se_mu: pooled.standardError,
      mu_lo: pooled.lower,
      mu_hi: pooled.upper,
    },
    groups,
  };
}

function groupEntry(one: ComparedGroup): Entry {
  return {
    group: one.group,
    n: one.n,
    mean: one.mean,
    sd: one.deviation,
    t_lo: one.interval?.lower ?? null,
    t_hi: one.interval?.upper ?? null,
    v: one.variance,
    lambda: one.shrunken?.weight ?? null,
    shrunk: one.shrunken?.value ?? null,
    shrunk_se: one.shrunken?.standardError ?? null,
    shrunk_lo: one.shrunken?.lower ?? null,
    shrunk_hi: one.shrunken?.upper ?? null,
  };
}
