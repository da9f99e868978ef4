import { useState } from 'react';
import type { LevelName } from '#shared/vocabulary.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { newIdempotencyKey } from '../../lib/api.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { ChipChoice } from '../../ui/segmented.tsx';
import { TextAreaField } from '../../ui/text-field.tsx';
import { notify } from '../../ui/toast.tsx';
import { useAdoptRule } from './mutations.ts';
import { type RuleFigures, ruleText } from './rule-words.ts';

export type RuleKind = 'percent' | 'two-part';

/** What the books ask for in each kind, and how it was rounded; null = too few yet. */
export type Proposal = {
  level: LevelName;
  percent: (RuleFigures & { rounding: string }) | null;
  'two-part': (RuleFigures & { rounding: string }) | null;
};

type Props = {
  proposal: Proposal;
  /** This shop year and the next, with the rule in force if there is one. */
  years: readonly { year: number; inForce: RuleFigures | null }[];
  /** What else shows the rule: made old after it is adopted. */
  alsoOld: readonly (readonly string[])[];
  onClose: () => void;
};

/** Adopts what the books ask for, for one shop year. Mount it to open it: the key of the write is made then. */
export function AdoptDialog({ proposal, years, alsoOld, onClose }: Props) {
  const format = useFormatter();
  const [idempotencyKey, setKey] = useState(newIdempotencyKey);
  const [year, setYear] = useState(years.at(-1)?.year ?? 0);
  const [kind, setKind] = useState<RuleKind>(proposal.percent ? 'percent' : 'two-part');
  const [note, setNote] = useState('');
  const adopt = useAdoptRule(alsoOld);
  const chosen = proposal[kind];
  const replaced = years.find((one) => one.year === year)?.inForce ?? null;
  // Another choice is another write: it must not replay the answer of the first.
  const change = (act: () => void) => {
    act();
    setKey(newIdempotencyKey());
  };
  const onAdopt = () =>
    adopt.mutate(
      { body: { year, kind, level: proposal.level, ...(note.trim() ? { note } : {}) }, idempotencyKey },
      {
        onSuccess: (rule) => {
          notify(`Adopted for ${rule.year}: ${ruleText(rule, format)}`);
          onClose();
        },
      },
    );
  return (
    <Dialog
      open
      onClose={onClose}
      title="Adopt a rule"
      note={`What the books ask for to hold ${proposal.level.replace('/', ' in ')}, over all rebuilds. The figures behind it are kept as they stand today.`}
    >
      <ChipChoice
        label="For budgets of"
        options={years.map((one) => ({ value: `${one.year}`, label: `${one.year}` }))}
        value={`${year}`}
        onChange={(value) => change(() => setYear(Number(value)))}
      />
      <ChipChoice
        label="Kind"
        options={KINDS.filter(({ value }) => proposal[value] !== null)}
        value={kind}
        onChange={(value) => change(() => setKind(value))}
      />
      {chosen && (
        <p>
          <strong className="font-[680]">{ruleText(chosen, format)}</strong> on top of the repair estimate.{' '}
          <span className="text-soft">{chosen.rounding}</span>
        </p>
      )}
      {replaced && (
        <p className="text-soft">
          It takes the place of {ruleText(replaced, format)} for {year}; that stays in the history.
        </p>
      )}
      <TextAreaField
        label="Note (optional)"
        value={note}
        onChange={(event) => change(() => setNote(event.target.value))}
      />
      <ErrorSummary message={adopt.error ? problemText(adopt.error) : undefined} />
      <DialogActions>
        <Button kind="main" onClick={onAdopt} busy={adopt.isPending} disabled={!chosen}>
          Adopt {chosen ? ruleText(chosen, format) : ''} for {year}
        </Button>
        <Button onClick={onClose}>Not now</Button>
      </DialogActions>
    </Dialog>
  );
}

const KINDS: readonly { value: RuleKind; label: string }[] = [
  { value: 'percent', label: 'One percentage' },
  { value: 'two-part', label: 'Percentage and sum' },
];

function problemText(error: unknown): string {
  if (!(error instanceof ApiProblem)) return 'This ran into an error of ours; nothing was saved.';
  return [error.message, ...error.errors.map((one) => one.detail)].join(' ');
}
