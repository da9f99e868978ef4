import type { z } from 'zod';
import type { CategoryOutcome } from '#shared/contracts/rebuild-outcome.ts';
import type { Rebuild, rebuildDetailSchema } from '#shared/contracts/rebuilds.ts';
import type { Day } from '#shared/day.ts';
import type { CautionFacts } from '#shared/trade-cautions.ts';
import { checkVin } from '#shared/vin.ts';
import { estimateStore } from '../../books/estimates.ts';
import type { ShopScope } from '../../books/scope.ts';
import { touchedBooks } from '../../books/touched.ts';
import { fromRow } from '../../platform/rows.ts';
import { cautionsFor } from './cautions.ts';
import { dateWarnings } from './date-warnings.ts';
import { rebuildRow } from './rows.ts';
import { stageDays } from './stage-days.ts';

type Detail = z.input<typeof rebuildDetailSchema>;
type Kept = Pick<Detail, 'paidSeconds' | 'undatedCount' | 'unknownForeseenCount' | 'lateCount' | 'lateCents'>;

/** Everything the page of one rebuild shows but its entries and hours, which are lists of their own. */
export async function rebuildDetail(scope: ShopScope, id: string, today: Day): Promise<Detail> {
  const rebuild = await scope.get<Rebuild>('rebuilds', id);
  const row = await rebuildRow(scope, today, id);
  const estimates = await estimateStore(scope, touchedBooks()).listOf(id);
  const categories = await categoryOutcomes(scope, id);
  const second = rebuild.secondDamageId
    ? await scope.get<{ name: string }>('damage_types', rebuild.secondDamageId)
    : null;
  const plan = estimates.find((estimate) => estimate.isBaseline) ?? estimates[0];
  return {
    rebuild,
    row,
    secondDamageName: second?.name ?? null,
    vinCheck: vinCheckOf(rebuild.vin),
    warnings: dateWarnings(rebuild, today),
    cautions: cautionsFor(await cautionFacts(scope, id, [row.damageName, second?.name], categories)),
    estimates,
    categories,
    stageDays: stageDays(rebuild),
    plannedSeconds: plan?.plannedSeconds ?? null,
    source: await sourceOf(scope, rebuild),
    ...(await keptSums(scope, id)),
  };
}

function vinCheckOf(vin: string | null): Detail['vinCheck'] {
  if (!vin) return null;
  const { isValid, problem, suggestions } = checkVin(vin);
  return { isValid, problem, suggestions: [...suggestions] };
}

async function keptSums(scope: ShopScope, id: string): Promise<Kept> {
  const row: object | undefined = await scope
    .table('rollup_rebuilds')
    .where({ rebuild_id: id })
    .first('paid_seconds', 'undated_count', 'unknown_foreseen_count', 'late_count', 'late_cents');
  const nothing = { paidSeconds: null, undatedCount: 0, unknownForeseenCount: 0, lateCount: 0, lateCents: 0 };
  return row ? fromRow<Kept>(row) : nothing;
}

const CATEGORIES = `
  SELECT c.id AS category_id, c.name,
    CASE WHEN EXISTS (SELECT 1 FROM estimates WHERE shop_id = :shop AND rebuild_id = :id AND is_baseline = 1)
      THEN coalesce(l.cents, 0) END AS estimate_cents,
    coalesce(k.paid_cents, 0) AS paid_cents, coalesce(k.planning_cents, 0) AS planning_cents,
    coalesce(k.unforeseen_cents, 0) AS surprise_cents, coalesce(k.extra_cents, 0) AS extra_cents,
    coalesce(k.free_cents, 0) AS free_cents, coalesce(k.entry_count, 0) AS entry_count
  FROM categories c
  LEFT JOIN rollup_categories k ON k.shop_id = c.shop_id AND k.category_id = c.id AND k.rebuild_id = :id
  LEFT JOIN (SELECT l.category_id, l.cents FROM estimate_lines l
    JOIN estimates s ON s.shop_id = l.shop_id AND s.id = l.estimate_id
    WHERE s.shop_id = :shop AND s.rebuild_id = :id AND s.is_baseline = 1) l ON l.category_id = c.id
  WHERE c.shop_id = :shop AND (k.entry_count > 0 OR l.cents > 0)
  ORDER BY c.position`;

/** Locked plan against actual for every category that was planned or spent in, in the shop's own order. */
async function categoryOutcomes(scope: ShopScope, id: string): Promise<CategoryOutcome[]> {
  const rows: object[] = await scope.db.raw(CATEGORIES, { shop: scope.shopId, id });
  return rows.map((row) => fromRow<CategoryOutcome>(row));
}

async function cautionFacts(
  scope: ShopScope,
  id: string,
  damages: readonly (string | null | undefined)[],
  categories: readonly CategoryOutcome[],
): Promise<CautionFacts> {
  const what: { what: string }[] = await scope
    .table('entries')
    .where({ rebuild_id: id })
    .whereNull('voided_at')
    .whereNotNull('what')
    .distinct('what');
  return {
    damages: damages.filter((name) => name != null),
    categories: categories.map((category) => category.name),
    entries: what.map((entry) => entry.what),
  };
}

async function sourceOf(scope: ShopScope, rebuild: Rebuild): Promise<Detail['source']> {
  if (!rebuild.importId) return null;
  const file = await scope.get<{ fileName: string }>('imports', rebuild.importId);
  return { importId: rebuild.importId, fileName: file.fileName, row: rebuild.importRow };
}
