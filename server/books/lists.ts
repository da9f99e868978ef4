import type { Category, ListItem, ListKind, Lists, Worker } from '#shared/contracts/shop.ts';
import { DEFAULT_CATEGORIES, DEFAULT_CLASSES, DEFAULT_DAMAGES } from '#shared/vocabulary.ts';
import { newId } from '../platform/ids.ts';
import { ProblemError } from '../platform/problems.ts';
import { fromRow, type Patch } from '../platform/rows.ts';
import type { ShopScope } from './scope.ts';

const TABLES = { classes: 'vehicle_classes', damages: 'damage_types', categories: 'categories' } as const;

/** A shop's own words to start with. */
export interface StartingLists {
  readonly classes: readonly string[];
  readonly damages: readonly string[];
  readonly categories: readonly { readonly name: string; readonly isPaidLabor?: boolean }[];
}

export const DEFAULT_LISTS: StartingLists = {
  classes: DEFAULT_CLASSES,
  damages: DEFAULT_DAMAGES,
  categories: DEFAULT_CATEGORIES,
};

/** The only writer of a shop's classes, damage types, categories and workers. They are retired, never removed. */
export function listStore(scope: ShopScope) {
  async function rowsOf<T>(table: string, order: string): Promise<T[]> {
    const rows: object[] = await scope.table(table).orderBy(order);
    return rows.map((row) => fromRow<T>(row));
  }

  async function refuseTakenName(table: string, name: string, except?: string): Promise<void> {
    const other = await scope.table(table).whereRaw('name = ? COLLATE NOCASE', [name]).first<{ id: string }>('id');
    if (!other || other.id === except) return;
    throw new ProblemError(409, {
      detail: `${name} stands in the list already.`,
      errors: [{ pointer: '/name', detail: 'This name is taken.' }],
    });
  }

  /** Numbers a list anew from 0, with the moved word at its place. The others only make room: their version stays. */
  async function makeRoom(table: string, moved: ListItem): Promise<void> {
    const others: { id: string }[] = await scope
      .table(table)
      .whereNot({ id: moved.id })
      .orderBy('position')
      .select('id');
    const order = others.toSpliced(moved.position, 0, moved);
    for (const [position, { id }] of order.entries()) await scope.table(table).where({ id }).update({ position });
  }

  return {
    async all(): Promise<Lists> {
      return {
        classes: await rowsOf<ListItem>('vehicle_classes', 'position'),
        damages: await rowsOf<ListItem>('damage_types', 'position'),
        categories: await rowsOf<Category>('categories', 'position'),
        workers: await rowsOf<Worker>('workers', 'name'),
      };
    },
    /** Fills the lists of a new shop. */
    async start(lists: StartingLists): Promise<void> {
      const numbered = (names: readonly { name: string }[]) =>
        names.map((item, position) => ({ ...item, id: newId(), position }));
      await scope.insert('vehicle_classes', numbered(lists.classes.map((name) => ({ name }))));
      await scope.insert('damage_types', numbered(lists.damages.map((name) => ({ name }))));
      await scope.insert(
        'categories',
        numbered(lists.categories.map(({ name, isPaidLabor = false }) => ({ name, isPaidLabor }))),
      );
    },
    getItem: (kind: ListKind, id: string) => scope.get<ListItem>(TABLES[kind], id),
    async addItem(kind: ListKind, name: string): Promise<ListItem> {
      const table = TABLES[kind];
      await refuseTakenName(table, name);
      const last = await scope.table(table).max<{ most: number | null }>('position as most').first();
      const id = newId();
      await scope.insert(table, { id, name, position: (last?.most ?? -1) + 1 });
      return scope.get<ListItem>(table, id);
    },
    async changeItem(kind: ListKind, id: string, version: number, change: Patch<ListItem>): Promise<ListItem> {
      if (change.name !== undefined) await refuseTakenName(TABLES[kind], change.name, id);
      const changed = await scope.update<ListItem>(TABLES[kind], id, version, change);
      if (change.position === undefined) return changed;
      await makeRoom(TABLES[kind], changed);
      return scope.get<ListItem>(TABLES[kind], id);
    },
    getWorker: (id: string) => scope.get<Worker>('workers', id),
    async addWorker(worker: { name: string; isPaid: boolean; userId?: string | null }): Promise<Worker> {
      await refuseTakenName('workers', worker.name);
      const id = newId();
      await scope.insert('workers', { ...worker, id });
      return scope.get<Worker>('workers', id);
    },
    async changeWorker(id: string, version: number, change: Patch<Worker>): Promise<Worker> {
      if (change.name !== undefined) await refuseTakenName('workers', change.name, id);
      return scope.update<Worker>('workers', id, version, change);
    },
  };
}
