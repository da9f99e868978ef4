/**
 * The books take a name once, in whatever case; a portfolio may hold "Parts" and "parts" as two. Gives each name the
 * one it is kept under, and back.
 */
export function distinctNames(names: Iterable<string>) {
  const kept = new Map<string, string>();
  const original = new Map<string, string>();
  const taken = new Set<string>();
  for (const name of names) {
    if (kept.has(name)) continue;
    let free = name;
    for (let i = 2; taken.has(free.toLowerCase()); i += 1) free = `${name} (${i})`;
    taken.add(free.toLowerCase());
    kept.set(name, free);
    original.set(free, name);
  }
  const look = (map: ReadonlyMap<string, string>) => (name: string) => map.get(name) ?? name;
  return { all: [...kept.values()], keptAs: look(kept), originalOf: look(original) };
}
