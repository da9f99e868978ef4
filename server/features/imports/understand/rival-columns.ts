import type { Choice, Column, Meaning } from '#shared/contracts/import-reading.ts';
import type { ChoiceKind, Shape } from '#shared/contracts/import-words.ts';
import type { moneyReader } from '../cells/money.ts';
import { fold } from '../cells/fold.ts';
import { dealOf, headingMeanings, headingRank, plannedPart } from '../words/headings.ts';
import { TURNED } from './amount-column.ts';
import type { Head } from './head.ts';

type Money = ReturnType<typeof moneyReader>;

/** Money that two columns may mean, and the words that tell them apart. */
interface Contest {
  readonly kind: Extract<ChoiceKind, 'sale' | 'amount-column'>;
  readonly meaning: Extract<Meaning, 'sale' | 'amount'>;
  readonly question: string;
  /** Among rivals, the one called so is meant; those called otherwise are not. */
  readonly isMeant: (heading: string) => boolean;
  readonly isRival: (heading: string) => boolean;
}

const PAID_OUT =
  /\b(?:paid out|pay ?out|net to (?:us|me|seller)|after fees|received|deposited|ausgezahlt|auszahlung|erhalten|cobrado|ingresado|encaisse|recu)\b/;
const PAID = /\b(?:paid|spent|bezahlt|gezahlt|pagad[oa]|payee?|actual|ttc|brutto|gross)\b/;

const CONTESTS: Partial<Record<Shape, Contest>> = {
  vehicles: {
    kind: 'sale',
    meaning: 'sale',
    question: 'Which column holds what the vehicles were sold for?',
    isMeant: (heading) => !PAID_OUT.test(fold(heading)),
    isRival: (heading) =>
      PAID_OUT.test(fold(heading)) || dealOf(heading) === 'selling' || headingMeanings(heading).includes('sale'),
  },
  expenses: {
    kind: 'amount-column',
    meaning: 'amount',
    question: 'Which column holds what was paid?',
    isMeant: (heading) => PAID.test(fold(heading)),
    isRival: (heading) => headingMeanings(heading).includes('amount'),
  },
};

/**
 * Asks which of several columns holds the sale, or what was paid, where no arithmetic tells and they do not agree. The
 * words of the headings settle the default; where they say the same, the file cannot tell and waits for an answer.
 */
export function askOfRivals(
  columns: readonly Column[],
  shape: Shape,
  { head, money, answers }: { head: Head; money: Money; answers: ReadonlyMap<string, string> },
): { columns: Column[]; choices: Choice[] } {
  const contest = CONTESTS[shape];
  const held = columns.find(({ meaning }) => meaning === contest?.meaning);
  if (!contest || !held || held.why === SAID) return { columns: [...columns], choices: [] };
  const valuesOf = ({ col }: Column) => head.below.map(({ cells }) => numberIn(money, cells[col - 1] ?? ''));
  const own = valuesOf(held);
  const rivals = columns.filter(
    (column) => isFree(column) && contest.isRival(column.heading) && differ(own, valuesOf(column)),
  );
  if (rivals.length === 0) return { columns: [...columns], choices: [] };
  const all = [held, ...rivals].sort((a, b) => a.col - b.col);
  const { preset, isSure } = settle(all, contest);
  const isTaxed = rivals.every((column) => hasOneRatio(own, valuesOf(column)));
  const id = held.sheet === 1 ? contest.kind : `${contest.kind}:${held.sheet}`;
  const answer = answers.get(id) ?? null;
  const valueOf = (column: Column) => namedOnce(column, all);
  const chosen = all.find((column) => valueOf(column) === answer) ?? preset;
  const choice: Choice = {
    id,
    kind: contest.kind,
    column: preset.heading,
    question: contest.question,
    options: all.map((column) => ({ value: valueOf(column), label: `“${column.heading}”` })),
    preset: valueOf(preset),
    answer,
    mustAsk: !isSure && !isTaxed,
    why:
      isSure || isTaxed
        ? 'Its heading says so best, and the others differ from it.'
        : 'They differ, and their headings say the same.',
  };
  const settled = columns.map((column) => {
    if (column === chosen)
      return { ...column, meaning: contest.meaning, category: null, why: answer ? SAID : held.why };
    return all.includes(column) ? { ...column, meaning: 'ignore' as const, category: null, why: NOT_IT } : column;
  });
  return { columns: settled, choices: [choice] };
}

const SAID = 'You said so.';
/** Said of a column that is not the one of those that may hold a thing. */
export const NOT_IT = 'Another column holds this.';

/** May a column hold what another was taken for? Not if arithmetic or a person said otherwise. */
const isFree = ({ meaning, heading, why }: Column) =>
  (meaning === 'ignore' || (meaning === 'derived' && why.startsWith('The heading'))) &&
  why !== SAID &&
  why !== TURNED &&
  plannedPart(heading) === null;

const numberIn = (money: Money, cell: string) => {
  const value = money(cell, true);
  return typeof value === 'number' ? value : null;
};

type Values = readonly (number | null)[];

/** Does a column hold money that another lacks or has otherwise? */
const differ = (own: Values, others: Values) => others.some((value, i) => value !== null && value !== own[i]);

/** Net and gross: in every row the same part of the other, to the cent. */
function hasOneRatio(own: Values, others: Values): boolean {
  const pairs = own.flatMap((a, i) => (a && others[i] ? [[a, others[i]] as const] : []));
  const [most] = [...pairs].sort((a, b) => Math.abs(b[0]) - Math.abs(a[0]));
  if (!most || pairs.length < 3) return false;
  return pairs.every(([a, b]) => Math.abs(b - (a * most[1]) / most[0]) <= 2);
}

/** The one that the words mean; else, unsure, the heading that says it best. */
function settle(all: readonly Column[], { isMeant, meaning }: Contest): { preset: Column; isSure: boolean } {
  const meant = all.filter(({ heading }) => isMeant(heading));
  const rank = ({ heading }: Column) => headingRank(heading, meaning) ?? Number.POSITIVE_INFINITY;
  const among = meant.length > 0 ? meant : all;
  const preset = among.reduce((best, column) => (rank(column) < rank(best) ? column : best));
  return { preset, isSure: meant.length === 1 };
}

const namedOnce = (column: Column, all: readonly Column[]) =>
  column.heading !== '' && all.filter(({ heading }) => heading === column.heading).length === 1
    ? column.heading
    : `column ${column.col}`;
