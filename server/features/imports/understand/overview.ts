import type { Choice, Column } from '#shared/contracts/import-reading.ts';
import { readHours } from '../cells/hours.ts';
import type { Draft } from '../read/draft.ts';
import type { Plan, RepeatedColumn } from '../read/plan.ts';
import { tableReader } from '../read/table-reader.ts';
import { placedId } from './placed-id.ts';

type Answers = ReadonlyMap<string, string>;
/** What the receipts of one vehicle add up to: `all`, `sale`, `hours`, each category, each sheet. */
type Sums = Map<string, number>;
interface Details {
  readonly of: ReadonlyMap<Draft, Sums>;
  readonly keys: ReadonlySet<string>;
  readonly sheets: string;
}

const MOST = 0.6;
const MONEY = new Set<Column['meaning']>(['cost', 'purchase', 'sale', 'ignore', 'derived', 'amount']);

/**
 * Finds the columns of an overview that only add up what other sheets of the workbook hold in detail. Such columns are
 * checked against the receipts and never counted. Where the two differ much, a person is asked.
 */
export function markRepeated(plans: readonly Plan[], answers: Answers): { plans: Plan[]; choices: Choice[] } {
  const details = detailsOf(plans.filter(({ shape }) => shape !== null && shape !== 'vehicles'));
  const choices: Choice[] = [];
  const marked = plans.map((plan): Plan => {
    if (plan.shape !== 'vehicles' || details.of.size === 0) return plan;
    const repeated: RepeatedColumn[] = [];
    const columns = plan.columns.map((column): Column => {
      const found = repeatedColumn(plan, column, details);
      if (!found) return column;
      if (found.isDoubt) {
        const choice = overlapChoice(plan, column, details.sheets, answers);
        choices.push(choice);
        if (choice.answer === 'both') return column;
      }
      repeated.push(found.column);
      const why = `It repeats what ${details.sheets} adds up to: checked against it, not counted again.`;
      return { ...column, meaning: 'derived', category: null, why };
    });
    return { ...plan, columns, repeated };
  });
  return { plans: marked, choices };
}

function detailsOf(lists: readonly Plan[]): Details {
  const of = new Map<Draft, Sums>();
  const keys = new Set<string>();
  for (const plan of lists) {
    const { read } = tableReader(plan);
    plan.sheet.forEachRow((cells, line, isMalformed) => {
      for (const { draft, kind, category, cents, seconds } of read(cells, line, isMalformed).lines) {
        if (!draft) continue;
        const sums: Sums = of.get(draft) ?? new Map();
        of.set(draft, sums);
        const isCost = kind === 'entry' || kind === 'purchase';
        const names = isCost
          ? ['all', kind === 'purchase' ? kind : `category ${category}`, `sheet ${plan.sheet.number}`]
          : [kind];
        if (kind === 'entry') names.push('entries');
        for (const name of names) {
          keys.add(name);
          sums.set(name, (sums.get(name) ?? 0) + (kind === 'hours' ? seconds : cents));
        }
      }
    });
  }
  return { of, keys, sheets: lists.map(({ sheet }) => `“${sheet.name ?? ''}”`).join(' and ') };
}

function repeatedColumn(plan: Plan, column: Column, { of, keys, sheets }: Details) {
  const isHours = column.meaning === 'hours';
  if (!isHours && !MONEY.has(column.meaning)) return null;
  const read = (text: string) => {
    const value = isHours ? readHours(text) : plan.money(text, true);
    return typeof value === 'number' ? value : null;
  };
  const values = new Map<number, number>();
  plan.sheet.forEachRow((cells, line) => {
    if (plan.rowDrafts.has(line)) values.set(line, read(cells[column.col - 1] ?? '') ?? 0);
  });
  const sumOf = (key: string) => {
    const sums = new Map<number, number>();
    for (const [line, draft] of plan.rowDrafts) sums.set(line, of.get(draft)?.get(key) ?? 0);
    return sums;
  };
  const made = (key: string, isDoubt: boolean) => ({
    isDoubt,
    column: {
      col: column.col,
      measure: isHours ? ('hours' as const) : ('money' as const),
      read,
      of: sumOf(key),
      sheets,
    },
  });
  const fits = [...keys]
    .filter((key) => (key === 'hours') === isHours && agreement(values, sumOf(key)) >= MOST)
    .sort((a, b) => agreement(values, sumOf(b)) - agreement(values, sumOf(a)));
  if (fits[0] !== undefined) return made(fits[0], false);
  const own = ownKey(column);
  return own !== null && keys.has(own) && overlaps(values, sumOf(own)) ? made(own, true) : null;
}

/** The sums that a column would be counted with, if it were counted. */
function ownKey({ meaning, category }: Column): string | null {
  if (meaning === 'cost') return `category ${category}`;
  return meaning === 'purchase' || meaning === 'sale' || meaning === 'hours' ? meaning : null;
}

/** Share of the rows that hold anything on which both agree to the cent. */
function agreement(values: ReadonlyMap<number, number>, sums: ReadonlyMap<number, number>): number {
  let filled = 0;
  let same = 0;
  for (const [line, value] of values) {
    const sum = sums.get(line) ?? 0;
    if (value === 0 && sum === 0) continue;
    filled++;
    if (value === sum) same++;
  }
  return filled === 0 ? 0 : same / filled;
}

/** Do both hold something for most of the same vehicles? */
function overlaps(values: ReadonlyMap<number, number>, sums: ReadonlyMap<number, number>): boolean {
  const filled = [...values].filter(([, value]) => value !== 0);
  return filled.length > 0 && filled.filter(([line]) => (sums.get(line) ?? 0) !== 0).length >= filled.length / 2;
}

function overlapChoice(plan: Plan, column: Column, sheets: string, answers: Answers): Choice {
  const id = placedId('overlap', plan.sheet.number, column.col);
  return {
    id,
    kind: 'overlap',
    column: column.heading,
    question: `“${column.heading}” of “${plan.sheet.name ?? ''}” and ${sheets} both hold figures for the same vehicles, but not the same ones. Is it the same money?`,
    options: [
      { value: 'same', label: 'yes: count only the receipts' },
      { value: 'both', label: 'no: count both' },
    ],
    preset: 'same',
    answer: answers.get(id) ?? null,
    mustAsk: true,
    why: 'An overview and the receipts behind it are never both counted.',
  };
}
