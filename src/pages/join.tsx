import { useQuery, useSuspenseQuery } from '@tanstack/react-query';
import { useNavigate, useParams } from 'react-router-dom';
import { JoinForm } from '../features/people/join-form.tsx';
import { invitationQuery } from '../features/people/queries.ts';
import { roleSentence } from '../features/people/roles.ts';
import { ApiProblem } from '../lib/api-problem.ts';
import { sessionQuery } from '../lib/session.ts';
import { PageHeader } from '../ui/answer-header.tsx';
import { LinkButton } from '../ui/button.tsx';
import { EmptyState, ErrorState, LoadingState } from '../ui/states.tsx';

/** Where an invitation's link leads: which shop, as what, and the way in. */
export function JoinPage() {
  const { token = '' } = useParams();
  const navigate = useNavigate();
  const { data: session } = useSuspenseQuery(sessionQuery());
  const { data: invitation, error, refetch } = useQuery(invitationQuery(token));
  if (isDead(error)) return <DeadLink isSignedIn={session !== null} />;
  if (error) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (!invitation) return <LoadingState label="Reading the invitation" />;
  const { shopName, role, email } = invitation;
  return (
    <>
      <PageHeader title={`Join ${shopName} as ${role}`} note={roleSentence(role)} />
      {session && session.user.email !== email && (
        <p className="mb-4 max-w-[38rem] text-soft">
          You are signed in as {session.user.email}. Joining signs you in as {email} instead.
        </p>
      )}
      <section className="panel max-w-[28rem]">
        <JoinForm
          token={token}
          invitation={invitation}
          onJoined={(shopId) => void navigate(shopId ? `/s/${shopId}` : '/', { replace: true })}
        />
      </section>
    </>
  );
}

/** A link that is used up, withdrawn, too old (404), or cut off when it was copied (400). */
function isDead(error: unknown): boolean {
  return error instanceof ApiProblem && (error.status === 404 || error.status === 400);
}

function DeadLink({ isSignedIn }: { isSignedIn: boolean }) {
  return (
    <>
      <PageHeader title="This invitation no longer works" />
      <EmptyState
        title="A link lets one person in, once, within seven days"
        action={<LinkButton to={isSignedIn ? '/' : '/sign-in'}>{isSignedIn ? 'To your shop' : 'Sign in'}</LinkButton>}
      >
        <p>
          It was used already, was withdrawn, is too old, or lost its end when it was copied. If you joined before, sign
          in with your address and password. Otherwise ask the owner of the shop for a new link.
        </p>
      </EmptyState>
    </>
  );
}
