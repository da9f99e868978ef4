import type { Import, importsApi } from '#shared/contracts/imports.ts';
import { shopScope } from '../../books/scope.ts';
import { write } from '../../books/write.ts';
import type { Context, Ready } from '../../platform/http.ts';
import { newId, sha256 } from '../../platform/ids.ts';
import { ProblemError } from '../../platform/problems.ts';
import { startReading } from './background.ts';
import { dropFile, fileHash, importPath, keepFile } from './files.ts';
import { showImport } from './read-model.ts';
import { receiveFile } from './receive.ts';
import { importStore } from './store.ts';

/**
 * Takes a file in and starts reading it. A file whose rows stand in the books already is refused, unless the person
 * says that it shall come in once more.
 */
export async function uploadImport(ctx: Context<typeof importsApi.upload>): Promise<Ready> {
  const { config, database } = ctx.services;
  const { shopId, userId } = ctx.actor;
  const received = await receiveFile(ctx.req, ctx.res, { dataDir: config.dataDir, mostBytes: config.importMaxBytes });
  const id = newId();
  const kept = importPath(config.dataDir, id);
  let isNew = false;
  try {
    const fileSha256 = await fileHash(received.path);
    await keepFile(received.path, kept);
    const once = ctx.once && { ...ctx.once, fingerprint: sha256(`${ctx.once.fingerprint} ${fileSha256}`) };
    const ready = await write({ ...ctx, once }, { action: 'upload file', subject: 'import' }, async (books) => {
      const store = importStore(books.scope);
      const earlier = ctx.query.importAnyway ? null : await store.findCommitted(fileSha256);
      if (earlier) throw alreadyIn(earlier.committedAt);
      await store.create({ id, fileName: received.name, fileSha256, byteSize: received.size, createdBy: userId });
      const reply: Import = await showImport(books.scope, id);
      isNew = true;
      return { id, before: null, after: { fileName: received.name, fileSha256 }, reply, version: reply.version };
    });
    if (isNew)
      startReading({ services: ctx.services, shopId }, await importStore(shopScope(database.reader, shopId)).get(id));
    return ready;
  } finally {
    if (!isNew) await Promise.all([dropFile(kept), dropFile(received.path)]);
  }
}

function alreadyIn(committedAt: string | null): ProblemError {
  const day = committedAt?.slice(0, 10) ?? 'an earlier day';
  return new ProblemError(409, {
    name: 'already-in',
    detail: `This very file came in on ${day}: there is nothing new in it.`,
  });
}
