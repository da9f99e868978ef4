import { useState } from 'react';
import type { RuleReview } from '#shared/contracts/answers-rule-review.ts';
import { newIdempotencyKey } from '../../lib/api.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorState } from '../../ui/states.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { notify } from '../../ui/toast.tsx';
import { type NewRule, useAdoptRule } from './mutations.ts';
import { ruleText } from './rule-words.ts';

type Reviewed = NonNullable<RuleReview['reviewed']>;
type Props = {
  reviewed: Reviewed;
  mayAdopt: boolean;
  alsoOld: readonly (readonly string[])[];
};

/** Keep the rule for the next year, or change to what the books ask for now: one press each. */
export function Decide({ reviewed, mayAdopt, alsoOld }: Props) {
  const format = useFormatter();
  const adopt = useAdoptRule(alsoOld);
  const [keys] = useState(() => new Map<string, string>());
  const { nextYear, next, kind, level, percent, flatCents } = reviewed;
  const figures = { percent, ...(flatCents !== null && { flatCents }) };
  const press = (body: NewRule) => {
    // The same press again is the same write; another one is another.
    const name = JSON.stringify(body);
    const idempotencyKey = keys.get(name) ?? newIdempotencyKey();
    keys.set(name, idempotencyKey);
    adopt.mutate(
      { body, idempotencyKey },
      { onSuccess: (rule) => notify(`Adopted for ${rule.year}: ${ruleText(rule, format)}`) },
    );
  };
  const common = { year: nextYear, level, reviewedRuleId: reviewed.id };
  const others = reviewed.askedNow.filter((one) => one.figures && !isSame(one, reviewed));
  const own = reviewed.askedNow[0];
  return (
    <Panel className="mb-6" title={`Keep it for ${nextYear}, or change it?`} subtitle={subtitleOf(reviewed, format)}>
      {own?.figures === null && <p>Too few finished rebuilds now for a rule at this level: nothing can be adopted.</p>}
      {own?.figures && isSame(own, reviewed) && (
        <p>The books ask for the same as before: {ruleText(own.figures, format)}.</p>
      )}
      {mayAdopt && own?.figures && (
        <div className="no-print mt-3 flex flex-wrap gap-3">
          <Button kind="main" busy={adopt.isPending} onClick={() => press({ ...common, kind, ...figures })}>
            Keep {ruleText(reviewed, format)} for {nextYear}
          </Button>
          {others.map((one) => (
            <Button key={one.kind} busy={adopt.isPending} onClick={() => press({ ...common, kind: one.kind })}>
              Change to {ruleText(one.figures ?? reviewed, format)}
            </Button>
          ))}
        </div>
      )}
      {next && <p className="mt-3 text-soft">{nextText(next, format)}</p>}
      {adopt.error && <ErrorState error={adopt.error} />}
    </Panel>
  );
}

function isSame(asked: Reviewed['askedNow'][number], { kind, percent, flatCents }: Reviewed): boolean {
  return asked.kind === kind && asked.figures?.percent === percent && asked.figures.flatCents === flatCents;
}

function subtitleOf({ askedNow, level }: Reviewed, format: ReturnType<typeof useFormatter>): string {
  const asked = askedNow.flatMap(({ figures, n }) =>
    figures ? [`${ruleText(figures, format)} (${format.count(n, 'finished rebuild')})`] : [],
  );
  const now =
    asked.length === 0 ? '' : ` To hold ${level.replace('/', ' in ')} they now ask for ${asked.join(', or ')}.`;
  return `The next rule is set on all finished rebuilds, those judged here with them; it is then judged on what is bought after it.${now}`;
}

function nextText(next: NonNullable<Reviewed['next']>, format: ReturnType<typeof useFormatter>): string {
  const how = next.review === null ? '' : `, ${next.review.decision} after this review`;
  return `For ${next.year} ${ruleText(next, format)} is adopted since ${format.day(next.adoptedOn)}${how}. Another press takes its place; it stays in the history.`;
}
