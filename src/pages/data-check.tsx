import { useQuery } from '@tanstack/react-query';
import { CHECKS_QUESTION, ChecksAnswerHead } from '../features/checks/checks-answer.tsx';
import { FindingsList } from '../features/checks/findings-list.tsx';
import { checksQuery } from '../features/checks/queries.ts';
import { useSession } from '../lib/session.ts';
import { PageHeader } from '../ui/answer-header.tsx';
import { LinkButton } from '../ui/button.tsx';
import { EmptyState, ErrorState, LoadingState } from '../ui/states.tsx';

/** What in the books would bend an answer? Each fault with its effect, the gravest first, and the way to mend it. */
export function DataCheckPage() {
  const { shop, role } = useSession();
  const { data: answer, error, refetch } = useQuery(checksQuery());
  const canWrite = role === 'owner' || role === 'bookkeeper';
  const shopPath = `/s/${shop.id}`;
  if (!answer) {
    return (
      <>
        <PageHeader title={CHECKS_QUESTION} />
        {error ? (
          <ErrorState error={error} onRetry={() => void refetch()} />
        ) : (
          <LoadingState label="Looking through the books" />
        )}
      </>
    );
  }
  if (answer.rebuildCount === 0 && answer.findings.length === 0) {
    return (
      <>
        <PageHeader title={CHECKS_QUESTION} />
        <EmptyState
          title="Gaps and slips in the books will stand here"
          action={
            canWrite && (
              <LinkButton kind="main" to={`${shopPath}/import`}>
                Import a spreadsheet
              </LinkButton>
            )
          }
        >
          Bills booked twice, hours that nobody kept, estimates that were written over: each with the answer that it
          bends, and the place to mend it.
        </EmptyState>
      </>
    );
  }
  return (
    <>
      <ChecksAnswerHead answer={answer} />
      <FindingsList answer={answer} shopPath={shopPath} canSettle={canWrite} />
    </>
  );
}
