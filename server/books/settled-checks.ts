import type { ShopScope } from './scope.ts';

/** The only writer of `settled_checks`: what people found right as it is, by kind and key. The trail keeps who and when. */
export function settledChecks(scope: ShopScope, userId: string) {
  const one = (kind: string, key: string) => scope.table('settled_checks').where({ kind, item_key: key });
  return {
    async settle(kind: string, key: string): Promise<void> {
      if (await one(kind, key).first('kind')) return;
      await scope.insert('settled_checks', {
        kind,
        itemKey: key,
        settledBy: userId,
        settledAt: new Date().toISOString(),
      });
    },
    async reopen(kind: string, key: string): Promise<void> {
      await one(kind, key).delete();
    },
  };
}
