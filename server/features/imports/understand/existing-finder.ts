import type { ExistingRebuild } from '../books.ts';
import { fold } from '../cells/fold.ts';
import { modelKey } from './vehicle-text.ts';

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
