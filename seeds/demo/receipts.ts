import { addDays, type Day, daysBetween } from '#shared/day.ts';
import type { Foreseen } from '#shared/vocabulary.ts';
import type { Calendar } from './calendar.ts';
import type { DemoCategory, DemoEntry } from './demo-book.ts';
import type { Figures, Repair } from './figures.ts';
import { COVER_PER_30_DAYS, DEMO_TODAY, INTEREST_RATE } from './parameters.ts';
import type { Fate, Slot } from './quota.ts';
import { type Random, random } from './random.ts';
import { EXTRAS, PAINT_JOBS, PAINT_SHOP, PART_VENDORS, PARTS, RESTRAINT_JOBS, SMALL_JOBS, SURPRISES } from './words.ts';

/** How much of each kind of work was bought by the end: a car in parts or still in work has not had it all. */
const DONE: Readonly<Partial<Record<Fate, Repair>>> = {
  'parted out': { parts: 0.35, paint: 0, restraints: 0, small: 0.4, paper: 0, selling: 1 },
  'in work': { parts: 0.8, paint: 0, restraints: 0, small: 0, paper: 0, selling: 0 },
};

interface Till {
  readonly chance: Random;
  readonly slot: Slot;
  readonly entries: DemoEntry[];
  add(
    category: DemoCategory,
    day: Day | null,
    dollars: number,
    vendor: string,
    what: string,
    kind?: Foreseen | 'chosen extra',
  ): void;
}

/** Every receipt of one vehicle but the wages, from its auction fee to the repair after its sale. */
export function receipts(seed: number, slot: Slot, figures: Figures, calendar: Calendar, seller: string): DemoEntry[] {
  const till = openTill(random(seed, `receipts ${slot.index}`), slot);
  const done = DONE[slot.fate];
  const share = (kind: keyof Repair) => figures.actual[kind] * (done?.[kind] ?? 1);
  buying(till, figures, calendar, seller);
  const [from, to] = bench(calendar);
  buyParts(till, share('parts'), from, to);
  each(
    till,
    'outside labor (sublet)',
    share('paint'),
    to,
    PAINT_JOBS.map((what) => [what, PAINT_SHOP]),
    2,
  );
  each(till, 'restraints (SRS)', share('restraints'), to, RESTRAINT_JOBS, 2);
  each(till, 'small systems', share('small'), to, SMALL_JOBS, 3);
  surprises(till, figures.surprises, from, to);
  paper(till, share('paper'), share('selling'), calendar);
  holding(till, figures, calendar);
  afterSale(till, figures.comeback, calendar);
  return till.entries;
}

function openTill(chance: Random, slot: Slot): Till {
  const entries: DemoEntry[] = [];
  return {
    chance,
    slot,
    entries,
    add(category, day, dollars, vendor, what, kind = 'foreseen') {
      const cents = Math.round(dollars * 100);
      const datedOn = day !== null && day > DEMO_TODAY ? DEMO_TODAY : day;
      const isExtra = kind === 'chosen extra';
      const foreseen = isExtra ? 'foreseen' : kind;
      if (cents !== 0) entries.push({ category, datedOn, cents, vendor, what, foreseen, isExtra });
    },
  };
}

function buying(till: Till, { fee, lateFee, haul }: Figures, { dates }: Calendar, seller: string): void {
  till.add('auction fees', dates.paidOn, fee, seller, "buyer's fee");
  till.add('auction fees', dates.paidOn, lateFee, seller, 'late payment');
  till.add('transport', dates.pickedUpOn, priced(till.chance, haul), 'Nettlewhit Hauling', 'haul home');
}

/** First and last day of work on the bench, as far as it got. */
function bench({ dates, exitOn, heldUntil }: Calendar): [Day, Day] {
  const from = dates.startedOn ?? heldUntil;
  return [from, dates.roadworthyOn ?? exitOn ?? heldUntil];
}

function buyParts(till: Till, dollars: number, from: Day, to: Day): void {
  const { chance, slot } = till;
  const count = Math.max(1, Math.min(6, Math.round(dollars / 130)));
  const names = chance.shuffle(PARTS[slot.damage]);
  for (const [index, part] of shares(chance, dollars, count).entries()) {
    const day = dayWithin(chance, from, to, 0, 0.75);
    till.add('parts', day, priced(chance, part), chance.pick(PART_VENDORS), names[index % names.length] ?? 'parts');
  }
  if (!chance.chance(0.25)) return;
  const core = chance.pick([22, 35, 45, 60]);
  const day = dayWithin(chance, from, to, 0.1, 0.5);
  till.add('parts', day, core, 'Junction Parts Counter', 'core deposit');
  till.add('parts', addDays(day, chance.whole(4, 12)), -core, 'Junction Parts Counter', 'core returned');
}

/** Bills of one kind towards the end of the work. */
function each(
  till: Till,
  category: DemoCategory,
  dollars: number,
  to: Day,
  jobs: readonly (readonly [what: string, vendor: string])[],
  most: number,
): void {
  if (dollars <= 0) return;
  const { chance } = till;
  const picked = chance.shuffle(jobs).slice(0, chance.whole(1, Math.min(most, Math.max(1, Math.floor(dollars / 90)))));
  for (const [index, part] of shares(chance, dollars, picked.length).entries()) {
    const [what, vendor] = picked[index] ?? ['', ''];
    till.add(category, addDays(to, -chance.whole(0, 12)), priced(chance, part), vendor, what);
  }
}

/** What nobody foresaw goes where the same work would have gone, had it been planned. */
function surprises(till: Till, dollars: readonly number[], from: Day, to: Day): void {
  const { chance, slot } = till;
  const names = chance.shuffle(SURPRISES[slot.damage]);
  for (const [index, amount] of dollars.entries()) {
    const category = chance.pick(['parts', 'parts', 'parts', 'outside labor (sublet)', 'small systems'] as const);
    const vendor =
      category === 'parts'
        ? chance.pick(PART_VENDORS)
        : category === 'small systems'
          ? 'Ottermere Alignment'
          : PAINT_SHOP;
    const day = dayWithin(chance, from, to, 0.1, 0.9);
    till.add(
      category,
      day,
      priced(chance, amount),
      vendor,
      names[index % names.length] ?? 'found on teardown',
      'surprise',
    );
  }
  if (slot.fate === 'sold' && chance.chance(0.08)) {
    till.add('parts', to, priced(chance, chance.between(70, 190)), 'online', chance.pick(EXTRAS), 'chosen extra');
  }
}

function paper(till: Till, dollars: number, selling: number, { dates, exitOn }: Calendar): void {
  const inspection = Math.round(dollars * 0.45);
  till.add('inspection', dates.inspectedOn, inspection, 'state inspection', 'rebuilt inspection');
  till.add(
    'title & registration',
    dates.titleIssuedOn,
    Math.round((dollars - inspection) * 4) / 4,
    'county clerk',
    'title and plates',
  );
  const adDay = dates.listedOn ?? exitOn;
  if (adDay === null) return;
  const ad = till.chance.pick([15, 20, 25]);
  till.add('selling costs', adDay, Math.min(ad, selling), 'Ottermere Weekly', 'ad');
  till.add(
    'selling costs',
    adDay,
    priced(till.chance, Math.max(0, selling - ad)),
    'Junction Shine',
    'detail and photos',
  );
}

/** Cover and interest while it is owned, a quarter at a time. */
function holding(till: Till, { hammer, actual }: Figures, { dates, heldUntil }: Calendar): void {
  const boughtOn = dates.boughtOn ?? heldUntil;
  for (let from = boughtOn; from < heldUntil; from = addDays(from, 91)) {
    const to = addDays(from, 91) < heldUntil ? addDays(from, 91) : heldUntil;
    const days = daysBetween(from, to);
    till.add('insurance', from, (COVER_PER_30_DAYS * days) / 30, 'Ottermere Mutual', `cover, ${days} days`);
    till.add(
      'other',
      to,
      (INTEREST_RATE * (hammer + actual.parts) * days) / 365,
      'credit line',
      `interest, ${days} days`,
    );
  }
}

function afterSale(till: Till, dollars: number, { dates }: Calendar): void {
  if (dates.soldOn === null || dollars === 0) return;
  const day = addDays(dates.soldOn, till.chance.whole(9, 60));
  if (day > DEMO_TODAY) return;
  till.add('selling costs', day, priced(till.chance, dollars), 'Junction Cooling', 'goodwill repair after the sale');
}

function dayWithin(chance: Random, from: Day, to: Day, low: number, high: number): Day {
  return addDays(from, Math.round(Math.max(0, daysBetween(from, to)) * chance.between(low, high)));
}

/** Uneven parts of an amount. */
function shares(chance: Random, total: number, count: number): number[] {
  const weights = Array.from({ length: count }, () => chance.between(0.4, 1.6));
  const sum = weights.reduce((a, b) => a + b, 0);
  return weights.map((weight) => (total * weight) / sum);
}

/** An amount as a till prints it: whole, just under a dollar, or with the odd cents of tax. */
function priced(chance: Random, dollars: number): number {
  const roll = chance.next();
  if (roll < 0.35) return Math.max(1, Math.round(dollars));
  if (roll < 0.65) return Math.max(1, Math.round(dollars)) - chance.pick([0.01, 0.05, 0.5, 0.51]);
  return Math.max(0.01, Math.round(dollars * 100) / 100);
}
