import { addDays, type Day, daysBetween } from '#shared/day.ts';
import type { DemoDates } from './demo-book.ts';
import type { Figures } from './figures.ts';
import { CLASS_TRAITS, DAMAGE_TRAITS, DEMO_TODAY } from './parameters.ts';
import type { Slot } from './quota.ts';
import { type Random, random } from './random.ts';

/** When things happened to one vehicle; `exitOn` is the day of another exit than a sale. */
export interface Calendar {
  readonly dates: DemoDates;
  readonly exitOn: Day | null;
  /** Day up to which it cost money: its exit, or today. */
  readonly heldUntil: Day;
  readonly daysListed: number;
}

/** Days of work: 10.5 hours a week on one vehicle, and as many idle days as waiting for parts and paint takes. */
export function plannedDays(plannedHours: number, listingDays: number): number {
  return Math.round((plannedHours / 10.5) * 7 + 18 + 21 + listingDays);
}

export function listingMedian(slot: Slot): number {
  return CLASS_TRAITS[slot.class].listingDays * DAMAGE_TRAITS[slot.damage].listing;
}

export function calendar(seed: number, slot: Slot, { hours, lateFee }: Figures): Calendar {
  const chance = random(seed, `calendar ${slot.index}`);
  const boughtOn = addDays(`${slot.boughtYear}-01-01`, dayOfYear(slot, chance));
  const paidOn = addDays(boughtOn, lateFee === 0 ? chance.whole(0, 3) : 3 + lateFee / 40);
  const pickedUpOn = addDays(paidOn, chance.whole(1, 7));
  const startedOn = addDays(pickedUpOn, chance.whole(1, 16));
  const roadworthyOn = addDays(startedOn, Math.round((hours / 10.5) * 7 + chance.between(10, 30)));
  const early = { boughtOn, paidOn, pickedUpOn, startedOn };
  if (slot.fate === 'in work') return held({ ...NO_DATES, ...early }, DEMO_TODAY);
  if (slot.fate === 'parted out') {
    const exitOn = addDays(startedOn, chance.whole(70, 150));
    return { ...held({ ...NO_DATES, ...early }, exitOn), exitOn };
  }
  return finished({ ...NO_DATES, ...early, roadworthyOn }, roadworthyOn, slot, chance);
}

function finished(early: DemoDates, roadworthyOn: Day, slot: Slot, chance: Random): Calendar {
  const paperDays = Math.max(4, Math.round(chance.gamma(3, 7)));
  const inspectedOn = addDays(roadworthyOn, Math.max(2, Math.round(paperDays * chance.between(0.35, 0.7))));
  const titleIssuedOn = addDays(roadworthyOn, paperDays);
  // Now and then the ad is out before the title is: common, and risky.
  const listedOn = addDays(titleIssuedOn, chance.chance(0.12) ? -chance.whole(2, 6) : chance.whole(0, 4));
  const listed = { ...early, inspectedOn, titleIssuedOn, listedOn };
  const natural = Math.max(1, Math.round(chance.logNormal(listingMedian(slot), 0.55)));
  const settleDays = chance.whole(2, 14);
  if (slot.fate !== 'sold') return { ...held(listed, DEMO_TODAY), daysListed: daysBetween(listedOn, DEMO_TODAY) };
  const soldOn = addDays(listedOn, natural);
  return { ...held({ ...listed, soldOn, settledOn: addDays(soldOn, settleDays) }, soldOn), daysListed: natural };
}

function held(dates: DemoDates, heldUntil: Day): Calendar {
  return { dates, exitOn: null, heldUntil, daysListed: 0 };
}

const NO_DATES: DemoDates = {
  boughtOn: null,
  paidOn: null,
  pickedUpOn: null,
  startedOn: null,
  roadworthyOn: null,
  inspectedOn: null,
  titleIssuedOn: null,
  listedOn: null,
  soldOn: null,
  settledOn: null,
};

/** Buys are spread over the year; in the last one they come early enough to be where the demo's today finds them. */
function dayOfYear({ fate, boughtYear, season }: Slot, chance: Random): number {
  const jitter = chance.whole(-7, 7);
  if (fate === 'listed long') return 6 + Math.abs(jitter);
  if (fate === 'listed') return 172 + jitter;
  if (fate === 'in work') return (season < 0.9 ? 258 : 292) + jitter;
  const isLastYear = boughtYear === Number(DEMO_TODAY.slice(0, 4));
  return Math.max(2, Math.round(season * (isLastYear ? 205 : 350)) + jitter);
}
