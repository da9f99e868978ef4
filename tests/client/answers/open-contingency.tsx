import { answersApi } from '#shared/contracts/answers.ts';
import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import { type Rule, rulesApi } from '#shared/contracts/rules.ts';
import type { Role } from '#shared/vocabulary.ts';
import { ContingencyPage } from '../../../src/pages/contingency.tsx';
import { openPage, type Request, serve } from './open-page.tsx';
import { contingencyReply } from './contingency-replies.ts';
import { idOf } from './replies.ts';
import { forCarReply } from './rule-replies.ts';

/** An adopted rule of 18 % for 2026. */
export const rule = (changes: Partial<Rule> = {}): Rule => ({
  id: idOf('rule'),
  year: 2026,
  revision: 1,
  kind: 'percent',
  level: '4/5',
  percent: 18,
  flatCents: null,
  rebuildCount: 30,
  dataUntil: '2025-12-20',
  evidence: {
    n: 30,
    k: 25,
    guarantee: 25 / 31,
    uplift: 0.174,
    flatCents: null,
    askedPercent: 18,
    askedFlatCents: null,
    covered: 20,
    scored: 24,
    booksVersion: 7,
  },
  note: null,
  review: null,
  adoptedOn: '2026-01-03',
  adoptedAt: '2026-01-03T10:00:00.000Z',
  adoptedByName: 'Dana Whitlock',
  ...changes,
});

type Options = {
  inForce?: Rule;
  answer?: Partial<ContingencyAnswer>;
  adopt?: (request: Request) => unknown;
  role?: Role;
  search?: string;
};

/** Opens the Contingency page with its three routes served. */
export function openContingency(options: Options = {}) {
  const { inForce, answer, adopt = () => rule({ year: 2027, percent: 24 }), role = 'owner', search = '' } = options;
  const record = {
    n: 9,
    x: 6,
    rate: 0.67,
    lower: 0.35,
    upper: 0.88,
    shortCents: 120_000,
    unusedCents: 1,
    openCount: 2,
  };
  const thisYear = { year: 2026, rule: inForce ? { ...inForce, record } : null };
  const asked = serve([
    { contract: answersApi.contingency, reply: () => contingencyReply({ thisYear, ...answer }) },
    { contract: answersApi.ruleForCar, reply: ({ url }) => forCarReply(url.searchParams) },
    { contract: rulesApi.adopt, reply: adopt },
  ]);
  return { asked, ...openPage(<ContingencyPage />, search, role) };
}
