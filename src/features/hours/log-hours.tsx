import { type FormEvent, useState } from 'react';
import { Link } from 'react-router-dom';
import type { BoardRow } from '#shared/contracts/hours.ts';
import { TASKS } from '#shared/vocabulary.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { newIdempotencyKey } from '../../lib/api.ts';
import { parseHours } from '../../lib/hours-text.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { ChipChoice } from '../../ui/segmented.tsx';
import { DayField, TextField } from '../../ui/text-field.tsx';
import { useOwnHoursWrites } from './mutations.ts';

const LENGTHS = ['0.5', '1', '2', '3', '4', '5', '6', '8'];
const TASK_OPTIONS = TASKS.map((task) => ({ value: task, label: task }));

/** Hours with dirty hands: a length, what was done, the day, one big button. Nothing is lost when it does not get through. */
export function LogHours({ row, today, back }: { row: BoardRow; today: string; back: string }) {
  const format = useFormatter();
  const { log } = useOwnHoursWrites();
  const [hours, setHours] = useState('');
  const [isTyped, setTyped] = useState(false);
  const [task, setTask] = useState<string | null>(null);
  const [workedOn, setWorkedOn] = useState(today);
  const [key, setKey] = useState(newIdempotencyKey);
  const [problem, setProblem] = useState<ApiProblem | string | null>(null);
  const [isBusy, setBusy] = useState(false);
  const seconds = parseHours(hours);
  const choose = (length: string, typed: boolean) => {
    setHours(length);
    setTyped(typed);
  };

  const onSubmit = async (event: FormEvent) => {
    event.preventDefault();
    if (!seconds) return setProblem('Choose how long.');
    setBusy(true);
    setProblem(null);
    try {
      await log({ rebuildId: row.id, workedOn, seconds, task }, key);
      setHours('');
      setKey(newIdempotencyKey());
    } catch (refused) {
      if (!(refused instanceof ApiProblem)) throw refused;
      setProblem(refused);
    } finally {
      setBusy(false);
    }
  };

  const planned = row.plannedSeconds === null ? '' : `, ${format.hours(row.plannedSeconds)} planned`;
  return (
    <form onSubmit={(event) => void onSubmit(event)} noValidate className="grid max-w-[30rem] gap-5">
      <header className="grid gap-1">
        <p className="font-semibold text-soft">Log hours</p>
        <h2 className="answer">
          {row.tag}
          {row.name && ` · ${row.name}`}
          {row.damageName && `, ${row.damageName}`}
        </h2>
        <p className="flex flex-wrap items-center gap-x-4 text-lead text-soft">
          {format.hours(row.loggedSeconds)} hours so far{planned}
          <Link to={back} className="inline-flex min-h-11 items-center">
            Another one
          </Link>
        </p>
      </header>
      <fieldset className="hour-keys">
        <legend className="sr-only">How long</legend>
        {LENGTHS.map((length) => (
          <label key={length} className="hour-key">
            <input
              type="radio"
              name="length"
              checked={!isTyped && hours === length}
              onChange={() => choose(length, false)}
            />
            {length === '0.5' ? '½' : length}
          </label>
        ))}
      </fieldset>
      <TextField
        label="Or another length"
        value={isTyped ? hours : ''}
        onChange={(event) => choose(event.target.value, true)}
        placeholder="1.5 or 1:30"
        inputMode="decimal"
        className="tall-field"
      />
      <ChipChoice label="Doing what" options={TASK_OPTIONS} value={task} onChange={setTask} large />
      <DayField
        label="Day"
        className="tall-field"
        value={workedOn}
        max={today}
        onChange={(event) => setWorkedOn(event.target.value)}
      />
      <ErrorSummary message={problem instanceof ApiProblem ? problem.message : (problem ?? undefined)} />
      <Button kind="main" size="large" type="submit" busy={isBusy}>
        {seconds ? `Log ${format.hours(seconds)} ${seconds === 3600 ? 'hour' : 'hours'}` : 'Log hours'}
      </Button>
    </form>
  );
}
