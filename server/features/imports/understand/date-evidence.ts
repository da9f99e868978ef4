import { dayFromParts, dayNumber } from '#shared/day.ts';
import { fullYear, isDotted, type UnsettledDay, unsettledDay } from '../cells/days.ts';

/** What the days of a column say about their order. */
export interface DateEvidence {
  firstOver12: number;
  secondOver12: number;
  /** Cells that a number order matters to. */
  unsettled: number;
  /** Steps back in time when read as month first, and as day first. */
  monthFirstBack: number;
  dayFirstBack: number;
  /** Cells with a weekday beside the day, and with how many of them each order agrees. */
  weekdays: number;
  monthFirstWeekdays: number;
  dayFirstWeekdays: number;
  /** Cells by the weekday that each order gives them: a weekly sheet names the same one in every row. */
  readonly monthFirstOn: number[];
  readonly dayFirstOn: number[];
  /** Days written with points, which name the day first. */
  dotted: number;
}

/** 0 = Monday; null = no such day. 1970-01-01 was a Thursday. */
function weekdayOn(year: number, month: number, day: number): number | null {
  const found = dayFromParts(year, month, day);
  return found === null ? null : (dayNumber(found) + 3) % 7;
}

/** Goes along a column of days and gathers what tells their order. */
export function dateWatcher(thisYear: number): { evidence: DateEvidence; cell(text: string): void } {
  const evidence: DateEvidence = {
    firstOver12: 0,
    secondOver12: 0,
    unsettled: 0,
    monthFirstBack: 0,
    dayFirstBack: 0,
    weekdays: 0,
    monthFirstWeekdays: 0,
    dayFirstWeekdays: 0,
    monthFirstOn: [0, 0, 0, 0, 0, 0, 0],
    dayFirstOn: [0, 0, 0, 0, 0, 0, 0],
    dotted: 0,
  };
  let before: UnsettledDay | null = null;
  const add = (counts: number[], weekday: number | null) => {
    if (weekday !== null) counts[weekday] = (counts[weekday] ?? 0) + 1;
  };
  return {
    evidence,
    cell(text) {
      const now = unsettledDay(text);
      if (!now) {
        if (text !== '' && isDotted(text)) evidence.dotted++;
        return;
      }
      const { first, second, year, weekday } = now;
      evidence.unsettled++;
      if (first > 12) evidence.firstOver12++;
      if (second > 12) evidence.secondOver12++;
      if (year !== '') {
        const full = fullYear(year, thisYear);
        const [monthFirst, dayFirst] = [weekdayOn(full, first, second), weekdayOn(full, second, first)];
        add(evidence.monthFirstOn, monthFirst);
        add(evidence.dayFirstOn, dayFirst);
        if (weekday !== null) {
          evidence.weekdays++;
          if (monthFirst === weekday) evidence.monthFirstWeekdays++;
          if (dayFirst === weekday) evidence.dayFirstWeekdays++;
        }
      }
      if (before && before.year === year) {
        if (first * 31 + second < before.first * 31 + before.second) evidence.monthFirstBack++;
        if (second * 31 + first < before.second * 31 + before.first) evidence.dayFirstBack++;
      }
      before = now;
    },
  };
}
