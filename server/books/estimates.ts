import type { Estimate, EstimateFields } from '#shared/contracts/estimates.ts';
import { newId } from '../platform/ids.ts';
import { impossible } from '../platform/problems.ts';
import { fromRow, type Patch } from '../platform/rows.ts';
import type { ShopScope } from './scope.ts';
import type { Touched } from './touched.ts';

/**
 * The only writer of `estimates` and their lines. Revision 0 is the plan; once locked it is the baseline for
 * ever, and whatever comes later is a revision beside it.
 */
export function estimateStore(scope: ShopScope, touched: Touched) {
  type Head = Omit<Estimate, 'lines'>;

  async function withLines(head: Head): Promise<Estimate> {
    const lines: object[] = await scope
      .table('estimate_lines')
      .where({ estimate_id: head.id })
      .select('category_id', 'cents');
    return { ...head, lines: lines.map((line) => fromRow(line)) };
  }

  const get = async (id: string) => withLines(await scope.get<Head>('estimates', id));

  async function writeLines(estimateId: string, lines: EstimateFields['lines']): Promise<void> {
    await scope.table('estimate_lines').where({ estimate_id: estimateId }).delete();
    await scope.insert(
      'estimate_lines',
      lines.map((line) => ({ ...line, estimateId })),
    );
  }

  return {
    get,
    /** All of a rebuild's, the plan first. */
    async listOf(rebuildId: string): Promise<Estimate[]> {
      const rows: object[] = await scope.table('estimates').where({ rebuild_id: rebuildId }).orderBy('revision');
      return Promise.all(rows.map((row) => withLines(fromRow<Head>(row))));
    },
    /** The plan if there is none yet, else a revision beside it (only once the plan is locked). */
    async create(rebuildId: string, fields: EstimateFields, madeOn: string): Promise<Estimate> {
      const earlier = await this.listOf(rebuildId);
      if (earlier.some((estimate) => estimate.revision === 0 && !estimate.lockedAt)) {
        throw impossible('', 'The plan is not locked yet: change it instead of revising it.');
      }
      const { lines, ...rest } = fields;
      const id = newId();
      await scope.insert('estimates', {
        ...rest,
        id,
        rebuildId,
        revision: earlier.length,
        madeOn,
        createdAt: new Date().toISOString(),
      });
      await writeLines(id, lines);
      touched.rebuild(rebuildId);
      return get(id);
    },
    async update(id: string, version: number, fields: Patch<EstimateFields>): Promise<Estimate> {
      const before = await get(id);
      if (before.lockedAt) throw impossible('', 'This estimate is locked. Add a revision beside it.');
      const { lines, ...rest } = fields;
      await scope.update('estimates', id, version, rest);
      if (lines) await writeLines(id, lines);
      touched.rebuild(before.rebuildId);
      return get(id);
    },
    /** Locks the plan: from now on every overrun is against it. */
    async lock(id: string, version: number): Promise<Estimate> {
      const before = await get(id);
      if (before.lockedAt) throw impossible('', 'This estimate is locked already.');
      await scope.update('estimates', id, version, {
        lockedAt: new Date().toISOString(),
        isBaseline: before.revision === 0,
      });
      touched.rebuild(before.rebuildId);
      return get(id);
    },
  };
}
