import type { Import, ImportSettings, importsApi } from '#shared/contracts/imports.ts';
import { shopScope } from '../../books/scope.ts';
import { write } from '../../books/write.ts';
import type { Context, Ready } from '../../platform/http.ts';
import { startReading } from './background.ts';
import { wrongState } from './problems.ts';
import { showImport } from './read-model.ts';
import { importStore, settingsOf } from './store.ts';

/**
 * Keeps what a person said of a file and reads it again. The trail keeps who corrected what: the text before and after
 * of every cell that changed.
 */
export async function changeImport(ctx: Context<typeof importsApi.change>): Promise<Ready> {
  const { importId } = ctx.params;
  const ready = await write(ctx, { action: 'answer for file', subject: 'import' }, async (books) => {
    const store = importStore(books.scope);
    const record = await store.get(importId);
    if (record.state !== 'ready' && record.state !== 'refused')
      throw wrongState('This file is not waiting for answers.');
    const before = settingsOf(record);
    const after = withChange(before, ctx.body);
    await store.readAgain(importId, ctx.ifMatch ?? 0, after);
    const reply: Import = await showImport(books.scope, importId);
    return {
      id: importId,
      before: without(before, after),
      after: without(after, before),
      reply,
      version: reply.version,
    };
  });
  const { services, actor } = ctx;
  startReading(
    { services, shopId: actor.shopId },
    await importStore(shopScope(services.database.reader, actor.shopId)).get(importId),
  );
  return ready;
}

/** Answers are added to those before; a list of columns, cells or rows takes the place of the one before. */
const withChange = (before: ImportSettings, { answers, ...lists }: ImportSettings): ImportSettings => ({
  ...before,
  ...Object.fromEntries(Object.entries(lists).filter(([, list]) => list !== undefined)),
  answers: { ...before.answers, ...answers },
});

/** What stands in `one` and not in `other`. */
function without(one: ImportSettings, other: ImportSettings): ImportSettings {
  const fresh = <T>(list: readonly T[] = [], known: readonly T[] = []) => {
    const texts = new Set(known.map((item) => JSON.stringify(item)));
    return list.filter((item) => !texts.has(JSON.stringify(item)));
  };
  return {
    columns: fresh(one.columns, other.columns),
    cells: fresh(one.cells, other.cells),
    leftOut: fresh(one.leftOut, other.leftOut),
    answers: Object.fromEntries(
      Object.entries(one.answers ?? {}).filter(([id, value]) => other.answers?.[id] !== value),
    ),
  };
}
