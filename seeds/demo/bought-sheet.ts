import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import type { FeeTableFields } from '#shared/contracts/bids-parts.ts';
import type { BidFields } from '#shared/contracts/bids.ts';
import type { Estimate } from '#shared/contracts/estimates.ts';
import type { Rebuild } from '#shared/contracts/rebuilds.ts';
import { addDays, type Day } from '#shared/day.ts';
import type { BidOutcome } from '../../server/books/bid-sheets.ts';
import { estimateStore } from '../../server/books/estimates.ts';
import { rebuildStore } from '../../server/books/rebuilds.ts';
import type { ShopScope } from '../../server/books/scope.ts';
import { touchedBooks } from '../../server/books/touched.ts';
import { HELPER_SHARE } from './parameters.ts';
import { EMPTY } from './looked-at.ts';

/** A sheet with the day it was made on, how it is filled in, and how it ended. */
export interface MadeSheet {
  readonly on: Day;
  readonly fill: (basis: BidBasis) => BidFields;
  readonly outcome: Partial<BidOutcome>;
}

/** The sheet that the last car still in work was bought from: its locked estimate, as it stood the day before. */
export async function boughtSheet(scope: ShopScope, fees: FeeTableFields): Promise<MadeSheet> {
  const rebuilds = await rebuildStore(scope, touchedBooks()).list();
  const open = rebuilds.filter(({ soldOn, exitKind, boughtOn }) => soldOn === null && exitKind === null && boughtOn);
  const [last] = open.sort((a, b) => ((a.boughtOn ?? '') < (b.boughtOn ?? '') ? 1 : -1));
  if (!last?.boughtOn) throw new Error('The demo shop has no car in work');
  const [plan] = await estimateStore(scope, touchedBooks()).listOf(last.id);
  if (!plan) throw new Error(`${last.tag} has no estimate`);
  const { id: rebuildId, purchaseCents } = last;
  return {
    on: addDays(last.boughtOn, -1),
    fill: (basis) => ({ ...fieldsOf(last, plan, basis), ...fees, ...costsOf(plan, basis) }),
    outcome: { state: 'bought', bidMadeCents: purchaseCents, hammerCents: purchaseCents, rebuildId },
  };
}

function fieldsOf(rebuild: Rebuild, plan: Estimate, basis: BidBasis): Omit<BidFields, keyof FeeTableFields> {
  const { year, make, model, vin, odometer, classId, damageId, isSeen } = rebuild;
  const car = { year, make, model, vin, odometer, classId, damageId, isSeen };
  const seconds = plan.plannedSeconds ?? 0;
  const paidSeconds = Math.round((seconds * HELPER_SHARE) / 3600) * 3600;
  const placed = new Set(basis.categories.filter(({ place }) => place !== null).map(({ id }) => id));
  return {
    ...EMPTY,
    ticks: ['any-paper', 'any-wear'],
    ...car,
    name: `Lot 118, ${model ?? 'car'}`,
    seller: rebuild.boughtFrom,
    expectedSaleCents: plan.expectedSaleCents ?? 0,
    lines: plan.lines.filter(({ categoryId }) => !placed.has(categoryId)),
    days: plan.expectedDays ?? 0,
    ownSeconds: seconds - paidSeconds,
    paidSeconds,
    paidLaborCents: placedCents(plan, basis, 'paid labor'),
    wantedCentsPerHour: basis.wantedCentsPerHour ?? 0,
  };
}

/** What the estimate holds for that the sheet has fields of their own. */
function costsOf(plan: Estimate, basis: BidBasis) {
  return {
    transportCents: placedCents(plan, basis, 'transport'),
    titleCents: placedCents(plan, basis, 'title'),
    sellingCents: placedCents(plan, basis, 'selling'),
  };
}

function placedCents({ lines }: Estimate, { categories }: BidBasis, place: string): number {
  const placed = new Set(categories.filter((one) => one.place === place).map(({ id }) => id));
  return lines.reduce((total, { categoryId, cents }) => total + (placed.has(categoryId) ? cents : 0), 0);
}
