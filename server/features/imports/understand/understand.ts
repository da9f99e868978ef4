import type { Hint } from '#shared/contracts/import-beside.ts';
import type { Choice, Column, Reading, SheetFound } from '#shared/contracts/import-reading.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';
import type { ShopBooks } from '../books.ts';
import { recall } from '../earlier/recall.ts';
import type { FilePlan } from '../read/plan.ts';
import { FileRefusal } from '../refusal.ts';
import { type GivenFile, openFiles } from '../sheets/open-files.ts';
import { editedSheets } from '../sheets/edited-sheet.ts';
import { hintsOf } from '../sheets/sheet.ts';
import { carryNames } from './carried-names.ts';
import { makeFilePlan, type SurveyedTable, usualDecimal } from './file-plan.ts';
import { guessTable, type TableGuess } from './table-guess.ts';
import { type Survey, survey, surveyVehicleSheet } from './survey.ts';

/** What could be understood of a file that is not refused outright. `plan` is null when its shape cannot be read. */
export interface Understanding {
  readonly format: Reading['format'];
  readonly sheets: readonly SheetFound[];
  readonly columns: readonly Column[];
  readonly hints: readonly Hint[];
  readonly choices: readonly Choice[];
  /** What people said of these files, and of earlier ones with the same headings. */
  readonly settings: ImportSettings;
  readonly rememberedFrom: Reading['rememberedFrom'];
  readonly plan: FilePlan | null;
  readonly refusal: Reading['refusal'];
}

/**
 * Understands the files of an import before their rows are read: how they are written, where their headings are, what
 * their columns hold, in which order their dates stand, which spellings are one vehicle. Throws a FileRefusal for what is
 * no table.
 */
export function understand(files: readonly GivenFile[], books: ShopBooks, said: ImportSettings): Understanding {
  const file = openFiles(files);
  const sheets = editedSheets(file.sheets, said);
  const recalled = recall(sheets, books.past, said, Number(books.today.slice(0, 4)));
  const { settings } = recalled;
  const answers = new Map(Object.entries(settings.answers ?? {}));
  const decimal = usualDecimal(books.locale);
  const guesses = sheets
    .map((sheet) => carryNames(guessTable(sheet, { books, settings, decimal, answers }), answers))
    .filter(({ hasRows, sheet }) => hasRows || sheet.name === null);
  const first = guesses.find((guess) => guess.shape !== null) ?? guesses[0];
  if (!first) throw new FileRefusal('empty', 'No sheet of this workbook holds anything.');
  const base = {
    format: {
      encoding: file.encoding,
      delimiter: file.delimiter,
      decimal,
      headingRow: first.heading.line || null,
    },
    sheets: guesses.filter(({ sheet }) => sheet.name !== null).map(sheetFound),
    columns: guesses.flatMap(({ columns }) => columns).map(recalled.columnSaid),
    settings,
    rememberedFrom: recalled.from,
    hints: hintsOf(file.sheets),
  };
  if (first.shape === null) {
    return { ...base, choices: [], plan: null, refusal: { kind: 'shape', message: first.why, row: first.row } };
  }
  const surveyed = guesses.map((guess): SurveyedTable => ({ guess, found: surveyOf(guess, books) }));
  refuseForeign(
    surveyed.map(({ found }) => found),
    books.currency,
  );
  const plan = makeFilePlan(surveyed, first.shape, { books, answers });
  return {
    ...base,
    format: { ...base.format, decimal: plan.decimal },
    columns: plan.tables.flatMap(({ columns }) => columns).map(recalled.columnSaid),
    choices: plan.choices.map(recalled.choiceSaid),
    plan,
    refusal: null,
  };
}

const surveyOf = ({ sheet, shape, columns, heading }: TableGuess, books: ShopBooks): Survey =>
  shape === 'vehicle sheet'
    ? surveyVehicleSheet(sheet, Number(books.today.slice(0, 4)))
    : survey(sheet, columns, heading, Number(books.today.slice(0, 4)));

const sheetFound = ({ sheet, shape, why }: TableGuess): SheetFound => ({
  number: sheet.number,
  file: sheet.file ?? 1,
  name: sheet.name ?? '',
  isHidden: sheet.isHidden,
  shape,
  why,
});

/** A file whose amounts carry another currency's sign is refused; single foreign cells are put aside later. */
function refuseForeign(found: readonly Survey[], currency: string): void {
  const counts = new Map<string, number>();
  for (const { currencies } of found) {
    for (const [name, cells] of currencies) counts.set(name, (counts.get(name) ?? 0) + cells);
  }
  let own = 0;
  let foreign = 0;
  let [other, most] = ['', 0];
  for (const [names, cells] of counts) {
    if (names.split(' ').includes(currency)) own += cells;
    else foreign += cells;
    if (!names.split(' ').includes(currency) && cells > most) [other, most] = [names.split(' ')[0] ?? '', cells];
  }
  if (foreign > own) {
    throw new FileRefusal(
      'currency',
      `The amounts in this file are in ${other}, and the shop keeps its books in ${currency}.`,
    );
  }
}
