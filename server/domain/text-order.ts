/**
 * Order of ids and names: by code point, as definitions §0 asks, not by language and not by UTF-16 unit
 * (the two differ above U+FFFF). Negative = `a` first.
 */
export function byCodePoint(a: string, b: string): number {
  const shared = Math.min(a.length, b.length);
  for (let i = 0; i < shared; i += 1) {
    const x = a.charCodeAt(i);
    const y = b.charCodeAt(i);
    if (x !== y) return rank(x) - rank(y);
  }
  return a.length - b.length;
}

/** Moves the surrogates, which stand for the code points above U+FFFF, behind every other unit. */
function rank(unit: number): number {
  if (unit < 0xd800) return unit;
  return unit < 0xe000 ? unit + 0x2000 : unit - 0x800;
}
