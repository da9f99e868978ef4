import type { Choice } from '#shared/contracts/import-reading.ts';
import type { ExistingRebuild, ShopBooks } from '../books.ts';
import { fold } from '../cells/fold.ts';
import { type Draft, newDraft, tagMaker } from '../read/draft.ts';
import { isOverhead } from '../words/vehicles.ts';
import { groupVehicles, type VehicleDoubt, type VehicleGroup } from './vehicle-groups.ts';
import { modelKey } from './vehicle-text.ts';

/** What a vehicle cell of a list leads to. */
export type VehicleTarget = Draft | 'overhead' | 'ambiguous' | 'aside';

/** Finds the shop's rebuild for a tag, or for a year and model. Several that fit: all of them. */
export function existingFinder(rebuilds: readonly ExistingRebuild[]) {
  const byTag = new Map(rebuilds.map((rebuild) => [fold(rebuild.tag), rebuild]));
  const byModel = new Map<string, ExistingRebuild[]>();
  for (const rebuild of rebuilds) {
    if (rebuild.year === null || !rebuild.model) continue;
    const key = `${rebuild.year}|${modelKey(rebuild.model)}`;
    byModel.set(key, [...(byModel.get(key) ?? []), rebuild]);
  }
  return {
    byTag: (tag: string) => byTag.get(fold(tag)) ?? null,
    byModel: (year: number | null, model: string | null) =>
      year === null || !model ? [] : (byModel.get(`${year}|${modelKey(model)}`) ?? []),
  };
}

/** A draft for every vehicle that a list names, with the questions about spellings that are left. */
export function vehicleDrafts(
  counts: ReadonlyMap<string, number>,
  books: ShopBooks,
  answers: ReadonlyMap<string, string>,
): { of: Map<string, VehicleTarget>; choices: Choice[] } {
  const named = new Map([...counts].filter(([spelling]) => !isOverhead(spelling)));
  const grouped = groupVehicles(named, Number(books.today.slice(0, 4)), prefixed(answers, 'vehicle:'));
  const finder = existingFinder(books.rebuilds);
  const tagFor = tagMaker(books.rebuilds.map((rebuild) => rebuild.tag));
  const choices = grouped.doubts.map((doubt) => spellingChoice(doubt, answers));
  const drafts = new Map<VehicleGroup, VehicleTarget>();
  for (const group of grouped.groups) {
    const sameTag = group.spellings.map((spelling) => finder.byTag(spelling)).find((found) => found !== null);
    const fits = finder.byModel(group.year, group.model);
    const { existing, choice } = sameTag ? { existing: sameTag, choice: null } : chooseExisting(group, fits, answers);
    if (choice) choices.push(choice);
    const { year, make, model, spellings } = group;
    const known = { year, make, model: year === null && make === null ? null : model, spellings };
    drafts.set(
      group,
      existing === 'ambiguous' ? existing : newDraft(existing ? existing.tag : tagFor(group.name), existing, 0, known),
    );
  }
  const of = new Map<string, VehicleTarget>();
  for (const spelling of counts.keys()) {
    const target = grouped.of.get(spelling);
    of.set(
      spelling,
      target === undefined ? 'overhead' : typeof target === 'string' ? target : (drafts.get(target) ?? 'ambiguous'),
    );
  }
  return { of, choices };
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
    preset: doubt.taken?.id ?? 'aside',
    answer: answers.get(id) ?? null,
    mustAsk: doubt.taken === null,
    why: doubt.taken === null ? `${doubt.why} More than one fits.` : doubt.why,
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
