/** A stream of chance that gives the same draws for the same seed and name, on every machine. */
export interface Random {
  /** Uniform in [0, 1). */
  next(): number;
  between(low: number, high: number): number;
  /** Whole number from low to high, both included. */
  whole(low: number, high: number): number;
  chance(probability: number): boolean;
  pick<T>(items: readonly T[]): T;
  shuffle<T>(items: readonly T[]): T[];
  normal(): number;
  /** Log-normal around a median; `sd` is that of the logarithm. */
  logNormal(median: number, sd: number): number;
  /** Gamma with a whole shape: the sum of that many exponentials. */
  gamma(shape: number, scale: number): number;
  poisson(mean: number): number;
}

/** Each part of the demo draws from a stream of its own name, so that changing one part leaves the others as they were. */
export function random(seed: number, name: string): Random {
  const next = stream(hash(`${seed}/${name}`));
  const between = (low: number, high: number) => low + (high - low) * next();
  const whole = (low: number, high: number) => low + Math.floor(next() * (high - low + 1));
  const normal = () => Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next());
  return {
    next,
    between,
    whole,
    normal,
    chance: (probability) => next() < probability,
    pick: (items) => at(items, whole(0, items.length - 1)),
    shuffle: (items) => shuffled(items, whole),
    logNormal: (median, sd) => median * Math.exp(sd * normal()),
    gamma: (shape, scale) =>
      scale * Array.from({ length: shape }, () => -Math.log(1 - next())).reduce((a, b) => a + b, 0),
    poisson: (mean) => poisson(mean, next),
  };
}

/** Knuth's product of uniforms: fine for the small means of a repair. */
function poisson(mean: number, next: () => number): number {
  const floor = Math.exp(-mean);
  let count = 0;
  for (let product = next(); product > floor; product *= next()) count += 1;
  return count;
}

function shuffled<T>(items: readonly T[], whole: (low: number, high: number) => number): T[] {
  const result = [...items];
  for (let last = result.length - 1; last > 0; last -= 1) {
    const other = whole(0, last);
    [result[last], result[other]] = [at(result, other), at(result, last)];
  }
  return result;
}

function at<T>(items: readonly T[], index: number): T {
  if (index < 0 || index >= items.length) throw new RangeError(`nothing at ${index}`);
  return items[index] as T;
}

/** FNV-1a, 32 bits. */
function hash(text: string): number {
  let value = 0x811c9dc5;
  for (const char of text) value = Math.imul(value ^ (char.codePointAt(0) ?? 0), 0x01000193);
  return value >>> 0;
}

/** A counter stepped by the golden ratio and scrambled by the 32-bit finisher of MurmurHash3: small, and even enough for a demo. */
function stream(start: number): () => number {
  let counter = start;
  return () => {
    counter = (counter + 0x9e3779b9) >>> 0;
    let mixed = counter;
    mixed = Math.imul(mixed ^ (mixed >>> 16), 0x85ebca6b);
    mixed = Math.imul(mixed ^ (mixed >>> 13), 0xc2b2ae35);
    return ((mixed ^ (mixed >>> 16)) >>> 0) / 2 ** 32;
  };
}
