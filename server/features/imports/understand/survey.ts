import type { Column } from '#shared/contracts/import-reading.ts';
import { REBUILD_DATES } from '#shared/vocabulary.ts';
import { looksLikeDay } from '../cells/days.ts';
import { currenciesIn, decimalVote, looksLikeMoney } from '../cells/money.ts';
import { keptText } from '../read/faulty-texts.ts';
import { type DateEvidence, dateWatcher } from './date-evidence.ts';
import type { Sheet } from '../sheets/sheet.ts';
import { isFigure, namesVehicle, titleOf } from '../read/sheet-words.ts';
import { repeatedRows, rowHash } from './repeats.ts';
import type { Heading } from '../read/plan.ts';
import { isBlank, isHeadingAgain } from '../read/row-kinds.ts';
import { readHours } from '../cells/hours.ts';
import { hoursInside, saysWork } from '../words/own-work.ts';
import { besideNumber, placeOf, vehicleText } from './vehicle-columns.ts';

/** What only the whole file can tell, found in one pass before any row is understood. */
export interface Survey {
  /** Above 0: the decimal mark is a point; below: a comma; 0: nothing speaks for either. */
  readonly decimalVotes: number;
  /** Currencies that a cell's sign may stand for → cells with such a sign. */
  readonly currencies: ReadonlyMap<string, number>;
  /** Per date column: what its numbers allow. */
  readonly dates: ReadonlyMap<number, DateEvidence>;
  readonly vehicles: ReadonlyMap<string, number>;
  /** Stock number → what columns beside it call the vehicle. */
  readonly described: ReadonlyMap<string, string>;
  readonly categories: ReadonlyMap<string, number>;
  /** Lines on which a block pasted twice stands. */
  readonly repeats: ReadonlySet<number>;
  /** Amounts for labor without hours and without anybody who was paid, as they stand. */
  readonly ownPay: readonly string[];
  /** A hash of each row that holds data, and its line. */
  readonly rows: SurveyedRows;
}

export interface SurveyedRows {
  readonly hashes: readonly number[];
  readonly lines: readonly number[];
  /** What later files are held against: of every row, its cells as they stood in the file before anyone put them right. */
  readonly prints: { readonly hashes: readonly number[]; readonly lines: readonly number[] };
}

const MONEY = new Set<Column['meaning']>([
  'amount',
  'credit',
  'purchase',
  'cost',
  'estimate',
  'sale',
  'asking',
  'expected sale',
  'derived',
]);
const DATES = new Set<Column['meaning']>(['date', ...REBUILD_DATES.map(([field]) => field)]);

const MOST_PAYS = 1_000;

/** The amount of a row of labor that names neither hours nor a payee; null = the row is another. */
export function ownPayIn(columns: readonly Column[]): (cells: readonly string[]) => string | null {
  const [amount, hours, vendor] = (['amount', 'hours', 'vendor'] as const).map((meaning) => placeOf(columns, meaning));
  const words = (['category', 'what'] as const).map((meaning) => placeOf(columns, meaning)).filter((at) => at >= 0);
  const at = (cells: readonly string[], place = -1) => (cells[place] ?? '').trim();
  return (cells) => {
    const said = words.map((place) => at(cells, place));
    if (!said.some(saysWork) || at(cells, vendor) !== '') return null;
    const isTimed = typeof readHours(at(cells, hours)) === 'number' || said.some((text) => hoursInside(text) !== null);
    return isTimed ? null : at(cells, amount) || null;
  };
}

/** Goes through a whole sheet once. */
export function survey(sheet: Sheet, columns: readonly Column[], heading: Heading, thisYear: number): Survey {
  const money = columns.filter((column) => MONEY.has(column.meaning)).map((column) => column.col - 1);
  const days = columns
    .filter((column) => DATES.has(column.meaning))
    .map((column) => ({ at: column.col - 1, see: dateWatcher(thisYear) }));
  const nameOf = vehicleText(columns);
  const isAgain = isHeadingAgain(heading.cells);
  const category = columns.find((column) => column.meaning === 'category');
  const ownPay: string[] = [];
  const described = new Map<string, string>();
  const besideOf = besideNumber(columns);
  const payOf = ownPayIn(columns);
  const currencies = new Map<string, number>();
  const vehicles = new Map<string, number>();
  const categories = new Map<string, number>();
  const hashes: number[] = [];
  const lines: number[] = [];
  let decimalVotes = 0;
  sheet.forEachRow((cells, line) => {
    if (line <= heading.last || isAgain(cells)) return;
    for (const at of money) {
      const cell = cells[at];
      if (!cell || !looksLikeMoney(cell)) continue;
      decimalVotes += decimalVote(cell);
      const named = currenciesIn(cell);
      if (named) count(currencies, named.join(' '));
    }
    for (const { at, see } of days) see.cell(cells[at] ?? '');
    const name = nameOf(cells);
    if (name) count(vehicles, name);
    if (name && besideOf && !described.has(name)) described.set(name, besideOf(cells));
    const pay = name ? payOf(cells) : null;
    if (pay && ownPay.length < MOST_PAYS) ownPay.push(pay);
    if (category && name) count(categories, keptText(cells[category.col - 1] ?? '') ?? '');
    if (cells.some((cell) => cell !== '')) {
      hashes.push(rowHash(cells));
      lines.push(line);
    }
  });
  const repeats = new Set([...repeatedRows(hashes)].map((place) => lines[place] as number));
  return {
    decimalVotes,
    currencies,
    vehicles,
    described,
    categories,
    ownPay,
    repeats,
    rows: { hashes, lines, prints: { hashes: rawPrints(sheet, hashes, lines), lines } },
    dates: new Map(days.map(({ at, see }) => [at + 1, see.evidence])),
  };
}

/** Goes through a whole sheet about one vehicle, or several: its days stand under column 1 of the evidence. */
export function surveyVehicleSheet(sheet: Sheet, thisYear: number): Survey {
  const currencies = new Map<string, number>();
  const vehicles = new Map<string, number>();
  const days = dateWatcher(thisYear);
  const hashes: number[] = [];
  const lines: number[] = [];
  const prints = { hashes: [] as number[], lines: [] as number[] };
  let owner = sheet.name ?? '';
  let decimalVotes = 0;
  sheet.forEachRow((cells, line) => {
    const title = titleOf(cells, thisYear);
    if (title) count(vehicles, (owner = title.text));
    // The same bill may stand under two vehicles: whose it is belongs to its print.
    if (!isBlank(cells)) {
      prints.hashes.push(rowHash([owner, ...(sheet.rawRow?.(line) ?? cells)]));
      prints.lines.push(line);
    }
    let isData = false;
    for (const cell of cells) {
      if (cell === '') continue;
      days.cell(cell);
      if (!isFigure(cell) || looksLikeDay(cell)) continue;
      isData = true;
      decimalVotes += decimalVote(cell);
      const named = currenciesIn(cell);
      if (named) count(currencies, named.join(' '));
    }
    if (!isData) return;
    hashes.push(rowHash(cells));
    lines.push(line);
  });
  const repeats = new Set([...repeatedRows(hashes)].map((place) => lines[place] as number));
  // A tab's name speaks where no title does.
  const isTab = sheet.name !== null && (vehicles.size === 0 || namesVehicle(sheet.name, thisYear));
  if (isTab) count(vehicles, sheet.name ?? '');
  return {
    decimalVotes,
    currencies,
    vehicles,
    described: new Map(),
    categories: new Map(),
    ownPay: [],
    repeats,
    rows: { hashes, lines, prints },
    dates: new Map([[1, days.evidence]]),
  };
}

const rawPrints = ({ rawRow }: Sheet, hashes: readonly number[], lines: readonly number[]) =>
  rawRow ? hashes.map((hash, i) => ofRaw(rawRow(lines[i] as number)) ?? hash) : hashes;
const ofRaw = (cells: readonly string[] | undefined) => cells && rowHash(cells);

function count(counts: Map<string, number>, key: string): void {
  counts.set(key, (counts.get(key) ?? 0) + 1);
}
