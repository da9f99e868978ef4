import type { Import, importsApi } from '#shared/contracts/imports.ts';
import { shopScope } from '../../books/scope.ts';
import { write } from '../../books/write.ts';
import type { Context, Ready } from '../../platform/http.ts';
import { newId, sha256 } from '../../platform/ids.ts';
import { ProblemError } from '../../platform/problems.ts';
import { startReading } from './background.ts';
import { dropFile, fileHash, importPath, keepFile } from './files.ts';
import { showImport } from './read-model.ts';
import { dropReceived, receiveFiles } from './receive.ts';
import { importFiles } from './import-files.ts';
import { importStore, type NewFile } from './store.ts';

/**
 * Takes files in and starts reading them as one import. A file whose rows stand in the books already is refused, unless
 * the person says that it shall come in once more.
 */
export async function uploadImport(ctx: Context<typeof importsApi.upload>): Promise<Ready> {
  const { config, database } = ctx.services;
  const { shopId, userId } = ctx.actor;
  const received = await receiveFiles(ctx.req, ctx.res, { dataDir: config.dataDir, mostBytes: config.importMaxBytes });
  const id = newId();
  const kept = received.map((_, at) => importPath(config.dataDir, id, at + 1));
  let isNew = false;
  try {
    const files: NewFile[] = [];
    for (const [at, { path, name, size }] of received.entries()) {
      files.push({ number: at + 1, name, sha256: await fileHash(path), byteSize: size });
      await keepFile(path, kept[at] as string);
    }
    const content = files.map((file) => file.sha256).join(' ');
    const once = ctx.once && { ...ctx.once, fingerprint: sha256(`${ctx.once.fingerprint} ${content}`) };
    const ready = await write({ ...ctx, once }, { action: 'upload file', subject: 'import' }, async (books) => {
      const store = importStore(books.scope);
      const isAnyway = ctx.query.importAnyway ?? false;
      if (!isAnyway) await refuseKnown(importFiles(books.scope), files);
      await store.create({ id, createdBy: userId, files, settings: isAnyway ? { answers: { earlier: 'twice' } } : {} });
      const reply: Import = await showImport(books.scope, id);
      isNew = true;
      return { id, before: null, after: { files }, reply, version: reply.version };
    });
    if (isNew)
      startReading({ services: ctx.services, shopId }, await importStore(shopScope(database.reader, shopId)).get(id));
    return ready;
  } finally {
    if (!isNew) await Promise.all([...kept.map(dropFile), dropReceived(received)]);
  }
}

/** Refuses files that came in before, and the same file twice. */
async function refuseKnown(known: ReturnType<typeof importFiles>, files: readonly NewFile[]): Promise<void> {
  for (const [at, { name, sha256: content }] of files.entries()) {
    const twin = files.slice(0, at).find((other) => other.sha256 === content);
    if (twin) throw alreadyIn(`“${name}” and “${twin.name}” are the same file: leave one out.`);
    const earlier = await known.findCommitted(content);
    if (!earlier) continue;
    const day = earlier.committedAt?.slice(0, 10) ?? 'an earlier day';
    const which = files.length === 1 ? 'This very file' : `“${name}”`;
    throw alreadyIn(`${which} came in on ${day}: there is nothing new in it.`);
  }
}

const alreadyIn = (detail: string) => new ProblemError(409, { name: 'already-in', detail });
