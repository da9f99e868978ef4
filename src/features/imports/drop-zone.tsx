import { useRef, useState } from 'react';
import { ApiProblem } from '../../lib/api-problem.ts';
import { newIdempotencyKey } from '../../lib/api.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorState } from '../../ui/states.tsx';
import { useImportWrites } from './mutations.ts';
import { useFileDrop } from './use-file-drop.ts';

/** Takes a file by dropping it or by a button. A file that is in already asks before it comes in again. */
export function DropZone({ onUploaded }: { onUploaded: (importId: string) => void }) {
  const writes = useImportWrites();
  const input = useRef<HTMLInputElement>(null);
  const [isBusy, setBusy] = useState(false);
  const [failed, setFailed] = useState<{ file: File; problem: unknown } | null>(null);

  async function send(file: File | undefined, importAnyway = false) {
    if (!file) return;
    setBusy(true);
    setFailed(null);
    try {
      onUploaded((await writes.upload(file, newIdempotencyKey(), importAnyway)).id);
    } catch (problem) {
      setFailed({ file, problem });
    } finally {
      setBusy(false);
      if (input.current) input.current.value = '';
    }
  }
  const isOver = useFileDrop((file) => void send(file));
  const isIn = failed?.problem instanceof ApiProblem && failed.problem.type === '/problems/already-in';
  return (
    <div className="mb-6 grid gap-4">
      <section
        aria-label="Bring a file in"
        className={`panel grid justify-items-start gap-3 border-dashed ${isOver ? 'border-ink bg-paper' : 'border-edge'}`}
      >
        <h2 className="text-lead font-[660]">Drop an old spreadsheet here</h2>
        <p className="max-w-[42rem] text-soft">
          A workbook (.xlsx, .ods) or a sheet saved as text: lists with one cost per row and the car beside it, sheets
          with one car per row, logs of hours. Nothing is booked before you have seen how it was understood.
        </p>
        <input
          ref={input}
          type="file"
          accept=".csv,.tsv,.txt,.xlsx,.ods,text/csv,text/plain,text/tab-separated-values"
          aria-label="File to bring in"
          className="sr-only"
          tabIndex={-1}
          onChange={(event) => void send(event.target.files?.[0])}
        />
        <Button kind="main" busy={isBusy} onClick={() => input.current?.click()}>
          Choose a file
        </Button>
      </section>
      {failed && !isIn && <ErrorState error={failed.problem} />}
      {failed && isIn && (
        <section role="alert" className="panel grid justify-items-start gap-3 border-l-4 border-l-edge">
          <h2 className="text-lead font-bold">{failed.file.name} is in already</h2>
          <p className="text-soft">{(failed.problem as ApiProblem).message}</p>
          <Button busy={isBusy} onClick={() => void send(failed.file, true)}>
            Bring it in once more all the same
          </Button>
        </section>
      )}
    </div>
  );
}
