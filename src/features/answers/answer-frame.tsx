import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import type { Head } from '#shared/contracts/answers-parts.ts';
import { unbroken } from '../../lib/unbroken.ts';
import { AnswerHeader } from '../../ui/answer-header.tsx';
import { HowWorkedOut } from '../../ui/panel.tsx';
import { usePageTitle } from '../../ui/page-title.ts';
import { ErrorState, LoadingState } from '../../ui/states.tsx';
import { OldSheetLine } from './old-sheet-line.tsx';
import type { Said } from './sentences/parts.ts';
import { Spoken } from './spoken.tsx';

type Props<Answer extends Head> = {
  question: string;
  /** The window's title. */
  title: string;
  result: UseQueryResult<Answer>;
  /** What stands here while the shop has no rebuild. */
  empty: ReactNode;
  filters: (answer: Answer) => ReactNode;
  say: (answer: Answer) => Said;
  howWorkedOut: (answer: Answer) => ReactNode;
  /** What leaving out all but the sold would have said; a page without it has no such switch. */
  oldSheet?: (answer: Answer) => string | null;
  children: (answer: Answer) => ReactNode;
};

/**
 * One answer page: the question, then loading, what went wrong, what will stand here, or the answer. While another filter
 * loads the last answer stays and is marked as busy.
 */
export function AnswerFrame<Answer extends Head>(props: Props<Answer>) {
  const { question, title, result } = props;
  usePageTitle(title);
  if (result.data && !hasRebuilds(result.data)) return <Waiting question={question}>{props.empty}</Waiting>;
  if (result.data) return <Answered {...props} answer={result.data} />;
  return (
    <Waiting question={question}>
      {result.error ? (
        <ErrorState error={result.error} onRetry={() => void result.refetch()} />
      ) : (
        <LoadingState label="Working out the answer" lines={6} />
      )}
    </Waiting>
  );
}

function Answered<Answer extends Head>(props: Props<Answer> & { answer: Answer }) {
  const { question, title, answer, result } = props;
  const { answer: sentence, cautions } = props.say(answer);
  return (
    <div aria-busy={result.isPlaceholderData || undefined} className={result.isPlaceholderData ? 'opacity-60' : ''}>
      <AnswerHeader
        question={question}
        title={title}
        filters={props.filters(answer)}
        answer={<Spoken sentence={sentence} />}
        caution={cautions.length > 0 && unbroken(cautions.join(' '))}
      >
        {props.oldSheet && <OldSheetLine says={props.oldSheet(answer)} />}
        <HowWorkedOut>{props.howWorkedOut(answer)}</HowWorkedOut>
      </AnswerHeader>
      {result.error && <ErrorState error={result.error} onRetry={() => void result.refetch()} />}
      {props.children(answer)}
    </div>
  );
}

function Waiting({ question, children }: { question: string; children: ReactNode }) {
  return (
    <>
      <h1 className="mb-6 font-semibold text-soft">{question}</h1>
      {children}
    </>
  );
}

/** Has the shop any rebuild at all, whatever the filters let through? */
function hasRebuilds({ filters }: Head): boolean {
  return filters.seen.yes + filters.seen.no + filters.seen.unknown > 0;
}
