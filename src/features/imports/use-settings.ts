import { useMemo, useState } from 'react';
import type { ColumnChoice, Reading } from '#shared/contracts/import-reading.ts';
import type { CellEdit, Import, ImportSettings } from '#shared/contracts/imports.ts';
import { cellKey, type Place, rowKey } from './place.ts';

type Column = Pick<ColumnChoice, 'sheet' | 'col'>;
type Row = Pick<Place, 'sheet' | 'row'>;
type Cell = Omit<CellEdit, 'text'>;
const columnKey = ({ sheet = 1, col }: Column) => `${sheet}-${col}`;

/** What was changed and is not sent yet. A cell without text, and a row that is not out, withdraws what was said before. */
interface Draft {
  readonly columns: ReadonlyMap<string, ColumnChoice>;
  readonly answers: ReadonlyMap<string, string>;
  readonly cells: ReadonlyMap<string, Cell & { readonly text: string | null }>;
  readonly rows: ReadonlyMap<string, Row & { readonly isOut: boolean }>;
}
const NOTHING: Draft = { columns: new Map(), answers: new Map(), cells: new Map(), rows: new Map() };

/**
 * What a person says of a file: what was sent before, and what is changed but not sent yet: columns, answers, cells put
 * right, rows left out. `settings` is null while nothing is changed; `reset` forgets it.
 */
export function useSettings(file: Import) {
  const [draft, setDraft] = useState(NOTHING);
  return useMemo(() => {
    const sent = sentOf(file.settings);
    const put = <Name extends keyof Draft>(name: Name, change: (before: Draft[Name]) => Draft[Name]) =>
      setDraft((before) => ({ ...before, [name]: change(before[name]) }));
    const { columns, answers, cells, rows } = draft;
    const corrections = cells.size + rows.size;
    const count = columns.size + answers.size + corrections;
    return {
      count,
      /** Are all of them cells put right and rows left out? */
      areCorrections: count === corrections,
      columnOf: (at: Column) => columns.get(columnKey(at)) ?? null,
      answerOf: (id: string) => answers.get(id) ?? null,
      /** The corrected text of a cell; null = it stands as in the file. */
      textOf(at: Cell): string | null {
        const own = cells.get(cellKey(at));
        return own ? own.text : (sent.cells.get(cellKey(at))?.text ?? null);
      },
      isLeftOut: (at: Row) => rows.get(rowKey(at))?.isOut ?? sent.rows.has(rowKey(at)),
      /** Is something about this row changed and not sent yet? */
      isChanged: (at: Row) => rows.has(rowKey(at)) || [...cells.values()].some((cell) => rowKey(cell) === rowKey(at)),
      setColumn: (choice: ColumnChoice) => put('columns', (before) => new Map(before).set(columnKey(choice), choice)),
      setAnswer: (id: string, value: string) => put('answers', (before) => new Map(before).set(id, value)),
      /** Puts a cell right; null, or what stands in the file (`raw`), lets it stand. */
      setText({ sheet, row, col }: Cell, text: string | null, raw: string) {
        const at = { sheet, row, col };
        const wanted = text === raw ? null : text;
        const before = sent.cells.get(cellKey(at))?.text ?? null;
        put('cells', (all) => withOrWithout(all, cellKey(at), wanted === before ? null : { ...at, text: wanted }));
      },
      setLeftOut({ sheet, row }: Row, isOut: boolean) {
        const at = { sheet, row };
        const isSame = isOut === sent.rows.has(rowKey(at));
        put('rows', (all) => withOrWithout(all, rowKey(at), isSame ? null : { ...at, isOut }));
      },
      settings: count === 0 || !file.reading ? null : settingsFrom(file.settings, file.reading, draft),
      reset: () => setDraft(NOTHING),
    };
  }, [draft, file]);
}

export type Settings = ReturnType<typeof useSettings>;

function sentOf({ cells = [], leftOut = [] }: ImportSettings) {
  return {
    cells: new Map(cells.map((cell) => [cellKey(cell), cell])),
    rows: new Map(leftOut.map((row) => [rowKey(row), row])),
  };
}

function withOrWithout<T>(all: ReadonlyMap<string, T>, key: string, value: T | null): ReadonlyMap<string, T> {
  const after = new Map(all);
  if (value === null) after.delete(key);
  else after.set(key, value);
  return after;
}

function settingsFrom(before: ImportSettings, reading: Reading, draft: Draft): ImportSettings {
  const sent = sentOf(before);
  const cells = new Map<string, Cell & { text: string | null }>([...sent.cells, ...draft.cells]);
  const rows = new Map<string, Row & { isOut: boolean }>([
    ...[...sent.rows].map(([key, row]) => [key, { ...row, isOut: true }] as const),
    ...draft.rows,
  ]);
  return {
    ...(draft.columns.size > 0 ? { columns: columnsFrom(reading, draft) } : {}),
    ...(draft.answers.size > 0 ? { answers: Object.fromEntries(draft.answers) } : {}),
    ...(draft.cells.size > 0
      ? { cells: [...cells.values()].flatMap(({ text, ...at }) => (text === null ? [] : [{ ...at, text }])) }
      : {}),
    ...(draft.rows.size > 0 ? { leftOut: [...rows.values()].flatMap(({ isOut, ...at }) => (isOut ? [at] : [])) } : {}),
  };
}

const columnsFrom = (reading: Reading, { columns }: Draft): ColumnChoice[] =>
  reading.columns.map(
    ({ sheet, col, meaning, category }) => columns.get(columnKey({ sheet, col })) ?? { sheet, col, meaning, category },
  );
