import fc from 'fast-check';

/** A random small shop's books, from which files in any form are written. */
export interface ShopBook {
  readonly cars: readonly { readonly year: number; readonly model: string }[];
  readonly rows: readonly BookRow[];
}

export interface BookRow {
  /** Days after 2018-01-01. */
  readonly day: number;
  readonly car: number;
  readonly kind: number;
  readonly cents: number;
  readonly what: number;
}

const MODELS = ['Corolla', 'Miata', 'Octavia', 'Clio', 'Transit', 'Forester'];
export const TEXTS = ['left front', 'door; used', 'two, of them', 'Tür hinten', 'it said "new"', 'côté droit'];

export const shopBooks: fc.Arbitrary<ShopBook> = fc.record({
  cars: fc
    .uniqueArray(fc.record({ year: fc.integer({ min: 2001, max: 2016 }), model: fc.constantFrom(...MODELS) }), {
      minLength: 2,
      maxLength: 5,
      selector: ({ model }) => model,
    })
    .map((cars) => [...cars]),
  rows: fc.array(
    fc.record({
      day: fc.integer({ min: 0, max: 1500 }),
      car: fc.nat(),
      kind: fc.nat(),
      cents: fc.integer({ min: 101, max: 900_000 }),
      what: fc.nat(TEXTS.length - 1),
    }),
    { minLength: 3, maxLength: 25 },
  ),
});

/** How a shop of one country writes: headings by what a column holds, kinds of cost by the shop's own names. */
export interface Writing {
  readonly headings: Readonly<Record<'date' | 'car' | 'kind' | 'what' | 'amount', string>>;
  readonly kinds: readonly (readonly [category: string, word: string])[];
  readonly decimal: '.' | ',';
  readonly dateOf: (year: string, month: string, day: string) => string;
}

const kinds = (purchase: string, parts: string, paint: string, transport: string, inspection: string) =>
  [
    ['purchase', purchase],
    ['parts', parts],
    ['paint & body materials', paint],
    ['transport', transport],
    ['inspection', inspection],
  ] as const;

export const WRITINGS: readonly Writing[] = [
  {
    headings: { date: 'Date', car: 'Car', kind: 'Category', what: 'Description', amount: 'Cost' },
    kinds: kinds('Purchase', 'Parts', 'Paint', 'Towing', 'Inspection'),
    decimal: '.',
    dateOf: (year, month, day) => `${month}/${day}/${year}`,
  },
  {
    headings: {
      date: 'Belegdatum',
      car: 'Fahrzeug',
      kind: 'Kostenart',
      what: 'Verwendungszweck',
      amount: 'Betrag (€)',
    },
    kinds: kinds('Kaufpreis', 'Ersatzteile', 'Lack', 'Abschleppen', 'TÜV'),
    decimal: ',',
    dateOf: (year, month, day) => `${day}.${month}.${year}`,
  },
  {
    headings: { date: 'Fecha', car: 'Vehículo', kind: 'Tipo de gasto', what: 'Concepto', amount: 'Importe' },
    kinds: kinds('Compra', 'Piezas', 'Pintura', 'Grúa', 'ITV'),
    decimal: ',',
    dateOf: (year, month, day) => `${day}/${month}/${year}`,
  },
  {
    headings: { date: 'Date', car: 'Véhicule', kind: 'Poste', what: 'Libellé', amount: 'Montant TTC' },
    kinds: kinds('Achat', 'Pièces', 'Peinture', 'Remorquage', 'Contrôle technique'),
    decimal: ',',
    dateOf: (year, month, day) => `${year}-${month}-${day}`,
  },
];

const isoOf = (day: number) => new Date(Date.UTC(2018, 0, 1) + day * 86_400_000).toISOString().slice(0, 10);

/** What the warehouse has to hold: every cost by day, vehicle, category and cents, in the order of the rows. */
export function factsOf({ cars, rows }: ShopBook) {
  return rows.map(({ day, car, kind, cents, what }) => ({
    on: isoOf(day),
    vehicle: nameOf(cars, car),
    category: WRITINGS[0]?.kinds[kind % 5]?.[0],
    cents,
    what: TEXTS[what],
  }));
}

export const nameOf = (cars: ShopBook['cars'], at: number) => {
  const car = cars[at % cars.length];
  return `${car?.year} ${car?.model}`;
};

/** The books as a table of cells; the columns in this order. */
export function tableOf({ cars, rows }: ShopBook, writing: Writing, order: readonly number[]): string[][] {
  const { headings, dateOf } = writing;
  const all = rows.map(({ day, car, kind, cents, what }) => {
    const [year = '', month = '', date = ''] = isoOf(day).split('-');
    const whole = String(Math.floor(cents / 100));
    const amount = `${whole}${writing.decimal}${String(cents % 100).padStart(2, '0')}`;
    return [
      dateOf(year, month, date),
      nameOf(cars, car),
      writing.kinds[kind % 5]?.[1] ?? '',
      TEXTS[what] ?? '',
      amount,
    ];
  });
  const head = [headings.date, headings.car, headings.kind, headings.what, headings.amount];
  return [head, ...all].map((cells) => order.map((at) => cells[at] ?? ''));
}
