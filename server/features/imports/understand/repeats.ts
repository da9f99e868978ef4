const SHORTEST_BLOCK = 3;

/** A text as a number of 53 bits: rows are compared by it, so that a long file's rows need not be held. */
export function rowHash(cells: readonly string[]): number {
  let high = 0x811c9dc5;
  let low = 0x1b873593;
  let end = cells.length;
  // Blank cells at the end come and go with the program that wrote the file.
  while (end > 0 && cells[end - 1] === '') end--;
  for (let at = 0; at < end; at++) {
    const cell = cells[at] as string;
    for (let i = 0; i < cell.length; i++) {
      const code = cell.charCodeAt(i);
      high = Math.imul(high ^ code, 0x01000193);
      low = Math.imul(low ^ code, 0x85ebca6b) + code;
    }
    high = Math.imul(high ^ 31, 0x01000193);
    low = Math.imul(low ^ 31, 0x85ebca6b);
  }
  return (high >>> 0) * 0x200000 + ((low >>> 0) & 0x1fffff);
}

/**
 * Finds blocks that were pasted twice: three or more different rows in a row that repeat earlier rows in the same
 * order. Single equal rows are honest repeats and stay. Takes one hash per row; gives the places of the repeats.
 */
export function repeatedRows(hashes: readonly number[]): Set<number> {
  const firstSeen = new Map<number, number>();
  const repeats = new Set<number>();
  let at = 0;
  while (at < hashes.length) {
    const earlier = firstSeen.get(hashes[at] as number);
    const length = earlier === undefined ? 0 : blockLength(hashes, earlier, at);
    if (length >= SHORTEST_BLOCK) {
      for (let i = 0; i < length; i++) repeats.add(at + i);
      at += length;
      continue;
    }
    if (earlier === undefined) firstSeen.set(hashes[at] as number, at);
    at++;
  }
  return repeats;
}

/** How many rows from `at` on repeat those from `earlier` on; 0 when they are all alike. */
function blockLength(hashes: readonly number[], earlier: number, at: number): number {
  let length = 0;
  while (at + length < hashes.length && earlier + length < at && hashes[earlier + length] === hashes[at + length])
    length++;
  return new Set(hashes.slice(at, at + length)).size >= SHORTEST_BLOCK ? length : 0;
}
