import type { Rule } from '#shared/contracts/rules.ts';
import type { Formatter } from '#shared/formatter.ts';
import type { RuleFigures } from './rule-words.ts';

/** A rule as it is put on paper. */
export type PrintedRule = {
  shopName: string;
  year: number;
  figures: RuleFigures;
  level: string;
  /** Where it comes from, in a sentence. */
  basis: string;
  /** How rules set this way would have done; null = too few to say. */
  record: string | null;
  /** The adopted rule; null = a proposal only. */
  rule: Rule | null;
};

/** `Adopted 3 Jan 2026 by Dana Whitlock, revision 2.` */
export function adoptedText({ rule }: PrintedRule, format: Formatter): string {
  if (!rule) return 'A proposal, not adopted.';
  const kept = rule.review?.decision === 'kept' ? `, kept after the review of ${rule.review.year}` : '';
  return `Adopted ${format.day(rule.adoptedOn)} by ${rule.adoptedByName}, revision ${rule.revision}${kept}.`;
}
