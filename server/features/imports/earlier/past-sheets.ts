import type { Shape } from '#shared/contracts/import-words.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';
import type { RawDatabase } from '../../../platform/database.ts';
import { type PastSheet, printsFromBytes } from './past.ts';

const SHEETS = `
  SELECT s.import_id, s.sheet, s.shape, s.headings, s.heading_print, i.file_name, i.committed_at
  FROM import_sheets s JOIN imports i ON i.shop_id = s.shop_id AND i.id = s.import_id
  WHERE s.shop_id = ? AND i.state = 'committed' ORDER BY i.committed_at, s.import_id, s.sheet`;
const REBUILDS = `
  SELECT import_row, rebuild_id FROM entries WHERE shop_id = @shop AND import_id = @import AND import_sheet = @sheet
    AND rebuild_id IS NOT NULL
  UNION SELECT row, rebuild_id FROM import_facts WHERE shop_id = @shop AND import_id = @import AND sheet = @sheet
  UNION SELECT import_row, id FROM rebuilds WHERE shop_id = @shop AND import_id = @import AND import_sheet = @sheet`;

interface SheetRow {
  readonly import_id: string;
  readonly sheet: number;
  readonly shape: Shape;
  readonly headings: string | null;
  readonly heading_print: string | null;
  readonly file_name: string;
  readonly committed_at: string;
}

/** The sheets of a shop's committed imports, oldest first. */
export function pastSheets(raw: RawDatabase, shopId: string): PastSheet[] {
  const ofImport = (column: string, importId: string) =>
    raw.prepare(`SELECT ${column} FROM imports WHERE shop_id = ? AND id = ?`).pluck().get(shopId, importId) as
      | string
      | null;
  return (raw.prepare(SHEETS).all(shopId) as SheetRow[]).map((row): PastSheet => {
    const importId = row.import_id;
    const own = { shop: shopId, import: importId, sheet: row.sheet };
    return {
      importId,
      fileName: row.file_name,
      committedAt: row.committed_at,
      sheet: row.sheet,
      shape: row.shape,
      headings: row.headings === null ? null : (JSON.parse(row.headings) as string[]),
      headingPrint: row.heading_print,
      settings: () => JSON.parse(ofImport('mapping', importId) ?? '{}') as ImportSettings,
      prints: () =>
        printsFromBytes(
          raw
            .prepare(
              'SELECT prints FROM import_sheets WHERE shop_id = @shop AND import_id = @import AND sheet = @sheet',
            )
            .pluck()
            .get(own) as Buffer,
        ),
      cellsOf(rows) {
        const cells = raw
          .prepare('SELECT cells FROM import_rows WHERE shop_id = ? AND import_id = ? AND sheet = ? AND row = ?')
          .pluck();
        const found = rows.map((line) => [line, cells.get(shopId, importId, row.sheet, line) as string] as const);
        return new Map(found.map(([line, text]) => [line, JSON.parse(text) as string[]]));
      },
      rebuilds: () => new Map(raw.prepare(REBUILDS).raw().all(own) as [number, string][]),
      vehicles() {
        const kept = ofImport(`json_extract(reading, '$.brought.vehicles')`, importId);
        return new Map(Object.entries(kept === null ? {} : (JSON.parse(kept) as Record<string, string>)));
      },
    };
  });
}
