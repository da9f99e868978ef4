import { useFormatter } from '../../ui/formatter-context.tsx';
import { MoneyField } from '../../ui/money-field.tsx';
import { TextField } from '../../ui/text-field.tsx';
import type { ReadRule, TypedRule } from './adopt-form.ts';
import { type RuleFigures, ruleText } from './rule-words.ts';

type Props = {
  typed: TypedRule;
  read: ReadRule;
  asked: RuleFigures & { rounding: string };
  errorAt: (pointer: string) => string | undefined;
  onChange: (typed: TypedRule) => void;
};

/** The figures of the rule, as the books ask for them until they are typed over; rounding up is free, less needs a reason. */
export function RuleFields({ typed, read, asked, errorAt, onChange }: Props) {
  const format = useFormatter();
  const unread = read.percent === null ? 'Give a whole percent, such as 25.' : undefined;
  return (
    <div className="grid gap-2">
      <div className="grid grid-cols-2 gap-3">
        <TextField
          label="Percent on top of the estimate"
          inputMode="numeric"
          autoComplete="off"
          value={typed.percent}
          error={unread ?? errorAt('/percent')}
          onChange={(event) => onChange({ ...typed, percent: event.target.value })}
        />
        {asked.flatCents !== null && (
          <MoneyField
            label="For surprises, on top of that"
            value={typed.flat}
            error={read.flatCents === null ? 'Give an amount, such as 450.' : errorAt('/flatCents')}
            onChange={(event) => onChange({ ...typed, flat: event.target.value })}
          />
        )}
      </div>
      <p className="text-soft" aria-live="polite">
        The books ask for {ruleText(asked, format)}: {asked.rounding}{' '}
        {read.isBelow ? 'This is less: say why below.' : 'Round it up as you like.'}
      </p>
    </div>
  );
}
