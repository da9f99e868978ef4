import { Link } from 'react-router-dom';
import { usePlainForm } from '../../lib/use-plain-form.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { PasswordField } from '../../ui/password-field.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { type SignUp, useSignUp } from './mutations.ts';

const NAMES = ['name', 'shopName', 'email', 'password'] as const;
const LEAST_PASSWORD = 15;

/** Name, shop, address, password: an account and its empty shop. Plain React, as the sign-in form. */
export function SignUpForm({ onSignedUp }: { onSignedUp: (shopId: string | null) => void }) {
  const signUp = useSignUp();
  const { onSubmit, isBusy, errors, message } = usePlainForm({
    names: NAMES,
    check,
    save: async (values) => onSignedUp(await signUp(values)),
  });
  return (
    <form onSubmit={onSubmit} noValidate className="grid gap-4">
      <TextField label="Your name" name="name" autoComplete="name" maxLength={80} error={errors.name} />
      <TextField
        label="Your shop's name"
        name="shopName"
        autoComplete="organization"
        maxLength={80}
        hint="As it shall stand on papers. It can be changed later."
        error={errors.shopName}
      />
      <TextField label="Email" name="email" type="email" autoComplete="username" maxLength={254} error={errors.email} />
      <PasswordField
        label="Password"
        name="password"
        autoComplete="new-password"
        hint="At least 15 characters; a short sentence is easiest to remember."
        error={errors.password}
      />
      <ErrorSummary message={message} />
      <div>
        <Button kind="main" type="submit" busy={isBusy}>
          Start the shop
        </Button>
      </div>
      <p className="text-soft">
        Been here before? <Link to="/sign-in">Sign in</Link>.
      </p>
    </form>
  );
}

/** What can be seen without the server; the rest of the rules are its own to say. */
function check(values: SignUp) {
  const found: Partial<Record<keyof SignUp, string>> = {};
  for (const name of NAMES) if (values[name].trim() === '') found[name] = 'Fill this in.';
  if (!found.email && !values.email.includes('@')) found.email = 'Give an e-mail address.';
  if (!found.password && values.password.length < LEAST_PASSWORD)
    found.password = `${LEAST_PASSWORD - values.password.length} more needed: at least 15 characters.`;
  return found;
}
