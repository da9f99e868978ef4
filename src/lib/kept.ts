/**
 * What this browser keeps for use without signal: plain data under a name, gone when its person signs out. Names of one
 * person in one shop begin with `mine(session)`. What is read back may be old or damaged: parse it.
 */
const OURS = 'panelgap.';

/** Where the last person's session is kept, so that a page opens without signal. */
export const KEPT_SESSION = 'session';

/** The beginning of all names of one person in one shop. */
export function mine({ user, shop }: { user: { id: string }; shop: { id: string } }): string {
  return `${user.id}.${shop.id}.`;
}

/** Keeps a value; false when the browser refuses, being full or closed to us. */
export function keep(name: string, value: unknown): boolean {
  try {
    localStorage.setItem(OURS + name, JSON.stringify(value));
    return true;
  } catch {
    return false;
  }
}

/** What was kept under a name; null when there is nothing that can be read. */
export function kept(name: string): unknown {
  try {
    return JSON.parse(localStorage.getItem(OURS + name) ?? 'null');
  } catch {
    return null;
  }
}

export function drop(name: string): void {
  try {
    localStorage.removeItem(OURS + name);
  } catch {
    // Closed to us: then nothing was kept either.
  }
}

/** Names that begin so, in no order. */
export function keptNames(beginning: string): string[] {
  try {
    return Object.keys(localStorage)
      .filter((key) => key.startsWith(OURS + beginning))
      .map((key) => key.slice(OURS.length));
  } catch {
    return [];
  }
}

/** Forgets all that was kept for a person, in every shop. */
export function forgetPerson(userId: string): void {
  for (const name of [KEPT_SESSION, ...keptNames(`${userId}.`)]) drop(name);
}
