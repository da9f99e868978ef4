import type { z } from 'zod';
import { type Estimate, type estimateFieldsSchema } from '#shared/contracts/estimates.ts';
import {
  type newRebuildSchema,
  type Rebuild,
  type rebuildChangeSchema,
  rebuildsApi,
} from '#shared/contracts/rebuilds.ts';
import { call } from '../../lib/api.ts';
import { useBooksChanged } from '../../lib/books-changed.ts';

export type RebuildChange = z.input<typeof rebuildChangeSchema>;
export type EstimateBody = z.input<typeof estimateFieldsSchema>;
type Named = Pick<Rebuild, 'id' | 'version'>;

/** Writes to rebuilds and their estimates; each makes everything that was read of the books be read again. */
export function useRebuildWrites() {
  const changed = useBooksChanged();
  const after = async <T>(written: Promise<T>): Promise<T> => {
    const result = await written;
    await changed();
    return result;
  };
  const place = (estimate: Estimate) => ({
    params: { rebuildId: estimate.rebuildId, estimateId: estimate.id },
    version: estimate.version,
  });
  return {
    add: (body: z.input<typeof newRebuildSchema>, idempotencyKey: string) =>
      after(call(rebuildsApi.create, { body, idempotencyKey })),
    change: ({ id, version }: Named, body: RebuildChange) =>
      after(call(rebuildsApi.update, { params: { rebuildId: id }, version, body })),
    addEstimate: (rebuildId: string, body: EstimateBody, idempotencyKey: string) =>
      after(call(rebuildsApi.addEstimate, { params: { rebuildId }, body, idempotencyKey })),
    changeEstimate: (estimate: Estimate, body: EstimateBody) =>
      after(call(rebuildsApi.changeEstimate, { ...place(estimate), body })),
    lockEstimate: (estimate: Estimate) => after(call(rebuildsApi.lockEstimate, place(estimate))),
  };
}
