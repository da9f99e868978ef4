import { describe, expect, it } from 'vitest';
import { publicCheckIds } from '../support/public-check.ts';
import { exactChecks } from './checks-exact.ts';
import { poolingChecks } from './checks-pooling.ts';
import { returnChecks } from './checks-returns.ts';
import { statisticsChecks } from './checks-statistics.ts';
import { survivalChecks } from './checks-survival.ts';

const checks: Record<string, () => void> = {
  ...statisticsChecks,
  ...survivalChecks,
  ...returnChecks,
  ...poolingChecks,
  ...exactChecks,
};

/** Published figures of what this product does not compute, each with the reason. */
const notComputed: Record<string, string> = {
  anscombe: 'no answer uses a correlation',
  'spearman-iq-tv': 'no answer uses a correlation',
  'spearman-ties': 'no answer uses a correlation',
  'james-stein-1977': 'groups are pulled together by random effects, not by James and Stein',
  'james-stein-1975': 'groups are pulled together by random effects, not by James and Stein',
  'wilks-sizes': 'a cushion states its chance for the next rebuild, not a tolerance interval',
  'rcf-uplifts': 'uplifts of public works; no shop is compared with them',
  'mott-macdonald': 'uplifts of public works; no shop is compared with them',
  'contingency-levels': 'levels that other trades use; ours are fractions',
  'cpi-u': 'the view in constant prices is optional and not built',
  'cpi-convert': 'the view in constant prices is optional and not built',
  'bootstrap-law': 'no interval here is resampled',
};

describe('published figures', () => {
  it.each(Object.entries(checks))('%s', (_id, check) => {
    expect.hasAssertions();
    check();
  });

  it('are each checked, or listed with the reason why not', () => {
    expect([...Object.keys(checks), ...Object.keys(notComputed)].sort()).toEqual([...publicCheckIds].sort());
  });
});
