import { addDays } from '#shared/day.ts';

/** Invented books of a given size, the same for the same seed: rebuilds with plans, and ledger lines over them. */
export interface InventedRebuild {
  readonly tag: string;
  readonly class: number;
  readonly damage: number;
  readonly isSeen: boolean;
  readonly boughtOn: string;
  readonly startedOn: string;
  readonly readyOn: string;
  readonly listedOn: string | null;
  readonly soldOn: string | null;
  readonly purchaseCents: number;
  readonly saleCents: number | null;
  readonly ownSeconds: number;
  readonly paidSeconds: number;
  readonly plannedSeconds: number;
  /** Cents planned per category, by its place in the shop's list. */
  readonly plan: readonly number[];
}

export interface InventedLine {
  /** Place of the rebuild in the list; null = overhead. */
  readonly rebuild: number | null;
  readonly category: number;
  readonly on: string;
  readonly cents: number;
  readonly isSurprise: boolean;
}

export const CATEGORY_COUNT = 14;
export const TODAY = '2026-06-15';

/** Small, fast and repeatable; not for anything secret. Values from 0 up to 1. */
export function randomFrom(seed: number): () => number {
  let state = seed >>> 0 || 1;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    state >>>= 0;
    return state / 4_294_967_296;
  };
}

export function inventRebuilds(count: number, seed = 20_261_215): InventedRebuild[] {
  const random = randomFrom(seed);
  const between = (low: number, high: number) => Math.floor(low + random() * (high - low));
  return Array.from({ length: count }, (_, i) => {
    const boughtOn = addDays('2016-02-01', Math.floor((i * 3700) / count));
    const startedOn = addDays(boughtOn, between(3, 30));
    const readyOn = addDays(startedOn, between(10, 90));
    const listed = addDays(readyOn, between(0, 20));
    const sold = addDays(listed, between(1, 30) + between(0, 60));
    const isListed = listed <= TODAY;
    const isSold = isListed && sold <= TODAY && random() > 0.04;
    const purchaseCents = between(200_000, 1_200_000);
    return {
      tag: `R-${String(i + 1).padStart(5, '0')}`,
      class: between(0, 7),
      damage: between(0, 9),
      isSeen: random() < 0.5,
      boughtOn,
      startedOn,
      readyOn,
      listedOn: isListed ? listed : null,
      soldOn: isSold ? sold : null,
      purchaseCents,
      saleCents: isSold ? purchaseCents + between(200_000, 900_000) : null,
      ownSeconds: between(20, 140) * 3600,
      paidSeconds: between(0, 60) * 3600,
      plannedSeconds: between(20, 120) * 3600,
      plan: Array.from({ length: CATEGORY_COUNT }, (_c, c) => (c % 3 === 2 ? 0 : between(5_000, 60_000))),
    };
  });
}

/** `perRebuild` lines on each, of which one in a hundred is overhead instead. */
export function inventLines(rebuilds: readonly InventedRebuild[], perRebuild: number, seed = 7): InventedLine[] {
  const random = randomFrom(seed);
  const lines: InventedLine[] = [];
  for (const [index, rebuild] of rebuilds.entries()) {
    for (let i = 0; i < perRebuild; i += 1) {
      lines.push({
        rebuild: random() < 0.01 ? null : index,
        category: Math.floor(random() * CATEGORY_COUNT),
        on: addDays(rebuild.boughtOn, Math.floor(random() * 120)),
        cents: random() < 0.03 ? -Math.floor(random() * 9_000) : Math.floor((600_000 / perRebuild) * 2 * random()),
        isSurprise: random() < 0.01,
      });
    }
  }
  return lines;
}
