import { addDays, type Day, dayNumber } from '#shared/day.ts';
import { firstOfWeek } from '../cells/coarse-days.ts';
import { aboutHours, readHours } from '../cells/hours.ts';
import { placeOf, vehicleText } from '../understand/vehicle-columns.ts';
import { weekdayOf } from '../words/weekdays.ts';
import { daysInOrder } from './days-in-order.ts';
import { keptText, withoutFaulty } from './faulty-texts.ts';
import { type CellAside, type DraftLine, notData, type Plan, putAside, type RowReader, taken } from './plan.ts';
import { filled, totalLabel } from './row-kinds.ts';
import type { ColumnSums } from './sums.ts';

const ENDING = /end|bis|until|hasta|jusqu/i;
const LONGEST = 200;

/** The columns of a weekly grid that stand for one weekday each; none in a plain log. */
export function weekdayColumns(plan: Plan): { col: number; weekday: number }[] {
  return plan.columns.flatMap(({ col, heading, meaning }) => {
    const weekday = meaning === 'hours' ? weekdayOf(heading) : null;
    return weekday === null ? [] : [{ col, weekday }];
  });
}

/** Reads rows of a weekly grid: the week, the vehicle, perhaps who, and the hours of each weekday. */
export function hoursGridReader(plan: Plan, sums: ColumnSums): RowReader {
  const grid = weekdayColumns(plan);
  const at = (meaning: Parameters<typeof placeOf>[1]) => placeOf(plan.columns, meaning);
  const [date, person, task] = [at('date'), at('person'), at('task')];
  const nameOf = vehicleText(plan.columns);
  const days = daysInOrder(plan, date + 1);
  const isEnding = ENDING.test(plan.columns[date]?.heading ?? '');
  const text = (cells: readonly string[], place: number) => keptText(cells[place] ?? '');
  const readRow: RowReader = (cells, line) => {
    const name = nameOf(cells);
    const label = name === '' || text(cells, date) === null ? totalLabel(cells) : undefined;
    if (label !== undefined) {
      sums.compare(cells, line, label);
      return notData('total');
    }
    const [who, what] = [text(cells, person), text(cells, task)];
    const dateCell = (cells[date] ?? '').trim();
    const week = firstOfWeek(dateCell) ?? days.next(dateCell);
    const target = plan.vehicles.get(name);
    if (filled(cells) === 1) return notData('note');
    if (plan.repeats.has(line)) return putAside('duplicate', null, null);
    if (name === '' || target === 'overhead') return putAside('missing-vehicle', null, null);
    if (typeof target !== 'object') return putAside('ambiguous-vehicle', null, null);
    if (week === 'bad') return putAside('bad-date', date + 1, null);
    if (Math.max(who?.length ?? 0, what?.length ?? 0) > LONGEST) return putAside('cell-too-long', null, null);
    const lines: DraftLine[] = [];
    const asides: CellAside[] = [];
    for (const { col, weekday } of grid) {
      const cell = (cells[col - 1] ?? '').trim();
      const exact = readHours(cell);
      const seconds = exact === 'bad' ? aboutHours(cell) : exact;
      if (seconds === null) asides.push({ col, reason: 'bad-hours', text: cell, cents: null });
      if (typeof seconds !== 'number' || seconds === 0) continue;
      sums.add(col, seconds, true);
      const on = week === 'blank' ? null : weekdayIn(week, weekday, isEnding);
      const isGuess = exact === 'bad' || days.isGuess;
      lines.push({ ...NOTHING, draft: target, on, seconds, what, person: who, isGuess, row: line, col });
    }
    return { ...taken(lines), cells: asides };
  };
  return (cells, line) => withoutFaulty(readRow(cells, line), cells, [person + 1, task + 1]);
}

const NOTHING = {
  kind: 'hours',
  category: null,
  cents: 0,
  vendor: null,
  foreseen: null,
  isExtra: false,
} as const satisfies Partial<DraftLine>;

/** The day of a weekday (0 = Monday) in the seven days from a day on, or up to it. */
function weekdayIn(week: Day, weekday: number, isEnding: boolean): Day {
  // 1970-01-01 was a Thursday.
  const first = (dayNumber(week) + 3) % 7;
  return isEnding ? addDays(week, -((first - weekday + 7) % 7)) : addDays(week, (weekday - first + 7) % 7);
}
