/** Milliseconds of one run. */
export async function timed(run: () => unknown): Promise<number> {
  const start = performance.now();
  await run();
  return performance.now() - start;
}

/** Medians of several things done in turn, A B C A B C …, so that a busy machine slows all of them alike. */
export async function interleaved<K extends string>(
  rounds: number,
  variants: Readonly<Record<K, () => Promise<number>>>,
): Promise<Record<K, number>> {
  const names = Object.keys(variants) as K[];
  const times = new Map<K, number[]>(names.map((name) => [name, []]));
  for (let round = 0; round < rounds; round += 1) {
    for (const name of names) times.get(name)?.push(await variants[name]());
  }
  return Object.fromEntries(names.map((name) => [name, middle(times.get(name) ?? [])])) as Record<K, number>;
}

function middle(values: readonly number[]): number {
  const sorted = values.toSorted((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? Number.NaN;
}

/** One line of the report: what was measured, beside its limit. */
export interface Measure {
  readonly name: string;
  readonly value: number;
  readonly unit: '×' | 'ms' | 'MB';
  readonly limit: number | null;
}

export function printTable(title: string, measures: readonly Measure[]): void {
  const lines = measures.map(({ name, value, unit, limit }) => {
    const verdict = limit === null ? '' : value <= limit ? `≤ ${limit} ${unit}  ok` : `≤ ${limit} ${unit}  OVER`;
    return `  ${name.padEnd(62)} ${value.toFixed(unit === '×' ? 2 : 1).padStart(9)} ${unit.padEnd(3)} ${verdict}`;
  });
  process.stdout.write(`\n${title}\n${lines.join('\n')}\n`);
}
