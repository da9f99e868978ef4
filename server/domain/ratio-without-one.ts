/** What one rebuild adds to a ratio Σy ÷ Σx. */
export interface RatioPart {
  readonly id: string;
  readonly x: number;
  readonly y: number;
}

/** The rebuild without which a figure changes most, and what the figure would be then. */
export interface WithoutOne {
  readonly id: string;
  readonly value: number;
}

/**
 * How far one rebuild moves a sum-over-sum figure: each is left out in turn, (Σy − y) ÷ (Σx − x), and the one that
 * changes it most stands. null = nothing is left to divide by without any of them.
 * Example: 10 of 100 and 90 of 100: without the first 0.9 in place of 0.5.
 */
export function ratioWithoutOne(parts: readonly RatioPart[]): WithoutOne | null {
  let [x, y] = [0, 0];
  for (const part of parts) {
    x += part.x;
    y += part.y;
  }
  let furthest: WithoutOne | null = null;
  let change = -1;
  for (const part of parts) {
    if (x - part.x <= 0) continue;
    const value = (y - part.y) / (x - part.x);
    if (Math.abs(value - y / x) <= change) continue;
    change = Math.abs(value - y / x);
    furthest = { id: part.id, value };
  }
  return furthest;
}
