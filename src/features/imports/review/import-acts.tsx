import { useState } from 'react';
import type { Import } from '#shared/contracts/imports.ts';
import { ApiProblem } from '../../../lib/api-problem.ts';
import { useUnsaved } from '../../../lib/unsaved.ts';
import { Button } from '../../../ui/button.tsx';
import { ConfirmDialog } from '../../../ui/confirm-dialog.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { ErrorState } from '../../../ui/states.tsx';
import { notify } from '../../../ui/toast.tsx';
import { useImportWrites } from '../mutations.ts';
import type { Settings } from '../use-settings.ts';
import { NextStep } from './next-step.tsx';
import { isOpen } from './choices-panel.tsx';

type Props = {
  file: Import;
  settings: Settings;
  /** It is being read again with what was changed. */
  isReading: boolean;
  onDropped: () => void;
};

const STALE = {
  title: 'Somebody else changed this import meanwhile',
  detail: 'How it stands now is shown below, and all that you changed is still here. Look once more, then press again.',
};

/** What comes next, in words, and its one button: read it again with what was changed, book it, drop it, take it out. */
export function ImportActs({ file, settings, isReading, onDropped }: Props) {
  const writes = useImportWrites();
  const format = useFormatter();
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<unknown>(null);
  const [asks, setAsks] = useState<'drop' | 'undo' | null>(null);
  useUnsaved(settings.count > 0);
  const taken = file.reading?.control.taken ?? 0;
  const mustAnswer = file.reading?.choices.some(isOpen) ?? false;

  async function act(work: () => Promise<unknown>) {
    setBusy(true);
    setProblem(null);
    try {
      await work();
    } catch (refused) {
      const isStale = refused instanceof ApiProblem && refused.status === 412;
      setProblem(isStale ? STALE : refused);
      if (isStale) await writes.latest(file).catch(setProblem);
    } finally {
      setBusy(false);
    }
  }
  const readAgain = async () => {
    if (!settings.settings) return;
    await writes.change(file, settings.settings);
    settings.reset();
  };
  const isWaiting = file.state === 'ready' || file.state === 'refused';
  const noun = settings.areCorrections ? 'correction' : 'change';
  return (
    <div className="next-step no-print">
      <NextStep file={file} settings={settings} isReading={isReading} />
      <div className="flex flex-wrap items-center gap-3">
        {isWaiting && settings.count > 0 && (
          <Button kind="main" busy={busy} onClick={() => void act(readAgain)}>
            Read again with {format.count(settings.count, noun)}
          </Button>
        )}
        {file.state === 'ready' && settings.count === 0 && (
          <Button
            kind="main"
            busy={busy}
            disabled={mustAnswer || taken === 0}
            aria-describedby="next-step"
            onClick={() => void act(() => writes.commit(file))}
          >
            Book {format.count(taken, 'row')}
          </Button>
        )}
        {isWaiting && settings.count > 0 && <Button onClick={settings.reset}>Forget them</Button>}
        {isWaiting && settings.count === 0 && <Button onClick={() => setAsks('drop')}>Drop this file</Button>}
        {file.state === 'committed' && <Button onClick={() => setAsks('undo')}>Take it out again</Button>}
      </div>
      {problem !== null && <ErrorState error={problem} />}
      {asks === 'drop' && (
        <ConfirmDialog
          title={`Drop ${file.fileName}?`}
          note="Nothing of it is booked. The file is removed; you can bring it in again."
          act="Drop it"
          isDanger
          onAct={async () => {
            await writes.discard(file);
            onDropped();
          }}
          onClose={() => setAsks(null)}
        />
      )}
      {asks === 'undo' && (
        <ConfirmDialog
          title={`Take ${file.fileName} out again?`}
          note="Everything that it brought leaves the books, as if it had never come in. This is refused when something of it was changed since."
          act="Take it out"
          isDanger
          onAct={async () => {
            await writes.undo(file);
            notify('The file is out of the books again');
          }}
          onClose={() => setAsks(null)}
        />
      )}
    </div>
  );
}
