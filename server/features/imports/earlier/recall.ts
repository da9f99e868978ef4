import type { Choice, Column, Reading } from '#shared/contracts/import-reading.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';
import type { Sheet } from '../sheets/sheet.ts';
import { readHead } from '../understand/head.ts';
import { placedId } from '../understand/placed-id.ts';
import { headingPrint } from './match-rows.ts';
import type { PastSheet } from './past.ts';

/** What people said of earlier files with the same headings, together with what they say of this one. */
export interface Recalled {
  readonly settings: ImportSettings;
  readonly from: Reading['rememberedFrom'];
  /** Says where a column's meaning, or an answer, comes from. */
  columnSaid(column: Column): Column;
  choiceSaid(choice: Choice): Choice;
}

// Answers that the headings or words of a file call for, whatever its rows hold. Others are asked of every file.
const PLACED = /^(date-order|columns):(?:(\d+)\.)?(\d+)$/;
const OF_WORDS = /^category:/;

/** Takes over what was said of the latest file with the same headings, sheet by sheet. What is said now goes before. */
export function recall(
  sheets: readonly Sheet[],
  past: readonly PastSheet[],
  settings: ImportSettings,
  thisYear: number,
): Recalled {
  const columns = new Map<string, NonNullable<ImportSettings['columns']>[number]>();
  const answers = new Map<string, string>();
  let latest: PastSheet | null = null;
  for (const sheet of past.length === 0 ? [] : sheets) {
    const then = lastOfKind(sheet, past, thisYear);
    if (!then) continue;
    const said = then.settings();
    const before = columns.size + answers.size;
    for (const column of said.columns ?? []) {
      if ((column.sheet ?? 1) === then.sheet)
        columns.set(`${sheet.number}.${column.col}`, { ...column, sheet: sheet.number });
    }
    for (const [id, answer] of Object.entries(said.answers ?? {})) {
      const today = idToday(id, then.sheet, sheet.number);
      if (today !== null) answers.set(today, answer);
    }
    if (columns.size + answers.size > before && (latest === null || latest.committedAt < then.committedAt))
      latest = then;
  }
  for (const { sheet = 1, col } of settings.columns ?? []) columns.delete(`${sheet}.${col}`);
  for (const id of Object.keys(settings.answers ?? {})) answers.delete(id);
  if (latest === null || columns.size + answers.size === 0) return nothing(settings);
  const words = `as you said for “${latest.fileName}” on ${latest.committedAt.slice(0, 10)}`;
  return {
    settings: {
      ...settings,
      columns: [...(settings.columns ?? []), ...columns.values()],
      answers: { ...Object.fromEntries(answers), ...settings.answers },
    },
    from: { importId: latest.importId, fileName: latest.fileName },
    columnSaid: (column) => (columns.has(`${column.sheet}.${column.col}`) ? { ...column, why: words } : column),
    choiceSaid: (choice) => (answers.has(choice.id) ? { ...choice, why: `Answered ${words}.` } : choice),
  };
}

const nothing = (settings: ImportSettings): Recalled => ({
  settings,
  from: null,
  columnSaid: (column) => column,
  choiceSaid: (choice) => choice,
});

function lastOfKind(sheet: Sheet, past: readonly PastSheet[], thisYear: number): PastSheet | null {
  const { heading, last } = readHead(sheet, thisYear);
  const print = heading && headingPrint({ line: heading.line, last, cells: heading.cells });
  return print ? (past.findLast(({ headingPrint: then }) => then === print) ?? null) : null;
}

/** The id that a question of a sheet then has on today's sheet; null = it is asked anew. */
function idToday(id: string, then: number, now: number): string | null {
  if (OF_WORDS.test(id)) return id;
  const [, kind, sheet = '1', col] = PLACED.exec(id) ?? [];
  return kind !== undefined && Number(sheet) === then ? placedId(kind, now, Number(col)) : null;
}
