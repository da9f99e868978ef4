import { useState } from 'react';
import type { Import } from '#shared/contracts/imports.ts';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { ErrorState } from '../../ui/states.tsx';
import { notify } from '../../ui/toast.tsx';
import { useImportWrites } from './mutations.ts';
import type { Settings } from './use-settings.ts';

/** What can be done with a file as it stands: read it again with what was changed, book it, drop it, take it out. */
export function ImportActs({ file, settings, onDropped }: { file: Import; settings: Settings; onDropped: () => void }) {
  const writes = useImportWrites();
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<unknown>(null);
  const [asks, setAsks] = useState<'drop' | 'undo' | null>(null);
  const taken = file.reading?.control.taken ?? 0;
  const isOpen = file.reading?.choices.some((choice) => choice.mustAsk && choice.answer === null) ?? false;

  async function act(work: () => Promise<unknown>) {
    setBusy(true);
    setProblem(null);
    try {
      await work();
    } catch (refused) {
      setProblem(refused);
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
  return (
    <div className="mb-6 grid gap-4">
      <div className="no-print flex flex-wrap items-center gap-3">
        {isWaiting && settings.count > 0 && (
          <Button kind="main" busy={busy} onClick={() => void act(readAgain)}>
            Read again with {settings.count} {settings.count === 1 ? 'change' : 'changes'}
          </Button>
        )}
        {file.state === 'ready' && settings.count === 0 && (
          <Button kind="main" busy={busy} disabled={isOpen} onClick={() => void act(() => writes.commit(file))}>
            {isOpen ? 'Answer the questions first' : `Book ${taken} ${taken === 1 ? 'row' : 'rows'}`}
          </Button>
        )}
        {settings.count > 0 && <Button onClick={() => settings.reset()}>Forget the changes</Button>}
        {isWaiting && <Button onClick={() => setAsks('drop')}>Drop this file</Button>}
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
