import { hash, verify } from '@node-rs/argon2';
import { ProblemError } from './problems.ts';

/** argon2id: 19 MiB, two passes, one lane. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };
const AT_ONCE = 2;
const LONGEST_QUEUE = 32;

/** Hashes passwords, two at a time, so that many sign-ins at once do not stop everything else. */
export function passwordService() {
  let running = 0;
  const waiting: (() => void)[] = [];
  const dummy = hash('a password that nobody has', COST);

  async function inTurn<T>(work: () => Promise<T>): Promise<T> {
    if (running >= AT_ONCE) {
      if (waiting.length >= LONGEST_QUEUE) {
        throw new ProblemError(503, { detail: 'Too many people are signing in. Try again in a moment.' });
      }
      await new Promise<void>((resolve) => waiting.push(resolve));
    }
    running += 1;
    try {
      return await work();
    } finally {
      running -= 1;
      waiting.shift()?.();
    }
  }

  return {
    /** The hash to store. */
    hash: (password: string) => inTurn(() => hash(password, COST)),
    /** Does the password fit? An unknown account (null) costs the same time and never fits. */
    fits: (stored: string | null, password: string) =>
      inTurn(async () => (await verify(stored ?? (await dummy), password)) && stored !== null),
  };
}

export type PasswordService = ReturnType<typeof passwordService>;
