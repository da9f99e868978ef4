import { expect } from 'vitest';
import { annualReturn, hasSeveralReturns } from '../../server/domain/annual-return.ts';
import { netFlows, presentValue, toSeries } from '../../server/domain/net-flows.ts';
import { dayNumber } from '#shared/day.ts';
import { expectNear, expectWithin, publicCheck } from '../support/public-check.ts';

interface Dated {
  dates: string[];
  flows: number[];
}

function net({ dates, flows }: Dated): ReadonlyMap<number, number> {
  return netFlows(dates.map((date, i) => ({ day: dayNumber(date), cents: flows[i] ?? 0 })));
}

/** Periods of exactly one year of 365 days. */
function yearly(flows: readonly number[]): ReadonlyMap<number, number> {
  return netFlows(flows.map((cents, i) => ({ day: 365 * i, cents })));
}

function valueAt(dated: Dated, rate: number): number {
  const series = toSeries(net(dated));
  return series === null ? Number.NaN : presentValue(series, Math.log1p(rate)).value;
}

function root(id: string, key: string): () => void {
  return () => {
    const { input, expected } = publicCheck<Dated, Record<string, number>>(id);
    expectWithin(annualReturn(net(input)), expected[key] ?? Number.NaN, 1e-9);
  };
}

function periodic(id: string): () => void {
  return () => {
    const { input, expected } = publicCheck<{ flows: number[][] }, { root: number[] }>(id);
    for (const [i, flows] of input.flows.entries()) {
      expectWithin(annualReturn(yearly(flows)), expected.root[i] ?? Number.NaN, 1e-9);
    }
  };
}

export const returnChecks: Record<string, () => void> = {
  'xirr-microsoft': root('xirr-microsoft', 'root'),
  'xirr-libreoffice': () => {
    const { input, expected } = publicCheck<Dated, Record<string, number>>('xirr-libreoffice');
    expectWithin(annualReturn(net(input)), expected.xirr ?? Number.NaN, 1e-9);
    expectWithin(valueAt(input, 0.06), expected.xnpv_6_percent ?? Number.NaN, 1e-7);
  },
  'xnpv-microsoft': () => {
    const { input, expected } = publicCheck<Dated & { rate: number }, { xnpv: number }>('xnpv-microsoft');
    expectNear(valueAt(input, input.rate), expected.xnpv, 1e-10);
  },
  'xirr-rust-doc': root('xirr-rust-doc', 'root'),
  'xirr-edges': () => {
    const { input, expected } = publicCheck<Dated[], { roots: number[] }>('xirr-edges');
    for (const [i, dated] of input.entries()) expectNear(annualReturn(net(dated)), expected.roots[i] ?? null, 1e-8);
  },
  'xirr-two-roots': () => {
    const { input, expected } = publicCheck<Dated, { reported: number }>('xirr-two-roots');
    expectWithin(annualReturn(net(input)), expected.reported, 1e-9);
    expect(hasSeveralReturns(net(input))).toBe(true);
  },
  'xirr-late-bill': () => {
    const { input, expected } = publicCheck<Dated, { reported: number }>('xirr-late-bill');
    expectNear(annualReturn(net(input)), expected.reported, 1e-8);
    expect(hasSeveralReturns(net(input))).toBe(false);
  },
  'xirr-none': () => {
    const { input, expected } = publicCheck<Dated[], null[]>('xirr-none');
    expect(input.map((dated) => annualReturn(net(dated)))).toEqual(expected);
  },
  'irr-numpy-financial': periodic('irr-numpy-financial'),
  'irr-microsoft': periodic('irr-microsoft'),
};
