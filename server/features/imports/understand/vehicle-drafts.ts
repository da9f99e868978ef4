import type { Choice } from '#shared/contracts/import-reading.ts';
import type { ExistingRebuild, ShopBooks } from '../books.ts';
import { fold } from '../cells/fold.ts';
import { type Draft, newDraft, tagMaker } from '../read/draft.ts';
import { isOverhead } from '../words/vehicles.ts';
import { existingFinder } from './existing-finder.ts';
import type { KnownVehicle } from './known-vehicles.ts';
import { groupVehicles, type VehicleDoubt, type VehicleGroup } from './vehicle-groups.ts';

/** What a vehicle cell of a list leads to. */
export type VehicleTarget = Draft | 'overhead' | 'ambiguous' | 'aside';

/** A draft for every vehicle that lists name, with the questions about spellings that are left. */
export function vehicleDrafts(
  counts: ReadonlyMap<string, number>,
  books: ShopBooks,
  answers: ReadonlyMap<string, string>,
  { known, spelled }: { known: readonly KnownVehicle[]; spelled: ReadonlyMap<string, ExistingRebuild> },
): { of: Map<string, VehicleTarget>; choices: Choice[] } {
  const of = new Map<string, VehicleTarget>();
  const byName = new Map(known.map((vehicle) => [nameKey(vehicle.name), vehicle.draft]));
  const named = new Map<string, number>();
  const draftOf = draftsOfBooks(known);
  for (const [spelling, count] of counts) {
    const draft = byName.get(nameKey(spelling)) ?? draftOf(spelled.get(fold(spelling)));
    if (draft) of.set(spelling, draft);
    else if (!isOverhead(spelling)) named.set(spelling, count);
    else of.set(spelling, 'overhead');
  }
  for (const { spelling } of known) if (spelling) named.set(spelling, (named.get(spelling) ?? 0) + SURE);
  const grouped = groupVehicles(named, Number(books.today.slice(0, 4)), prefixed(answers, 'vehicle:'));
  const finder = existingFinder(books.rebuilds);
  const tagFor = tagMaker([...books.rebuilds.map(({ tag }) => tag), ...known.map(({ draft }) => draft.found.tag)]);
  const choices = grouped.doubts.map((doubt) => spellingChoice(doubt, answers));
  const drafts = new Map<VehicleGroup, VehicleTarget>();
  for (const group of grouped.groups) {
    const rows = known.filter(({ spelling }) => spelling !== null && group.spellings.includes(spelling));
    const { target, choice } =
      rows.length > 0 ? ofKnown(group, rows, counts, answers) : ofBooks(group, finder, answers, tagFor);
    if (choice) choices.push(choice);
    if (typeof target === 'object') target.found.vehicleId = group.id;
    drafts.set(group, target);
  }
  for (const spelling of counts.keys()) {
    if (of.has(spelling)) continue;
    const target = grouped.of.get(spelling);
    of.set(spelling, typeof target === 'object' ? (drafts.get(target) ?? 'ambiguous') : (target ?? 'ambiguous'));
  }
  return { of, choices };
}

/** One draft for each rebuild of the books that the file names in words of before. */
function draftsOfBooks(known: readonly KnownVehicle[]) {
  const drafts = new Map(known.map(({ draft }) => [draft.existing?.id, draft]));
  return (existing: ExistingRebuild | undefined): Draft | null => {
    if (!existing) return null;
    const draft = drafts.get(existing.id) ?? newDraft(existing.tag, existing, 0);
    drafts.set(existing.id, draft);
    return draft;
  };
}

// More than any list can mention a vehicle: what a row of its own calls it decides.
const SURE = 1_000_000;
/** A stock number without what people leave out of it: case, signs, leading zeros. */
const nameKey = (name: string) =>
  fold(name)
    .replaceAll(' ', '')
    .replace(/^([a-z]*)0+(?=\d)/, '$1');

interface Settled {
  readonly target: VehicleTarget;
  readonly choice: Choice | null;
}

/** The row of the workbook that a vehicle of its lists is; two rows with the same year and model are asked about. */
function ofKnown(
  group: VehicleGroup,
  rows: readonly KnownVehicle[],
  counts: ReadonlyMap<string, number>,
  answers: ReadonlyMap<string, string>,
): Settled {
  const [only] = rows;
  if (only && rows.every(({ draft }) => draft === only.draft)) return { target: only.draft, choice: null };
  const mentioned = group.spellings.find((spelling) => counts.has(spelling));
  if (mentioned === undefined) return { target: 'ambiguous', choice: null };
  const id = `vehicle:${mentioned}`;
  const answer = answers.get(id) ?? null;
  const choice: Choice = {
    id,
    kind: 'vehicle',
    column: null,
    question: `Which vehicle is “${mentioned}”?`,
    options: [
      ...rows.map(({ draft, name }) => ({ value: draft.found.tag, label: name })),
      { value: 'aside', label: 'put its rows aside' },
    ],
    preset: 'aside',
    answer,
    mustAsk: true,
    why: 'Two vehicles of this workbook have the same year and model.',
  };
  return { target: rows.find(({ draft }) => draft.found.tag === answer)?.draft ?? 'ambiguous', choice };
}

function ofBooks(
  group: VehicleGroup,
  finder: ReturnType<typeof existingFinder>,
  answers: ReadonlyMap<string, string>,
  tagFor: (wanted: string) => string,
): Settled {
  // One that was told from another of the same year and model is not the shop's one of them.
  const fits = group.isSplit ? [] : finder.byModel(group.year, group.model);
  const sameTag = group.spellings.map((spelling) => finder.byTag(spelling)).find((found) => found !== null);
  const { existing, choice } = sameTag ? { existing: sameTag, choice: null } : chooseExisting(group, fits, answers);
  if (existing === 'ambiguous') return { target: existing, choice };
  const { year, make, model, spellings } = group;
  const facts = { year, make, model: year === null && make === null ? null : model, spellings };
  return { target: newDraft(existing ? existing.tag : tagFor(group.name), existing, 0, facts), choice };
}

function prefixed(answers: ReadonlyMap<string, string>, prefix: string): Map<string, string> {
  return new Map(
    [...answers].filter(([id]) => id.startsWith(prefix)).map(([id, value]) => [id.slice(prefix.length), value]),
  );
}

function spellingChoice(doubt: VehicleDoubt, answers: ReadonlyMap<string, string>): Choice {
  const id = `vehicle:${doubt.spelling}`;
  return {
    id,
    kind: 'vehicle',
    column: null,
    question: `Which vehicle is “${doubt.spelling}”?`,
    options: [
      ...doubt.others.map((group) => ({ value: group.id, label: group.name })),
      { value: 'own', label: 'a vehicle of its own' },
      { value: 'aside', label: 'put its rows aside' },
    ],
    preset: doubt.preset ?? doubt.taken?.id ?? 'aside',
    answer: answers.get(id) ?? null,
    mustAsk: doubt.taken === null,
    why: doubt.others.length > 1 ? `${doubt.why} More than one fits.` : doubt.why,
  };
}

/**
 * The shop's rebuild that a vehicle of the file is, and the question whether it is. One that fits and still stands in the
 * shop is taken; one that has left is asked about, since the shop may have bought the same year and model again.
 */
function chooseExisting(group: VehicleGroup, fits: readonly ExistingRebuild[], answers: ReadonlyMap<string, string>) {
  const [first] = fits;
  if (!first) return { existing: null, choice: null };
  const id = `rebuild:${group.name}`;
  const answer = answers.get(id);
  const sure = fits.length === 1 && !first.hasLeft ? first : null;
  const choice: Choice = {
    id,
    kind: 'vehicle',
    column: null,
    question: `Is “${group.name}” a rebuild that you have already?`,
    options: [
      ...fits.map((rebuild) => ({ value: rebuild.id, label: rebuild.tag })),
      { value: 'new', label: 'a new rebuild' },
    ],
    preset: sure?.id ?? 'new',
    answer: answer ?? null,
    mustAsk: sure === null,
    why: whyAsked(fits.length, sure !== null),
  };
  if (answer === undefined) return { existing: sure ?? ('ambiguous' as const), choice };
  return { existing: fits.find((rebuild) => rebuild.id === answer) ?? null, choice };
}

function whyAsked(count: number, isSure: boolean): string {
  if (count > 1) return 'More than one of your rebuilds has this year and model.';
  return isSure ? 'Year and model are the same.' : 'Year and model are the same, but yours has left the shop.';
}
