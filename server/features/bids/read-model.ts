import { type BidBasis, bidBasisSchema } from '#shared/contracts/bids-basis.ts';
import { bidsApi } from '#shared/contracts/bids.ts';
import type { FeeTable } from '#shared/contracts/bids-parts.ts';
import type { Day } from '#shared/day.ts';
import { asOf } from '../../books/facts-as-of.ts';
import { type KeptReply, keptReply } from '../../books/kept-replies.ts';
import { readRules } from '../../books/rules.ts';
import type { Named, NamedCategory, ShopFacts } from '../../books/shop-facts.ts';
import { sheetPlace } from '../../domain/sheet-places.ts';
import type { SurpriseEntry } from '../../domain/surprise-groups.ts';
import { shopYearOf } from '../../domain/years.ts';
import type { Database, RawDatabase } from '../../platform/database.ts';
import type { BasisInput } from './basis-input.ts';
import { bidBasis } from './basis.ts';

/** Where and when a basis is asked for. `feeTable` is read by its store. */
export interface BasisAsked {
  readonly shopId: string;
  readonly today: Day;
  readonly feeTable: FeeTable;
}

/** The basis as text, kept like the answers until the books change. */
export function keptBasis(database: Database, { shopId, today, feeTable }: BasisAsked): Promise<KeptReply> {
  const question = `${today} ${bidsApi.basis.path} ${feeTable.version}`;
  return keptReply(database, { shopId, question }, (raw, facts) =>
    JSON.stringify(bidBasisSchema.parse(bidBasis({ ...readInput(raw, facts, today), feeTable }))),
  );
}

/** The very basis that a browser gets: what it showed and what is kept are worked out from the same text. */
export async function basisNow(database: Database, asked: BasisAsked): Promise<BidBasis> {
  return bidBasisSchema.parse(JSON.parse((await keptBasis(database, asked)).text));
}

function readInput(raw: RawDatabase, facts: ShopFacts, today: Day): Omit<BasisInput, 'feeTable'> {
  const year = shopYearOf(today, facts.startMonth);
  return {
    shop: asOf(facts, today),
    today,
    ruleInForce: readRules(raw, facts.shopId).find((rule) => rule.year === year) ?? null,
    surprises: raw.prepare(SURPRISES).all(facts.shopId) as SurpriseEntry[],
    words: readWords(raw, facts),
  };
}

// The partial index of the surprises: they are few, the entries many.
const SURPRISES = `
  SELECT e.rebuild_id AS rebuildId, c.name AS category, e.what, e.cents
  FROM entries e INDEXED BY entries_surprises
  JOIN categories c ON c.shop_id = e.shop_id AND c.id = e.category_id
  WHERE e.shop_id = ? AND e.foreseen = 'surprise' AND e.voided_at IS NULL AND e.is_extra = 0 AND e.cents > 0
    AND e.rebuild_id IS NOT NULL
  ORDER BY e.dated_on, e.id`;

function readWords(raw: RawDatabase, facts: ShopFacts): BasisInput['words'] {
  const retired = (table: string) =>
    new Set(raw.prepare(`SELECT id FROM ${table} WHERE shop_id = ? AND is_retired = 1`).pluck().all(facts.shopId));
  const words = (table: string, list: readonly Named[]) => {
    const gone = retired(table);
    return list.map(({ id, name }) => ({ id, name, isRetired: gone.has(id) }));
  };
  const places = new Map(facts.categories.map((category: NamedCategory) => [category.id, sheetPlace(category)]));
  return {
    classes: words('vehicle_classes', facts.classes),
    damages: words('damage_types', facts.damages),
    categories: words('categories', facts.categories).map((one) => ({ ...one, place: places.get(one.id) ?? null })),
  };
}
