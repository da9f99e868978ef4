import type { Column } from '#shared/contracts/import-reading.ts';
import type { ExistingRebuild } from '../books.ts';
import type { EarlierRow } from '../earlier/settle-earlier.ts';
import { fold } from '../cells/fold.ts';
import { SUM_OF_COSTS } from '../understand/derived.ts';
import { existingFinder } from '../understand/existing-finder.ts';
import { placeOf, vehicleName } from '../understand/vehicle-columns.ts';
import { looksLikeVehicle, readVehicle } from '../understand/vehicle-text.ts';
import { type Draft, newDraft, tagMaker } from './draft.ts';
import { type DraftLine, notData, type Plan, putAside, type RowReader, taken } from './plan.ts';
import { filled, totalLabel } from './row-kinds.ts';
import type { ColumnSums } from './sums.ts';
import { type Figure, type VehicleCells, vehicleCellReader } from './vehicle-cells.ts';
import { freshCells } from './vehicle-row-before.ts';

/** Reads rows of a sheet with one vehicle each: its facts, its costs by column, its plan, its sale. */
export function vehicleRowReader(plan: Plan, sums: ColumnSums, carried: CarriedFigures): RowReader {
  const read = vehicleCellReader(plan);
  const nameOf = vehicleName(plan.columns);
  const findExisting = existingOf(plan);
  const rebuilds = new Map(plan.books.rebuilds.map((rebuild) => [rebuild.id, rebuild]));
  const bookedAs = (earlier: EarlierRow | undefined) => rebuilds.get(earlier?.rebuildId ?? '') ?? null;
  const tagFor = tagMaker(plan.books.rebuilds.map((rebuild) => rebuild.tag));
  const seen = new Set<string>();
  const thisYear = Number(plan.books.today.slice(0, 4));
  const named = namer(plan);
  const vehicle = placeOf(plan.columns, 'vehicle');
  const vehicleAt = (cells: readonly string[]) => (cells[vehicle] ?? '').trim();
  const hasStock = placeOf(plan.columns, 'stock number') >= 0;
  const summing = plan.columns.filter((column) => column.meaning === 'derived' && column.why === SUM_OF_COSTS);
  const addAll = (row: VehicleCells, isTaken: boolean) => {
    for (const { column, cents, seconds } of row.figures) sums.add(column.col, cents + seconds, isTaken);
    for (const column of summing) sums.add(column.col, costOf(row), isTaken);
  };
  return (cells, line) => {
    const name = nameOf(cells);
    const label = totalLabel(cells);
    if (
      (label !== undefined && (name === '' || name === label.trim())) ||
      (!isName(name, thisYear) && sums.isTotal(cells, name === '' ? 2 : 3))
    ) {
      sums.compare(cells, line, label ?? '');
      return notData('total');
    }
    const row = read(cells);
    if (row.figures.length === 0 && (name === '' || isRemark(cells, name, thisYear))) return notData('note');
    const known = plan.rowDrafts.get(line);
    const earlier = plan.earlier.get(line);
    const existing = known ? known.existing : (bookedAs(earlier) ?? (name === '' ? null : findExisting(name, row)));
    const before = earlier && existing ? { earlier, existing } : null;
    const key = hasStock ? fold(name) : null;
    const reason =
      name === ''
        ? 'missing-vehicle'
        : !before && (plan.repeats.has(line) || (key !== null && seen.has(key)) || isBooked(existing))
          ? 'duplicate'
          : null;
    if (reason) {
      addAll(row, false);
      return putAside(reason, placeOf(plan.columns, 'stock number') + 1 || null, costOf(row));
    }
    if (key !== null) seen.add(key);
    const own = known ? withoutCarried(row, known, carried) : row;
    addAll(row, true);
    sums.row();
    checkRepeated(plan, sums, cells, line);
    const fresh = before && freshCells(plan, read, cells, before);
    if (fresh?.isEmpty) return notData('already in');
    const hasPrice = row.figures.some(({ column }) => column.meaning === 'sale') || (before?.existing.hasLeft ?? false);
    const sold = settleSale(fresh?.row ?? own, plan.columns, hasPrice);
    const draft = known ?? newDraft(existing ? existing.tag : tagFor(name), existing, line);
    for (const field of fresh?.overwrites ?? []) draft.overwrites.add(field);
    Object.assign(draft.found, named(vehicleAt(cells) || name, sold.known), sold.known, {
      spellings: [...draft.found.spellings, name],
    });
    Object.assign(draft.found.dates, sold.dates);
    const lines = sold.figures.map((figure) => lineOf(figure, draft, row, line));
    return { ...taken(lines), cells: sold.asides, draft, ...(fresh ? { replaces: fresh.replaces } : {}) };
  };
}

/** A stock number, or a year beside a model. */
const isName = (name: string, thisYear: number) => /^[\w.-]*\d[\w.-]*$/.test(name) || looksLikeVehicle(name, thisYear);

/** A row of nothing but words that name no vehicle: `checked by D. Okafor`. */
const isRemark = (cells: readonly string[], name: string, thisYear: number) =>
  filled(cells) === 1 && !looksLikeVehicle(name, thisYear) && (!/\d/.test(name) || name.split(' ').length > 3);

/** What sheets said of a vehicle so far: cents or seconds by what the column holds. */
export type CarriedFigures = Map<Draft, Map<string, number>>;

/**
 * A vehicle that a later sheet carries on, as year sheets do: figures that an earlier sheet gave already are not counted
 * again; those that changed meanwhile are put aside.
 */
function withoutCarried(row: VehicleCells, draft: Draft, carried: CarriedFigures): VehicleCells {
  const before = carried.get(draft);
  const now = new Map(before);
  carried.set(draft, now);
  const keyOf = ({ column }: Figure) => `${column.meaning} ${column.category ?? ''}`;
  const asides = [...row.asides];
  const figures = row.figures.filter((figure) => {
    const value = figure.cents + figure.seconds;
    const said = before?.get(keyOf(figure));
    if (said === undefined) {
      now.set(keyOf(figure), (now.get(keyOf(figure)) ?? 0) + value);
      return true;
    }
    const { cents, column } = figure;
    if (said !== value)
      asides.push({ col: column.col, reason: 'duplicate', text: column.heading, cents: cents || null });
    return false;
  });
  return { ...row, figures, asides };
}

/** Year, make and model out of what a row calls its vehicle, when no column of their own holds them. */
function namer(plan: Plan): (name: string, known: VehicleCells['known']) => Partial<VehicleCells['known']> {
  const thisYear = Number(plan.books.today.slice(0, 4));
  return (name, known) => {
    if (known.model || known.year) return {};
    const { year, make, model } = readVehicle(name, thisYear);
    return year === null || model === null ? {} : { year, make, model };
  };
}

/** Holds what an overview repeats of its receipts against what came of those. */
function checkRepeated(plan: Plan, sums: ColumnSums, cells: readonly string[], line: number): void {
  for (const { col, measure, read, of, sheets } of plan.repeated) {
    const value = read(cells[col - 1] ?? '');
    const imported = of.get(line) ?? 0;
    sums.add(col, imported, true);
    if (value === null || value === imported) continue;
    sums.note({
      row: line,
      col,
      label: plan.heading.cells[col - 1] ?? '',
      measure,
      stated: value,
      imported,
      putAside: 0,
      explanation: `The overview differs from what ${sheets} adds up to; what is there came in.`,
    });
  }
}

const isBooked = (existing: ExistingRebuild | null) =>
  existing !== null && (existing.hasEntries || existing.hasPurchase || existing.hasLeft || existing.hasBaseline);
const costOf = (row: VehicleCells) =>
  row.figures.reduce(
    (sum, { column, cents }) => (column.meaning === 'cost' || column.meaning === 'purchase' ? sum + cents : sum),
    0,
  );

/** The shop's own rebuild by tag; without stock numbers also the only one of the same year and model. */
function existingOf(plan: Plan): (name: string, row: VehicleCells) => ExistingRebuild | null {
  const finder = existingFinder(plan.books.rebuilds);
  const hasStock = placeOf(plan.columns, 'stock number') >= 0;
  return (name, row) => {
    const fits = hasStock ? [] : finder.byModel(row.known.year ?? null, row.known.model ?? null);
    return finder.byTag(name) ?? (fits.length === 1 ? (fits[0] ?? null) : null);
  };
}

/** A sale date without a price cannot stand in the books: the date is put aside, and the rebuild stays unsold. */
function settleSale(row: VehicleCells, columns: readonly Column[], hasPrice: boolean): VehicleCells {
  const soldOn = row.dates.soldOn;
  if (soldOn === undefined || hasPrice) return row;
  const { soldOn: _, ...dates } = row.dates;
  const col = columns.find((column) => column.meaning === 'soldOn')?.col ?? 1;
  return { ...row, dates, asides: [...row.asides, { col, reason: 'missing-amount', text: soldOn, cents: null }] };
}

// A heading longer than an entry's text is left to the row that the entry links to.
const LONGEST_WHAT = 500;
const KINDS = {
  purchase: 'purchase',
  cost: 'entry',
  estimate: 'estimate',
  sale: 'sale',
  hours: 'hours',
  'estimated hours': 'estimated hours',
  asking: 'asking',
  'expected sale': 'expected sale',
} as const;

function lineOf({ column, cents, seconds, isGuess }: Figure, draft: Draft, row: VehicleCells, line: number): DraftLine {
  const kind = KINDS[column.meaning as keyof typeof KINDS];
  const on = kind === 'purchase' ? row.dates.boughtOn : kind === 'sale' ? row.dates.soldOn : undefined;
  return {
    kind,
    draft,
    category: column.category,
    on: on ?? null,
    cents,
    seconds,
    vendor: null,
    what: column.heading.length > LONGEST_WHAT ? null : column.heading || null,
    foreseen: null,
    person: null,
    isExtra: false,
    isGuess,
    row: line,
    col: column.col,
  };
}
