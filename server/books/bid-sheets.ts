import type { Bid, BidFields, BidState } from '#shared/contracts/bids.ts';
import type { BidFigures } from '#shared/contracts/bids-parts.ts';
import { newId } from '../platform/ids.ts';
import { ProblemError } from '../platform/problems.ts';
import { fromRow } from '../platform/rows.ts';
import type { ShopScope } from './scope.ts';

/** A sheet with what it came to, and the version of the books that this was worked out on. */
export interface WorkedSheet {
  readonly fields: BidFields;
  readonly figures: BidFigures;
  readonly booksVersion: number;
}

/** How a sheet ended. */
export interface BidOutcome {
  readonly state: BidState;
  readonly reason: string | null;
  readonly bidMadeCents: number | null;
  readonly hammerCents: number | null;
  readonly rebuildId: string | null;
}

/** Fields with a column of their own, to be listed and held to the shop's words by; the rest is one JSON text. */
const COLUMNS = ['name', 'classId', 'damageId', 'secondDamageId', 'isSeen', 'expectedSaleCents'] as const;
type Column = (typeof COLUMNS)[number];

type Row = Pick<Bid, Column | 'id' | 'madeOn' | 'version' | 'rebuildTag' | 'madeByName'> &
  BidOutcome & { readonly fields: string; readonly figures: string };

/** The only writer of `bid_sheets`. */
export function bidStore(scope: ShopScope) {
  const rows = () =>
    scope
      .table('bid_sheets')
      .leftJoin('rebuilds', { 'rebuilds.shop_id': 'bid_sheets.shop_id', 'rebuilds.id': 'bid_sheets.rebuild_id' })
      .join('users', 'users.id', 'bid_sheets.made_by')
      .select('bid_sheets.*', 'rebuilds.tag as rebuild_tag', 'users.name as made_by_name');

  async function get(id: string): Promise<Bid> {
    const row: object | undefined = await rows().where('bid_sheets.id', id).first();
    if (!row) throw new ProblemError(404, { detail: 'There is no such thing in this shop.' });
    const { fields, figures, ...rest } = fromRow<Row>(row);
    const typed = JSON.parse(fields) as Omit<BidFields, Column>;
    return { ...typed, ...rest, figures: JSON.parse(figures) as BidFigures };
  }

  return {
    get,
    async create(sheet: WorkedSheet, { madeOn, madeBy }: { madeOn: string; madeBy: string }): Promise<Bid> {
      const id = newId();
      await scope.insert('bid_sheets', {
        ...rowOf(sheet),
        id,
        madeOn,
        madeBy,
        createdAt: new Date().toISOString(),
      });
      return get(id);
    },
    async update(id: string, version: number, sheet: WorkedSheet): Promise<Bid> {
      await scope.update('bid_sheets', id, version, rowOf(sheet));
      return get(id);
    },
    async setOutcome(id: string, version: number, outcome: BidOutcome): Promise<Bid> {
      await scope.update('bid_sheets', id, version, outcome);
      return get(id);
    },
  };
}

export type BidStore = ReturnType<typeof bidStore>;

function rowOf({ fields, figures, booksVersion }: WorkedSheet): object {
  const { name, classId, damageId, secondDamageId, isSeen, expectedSaleCents, ...rest } = fields;
  return {
    name,
    classId,
    damageId,
    secondDamageId,
    isSeen,
    expectedSaleCents,
    fields: JSON.stringify(rest),
    figures: JSON.stringify(figures),
    booksVersion,
  };
}
