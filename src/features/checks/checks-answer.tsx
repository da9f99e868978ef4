import type { ChecksAnswer } from '#shared/contracts/checks.ts';
import { AnswerHeader, Mark } from '../../ui/answer-header.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { HowWorkedOut } from '../../ui/panel.tsx';

export const CHECKS_QUESTION = 'What in the books would bend an answer?';

/** The sentence over the data check: what may be wrong, and what is only left out. */
export function ChecksAnswerHead({ answer }: { answer: ChecksAnswer }) {
  const format = useFormatter();
  const { rebuildCount, finishedCount, asOf } = answer;
  return (
    <AnswerHeader
      question={CHECKS_QUESTION}
      title="Data check"
      answer={<Sentence answer={answer} />}
      caution={`Looked at ${format.count(rebuildCount, 'rebuild')}, ${format.number(finishedCount)} of them finished, as the books stood on ${format.day(asOf)}. What is never written down cannot be found missing.`}
    >
      <HowWorkedOut>
        <p>
          Each check is a plain rule. One bill twice: the same rebuild, category, day, amount, vendor and words on two
          entries that are not void and not split. A refund as a cost: its words say refund or returned, its amount is
          above zero. An estimate written over: three or more categories planned, and each came to its plan to the cent.
          A thin estimate: more than half of the cost lies in categories without a plan. A long day: one line of hours
          over twelve. A vehicle number: its ninth character against the sum that the standard for it asks for.
        </p>
        <p>
          “Of so many rebuilds” counts those that the check is made on: all, the finished ones, or the sold ones. Saying
          that something is right changes no figure; it only takes it off this list.
        </p>
      </HowWorkedOut>
    </AnswerHeader>
  );
}

function Sentence({ answer: { findings } }: { answer: ChecksAnswer }) {
  const format = useFormatter();
  const sumOf = (grade: string) => findings.reduce((sum, one) => sum + (one.grade === grade ? one.count : 0), 0);
  const kindsLeftOut = findings.filter(({ grade, count }) => grade === 'left out' && count > 0).length;
  const wrong = sumOf('wrong');
  if (wrong === 0 && kindsLeftOut === 0) {
    return <>Nothing stands in the way of an answer{sumOf('unsure') > 0 && '; a few things are worth a look'}.</>;
  }
  const leftOut =
    kindsLeftOut === 0
      ? 'nothing keeps a rebuild out of an answer'
      : `${format.count(kindsLeftOut, 'gap keeps', 'gaps keep')} rebuilds out of an answer`;
  if (wrong === 0) return <>No figure looks wrong; {leftOut}.</>;
  return (
    <>
      <Mark>{format.count(wrong, 'thing')}</Mark> may make a figure wrong; {leftOut}.
    </>
  );
}
