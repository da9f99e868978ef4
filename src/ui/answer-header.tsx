import type { ReactNode } from 'react';
import { usePageTitle } from './page-title.ts';

type Props = {
  /** The page's one question; also the window's title unless `title` is given. */
  question: string;
  title?: string;
  /** Filters, at the right of the question. */
  filters?: ReactNode;
  /** The answer in one sentence; wrap its figures in Mark. */
  answer: ReactNode;
  /** What a careful friend would add: how many, what is not counted, how sure. */
  caution?: ReactNode;
  children?: ReactNode;
};

/** The head of an answer page: question small with filters, answer large, caution line. `question`, `title`, `filters`, `answer`, `caution`. */
export function AnswerHeader({ question, title, filters, answer, caution, children }: Props) {
  usePageTitle(title ?? question);
  return (
    <header className="mb-6 grid gap-2.5">
      <div className="flex min-h-9 flex-wrap items-center justify-between gap-x-6 gap-y-2">
        <h1 className="font-semibold text-soft">{question}</h1>
        {filters && <div className="no-print flex flex-wrap items-center gap-2">{filters}</div>}
      </div>
      <p className="answer">{answer}</p>
      {caution && <Caution>{caution}</Caution>}
      {children}
    </header>
  );
}

/** The head of a page that is not an answer: `title`, `note` under it, `actions` at the right. */
export function PageHeader({ title, note, actions }: { title: string; note?: ReactNode; actions?: ReactNode }) {
  usePageTitle(title);
  return (
    <header className="mb-6 flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
      <div className="grid gap-1.5">
        <h1 className="answer">{title}</h1>
        {note && <div className="max-w-[58rem] text-lead text-soft">{note}</div>}
      </div>
      {actions && <div className="no-print flex flex-wrap gap-3">{actions}</div>}
    </header>
  );
}

/** Chalk under a figure of the answer. */
export function Mark({ children }: { children: ReactNode }) {
  return <mark className="mark">{children}</mark>;
}

/** The caution line: plain words in the second voice. */
export function Caution({ children }: { children: ReactNode }) {
  return <div className="max-w-[58rem] text-lead text-pretty text-soft">{children}</div>;
}
