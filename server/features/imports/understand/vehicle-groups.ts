import { fold } from '../cells/fold.ts';
import { splitGroups } from './split-groups.ts';
import { isSlip, modelKey, readVehicle, type VehicleText } from './vehicle-text.ts';

/** Spellings that mean one vehicle. */
export interface VehicleGroup {
  /** `2013|f150`: tells groups of one file apart. */
  readonly id: string;
  /** The spelling used most, as the tag of a new rebuild. */
  name: string;
  year: number | null;
  make: string | null;
  model: string | null;
  count: number;
  readonly spellings: string[];
  /** A person, or its color, told it from one of the same year and model. */
  readonly isSplit?: boolean;
}

/** A spelling that fits a vehicle without being the same: what it was taken for, and what else it may be. */
export interface VehicleDoubt {
  readonly spelling: string;
  /** null = two fit equally, so none was taken. */
  readonly taken: VehicleGroup | null;
  readonly others: readonly VehicleGroup[];
  readonly why: string;
  /** What is done unless someone answers otherwise, where that is neither `taken` nor 'aside'. */
  readonly preset?: 'own';
}

export interface VehicleGroups {
  readonly of: ReadonlyMap<string, VehicleGroup | 'ambiguous' | 'aside'>;
  readonly groups: readonly VehicleGroup[];
  readonly doubts: readonly VehicleDoubt[];
}

/**
 * Puts the spellings of a file together into vehicles. The same year and model is the same vehicle, whatever the
 * order, case, color or make beside it; a slip of the pen or a missing year joins the only vehicle that it fits.
 * `answers`: any spelling → group id, 'own' or 'aside', as a person decided.
 */
export function groupVehicles(
  counts: ReadonlyMap<string, number>,
  thisYear: number,
  answers: ReadonlyMap<string, string>,
): VehicleGroups {
  const groups = new Map<string, VehicleGroup>();
  const parts = new Map<string, VehicleText>();
  for (const [spelling, count] of counts) {
    const part = readVehicle(spelling, thisYear);
    parts.set(spelling, part);
    join(groups, spelling, part, count);
  }
  for (const group of groups.values()) {
    group.name = mostUsed(group, counts);
    group.model = parts.get(group.name)?.model ?? group.model;
  }
  const doubts: VehicleDoubt[] = [];
  const index = bucketsOf([...groups.values()]);
  const ordered = [...groups.values()].sort((a, b) => a.count - b.count);
  const target = new Map<VehicleGroup, VehicleGroup | 'ambiguous' | 'aside'>();
  for (const group of ordered) {
    const doubt = doubtOf(group, index);
    if (doubt === null) continue;
    doubts.push(doubt);
    target.set(group, answered(group, doubt, answers.get(group.name), groups));
  }
  const of = new Map<string, VehicleGroup | 'ambiguous' | 'aside'>();
  for (const group of ordered) {
    const end = follow(group, target);
    for (const spelling of group.spellings) of.set(spelling, end);
    if (typeof end !== 'string' && end !== group) absorb(end, group);
  }
  const grouped = { of, groups: [...groups.values()].filter((group) => follow(group, target) === group), doubts };
  splitGroups(grouped, counts, answers);
  return grouped;
}

function join(groups: Map<string, VehicleGroup>, spelling: string, part: VehicleText, count: number): void {
  const id = `${part.year ?? ''}|${part.key}`;
  const group = groups.get(id) ?? {
    id,
    name: spelling,
    year: part.year,
    make: null,
    model: part.model,
    count: 0,
    spellings: [],
  };
  groups.set(id, group);
  group.make ??= part.make;
  group.count += count;
  group.spellings.push(spelling);
}

/** The spelling used most, in any case; of its cases `10 Ceed` is preferred to `10 CEED` and `10 ceed`. */
function mostUsed(group: VehicleGroup, counts: ReadonlyMap<string, number>): string {
  const inAnyCase = new Map<string, number>();
  for (const spelling of group.spellings) {
    const words = fold(spelling);
    inAnyCase.set(words, (inAnyCase.get(words) ?? 0) + (counts.get(spelling) ?? 0));
  }
  const isMixed = (spelling: string) => /\p{Lu}/u.test(spelling) && /\p{Ll}/u.test(spelling);
  const rank = (spelling: string) => [
    inAnyCase.get(fold(spelling)) ?? 0,
    isMixed(spelling) ? 1 : 0,
    counts.get(spelling) ?? 0,
  ];
  return group.spellings.reduce((best, spelling) => (isAbove(rank(spelling), rank(best)) ? spelling : best));
}

function isAbove(a: readonly number[], b: readonly number[]): boolean {
  const at = a.findIndex((value, i) => value !== b[i]);
  return at >= 0 && (a[at] ?? 0) > (b[at] ?? 0);
}

const keyOf = (group: VehicleGroup) => group.id.slice(group.id.indexOf('|') + 1);

/** Groups under what candidates for them share (see `bucketKeys`), and under `=` and their whole key. */
function bucketsOf(groups: readonly VehicleGroup[]): ReadonlyMap<string, readonly VehicleGroup[]> {
  const buckets = new Map<string, VehicleGroup[]>();
  for (const group of groups) {
    for (const key of [...bucketKeys(group), `=${keyOf(group)}`]) {
      const bucket = buckets.get(key);
      if (bucket) bucket.push(group);
      else buckets.set(key, [group]);
    }
  }
  return buckets;
}

/** The year, the digits, and the first two or the last two letters: two thousand stock numbers need no comparing. */
function bucketKeys(group: VehicleGroup): string[] {
  const key = keyOf(group);
  const shared = `${group.year ?? ''}|${key.replace(/\D+/g, ' ').trim()}`;
  return [`<${key.slice(0, 2)}`, `>${key.slice(-2)}`].map((end) => `${shared}${end}`);
}

function doubtOf(group: VehicleGroup, index: ReadonlyMap<string, readonly VehicleGroup[]>): VehicleDoubt | null {
  const key = keyOf(group);
  const near = new Set(bucketKeys(group).flatMap((bucket) => index.get(bucket) ?? []));
  const fits = [...near].filter((other) => other !== group && other.count > group.count && isSlip(key, keyOf(other)));
  if (fits.length > 0) return doubt(group, fits, 'It looks like a slip of the pen.');
  const words = (group.model ?? '').split(' ');
  const lessOne = words.length > 1 ? (index.get(`=${modelKey(words.slice(0, -1).join(' '))}`) ?? []) : [];
  const shorter = lessOne.filter((other) => other.year === group.year);
  if (shorter.length > 0) return doubt(group, shorter, 'It is the same year and model with a word more.');
  if (group.year !== null) return null;
  const dated = (index.get(`=${key}`) ?? []).filter((other) => other.year !== null);
  return dated.length > 0 ? doubt(group, dated, 'It names no year.') : null;
}

function doubt(group: VehicleGroup, fits: readonly VehicleGroup[], why: string): VehicleDoubt {
  const [only] = fits;
  return { spelling: group.name, taken: fits.length === 1 ? (only ?? null) : null, others: fits, why };
}

function answered(
  group: VehicleGroup,
  found: VehicleDoubt,
  answer: string | undefined,
  groups: ReadonlyMap<string, VehicleGroup>,
) {
  if (answer === 'own') return group;
  if (answer === 'aside') return 'aside' as const;
  return (answer === undefined ? undefined : groups.get(answer)) ?? found.taken ?? ('ambiguous' as const);
}

function follow(group: VehicleGroup, target: ReadonlyMap<VehicleGroup, VehicleGroup | 'ambiguous' | 'aside'>) {
  let end: VehicleGroup = group;
  for (let steps = 0; steps < 5; steps++) {
    const next = target.get(end) ?? end;
    if (typeof next === 'string' || next === end) return next;
    end = next;
  }
  return end;
}

function absorb(into: VehicleGroup, from: VehicleGroup): void {
  into.make ??= from.make;
  into.count += from.count;
  into.spellings.push(...from.spellings);
}
