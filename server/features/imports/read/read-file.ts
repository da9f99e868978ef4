import type { Aside, FirstRow, Reading } from '#shared/contracts/import-reading.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';
import type { ShopBooks } from '../books.ts';
import { FileRefusal } from '../refusal.ts';
import type { GivenFile } from '../sheets/open-files.ts';
import { type Understanding, understand } from '../understand/understand.ts';
import { emptyControl } from './empty-control.ts';
import { overwrittenRemark } from './overwritten.ts';
import { type DraftLine, type FilePlan, lineOf, type Plan } from './plan.ts';
import { asidesOf } from './asides.ts';
import { readRows } from './read-rows.ts';

const FIRST_ROWS = 200;
const MOST_ASIDES = 5_000;

/** Reads files for people to look at: nothing is booked. A refusal is part of the reading, never thrown. */
export function readFile(
  files: readonly GivenFile[],
  books: ShopBooks,
  settings: ImportSettings = {},
  onPart?: (share: number) => void,
): Reading {
  try {
    const understood = understand(files, books, settings);
    return understood.plan === null ? refusedReading(understood) : previewOf(understood, understood.plan, onPart);
  } catch (error) {
    if (!(error instanceof FileRefusal)) throw error;
    return refusedReading({
      format: { encoding: '', delimiter: '', decimal: '.', headingRow: null },
      sheets: [],
      columns: [],
      hints: [],
      choices: [],
      settings,
      rememberedFrom: null,
      plan: null,
      refusal: { kind: error.kind, message: error.message, row: error.row },
    });
  }
}

function previewOf(understood: Understanding, plan: FilePlan, onPart?: (share: number) => void): Reading {
  const firstRows: (Omit<FirstRow, 'lines'> & { lines: readonly DraftLine[] })[] = [];
  const asides: Aside[] = [];
  let asideCount = 0;
  let ragged = 0;
  const tables = new Map(plan.tables.map((table) => [table.sheet.number, table]));
  const widths = new Map(plan.tables.map(({ sheet, heading }) => [sheet.number, heading.cells.length]));
  const read = readRows(
    plan,
    {
      row(raw, line, result, sheet, cells) {
        if (cells.length > (widths.get(sheet) || Number.POSITIVE_INFINITY) && result.outcome === 'taken') ragged++;
        if (firstRows.length < FIRST_ROWS && result.reason !== 'blank') {
          firstRows.push({
            sheet,
            row: line,
            cells: raw.map((cell) => cell.slice(0, 500)),
            outcome: result.outcome,
            reason: result.reason,
            lines: result.lines,
          });
        }
        if (result.outcome === 'taken' && result.cells.length === 0) return;
        const made = asidesOf(cells, line, result, tables.get(sheet) as Plan);
        asideCount += made.length;
        if (asides.length < MOST_ASIDES) asides.push(...made);
      },
    },
    onPart,
  );
  const { format, sheets, columns, choices, hints } = understood;
  return {
    format,
    sheets: [...sheets],
    columns: [...columns],
    choices: [...choices],
    shape: plan.shape,
    refusal: null,
    rebuilds: read.drafts.map((draft) => draft.found),
    firstRows: firstRows.map((row) => ({ ...row, lines: row.lines.map((line) => lineOf(line, row.sheet)) })),
    asides,
    asideCount,
    notData: read.notData,
    statedTotals: [...read.statedTotals],
    control: read.control,
    remarks: [raggedRemark(ragged), overwrittenRemark(read.drafts)].filter((remark) => remark !== null),
    hints: [...hints],
    earlier: [...plan.earlier],
    rememberedFrom: understood.rememberedFrom,
  };
}

const raggedRemark = (rows: number) =>
  rows === 0
    ? null
    : `${rows} rows have more cells than there are headings; what stands beyond the headings is kept with the rows and not booked.`;

function refusedReading(understood: Understanding): Reading {
  return {
    format: understood.format,
    sheets: [...understood.sheets],
    columns: [...understood.columns],
    choices: [],
    shape: null,
    refusal: understood.refusal,
    rebuilds: [],
    firstRows: [],
    asides: [],
    asideCount: 0,
    notData: {},
    statedTotals: [],
    control: emptyControl(),
    remarks: [],
    hints: [...understood.hints],
    earlier: [],
    rememberedFrom: understood.rememberedFrom,
  };
}
