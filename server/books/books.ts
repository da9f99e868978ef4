import type { Knex } from 'knex';
import { entryStore } from './entries.ts';
import { estimateStore } from './estimates.ts';
import { hoursStore } from './hours.ts';
import { listStore } from './lists.ts';
import { rebuildStore } from './rebuilds.ts';
import { shopScope } from './scope.ts';
import { touchedBooks } from './touched.ts';

/**
 * All stores of one shop's books on one transaction. `userId` stands on what is made; null = the shop itself.
 */
export function openBooks(trx: Knex, shopId: string, userId: string | null) {
  const scope = shopScope(trx, shopId);
  const touched = touchedBooks();
  return {
    scope,
    touched,
    rebuilds: rebuildStore(scope, touched),
    estimates: estimateStore(scope, touched),
    entries: entryStore(scope, touched, userId),
    hours: hoursStore(scope, touched, userId),
    lists: listStore(scope),
  };
}

export type Books = ReturnType<typeof openBooks>;
