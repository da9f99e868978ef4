import type { ReactNode } from 'react';
import { Mark } from '../../ui/answer-header.tsx';
import type { Answer } from './say.ts';

/** The answer; it stays in view while the sheet below it is filled in. `act`: what stands beside it. */
export function AnswerStrip({ answer, act }: { answer: Answer; act: ReactNode }) {
  return (
    <div className="sheet-answer no-print">
      <p className="answer" aria-live="polite" aria-atomic="true">
        {answer.before}
        {answer.figure && <Mark>{answer.figure}</Mark>}
        {answer.after}
      </p>
      {act}
    </div>
  );
}
