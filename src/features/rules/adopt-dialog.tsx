import { useState } from 'react';
import { parseCents } from '#shared/money.ts';
import type { LevelName } from '#shared/vocabulary.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { newIdempotencyKey } from '../../lib/api.ts';
import { centsToText } from '../../lib/money-text.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { ChipChoice } from '../../ui/segmented.tsx';
import { TextAreaField } from '../../ui/text-field.tsx';
import { notify } from '../../ui/toast.tsx';
import { readRule, type TypedRule } from './adopt-form.ts';
import { useAdoptRule } from './mutations.ts';
import { RuleFields } from './rule-fields.tsx';
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
  /** The kind that the page speaks of. */
  kind: RuleKind;
  /** This shop year and the next, with the rule in force if there is one. */
  years: readonly { year: number; inForce: RuleFigures | null }[];
  /** The rule that was looked back at before; null = none. */
  reviewedRuleId?: string | null;
  /** What else shows the rule: made old after it is adopted. */
  alsoOld: readonly (readonly string[])[];
  onClose: () => void;
};

/** Adopts what the books ask for, or more, for one shop year. Mount it to open it: the key of the write is made then. */
export function AdoptDialog({ proposal, kind: shownKind, years, reviewedRuleId = null, alsoOld, onClose }: Props) {
  const format = useFormatter();
  const [idempotencyKey, setKey] = useState(newIdempotencyKey);
  const [year, setYear] = useState(years.at(-1)?.year ?? 0);
  const [kind, setKind] = useState<RuleKind>(proposal[shownKind] ? shownKind : otherOf(shownKind));
  const [typed, setTyped] = useState<TypedRule | null>(null);
  const [note, setNote] = useState('');
  const adopt = useAdoptRule(alsoOld);
  const asked = proposal[kind];
  const replaced = years.find((one) => one.year === year)?.inForce ?? null;
  // Another choice is another write: it must not replay the answer of the first.
  const change = (act: () => void) => {
    act();
    setKey(newIdempotencyKey());
  };
  if (!asked) return null;
  const shown = typed ?? { percent: `${asked.percent}`, flat: centsToText(asked.flatCents, format.decimal) };
  const read = readRule(shown, asked, (text) => parseCents(text, format.decimal));
  const figures: RuleFigures | null =
    read.percent === null || read.flatCents === null
      ? null
      : { percent: read.percent, flatCents: read.flatCents ?? null };
  const problem = adopt.error instanceof ApiProblem ? adopt.error : null;
  const errorAt = (pointer: string) => problem?.errors.find((one) => one.pointer === pointer)?.detail;
  const onAdopt = () => {
    if (!figures) return;
    const other = read.isAbove || read.isBelow;
    adopt.mutate(
      {
        body: {
          year,
          kind,
          level: proposal.level,
          ...(other && {
            percent: figures.percent,
            ...(figures.flatCents !== null && { flatCents: figures.flatCents }),
          }),
          ...(note.trim() && { note }),
          ...(reviewedRuleId && { reviewedRuleId }),
        },
        idempotencyKey,
      },
      {
        onSuccess: (rule) => {
          notify(`Adopted for ${rule.year}: ${ruleText(rule, format)}`);
          onClose();
        },
      },
    );
  };
  return (
    <Dialog
      open
      onClose={onClose}
      title="Adopt a rule"
      note={`To hold ${proposal.level.replace('/', ' in ')}, over all rebuilds. The figures behind it are kept as they stand today.`}
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
        onChange={(value) =>
          change(() => {
            setKind(value);
            setTyped(null);
          })
        }
      />
      <RuleFields
        typed={shown}
        read={read}
        asked={asked}
        errorAt={errorAt}
        onChange={(next) => change(() => setTyped(next))}
      />
      {replaced && (
        <p className="text-soft">
          It takes the place of {ruleText(replaced, format)} for {year}; that stays in the history.
        </p>
      )}
      <TextAreaField
        label={read.isBelow ? 'Why less than the books ask' : 'Note (optional)'}
        error={errorAt('/note')}
        rows={2}
        value={note}
        onChange={(event) => change(() => setNote(event.target.value))}
      />
      <ErrorSummary message={adopt.error ? problemText(adopt.error) : undefined} />
      <DialogActions>
        <Button
          kind="main"
          onClick={onAdopt}
          busy={adopt.isPending}
          disabled={!figures || (read.isBelow && note.trim() === '')}
        >
          Adopt {figures ? ruleText(figures, format) : ''} for {year}
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

function otherOf(kind: RuleKind): RuleKind {
  return kind === 'percent' ? 'two-part' : 'percent';
}

function problemText(error: unknown): string {
  if (!(error instanceof ApiProblem)) return 'This ran into an error of ours; nothing was saved.';
  return [error.message, ...error.errors.map((one) => one.detail)].join(' ');
}
