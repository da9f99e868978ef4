import { type Rule, ruleEvidenceSchema } from '#shared/contracts/rules.ts';
import type { RawDatabase } from '../platform/database.ts';
import { newId } from '../platform/ids.ts';
import { fromRow } from '../platform/rows.ts';
import type { ShopScope } from './scope.ts';

export type NewRule = Omit<Rule, 'id' | 'revision' | 'adoptedAt' | 'adoptedByName'>;

const RULES = `
  SELECT r.id, r.year, r.revision, r.kind, r.level, r.percent, r.flat_cents, r.rebuild_count, r.data_until, r.evidence,
    r.note, r.review, r.adopted_on, r.adopted_at, u.name AS adopted_by_name
  FROM contingency_rules r JOIN users u ON u.id = r.adopted_by
  WHERE r.shop_id = ? ORDER BY r.year DESC, r.revision DESC`;

/** Every rule that the shop adopted, the latest year and revision first: the first of a year is in force. */
export function readRules(raw: RawDatabase, shopId: string): Rule[] {
  const rows = raw.prepare(RULES).all(shopId) as object[];
  return rows.map((row) => {
    const rule = fromRow<Omit<Rule, 'evidence' | 'review'> & { evidence: string; review: string | null }>(row);
    return {
      ...rule,
      evidence: ruleEvidenceSchema.parse(JSON.parse(rule.evidence)),
      review: rule.review === null ? null : (JSON.parse(rule.review) as Rule['review']),
    };
  });
}

/** The only writer of `contingency_rules`. A rule is never changed: a later one for the same year stands beside it. */
export function ruleStore(scope: ShopScope, userId: string) {
  return {
    async adopt(rule: NewRule): Promise<string> {
      const last = await scope
        .table('contingency_rules')
        .where({ year: rule.year })
        .max<{ most: number | null }>('revision as most')
        .first();
      const id = newId();
      await scope.insert('contingency_rules', {
        ...rule,
        id,
        revision: (last?.most ?? 0) + 1,
        evidence: JSON.stringify(rule.evidence),
        review: rule.review && JSON.stringify(rule.review),
        adoptedAt: new Date().toISOString(),
        adoptedBy: userId,
      });
      return id;
    },
  };
}
