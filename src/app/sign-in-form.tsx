import { type FormEvent, useState } from 'react';
import { ApiProblem } from '../lib/api-problem.ts';
import { signIn } from '../lib/session.ts';
import { Button } from '../ui/button.tsx';
import { ErrorSummary } from '../ui/error-summary.tsx';
import { PasswordField } from '../ui/password-field.tsx';
import { TextField } from '../ui/text-field.tsx';

/** Address and password, and the way in. Plain React: the first page a visitor meets loads no form library. */
export function SignInForm({ email = '', onSignedIn }: { email?: string; onSignedIn: () => void | Promise<void> }) {
  const [problem, setProblem] = useState<string>();
  const [isBusy, setBusy] = useState(false);
  const onSubmit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const fields = new FormData(event.currentTarget);
    setBusy(true);
    try {
      await signIn({ email: String(fields.get('email')), password: String(fields.get('password')) });
      await onSignedIn();
    } catch (refused) {
      if (!(refused instanceof ApiProblem)) throw refused;
      setProblem(refused.message);
    } finally {
      setBusy(false);
    }
  };
  return (
    <form onSubmit={onSubmit} className="grid max-w-[24rem] gap-4">
      <TextField label="Email" name="email" type="email" autoComplete="username" required defaultValue={email} />
      <PasswordField label="Password" name="password" autoComplete="current-password" required />
      <ErrorSummary message={problem} />
      <Button kind="main" type="submit" busy={isBusy}>
        Sign in
      </Button>
    </form>
  );
}
