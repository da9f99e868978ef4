/** Collects whose sums a write makes stale, so that they are refreshed before it commits. */
export function touchedBooks() {
  const rebuilds = new Set<string>();
  let isOverhead = false;
  return {
    rebuild(id: string): void {
      rebuilds.add(id);
    },
    /** An entry of a rebuild, or of none: overhead. */
    entryOf(rebuildId: string | null): void {
      if (rebuildId) rebuilds.add(rebuildId);
      else isOverhead = true;
    },
    get rebuildIds(): string[] {
      return [...rebuilds];
    },
    get isOverhead(): boolean {
      return isOverhead;
    },
  };
}

export type Touched = ReturnType<typeof touchedBooks>;
