import { fold } from '../cells/fold.ts';
import { looksLikeDay } from '../cells/days.ts';
import { looksLikeMoney } from '../cells/money.ts';
import { tradeMeaning } from '../words/categories.ts';
import { headingMeanings } from '../words/headings.ts';

const QUALIFIER =
  /^(?:est|estim|estimate|estimated|plan|planned|budget|budgeted|bud|quote|quoted|actual|act|real|spent|ist|soll|kva|geplant|gepl|tatsachlich|prev|previsto|presupuesto|presup|gastado|prevu|devis|reel|paid|cost|kosten|diff|difference|differenz|abweichung|ecart|diferencia)$/;
const UNIT =
  /^[([]?\s*(?:usd|eur|gbp|\$|€|£|h|hrs?|hours|std|km|mi|miles|y\/n|d{1,2}[./-]m{1,2}[./-]y{2,4}|m{1,2}[./-]d{1,2}[./-]y{2,4})\s*[)\]]?$/i;

/** Headings under a row of groups: `Parts` above `est` and `actual` makes `Parts est`, `Parts actual`. null = no groups. */
export function underGroups(upper: readonly string[], lower: readonly string[]): string[] | null {
  const groups = upper.filter((cell) => cell.trim() !== '');
  const isGroups = groups.length > 0 && !upper.some((cell) => looksLikeMoney(cell) || looksLikeDay(cell));
  const known = groups.filter((cell) => tradeMeaning(cell) !== null || headingMeanings(cell).length > 0);
  if (!isGroups || known.length < groups.length / 2) return null;
  const again = repeatedUnder(upper, lower);
  let group = '';
  let merged = 0;
  const cells = lower.map((cell, at) => {
    group = (upper[at] ?? '').trim() || group;
    if (group === '' || !(QUALIFIER.test(fold(cell)) || again.has(fold(cell)))) return cell;
    merged++;
    return `${group} ${cell.trim()}`;
  });
  return merged >= 2 ? cells : null;
}

/** What stands under several groups: `Date` under `Purchase` and under `Sale` is told apart by them alone. */
function repeatedUnder(upper: readonly string[], lower: readonly string[]): ReadonlySet<string> {
  const groups = new Map<string, Set<string>>();
  let group = '';
  for (const [at, cell] of lower.entries()) {
    group = (upper[at] ?? '').trim() || group;
    const word = fold(cell);
    if (word !== '' && group !== '') groups.set(word, (groups.get(word) ?? new Set()).add(group));
  }
  return new Set([...groups].filter(([, over]) => over.size > 1).map(([word]) => word));
}

/** Headings above a row that only says which figure is which: `Parts` over two columns, `est` and `actual` below. null = none. */
export function overQualifiers(upper: readonly string[], lower: readonly string[]): string[] | null {
  const filled = lower.filter((cell) => cell.trim() !== '');
  if (filled.length < 2 || !filled.every((cell) => QUALIFIER.test(fold(cell)))) return null;
  let group = '';
  return Array.from({ length: Math.max(upper.length, lower.length) }, (_, at) => {
    group = (upper[at] ?? '').trim() || group;
    const below = (lower[at] ?? '').trim();
    return below === '' ? (upper[at] ?? '') : `${group} ${below}`;
  });
}

/** Headings with the units that a row of their own gives below them; null = that row holds something else. */
export function withUnits(headings: readonly string[], below: readonly string[]): string[] | null {
  const filled = below.filter((cell) => cell.trim() !== '');
  if (filled.length === 0 || !filled.every((cell) => UNIT.test(cell.trim()))) return null;
  return headings.map((heading, at) => {
    const unit = (below[at] ?? '').trim().replace(/^[([]|[)\]]$/g, '');
    return unit === '' ? heading : `${heading} (${unit})`;
  });
}
