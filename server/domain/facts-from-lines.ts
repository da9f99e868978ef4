import { type Day, dayNumber } from '#shared/day.ts';
import { annualReturn, hasFlows } from './annual-return.ts';
import type { CategoryFacts, RebuildFacts } from './facts.ts';
import { type Flow, netFlows } from './net-flows.ts';

/** One entry of one rebuild, as the books hold it. */
export interface Line {
  /** null = undated. */
  readonly on: Day | null;
  readonly category: string;
  readonly cents: number;
  /** false = a surprise; null = nobody said. */
  readonly isForeseen: boolean | null;
  /** Scope added by choice: in cost and profit, never in overrun or surprise. */
  readonly isExtra: boolean;
  /** Received free: its market value in cents (`cents` is 0 then). null = paid for. */
  readonly freeCents: number | null;
}

/** What the facts of a rebuild hold that does not come from its entries. */
export type RebuildFrame = Omit<
  RebuildFacts,
  | 'categories'
  | 'paidCents'
  | 'planningCents'
  | 'estimateCents'
  | 'paidLaborCents'
  | 'hasUnknownForeseen'
  | 'hasUndated'
  | 'surprisePlanningCents'
  | 'lateCount'
  | 'lateCents'
  | 'xirr'
>;

/** What planning must expect of an entry, cents (§18.1): market value if free, nothing for a chosen extra. */
export function planningValue(line: Line): number {
  return line.isExtra ? 0 : (line.freeCents ?? line.cents);
}

/** Is it a surprise: not foreseen, and not added by choice? */
function isSurprise(line: Line): boolean {
  return line.isForeseen === false && !line.isExtra;
}

/**
 * The facts of one rebuild, summed from its entries (definitions §18.1): the meaning that the rollup keeps, and that
 * a recount is checked with. `paidLaborCategory` names the category of wages; null = the shop has none.
 */
export function factsFromLines(
  frame: RebuildFrame,
  lines: readonly Line[],
  paidLaborCategory: string | null,
): RebuildFacts {
  const exitOn = frame.exit?.on ?? null;
  const late = lines.filter(({ on, cents }) => cents !== 0 && on !== null && exitOn !== null && on > exitOn);
  const categories = new Map<string, CategoryFacts>();
  for (const line of lines) categories.set(line.category, addLine(categories.get(line.category), line));
  const facts: RebuildFacts = {
    ...frame,
    categories,
    paidCents: lines.reduce((total, line) => total + line.cents, 0),
    planningCents: lines.reduce((total, line) => total + planningValue(line), 0),
    estimateCents: [...frame.estimates.values()].reduce((total, cents) => total + cents, 0),
    paidLaborCents: paidLaborCategory === null ? 0 : (categories.get(paidLaborCategory)?.paidCents ?? 0),
    hasUnknownForeseen: lines.some((line) => line.isForeseen === null),
    hasUndated: lines.some((line) => line.on === null),
    surprisePlanningCents: lines
      .filter(isSurprise)
      .reduce((total, line) => total + Math.max(0, planningValue(line)), 0),
    lateCount: late.length,
    lateCents: late.reduce((total, line) => total + line.cents, 0),
    xirr: null,
  };
  return hasFlows(facts) ? { ...facts, xirr: annualReturn(netFlows(flowsOf(facts, lines))) } : facts;
}

/** Money out and in of one rebuild by day (§3): purchase, entries, proceeds. Only for one that `hasFlows`. */
export function flowsOf(frame: RebuildFrame, lines: readonly Line[]): Flow[] {
  const flows: Flow[] = [];
  if (frame.boughtOn !== null) flows.push({ day: dayNumber(frame.boughtOn), cents: -(frame.purchaseCents ?? 0) });
  for (const { on, cents } of lines) if (on !== null) flows.push({ day: dayNumber(on), cents: -cents });
  if (frame.exit !== null) flows.push({ day: dayNumber(frame.exit.on), cents: frame.exit.proceedsCents });
  return flows;
}

function addLine(sums: CategoryFacts | undefined, line: Line): CategoryFacts {
  const surprise = isSurprise(line);
  return {
    paidCents: (sums?.paidCents ?? 0) + line.cents,
    planningCents: (sums?.planningCents ?? 0) + planningValue(line),
    unforeseenCents: (sums?.unforeseenCents ?? 0) + (surprise ? line.cents : 0),
    surpriseCount: (sums?.surpriseCount ?? 0) + (surprise && line.cents > 0 ? 1 : 0),
    extraCents: (sums?.extraCents ?? 0) + (line.isExtra ? line.cents : 0),
    freeCents: (sums?.freeCents ?? 0) + (line.freeCents ?? 0),
    entryCount: (sums?.entryCount ?? 0) + 1,
  };
}
