/**
 * Lets one writer at a time into the database: requests and the import worker queue here, in order, so that
 * nobody ever waits on SQLite's busy timeout.
 */
export function writeLock() {
  let last: Promise<unknown> = Promise.resolve();
  return function hold<T>(work: () => Promise<T>): Promise<T> {
    const turn = last.then(work, work);
    last = turn.catch(() => undefined);
    return turn;
  };
}

export type WriteLock = ReturnType<typeof writeLock>;
