import type { Choice } from '#shared/contracts/import-reading.ts';
import type { Shape } from '#shared/contracts/import-words.ts';
import type { ShopBooks } from '../books.ts';
import { type DateOrder, dayReader } from '../cells/days.ts';
import { remembered } from '../cells/fold.ts';
import { aboutCents, currenciesIn, type DecimalMark, moneyReader } from '../cells/money.ts';
import { matchEarlier, spelledBefore } from '../earlier/match-rows.ts';
import { earlierRows, settleEarlier } from '../earlier/settle-earlier.ts';
import type { FilePlan, Plan } from '../read/plan.ts';
import { categoryWords } from './category-words.ts';
import { copiedSheets } from './copied-sheets.ts';
import { commonOrder, dateOrders } from './date-order.ts';
import { knownVehicles } from './known-vehicles.ts';
import { ownLabor } from './own-labor.ts';
import { markRepeated } from './overview.ts';
import type { Survey } from './survey.ts';
import type { TableGuess } from './table-guess.ts';
import { type VehicleTarget, vehicleDrafts } from './vehicle-drafts.ts';
import { readVehicle } from './vehicle-text.ts';

/** A sheet as guessed, and what all its rows say. */
export interface SurveyedTable {
  readonly guess: TableGuess;
  readonly found: Survey;
}

interface Known {
  readonly books: ShopBooks;
  readonly answers: ReadonlyMap<string, string>;
}

/** The decimal mark that people of this locale type. */
export const usualDecimal = (locale: string): DecimalMark =>
  new Intl.NumberFormat(locale).formatToParts(1.5).find((part) => part.type === 'decimal')?.value === ',' ? ',' : '.';

/** Settles everything about a file before its rows are read; what it cannot settle becomes a question. */
export function makeFilePlan(tables: readonly SurveyedTable[], shape: Shape, { books, answers }: Known): FilePlan {
  const votes = tables.reduce((sum, { found }) => sum + found.decimalVotes, 0);
  const decimal: DecimalMark = votes === 0 ? usualDecimal(books.locale) : votes > 0 ? '.' : ',';
  const order = commonOrder(tables.flatMap(({ found }) => [...found.dates.values()]));
  const isMixed = tables.filter(({ guess }) => guess.shape !== null).length > 1;
  const matched = matchEarlier(tables, books.past);
  const spelled = spelledBefore(matched, books.rebuilds);
  const known = isMixed ? knownVehicles(tables, books, matched) : [];
  const vehicles = vehicleDrafts(mentioned(tables), books, answers, { known, spelled });
  describe(tables, vehicles.of, Number(books.today.slice(0, 4)));
  const copied = copiedSheets(tables, answers);
  const choices: Choice[] = [...tables.flatMap(({ guess }) => guess.choices), ...copied.choices];
  const plans = tables.map(({ guess, found }): Plan => {
    const settled = settle(guess, found, { books, answers }, order);
    const money = moneyReader(decimal);
    const pays = found.ownPay.map((cell) => money(cell)).filter((cents) => typeof cents === 'number');
    const own = ownLabor(pays, guess.sheet.number, answers);
    choices.push(...settled.choices, ...(own.choice ? [own.choice] : []));
    return {
      sheet: guess.sheet,
      shape: guess.shape,
      columns: guess.columns,
      heading: guess.heading,
      books,
      money,
      about: (text) => aboutCents(text, decimal),
      orders: settled.orders,
      days: settled.days,
      vehicles: vehicles.of,
      rowDrafts: new Map(
        known.filter(({ sheet }) => sheet === guess.sheet.number).map(({ row, draft }) => [row, draft]),
      ),
      repeated: [],
      categories: settled.categories,
      ownLabor: own.labor,
      repeats: new Set([...settled.repeats, ...(copied.lines.get(guess.sheet.number) ?? [])]),
      rows: found.rows,
      earlier: earlierRows(matched, guess.sheet.number, answers),
      isForeign: (text) => {
        const named = currenciesIn(text);
        return named !== null && !named.includes(books.currency);
      },
    };
  });
  choices.push(...vehicles.choices);
  const overview = isMixed ? markRepeated(plans, answers) : { plans, choices: [] };
  const before = settleEarlier(overview.plans, matched, answers);
  choices.push(...overview.choices, ...before.choices);
  return { decimal, shape, choices: distinct(choices), earlier: before.earlier, tables: before.plans };
}

/** The same word may be asked about on several sheets. */
const distinct = (choices: readonly Choice[]) => [...new Map(choices.map((choice) => [choice.id, choice])).values()];

/** Gives new rebuilds that are known by a stock number the year, make and model that stand beside it. */
function describe(tables: readonly SurveyedTable[], of: ReadonlyMap<string, VehicleTarget>, thisYear: number): void {
  for (const [number, text] of tables.flatMap(({ found }) => [...found.described])) {
    const target = of.get(number);
    if (typeof target !== 'object' || target.existing || target.found.model !== null) continue;
    const { year, make, model } = readVehicle(text, thisYear);
    Object.assign(target.found, { year, make, model });
  }
}

/** How often each spelling of a vehicle stands in the lists of a file. */
function mentioned(tables: readonly SurveyedTable[]): Map<string, number> {
  const counts = new Map<string, number>();
  for (const { guess, found } of tables) {
    if (guess.shape === null || guess.shape === 'vehicles') continue;
    for (const [spelling, count] of found.vehicles) counts.set(spelling, (counts.get(spelling) ?? 0) + count);
  }
  return counts;
}

/** Days, categories and repeats of one sheet. */
function settle(guess: TableGuess, found: Survey, { books, answers }: Known, order: DateOrder | null) {
  if (guess.shape === null) {
    return { orders: new Map(), days: new Map(), categories: new Map(), repeats: new Set<number>(), choices: [] };
  }
  const dates = dateOrders(guess.columns, found.dates, books.locale, answers, order);
  const words =
    guess.shape === 'expenses'
      ? categoryWords(found.categories.size ? found.categories : new Map([['', 1]]), books, answers)
      : { of: new Map(), choices: [] };
  const id = guess.sheet.number === 1 ? 'duplicate' : `duplicate:${guess.sheet.number}`;
  const repeat = repeatChoice(id, found.repeats.size, guess.sheet.name, answers);
  return {
    orders: dates.orders,
    days: new Map([...dates.orders].map(([col, each]) => [col, remembered(dayReader(each, books.today))])),
    categories: words.of,
    repeats: answers.get(id) === 'twice' ? new Set<number>() : found.repeats,
    choices: [...dates.choices, ...words.choices, ...(repeat ? [repeat] : [])],
  };
}

function repeatChoice(
  id: string,
  rows: number,
  sheet: string | null,
  answers: ReadonlyMap<string, string>,
): Choice | null {
  if (rows === 0) return null;
  return {
    id,
    kind: 'duplicate',
    column: null,
    question: `${rows} rows${sheet === null ? '' : ` of “${sheet}”`} repeat a block of rows before them exactly. Do they count once or twice?`,
    options: [
      { value: 'once', label: 'once: put the repeats aside' },
      { value: 'twice', label: 'twice: they happened again' },
    ],
    preset: 'once',
    answer: answers.get(id) ?? null,
    mustAsk: false,
    why: 'Three or more different rows in the same order look like an accident of pasting.',
  };
}
