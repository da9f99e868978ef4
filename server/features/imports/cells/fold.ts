/** Text reduced to what tells words apart: small letters without accents, single spaces, no punctuation. */
export function fold(text: string): string {
  return text
    .normalize('NFKD')
    .replace(/\p{M}+/gu, '')
    .toLowerCase()
    .replaceAll('ß', 'ss')
    .replaceAll('œ', 'oe')
    .replaceAll('æ', 'ae')
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();
}

/** Remembers what a pure function said of a text: the same words come by thousands of times in one file. */
export function remembered<T>(read: (text: string) => T): (text: string) => T {
  const known = new Map<string, T>();
  return (text) => {
    const found = known.get(text);
    if (found !== undefined || known.has(text)) return found as T;
    const value = read(text);
    // A column of a million different texts must not fill the memory.
    if (known.size < 10_000) known.set(text, value);
    return value;
  };
}
