import type { Knex } from 'knex';
import type { ImportRow } from '#shared/contracts/imports.ts';
import type { ShopScope } from '../../books/scope.ts';

type BookedLine = ImportRow['lines'][number];
interface Place {
  readonly sheet: number;
  readonly row: number;
}

/** What rows of an import, from one to another, stand in the books as: entries and hours with their id, and facts. */
export async function bookedLines(
  scope: ShopScope,
  importId: string,
  [first, last]: readonly [Place, Place],
): Promise<BookedLine[]> {
  const places = await rebuildPlaces(scope, importId);
  const range = [first.sheet, first.row, last.sheet, last.row];
  const within = (query: Knex.QueryBuilder, prefix: string) =>
    query.whereRaw(`(${prefix}sheet, ${prefix}row) >= (?, ?) AND (${prefix}sheet, ${prefix}row) <= (?, ?)`, range);
  const entries: Row[] = await within(scope.table('entries').where('entries.import_id', importId), 'entries.import_')
    .join('categories', (join) =>
      join.on('categories.id', 'entries.category_id').on('categories.shop_id', 'entries.shop_id'),
    )
    .select('entries.*', 'categories.name as category');
  const hours: Row[] = await within(scope.table('hours').where('hours.import_id', importId), 'hours.import_')
    .leftJoin('workers', (join) => join.on('workers.id', 'hours.worker_id').on('workers.shop_id', 'hours.shop_id'))
    .select('hours.*', 'hours.worked_on as dated_on', 'hours.task as what', 'workers.name as person');
  const facts: Row[] = await within(
    scope.table('import_facts').where('import_facts.import_id', importId),
    'import_facts.',
  )
    .leftJoin('categories', (join) =>
      join.on('categories.id', 'import_facts.category_id').on('categories.shop_id', 'import_facts.shop_id'),
    )
    .select(
      'import_facts.*',
      'import_facts.sheet as import_sheet',
      'import_facts.row as import_row',
      'import_facts.col as import_col',
      'categories.name as category',
    );
  return [
    ...entries.map((row) => lineOf(row, 'entry', places)),
    ...hours.map((row) => lineOf(row, 'hours', places)),
    ...facts.map((row) => lineOf(row, row.kind as BookedLine['kind'], places)),
  ].sort((a, b) => a.sheet - b.sheet || a.row - b.row || a.col - b.col);
}

interface Row {
  readonly id?: string;
  readonly kind?: string;
  readonly rebuild_id: string | null;
  readonly category?: string | null;
  readonly dated_on: string | null;
  readonly cents?: number;
  readonly seconds?: number;
  readonly vendor?: string | null;
  readonly what?: string | null;
  readonly foreseen?: BookedLine['foreseen'];
  readonly is_extra?: number;
  readonly is_guess?: number;
  readonly person?: string | null;
  readonly import_sheet: number;
  readonly import_row: number;
  readonly import_col: number;
}

function lineOf(row: Row, kind: BookedLine['kind'], places: ReadonlyMap<string, number>): BookedLine {
  return {
    kind,
    entryId: row.id ?? null,
    rebuild: row.rebuild_id === null ? null : (places.get(row.rebuild_id) ?? null),
    category: row.category ?? null,
    on: row.dated_on,
    cents: row.cents ?? 0,
    seconds: row.seconds ?? 0,
    vendor: row.vendor ?? null,
    what: row.what ?? null,
    foreseen: row.foreseen ?? null,
    isExtra: row.is_extra === 1,
    person: row.person ?? null,
    isGuess: row.is_guess === 1,
    sheet: row.import_sheet,
    row: row.import_row,
    col: row.import_col,
  };
}

/** Rebuild → its place in the reading's list. */
async function rebuildPlaces(scope: ShopScope, importId: string): Promise<Map<string, number>> {
  const row: { ids: string | null } | undefined = await scope
    .table('imports')
    .where({ id: importId })
    .first(scope.db.raw(`json_extract(reading, '$.brought.rebuildIds') AS ids`));
  const ids = JSON.parse(row?.ids ?? '[]') as string[];
  return new Map(ids.map((id, place) => [id, place]));
}
