import { type ComponentProps, useState } from 'react';
import { FieldFrame, type FieldProps, useField } from './field.tsx';

type Props = FieldProps & { className?: string | undefined } & Omit<ComponentProps<'input'>, 'className' | 'type'>;

/** A password with a button that shows it. `label`, `hint`, `error`, and the props of an input (say `autoComplete`). */
export function PasswordField({ label, hideLabel, hint, error, className, ...input }: Props) {
  const [isShown, setShown] = useState(false);
  const { id, control } = useField({ hint, error }, input.id);
  return (
    <FieldFrame {...{ id, label, hideLabel, hint, error, className }}>
      <div className="relative">
        <input
          {...input}
          {...control}
          type={isShown ? 'text' : 'password'}
          autoCapitalize="none"
          spellCheck={false}
          className="control pr-16"
        />
        <button
          type="button"
          aria-pressed={isShown}
          onClick={() => setShown(!isShown)}
          className="absolute inset-y-0 right-0 min-w-14 px-3 text-label font-[640] underline underline-offset-3"
        >
          <span aria-hidden="true">{isShown ? 'Hide' : 'Show'}</span>
          <span className="sr-only">Show password</span>
        </button>
      </div>
    </FieldFrame>
  );
}
