import type { Choice, Column } from '#shared/contracts/import-reading.ts';
import type { DateOrder } from '../cells/days.ts';
import { fold } from '../cells/fold.ts';
import { placedId } from './placed-id.ts';
import type { DateEvidence } from './date-evidence.ts';

const ENOUGH = 5;
// German, Spanish and French headings: people who write so put the day first.
const DAY_FIRST_WORDS =
  /\b(?:datum|tag|woche|fahrzeug|wagen|kfz|betrag|fecha|semana|coche|vehiculo|importe|gasto|jour|semaine|voiture|vehicule|montant)\b/;
const FEWEST_WEEKS = 3;

/** Month or day first, by what the whole column holds; null = it cannot be told. */
export function settledOrder(evidence: DateEvidence): DateOrder | null {
  const { firstOver12, secondOver12, unsettled, monthFirstBack, dayFirstBack } = evidence;
  if (firstOver12 !== secondOver12) return firstOver12 > secondOver12 ? 'DMY' : 'MDY';
  const byWeekday = weekdayOrder(evidence) ?? rhythmOrder(evidence);
  if (byWeekday !== null) return byWeekday;
  if (unsettled > 0 && evidence.dotted > 0) return 'DMY';
  if (unsettled < ENOUGH || monthFirstBack > 0 === dayFirstBack > 0) return null;
  return monthFirstBack === 0 ? 'MDY' : 'DMY';
}

/** The order with which the weekdays beside the days agree. */
function weekdayOrder({ weekdays, monthFirstWeekdays, dayFirstWeekdays }: DateEvidence): DateOrder | null {
  if (weekdays === 0 || monthFirstWeekdays === dayFirstWeekdays) return null;
  return monthFirstWeekdays > dayFirstWeekdays ? 'MDY' : 'DMY';
}

/** A weekly sheet names the same weekday in every row: three weeks are enough, if only one order gives it so. */
function rhythmOrder({ unsettled, monthFirstOn, dayFirstOn }: DateEvidence): DateOrder | null {
  const [monthFirst, dayFirst] = [Math.max(...monthFirstOn) === unsettled, Math.max(...dayFirstOn) === unsettled];
  if (unsettled < FEWEST_WEEKS || monthFirst === dayFirst) return null;
  return monthFirst ? 'MDY' : 'DMY';
}

/** The order that the settled columns of a whole file agree on; null = none, or they differ. */
export function commonOrder(evidence: Iterable<DateEvidence>): DateOrder | null {
  const settled = new Set([...evidence].map(settledOrder).filter((order) => order !== null));
  return settled.size === 1 ? ([...settled][0] ?? null) : null;
}

/** The order of each date column of a sheet, and the questions that are left. */
export function dateOrders(
  columns: readonly Column[],
  evidence: ReadonlyMap<number, DateEvidence>,
  locale: string,
  answers: ReadonlyMap<string, string>,
  common: DateOrder | null,
): { orders: Map<number, DateOrder>; choices: Choice[] } {
  const settled = new Map([...evidence].map(([col, found]) => [col, settledOrder(found)]));
  const isDayFirst = locale !== 'en-US' || columns.some(({ heading }) => DAY_FIRST_WORDS.test(fold(heading)));
  const usual: DateOrder = isDayFirst ? 'DMY' : 'MDY';
  const orders = new Map<number, DateOrder>();
  const choices: Choice[] = [];
  for (const [col, found] of evidence) {
    const known = settled.get(col) ?? common;
    const column = columns.find((candidate) => candidate.col === col);
    const id = placedId('date-order', column?.sheet ?? 1, col);
    const answer = answers.get(id);
    // What the dates themselves say goes before an answer that was given for an earlier file.
    orders.set(col, known ?? (answer === 'MDY' || answer === 'DMY' ? answer : usual));
    if (known !== null || found.unsettled === 0) continue;
    choices.push({
      id,
      kind: 'date-order',
      column: column?.heading ?? null,
      question: `Column ${column?.heading || col}: does the month or the day stand first in ${column?.samples[0] ?? 'its dates'}?`,
      options: [
        { value: 'MDY', label: 'The month' },
        { value: 'DMY', label: 'The day' },
      ],
      preset: usual,
      answer: answer ?? null,
      mustAsk: true,
      why: 'No day in this column is above 12, and its rows are in no order that would tell.',
    });
  }
  return { orders, choices };
}
