/** Net cents per day number (see `dayNumber`); money in is positive. */
export type NetFlows = ReadonlyMap<number, number>;

export interface Flow {
  readonly day: number;
  readonly cents: number;
}

/** Flows as two columns: years since the first day, rising, and cents ≠ 0. */
export interface Series {
  readonly years: Float64Array;
  readonly cents: Float64Array;
}

/** Adds up flows of the same day. */
export function netFlows(flows: Iterable<Flow>): Map<number, number> {
  const net = new Map<number, number>();
  for (const { day, cents } of flows) net.set(day, (net.get(day) ?? 0) + cents);
  return net;
}

/** Days without a net flow are dropped; null unless money went both ways. */
export function toSeries(net: NetFlows): Series | null {
  const days = Float64Array.from(net.keys()).sort();
  const years: number[] = [];
  const cents: number[] = [];
  let [first, low, high] = [0, 0, 0];
  for (const day of days) {
    const amount = net.get(day) ?? 0;
    if (amount === 0) continue;
    if (cents.length === 0) first = day;
    years.push((day - first) / 365);
    cents.push(amount);
    low = Math.min(low, amount);
    high = Math.max(high, amount);
  }
  return low < 0 && high > 0 ? { years: new Float64Array(years), cents: new Float64Array(cents) } : null;
}

/**
 * Present value Σ CF·e^(−x·t) and its slope at x = ln(1 + r). Below x = 0 it is in money of the last day, so that
 * no power overflows; sign and root stay the same.
 */
export function presentValue(series: Series, x: number): { value: number; slope: number } {
  const { years, cents } = series;
  const origin = x < 0 ? (years[years.length - 1] ?? 0) : 0;
  let value = 0;
  let slope = 0;
  for (let i = 0; i < years.length; i += 1) {
    const t = (years[i] as number) - origin;
    const term = (cents[i] as number) * Math.exp(-x * t);
    value += term;
    slope -= t * term;
  }
  return { value, slope };
}
