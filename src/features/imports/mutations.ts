import { useQueryClient } from '@tanstack/react-query';
import { type Import, type ImportSettings, importsApi } from '#shared/contracts/imports.ts';
import { call } from '../../lib/api.ts';
import { useBooksChanged } from '../../lib/books-changed.ts';
import { withProgress } from '../../lib/with-progress.ts';
import { importQuery } from './queries.ts';

export interface Upload {
  readonly files: readonly File[];
  readonly idempotencyKey: string;
  readonly importAnyway?: boolean;
  /** Gets the share that has gone, 0–1. */
  readonly onProgress: (share: number) => void;
}

/** Writes to imports. Each keeps the page's own import fresh. */
export function useImportWrites() {
  const client = useQueryClient();
  const changed = useBooksChanged();

  function keep(reply: Import): Import {
    client.setQueryData(importQuery(reply.id).queryKey, reply);
    void client.invalidateQueries({ queryKey: ['imports'], exact: true });
    return reply;
  }

  return {
    async upload({ files, idempotencyKey, importAnyway = false, onProgress }: Upload): Promise<Import> {
      const body = new FormData();
      for (const file of files) body.append('file', file);
      const query = importAnyway ? { importAnyway: 'true' as const } : {};
      const transport = withProgress(onProgress);
      return keep(await call(importsApi.upload, { body, idempotencyKey, query, transport }));
    },
    async change({ id, version }: Import, body: ImportSettings): Promise<Import> {
      return keep(await call(importsApi.change, { params: { importId: id }, version, body }));
    },
    /** Fetches how it stands now, after somebody else was quicker. */
    async latest({ id }: Import): Promise<Import> {
      return keep(await call(importsApi.show, { params: { importId: id } }));
    },
    async commit({ id, version }: Import): Promise<Import> {
      return keep(await call(importsApi.commit, { params: { importId: id }, version }));
    },
    async undo({ id }: Import): Promise<Import> {
      const reply = keep(await call(importsApi.undo, { params: { importId: id } }));
      await changed();
      return reply;
    },
    async discard({ id }: Import): Promise<Import> {
      return keep(await call(importsApi.discard, { params: { importId: id } }));
    },
  };
}
