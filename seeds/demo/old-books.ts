import type { Day } from '#shared/day.ts';
import type { DemoBook, DemoCategory, DemoEntry, DemoVehicle } from './demo-book.ts';

/** The old spreadsheets as text, as somebody kept them by hand: dollar signs, a total at the foot, loose names. */
export interface OldBooks {
  /** One row per vehicle. */
  readonly cars: string;
  /** One row per receipt. */
  readonly receipts: string;
}

export function oldBooks({ vehicles }: DemoBook): OldBooks {
  return {
    cars: carsSheet(vehicles.filter(({ source }) => source === 'cars sheet')),
    receipts: receiptsList(vehicles.filter(({ source }) => source === 'receipts list')),
  };
}

/** Heading of each money column; each has one for its plan on its left. */
const COLUMNS: readonly (readonly [heading: string, category: DemoCategory])[] = [
  ['Fees', 'auction fees'],
  ['Tow', 'transport'],
  ['Parts', 'parts'],
  ['Body shop', 'outside labor (sublet)'],
  ['Airbags', 'restraints (SRS)'],
  ['Glass', 'small systems'],
  ['Title + plates', 'title & registration'],
  ['Inspection', 'inspection'],
  ['Ad', 'selling costs'],
  ['Helper', 'paid labor'],
];

type Cell = string | { readonly cents: number | null };

function carsSheet(vehicles: readonly DemoVehicle[]): string {
  const head = ['Stock', 'Year', 'Make', 'Model', 'Type', 'Damage', 'Miles', 'Bought', 'Bid'];
  const pairs = COLUMNS.flatMap(([heading]) => [`${heading} est.`, heading]);
  const tail = ['Total in', 'Hrs', 'Ready', 'Listed', 'Sold on', 'Sold for', 'Profit'];
  const rows = vehicles.map(carsRow);
  return csv([[...head, ...pairs, ...tail], ...rows, totals(rows)]);
}

function carsRow(vehicle: DemoVehicle): Cell[] {
  const { tag, year, make, model, dates, purchaseCents, saleCents, baseline, hours } = vehicle;
  const costs = COLUMNS.flatMap(([, category]) => [
    { cents: baseline?.lines.get(category) ?? null },
    { cents: vehicle.entries.find((entry) => entry.category === category)?.cents ?? null },
  ]);
  const total = purchaseCents + vehicle.entries.reduce((sum, { cents }) => sum + cents, 0);
  const seconds = hours.reduce((sum, row) => sum + row.seconds, 0);
  return [
    tag,
    String(year),
    make,
    model,
    vehicle.class,
    vehicle.damage,
    vehicle.odometer?.toLocaleString('en-US') ?? '',
    typed(dates.boughtOn),
    { cents: purchaseCents },
    ...costs,
    { cents: total },
    String(seconds / 3600),
    ...[dates.roadworthyOn, dates.listedOn, dates.soldOn].map(typed),
    { cents: saleCents },
    { cents: saleCents === null ? null : saleCents - total },
  ];
}

function totals(rows: readonly (readonly Cell[])[]): Cell[] {
  return (rows[0] ?? []).map((first, column) => {
    if (column === 0) return 'TOTAL';
    if (typeof first === 'string') return '';
    return { cents: rows.reduce((sum, row) => sum + centsOf(row[column]), 0) };
  });
}

function centsOf(cell: Cell | undefined): number {
  return cell === undefined || typeof cell === 'string' ? 0 : (cell.cents ?? 0);
}

const WORDS: Readonly<Partial<Record<DemoCategory, string>>> = {
  'auction fees': 'Auction fee',
  transport: 'Towing',
  parts: 'Parts',
  'outside labor (sublet)': 'Body shop',
  'restraints (SRS)': 'Airbags',
  'small systems': 'Glass',
  'title & registration': 'Title/DMV',
  inspection: 'Inspection',
  'selling costs': 'Ads',
  'paid labor': 'Helper',
};

/** A receipt of a day that no calendar has: it can only be put aside. */
const UNREADABLE: readonly Cell[] = [
  '2/30/2022',
  '',
  'Parts',
  'hose clamps',
  'Ottermere Hardware',
  { cents: 1_840 },
  '',
];

function receiptsList(vehicles: readonly DemoVehicle[]): string {
  const rows = vehicles
    .flatMap((vehicle) => receiptRows(vehicle))
    .sort((a, b) => (a.day < b.day ? -1 : a.day > b.day ? 1 : 0))
    .map(({ cells }) => cells);
  const [first, ...others] = rows;
  const odd = UNREADABLE.map((cell, column) => (column === 1 ? (first?.[1] ?? '') : cell));
  const all = first ? [first, odd, ...others] : [];
  const sums = [5, 6].map((column) => ({ cents: all.reduce((sum, row) => sum + centsOf(row[column]), 0) }));
  return csv([
    ['Date', 'Car', 'What for', 'Details', 'Bought from', 'Paid', 'Got back'],
    ...all,
    ['', '', '', 'Total', '', ...sums],
  ]);
}

function receiptRows(vehicle: DemoVehicle): { day: Day; cells: Cell[] }[] {
  const { dates, purchaseCents, saleCents, entries } = vehicle;
  const bought = { datedOn: dates.boughtOn, cents: purchaseCents, vendor: null, what: 'bid' };
  const sold = { datedOn: dates.soldOn, cents: -(saleCents ?? 0), vendor: null, what: 'sold it' };
  const all = [
    { ...bought, word: 'Purchase' },
    ...entries.map((entry) => ({ ...entry, word: WORDS[entry.category] ?? '' })),
    { ...sold, word: 'Sale' },
  ];
  return all.map((entry, index) => ({
    day: entry.datedOn ?? '',
    cells: [
      typed(entry.datedOn),
      nickname(vehicle, index),
      entry.word,
      entry.what ?? '',
      entry.vendor ?? '',
      ...paidOrBack(entry),
    ],
  }));
}

function paidOrBack({ cents }: Pick<DemoEntry, 'cents'>): [Cell, Cell] {
  return cents < 0 ? ['', { cents: -cents }] : [{ cents }, ''];
}

/** The same car is called now this, now that. */
function nickname({ year, make, model }: DemoVehicle, index: number): string {
  const short = `${String(year).slice(2)} ${model}`;
  return [short, `${year} ${make} ${model}`, short.toUpperCase(), short, `${year} ${model}`][index % 5] ?? short;
}

/** A day as typed: 3/12/2021. */
function typed(day: Day | null): string {
  return day === null ? '' : `${Number(day.slice(5, 7))}/${Number(day.slice(8))}/${day.slice(0, 4)}`;
}

function csv(rows: readonly (readonly Cell[])[]): string {
  return `${rows.map((row) => row.map(written).join(',')).join('\r\n')}\r\n`;
}

function written(cell: Cell): string {
  const text = typeof cell === 'string' ? cell : cell.cents === null ? '' : dollars(cell.cents);
  return /[",]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

function dollars(cents: number): string {
  const text = (Math.abs(cents) / 100).toLocaleString('en-US', { minimumFractionDigits: 2 });
  return cents < 0 ? `-$${text}` : `$${text}`;
}
