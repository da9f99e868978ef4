import { presentValue, type Series } from './net-flows.ts';

const STEP = 0.01;
/** ln(1 + r) at r = −0.9999 and at r = 1,000,000, each with room for the rounding of a root that lies on it. */
const LOWEST = Math.log(0.0001) - 1e-12;
const HIGHEST = Math.log(1_000_001) + 1e-12;

/** Up to `wanted` roots x, nearest to 0 first: rings of 0.01 outward from 0, both ways, refined where the sign turns. */
export function roots(series: Series, wanted: number): number[] {
  const found = series.cents.reduce((a, b) => a + b, 0) === 0 ? [0] : [];
  const up = walk(series, HIGHEST, 1);
  const down = walk(series, -LOWEST, -1);
  for (let ring = 1; (ring - 1) * STEP < HIGHEST && found.length < wanted; ring += 1) {
    const above = up();
    const below = down();
    // The two of a symmetric pair differ by rounding only; then the positive one comes first.
    const belowFirst = above !== null && below !== null && -below < above - 1e-9;
    for (const root of belowFirst ? [below, above] : [above, below]) if (root !== null) found.push(root);
  }
  return found;
}

/**
 * Steps away from 0 and answers per step the root inside it, or null. A step multiplies each term by a constant
 * in place of a new power. Rounding grows to under 1e-12 of Σ|CF|, so nearer to 0 than that the value is computed anew.
 */
function walk({ years, cents }: Series, end: number, direction: 1 | -1): () => number | null {
  const origin = direction < 0 ? (years[years.length - 1] ?? 0) : 0;
  const factors = years.map((t) => Math.exp(-direction * STEP * (t - origin)));
  const terms = Float64Array.from(cents);
  const doubt = 1e-12 * cents.reduce((a, b) => a + Math.abs(b), 0);
  let inner = 0;
  let sign = Math.sign(cents.reduce((a, b) => a + b, 0));
  let step = 0;
  return () => {
    if (Math.abs(inner) >= end) return null;
    step += 1;
    const outer = direction * Math.min(step * STEP, end);
    let value = 0;
    for (let i = 0; i < terms.length; i += 1) value += terms[i] = (terms[i] as number) * (factors[i] as number);
    if (Math.abs(value) <= doubt || Math.abs(outer) === end) value = presentValue({ years, cents }, outer).value;
    const turned = sign * value < 0;
    const root = value === 0 ? outer : turned ? refine({ years, cents }, inner, outer) : null;
    sign = Math.sign(value);
    inner = outer;
    return root;
  };
}

/** The root between two x of opposite sign: Newton's step where it stays inside, else the middle. */
function refine(series: Series, a: number, b: number): number {
  let [low, high] = [a, b];
  const lowSign = Math.sign(presentValue(series, a).value);
  let x = (a + b) / 2;
  for (let round = 0; round < 80; round += 1) {
    const { value, slope } = presentValue(series, x);
    if (value === 0) return x;
    if (Math.sign(value) === lowSign) low = x;
    else high = x;
    const newton = x - value / slope;
    const isInside = newton > Math.min(low, high) && newton < Math.max(low, high);
    const next = isInside ? newton : (low + high) / 2;
    if (Math.abs(next - x) <= 1e-14 * Math.max(1, Math.abs(x))) return next;
    x = next;
  }
  return x;
}
