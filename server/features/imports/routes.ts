import { type Import, importsApi, type Progress } from '#shared/contracts/imports.ts';
import { shopScope } from '../../books/scope.ts';
import { write } from '../../books/write.ts';
import { Events } from '../../platform/event-stream.ts';
import { type Context, type Route, route } from '../../platform/http.ts';
import { ProblemError } from '../../platform/problems.ts';
import { forgetFiles, startCommit } from './background.ts';
import { changeImport } from './change-import.ts';
import { refuseStale, wrongState } from './problems.ts';
import { listRows } from './list-rows.ts';
import { progressEvents } from './progress.ts';
import { listImports, showImport } from './read-model.ts';
import { runJob } from './run-job.ts';
import { importFiles } from './import-files.ts';
import { importStore, readingOf } from './store.ts';
import { uploadImport } from './upload-import.ts';

type OnImport = Context & { readonly params: { readonly importId: string } };

const readScope = (ctx: Pick<Context, 'services' | 'actor'>) =>
  shopScope(ctx.services.database.reader, ctx.actor.shopId);
const current = async (ctx: OnImport) => importStore(readScope(ctx)).get(ctx.params.importId);
const shown = async (ctx: OnImport) => {
  const reply = await showImport(readScope(ctx), ctx.params.importId);
  return { versioned: reply, version: reply.version };
};

// Two people, or two presses, may bring in one file before either books it.
const alreadyIn = () =>
  new ProblemError(409, {
    name: 'already-in',
    detail: 'This very file came in meanwhile. Drop this one, or bring it in once more if its rows shall count twice.',
  });

export const importRoutes: Route[] = [
  route(importsApi.list, (ctx) => listImports(readScope(ctx), ctx.query.cursor)),
  route(importsApi.upload, uploadImport),
  route(importsApi.show, (ctx) => shown(ctx as unknown as OnImport)),
  route(importsApi.progress, followImport),
  route(importsApi.rows, listRows),
  route(importsApi.change, changeImport),
  route(importsApi.commit, async (ctx) => commitImport(ctx as unknown as OnImport)),
  route(importsApi.undo, async (ctx) => undoImport(ctx as unknown as OnImport)),
  route(importsApi.discard, async (ctx) => discardImport(ctx)),
];

/** Follows an import until it is done. */
async function followImport(ctx: Context<typeof importsApi.progress>): Promise<Events<Progress>> {
  const { importId } = ctx.params;
  await current(ctx as unknown as OnImport);
  return new Events((closed) => progressEvents(readScope(ctx), importId, closed));
}

/** Starts the commit. Asking again while it runs, or after, changes nothing: it books once. */
async function commitImport(ctx: OnImport) {
  const { services, actor } = ctx;
  const before = await current(ctx);
  if (before.state === 'committing' || before.state === 'committed') return shown(ctx);
  if (before.state !== 'ready') throw wrongState('Only a file that was read can be booked.');
  refuseStale(ctx.ifMatch, before.version);
  const open = readingOf(before)?.choices.filter((choice) => choice.mustAsk && choice.answer === null) ?? [];
  if (open.length > 0) {
    throw new ProblemError(422, {
      name: 'choices-open',
      detail: `Answer first: ${open.map((choice) => choice.question).join(' ')}`,
    });
  }
  const { database } = services;
  const isMine = await database.lock(async () => {
    const scope = shopScope(database.writer, actor.shopId);
    const store = importStore(scope);
    if (await importFiles(scope).cameInMeanwhile(before)) throw alreadyIn();
    refuseStale(ctx.ifMatch, (await store.get(before.id)).version);
    return store.move(before.id, 'ready', 'committing');
  });
  if (isMine) startCommit({ services, ...actor, requestId: String(ctx.req.id) }, before);
  return shown(ctx);
}

async function undoImport(ctx: OnImport) {
  const { services, actor } = ctx;
  const { database, now } = services;
  const before = await current(ctx);
  if (before.state === 'undone') return shown(ctx);
  if (before.state !== 'committed') throw wrongState('Only a file that is booked can be taken out.');
  const done = await database.lock(() =>
    runJob({
      kind: 'undo',
      databaseFile: database.file,
      importId: before.id,
      now: now(),
      ...actor,
      requestId: String(ctx.req.id),
    }),
  );
  if (done.kind === 'undone' && done.obstacle !== null) {
    throw new ProblemError(409, {
      name: 'undo-refused',
      detail: `This import cannot be taken out any more. ${done.obstacle}`,
    });
  }
  return shown(ctx);
}

async function discardImport(ctx: Context<typeof importsApi.discard>) {
  const { importId } = ctx.params;
  const ready = await write(ctx, { action: 'drop file', subject: 'import' }, async (books) => {
    const store = importStore(books.scope);
    const before = await store.get(importId);
    if (before.state !== 'ready' && before.state !== 'refused')
      throw wrongState('A file that is being read, or is booked, cannot be dropped.');
    await store.discard(importId);
    const reply: Import = await showImport(books.scope, importId);
    return { id: importId, before: { state: before.state }, after: { state: 'discarded' }, reply };
  });
  await forgetFiles({ services: ctx.services, shopId: ctx.actor.shopId }, importId);
  return ready;
}
