import { aboutHours, readHours } from '../cells/hours.ts';
import { placeOf, vehicleText } from '../understand/vehicle-columns.ts';
import { daysInOrder } from './days-in-order.ts';
import { keptText, withoutFaulty } from './faulty-texts.ts';
import { notData, type Plan, putAside, type RowReader, taken } from './plan.ts';
import { filled, totalLabel } from './row-kinds.ts';
import type { ColumnSums } from './sums.ts';

const LONGEST = 200;

/** Reads rows of a log with one piece of work each: day, vehicle, who, how long. */
export function hoursRowReader(plan: Plan, sums: ColumnSums): RowReader {
  const at = (meaning: Parameters<typeof placeOf>[1]) => placeOf(plan.columns, meaning);
  const [date, person, hours, task] = [at('date'), at('person'), at('hours'), at('task')];
  const nameCol = Math.max(at('vehicle'), at('stock number'), at('model')) + 1;
  const nameOf = vehicleText(plan.columns);
  const days = daysInOrder(plan, date + 1);
  const textAt = (cells: readonly string[], place: number) => (place < 0 ? null : keptText(cells[place] ?? ''));
  const readRow: RowReader = (cells, line) => {
    const name = nameOf(cells);
    const dateCell = (cells[date] ?? '').trim();
    const exact = readHours(cells[hours] ?? '');
    const about = exact === 'bad' ? aboutHours(cells[hours] ?? '') : null;
    const seconds = about ?? exact;
    const label = dateCell === '' || name === '' ? totalLabel(cells) : undefined;
    if (label !== undefined) {
      sums.compare(cells, line, label);
      return notData('total');
    }
    if (filled(cells) === 1 && seconds === 'blank') return notData('note');
    const target = plan.vehicles.get(name);
    const on = days.next(dateCell);
    const [who, what] = [textAt(cells, person), textAt(cells, task)];
    const fault =
      plan.repeats.has(line) && !plan.earlier.has(line)
        ? (['duplicate', hours + 1] as const)
        : name === '' || target === 'overhead'
          ? (['missing-vehicle', nameCol] as const)
          : typeof target !== 'object'
            ? (['ambiguous-vehicle', nameCol] as const)
            : on === 'bad'
              ? (['bad-date', date + 1] as const)
              : typeof seconds !== 'number'
                ? (['bad-hours', hours + 1] as const)
                : Math.max(who?.length ?? 0, what?.length ?? 0) > LONGEST
                  ? (['cell-too-long', task + 1] as const)
                  : null;
    if (typeof seconds === 'number') sums.add(hours + 1, seconds, fault === null);
    if (fault || typeof target !== 'object' || typeof seconds !== 'number') {
      const [reason, col] = fault ?? (['bad-hours', hours + 1] as const);
      return putAside(reason, col, null);
    }
    return taken([
      {
        kind: 'hours',
        draft: target,
        category: null,
        on: on === 'blank' || on === 'bad' ? null : on,
        cents: 0,
        seconds,
        vendor: null,
        what,
        foreseen: null,
        person: who,
        isExtra: false,
        isGuess: about !== null || days.isGuess,
        row: line,
        col: hours + 1,
      },
    ]);
  };
  return (cells, line) => withoutFaulty(readRow(cells, line), cells, [person + 1, task + 1]);
}
