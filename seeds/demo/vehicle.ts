import { addDays } from '#shared/day.ts';
import { type Calendar, calendar, listingMedian, plannedDays } from './calendar.ts';
import type { DemoBaseline, DemoCategory, DemoEntry, DemoVehicle } from './demo-book.ts';
import { type Figures, figures } from './figures.ts';
import { COVER_PER_30_DAYS, HELPER_SHARE, helperWageCents, INTEREST_RATE } from './parameters.ts';
import type { Slot } from './quota.ts';
import { random } from './random.ts';
import { receipts } from './receipts.ts';
import { CHANNELS, COLORS, MODELS, SELLERS } from './words.ts';
import { wages, work } from './work.ts';

/** A parted-out vehicle brings this share of its clean value. */
const PARTS_INCOME = 0.17;
/** A price comes down by this much for each day of waiting beyond a month and a half. */
const CUT_PER_DAY = 4;
const PATIENCE_DAYS = 45;

/** One vehicle's whole story as a careful shop would have written it down. */
export function vehicle(seed: number, slot: Slot): DemoVehicle {
  const money = figures(seed, slot);
  const when = calendar(seed, slot, money);
  const hours = work(seed, slot, money.hours, when);
  const seen = looks(seed, slot);
  return {
    ...seen,
    class: slot.class,
    damage: slot.damage,
    isSeen: slot.wasSeen,
    source: 'ledger',
    purchaseCents: money.hammer * 100,
    ...sale(money, when, slot),
    dates: when.dates,
    baseline: baseline(money, when, slot),
    entries: byDay([...receipts(seed, slot, money, when, seen.boughtFrom), ...wages(hours)]),
    hours,
    lessons: lessonOf(slot, money.surprises.length),
  };
}

function byDay(entries: readonly DemoEntry[]): DemoEntry[] {
  return entries.toSorted((a, b) => ((a.datedOn ?? '') < (b.datedOn ?? '') ? -1 : 1));
}

/** What the owner wrote down afterwards. */
function lessonOf({ fate, wasSeen, damage }: Slot, surpriseCount: number): string | null {
  if (fate === 'parted out') return 'Should have stopped at the teardown, before buying parts.';
  if (surpriseCount >= 2 && !wasSeen) return 'Two bad finds that a flashlight would have shown. Go and look first.';
  return damage === 'flood' && fate === 'sold' ? 'Whatever was dry on the photos was not.' : null;
}

function looks(seed: number, slot: Slot) {
  const chance = random(seed, `looks ${slot.index}`);
  const [make, model] = chance.pick(MODELS[slot.class]);
  const isSold = slot.fate === 'sold';
  return {
    tag: `B-${String(slot.index + 1).padStart(3, '0')}`,
    year: slot.boughtYear - chance.whole(4, 10),
    make,
    model,
    color: chance.pick(COLORS),
    vin: null,
    titleBrandBought: slot.damage === 'flood' ? 'salvage, flood' : 'salvage',
    titleBrandSold: isSold ? 'rebuilt' : null,
    odometer: chance.whole(41_000, 138_000),
    boughtFrom: chance.pick(SELLERS),
    buyerChannel: isSold ? chance.pick(CHANNELS) : null,
  };
}

function sale(money: Figures, { dates, exitOn, daysListed }: Calendar, { fate }: Slot) {
  const cut = CUT_PER_DAY * Math.max(0, daysListed - PATIENCE_DAYS);
  const first = Math.ceil((money.price * 1.04) / 100) * 100;
  const now = Math.round((first - cut) / 50) * 50;
  const askingCents = dates.listedOn === null ? null : now * 100;
  const notes =
    now < first ? `First asked ${first.toLocaleString('en-US')}; came down to ${now.toLocaleString('en-US')}.` : null;
  const saleCents = fate === 'sold' ? Math.round((money.price - cut) / 50) * 5_000 : null;
  const exit =
    exitOn === null
      ? null
      : { kind: 'parted out' as const, on: exitOn, cents: Math.round(money.clean * PARTS_INCOME) * 100 };
  return { askingCents, saleCents, exit, notes };
}

/** The estimate as it was locked: everything that the owner expects to pay, hours short and wages with them. */
function baseline(money: Figures, { dates }: Calendar, slot: Slot): DemoBaseline {
  const { planned, plannedHours, hammer } = money;
  const expectedDays = Math.round(10 + plannedDays(plannedHours, listingMedian(slot)));
  // Cover and interest are planned short: that it must sell, too, is half forgotten every time.
  const heldDays = expectedDays - listingMedian(slot) / 2;
  const inspection = Math.round(planned.paper * 0.45);
  const dollars: readonly (readonly [DemoCategory, number])[] = [
    ['auction fees', money.fee],
    ['transport', money.plannedHaul],
    ['parts', planned.parts],
    ['outside labor (sublet)', planned.paint],
    ['restraints (SRS)', planned.restraints],
    ['small systems', planned.small],
    ['inspection', inspection],
    ['title & registration', planned.paper - inspection],
    ['selling costs', planned.selling],
    ['paid labor', Math.round((plannedHours * HELPER_SHARE * helperWageCents(slot.boughtYear)) / 500) * 5],
    ['insurance', Math.round((COVER_PER_30_DAYS * heldDays) / 150) * 5],
    ['other', Math.round((INTEREST_RATE * (hammer + planned.parts) * heldDays) / 1825) * 5],
  ];
  return {
    madeOn: dates.boughtOn === null ? null : addDays(dates.boughtOn, -1),
    plannedSeconds: plannedHours * 3600,
    expectedSaleCents: money.expectedSale * 100,
    expectedDays,
    lines: new Map(dollars.filter(([, value]) => value > 0).map(([name, value]) => [name, value * 100])),
  };
}
