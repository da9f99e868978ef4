/**
 * Ceiling of a·b/c in whole numbers, exactly: a reserve computed with binary fractions can be a cent off
 * (definitions §10). `c` > 0. Example: ceilProduct(505822, 213016, 213016) = 505822.
 */
export function ceilProduct(a: number, b: number, c: number): number {
  const product = a * b;
  if (Number.isSafeInteger(product)) {
    const rest = product % c;
    const whole = (product - rest) / c;
    return rest > 0 ? whole + 1 : whole + 0;
  }
  const exact = BigInt(a) * BigInt(b);
  const divisor = BigInt(c);
  const whole = exact / divisor;
  return Number(exact % divisor > 0n ? whole + 1n : whole);
}

/** Sign of a/b − c/d for whole numbers with b, d > 0, exactly. */
export function compareFractions(a: number, b: number, c: number, d: number): number {
  const difference = a / b - c / d;
  // Rounding keeps order, so two quotients that differ are in the right order already.
  if (difference !== 0) return difference;
  const cross = BigInt(a) * BigInt(d) - BigInt(c) * BigInt(b);
  return cross > 0n ? 1 : cross < 0n ? -1 : 0;
}
