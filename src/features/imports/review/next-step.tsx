import type { Reading } from '#shared/contracts/import-reading.ts';
import type { Import } from '#shared/contracts/imports.ts';
import type { Formatter } from '#shared/formatter.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import type { Settings } from '../use-settings.ts';
import { isOpen } from './choices-panel.tsx';

type Props = { file: Import; settings: Settings; isReading: boolean };

/** What to do next, in one sentence; said aloud whenever it changes. */
export function NextStep({ file, settings, isReading }: Props) {
  const format = useFormatter();
  const open = file.reading?.choices.filter(isOpen).length ?? 0;
  const hasQuestions = file.state === 'ready' && settings.count === 0 && open > 0 && !isReading;
  return (
    <p id="next-step" role="status" className="max-w-[42rem]">
      {isReading ? `Reading it again. ${share(file.progress)}` : words(file, settings, format)}
      {hasQuestions && (
        <>
          {' '}
          <a
            href="#open-questions"
            onClick={(event) => {
              event.preventDefault();
              const questions = document.querySelector<HTMLElement>('#open-questions');
              questions?.scrollIntoView();
              questions?.querySelector('select')?.focus({ preventScroll: true });
            }}
          >
            {open === 1 ? 'Go to the question' : 'Go to the questions'}
          </a>
        </>
      )}
    </p>
  );
}

const share = (progress: number | null) => (progress === null ? '' : `${Math.round(progress * 100)} %`);

function words({ state, reading }: Import, { count, areCorrections }: Settings, format: Formatter): string {
  if (state === 'committed')
    return 'It is in the books. If it was the wrong file, take it out again: nothing of it stays.';
  if (count > 0)
    return `${format.count(count, areCorrections ? 'correction' : 'change')} ${count === 1 ? 'is' : 'are'} not read yet.`;
  if (state === 'refused')
    return reading?.columns.length
      ? 'Change what a column holds, or drop this file and bring in another.'
      : 'Drop this file and bring in another.';
  return reading ? readyWords(reading, format) : '';
}

function readyWords({ choices, control, asideCount }: Reading, format: Formatter): string {
  const open = choices.filter(isOpen).length;
  if (open > 0)
    return `${format.count(open, 'question')} ${open === 1 ? 'has' : 'have'} to be answered before anything can be booked.`;
  if (control.taken === 0) return 'There is nothing in it that could be booked.';
  if (asideCount > 0)
    return `${format.count(asideCount, 'place')} ${asideCount === 1 ? 'stays' : 'stay'} aside unless you put ${asideCount === 1 ? 'it' : 'them'} right below. All the rest can be booked.`;
  return 'Everything was understood. Look it over, then book it.';
}
