import { useSuspenseQuery, useQueryClient } from '@tanstack/react-query';
import { Link, Navigate, useSearchParams } from 'react-router-dom';
import { SignInForm } from '../app/sign-in-form.tsx';
import { sessionQuery } from '../lib/session.ts';
import { PageHeader } from '../ui/answer-header.tsx';

/** The way in. `?to=` is the address that was asked for; only our own addresses are followed. */
export function SignInPage() {
  const client = useQueryClient();
  const [search] = useSearchParams();
  const { data: session } = useSuspenseQuery(sessionQuery());
  const to = search.get('to') ?? '/';
  if (session) return <Navigate to={/^\/(?!\/)/.test(to) ? to : '/'} replace />;
  return (
    <>
      <PageHeader title="Sign in to your shop" note="What your own past says about the next car." />
      <SignInForm onSignedIn={() => client.refetchQueries({ queryKey: sessionQuery().queryKey })} />
      <p className="mt-6 text-soft">
        New here? <Link to="/sign-up">Start a shop</Link>.
      </p>
    </>
  );
}
