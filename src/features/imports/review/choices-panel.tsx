import type { Choice, Reading } from '#shared/contracts/import-reading.ts';
import { Panel } from '../../../ui/panel.tsx';
import { SelectField } from '../../../ui/text-field.tsx';
import { type Place, placeOf } from '../place.ts';
import type { Settings } from '../use-settings.ts';

type Props = { reading: Reading; settings: Settings; canChange: boolean; onJump: (place: Place) => void };

/** Must it be answered before anything is booked, and was it not? */
export const isOpen = (choice: Choice) => choice.mustAsk && choice.answer === null;

/** Questions that the file leaves open, each with what is done unless it is answered, and why. Those that must be asked come first. */
export function ChoicesPanel({ reading, settings, canChange, onJump }: Props) {
  if (reading.choices.length === 0) return null;
  const open = reading.choices.filter(isOpen);
  const others = reading.choices.filter((choice) => !isOpen(choice));
  const list = (choices: readonly Choice[]) => (
    <ul className="grid gap-x-8 gap-y-5 lg:grid-cols-2">
      {choices.map((choice) => (
        <li key={choice.id}>
          <ChoiceField {...{ choice, reading, settings, canChange, onJump }} />
        </li>
      ))}
    </ul>
  );
  return (
    <>
      {open.length > 0 && (
        <div id="open-questions" tabIndex={-1} className="mb-6 scroll-mt-20">
          <Panel
            title={`${open.length} ${open.length === 1 ? 'question has' : 'questions have'} to be answered first`}
            subtitle="The file itself cannot tell. Nothing is booked before you say."
            className="border-l-4 border-l-ink"
          >
            {list(open)}
          </Panel>
        </div>
      )}
      {others.length > 0 && (
        <Panel
          title={
            others.length === 1 ? 'A choice that was made for you' : `${others.length} choices that were made for you`
          }
          subtitle={canChange ? 'Each can be changed; then read the file again.' : undefined}
          className="mb-6"
        >
          {list(others)}
        </Panel>
      )}
    </>
  );
}

function ChoiceField({ choice, reading, settings, canChange, onJump }: Props & { choice: Choice }) {
  const answer = settings.answerOf(choice.id) ?? choice.answer;
  const value = answer ?? (choice.mustAsk ? '' : choice.preset);
  const preset = choice.options.find((option) => option.value === choice.preset)?.label;
  const place = placeOf(reading, choice);
  return (
    <div className="max-w-[38rem]">
      <SelectField
        label={choice.question}
        hint={
          <>
            {choice.why}
            {preset && answer === null && !choice.mustAsk && ` Unless you say otherwise: ${preset}.`}
            {preset && choice.mustAsk && answer === null && ` Most likely: ${preset}.`}
          </>
        }
        disabled={!canChange}
        options={choice.options}
        {...(choice.mustAsk ? { none: 'Choose' } : {})}
        value={value}
        onChange={(event) => event.target.value && settings.setAnswer(choice.id, event.target.value)}
      />
      {place && (
        <button type="button" className="row-act text-label" onClick={() => onJump(place)}>
          Show it in the file
        </button>
      )}
    </div>
  );
}
