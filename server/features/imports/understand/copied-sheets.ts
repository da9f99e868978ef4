import type { Choice } from '#shared/contracts/import-reading.ts';
import type { SurveyedTable } from './file-plan.ts';

const MOST = 0.7;
const FEWEST_ROWS = 3;

/**
 * Finds sheets that repeat most rows of an earlier one, as copies and backups in a workbook do: their repeated rows are put
 * aside, unless a person says that they happened again. Gives the lines by sheet.
 */
export function copiedSheets(
  tables: readonly SurveyedTable[],
  answers: ReadonlyMap<string, string>,
): { lines: Map<number, Set<number>>; choices: Choice[] } {
  const lines = new Map<number, Set<number>>();
  const choices: Choice[] = [];
  const lists = tables.filter(({ guess }) => guess.shape !== null && guess.shape !== 'vehicles');
  lists.forEach(({ guess, found }, place) => {
    for (const earlier of lists.slice(0, place)) {
      // Sheets about different vehicles may hold the same bills.
      if (![...found.vehicles.keys()].some((name) => earlier.found.vehicles.has(name))) continue;
      const known = new Set(earlier.found.rows.hashes);
      const { hashes, lines: all } = found.rows;
      const same = all.filter((_, i) => known.has(hashes[i] as number));
      if (all.length < FEWEST_ROWS || same.length < all.length * MOST || lines.has(guess.sheet.number)) continue;
      const choice = choiceOf(guess.sheet, earlier.guess.sheet, same.length, answers);
      choices.push(choice);
      if (choice.answer !== 'both') lines.set(guess.sheet.number, new Set(same));
    }
  });
  return { lines, choices };
}

type Named = SurveyedTable['guess']['sheet'];

function choiceOf(sheet: Named, earlier: Named, rows: number, answers: ReadonlyMap<string, string>): Choice {
  const id = `sheets:${sheet.number}`;
  return {
    id,
    kind: 'sheets',
    column: null,
    question: `${rows} rows of “${sheet.name ?? ''}” stand on “${earlier.name ?? ''}” as well. Is it a copy?`,
    options: [
      { value: 'copy', label: 'yes: put its repeated rows aside' },
      { value: 'both', label: 'no: count both' },
    ],
    preset: 'copy',
    answer: answers.get(id) ?? null,
    mustAsk: true,
    why: 'Most of its rows are the same, day and amount included.',
  };
}
