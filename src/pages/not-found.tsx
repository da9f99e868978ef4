import { useSuspenseQuery } from '@tanstack/react-query';
import { sessionQuery } from '../lib/session.ts';
import { PageHeader } from '../ui/answer-header.tsx';
import { LinkButton } from '../ui/button.tsx';

/** An address that leads nowhere, or nowhere that this person may see: the two look the same on purpose. */
export function NotFoundPage() {
  const { data: session } = useSuspenseQuery(sessionQuery());
  return (
    <>
      <PageHeader
        title="Nothing stands at this address"
        note="It may have moved, or belong to a shop that you are not a member of."
      />
      {session ? <LinkButton to="/">To the start</LinkButton> : <LinkButton to="/sign-in">Sign in</LinkButton>}
    </>
  );
}
