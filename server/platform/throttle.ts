import type { Database } from './database.ts';
import { ProblemError } from './problems.ts';

const MINUTE = 60_000;

/**
 * Slows down guessing. Failures are counted per account and source together, per source, and per account from
 * everywhere (at most 60 an hour), and kept in the warehouse so that a restart forgets none. Sessions that are
 * open never suffer.
 */
export function signInThrottle(database: Database, perPair: number) {
  const limits = (account: string, source: string) => [
    { subject: `pair:${account}|${source}`, most: perPair, within: 15 * MINUTE },
    { subject: `source:${source}`, most: perPair * 10, within: 60 * MINUTE },
    { subject: `account:${account}`, most: Math.max(60, perPair), within: 60 * MINUTE },
  ];
  return {
    /** Throws 429 while this account or source has failed too often. */
    async check(account: string, source: string): Promise<void> {
      for (const { subject, most, within } of limits(account, source)) {
        const since = Date.now() - within;
        const row = await database
          .reader('sign_in_failures')
          .where({ subject })
          .where('failed_at', '>', since)
          .first<{ n: number; oldest: number | null }>(database.reader.raw('count(*) AS n, min(failed_at) AS oldest'));
        if (row.n < most) continue;
        const seconds = Math.max(1, Math.ceil(((row.oldest ?? Date.now()) - since) / 1000));
        throw new ProblemError(429, {
          detail: 'Too many sign-ins have failed. Wait a while, then try again.',
          headers: { 'Retry-After': String(seconds) },
        });
      }
    },
    async failed(account: string, source: string): Promise<void> {
      const failedAt = Date.now();
      await database.lock(async () => {
        await database
          .writer('sign_in_failures')
          .where('failed_at', '<', failedAt - 60 * MINUTE)
          .delete();
        await database
          .writer('sign_in_failures')
          .insert(limits(account, source).map(({ subject }) => ({ subject, failed_at: failedAt })));
      });
    },
  };
}

export type SignInThrottle = ReturnType<typeof signInThrottle>;
