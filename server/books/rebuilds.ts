import type { Rebuild, RebuildFields } from '#shared/contracts/rebuilds.ts';
import { newId } from '../platform/ids.ts';
import { ProblemError } from '../platform/problems.ts';
import { fromRow, type Patch } from '../platform/rows.ts';
import type { ShopScope } from './scope.ts';
import type { Touched } from './touched.ts';

type Source = Partial<Pick<Rebuild, 'importId' | 'importSheet' | 'importRow'>>;

/** The only writer of `rebuilds`. */
export function rebuildStore(scope: ShopScope, touched: Touched) {
  async function refuseTakenTag(tag: string, except?: string): Promise<void> {
    const other = await scope.table('rebuilds').whereRaw('tag = ? COLLATE NOCASE', [tag]).first<{ id: string }>('id');
    if (!other || other.id === except) return;
    throw new ProblemError(409, {
      detail: `The tag ${tag} is taken.`,
      errors: [{ pointer: '/tag', detail: 'Another rebuild has this tag.' }],
    });
  }

  return {
    get: (id: string) => scope.get<Rebuild>('rebuilds', id),
    find: (id: string) => scope.find<Rebuild>('rebuilds', id),
    async list(): Promise<Rebuild[]> {
      const rows: object[] = await scope.table('rebuilds').orderBy('tag');
      return rows.map((row) => fromRow<Rebuild>(row));
    },
    async create(fields: Patch<RebuildFields> & { tag: string } & Source): Promise<Rebuild> {
      await refuseTakenTag(fields.tag);
      const id = newId();
      await scope.insert('rebuilds', { ...fields, id, createdAt: new Date().toISOString() });
      touched.rebuild(id);
      return this.get(id);
    },
    async update(id: string, version: number, change: Patch<RebuildFields>): Promise<Rebuild> {
      if (change.tag !== undefined) await refuseTakenTag(change.tag, id);
      touched.rebuild(id);
      return scope.update<Rebuild>('rebuilds', id, version, change);
    },
  };
}
