import type { RebuildFacts } from './facts.ts';

/**
 * A measure of one rebuild that is worked out once for each: facts never change, and most of them stay in memory from
 * one question to the next. Forgets with the facts.
 */
export function remembered<F extends RebuildFacts, T>(measure: (rebuild: F) => T): (rebuild: F) => T {
  const known = new WeakMap<RebuildFacts, { readonly value: T }>();
  return (rebuild) => {
    const found = known.get(rebuild);
    if (found) return found.value;
    const value = measure(rebuild);
    known.set(rebuild, { value });
    return value;
  };
}
