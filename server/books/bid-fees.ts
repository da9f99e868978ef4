import type { FeeTable, FeeTableFields } from '#shared/contracts/bids-parts.ts';
import { ProblemError } from '../platform/problems.ts';
import { fromRow, toRow } from '../platform/rows.ts';
import type { ShopScope } from './scope.ts';

/** What a shop has before it sets its own: no fees known, bids in steps of 50.00. */
const UNSET: FeeTable = {
  feeSteps: [],
  feeFlatCents: 0,
  bidStepCents: 5_000,
  tax: { p: 0, q: 1 },
  transportCents: 0,
  titleCents: 0,
  sellingCents: 0,
  holdingCentsPerDay: 0,
  wantedProfitCents: 0,
  version: 0,
};

type Row = Omit<FeeTable, 'feeSteps' | 'tax'> & { feeSteps: string; taxP: number; taxQ: number };

/** The only writer of `fee_tables`: one for each shop. */
export function feeTableStore(scope: ShopScope) {
  const find = async (): Promise<FeeTable> => {
    const row: object | undefined = await scope.table('fee_tables').first();
    if (!row) return UNSET;
    const { feeSteps, taxP: p, taxQ: q, ...rest } = fromRow<Row>(row);
    return { ...rest, feeSteps: JSON.parse(feeSteps) as FeeTable['feeSteps'], tax: { p, q } };
  };

  return {
    /** The shop's, or the empty one (version 0) that it begins with. */
    get: find,
    /** Puts the table in place of that version; 412 if someone was quicker. */
    async replace(version: number, { feeSteps, tax, ...rest }: FeeTableFields): Promise<FeeTable> {
      const before = await find();
      if (before.version !== version) {
        throw new ProblemError(412, {
          name: 'changed-meanwhile',
          detail: 'Someone changed the fee table since you opened it. Look at the new one, then save again.',
        });
      }
      const row = { ...rest, feeSteps: JSON.stringify(feeSteps), taxP: tax.p, taxQ: tax.q, version: version + 1 };
      if (version === 0) await scope.insert('fee_tables', row);
      else await scope.table('fee_tables').update(toRow(row));
      return find();
    },
  };
}
