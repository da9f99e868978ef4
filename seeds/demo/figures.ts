import { buyersFee, CLASS_TRAITS, DAMAGE_TRAITS, FIRST_YEAR } from './parameters.ts';
import type { Slot } from './quota.ts';
import { type Random, random } from './random.ts';

/** The repair by kind of work, in dollars. */
export interface Repair {
  readonly parts: number;
  readonly paint: number;
  readonly restraints: number;
  readonly small: number;
  readonly paper: number;
  readonly selling: number;
}

/** What one vehicle is worth, was planned to cost and did cost, in dollars and hours, before it becomes receipts. */
export interface Figures {
  readonly clean: number;
  readonly hammer: number;
  readonly fee: number;
  readonly lateFee: number;
  /** The same for near and far: a haul from a lot that nobody drove to is never planned right. */
  readonly plannedHaul: number;
  readonly haul: number;
  readonly planned: Repair;
  readonly actual: Repair;
  readonly plannedHours: number;
  readonly hours: number;
  readonly surprises: readonly number[];
  /** Repair after the sale; 0 = none. */
  readonly comeback: number;
  /** What was asked of the estimate: the price that such a one fetches. */
  readonly expectedSale: number;
  /** The price before anything came off for waiting. */
  readonly price: number;
}

/** Unseen ones bring this many times the surprises. */
const UNSEEN_SURPRISES = 2.1;
const HOURS_PER_SURPRISE = 5;
/** The paint shop raised its prices in 2024; from 2025 on the estimates follow half way. */
const PAINT_STEP = 1.28;
const PAINT_LEARNED = 1.15;

export function figures(seed: number, slot: Slot): Figures {
  const chance = random(seed, `figures ${slot.index}`);
  const ofClass = CLASS_TRAITS[slot.class];
  const ofDamage = DAMAGE_TRAITS[slot.damage];
  const clean = roundTo(chance.logNormal(ofClass.clean, ofClass.logSd) * 1.02 ** (slot.boughtYear - FIRST_YEAR), 50);
  const hammer = roundTo(clean * ofDamage.hammer * Math.exp(0.08 * chance.normal()), 25);
  const planned = plannedRepair(slot, clean, chance);
  const surprises = surprisesOf(slot, chance);
  const plannedHours = Math.round(ofDamage.hours * ofClass.hoursFactor * Math.exp(0.1 * chance.normal()));
  const fair = clean * (1 - ofDamage.priceOff + ofClass.priceShift);
  return {
    clean,
    hammer,
    fee: buyersFee(hammer),
    lateFee: chance.pick([0, 0, 0, 0, 0, 40, 40, 80, 160]),
    plannedHaul: 200,
    haul: slot.wasSeen ? chance.between(140, 260) : chance.between(250, 620),
    planned,
    actual: actualRepair(slot, planned, chance),
    plannedHours,
    hours: plannedHours * chance.logNormal(1.42, 0.18) + HOURS_PER_SURPRISE * surprises.length,
    surprises,
    comeback: chance.chance(slot.damage === 'flood' ? 0.3 : 0.08) ? chance.between(150, 900) : 0,
    expectedSale: roundTo(fair, 100),
    price: fair * Math.exp(0.06 * chance.normal()),
  };
}

function plannedRepair(slot: Slot, clean: number, chance: Random): Repair {
  const plan = clean * DAMAGE_TRAITS[slot.damage].plan;
  const paint = slot.damage === 'theft' ? clean * 0.012 : plan * 0.3;
  const hasBags = ['front', 'side', 'rollover'].includes(slot.damage) && chance.chance(0.65);
  const risen = slot.boughtYear >= 2025 ? PAINT_LEARNED : 1;
  return {
    parts: roundTo(plan * 0.55 * Math.exp(0.22 * chance.normal()), 5),
    paint: roundTo(paint * risen * Math.exp(0.2 * chance.normal()), 10),
    restraints: hasBags ? roundTo(chance.between(450, 1_100), 10) : 0,
    small: roundTo(chance.between(180, 420), 5),
    paper: roundTo(chance.between(120, 225), 5),
    selling: roundTo(chance.between(60, 160), 5),
  };
}

/** What the planned work came to: parts are estimated a little better each year, hours and small systems never. */
function actualRepair(slot: Slot, planned: Repair, chance: Random): Repair {
  const partsLearned = 0.012 * Math.max(0, slot.boughtYear - 2022);
  const dearer = slot.boughtYear >= 2024 ? PAINT_STEP : 1;
  const learnedPaint = slot.boughtYear >= 2025 ? PAINT_LEARNED : 1;
  return {
    parts: planned.parts * chance.logNormal((slot.wasSeen ? 1.06 : 1.3) - partsLearned, 0.16),
    paint: planned.paint * chance.logNormal((1.04 * dearer) / learnedPaint, 0.12),
    restraints: planned.restraints * chance.logNormal(slot.wasSeen ? 1.05 : 1.28, 0.2),
    small: planned.small * chance.logNormal(1.35, 0.25),
    paper: planned.paper * chance.between(0.99, 1.12),
    selling: planned.selling * chance.between(0.9, 1.15),
  };
}

function surprisesOf(slot: Slot, chance: Random): number[] {
  const { surprises, surpriseDollars } = DAMAGE_TRAITS[slot.damage];
  const found = chance.poisson(surprises * (slot.wasSeen ? 1 : UNSEEN_SURPRISES));
  const count = slot.fate === 'parted out' ? Math.max(1, found) : found;
  return Array.from({ length: count }, () => chance.logNormal(surpriseDollars, 0.55));
}

function roundTo(value: number, step: number): number {
  return Math.round(value / step) * step;
}
