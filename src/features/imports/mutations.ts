import { useQueryClient } from '@tanstack/react-query';
import { type Import, type ImportSettings, importsApi } from '#shared/contracts/imports.ts';
import { call } from '../../lib/api.ts';
import { useBooksChanged } from '../../lib/books-changed.ts';
import { importQuery } from './queries.ts';

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
    async upload(file: File, idempotencyKey: string, importAnyway = false): Promise<Import> {
      const body = new FormData();
      body.append('file', file);
      return keep(
        await call(importsApi.upload, { body, idempotencyKey, query: importAnyway ? { importAnyway: 'true' } : {} }),
      );
    },
    async change({ id, version }: Import, body: ImportSettings): Promise<Import> {
      return keep(await call(importsApi.change, { params: { importId: id }, version, body }));
    },
    async commit({ id }: Import): Promise<Import> {
      return keep(await call(importsApi.commit, { params: { importId: id } }));
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
