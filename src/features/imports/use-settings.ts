import { useState } from 'react';
import type { ColumnChoice, Reading } from '#shared/contracts/import-reading.ts';
import type { Import, ImportSettings } from '#shared/contracts/imports.ts';

type At = Pick<ColumnChoice, 'sheet' | 'col'>;
const keyOf = ({ sheet = 1, col }: At) => `${sheet}-${col}`;

/**
 * What a person has said of a file but not sent yet: changed columns and answers. `settings` is null while nothing is
 * changed; `reset` forgets it.
 */
export function useSettings(file: Import) {
  const [columns, setColumns] = useState<ReadonlyMap<string, ColumnChoice>>(new Map());
  const [answers, setAnswers] = useState<ReadonlyMap<string, string>>(new Map());
  const count = columns.size + answers.size;
  return {
    count,
    columnOf: (at: At) => columns.get(keyOf(at)) ?? null,
    answerOf: (id: string) => answers.get(id) ?? null,
    setColumn: (choice: ColumnChoice) => setColumns((before) => new Map(before).set(keyOf(choice), choice)),
    setAnswer: (id: string, value: string) => setAnswers((before) => new Map(before).set(id, value)),
    settings: count === 0 || !file.reading ? null : settingsFrom(file.reading, columns, answers),
    reset() {
      setColumns(new Map());
      setAnswers(new Map());
    },
  };
}

export type Settings = ReturnType<typeof useSettings>;

function settingsFrom(
  reading: Reading,
  columns: ReadonlyMap<string, ColumnChoice>,
  answers: ReadonlyMap<string, string>,
): ImportSettings {
  return {
    ...(columns.size > 0
      ? {
          columns: reading.columns.map(
            ({ sheet, col, meaning, category }) =>
              columns.get(keyOf({ sheet, col })) ?? { sheet, col, meaning, category },
          ),
        }
      : {}),
    answers: Object.fromEntries(answers),
  };
}
