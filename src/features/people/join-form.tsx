import type { z } from 'zod';
import type { peopleApi } from '#shared/contracts/people.ts';
import { newPasswordSchema } from '#shared/contracts/session.ts';
import { usePlainForm } from '../../lib/use-plain-form.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { PasswordField } from '../../ui/password-field.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { useJoin } from './mutations.ts';

type Look = z.output<typeof peopleApi.look.response>;
type Props = { token: string; invitation: Look; onJoined: (shopId: string | null) => void };

const NAMES = ['name', 'password'] as const;

/** Takes an invitation up: with a new account's name and password, or with the password of the account there is. */
export function JoinForm({ token, invitation, onJoined }: Props) {
  const join = useJoin();
  const { email, hasAccount, shopName } = invitation;
  const { onSubmit, isBusy, errors, message } = usePlainForm({
    names: NAMES,
    check: (values) => (hasAccount ? needed(values.password) : checkNew(values)),
    save: async ({ name, password }) => onJoined(await join({ token, password, ...(hasAccount ? {} : { name }) })),
  });
  return (
    <form onSubmit={onSubmit} noValidate className="grid gap-4">
      <TextField
        label="Email"
        name="email"
        type="email"
        autoComplete="username"
        value={email}
        readOnly
        hint="The invitation is for this address."
      />
      {!hasAccount && (
        <TextField label="Your name" name="name" autoComplete="name" maxLength={80} error={errors.name} />
      )}
      <PasswordField
        label="Password"
        name="password"
        autoComplete={hasAccount ? 'current-password' : 'new-password'}
        hint={
          hasAccount
            ? 'This address has an account: give its password.'
            : 'At least 15 characters; a short sentence is easiest to remember.'
        }
        error={errors.password}
      />
      <ErrorSummary message={message} />
      <div>
        <Button kind="main" type="submit" busy={isBusy}>
          Join {shopName}
        </Button>
      </div>
    </form>
  );
}

function needed(password: string) {
  return password === '' ? { password: 'Fill this in.' } : {};
}

function checkNew({ name, password }: { name: string; password: string }) {
  const parsed = newPasswordSchema.safeParse(password);
  return {
    ...(name.trim() === '' ? { name: 'Fill this in.' } : {}),
    ...(parsed.success ? {} : { password: parsed.error.issues[0]?.message ?? 'Choose another password.' }),
  };
}
