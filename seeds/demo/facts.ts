import type { RebuildFacts } from '../../server/domain/facts.ts';
import { factsFromLines } from '../../server/domain/facts-from-lines.ts';
import type { Measured } from './bands.ts';
import type { DemoBook, DemoVehicle } from './demo-book.ts';

/** The whole book as the checks of a seed take it, worked out without a warehouse. */
export function measured({ vehicles }: DemoBook): Measured {
  const planned = vehicles.flatMap(({ tag, baseline }) =>
    baseline?.plannedSeconds == null ? [] : [[tag, baseline.plannedSeconds] as const],
  );
  return { facts: vehicles.map(factsOf), plannedSeconds: new Map(planned) };
}

function factsOf(vehicle: DemoVehicle): RebuildFacts {
  const frame = {
    id: vehicle.tag,
    class: vehicle.class,
    damage: vehicle.damage,
    seen: vehicle.isSeen,
    boughtOn: vehicle.dates.boughtOn,
    readyOn: vehicle.dates.roadworthyOn,
    listedOn: vehicle.dates.listedOn,
    exit: exitOf(vehicle),
    purchaseCents: vehicle.purchaseCents,
    ownSeconds: secondsOf(vehicle, false),
    paidSeconds: secondsOf(vehicle, true),
    estimates: vehicle.baseline?.lines ?? new Map<string, number>(),
  };
  const lines = vehicle.entries.map(({ datedOn, category, cents, foreseen, isExtra }) => ({
    on: datedOn,
    category,
    cents,
    isForeseen: foreseen === null ? null : foreseen === 'foreseen',
    isExtra,
    freeCents: null,
  }));
  return factsFromLines(frame, lines, 'paid labor');
}

function exitOf({ dates, saleCents, exit }: DemoVehicle): RebuildFacts['exit'] {
  if (exit) return { kind: exit.kind, on: exit.on, proceedsCents: exit.cents };
  if (dates.soldOn === null || saleCents === null) return null;
  return { kind: 'sold', on: dates.soldOn, proceedsCents: saleCents };
}

function secondsOf({ hours }: DemoVehicle, isPaid: boolean): number | null {
  const own = hours.filter(({ worker }) => (worker === 'helper') === isPaid);
  return own.length === 0 ? null : own.reduce((total, { seconds }) => total + seconds, 0);
}
