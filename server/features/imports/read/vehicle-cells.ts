import type { Column, Meaning, RebuildFound } from '#shared/contracts/import-reading.ts';
import type { AsideReason } from '#shared/contracts/import-words.ts';
import { isNotYet } from '../cells/days.ts';
import { aboutHours, readHours } from '../cells/hours.ts';
import { isFaulty } from '../cells/faulty-cells.ts';
import { remembered } from '../cells/fold.ts';
import { makeOf } from '../words/vehicles.ts';
import { classReader, damageReader, yesOrNo } from '../words/kinds.ts';
import type { CellAside, Plan } from './plan.ts';

/** Money and hours of one cell of a vehicle's row. */
export interface Figure {
  readonly column: Column;
  readonly cents: number;
  readonly seconds: number;
  /** It is only said roughly. */
  readonly isGuess: boolean;
}

/** What the cells of one vehicle's row say. */
export interface VehicleCells {
  readonly known: Partial<RebuildFound>;
  readonly dates: Record<string, string>;
  readonly figures: Figure[];
  readonly asides: CellAside[];
}

type Take = (cell: string, row: VehicleCells) => AsideReason | null;

const LONGEST: Partial<Record<keyof RebuildFound, number>> = { notes: 4000, boughtFrom: 120, vin: 20 };
const FIGURES = new Set<Meaning>(['purchase', 'cost', 'estimate', 'sale', 'asking', 'expected sale']);
const MAY_BE_CREDIT = new Set<Meaning>(['cost']);
const TEXTS: Partial<Record<Meaning, keyof RebuildFound>> = {
  make: 'make',
  model: 'model',
  trim: 'trim',
  vin: 'vin',
  'title brand': 'titleBrand',
  'bought from': 'boughtFrom',
  notes: 'notes',
};

/** Reads the cells of a vehicle's row, each by what its column holds. A cell that cannot be read is put aside alone. */
export function vehicleCellReader(plan: Plan): (cells: readonly string[]) => VehicleCells {
  const takers = plan.columns
    .map((column) => ({ column, take: takerOf(plan, column) }))
    .filter(({ take }) => take !== null);
  return (cells) => {
    const row: VehicleCells = { known: {}, dates: {}, figures: [], asides: [] };
    for (const { column, take } of takers) {
      const cell = (cells[column.col - 1] ?? '').trim();
      if (cell === '') continue;
      const reason = take?.(cell, row) ?? null;
      if (reason) row.asides.push({ col: column.col, reason, text: cell, cents: null });
    }
    return row;
  };
}

function takerOf(plan: Plan, column: Column): Take | null {
  const { meaning } = column;
  if (FIGURES.has(meaning)) return moneyTaker(plan, column);
  if (meaning === 'hours' || meaning === 'estimated hours') return hoursTaker(column);
  const dayOf = plan.days.get(column.col);
  if (dayOf)
    return (cell, row) => take(isNotYet(cell) ? 'blank' : dayOf(cell), (day) => (row.dates[meaning] = day), 'bad-date');
  if (meaning === 'vehicle' || meaning === 'stock number') return (cell) => (isFaulty(cell) ? 'bad-value' : null);
  const field = TEXTS[meaning];
  if (field) return textTaker(field);
  return factTaker(plan, meaning);
}

function take<T>(value: T | 'bad' | 'blank' | null, keep: (value: T) => void, reason: AsideReason): AsideReason | null {
  if (value === 'bad' || value === null) return reason;
  if (value !== 'blank') keep(value);
  return null;
}

function moneyTaker(plan: Plan, column: Column): Take {
  return (cell, row) => {
    const exact = plan.money(cell, true);
    const isGuess = exact === 'rough';
    const cents = isGuess ? (plan.about(cell) ?? 'rough') : exact;
    if (cents === 'blank') return null;
    if (cents === 'rough') return 'ambiguous-amount';
    if (cents === 'bad' || (cents < 0 && !MAY_BE_CREDIT.has(column.meaning))) return 'bad-amount';
    if (plan.isForeign(cell)) return 'currency';
    if (cents !== 0) row.figures.push({ column, cents, seconds: 0, isGuess });
    return null;
  };
}

function hoursTaker(column: Column): Take {
  return (cell, row) => {
    const exact = readHours(cell);
    const about = exact === 'bad' ? aboutHours(cell) : null;
    const keep = (seconds: number) => row.figures.push({ column, cents: 0, seconds, isGuess: about !== null });
    return take(about ?? exact, keep, 'bad-hours');
  };
}

function textTaker(field: keyof RebuildFound): Take {
  return (cell, row) => {
    if (isFaulty(cell)) return 'bad-value';
    const before = row.known[field];
    // `VW` and `Chevy` stand for one make each.
    const own = field === 'make' ? (makeOf(cell) ?? cell) : cell;
    const text = (field === 'notes' && before ? `${String(before)}\n${cell}` : own).normalize('NFC');
    if (text.length > (LONGEST[field] ?? 60)) return 'cell-too-long';
    Object.assign(row.known, { [field]: text });
    return null;
  };
}

function factTaker(plan: Plan, meaning: Meaning): Take | null {
  const fact = (field: keyof RebuildFound, read: (cell: string) => string | number | boolean | null): Take => {
    const known = remembered(read);
    return (cell, row) => take(known(cell), (value) => Object.assign(row.known, { [field]: value }), 'bad-value');
  };
  if (meaning === 'class') return fact('className', classReader(plan.books.classes));
  if (meaning === 'damage') return fact('damageName', damageReader(plan.books.damages));
  if (meaning === 'second damage') return fact('secondDamageName', damageReader(plan.books.damages));
  if (meaning === 'seen') return fact('isSeen', yesOrNo);
  if (meaning === 'year') return fact('year', (cell) => (/^(19[3-9]\d|20\d\d)$/.test(cell) ? Number(cell) : null));
  if (meaning === 'odometer') return fact('odometer', readOdometer);
  return null;
}

/** `103,197`, `103.197 km`, `103k` into whole miles or kilometers as written; null = neither. */
export function readOdometer(cell: string): number | null {
  const match = /^(\d{1,3}(?:[., ’']?\d{3})*|\d{1,7})\s*(k)?\s*(?:mi|miles|km)?\.?$/i.exec(cell);
  if (!match) return null;
  const number = Number((match[1] ?? '').replace(/\D/g, '')) * (match[2] ? 1000 : 1);
  return number <= 9_999_999 ? number : null;
}
