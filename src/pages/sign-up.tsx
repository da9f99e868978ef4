import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Navigate, useNavigate } from 'react-router-dom';
import { SignUpForm } from '../features/session/sign-up-form.tsx';
import { sessionQuery } from '../lib/session.ts';
import { PageHeader } from '../ui/answer-header.tsx';

/** A new account and its empty shop, which is led straight to its first import. */
export function SignUpPage() {
  const navigate = useNavigate();
  // Only who came here signed in is led away; a fresh session is the form's own doing.
  const [cameAs] = useState(useSuspenseQuery(sessionQuery()).data);
  if (cameAs) return <Navigate to="/" replace />;
  const onSignedUp = (shopId: string | null) => void navigate(shopId ? `/s/${shopId}/import` : '/', { replace: true });
  return (
    <>
      <PageHeader
        title="Start a shop"
        note="Its books are yours alone. Next you bring in an old spreadsheet, or begin with the next car."
      />
      <section className="panel max-w-[28rem]">
        <SignUpForm onSignedUp={onSignedUp} />
      </section>
    </>
  );
}
