import { addDays, type Day, daysBetween } from '#shared/day.ts';
import { TASKS } from '#shared/vocabulary.ts';
import type { Calendar } from './calendar.ts';
import type { DemoEntry, DemoHours } from './demo-book.ts';
import { DEMO_TODAY, HELPER_SHARE, helperWageCents } from './parameters.ts';
import type { Fate, Slot } from './quota.ts';
import { type Random, random } from './random.ts';

/** A car that is parted out, or still in work, took this much of the hours that its whole repair would have. */
const DONE: Readonly<Partial<Record<Fate, number>>> = { 'parted out': 0.5, 'in work': 0.6 };
const QUARTER = 900;

/** The hours of one vehicle, day by day and by person; whole quarters of an hour. */
export function work(seed: number, slot: Slot, hours: number, { dates, exitOn, heldUntil }: Calendar): DemoHours[] {
  const chance = random(seed, `work ${slot.index}`);
  const total = hours * (DONE[slot.fate] ?? 1);
  const from = dates.startedOn ?? heldUntil;
  const to = dates.roadworthyOn ?? exitOn ?? heldUntil;
  return [
    ...days(chance, 'owner', quarters(total * (1 - HELPER_SHARE)), from, to),
    ...days(chance, 'helper', quarters(total * HELPER_SHARE), from, to),
  ].sort((a, b) => ((a.workedOn ?? '') < (b.workedOn ?? '') ? -1 : 1));
}

function quarters(hours: number): number {
  return Math.round(hours * 4) * QUARTER;
}

function days(chance: Random, worker: 'owner' | 'helper', seconds: number, from: Day, to: Day): DemoHours[] {
  const rows: DemoHours[] = [];
  const span = Math.max(1, daysBetween(from, to));
  for (let left = seconds; left > 0; ) {
    const part = Math.min(left, chance.whole(6, 22) * QUARTER);
    left -= part;
    const place = 1 - left / seconds;
    const day = addDays(from, Math.min(span, Math.round(span * place) - chance.whole(0, 1)));
    const task = TASKS[Math.min(TASKS.length - 1, Math.floor(place * 5.9))] ?? null;
    rows.push({ worker, workedOn: day > DEMO_TODAY ? DEMO_TODAY : day, seconds: part, task });
  }
  return rows;
}

/** The helper's pay for a vehicle: one entry a month, at that year's wage. */
export function wages(hours: readonly DemoHours[]): DemoEntry[] {
  const months = new Map<string, number>();
  for (const { worker, workedOn, seconds } of hours) {
    if (worker !== 'helper' || workedOn === null) continue;
    const month = workedOn.slice(0, 7);
    months.set(month, (months.get(month) ?? 0) + seconds);
  }
  return [...months].map(([month, seconds]) => ({
    category: 'paid labor',
    datedOn: payday(month),
    cents: Math.round((seconds * helperWageCents(Number(month.slice(0, 4)))) / 3600),
    vendor: null,
    what: `${seconds / 3600} h`,
    foreseen: 'foreseen',
    isExtra: false,
  }));
}

/** The 28th, so that a month's hours are nearly all behind it. */
function payday(month: string): Day {
  const day = `${month}-28`;
  return day > DEMO_TODAY ? DEMO_TODAY : day;
}
