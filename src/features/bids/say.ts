import type { BidFields } from '#shared/contracts/bids.ts';
import type { BidFigures } from '#shared/contracts/bids-parts.ts';
import type { Formatter } from '#shared/formatter.ts';
import { hasBid, levelWords, ruleFigures, rungWords, timesInTen } from './words.ts';

/** The answer as `before`, a figure to underline, and `after`. */
export type Answer = { readonly before: string; readonly figure: string; readonly after: string };

/** The walk-away bid in one sentence, or why there is none yet. */
export function sayBid(sheet: BidFields | null, figures: BidFigures | null, format: Formatter): Answer {
  const plain = (before: string): Answer => ({ before, figure: '', after: '' });
  if (!sheet || !figures) return plain('A field cannot be read yet: look at what is marked.');
  if (sheet.expectedSaleCents === 0) return plain('Put in what it should sell for.');
  if (figures.rule.isMissing) return plain('No bid yet: this cushion has too little behind it.');
  if (!hasBid(figures)) return plain('Do not bid: even as a gift it would not bring what you want.');
  return { before: 'Walk away above ', figure: format.money(figures.bidCents), after: '.' };
}

/** What the cushion is and what it rests on, in one sentence. */
export function cushionWords(figures: BidFigures, isSeen: boolean | null, format: Formatter): string {
  const { rule, planCents, repairBudgetCents } = figures;
  if (rule.kind === 'none') return 'No cushion: every past plan that ran over would have run over this one too.';
  if (rule.isMissing) return missingWords(figures, format);
  const cushion = format.money((repairBudgetCents ?? planCents) - planCents);
  const set = ruleFigures(rule, format);
  if (rule.kind === 'flat') return `Cushion ${cushion}: ${set} of your own, not from past rebuilds.`;
  const past = `${format.count(rule.n ?? 0, 'finished rebuild')} ${rule.rung ? rungWords(rule.rung, isSeen) : ''}`;
  const level = rule.level ? `, set to hold ${levelWords(rule.level)}` : '';
  const source = rule.kind === 'in force' ? `the rule adopted for ${rule.year}` : 'the rule of your past';
  return `Cushion ${cushion}: ${set} by ${source}${level}. Based on ${past}.`;
}

function missingWords({ rule }: BidFigures, format: Formatter): string {
  if (rule.kind === 'in force') return 'No rule is adopted for this year. Choose another cushion, or adopt one first.';
  const has = format.count(rule.n ?? 0, 'finished rebuild');
  const need = rule.k !== null && rule.n !== null && rule.k > rule.n ? 'more' : 'nine at least';
  return `Too few yet: this level needs ${need}, and there are ${has} with an estimate. Choose a lower level or a percentage of your own.`;
}

/** What a careful friend would add: what it rests on, how sure, what is not counted. */
export function cautionsOf(
  sheet: BidFields | null,
  figures: BidFigures | null,
  whole: BidFigures | null,
  format: Formatter,
): string[] {
  if (!sheet || !figures || sheet.expectedSaleCents === 0) return [];
  const words = [cushionWords(figures, sheet.isSeen, format)];
  if (figures.roomCents !== null && figures.bidCents === null)
    words.push(`It is ${format.money(-figures.roomCents)} short before any bid.`);
  if (hasBid(figures) && whole) words.push(jointWords(whole, format));
  return [...words, notCounted(sheet)].filter((text) => text !== '');
}

function jointWords({ joint }: BidFigures, format: Formatter): string {
  if (!joint || joint.both.rate === null) return '';
  return `All of it together holds ${timesInTen(joint.both.rate)}, tried on ${format.count(joint.both.n, 'past rebuild')}.`;
}

/** What the sheet leaves out, so that an empty field is no quiet zero. */
function notCounted(sheet: BidFields): string {
  const empty = [
    sheet.lines.length === 0 && 'repair',
    sheet.ownSeconds === 0 && 'own hours',
    sheet.transportCents === 0 && 'transport',
    sheet.titleCents === 0 && 'title and inspection',
    sheet.sellingCents === 0 && 'selling',
    sheet.days * sheet.holdingCentsPerDay === 0 && 'holding',
    sheet.feeSteps.length === 0 && sheet.feeFlatCents === 0 && 'fees',
  ].filter((one) => one !== false);
  return empty.length === 0 ? 'Overhead is not counted.' : `Not counted: ${empty.join(', ')} and overhead.`;
}
