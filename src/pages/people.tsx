import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Role } from '#shared/vocabulary.ts';
import { InvitationsPanel } from '../features/people/invitations-panel.tsx';
import { InviteDialog } from '../features/people/invite-dialog.tsx';
import { MembersPanel } from '../features/people/members-panel.tsx';
import { peopleQuery } from '../features/people/queries.ts';
import { roleSentence } from '../features/people/roles.ts';
import { RoleTable } from '../features/people/role-table.tsx';
import { useSession } from '../lib/session.ts';
import { PageHeader } from '../ui/answer-header.tsx';
import { Button } from '../ui/button.tsx';
import { EmptyState, ErrorState, LoadingState } from '../ui/states.tsx';

/** Who may see what: members, invitations, and what each role means. Owners only. */
export function PeoplePage() {
  const { role, shop } = useSession();
  const [isInviting, setInviting] = useState(false);
  if (role !== 'owner') return <NotYours role={role} />;
  return (
    <>
      <PageHeader
        title="People"
        note={`Who may see and do what in ${shop.name}.`}
        actions={
          <Button kind="main" onClick={() => setInviting(true)}>
            Invite someone
          </Button>
        }
      />
      <div className="grid gap-6">
        <People />
        <RoleTable />
      </div>
      {isInviting && <InviteDialog onClose={() => setInviting(false)} />}
    </>
  );
}

function People() {
  const { data, error, refetch } = useQuery(peopleQuery());
  if (!data) {
    if (error) return <ErrorState error={error} onRetry={() => void refetch()} />;
    return <LoadingState label="Reading who belongs to the shop" />;
  }
  return (
    <>
      <MembersPanel members={data.members} />
      <InvitationsPanel invitations={data.invitations} />
    </>
  );
}

function NotYours({ role }: { role: Role }) {
  return (
    <>
      <PageHeader title="People" />
      <EmptyState title="Only owners invite people and change roles">
        <p>
          Your role here is {role}. {roleSentence(role)} Ask an owner of the shop if it should be another.
        </p>
      </EmptyState>
    </>
  );
}
