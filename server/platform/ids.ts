import { createHash, randomBytes } from 'node:crypto';

/** A new id as the outside sees it: 16 random bytes in base64url, 22 characters. */
export function newId(): string {
  return randomBytes(16).toString('base64url');
}

/** `count` new ids at once: one call for random bytes serves them all. */
export function newIds(count: number): string[] {
  const bytes = randomBytes(16 * count);
  return Array.from({ length: count }, (_, i) => bytes.toString('base64url', i * 16, i * 16 + 16));
}

/** A token of 256 random bits for a link; only its hash is stored. */
export function newToken(): string {
  return randomBytes(32).toString('base64url');
}

/** SHA-256 as hex: what is stored of tokens and session ids, and what tells two files apart. */
export function sha256(data: string | Buffer): string {
  return createHash('sha256').update(data).digest('hex');
}
