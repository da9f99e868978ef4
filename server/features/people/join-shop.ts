import type { Knex } from 'knex';
import { leaveTrail } from '../../books/trail.ts';
import type { Services } from '../../platform/http.ts';
import { newId } from '../../platform/ids.ts';
import { ProblemError } from '../../platform/problems.ts';
import { findInvitation, type OpenInvitation } from './store.ts';

interface Wish {
  readonly token: string;
  readonly name?: string | undefined;
  readonly password: string;
}

/**
 * Takes an invitation up: an account with its address joins by its password, anyone else makes an account.
 * The link works once, however many try it at the same moment.
 */
export async function joinShop(
  { database, passwords, throttle, now }: Services,
  wish: Wish,
  from: { source: string; requestId: string },
): Promise<{ userId: string; shopId: string }> {
  const stamp = now().toISOString();
  const invitation = await findInvitation(database.reader, wish.token, stamp);
  const account = await database
    .reader('users')
    .where({ email: invitation.email })
    .first<{ id: string; password_hash: string } | undefined>();
  if (account) {
    await throttle.check(invitation.email, from.source);
    const fits = await passwords.fits(account.password_hash, wish.password);
    await throttle.check(invitation.email, from.source);
    if (!fits) {
      await throttle.failed(invitation.email, from.source);
      throw wrong('/password', 'This is not the password of your account.');
    }
  } else if (!wish.name) {
    throw wrong('/name', 'Fill this in.');
  }
  const passwordHash = account ? null : await passwords.hash(wish.password);
  return database.lock(() =>
    database.writer.transaction(async (trx) => {
      const userId = account?.id ?? newId();
      await claim(trx, invitation, account ? userId : null, stamp);
      if (passwordHash) {
        await refuseTakenAddress(trx, invitation.email);
        const person = { id: userId, email: invitation.email, name: wish.name, password_hash: passwordHash };
        await trx('users').insert({ ...person, created_at: stamp });
      }
      await enter(trx, invitation, userId, stamp, from.requestId);
      return { userId, shopId: invitation.shopId };
    }),
  );
}

/** Someone made an account with this address while the password was being hashed. */
async function refuseTakenAddress(trx: Knex, email: string): Promise<void> {
  const taken = await trx('users').where({ email }).first('id');
  if (taken)
    throw new ProblemError(409, { detail: 'There is an account with this address now: join with its password.' });
}

/** Uses the invitation up; who got this far while it was used or withdrawn finds it gone. */
async function claim(trx: Knex, { id, shopId }: OpenInvitation, userId: string | null, stamp: string): Promise<void> {
  const claimed = await trx('invitations')
    .where({ id, shop_id: shopId })
    .whereNull('used_at')
    .whereNull('withdrawn_at')
    .update({ used_at: stamp, used_by: userId });
  if (claimed !== 1) throw new ProblemError(404, { detail: 'This invitation is used up or withdrawn.' });
}

async function enter(
  trx: Knex,
  invitation: OpenInvitation,
  userId: string,
  stamp: string,
  requestId: string,
): Promise<void> {
  const { shopId, role, id } = invitation;
  const member = await trx('memberships').where({ shop_id: shopId, user_id: userId }).first('role');
  if (member) throw new ProblemError(409, { detail: 'You belong to this shop already.' });
  await trx('memberships').insert({ shop_id: shopId, user_id: userId, role, joined_at: stamp });
  await leaveTrail(trx, {
    shopId,
    actorId: userId,
    requestId,
    action: 'join shop',
    subject: 'person',
    subjectId: userId,
    before: null,
    after: { role, invitationId: id },
  });
}

function wrong(pointer: string, detail: string): ProblemError {
  return new ProblemError(400, { detail, errors: [{ pointer, detail }] });
}
