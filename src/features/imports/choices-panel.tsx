import type { Choice, Reading } from '#shared/contracts/import-reading.ts';
import { Panel } from '../../ui/panel.tsx';
import { SelectField } from '../../ui/text-field.tsx';
import type { Settings } from './use-settings.ts';

/** Questions that the file leaves open, each with what is done unless it is answered, and why. Those that must be asked come first. */
export function ChoicesPanel({
  reading,
  settings,
  canChange,
}: {
  reading: Reading;
  settings: Settings;
  canChange: boolean;
}) {
  if (reading.choices.length === 0) return null;
  const ordered = [...reading.choices].sort((a, b) => Number(isOpen(b)) - Number(isOpen(a)));
  const open = ordered.filter(isOpen).length;
  return (
    <Panel
      title={
        open > 0
          ? `${open} ${open === 1 ? 'question has' : 'questions have'} to be answered first`
          : 'Choices that were made for you'
      }
      subtitle={open > 0 ? 'The file itself cannot tell.' : 'Each can be changed; then read the file again.'}
      className="mb-6"
    >
      <ul className="grid gap-5">
        {ordered.map((choice) => (
          <li key={choice.id}>
            <ChoiceField {...{ choice, settings, canChange }} />
          </li>
        ))}
      </ul>
    </Panel>
  );
}

const isOpen = (choice: Choice) => choice.mustAsk && choice.answer === null;

function ChoiceField({ choice, settings, canChange }: { choice: Choice; settings: Settings; canChange: boolean }) {
  const answer = settings.answerOf(choice.id) ?? choice.answer;
  const value = answer ?? (choice.mustAsk ? '' : choice.preset);
  return (
    <SelectField
      className="max-w-[38rem]"
      label={choice.question}
      hint={choice.why}
      disabled={!canChange}
      options={choice.options}
      {...(choice.mustAsk ? { none: 'Choose' } : {})}
      value={value}
      onChange={(event) => event.target.value && settings.setAnswer(choice.id, event.target.value)}
    />
  );
}
