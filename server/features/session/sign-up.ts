import type { z } from 'zod';
import type { signUpSchema } from '#shared/contracts/session.ts';
import { openShop } from '../../books/new-shop.ts';
import type { Services } from '../../platform/http.ts';
import { newId } from '../../platform/ids.ts';
import { ProblemError } from '../../platform/problems.ts';
import { userStore } from './store.ts';

/** Makes an account and its shop, with the owner's own name as the first worker. Gives both ids. */
export async function signUp(
  { database, passwords }: Services,
  wish: z.output<typeof signUpSchema>,
  requestId: string,
): Promise<{ userId: string; shopId: string }> {
  const passwordHash = await passwords.hash(wish.password);
  const userId = newId();
  return database.lock(() =>
    database.writer.transaction(async (trx) => {
      const users = userStore(trx);
      if (await users.findByEmail(wish.email)) {
        throw new ProblemError(409, {
          detail: 'There is an account with this address.',
          errors: [{ pointer: '/email', detail: 'This address has an account: sign in instead.' }],
        });
      }
      await users.create({ id: userId, email: wish.email, name: wish.name, passwordHash });
      const timeZone = usableZone(wish.timeZone);
      const shopId = await openShop(trx, { name: wish.shopName, ownerId: userId, timeZone }, requestId);
      await trx('workers').insert({ id: newId(), shop_id: shopId, name: wish.name, is_paid: 0, user_id: userId });
      return { userId, shopId };
    }),
  );
}

function usableZone(name: string | undefined): string {
  return name && Intl.supportedValuesOf('timeZone').includes(name) ? name : 'America/Chicago';
}
